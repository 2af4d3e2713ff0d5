import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chordM, geodeticToItrf, greatCircleM, itrfToGeodetic } from '@/src/sky/site';
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
  /** flattening, 1/298: a meridian at the equator has the radius of curvature 6335 km */
  sphere: 5.7e-3,
  /** the same beyond 10 000 km */
  farSphere: 1.2e-3,
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
    expect(() => greatCircleM(place(0, 0), place(91, 0))).toThrow(RangeError);
    expect(() => chordM(place(0, NaN), place(0, 0))).toThrow(RangeError);
  });

  it('hold at both poles: on the axis, at the polar radius, within a millimetre', () => {
    // b = a(1 − f) = 6 356 752.3142 m (NIMA TR8350.2, 3rd ed. 2000, table 3.3)
    const polarM = 6_356_752.3142;
    for (const side of [1, -1]) {
      const p = geodeticToItrf({ latitudeDeg: 90 * side, longitudeDeg: 123, heightM: 2835 });
      expect(Math.hypot(p.x, p.y, p.z - side * (polarM + 2835))).toBeLessThan(TOLERANCE.roundTripM);
      const g = itrfToGeodetic({ x: 0, y: 0, z: side * (polarM + 2835) });
      expect(g).toMatchObject({ latitudeDeg: 90 * side, longitudeDeg: 0 });
      expect(Math.abs(g.heightM - 2835)).toBeLessThan(TOLERANCE.roundTripM);
    }
  });
});

const place = (latitudeDeg: number, longitudeDeg: number) => ({ latitudeDeg, longitudeDeg, heightM: 0 });

// Truth: geodesics on WGS84 by GeographicLib 2.0 (Karney, J. Geodesy 87, 43, 2013), Geodesic.WGS84.Inverse.
const GEODESICS: [[number, number], [number, number], number][] = [
  [[0, 0], [0, 90], 10_018_754.171395],
  [[0, 0], [90, 0], 10_001_965.729313],
  [[0, 0], [0.5, 179.5], 19_936_288.578965],
  [[45, 0], [45.1, 0], 11_113.275454],
  [[-30, 10], [52, -100], 13_910_910.307073],
  [[0, 0], [0.1, 0], 11_057.427695],
  [[89, 0], [89, 180], 223_387.729828],
  [[61.3724, 8.9213], [-29.9046, 134.6175], 14_760_143.259594],
];

describe('distances of places', () => {
  it('along the ground are the geodesic’s to the flattening of the Earth', () => {
    for (const [from, to, metres] of GEODESICS) {
      const off = Math.abs(greatCircleM(place(...from), place(...to)) / metres - 1);
      expect(off, `${metres}`).toBeLessThan(metres < 1e7 ? TOLERANCE.sphere : TOLERANCE.farSphere);
    }
  });

  it('are shorter through the Earth than along it by the chord of the same angle', () => {
    // a quarter of the equator: a√2
    expect(Math.abs(chordM(place(0, 0), place(0, 90)) - 6_378_137 * Math.SQRT2)).toBeLessThan(
      TOLERANCE.roundTripM,
    );
    expect(chordM(place(20, 30), place(20, 30))).toBe(0);
    expect(greatCircleM(place(20, 30), place(20, 30))).toBe(0);
  });
});
