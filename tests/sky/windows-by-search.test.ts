import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { trackOf } from '@/src/sky/track';
import type { MountLimits, SkyStation } from '@/src/sky/types';
import { trackWindows } from '@/src/sky/windows';
import { windowsBySearch } from '@/src/sky/windows-by-search';

// Truth: trackWindows, itself checked against ERFA and by brute force in tests/sky.
const START = Date.UTC(2028, 5, 1);
const spanOf = (hours: number) => ({ start: new Date(START), end: new Date(START + hours * 3_600_000) });
const anySite = fc.record({
  latitudeDeg: fc.double({ min: -85, max: 85, noNaN: true }),
  longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
  heightM: fc.constant(500),
});
const anySource = fc.record({
  raDeg: fc.double({ min: 0, max: 360, noNaN: true }),
  decDeg: fc.double({ min: -85, max: 85, noNaN: true }),
});
const range = (minDeg: number, maxDeg: number) => ({ minDeg, maxDeg });
const MOUNTS: readonly MountLimits[] = [
  { kind: 'az-el', azimuth: range(-90, 200), elevation: range(8, 80) },
  { kind: 'az-el', azimuth: range(-90, 450), elevation: range(8, 88), keyholeDeg: 3 },
  { kind: 'ha-dec', hourAngle: range(-95, 95), declination: range(-40, 80) },
  { kind: 'xy-ns', x: range(-80, 80), y: range(-75, 75), keyholeDeg: 5 },
  { kind: 'xy-ew', x: range(-80, 80), y: range(-75, 75) },
];
const lengthOf = (list: readonly { start: Date; end: Date }[]) =>
  list.reduce((sum, { start, end }) => sum + end.getTime() - start.getTime(), 0);

describe('windowsBySearch', () => {
  it('agrees with the exact windows for every kind of mount, in a day and in an hour', () => {
    fc.assert(
      fc.property(
        anySite,
        anySource,
        fc.constantFrom(...MOUNTS),
        fc.constantFrom(1, 24),
        (site, source, mount, hours) => {
          const station: SkyStation = { site, minElevationDeg: 5, maxElevationDeg: 88, mount };
          const span = spanOf(hours);
          const track = trackOf(source, spanOf(24));
          const exact = trackWindows(track, source, station, span);
          const found = windowsBySearch(track, station, span);
          // a window that is passed in less than a step may be missed, as may the gap of one
          expect(Math.abs(lengthOf(found) - lengthOf(exact))).toBeLessThan(hours > 2 ? 60_000 : 15_000);
        },
      ),
      { numRuns: 150 },
    );
  });

  it('has the edges of a mask to milliseconds', () => {
    const site = { latitudeDeg: 48, longitudeDeg: 10, heightM: 300 };
    const source = { raDeg: 210, decDeg: 12 };
    const horizon = [
      { azimuthDeg: 60, elevationDeg: 10 },
      { azimuthDeg: 120, elevationDeg: 25 },
      { azimuthDeg: 270, elevationDeg: 15 },
    ];
    const span = spanOf(24);
    const track = trackOf(source, span);
    const station: SkyStation = { site, minElevationDeg: 5, horizon };
    const exact = trackWindows(track, source, station, span);
    const found = windowsBySearch(track, station, span);
    expect(found).toHaveLength(exact.length);
    found.forEach(({ start, end }, index) => {
      expect(Math.abs(start.getTime() - (exact[index]?.start.getTime() ?? NaN))).toBeLessThanOrEqual(3);
      expect(Math.abs(end.getTime() - (exact[index]?.end.getTime() ?? NaN))).toBeLessThanOrEqual(3);
    });
  });

  it('is empty in an empty span', () => {
    const site = { latitudeDeg: 48, longitudeDeg: 10, heightM: 300 };
    const track = trackOf({ raDeg: 0, decDeg: 0 }, spanOf(1));
    expect(windowsBySearch(track, { site, minElevationDeg: 5 }, spanOf(0))).toEqual([]);
  });
});
