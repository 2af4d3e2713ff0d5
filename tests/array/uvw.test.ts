import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { baselineUvw } from '@/src/array/uvw';
import { geodeticToItrf } from '@/src/sky/site';
import uvw from '../reference/uvw.json';

// Truth: ERFA c2t06a and apci13 (reference/uvw.json). Relative to the length of the baseline.
const TOLERANCE = {
  /** nutation of five terms and frame bias [3.5e-7] */
  aberrated: 3e-6,
  /** annual aberration itself, 20.5″ */
  catalogue: 2e-4,
  /** double precision */
  algebraic: 1e-12,
};

const stations = new Map(
  uvw.stations.map(({ code, xyz: [x = NaN, y = NaN, z = NaN] }) => [code, { x, y, z }]),
);
const places = new Map(uvw.sources.map((s) => [s.name, { raDeg: s.ra, decDeg: s.dec }]));

describe('baselineUvw', () => {
  it('agrees with ERFA in all 60 cases, aberrated and catalogue direction', () => {
    expect(uvw.cases).toHaveLength(60);
    for (const c of uvw.cases) {
      const [first, second, source] = [stations.get(c.st1), stations.get(c.st2), places.get(c.source)];
      if (!first || !second || !source) throw new Error(`${c.id}: no such station or source`);
      const found = baselineUvw(first, second, source, new Date(c.utc));
      const length = Math.hypot(...c.baseline_itrf);
      const off = ([u = NaN, v = NaN, w = NaN]: number[]) =>
        Math.hypot(found.u - u, found.v - v, found.w - w) / length;
      expect(off(c.uvw_erfa_aberrated), c.id).toBeLessThan(TOLERANCE.aberrated);
      expect(off(c.uvw_erfa), c.id).toBeLessThan(TOLERANCE.catalogue);
    }
  });

  const place = fc.record({
    latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
    longitudeDeg: fc.double({ min: -180, max: 180, noNaN: true }),
    heightM: fc.double({ min: 0, max: 5000, noNaN: true }),
  });
  const source = fc.record({
    raDeg: fc.double({ min: 0, max: 360, noNaN: true }),
    decDeg: fc.double({ min: -90, max: 90, noNaN: true }),
  });
  const instant = fc.date({
    min: new Date('2026-01-01T00:00:00Z'),
    max: new Date('2040-01-01T00:00:00Z'),
    noInvalidDate: true,
  });

  it('changes its sign with the order of the stations and keeps the length', () => {
    fc.assert(
      fc.property(place, place, source, instant, (a, b, s, at) => {
        const [first, second] = [geodeticToItrf(a), geodeticToItrf(b)];
        const there = baselineUvw(first, second, s, at);
        const back = baselineUvw(second, first, s, at);
        const length = Math.hypot(second.x - first.x, second.y - first.y, second.z - first.z);
        const allowed = TOLERANCE.algebraic * (length + 1) * 10;
        expect(Math.hypot(there.u + back.u, there.v + back.v, there.w + back.w)).toBeLessThanOrEqual(allowed);
        expect(Math.abs(Math.hypot(there.u, there.v, there.w) - length)).toBeLessThanOrEqual(allowed);
      }),
    );
  });

  it('closes around a triangle', () => {
    fc.assert(
      fc.property(place, place, place, source, instant, (a, b, c, s, at) => {
        const [p, q, r] = [geodeticToItrf(a), geodeticToItrf(b), geodeticToItrf(c)];
        const sides = [baselineUvw(p, q, s, at), baselineUvw(q, r, s, at), baselineUvw(r, p, s, at)];
        for (const axis of ['u', 'v', 'w'] as const) {
          expect(Math.abs(sides.reduce((sum, side) => sum + side[axis], 0))).toBeLessThan(1e-6);
        }
      }),
    );
  });
});
