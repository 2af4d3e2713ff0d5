import { describe, expect, it } from 'vitest';
import {
  answerTo,
  hoursWithout,
  LEAD_SECONDS,
  scansHit,
  slotsOf,
  TAIL_SECONDS,
  within,
  type Reply,
} from '@/src/schedule/slots';
import { makePlan, makeScan, member, T0 } from './plan-maker';

const HOUR = 3_600_000;
const plan = makePlan([
  makeScan('a', { stations: [member('Af', 60), member('Bm')] }),
  makeScan('b', { startMs: T0 + HOUR, modeId: 'mode-b', stations: [member('Bm', 0, 120)] }),
]);
const asked = { startMs: T0, endMs: T0 + 10 * HOUR, modeIds: ['m'] };
const yes: Reply = { reply: 'confirmed', hours: [[T0, T0 + 10 * HOUR]], asked };

describe('the slots of a plan', () => {
  it('run from the first start less lead to the last stop plus tail, of a station’s own hours', () => {
    const slots = slotsOf(plan);
    expect(slots.map(({ station }) => station)).toEqual(['Af', 'Bm']);
    expect(slots[0]).toMatchObject({
      startMs: T0 + 60_000 - LEAD_SECONDS * 1000,
      endMs: T0 + 600_000 + TAIL_SECONDS * 1000,
      modeIds: ['mode-a'],
    });
    expect(slots[1]).toMatchObject({
      endMs: T0 + HOUR + 480_000 + TAIL_SECONDS * 1000,
      modeIds: ['mode-a', 'mode-b'],
    });
  });

  it('are none of a station that takes part in nothing', () => {
    expect(slotsOf(makePlan([]))).toEqual([]);
  });
});

describe('a station’s word', () => {
  it.each([
    ['open without a reply', null, asked, 'open'],
    ['what it was while the slot keeps to it', yes, asked, 'confirmed'],
    ['what it was when the slot shrinks', yes, { ...asked, endMs: T0 + HOUR }, 'confirmed'],
    ['stale when the slot ends later', yes, { ...asked, endMs: T0 + 11 * HOUR }, 'stale'],
    ['stale when the slot starts earlier', yes, { ...asked, startMs: T0 - 1000 }, 'stale'],
    ['stale when a mode comes in', yes, { ...asked, modeIds: ['m', 'n'] }, 'stale'],
    ['stale when a mode is another', yes, { ...asked, modeIds: ['n'] }, 'stale'],
    ['stale when a mode goes out', yes, { ...asked, modeIds: [] }, 'stale'],
    ['partly while the slot is the one it answered', { ...yes, reply: 'partly' as const }, asked, 'partly'],
    [
      'declined whatever moves',
      { ...yes, reply: 'declined' as const, hours: [] },
      { ...asked, endMs: T0 },
      'declined',
    ],
  ] as const)('is %s', (_, reply, slot, answer) => {
    expect(answerTo(slot, reply)).toBe(answer);
  });

  it('leaves the hours it does not give', () => {
    const span = [T0, T0 + 10 * HOUR] as const;
    expect(hoursWithout(span, null)).toEqual([]);
    expect(hoursWithout(span, { hours: [] })).toEqual([span]);
    expect(
      hoursWithout(span, {
        hours: [
          [T0 + 4 * HOUR, T0 + 12 * HOUR],
          [T0 - HOUR, T0 + 2 * HOUR],
        ],
      }),
    ).toEqual([[T0 + 2 * HOUR, T0 + 4 * HOUR]]);
  });

  it('says which scans it costs, and whether the whole of them', () => {
    const hit = scansHit(plan, 'Bm', [[T0 + 300_000, T0 + 2 * HOUR]]);
    expect(hit.map(({ scan, isWhole }) => [scan.id, isWhole])).toEqual([
      ['a', false],
      ['b', true],
    ]);
    expect(scansHit(plan, 'Em', [[T0, T0 + HOUR]])).toEqual([]);
  });
});

describe('the hours within a slot', () => {
  it('are cut at its ends, and those outside fall away', () => {
    const span = [T0, T0 + 4 * HOUR] as const;
    const hours = [
      [T0 - HOUR, T0 + HOUR],
      [T0 + 2 * HOUR, T0 + 9 * HOUR],
      [T0 + 4 * HOUR, T0 + 5 * HOUR],
    ] as const;
    expect(within(span, hours)).toEqual([
      [T0, T0 + HOUR],
      [T0 + 2 * HOUR, T0 + 4 * HOUR],
    ]);
  });
});
