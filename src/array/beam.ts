import { radToDeg } from '../units/angle';
import { evenTransform, transformEven } from './even-transform';
import type { EvenTransform } from './even-transform';
import { narrowKernel, taperCure, wideKernel } from './spread-kernel';
import { checkUvPoints } from './uv-points';
import type { UvPoints } from './uv-points';
import { spreadManyUv, spreadUv } from './uv-spread';
import type { UvLines } from './uv-spread';

/** Square field: even side in cells, from 2 to 2048; cellRad > 0, radians. */
export type BeamGrid = { size: number; cellRad: number };

/** Cells to the finest fringe at least: coarser ones would not show it. */
const LEAST_CELLS_A_FRINGE = 1 / 0.45;

const LARGEST_SIDE = 2048;
/** So that the widest kernel reaches neither the end of a line nor beyond u = 0. */
const LEAST_PADDED = 128;
const BEFORE = 4;

/** Beyond so many points the narrow kernel is enough: errors of single points even out along tracks. */
const MANY = 5000;

/**
 * Dirty beam of an array: Σ w cos 2π(ul + vm) / Σ w.
 *
 * @param uv    n ≥ 1 points, wavelengths, each standing for itself and its conjugate; weight ≥ 0, not all of them 0,
 *              default 1 (see uniformWeights)
 * @param grid  size even, 2 to 2048; cellRad > 0, at least 1/0.45 cells to the finest fringe along either axis
 * @returns the beam at cells of the field; peak 1 at cell (size/2, size/2)
 * @throws RangeError if a point is not finite, none is given, lengths differ, weights sum to nothing, or the grid is
 *         out of range (programmer error)
 *
 * Shape   Float32Array(size · size), row-major: row = m (north) from −size/2, column = l (east) from −size/2
 * Error   ≤ 1e-4 of the peak up to 5000 points, ≤ 1e-3 for more on tracks, against the direct sum; largest in the
 *         field's corners (tests/array/beam.test.ts). More than 5000 at one point of the plane would be off by 3·10⁻²
 * Source  TMS ch. 10: convolutional gridding on twice the field, FFT, taper of the kernel divided out
 */
export function dirtyBeam(uv: UvPoints, grid: BeamGrid): Float32Array {
  const { size, cellRad } = checkGrid(grid);
  checkUvPoints(uv, 1 / (LEAST_CELLS_A_FRINGE * cellRad));
  const isMany = uv.u.length > MANY;
  const plan = planFor(size);
  (isMany ? spreadManyUv : spreadUv)(uv, plan.lines.cells * cellRad, plan.lines);
  const field = new Float32Array(size * size);
  transformEven(plan.transform, plan.lines, field, isMany ? plan.narrowCure : plan.wideCure);
  return field;
}

/** Gaussian of the main lobe: FWHM axes; position angle of the major one, north through east. */
export type MainLobe = { majorRad: number; minorRad: number; positionAngleDeg: number };

/** A second moment below this share of the other is none: the points are on a line. */
const ON_A_LINE = 1e-12;
const ROUND = 1e-9;

/**
 * Main lobe of a dirty beam by its second derivatives at the peak.
 *
 * @param uv  as dirtyBeam
 * @returns FWHM, radians: Infinity along an axis that nothing resolves (points on a line: major; all of them at the
 *          origin: both); positionAngleDeg [0, 180), 0 for a round lobe
 * @throws RangeError as dirtyBeam, for the points (programmer error)
 *
 * Error   1e-9 relative (tests/array/beam.test.ts); a half-power fit gives axes a few per cent away
 * Source  B = exp(−xᵀHx/2), H = 4π² Σ w(u,v)ᵀ(u,v)/Σ w: the series of the cosines at the peak
 */
export function fitMainLobe(uv: UvPoints): MainLobe {
  checkUvPoints(uv);
  let [uu, mixed, vv, sum] = [0, 0, 0, 0];
  for (let k = 0; k < uv.u.length; k += 1) {
    const [x, y, w] = [uv.u[k] ?? NaN, uv.v[k] ?? NaN, uv.weight ? (uv.weight[k] ?? NaN) : 1];
    uu += w * x * x;
    mixed += w * x * y;
    vv += w * y * y;
    sum += w;
  }
  const [middle, apart] = [(uu + vv) / 2, Math.hypot((uu - vv) / 2, mixed)];
  const long = middle + apart;
  const short = long === 0 ? 0 : (uu * vv - mixed * mixed) / long;
  const fwhmRad = (moment: number) => Math.sqrt((2 * Math.LN2 * sum) / moment) / Math.PI;
  // the lobe is long where the points are near together: across their own long axis
  const turnedDeg = radToDeg(Math.atan2(2 * mixed, vv - uu) / 2) + 90;
  return {
    majorRad: short <= ON_A_LINE * long ? Infinity : fwhmRad(short),
    minorRad: long === 0 ? Infinity : fwhmRad(long),
    positionAngleDeg: apart <= ROUND * middle ? 0 : turnedDeg % 180,
  };
}

type Plan = {
  size: number;
  lines: UvLines;
  transform: EvenTransform;
  wideCure: Float64Array;
  narrowCure: Float64Array;
};

let lastPlan: Plan | null = null;

/** Tables and buffers of a size, kept for the next beam of that size. */
function planFor(size: number): Plan {
  if (lastPlan?.size === size) return lastPlan;
  let cells = LEAST_PADDED;
  while (cells < 2 * size) cells *= 2;
  const count = cells / 2 + 2 * BEFORE;
  lastPlan = {
    size,
    lines: { cells, before: BEFORE, used: 0, values: new Float64Array(cells * count) },
    transform: evenTransform(cells, size / 2, count),
    wideCure: taperCure(wideKernel, cells, size / 2),
    narrowCure: taperCure(narrowKernel, cells, size / 2),
  };
  return lastPlan;
}

function checkGrid({ size, cellRad }: BeamGrid): BeamGrid {
  if (!(size >= 2 && size <= LARGEST_SIDE && size % 2 === 0))
    throw new RangeError(`Not a field: ${size} cells`);
  if (!(cellRad > 0 && Number.isFinite(cellRad))) throw new RangeError(`Not a cell: ${cellRad} rad`);
  return { size, cellRad };
}
