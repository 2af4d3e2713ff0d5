import type { Route } from 'next';
import { POLICY, type Verb, type Viewer } from '@/src/access/policy';

/** Where a page stands: beside the sessions, or inside one. */
export type Place = { kind: 'network' } | { kind: 'session'; sessionId: string };

export type NavItem = { label: string; href: Route };

type Page = { label: string; verb: Verb } & (
  { kind: 'network'; path: Route } | { kind: 'session'; segment: string }
);

/** In the order of the masthead: a page that exists is one line here. */
const PAGES: readonly Page[] = [
  { kind: 'network', label: 'Sessions', verb: 'session.list', path: '/sessions' },
  { kind: 'network', label: 'Stations', verb: 'catalogue.read', path: '/stations' as Route },
  { kind: 'session', label: 'Timeline', verb: 'plan.read-draft', segment: 'timeline' },
  { kind: 'session', label: 'Sky', verb: 'plan.read-draft', segment: 'sky' },
  { kind: 'session', label: 'Fringes', verb: 'plan.read-draft', segment: 'fringes' },
  { kind: 'session', label: 'Coverage', verb: 'plan.read-draft', segment: 'coverage' },
];

/** The pages of a place that one of the viewer's roles has a part in. */
export function navFor(viewer: Viewer, place: Place): NavItem[] {
  return PAGES.filter((page) => page.kind === place.kind && hasPart(viewer, page.verb)).map((page) => ({
    label: page.label,
    href: hrefOf(page, place),
  }));
}

function hrefOf(page: Page, place: Place): Route {
  if (page.kind === 'network') return page.path;
  const sessionId = place.kind === 'session' ? place.sessionId : '';
  return `/sessions/${encodeURIComponent(sessionId)}/${page.segment}` as Route;
}

function hasPart(viewer: Viewer, verb: Verb): boolean {
  return viewer.grants.some((grant) => POLICY[verb][grant.role] !== undefined);
}
