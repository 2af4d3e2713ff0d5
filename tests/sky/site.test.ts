import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { geodeticToItrf, itrfToGeodetic } from '@/src/sky/site';
import { normalise180 } from '@/src/units/angle';
import geodetic from '../reference/geodetic.json';

// Truth: ERFA gd2gc / gc2gd, ellipsoid WGS84 (reference/geodetic.json).
const TOLERANCE = {
  /** digits of the reference (1 µm) */
  xyzM: 2e-6,
  /** digits of the reference and of double precision at 36 000 km */
  heightM: 1e-4,
  angleDeg: 1e-9,
  /** double precision */
  roundTripM: 1e-3,
};

describe('geodetic and Cartesian places', () => {
  it('agree with ERFA in all 30 cases, both ways', () => {
    expect(geodetic.cases).toHaveLength(30);
    for (const c of geodetic.cases) {
      const { xyz, inverse } = c.WGS84;
      const [x = NaN, y = NaN, z = NaN] = xyz;
      const p = geodeticToItrf({ latitudeDeg: c.lat, longitudeDeg: c.lon, heightM: c.height });
      expect(Math.hypot(p.x - x, p.y - y, p.z - z), c.id).toBeLessThan(TOLERANCE.xyzM);
      const g = itrfToGeodetic({ x, y, z });
      expect(Math.abs(g.latitudeDeg - inverse.lat), c.id).toBeLessThan(TOLERANCE.angleDeg);
      expect(Math.abs(g.heightM - inverse.height), c.id).toBeLessThan(TOLERANCE.heightM);
      const parallel = Math.cos((c.lat * Math.PI) / 180);
      if (parallel > 1e-9) {
        const apart = Math.abs(normalise180(g.longitudeDeg - inverse.lon)) * parallel;
        expect(apart, c.id).toBeLessThan(TOLERANCE.angleDeg);
      }
    }
  });

  it('come back to the same place within a millimetre', () => {
    const place = fc.record({
      latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
      longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
      heightM: fc.double({ min: -5000, max: 40_000_000, noNaN: true }),
    });
    fc.assert(
      fc.property(place, (g) => {
        const p = geodeticToItrf(g);
        const q = geodeticToItrf(itrfToGeodetic(p));
        expect(Math.hypot(p.x - q.x, p.y - q.y, p.z - q.z)).toBeLessThan(TOLERANCE.roundTripM);
      }),
    );
  });

  it('refuse coordinates that are no place', () => {
    expect(() => geodeticToItrf({ latitudeDeg: 90.001, longitudeDeg: 0, heightM: 0 })).toThrow(RangeError);
    expect(() => geodeticToItrf({ latitudeDeg: 0, longitudeDeg: Infinity, heightM: 0 })).toThrow(RangeError);
    expect(() => itrfToGeodetic({ x: 0, y: 0, z: 0 })).toThrow(RangeError);
    expect(() => itrfToGeodetic({ x: NaN, y: 0, z: 0 })).toThrow(RangeError);
  });
});
