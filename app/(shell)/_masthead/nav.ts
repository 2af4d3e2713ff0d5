import type { Route } from 'next';
import { canSome, type Role, type Verb, type Viewer } from '@/src/access/policy';

/** Where a page stands: beside the sessions, inside one, or at a station. */
export type Place =
  { kind: 'network' } | { kind: 'session'; sessionId: string } | { kind: 'station'; stationCode: string };

export type NavItem = { label: string; href: Route };

type Page = { label: string; verb: Verb } & (
  { kind: 'network'; path: Route } | { kind: 'session' | 'station'; segment: string }
);

/** In the order of the masthead: a page that exists is one line here. */
const PAGES: readonly Page[] = [
  { kind: 'station', label: 'Desk', verb: 'desk.read', segment: 'desk' },
  { kind: 'station', label: 'Clock log', verb: 'clock.read', segment: 'clock' },
  { kind: 'network', label: 'Sessions', verb: 'session.list', path: '/sessions' },
  { kind: 'network', label: 'Slots', verb: 'slot.reply', path: '/slots' as Route },
  { kind: 'network', label: 'Clocks', verb: 'clock.read', path: '/clocks' },
  { kind: 'network', label: 'Stations', verb: 'catalogue.read', path: '/stations' as Route },
  { kind: 'network', label: 'Sources', verb: 'catalogue.read', path: '/sources' as Route },
  { kind: 'network', label: 'Modes', verb: 'catalogue.read', path: '/modes' as Route },
  { kind: 'network', label: 'Mailbox', verb: 'mail.read', path: '/mail' as Route },
  { kind: 'session', label: 'Timeline', verb: 'plan.read-draft', segment: 'timeline' },
  { kind: 'session', label: 'Sky', verb: 'plan.read-draft', segment: 'sky' },
  { kind: 'session', label: 'Fringes', verb: 'plan.read-draft', segment: 'fringes' },
  { kind: 'session', label: 'Coverage', verb: 'plan.read-draft', segment: 'coverage' },
  { kind: 'session', label: 'Slots', verb: 'slot.read', segment: 'slots' },
  { kind: 'session', label: 'Comments', verb: 'session.read', segment: 'comments' },
  { kind: 'session', label: 'Session', verb: 'session.edit', segment: 'settings' },
];

/**
 * The pages of a place that one of the viewer's roles has a part in. An operator's own desk and clock log come first;
 * at a station the way back to the sessions comes last.
 */
export function navFor(viewer: Viewer, place: Place): NavItem[] {
  const items = pagesOf(viewer, place);
  if (place.kind === 'station') return [...items, ...pagesOf(viewer, { kind: 'network' }).slice(0, 1)];
  const own = viewer.grants.find(({ role }) => role === 'operator')?.stationCode;
  return own ? [...pagesOf(viewer, { kind: 'station', stationCode: own }), ...items] : items;
}

/** Where a trimmed address of a session leads: the page of it that someone's work begins with. */
export const firstPageOf = (viewer: Viewer, place: Place): Route | null =>
  pagesOf(viewer, place)[0]?.href ?? null;

const pagesOf = (viewer: Viewer, place: Place): NavItem[] => {
  const first = firstOf(viewer);
  return PAGES.filter((page) => page.kind === place.kind && canSome(viewer, page.verb))
    .sort((a, b) => Number(b.label === first) - Number(a.label === first))
    .map((page) => ({ label: page.label, href: hrefOf(page, place) }));
};

/** The page of a session that someone's work begins with, where it is not the plan. */
function firstOf({ grants }: Viewer): string | null {
  const has = (role: Role) => grants.some((grant) => grant.role === role);
  if (has('admin') || has('scheduler')) return null;
  return has('correlator') ? 'Fringes' : has('investigator') ? 'Coverage' : null;
}

function hrefOf(page: Page, place: Place): Route {
  if (page.kind === 'network') return page.path;
  if (place.kind === 'station') return `/stations/${place.stationCode}/${page.segment}` as Route;
  const sessionId = place.kind === 'session' ? place.sessionId : '';
  return `/sessions/${encodeURIComponent(sessionId)}/${page.segment}` as Route;
}
