import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyCommand, CommandRefused, subjectsOf, type Command, type Edit } from '@/src/schedule/commands';
import type { Plan } from '@/src/schedule/plan';
import { commandArb, makeGroup, makePlan, makeScan, member, planArb, T0 } from './plan-maker';

function command(...edits: Edit[]): Command {
  return { verb: 'edit-scan', edits };
}

function refusal(plan: Plan, given: Command): CommandRefused | null {
  try {
    applyCommand(plan, given);
    return null;
  } catch (error) {
    if (error instanceof CommandRefused) return error;
    throw error;
  }
}

/** Only what the command touches, as the server loads it: its subjects, and the legs of a removed group. */
function partOf(plan: Plan, given: Command): Plan {
  const touched = new Set(subjectsOf(plan, given));
  const removed = new Set<string>(
    given.edits.flatMap((edit) => (edit.kind === 'remove-group' ? [edit.groupId] : [])),
  );
  return {
    ...plan,
    scans: plan.scans.filter(
      (scan) => touched.has(scan.id) || (scan.groupId !== null && removed.has(scan.groupId)),
    ),
    groups: plan.groups.filter((group) => touched.has(group.id)),
  };
}

describe('a command and its inverse', () => {
  it('undo after do gives the plan back, and redo after undo the changed one', () => {
    let taken = 0;
    fc.assert(
      fc.property(planArb, commandArb, (plan, given) => {
        if (refusal(plan, given)) return;
        taken += 1;
        const done = applyCommand(plan, given);
        const undone = applyCommand(done.plan, done.inverse);
        expect(undone.plan).toEqual(plan);
        expect(applyCommand(undone.plan, undone.inverse).plan).toEqual(done.plan);
      }),
      { numRuns: 2000 },
    );
    expect(taken).toBeGreaterThan(200);
  });

  it('touch the same subjects', () => {
    fc.assert(
      fc.property(planArb, commandArb, (plan, given) => {
        if (refusal(plan, given)) return;
        const done = applyCommand(plan, given);
        expect(subjectsOf(done.plan, done.inverse)).toEqual(subjectsOf(plan, given));
      }),
      { numRuns: 1000 },
    );
  });

  it('never change the plan they are given', () => {
    fc.assert(
      fc.property(planArb, commandArb, (plan, given) => {
        const before = structuredClone(plan);
        refusal(plan, given);
        expect(plan).toEqual(before);
      }),
    );
  });

  it('come out the same on a plan that holds only what they touch', () => {
    fc.assert(
      fc.property(planArb, commandArb, (plan, given) => {
        const part = partOf(plan, given);
        const whole = refusal(plan, given);
        expect(refusal(part, given)?.code).toBe(whole?.code);
        if (whole) return;
        const done = applyCommand(plan, given);
        const small = applyCommand(part, given);
        expect(small.inverse).toEqual(done.inverse);
        expect(partOf(done.plan, given).scans).toEqual(partOf(small.plan, given).scans);
        expect(subjectsOf(part, given)).toEqual(subjectsOf(plan, given));
      }),
      { numRuns: 1000 },
    );
  });
});

describe('a plan after a command', () => {
  it('keeps scans by start and id, and stations by code', () => {
    const plan = makePlan([makeScan('b'), makeScan('c', { startMs: T0 + 60_000 })]);
    const scan = makeScan('a', { stations: [member('Em'), member('Af')] });
    const { plan: after } = applyCommand(plan, command({ kind: 'add-scan', scan }));
    expect(after.scans.map((s) => s.id)).toEqual(['a', 'b', 'c']);
    expect(after.scans[0]?.stations.map((s) => s.station)).toEqual(['Af', 'Em']);
  });

  it('may overlap itself and lie outside the session: those are problems, not refusals', () => {
    const plan = makePlan([makeScan('a')]);
    const far = T0 + 400 * 86_400_000;
    const edits: Edit[] = [
      { kind: 'add-scan', scan: makeScan('b') },
      { kind: 'add-scan', scan: makeScan('c', { startMs: far }) },
    ];
    expect(applyCommand(plan, command(...edits)).plan.scans).toHaveLength(3);
  });

  it('names a group as touched when a leg joins, leaves or changes', () => {
    const leg = makeScan('a', { groupId: 'g1', leg: 'target' });
    const plan = makePlan([leg, makeScan('b')], [makeGroup('g1'), makeGroup('g2')]);
    const move = command({ kind: 'change-scan', scan: { ...leg, groupId: 'g2' } });
    expect(subjectsOf(plan, move)).toEqual(['a', 'g1', 'g2']);
    expect(subjectsOf(plan, command({ kind: 'remove-scan', scanId: 'a' }))).toEqual(['a', 'g1']);
    expect(subjectsOf(plan, command({ kind: 'remove-scan', scanId: 'b' }))).toEqual(['b']);
    const span = command({ kind: 'change-span', span: { startMs: T0, lengthSeconds: 60 } });
    expect(subjectsOf(plan, span)).toEqual(['span']);
  });

  it('takes a group away with its legs in either order, and brings both back', () => {
    const leg = makeScan('a', { groupId: 'g1', leg: 'target' });
    const plan = makePlan([leg], [makeGroup('g1')]);
    const done = applyCommand(
      plan,
      command({ kind: 'remove-group', groupId: 'g1' }, { kind: 'remove-scan', scanId: 'a' }),
    );
    expect(done.plan.groups).toEqual([]);
    expect(applyCommand(done.plan, done.inverse).plan).toEqual(plan);
  });
});

describe('a wrong command is refused with a sentence', () => {
  const leg = makeScan('leg', { groupId: 'g1', leg: 'target' });
  const plan = makePlan([makeScan('a'), leg], [makeGroup('g1')]);
  const add = (changes: Parameters<typeof makeScan>[1]) =>
    command({ kind: 'add-scan', scan: makeScan('new', changes) });
  const span = (startMs: number, lengthSeconds: number) =>
    command({ kind: 'change-span', span: { startMs, lengthSeconds } });
  const group = (changes: Parameters<typeof makeGroup>[1]) =>
    command({ kind: 'add-group', group: makeGroup('g2', changes) });

  it.each([
    ['nothing to do', command(), 'empty', null, /nothing to do/],
    ['a length of zero', add({ lengthSeconds: 0 }), 'length', 'new', /cannot last 0 s\. Give it 1 s or more/],
    ['a scan longer than a day', add({ lengthSeconds: 86_401 }), 'length', 'new', /longer than 24 h/],
    ['a scan in the year 2400', add({ startMs: Date.UTC(2400, 0, 1) }), 'time', 'new', /Look at the year/],
    ['a negative length', add({ lengthSeconds: -60 }), 'length', 'new', /cannot last −1 min 00 s/],
    [
      'a length in part seconds',
      add({ lengthSeconds: 1.5 }),
      'part-second',
      'new',
      /whole seconds, not 1\.5/,
    ],
    ['a length that is no number', add({ lengthSeconds: Number.NaN }), 'part-second', 'new', /not NaN/],
    ['a start in part seconds', add({ startMs: T0 + 1 }), 'part-second', 'new', /start on a whole second/],
    ['a start that is no time', add({ startMs: Number.NaN }), 'part-second', 'new', /scan at NaN/],
    [
      'a double station',
      add({ stations: [member('Af'), member('Af')] }),
      'double-station',
      'new',
      /names Af twice/,
    ],
    [
      'a station of no session',
      add({ stations: [member('Zz')] }),
      'unknown-station',
      'new',
      /Zz, which is not a station of this session/,
    ],
    [
      'late and early that leave nothing',
      add({ stations: [member('Af', 400, 200)] }),
      'nothing-left',
      'new',
      /Af has nothing left .* 6 min 40 s late and 3 min 20 s early of 10 min 00 s/,
    ],
    [
      'joining before the start',
      add({ stations: [member('Af', -1)] }),
      'nothing-left',
      'new',
      /Af cannot join before/,
    ],
    ['late in part seconds', add({ stations: [member('Af', 0.5)] }), 'part-second', 'new', /whole seconds/],
    [
      'an id in use',
      command({ kind: 'add-scan', scan: makeScan('a') }),
      'exists',
      'a',
      /in the plan already/,
    ],
    [
      'a scan that is gone',
      command({ kind: 'remove-scan', scanId: 'x' }),
      'gone',
      'x',
      /no longer in the plan/,
    ],
    [
      'a change of a scan that is gone',
      command({ kind: 'change-scan', scan: makeScan('x') }),
      'gone',
      'x',
      /no longer in the plan/,
    ],
    [
      'an unknown group',
      add({ groupId: 'g9', leg: 'target' }),
      'unknown-group',
      'new',
      /nodding group that is not in the plan/,
    ],
    ['a leg of no group', add({ leg: 'target' }), 'leg', 'new', /target or calibrator leg/],
    ['a group member that is no leg', add({ groupId: 'g1' }), 'leg', 'new', /target or calibrator leg/],
    ['a group id in use', command({ kind: 'add-group', group: makeGroup('g1') }), 'exists', 'g1', /already/],
    ['a group that is gone', command({ kind: 'remove-group', groupId: 'g9' }), 'gone', 'g9', /no longer/],
    [
      'a change of a group that is gone',
      command({ kind: 'change-group', group: makeGroup('g9') }),
      'gone',
      'g9',
      /no longer/,
    ],
    [
      'a group that still has legs',
      command({ kind: 'remove-group', groupId: 'g1' }),
      'group-in-use',
      'g1',
      /still a leg .* Remove its legs with it/,
    ],
    ['a group without time on target', group({ targetOnSeconds: 0 }), 'length', 'g2', /1 s or more/],
    ['a group in part seconds', group({ turnSeconds: 0.5 }), 'part-second', 'g2', /whole seconds/],
    ['a session that ends before it starts', span(T0, -1), 'length', 'span', /ends before it starts/],
    ['a session of three years', span(T0, 3 * 365 * 86_400), 'length', 'span', /longer than 14 days/],
    ['a session in the year 1800', span(Date.UTC(1800, 0, 1), 60), 'time', 'span', /Look at the year/],
    ['a session in part seconds', span(T0 + 500, 60), 'part-second', 'span', /whole seconds/],
  ])('%s', (_title, given, code, subjectId, message) => {
    const refused = refusal(plan, given);
    expect(refused?.code).toBe(code);
    expect(refused?.subjectId).toBe(subjectId);
    expect(refused?.message).toMatch(message);
  });

  it('every refusal is a sentence, whatever the command', () => {
    let refusals = 0;
    fc.assert(
      fc.property(planArb, commandArb, (given, wrong) => {
        const refused = refusal(given, wrong);
        if (!refused) return;
        refusals += 1;
        expect(refused.message).toMatch(/^[A-Z].*\.$/);
      }),
      { numRuns: 1000 },
    );
    expect(refusals).toBeGreaterThan(100);
  });
});
