import { describe, expect, it } from 'vitest';
import { dirtyBeam, fitMainLobe } from '@/src/array/beam';
import { fitHalfPower, highestSidelobe } from '@/src/array/beam-shape';
import { uniformWeights } from '@/src/array/uv-weights';
import beam from '../reference/beam.json';

// Truth: fine search and Newton iteration on numpy's direct sum (reference/beam.json).
const TOLERANCE = {
  /** twelve cells to the finest fringe, quadratic between */
  sidelobe: 1e-3,
  /** of the finest fringe */
  place: 0.02,
  /** half power against second derivative at the peak: “a few per cent” of the reference’s note; few points, more */
  halfPower: 0.2,
  /** a Gaussian field: Float32 */
  gaussian: 1e-4,
};
const RAD_PER_MICROARCSEC = Math.PI / 180 / 3600 / 1e6;
const CELLS_A_FRINGE = 12;
/** A ring has its sidelobes all around; the second has another lobe as high within 10⁻⁵: their places are not told. */
const HAS_EQUALS = ['beam-04', 'beam-07'];

const cases = beam.cases.map((c) => ({
  ...c,
  points: {
    u: Float64Array.from(c.uv, ([u = NaN]) => u),
    v: Float64Array.from(c.uv, ([, v = NaN]) => v),
    ...(c.weight && { weight: Float64Array.from(c.weight) }),
  },
}));

describe('highestSidelobe', () => {
  it('is the reference’s, value and place, in the eight cases that have one', () => {
    const known = cases.filter((c) => c.peak_sidelobe);
    expect(known).toHaveLength(8);
    for (const {
      points,
      resolution_uas: fringe,
      field_half_width_uas: width,
      peak_sidelobe: peak,
      id,
    } of known) {
      const half = Math.round((width / fringe) * CELLS_A_FRINGE);
      const grid = { size: 2 * half, cellRad: (width * RAD_PER_MICROARCSEC) / half };
      const found = highestSidelobe(dirtyBeam(points, grid), grid);
      expect(Math.abs((found?.value ?? NaN) - (peak?.value ?? NaN)), id).toBeLessThan(TOLERANCE.sidelobe);
      const [east, north] = [found?.eastRad ?? NaN, found?.northRad ?? NaN].map(
        (rad) => rad / RAD_PER_MICROARCSEC,
      );
      if (HAS_EQUALS.includes(id)) continue;
      const off = Math.hypot((east ?? NaN) - (peak?.l_uas ?? NaN), (north ?? NaN) - (peak?.m_uas ?? NaN));
      expect(off / fringe, id).toBeLessThan(TOLERANCE.place);
    }
  });

  it('is none where the field holds the main lobe alone', () => {
    const [c] = cases.slice(4);
    if (!c) throw new Error('No case');
    const grid = { size: 8, cellRad: (c.resolution_uas * RAD_PER_MICROARCSEC) / 40 };
    expect(highestSidelobe(dirtyBeam(c.points, grid), grid)).toBeNull();
  });

  it('refuses a beam of another size', () => {
    expect(() => highestSidelobe(new Float32Array(9), { size: 4, cellRad: 1 })).toThrow(RangeError);
    expect(() => fitHalfPower(new Float32Array(9), { size: 4, cellRad: 1 })).toThrow(RangeError);
  });
});

describe('fitHalfPower', () => {
  it('recovers a Gaussian at any angle', () => {
    const size = 64;
    for (const angleDeg of [0, 20, 90, 135]) {
      const [sin, cos] = [Math.sin((angleDeg * Math.PI) / 180), Math.cos((angleDeg * Math.PI) / 180)];
      const field = Float32Array.from({ length: size * size }, (_, at) => {
        const [l, m] = [(at % size) - 32, Math.floor(at / size) - 32];
        const [along, across] = [l * sin + m * cos, l * cos - m * sin];
        return Math.exp(-4 * Math.LN2 * ((along / 14) ** 2 + (across / 7) ** 2));
      });
      const found = fitHalfPower(field, { size, cellRad: 2 });
      expect(Math.abs((found?.majorRad ?? NaN) / 28 - 1)).toBeLessThan(TOLERANCE.gaussian);
      expect(Math.abs((found?.minorRad ?? NaN) / 14 - 1)).toBeLessThan(TOLERANCE.gaussian);
      const turned = ((found?.positionAngleDeg ?? NaN) - angleDeg + 270) % 180;
      expect(Math.abs(turned - 90)).toBeLessThan(0.01);
    }
  });

  it('comes near the second derivative at the peak where the lobe is closed', () => {
    const closed = cases.flatMap((c) => {
      const grid = { size: 256, cellRad: (c.resolution_uas * RAD_PER_MICROARCSEC) / CELLS_A_FRINGE };
      const half = fitHalfPower(dirtyBeam(c.points, grid), grid);
      return half ? [{ half, peak: fitMainLobe(c.points), id: c.id }] : [];
    });
    expect(closed.map(({ id }) => id)).toEqual(cases.slice(2).map(({ id }) => id));
    for (const { half, peak, id } of closed) {
      expect(Math.abs(half.minorRad / peak.minorRad - 1), id).toBeLessThan(TOLERANCE.halfPower);
      expect(Math.abs(half.majorRad / peak.majorRad - 1), id).toBeLessThan(TOLERANCE.halfPower);
    }
  });

  it('is none for a lobe that reaches the edge of the field', () => {
    const [fringe] = cases;
    if (!fringe) throw new Error('No case');
    const grid = { size: 64, cellRad: (fringe.resolution_uas * RAD_PER_MICROARCSEC) / 8 };
    expect(fitHalfPower(dirtyBeam(fringe.points, grid), grid)).toBeNull();
  });
});

describe('uniformWeights', () => {
  const grid = { size: 64, cellRad: 1e-9 }; // cells of 1/(64e-9) = 1.5625e7 wavelengths

  it('counts a cell once, shared by what lies in it, its conjugate’s too', () => {
    const uv = {
      u: Float64Array.of(1e8, 1.01e8, -1e8, 3e8),
      v: Float64Array.of(2e8, 2.01e8, -2e8, 0),
      weight: Float64Array.of(1, 2, 1, 5),
    };
    expect([...uniformWeights(uv, grid)]).toEqual([0.25, 0.5, 0.25, 1]);
    expect([...uniformWeights({ u: uv.u, v: uv.v }, grid)]).toEqual([1 / 3, 1 / 3, 1 / 3, 1]);
  });

  it('narrows the beam of points that crowd near the origin', () => {
    const u = Float64Array.from({ length: 200 }, (_, k) => 4e8 * (k / 200) ** 2);
    const v = Float64Array.from({ length: 200 }, (_, k) => 1e8 * Math.sin(k) * (k / 200));
    const natural = fitMainLobe({ u, v });
    const uniform = fitMainLobe({ u, v, weight: uniformWeights({ u, v }, grid) });
    expect(uniform.minorRad).toBeLessThan(0.9 * natural.minorRad);
  });

  it('leaves out what has no weight and refuses what is none', () => {
    const uv = { u: Float64Array.of(1e8, 1e8), v: Float64Array.of(0, 0), weight: Float64Array.of(0, 3) };
    expect([...uniformWeights(uv, grid)]).toEqual([0, 1]);
    expect(() => uniformWeights({ u: Float64Array.of(), v: Float64Array.of() }, grid)).toThrow(RangeError);
    expect(() => uniformWeights(uv, { size: 64, cellRad: NaN })).toThrow(RangeError);
    expect(() => uniformWeights({ ...uv, u: Float64Array.of(1e12, 0) }, grid)).toThrow(RangeError);
  });
});
