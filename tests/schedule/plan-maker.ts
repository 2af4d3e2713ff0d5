import fc from 'fast-check';
import type { Command, Edit } from '@/src/schedule/commands';
import type { NoddingGroup, Plan, Scan, ScanStation } from '@/src/schedule/plan';
import { compareScans } from '@/src/schedule/plan';

export const T0 = Date.UTC(2027, 1, 13, 1, 0, 0);

export function makeScan(id: string, changes: Partial<Scan> = {}): Scan {
  return {
    id,
    sourceId: 'src-a',
    modeId: 'mode-a',
    startMs: T0,
    lengthSeconds: 600,
    stations: [member('Af'), member('Bm')],
    groupId: null,
    leg: null,
    comment: '',
    ...changes,
  };
}

export function member(station: string, lateSeconds = 0, earlySeconds = 0): ScanStation {
  return { station, lateSeconds, earlySeconds };
}

export function makeGroup(id: string, changes: Partial<NoddingGroup> = {}): NoddingGroup {
  return {
    id,
    targetId: 'src-a',
    calibratorId: 'src-b',
    targetOnSeconds: 120,
    calibratorOnSeconds: 60,
    turnSeconds: 20,
    first: 'calibrator',
    ...changes,
  };
}

export function makePlan(scans: Scan[] = [], groups: NoddingGroup[] = [], changes: Partial<Plan> = {}): Plan {
  return {
    sessionId: 'session-a',
    span: { startMs: T0 - 3_600_000, lengthSeconds: 86_400 },
    stations: ['Em', 'Af', 'Bm', 'Cf'],
    scans: [...scans].sort(compareScans),
    groups: [...groups].sort((a, b) => (a.id < b.id ? -1 : 1)),
    ...changes,
  };
}

const SCAN_IDS = ['s1', 's2', 's3', 's4', 's5'];
const GROUP_IDS = ['g1', 'g2'];

const membersArb = fc
  .subarray(['Af', 'Bm', 'Cf', 'Em'], { minLength: 0 })
  .chain((codes) =>
    fc.tuple(
      ...codes.map((code) =>
        fc
          .tuple(fc.integer({ min: 0, max: 10 }), fc.integer({ min: 0, max: 10 }))
          .map(([late, early]) => member(code, late, early)),
      ),
    ),
  );

const scanArb: fc.Arbitrary<Scan> = fc
  .record({
    id: fc.constantFrom(...SCAN_IDS),
    startMs: fc.integer({ min: 0, max: 500 }).map((n) => T0 + n * 1000),
    lengthSeconds: fc.integer({ min: 1, max: 60 }),
    stations: membersArb,
    groupId: fc.option(fc.constantFrom(...GROUP_IDS), { nil: null, freq: 2 }),
    leg: fc.constantFrom('target' as const, 'calibrator' as const),
  })
  .map(({ leg, ...scan }) => makeScan(scan.id, { ...scan, leg: scan.groupId === null ? null : leg }));

const groupArb = fc
  .tuple(fc.constantFrom(...GROUP_IDS), fc.integer({ min: 1, max: 300 }))
  .map(([id, targetOnSeconds]) => makeGroup(id, { targetOnSeconds }));

const editArb: fc.Arbitrary<Edit> = fc.oneof(
  { weight: 4, arbitrary: scanArb.map((scan): Edit => ({ kind: 'add-scan', scan })) },
  { weight: 4, arbitrary: scanArb.map((scan): Edit => ({ kind: 'change-scan', scan })) },
  fc.constantFrom(...SCAN_IDS).map((scanId): Edit => ({ kind: 'remove-scan', scanId })),
  groupArb.map((group): Edit => ({ kind: 'add-group', group })),
  groupArb.map((group): Edit => ({ kind: 'change-group', group })),
  fc.constantFrom(...GROUP_IDS).map((groupId): Edit => ({ kind: 'remove-group', groupId })),
  fc
    .integer({ min: 1, max: 90_000 })
    .map((lengthSeconds): Edit => ({ kind: 'change-span', span: { startMs: T0, lengthSeconds } })),
);

/** Commands of one to four edits over few ids, many of which a given plan must refuse. */
export const commandArb: fc.Arbitrary<Command> = fc
  .array(editArb, { minLength: 1, maxLength: 4 })
  .map((edits): Command => ({ verb: 'edit-scan', edits }));

/** Plans in canonical order over the same ids. */
export const planArb: fc.Arbitrary<Plan> = fc
  .tuple(
    fc.uniqueArray(scanArb, { selector: (scan) => scan.id }),
    fc.uniqueArray(groupArb, { selector: (group) => group.id }),
  )
  .map(([scans, groups]) => {
    const known = new Set(groups.map((group) => group.id));
    const whole = scans.map((scan) => ({
      ...scan,
      lengthSeconds: scan.lengthSeconds + 30,
      ...(scan.groupId !== null && !known.has(scan.groupId) ? { groupId: null, leg: null } : {}),
    }));
    return makePlan(whole, groups);
  });
