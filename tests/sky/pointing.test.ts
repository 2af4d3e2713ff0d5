import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstAxis } from '@/src/sky/axes';
import { pointingsOf, type PointedScan } from '@/src/sky/pointing';
import { azEl } from '@/src/sky/position';
import { firstPointing, pointingAtEnd, slewBetween, type SlewStation } from '@/src/sky/slew';
import { trackOf } from '@/src/sky/track';
import type { Pointing } from '@/src/sky/types';
import { KINDS, lookedAt, mountOf, someKind, someSite, someSource, START_MS } from './slew-maker';

const STEP_MS = 10_000;
/** a slew of 2√(d/a) magnifies the rounding of a short way */
const TOLERANCE = { deg: 1e-9, seconds: 1e-6 };

const stations: SlewStation[] = KINDS.flatMap((kind) => [
  { site: { latitudeDeg: 50, longitudeDeg: 10, heightM: 100 }, mount: mountOf(kind) },
  { site: { latitudeDeg: -31, longitudeDeg: 115, heightM: 300 }, mount: mountOf(kind) },
]);
const someScans = fc
  .array(fc.record({ source: someSource, minutes: fc.integer({ min: 1, max: 90 }) }), {
    minLength: 1,
    maxLength: 8,
  })
  .map((list) => {
    let fromMs = START_MS;
    return list.map(({ source, minutes }): PointedScan => {
      const start = new Date(fromMs);
      const end = new Date(fromMs + minutes * 60_000);
      fromMs = end.getTime() + 300_000;
      return { source, scan: { start, end } };
    });
  });

function spanOf(scans: readonly PointedScan[]) {
  const [first, last] = [scans[0], scans.at(-1)];
  if (!first || !last) throw new Error('no scans');
  return { start: first.scan.start, end: last.scan.end };
}

describe('pointingsOf', () => {
  it('is the same as one scan and station after another', () => {
    fc.assert(
      fc.property(someScans, (scans) => {
        const table = pointingsOf(scans, stations);
        const span = spanOf(scans);
        stations.forEach((station, column) => {
          let held: Pointing | null = null;
          scans.forEach(({ source, scan }, row) => {
            const at = row * stations.length + column;
            const target = { source, scan, track: trackOf(source, span) };
            const slew: ReturnType<typeof slewBetween> | null = held
              ? slewBetween(station, held, target)
              : null;
            const found: ReturnType<typeof firstPointing> = !slew
              ? firstPointing(station, target)
              : 'impossible' in slew
                ? slew
                : slew.pointing;
            if ('impossible' in found) {
              expect(table.impossible.get(at)).toEqual(found);
              expect(table.motorDeg[at]).toBeNaN();
              return;
            }
            expect(table.impossible.has(at)).toBe(false);
            expect(Math.abs((table.motorDeg[at] ?? NaN) - found.motorAzimuthDeg)).toBeLessThan(TOLERANCE.deg);
            expect(Math.abs((table.azimuthDeg[at] ?? NaN) - found.azimuthDeg)).toBeLessThan(TOLERANCE.deg);
            expect(Math.abs((table.elevationDeg[at] ?? NaN) - found.elevationDeg)).toBeLessThan(
              TOLERANCE.deg,
            );
            const seconds = slew && 'seconds' in slew ? slew.seconds : NaN;
            if (Number.isNaN(seconds)) expect(table.slewSeconds[at]).toBeNaN();
            else expect(Math.abs((table.slewSeconds[at] ?? NaN) - seconds)).toBeLessThan(TOLERANCE.seconds);
            held = pointingAtEnd(station, found, target);
            expect(Math.abs((table.endMotorDeg[at] ?? NaN) - held.motorAzimuthDeg)).toBeLessThan(
              TOLERANCE.deg,
            );
          });
        });
      }),
      { numRuns: 40 },
    );
  });

  it('takes the quickest of the turns that last, by brute force', () => {
    const someMiddle = fc.integer({ min: -300, max: 300 });
    const someHalf = fc.integer({ min: 60, max: 400 });
    fc.assert(
      fc.property(someKind, someSite, someScans, someMiddle, someHalf, (kind, site, scans, middle, half) => {
        const mount = mountOf(kind, { first: { minDeg: middle - half, maxDeg: middle + half } });
        const first = firstAxis(mount);
        const table = pointingsOf(scans, [{ site, mount }]);
        let heldDeg: number | null = null;
        scans.forEach(({ source, scan }, row) => {
          const seen = lookedAt(kind, site, trackOf(source, scan), scan.end.getTime(), STEP_MS);
          const isLegal = (motorDeg: number, insideDeg = 0) =>
            seen.every(
              ({ turnDeg }) =>
                motorDeg + turnDeg >= first.minDeg + insideDeg &&
                motorDeg + turnDeg <= first.maxDeg - insideDeg,
            );
          const startDeg = seen[0]?.firstDeg ?? NaN;
          const turns = Array.from({ length: 9 }, (_, k) => startDeg + 360 * (k - 4));
          const legal = turns.filter((turn) => isLegal(turn));
          const motorDeg = table.motorDeg[row] ?? NaN;
          if (Number.isNaN(motorDeg)) {
            const { limit, kind: why } = table.impossible.get(row) ?? {};
            // between two looks an axis goes on by no more than its bend
            if (limit === 'first' && why !== 'too-fast')
              expect(turns.filter((turn) => isLegal(turn, 0.05))).toEqual([]);
            return;
          }
          expect(isLegal(motorDeg)).toBe(true);
          const wayDeg = (turn: number) => Math.abs(turn - (heldDeg ?? (first.minDeg + first.maxDeg) / 2));
          // the quickest turn has the shortest way, unless the second axis is slower than both
          const isByFirst = heldDeg === null || isFirstSlower(table.slewSeconds[row], wayDeg(motorDeg));
          if (isByFirst) expect(wayDeg(motorDeg)).toBeLessThanOrEqual(Math.min(...legal.map(wayDeg)) + 1e-6);
          heldDeg = table.endMotorDeg[row] ?? NaN;
        });
        function isFirstSlower(seconds: number | undefined, deg: number): boolean {
          const { rateDegPerS: v, accelDegPerS2: a } = first;
          return (seconds ?? NaN) - mount.settleSeconds <= deg / v + v / a + 1e-6;
        }
      }),
      { numRuns: 60 },
    );
  });

  it('gives azimuth and elevation of the source whatever the axes', () => {
    const source = { raDeg: 120, decDeg: 5 };
    const scan = { start: new Date(START_MS), end: new Date(START_MS + 60_000) };
    const table = pointingsOf([{ source, scan }], stations);
    let seen = 0;
    stations.forEach(({ site }, column) => {
      if (table.impossible.has(column)) return;
      const wanted = azEl(source, site, scan.start);
      expect(table.azimuthDeg[column]).toBeCloseTo(wanted.azimuthDeg, 5);
      expect(table.elevationDeg[column]).toBeCloseTo(wanted.elevationDeg, 5);
      seen += 1;
    });
    expect(seen).toBeGreaterThan(3);
  });

  it('leaves out stations that are not in a scan, and keeps them where they are', () => {
    const scanAt = (minutes: number) => ({
      start: new Date(START_MS + minutes * 60_000),
      end: new Date(START_MS + (minutes + 5) * 60_000),
    });
    const [a, b] = [
      { raDeg: 120, decDeg: 40 },
      { raDeg: 170, decDeg: 30 },
    ];
    const two = stations.slice(0, 1).flatMap((one) => [one, one]);
    const table = pointingsOf(
      [
        { source: a, scan: scanAt(0) },
        { source: b, scan: scanAt(10), stations: [1] },
        { source: a, scan: scanAt(20) },
      ],
      two,
    );
    expect(table.slewSeconds[2]).toBeNaN();
    expect(table.slewSeconds[3]).toBeGreaterThan(10);
    // the source has moved on in the fifteen minutes since
    expect(table.slewSeconds[4]).toBeGreaterThan(4);
    expect(table.slewSeconds[4]).toBeLessThan(table.slewSeconds[5] ?? NaN);
    expect(pointingsOf([], two).motorDeg).toHaveLength(0);
    expect(pointingsOf([{ source: a, scan: scanAt(0) }], []).motorDeg).toHaveLength(0);
  });

  it('refuses what cannot be', () => {
    const [station] = stations;
    if (!station) throw new Error('no station');
    const scan = { start: new Date(START_MS), end: new Date(START_MS + 60_000) };
    const source = { raDeg: 10, decDeg: 10 };
    const of = (change: Partial<PointedScan>, first = {}) =>
      pointingsOf([{ source, scan, ...change }], [{ ...station, mount: mountOf('az-el', { first }) }]);
    expect(() => of({ source: { raDeg: NaN, decDeg: 0 } })).toThrow(RangeError);
    expect(() => of({ source: { raDeg: 0, decDeg: 91 } })).toThrow(RangeError);
    expect(() => of({ scan: { start: scan.end, end: scan.start } })).toThrow(RangeError);
    expect(() => of({ scan: { start: scan.start, end: new Date(NaN) } })).toThrow(RangeError);
    expect(() => of({ stations: [1] })).toThrow('No station 1 among 1');
    expect(() => of({}, { rateDegPerS: 0 })).toThrow(RangeError);
    expect(() => of({}, { accelDegPerS2: NaN })).toThrow(RangeError);
    expect(() => of({}, { minDeg: 100, maxDeg: 90 })).toThrow('Not a range of angles: 100 to 90');
    expect(() => of({}, { maxDeg: Infinity })).toThrow(RangeError);
    expect(of({}).impossible.size + of({}).motorDeg.filter(Number.isFinite).length).toBe(1);
  });
});
