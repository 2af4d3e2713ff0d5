import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isInView } from '@/src/outlook/in-view';
import type { PlanSource, PlanStation } from '@/src/schedule/context';
import { skyStation } from '@/src/schedule/sky-station';
import { azEl } from '@/src/sky/position';
import { visibilityWindows } from '@/src/sky/windows';
import { SOURCES, STATIONS } from '../schedule/context-maker';
import { T0 } from '../schedule/plan-maker';

// Truth: visibilityWindows of this project, itself checked against ERFA in tests/sky.
const TOLERANCE = {
  /** edges of windows; a scan that ends so near to one is not asked */
  edgeMs: 200,
};
const SETTINGS = { minElevationDeg: 5 };
const HOUR = 3_600_000;
const HILLS = [
  { azimuthDeg: 40, elevationDeg: 3 },
  { azimuthDeg: 100, elevationDeg: 28 },
  { azimuthDeg: 130, elevationDeg: 6 },
  { azimuthDeg: 250, elevationDeg: 22 },
  { azimuthDeg: 250, elevationDeg: 4 },
];

function stationOf(code: string, changes: Partial<PlanStation> = {}): PlanStation {
  const station = STATIONS[code];
  if (!station) throw new Error(`no station ${code}`);
  return { ...station, ...changes };
}

function sourceOf(raDeg: number, decDeg: number): PlanSource {
  const source = SOURCES['src-a'];
  if (!source) throw new Error('no source');
  return { ...source, position: { raDeg, decDeg } };
}

/** null where an edge is too near to tell. */
function byWindows(station: PlanStation, source: PlanSource, startMs: number, stopMs: number) {
  const span = { start: new Date(startMs - HOUR), end: new Date(stopMs + HOUR) };
  const windows = visibilityWindows(source.position, skyStation(station, SETTINGS), span);
  const covers = (slackMs: number) =>
    windows.some(
      ({ start, end }) => start.getTime() - slackMs <= startMs && end.getTime() + slackMs >= stopMs,
    );
  const [strict, loose] = [covers(-TOLERANCE.edgeMs), covers(TOLERANCE.edgeMs)];
  return strict === loose ? strict : null;
}

describe('isInView', () => {
  it('agrees with the windows of a station, masks and a highest elevation included', () => {
    const stations = [
      stationOf('Af', { maxElevationDeg: 60 }),
      stationOf('Bm', { horizon: HILLS }),
      stationOf('Cf'),
      stationOf('Em', { horizon: HILLS, maxElevationDeg: 70 }),
    ];
    const seen = { yes: 0, no: 0 };
    fc.assert(
      fc.property(
        fc.constantFrom(...stations),
        fc.integer({ min: 0, max: 359 }),
        fc.integer({ min: -60, max: 85 }),
        fc.integer({ min: 0, max: 48 * 3600 }),
        fc.integer({ min: 1, max: 4 * 3600 }),
        (station, raDeg, decDeg, fromSeconds, lengthSeconds) => {
          const source = sourceOf(raDeg, decDeg);
          const startMs = T0 + fromSeconds * 1000;
          const stopMs = startMs + lengthSeconds * 1000;
          const expected = byWindows(station, source, startMs, stopMs);
          fc.pre(expected !== null);
          expect(isInView(station, source, SETTINGS, startMs, stopMs)).toBe(expected);
          seen[expected ? 'yes' : 'no'] += 1;
        },
      ),
      { numRuns: 600 },
    );
    expect(seen.yes).toBeGreaterThan(100);
    expect(seen.no).toBeGreaterThan(100);
  });

  it('sees a dip at the lower culmination and a peak at the upper, between ends that are fine', () => {
    const source = SOURCES['src-b'];
    if (!source) throw new Error('no source');
    const plain = stationOf('Bm');
    const elevations = Array.from({ length: 1440 }, (_, minute) => {
      const ms = T0 + minute * 60_000;
      return { ms, deg: azEl(source.position, plain.site, new Date(ms)).elevationDeg };
    });
    const inner = elevations.slice(60, -60);
    const lowest = inner.reduce((best, one) => (one.deg < best.deg ? one : best));
    const highest = inner.reduce((best, one) => (one.deg > best.deg ? one : best));
    const about = (station: PlanStation, ms: number) =>
      isInView(station, source, SETTINGS, ms - 30 * 60_000, ms + 30 * 60_000);
    expect(about(stationOf('Bm', { minElevationDeg: lowest.deg + 0.01 }), lowest.ms)).toBe(false);
    expect(about(stationOf('Bm', { minElevationDeg: lowest.deg - 0.01 }), lowest.ms)).toBe(true);
    expect(about(stationOf('Bm', { maxElevationDeg: highest.deg - 0.01 }), highest.ms)).toBe(false);
    expect(about(stationOf('Bm', { maxElevationDeg: highest.deg + 0.01 }), highest.ms)).toBe(true);
  });
});
