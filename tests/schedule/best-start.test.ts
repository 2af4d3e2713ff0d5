import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bestStart, startHours, startsEndMs } from '@/src/schedule/best-start';
import { sweep } from '@/src/sky/interval-set';
import { windowsFor } from '@/src/sky/windows';

const HOUR = 3_600_000;
const FROM = Date.UTC(2029, 2, 20, 18);

const spans = fc
  .array(fc.tuple(fc.integer({ min: 0, max: 60 * 60 }), fc.integer({ min: 1, max: 600 })), { maxLength: 4 })
  .map((list) =>
    sweep([list.map(([from, length]) => [FROM + from * 60_000, FROM + (from + length) * 60_000])], 1),
  );

describe('startHours', () => {
  it('counts by the minute what it integrates', () => {
    fc.assert(
      fc.property(
        fc.array(fc.array(spans, { minLength: 1, maxLength: 4 }), { minLength: 1, maxLength: 3 }),
        fc.integer({ min: 10, max: 1440 }),
        (windows, minutes) => {
          const starts = startHours(windows, FROM, minutes * 60_000);
          for (const { startMs, stationHours, baselineHours } of [starts[0], starts[37]].flatMap(
            (one) => one ?? [],
          )) {
            let [stations, baselines] = [0, 0];
            for (let minute = 0; minute < minutes; minute += 1) {
              const at = startMs + minute * 60_000;
              for (const target of windows) {
                const up = target.filter((list) =>
                  list.some(([from, until]) => from <= at && at < until),
                ).length;
                stations += up / 60;
                baselines += (up * (up - 1)) / 120;
              }
            }
            expect(stationHours).toBeCloseTo(stations / windows.length, 9);
            expect(baselineHours).toBeCloseTo(baselines / windows.length, 9);
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  it('comes back after a sidereal day, and starts every ten minutes between', () => {
    const stations = [-20, 10, 45].map((longitudeDeg) => ({
      site: { latitudeDeg: 50, longitudeDeg, heightM: 0 },
      minElevationDeg: 10,
    }));
    const sources = [
      { raDeg: 80, decDeg: 10 },
      { raDeg: 120, decDeg: -5 },
    ];
    const span = { start: new Date(FROM), end: new Date(startsEndMs(FROM, 8 * HOUR)) };
    const windows = windowsFor(sources, stations, span).map((target) =>
      target.map((list) => list.map(({ start, end }) => [start.getTime(), end.getTime()] as const)),
    );
    const starts = startHours(windows, FROM, 8 * HOUR);
    expect(starts).toHaveLength(145);
    expect(starts[1]?.startMs).toBe(FROM + 600_000);
    expect(starts.at(-1)?.stationHours).toBeCloseTo(starts[0]?.stationHours ?? NaN, 3);
    expect(starts.at(-1)?.baselineHours).toBeCloseTo(starts[0]?.baselineHours ?? NaN, 3);
    const best = bestStart(starts);
    expect(best?.stationHours).toBeGreaterThan(15);
    expect(starts.every(({ stationHours }) => stationHours <= (best?.stationHours ?? NaN) + 0.002)).toBe(
      true,
    );
  });

  it('has nothing without targets, and refuses what is no length', () => {
    expect(startHours([], FROM, HOUR)[0]).toEqual({ startMs: FROM, stationHours: 0, baselineHours: 0 });
    expect(bestStart([])).toBeNull();
    expect(() => startHours([], FROM, 0)).toThrow(RangeError);
    expect(() => startHours([], NaN, HOUR)).toThrow(RangeError);
  });

  it('takes the earlier of two that are as good', () => {
    const at = (startMs: number, stationHours: number, baselineHours = 1) => ({
      startMs,
      stationHours,
      baselineHours,
    });
    expect(bestStart([at(1, 5), at(2, 5.001), at(3, 4)])?.startMs).toBe(1);
    expect(bestStart([at(1, 5), at(2, 5.001, 2), at(3, 4)])?.startMs).toBe(2);
  });
});
