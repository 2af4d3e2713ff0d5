export const ROLES = ['admin', 'scheduler', 'operator', 'correlator', 'investigator'] as const;
export type Role = (typeof ROLES)[number];

/** An operator's grant names a station, an investigator's a session; the others hold everywhere. */
export type Grant = { role: Role; stationCode: string | null; sessionId: string | null };

export type Viewer = {
  userId: string;
  email: string;
  theme: 'day' | 'night' | null;
  grants: readonly Grant[];
};

export type SessionSubject = { sessionId: string; stationCodes: readonly string[] };

export const SESSION_VERBS = ['session.read', 'plan.read-draft', 'plan.edit'] as const;
export const GENERAL_VERBS = ['session.list', 'catalogue.read', 'settings.own'] as const;
export type SessionVerb = (typeof SESSION_VERBS)[number];
export type GeneralVerb = (typeof GENERAL_VERBS)[number];
export type Verb = SessionVerb | GeneralVerb;

/** 'own': an operator's stations take part; an investigator's session is this one. */
export type Scope = 'any' | 'own';

/** Who may do what. A cell that is absent is denied. */
export const POLICY: Readonly<Record<Verb, Readonly<Partial<Record<Role, Scope>>>>> = {
  'session.list': {
    admin: 'any',
    scheduler: 'any',
    operator: 'any',
    correlator: 'any',
    investigator: 'any',
  },
  'session.read': {
    admin: 'any',
    scheduler: 'any',
    operator: 'own',
    correlator: 'any',
    investigator: 'own',
  },
  'plan.read-draft': { admin: 'any', scheduler: 'any', correlator: 'any', investigator: 'own' },
  'plan.edit': { admin: 'any', scheduler: 'any' },
  'catalogue.read': {
    admin: 'any',
    scheduler: 'any',
    operator: 'any',
    correlator: 'any',
    investigator: 'any',
  },
  'settings.own': {
    admin: 'any',
    scheduler: 'any',
    operator: 'any',
    correlator: 'any',
    investigator: 'any',
  },
};

export function can(viewer: Viewer, verb: GeneralVerb): boolean;
export function can(viewer: Viewer, verb: SessionVerb, subject: SessionSubject): boolean;
export function can(viewer: Viewer, verb: Verb, subject?: SessionSubject): boolean {
  return grantFor(viewer, verb, subject) !== null;
}

/** The role a viewer acts in, for the journal: the first of ROLES that has the right; null is denied. */
export function actingRole(viewer: Viewer, verb: SessionVerb, subject: SessionSubject): Role | null {
  return grantFor(viewer, verb, subject)?.role ?? null;
}

/** How the masthead and the journal name a grant: "Scheduler", "Operator Af". */
export function roleLabel(grant: Pick<Grant, 'role' | 'stationCode'>): string {
  const word = ROLE_WORDS[grant.role];
  return grant.stationCode === null ? word : `${word} ${grant.stationCode}`;
}

/** What the page says to someone who has no part in it: a heading, and who can give the right. */
export function whoCanGrant(verb: Verb): { heading: string; message: string } {
  return { heading: HEADINGS[verb], message: 'An administrator can give the right.' };
}

const ROLE_WORDS: Readonly<Record<Role, string>> = {
  admin: 'Administrator',
  scheduler: 'Scheduler',
  operator: 'Operator',
  correlator: 'Correlator',
  investigator: 'Investigator',
};

const HEADINGS: Readonly<Record<Verb, string>> = {
  'session.list': 'Sessions are listed for those who have a role',
  'session.read':
    'Sessions are read by schedulers, correlator staff, their stations’ operators and their investigators',
  'plan.read-draft': 'Draft plans are read by schedulers, correlator staff and the session’s investigators',
  'plan.edit': 'Schedulers change plans',
  'catalogue.read': 'Stations, sources and modes are read by those who have a role',
  'settings.own': 'Settings are kept for those who have a role',
};

function grantFor(viewer: Viewer, verb: Verb, subject?: SessionSubject): Grant | null {
  for (const role of ROLES) {
    const scope = POLICY[verb][role];
    if (scope === undefined) continue;
    const grant = viewer.grants.find((held) => held.role === role && covers(held, scope, subject));
    if (grant) return grant;
  }
  return null;
}

function covers(grant: Grant, scope: Scope, subject?: SessionSubject): boolean {
  if (scope === 'any') return true;
  if (!subject) return false;
  if (grant.stationCode !== null) return subject.stationCodes.includes(grant.stationCode);
  return grant.sessionId === subject.sessionId;
}
