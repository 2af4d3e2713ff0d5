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
export type StationSubject = { stationCode: string };

/** About a session; of slots and outcomes, `stationCodes` is the one station that is spoken of. */
export const SESSION_VERBS = [
  'session.read',
  'session.edit',
  'plan.read-draft',
  'plan.edit',
  'plan.read-offered',
  'comment.write',
  'offer.write',
  'offer.approve',
  'slot.read',
  'slot.reply',
  'outcome.write',
] as const;
/** About one station. */
export const STATION_VERBS = [
  'station.write-own',
  'desk.read',
  'clock.read',
  'clock.write',
  'clock.set-aside',
] as const;
export const GENERAL_VERBS = [
  'session.list',
  'session.make',
  'catalogue.read',
  'station.write',
  'source.write',
  'mode.write',
  'clock-model.read',
  'clock-model.write',
  'mail.read',
  'people.write',
  'token.own',
  'settings.own',
] as const;
export type SessionVerb = (typeof SESSION_VERBS)[number];
export type StationVerb = (typeof STATION_VERBS)[number];
export type GeneralVerb = (typeof GENERAL_VERBS)[number];
export type Verb = SessionVerb | StationVerb | GeneralVerb;

/** 'own': an operator's stations take part; an investigator's session is this one. */
type Scope = 'any' | 'own';

type Row = Readonly<Partial<Record<Role, Scope>>>;

const ALL: Row = { admin: 'any', scheduler: 'any', operator: 'any', correlator: 'any', investigator: 'any' };
const OWN_READ: Row = { ...ALL, operator: 'own', investigator: 'own' };
const PLANNERS: Row = { admin: 'any', scheduler: 'any' };

/** Who may do what. A cell that is absent is denied. */
export const POLICY: Readonly<Record<Verb, Row>> = {
  'session.list': ALL,
  'session.make': PLANNERS,
  'session.read': OWN_READ,
  'session.edit': PLANNERS,
  'plan.read-draft': { admin: 'any', scheduler: 'any', correlator: 'any', investigator: 'own' },
  'plan.edit': PLANNERS,
  'plan.read-offered': OWN_READ,
  'comment.write': OWN_READ,
  'offer.write': PLANNERS,
  'offer.approve': { investigator: 'own' },
  'slot.read': OWN_READ,
  'slot.reply': { scheduler: 'any', operator: 'own' },
  'outcome.write': { scheduler: 'any', operator: 'own' },
  'catalogue.read': ALL,
  'station.write': PLANNERS,
  'station.write-own': { ...PLANNERS, operator: 'own' },
  'source.write': PLANNERS,
  'mode.write': PLANNERS,
  'desk.read': { ...PLANNERS, operator: 'own' },
  'clock.read': { ...ALL, operator: 'own' },
  'clock.write': { operator: 'own' },
  'clock.set-aside': { operator: 'own', correlator: 'any' },
  'clock-model.read': ALL,
  'clock-model.write': { correlator: 'any' },
  'mail.read': { admin: 'any' },
  'people.write': { admin: 'any' },
  'token.own': { admin: 'any', scheduler: 'any', operator: 'any', correlator: 'any' },
  'settings.own': ALL,
};

type Subject = SessionSubject | StationSubject;

export function can(viewer: Viewer, verb: GeneralVerb): boolean;
export function can(viewer: Viewer, verb: SessionVerb, subject: SessionSubject): boolean;
export function can(viewer: Viewer, verb: StationVerb, subject: StationSubject): boolean;
export function can(viewer: Viewer, verb: Verb, subject?: Subject): boolean {
  return grantFor(viewer, verb, subject) !== null;
}

/** Whether the verb is open to the viewer for something at all: for pages that list their own. */
export const canSome = (viewer: Viewer, verb: Verb): boolean =>
  viewer.grants.some(({ role }) => POLICY[verb][role] !== undefined);

/** The role a viewer acts in, for the journal: the first of ROLES that has the right; null is denied. */
export function actingRole(viewer: Viewer, verb: SessionVerb, subject: SessionSubject): Role | null;
export function actingRole(viewer: Viewer, verb: StationVerb, subject: StationSubject): Role | null;
export function actingRole(viewer: Viewer, verb: Verb, subject: Subject): Role | null {
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
  'plan.read-offered':
    'Offered plans are read by schedulers, correlator staff, their stations’ operators and their investigators',
  'session.make': 'Schedulers make sessions',
  'session.edit': 'Schedulers change, cancel and close sessions',
  'comment.write': 'Comments are written by those who take part in the session',
  'offer.write': 'Schedulers offer and publish plans',
  'offer.approve': 'A session’s investigator agrees to its plan',
  'slot.read': 'Slots are read by those who take part in the session',
  'slot.reply': 'A station’s operators answer for their slot, or a scheduler on their behalf',
  'outcome.write': 'A station’s operators say how a scan went, or a scheduler on their behalf',
  'catalogue.read': 'Stations, sources and modes are read by those who have a role',
  'station.write': 'Schedulers keep the list of stations',
  'station.write-own': 'A station’s entry is kept by its operators and by schedulers',
  'source.write': 'Schedulers keep the list of sources',
  'mode.write': 'Schedulers keep the list of modes',
  'desk.read': 'A station’s desk is for its operators and for schedulers',
  'clock.read':
    'A clock log is read by its station’s operators, schedulers, correlator staff and investigators',
  'clock.write': 'A station’s operators keep its clock log',
  'clock.set-aside': 'Correlator staff and the station’s operators set readings aside',
  'clock-model.read': 'Clock models are read by those who have a role',
  'clock-model.write': 'Correlator staff make clock models',
  'mail.read': 'The local mailbox is for administrators',
  'people.write': 'Administrators keep people and their roles',
  'token.own': 'Tokens are for administrators, schedulers, operators and correlator staff',
  'settings.own': 'Settings are kept for those who have a role',
};

function grantFor(viewer: Viewer, verb: Verb, subject?: Subject): Grant | null {
  for (const role of ROLES) {
    const scope = POLICY[verb][role];
    if (scope === undefined) continue;
    const grant = viewer.grants.find((held) => held.role === role && covers(held, scope, subject));
    if (grant) return grant;
  }
  return null;
}

function covers(grant: Grant, scope: Scope, subject?: Subject): boolean {
  if (scope === 'any') return true;
  if (!subject) return false;
  if ('stationCode' in subject) return grant.stationCode === subject.stationCode;
  if (grant.stationCode !== null) return subject.stationCodes.includes(grant.stationCode);
  return grant.sessionId === subject.sessionId;
}
