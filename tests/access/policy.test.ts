import { describe, expect, it } from 'vitest';
import {
  actingRole,
  can,
  canSome,
  GENERAL_VERBS,
  POLICY,
  ROLES,
  SESSION_VERBS,
  STATION_VERBS,
  whoCanGrant,
  type Grant,
  type Role,
  type Viewer,
} from '@/src/access/policy';

const mine = { sessionId: 'mine', stationCodes: ['Af', 'Bm'] };
const other = { sessionId: 'other', stationCodes: ['Cf'] };
const ownStation = { stationCode: 'Af' };
const otherStation = { stationCode: 'Cf' };

const viewerAs = (...roles: Role[]): Viewer => ({
  userId: 'u',
  email: 'u@antiphon.example',
  theme: null,
  grants: roles.map(grantOf),
});

const grantOf = (role: Role): Grant => ({
  role,
  stationCode: role === 'operator' ? 'Af' : null,
  sessionId: role === 'investigator' ? 'mine' : null,
});

/**
 * The table of roles, in the order of ROLES: a any, o own only, . denied. What a verb stands for in that
 * table is its name; reading a draft, a slot, a clock has verbs of its own.
 */
const TABLE: Readonly<Record<string, string>> = {
  'session.list': 'aaaaa',
  'session.make': 'aa...',
  'session.read': 'aaoao',
  'session.edit': 'aa...',
  'plan.read-draft': 'aa.ao',
  'plan.edit': 'aa...',
  'plan.read-offered': 'aaoao',
  'comment.write': 'aaoao',
  'offer.write': 'aa...',
  'offer.approve': '....o',
  'slot.read': 'aaoao',
  'slot.reply': '.ao..',
  'outcome.write': '.ao..',
  'catalogue.read': 'aaaaa',
  'station.write': 'aa...',
  'station.write-own': 'aao..',
  'source.write': 'aa...',
  'mode.write': 'aa...',
  'desk.read': 'aao..',
  'clock.read': 'aaoaa',
  'clock.write': '..o..',
  'clock.set-aside': '..oa.',
  'clock-model.read': 'aaaaa',
  'clock-model.write': '...a.',
  'mail.read': 'a....',
  'people.write': 'a....',
  'token.own': 'aaaa.',
  'settings.own': 'aaaaa',
};

const cellsOf = <V extends string>(verbs: readonly V[]) =>
  verbs.flatMap((verb) => ROLES.map((role, index) => [verb, role, TABLE[verb]?.[index] ?? '?'] as const));

describe('who may do what', () => {
  it('has a row here for every verb', () => {
    const verbs = [...SESSION_VERBS, ...STATION_VERBS, ...GENERAL_VERBS];
    expect(Object.keys(TABLE).sort()).toEqual([...verbs].sort());
    expect(Object.values(TABLE).every((row) => /^[ao.]{5}$/.test(row))).toBe(true);
  });

  it.each(cellsOf(SESSION_VERBS))('%s by %s of a session: %s', (verb, role, cell) => {
    expect(can(viewerAs(role), verb, mine)).toBe(cell !== '.');
    expect(can(viewerAs(role), verb, other)).toBe(cell === 'a');
    expect(canSome(viewerAs(role), verb)).toBe(cell !== '.');
  });

  it.each(cellsOf(STATION_VERBS))('%s by %s of a station: %s', (verb, role, cell) => {
    expect(can(viewerAs(role), verb, ownStation)).toBe(cell !== '.');
    expect(can(viewerAs(role), verb, otherStation)).toBe(cell === 'a');
  });

  it.each(cellsOf(GENERAL_VERBS))('%s by %s: %s', (verb, role, cell) => {
    expect(can(viewerAs(role), verb)).toBe(cell === 'a');
  });

  it('answers for a slot only by the station that is spoken of', () => {
    const operator = viewerAs('operator');
    expect(can(operator, 'slot.reply', { sessionId: 'mine', stationCodes: ['Af'] })).toBe(true);
    expect(can(operator, 'slot.reply', { sessionId: 'mine', stationCodes: ['Bm'] })).toBe(false);
  });

  it('denies everything to one without a grant', () => {
    const nobody = viewerAs();
    for (const verb of GENERAL_VERBS) expect(can(nobody, verb)).toBe(false);
    for (const verb of SESSION_VERBS) expect(can(nobody, verb, mine)).toBe(false);
    for (const verb of STATION_VERBS) expect(can(nobody, verb, ownStation)).toBe(false);
  });

  it('lets the widest of several roles act', () => {
    expect(actingRole(viewerAs('correlator', 'scheduler'), 'plan.edit', mine)).toBe('scheduler');
    expect(actingRole(viewerAs('correlator'), 'plan.edit', mine)).toBeNull();
    expect(actingRole(viewerAs('operator', 'correlator'), 'clock.write', ownStation)).toBe('operator');
  });

  it('says for every verb who can give the right', () => {
    for (const verb of [...GENERAL_VERBS, ...SESSION_VERBS, ...STATION_VERBS]) {
      expect(POLICY[verb]).toBeDefined();
      expect(whoCanGrant(verb).heading).not.toBe('');
      expect(whoCanGrant(verb).message).toContain('administrator can give');
    }
  });
});
