import { expect, it } from 'vitest';
import { scanNumbers } from '@/src/schedule/scan-numbers';
import { makeGroup, makePlan, makeScan, T0 } from './plan-maker';

it('scans are numbered by start, whatever their ids', () => {
  const plan = makePlan([
    makeScan('z'),
    makeScan('a', { startMs: T0 + 60_000 }),
    makeScan('m', { startMs: T0 - 1000 }),
  ]);
  expect([...scanNumbers(plan)]).toEqual([
    ['m', '1'],
    ['z', '2'],
    ['a', '3'],
  ]);
});

it('a nodding group counts once, where its first leg starts, and its legs are numbered after a point', () => {
  const leg = (id: string, minutes: number) =>
    makeScan(id, { startMs: T0 + minutes * 60_000, groupId: 'g1', leg: 'target' });
  const plan = makePlan(
    [
      makeScan('a'),
      leg('l1', 10),
      makeScan('between', { startMs: T0 + 11 * 60_000 }),
      leg('l2', 12),
      makeScan('z', { startMs: T0 + 30 * 60_000 }),
    ],
    [makeGroup('g1')],
  );
  expect(Object.fromEntries(scanNumbers(plan))).toEqual({
    a: '1',
    l1: '2.1',
    between: '3',
    l2: '2.2',
    z: '4',
  });
});
