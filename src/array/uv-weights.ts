import type { BeamGrid } from './beam';
import { checkUvPoints } from './uv-points';
import type { UvPoints } from './uv-points';

const MOST_CELLS = 65_536;

/**
 * Weights that count each cell of the uv plane alike, whatever lies in it.
 *
 * @param uv    as dirtyBeam; its own weights share out what a cell counts
 * @param grid  field of the beam: cells of the plane are 1/(size · cellRad) wide
 * @returns weights, one a point; those of a cell (and its conjugate) sum to 1
 * @throws RangeError as dirtyBeam, for the points; if the field is not positive (programmer error)
 *
 * Error   rounding
 * Source  TMS ch. 10: uniform weighting
 */
export function uniformWeights(uv: UvPoints, { size, cellRad }: BeamGrid): Float64Array {
  const fieldRad = size * cellRad;
  if (!(size > 0 && size <= MOST_CELLS && fieldRad > 0)) throw new RangeError(`Not a field: ${fieldRad} rad`);
  checkUvPoints(uv, 0.5 / cellRad);
  const weightOf = (k: number) => (uv.weight ? (uv.weight[k] ?? NaN) : 1);
  const cells = uv.u.map((u, k) => cellOf(u * fieldRad, (uv.v[k] ?? NaN) * fieldRad));
  const held = new Map<number, number>();
  cells.forEach((cell, k) => held.set(cell, (held.get(cell) ?? 0) + weightOf(k)));
  return cells.map((cell, k) => (weightOf(k) === 0 ? 0 : weightOf(k) / (held.get(cell) ?? NaN)));
}

/** One number for a cell and its conjugate. */
function cellOf(x: number, y: number): number {
  const [column, row] = [Math.round(x), Math.round(y)];
  return Math.abs(column * 4 * MOST_CELLS + row);
}
