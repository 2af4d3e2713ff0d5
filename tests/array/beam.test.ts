import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dirtyBeam, fitMainLobe } from '@/src/array/beam';
import { fringeSpacingRad } from '@/src/array/angular-size';
import { uvTracks } from '@/src/array/uvw-tracks';
import type { UvPoints } from '@/src/array/uv-points';
import { geodeticToItrf } from '@/src/sky/site';
import beam from '../reference/beam.json';

// Truth: numpy's direct sum (reference/beam.json), and the same sum here.
const TOLERANCE = {
  /** what the kernel of six cells lets in from outside the field, single points */
  few: 1e-4,
  /** the kernel of three cells, along tracks */
  many: 1e-3,
  /** the direct sum here against that of the reference, printed to 12 figures */
  direct: 1e-8,
  /** closed form; digits of the reference */
  relative: 1e-9,
  angleDeg: 1e-6,
  /** Float32 */
  peak: 1e-6,
};
const RAD_PER_MICROARCSEC = Math.PI / 180 / 3600 / 1e6;

function pointsOf(c: (typeof beam.cases)[number]): UvPoints {
  return {
    u: Float64Array.from(c.uv, ([u = NaN]) => u),
    v: Float64Array.from(c.uv, ([, v = NaN]) => v),
    ...(c.weight && { weight: Float64Array.from(c.weight) }),
  };
}

function directSum({ u, v, weight }: UvPoints, l: number, m: number): number {
  let [sum, whole] = [0, 0];
  u.forEach((x, k) => {
    const w = weight?.[k] ?? 1;
    sum += w * Math.cos(2 * Math.PI * (x * l + (v[k] ?? NaN) * m));
    whole += w;
  });
  return sum / whole;
}

/** Corners, edges, middle and a spread of others. */
function cellsToTry(size: number, count: number): [number, number][] {
  const edges = [0, 1, size / 4, size / 2, size / 2 + 1, size - 1];
  const spread = Array.from({ length: count }, (_, k): [number, number] => [
    (k * 7919) % size,
    (k * 104_729 + k) % size,
  ]);
  return [...edges.flatMap((row) => edges.map((column): [number, number] => [row, column])), ...spread];
}

function worstOf(uv: UvPoints, size: number, cellRad: number, count: number): number {
  const found = dirtyBeam(uv, { size, cellRad });
  const offs = cellsToTry(size, count).map(([row, column]) => {
    const exact = directSum(uv, (column - size / 2) * cellRad, (row - size / 2) * cellRad);
    return Math.abs((found[row * size + column] ?? NaN) - exact);
  });
  return offs.reduce((worst, off) => (off <= worst ? worst : off), 0);
}

describe('the direct sum of this test', () => {
  it('is the reference’s in all ten cases, twelve places each', () => {
    expect(beam.cases).toHaveLength(10);
    for (const c of beam.cases) {
      expect(c.values).toHaveLength(12);
      for (const [l = NaN, m = NaN, value = NaN] of c.values) {
        const found = directSum(pointsOf(c), l * RAD_PER_MICROARCSEC, m * RAD_PER_MICROARCSEC);
        expect(Math.abs(found - value), c.id).toBeLessThan(TOLERANCE.direct);
      }
    }
  });
});

describe('dirtyBeam', () => {
  it('is the reference’s at its twelve places, each brought onto a cell', () => {
    for (const c of beam.cases) {
      const uv = pointsOf(c);
      for (const [l = NaN, m = NaN, value = NaN] of c.values) {
        const far = Math.max(Math.abs(l), Math.abs(m)) * RAD_PER_MICROARCSEC;
        if (far === 0) continue;
        // a field whose cells are as wide as the place is far, or a whole part of it
        const finest = (c.resolution_uas * RAD_PER_MICROARCSEC) / 3;
        const parts = Math.ceil(far / finest);
        const cellRad = far / parts;
        const size = 4 * parts;
        // the nearer axis falls between cells, so both sides are read there by the direct sum’s slope
        const [x, y] = [(l * RAD_PER_MICROARCSEC) / cellRad, (m * RAD_PER_MICROARCSEC) / cellRad];
        const [column, row] = [Math.round(x), Math.round(y)];
        const moved =
          directSum(uv, column * cellRad, row * cellRad) - directSum(uv, x * cellRad, y * cellRad);
        const found = dirtyBeam(uv, { size, cellRad })[(row + size / 2) * size + column + size / 2] ?? NaN;
        expect(Math.abs(found - moved - value), `${c.id} ${l} ${m}`).toBeLessThan(TOLERANCE.few);
      }
    }
  });

  it('is the direct sum over the whole field, at any size, coarse and fine', () => {
    for (const c of beam.cases) {
      for (const [size, cells] of [
        [512, 5],
        [200, 2.5],
        [30, 3],
        [2, 4],
      ] as const) {
        const cellRad = (c.resolution_uas * RAD_PER_MICROARCSEC) / cells;
        expect(worstOf(pointsOf(c), size, cellRad, 200), c.id).toBeLessThan(TOLERANCE.few);
      }
    }
  });

  it('is the direct sum for any few points and weights', () => {
    const wavelengths = fc.double({ min: -4e8, max: 4e8, noNaN: true });
    const weight = fc.double({ min: 0, max: 9, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(wavelengths, wavelengths, weight), { minLength: 1 }), (points) => {
        fc.pre(points.some(([, , w]) => w > 1e-3));
        const [u, v, w] = [0, 1, 2].map((part) => Float64Array.from(points, (point) => point[part] ?? NaN));
        if (!u || !v || !w) throw new Error('No points');
        expect(worstOf({ u, v, weight: w }, 64, 1e-9, 20)).toBeLessThan(TOLERANCE.few);
      }),
    );
  });

  it('is the direct sum for the tracks of a day, natural and weighted', () => {
    const places = [-110, -70, -5, 8, 14, 115].map((longitudeDeg, index) =>
      geodeticToItrf({ latitudeDeg: 20 + 7 * index, longitudeDeg, heightM: 300 }),
    );
    const timesMs = Array.from({ length: 600 }, (_, index) => Date.UTC(2029, 2, 20) + index * 60_000);
    const uv = uvTracks(places, { raDeg: 187, decDeg: 12 }, timesMs, { unitM: 0.013 });
    expect(uv.u).toHaveLength(9000);
    const longest = uv.u.reduce((most, u, k) => Math.max(most, Math.hypot(u, uv.v[k] ?? NaN)), 0);
    const weight = uv.u.map((_, k) => 1 + (k % 7));
    expect(worstOf(uv, 256, 1 / longest / 5, 60)).toBeLessThan(TOLERANCE.many);
    expect(worstOf({ ...uv, weight }, 256, 1 / longest / 5, 60)).toBeLessThan(TOLERANCE.many);
  });

  it('has its peak of 1 in the middle, is even, and stays within 1', () => {
    for (const c of beam.cases) {
      const [size, cellRad] = [128, (c.resolution_uas * RAD_PER_MICROARCSEC) / 4];
      const found = dirtyBeam(pointsOf(c), { size, cellRad });
      expect(Math.abs((found[64 * size + 64] ?? NaN) - 1)).toBeLessThan(TOLERANCE.peak);
      for (let row = 1; row < size; row += 1) {
        for (let column = 1; column < size; column += 1) {
          const [here, there] = [found[row * size + column], found[(size - row) * size + size - column]];
          if (here !== there) expect(here).toBeCloseTo(there ?? NaN, 6);
          if (Math.abs(here ?? NaN) > 1) expect(Math.abs(here ?? NaN)).toBeLessThan(1 + TOLERANCE.few);
        }
      }
    }
  });

  it('does not remember the beam before it', () => {
    const [first, second] = [beam.cases[4], beam.cases[7]];
    if (!first || !second) throw new Error('No cases');
    const grid = { size: 128, cellRad: RAD_PER_MICROARCSEC * 8 };
    const before = dirtyBeam(pointsOf(first), grid);
    dirtyBeam(pointsOf(second), grid);
    dirtyBeam(pointsOf(second), { ...grid, size: 64 });
    expect(dirtyBeam(pointsOf(first), grid)).toEqual(before);
  });

  it('refuses what is no point, no weight and no field', () => {
    const of = (...values: number[]) => Float64Array.from(values);
    const grid = { size: 64, cellRad: 1e-9 };
    const bad: UvPoints[] = [
      { u: of(), v: of() },
      { u: of(1e8), v: of() },
      { u: of(NaN), v: of(0) },
      { u: of(0), v: of(Infinity) },
      { u: of(1e8), v: of(0), weight: of() },
      { u: of(1e8), v: of(0), weight: of(-1) },
      { u: of(1e8), v: of(0), weight: of(NaN) },
      { u: of(1e8), v: of(0), weight: of(0) },
      { u: of(5e8), v: of(0) },
    ];
    for (const uv of bad) expect(() => dirtyBeam(uv, grid)).toThrow(RangeError);
    const good = { u: of(1e8), v: of(0) };
    for (const size of [0, 1, 63, 64.5, 4096, NaN, Infinity]) {
      expect(() => dirtyBeam(good, { ...grid, size })).toThrow(RangeError);
    }
    for (const cellRad of [0, -1e-9, NaN, Infinity]) {
      expect(() => dirtyBeam(good, { ...grid, cellRad })).toThrow(RangeError);
    }
    expect(dirtyBeam(good, grid).every(Number.isFinite)).toBe(true);
  });
});

describe('fitMainLobe', () => {
  it('agrees with all ten cases, resolution included', () => {
    for (const c of beam.cases) {
      const { majorRad, minorRad, positionAngleDeg } = fitMainLobe(pointsOf(c));
      const { fwhm_major_uas: major, fwhm_minor_uas: minor, pa_deg: angle } = c.gaussian;
      if (major === null) expect(majorRad, c.id).toBe(Infinity);
      else
        expect(Math.abs(majorRad / RAD_PER_MICROARCSEC / major - 1), c.id).toBeLessThan(TOLERANCE.relative);
      expect(Math.abs(minorRad / RAD_PER_MICROARCSEC / minor - 1), c.id).toBeLessThan(TOLERANCE.relative);
      expect(Math.abs(positionAngleDeg - (angle ?? 0)), c.id).toBeLessThan(TOLERANCE.angleDeg);
      const resolved = fringeSpacingRad(1, c.bmax_wavelengths) / RAD_PER_MICROARCSEC;
      expect(Math.abs(resolved / c.resolution_uas - 1), c.id).toBeLessThan(TOLERANCE.relative);
    }
  });

  it('turns with its points', () => {
    const uv = { u: Float64Array.of(3e8, -1e8), v: Float64Array.of(1e8, 2e8) };
    const [before, turned] = [fitMainLobe(uv), fitMainLobe({ u: uv.v, v: uv.u.map((u) => -u) })];
    // (u, v) → (v, −u) turns from east to north: position angles fall by −90°
    expect((turned.positionAngleDeg - before.positionAngleDeg + 360) % 180).toBeCloseTo(90, 9);
    expect(turned.majorRad / before.majorRad).toBeCloseTo(1, 12);
  });

  it('is without end where nothing resolves, and refuses no points', () => {
    const nought = Float64Array.of(0);
    expect(fitMainLobe({ u: nought, v: nought })).toEqual({
      majorRad: Infinity,
      minorRad: Infinity,
      positionAngleDeg: 0,
    });
    expect(() => fitMainLobe({ u: Float64Array.of(), v: Float64Array.of() })).toThrow(RangeError);
    expect(() => fitMainLobe({ u: nought, v: Float64Array.of(NaN) })).toThrow(RangeError);
  });
});
