import { describe, expect, it } from 'vitest';
import { azElBatch } from '@/src/sky/az-el-batch';
import { azEl } from '@/src/sky/position';
import { angularSeparationDeg } from '@/src/units/angle';
import azel from '../reference/azel.json';

// Truth: ERFA atco13 (reference/azel.json, provenance inside).
const TOLERANCE = { directionArcsec: 0.1, betweenNodesArcsec: 0.1 };

const apartArcsec = (azimuthDeg: number, elevationDeg: number, az: number, el: number) =>
  3600 *
  angularSeparationDeg(
    { longitudeDeg: azimuthDeg, latitudeDeg: elevationDeg },
    { longitudeDeg: az, latitudeDeg: el },
  );

describe('azElBatch', () => {
  it('agrees with ERFA atco13 in all 200 reference cases', () => {
    expect(azel.cases).toHaveLength(200);
    for (const c of azel.cases) {
      const site = { latitudeDeg: c.lat, longitudeDeg: c.lon, heightM: c.height };
      const found = azElBatch([{ raDeg: c.ra, decDeg: c.dec }], [site], [Date.parse(c.utc)]);
      const apart = apartArcsec(found.azimuthDeg[0] ?? NaN, found.elevationDeg[0] ?? NaN, c.az, c.el);
      expect(apart, c.id).toBeLessThan(TOLERANCE.directionArcsec);
    }
  });

  it('gives what azEl gives, by source, site and time, over days and at the poles', () => {
    const sources = [
      { raDeg: 10, decDeg: 80 },
      { raDeg: 200, decDeg: -35 },
      { raDeg: 0, decDeg: 90 },
    ];
    const sites = [
      { latitudeDeg: 90, longitudeDeg: 0, heightM: 0 },
      { latitudeDeg: -24, longitudeDeg: 130, heightM: 900 },
    ];
    const startMs = Date.UTC(2028, 11, 30);
    const timesMs = Array.from({ length: 40 }, (_, index) => startMs + ((index * 7919) % 40) * 9_000_000);
    const found = azElBatch(sources, sites, timesMs);
    expect(found.azimuthDeg).toHaveLength(240);
    sources.forEach((source, s) =>
      sites.forEach((site, p) =>
        timesMs.forEach((ms, t) => {
          const at = (s * sites.length + p) * timesMs.length + t;
          const [az, el] = [found.azimuthDeg[at] ?? NaN, found.elevationDeg[at] ?? NaN];
          const truth = azEl(source, site, new Date(ms));
          const apart = apartArcsec(az, el, truth.azimuthDeg, truth.elevationDeg);
          expect(apart).toBeLessThan(TOLERANCE.betweenNodesArcsec);
          expect(az).toBeGreaterThanOrEqual(0);
          expect(az).toBeLessThan(360);
        }),
      ),
    );
  });

  it('is empty without sources, sites or times, and refuses what is no instant and no place', () => {
    const site = { latitudeDeg: 0, longitudeDeg: 0, heightM: 0 };
    expect(azElBatch([], [site], [0]).azimuthDeg).toHaveLength(0);
    expect(azElBatch([{ raDeg: 0, decDeg: 0 }], [site], []).elevationDeg).toHaveLength(0);
    expect(() => azElBatch([{ raDeg: 0, decDeg: 0 }], [site], [NaN])).toThrow(RangeError);
    expect(() => azElBatch([{ raDeg: 0, decDeg: 95 }], [site], [0])).toThrow(RangeError);
    expect(() => azElBatch([{ raDeg: 0, decDeg: 0 }], [{ ...site, latitudeDeg: 95 }], [0])).toThrow(
      RangeError,
    );
  });
});
