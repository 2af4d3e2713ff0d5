import { describe, expect, it } from 'vitest';
import {
  actingRole,
  can,
  GENERAL_VERBS,
  POLICY,
  ROLES,
  SESSION_VERBS,
  whoCanGrant,
  type Grant,
  type Role,
  type Viewer,
} from '@/src/access/policy';

const mine = { sessionId: 'mine', stationCodes: ['Af', 'Bm'] };
const other = { sessionId: 'other', stationCodes: ['Cf'] };

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

/** [verb, role, own session or station, another's], by the table of roles. */
const CELLS = [
  ['session.read', 'admin', true, true],
  ['session.read', 'scheduler', true, true],
  ['session.read', 'operator', true, false],
  ['session.read', 'correlator', true, true],
  ['session.read', 'investigator', true, false],
  ['plan.read-draft', 'admin', true, true],
  ['plan.read-draft', 'scheduler', true, true],
  ['plan.read-draft', 'operator', false, false],
  ['plan.read-draft', 'correlator', true, true],
  ['plan.read-draft', 'investigator', true, false],
  ['plan.edit', 'admin', true, true],
  ['plan.edit', 'scheduler', true, true],
  ['plan.edit', 'operator', false, false],
  ['plan.edit', 'correlator', false, false],
  ['plan.edit', 'investigator', false, false],
] as const;

describe('who may do what', () => {
  it.each(CELLS)('%s by %s: own %s, another’s %s', (verb, role, own, others) => {
    expect(can(viewerAs(role), verb, mine)).toBe(own);
    expect(can(viewerAs(role), verb, other)).toBe(others);
  });

  it('has a row here for every verb of a session and every role', () => {
    const rows = CELLS.map(([verb, role]) => `${verb} ${role}`);
    const cells = SESSION_VERBS.flatMap((verb) => ROLES.map((role) => `${verb} ${role}`));
    expect([...rows].sort()).toEqual([...cells].sort());
  });

  it.each(GENERAL_VERBS.flatMap((verb) => ROLES.map((role) => [verb, role] as const)))(
    '%s is open to %s',
    (verb, role) => {
      expect(can(viewerAs(role), verb)).toBe(true);
    },
  );

  it('denies everything to one without a grant', () => {
    const nobody = viewerAs();
    for (const verb of GENERAL_VERBS) expect(can(nobody, verb)).toBe(false);
    for (const verb of SESSION_VERBS) expect(can(nobody, verb, mine)).toBe(false);
  });

  it('lets the widest of several roles act', () => {
    expect(actingRole(viewerAs('correlator', 'scheduler'), 'plan.edit', mine)).toBe('scheduler');
    expect(actingRole(viewerAs('correlator'), 'plan.edit', mine)).toBeNull();
  });

  it('says for every verb who can give the right', () => {
    for (const verb of [...GENERAL_VERBS, ...SESSION_VERBS]) {
      expect(POLICY[verb]).toBeDefined();
      expect(whoCanGrant(verb).heading).not.toBe('');
      expect(whoCanGrant(verb).message).toContain('administrator can give');
    }
  });
});
