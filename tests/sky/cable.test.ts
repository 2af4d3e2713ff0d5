import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { axisFrame } from '@/src/sky/axis-frame';
import { leavesFirstAtMs, leavesSecondAt, scanEnd, scanPath, tooFastAtMs, turnsFor } from '@/src/sky/cable';
import { siteFrame } from '@/src/sky/site';
import { trackOf } from '@/src/sky/track';
import type { Geodetic, MountKind, SkyPosition } from '@/src/sky/types';
import { KINDS, lookedAt, someKind, someSite, someSource, START_MS } from './slew-maker';

// Truth: the same angles looked at each so often, by brute force.
const STEP_MS = 60_000;
const NEAR_AXIS_DEG = 88;

const someHours = fc.double({ min: 0.01, max: 30, noNaN: true });

function pathOf(kind: MountKind, site: Geodetic, source: SkyPosition, hours: number) {
  const endMs = START_MS + Math.round(hours * 3_600_000);
  const track = trackOf(source, { start: new Date(START_MS), end: new Date(endMs) });
  const axes = axisFrame(kind, siteFrame(site));
  const path = scanPath(axes, track, scanEnd(track, START_MS), scanEnd(track, endMs));
  const seen = lookedAt(kind, site, track, endMs, STEP_MS);
  return { path, seen, steepest: Math.max(...seen.map(({ secondDeg }) => Math.abs(secondDeg))) };
}

describe('turnsFor', () => {
  it('are all turns within the range, nearest to its middle first', () => {
    expect(turnsFor({ minDeg: -90, maxDeg: 450 }, 10)).toEqual([10, 370]);
    expect(turnsFor({ minDeg: -270, maxDeg: 270 }, 180)).toEqual([-180, 180]);
    expect(turnsFor({ minDeg: 0, maxDeg: 360 }, 0)).toEqual([0, 360]);
    expect(turnsFor({ minDeg: 20, maxDeg: 340 }, 5)).toEqual([]);
    expect(() => turnsFor({ minDeg: 0, maxDeg: 360 }, NaN)).toThrow(RangeError);
  });
});

describe('scanPath', () => {
  it('turns and reaches as far as a path looked at each minute, for every kind and any length', () => {
    fc.assert(
      fc.property(someKind, someSite, someSource, someHours, (kind, site, source, hours) => {
        const { path, seen, steepest } = pathOf(kind, site, source, hours);
        fc.pre(steepest < NEAR_AXIS_DEG);
        const turns = seen.map(({ turnDeg }) => turnDeg);
        expect(path.endTurnDeg).toBeCloseTo(turns.at(-1) ?? NaN, 6);
        // between two looks an axis goes on by no more than its bend
        const bend = 0.0005 / Math.cos((steepest * Math.PI) / 180) ** 2;
        expect(Math.abs(path.leastTurnDeg - Math.min(...turns))).toBeLessThan(bend);
        expect(Math.abs(path.mostTurnDeg - Math.max(...turns))).toBeLessThan(bend);
        expect(path.leastTurnDeg).toBeLessThanOrEqual(Math.min(...turns) + 1e-6);
        expect(path.mostTurnDeg).toBeGreaterThanOrEqual(Math.max(...turns) - 1e-6);
        const seconds = seen.map(({ secondDeg }) => secondDeg);
        expect(Math.abs(path.leastSecondDeg - Math.min(...seconds))).toBeLessThan(bend);
        expect(Math.abs(path.mostSecondDeg - Math.max(...seconds))).toBeLessThan(bend);
      }),
      { numRuns: 300 },
    );
  });

  it('goes through more than half a turn between rise and set', () => {
    // passes 2° south of the zenith: azimuth goes from north-east over south to north-west
    const site = { latitudeDeg: 50, longitudeDeg: 10, heightM: 0 };
    const { path, seen } = pathOf('az-el', site, { raDeg: 200, decDeg: 48 }, 23.9);
    expect(path.endTurnDeg).toBeCloseTo(seen.at(-1)?.turnDeg ?? NaN, 6);
    expect(path.endTurnDeg).toBeGreaterThan(350);
  });

  it('has values at the pole, at the zenith and at the end of the first axis', () => {
    const pole = { latitudeDeg: 90, longitudeDeg: 0, heightM: 0 };
    const equator = { latitudeDeg: 0, longitudeDeg: 0, heightM: 0 };
    for (const kind of KINDS)
      for (const site of [pole, equator, { ...pole, latitudeDeg: -90 }])
        for (const decDeg of [-90, 0, 90]) {
          const { path } = pathOf(kind, site, { raDeg: 0, decDeg }, 25);
          const { turnsAtMs, track, axes, ...rest } = path;
          expect(track.startMs).toBe(START_MS);
          expect(axes.kind).toBe(kind);
          expect(turnsAtMs.every((ms) => ms > path.startMs && ms < path.endMs)).toBe(true);
          const numbers = Object.values(rest).flatMap((value) =>
            typeof value === 'number' ? [value] : Object.values(value),
          );
          expect(numbers.every(Number.isFinite)).toBe(true);
        }
  });

  it('refuses a scan that is empty or not a time', () => {
    const track = trackOf({ raDeg: 1, decDeg: 1 }, { start: new Date(0), end: new Date(1000) });
    const axes = axisFrame('az-el', siteFrame({ latitudeDeg: 0, longitudeDeg: 0, heightM: 0 }));
    const end = scanEnd(track, 1000);
    expect(() => scanPath(axes, track, end, end)).toThrow(RangeError);
    expect(() => scanPath(axes, track, end, { ...end, atMs: NaN })).toThrow(RangeError);
    expect(() => scanPath(axes, track, end, { ...end, atMs: Infinity })).toThrow(RangeError);
  });
});

describe('the first instant outside', () => {
  it('a range of the first axis is that of brute force', () => {
    const someSpan = fc.tuple(
      fc.double({ min: 0, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
    );
    fc.assert(
      fc.property(someKind, someSite, someSource, someHours, someSpan, (kind, site, source, hours, cut) => {
        const { path, seen, steepest } = pathOf(kind, site, source, hours);
        fc.pre(steepest < NEAR_AXIS_DEG);
        const [low, high] = [path.leastTurnDeg * cut[0] - 0.01, path.mostTurnDeg * cut[1] + 0.01];
        const range = { minDeg: 100 + low, maxDeg: 100 + high };
        const foundMs = leavesFirstAtMs(path, range, 100);
        expect(leavesFirstAtMs(path, range, range.maxDeg + 1)).toBe(path.startMs);
        const first = seen.findIndex(({ turnDeg }) => turnDeg < low || turnDeg > high);
        if (foundMs === null) {
          expect(first).toBe(-1);
          return;
        }
        const [before, at] = [seen[first - 1]?.atMs ?? NaN, seen[first]?.atMs ?? NaN];
        // a look each minute misses what is outside for less
        if (first >= 0 && foundMs >= before - 1) expect(foundMs).toBeLessThanOrEqual(at + 1);
        const { turnDeg = NaN } = lookedAt(kind, site, path.track, foundMs, STEP_MS).at(-1) ?? {};
        expect(Math.min(Math.abs(turnDeg - low), Math.abs(turnDeg - high))).toBeLessThan(1e-4);
      }),
      { numRuns: 200 },
    );
  });

  it('a range of the second axis is that of brute force', () => {
    fc.assert(
      fc.property(someKind, someSite, someSource, someHours, (kind, site, source, hours) => {
        const { path, seen } = pathOf(kind, site, source, hours);
        const maxDeg = path.start.secondDeg + (path.mostSecondDeg - path.start.secondDeg) / 2 + 0.01;
        const found = leavesSecondAt(path, { minDeg: -90, maxDeg });
        const first = seen.findIndex(({ secondDeg }) => secondDeg > maxDeg);
        if (first < 0) {
          expect(path.mostSecondDeg).toBeLessThan(maxDeg + 0.01);
          return;
        }
        const [before, at] = [seen[first - 1]?.atMs ?? NaN, seen[first]?.atMs ?? NaN];
        expect(found?.atMs).toBeGreaterThanOrEqual(before - 1);
        expect(found?.atMs).toBeLessThanOrEqual(at + 1);
        expect(found?.secondDeg).toBeGreaterThan(maxDeg);
      }),
      { numRuns: 200 },
    );
  });

  it('a rate of the first axis is that of the steps between looks', () => {
    fc.assert(
      fc.property(someKind, someSite, someSource, someHours, (kind, site, source, hours) => {
        const { path, seen, steepest } = pathOf(kind, site, source, hours);
        fc.pre(steepest < 87 && seen.length > 3);
        const rates = seen.slice(1).map(({ atMs, turnDeg }, index) => {
          const before = seen[index];
          return Math.abs(turnDeg - (before?.turnDeg ?? NaN)) / ((atMs - (before?.atMs ?? NaN)) / 1000);
        });
        const fastest = Math.max(...rates);
        expect(tooFastAtMs(path, fastest * 0.99)).not.toBeNull();
        // a mean over a minute is below the peak
        expect(tooFastAtMs(path, fastest * 1.2 + 1e-4)).toBeNull();
      }),
      { numRuns: 200 },
    );
  });
});
