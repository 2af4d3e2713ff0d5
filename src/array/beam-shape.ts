import { radToDeg } from '../units/angle';
import type { BeamGrid, MainLobe } from './beam';

/** A sidelobe; its twin is at the opposite place. */
export type Sidelobe = { value: number; eastRad: number; northRad: number };

const HALF_POWER = 0.5;

/**
 * Highest sidelobe of a beam inside its field.
 *
 * @param beam  from dirtyBeam
 * @param grid  the same
 * @returns the highest local maximum other than the peak, by a quadratic through its cell and its neighbours;
 *          eastRad ≥ 0; null where there is none strictly inside the field
 * @throws RangeError if the beam has another size (programmer error)
 *
 * Error   ≤ 1e-3 of the peak with 10 or more cells to the finest fringe (tests/array/beam-shape.test.ts)
 */
export function highestSidelobe(beam: Float32Array, { size, cellRad }: BeamGrid): Sidelobe | null {
  checkBeam(beam, size);
  const half = size / 2;
  let best: Sidelobe | null = null;
  // the field is even: its upper half has all of it
  for (let row = half; row < size - 1; row += 1) {
    for (let column = 1; column < size - 1; column += 1) {
      if (row === half && column <= half) continue;
      const at = row * size + column;
      if (!isHigher(beam, size, at)) continue;
      const top = topOf(beam, size, at);
      if (best && top.value <= best.value) continue;
      const [east, north] = [(column - half + top.x) * cellRad, (row - half + top.y) * cellRad];
      const sense = east < 0 ? -1 : 1;
      best = { value: top.value, eastRad: sense * east, northRad: sense * north };
    }
  }
  return best;
}

/**
 * Main lobe by a least-squares Gaussian through its cells above half power.
 *
 * @param beam  from dirtyBeam
 * @param grid  the same
 * @returns FWHM, radians; position angle of the major axis [0, 180); null where the lobe reaches the field's edge or
 *          has too few cells
 * @throws RangeError if the beam has another size (programmer error)
 *
 * Error   1e-4 relative on a Gaussian (tests/array/beam-shape.test.ts)
 * Source  ln B = −(a l² + 2b lm + c m²), cells weighted by B²
 */
export function fitHalfPower(beam: Float32Array, { size, cellRad }: BeamGrid): MainLobe | null {
  checkBeam(beam, size);
  const lobe = cellsAbove(beam, size, HALF_POWER);
  if (!lobe) return null;
  const sums = [0, 0, 0, 0, 0];
  const right = [0, 0, 0];
  for (const at of lobe) {
    const [l, m, b] = [(at % size) - size / 2, Math.floor(at / size) - size / 2, beam[at] ?? NaN];
    const height = -Math.log(b);
    // l⁴, l³m, l²m², lm³, m⁴
    sums.forEach((_, power) => (sums[power] = (sums[power] ?? 0) + b * b * l ** (4 - power) * m ** power));
    right.forEach(
      (_, power) => (right[power] = (right[power] ?? 0) + b * b * height * l ** (2 - power) * m ** power),
    );
  }
  return lobeOf(solve(sums, right), cellRad);
}

function checkBeam(beam: Float32Array, size: number): void {
  if (beam.length !== size * size) throw new RangeError(`Not a beam of ${size} cells: ${beam.length}`);
}

function isHigher(beam: Float32Array, size: number, at: number): boolean {
  const value = beam[at] ?? NaN;
  for (const step of [1, size - 1, size, size + 1]) {
    if (!(value > (beam[at + step] ?? NaN) && value > (beam[at - step] ?? NaN))) return false;
  }
  return true;
}

/** Top of the quadratic through a cell and its eight neighbours, x and y in cells from it. */
function topOf(beam: Float32Array, size: number, at: number): { value: number; x: number; y: number } {
  const of = (column: number, row: number) => beam[at + row * size + column] ?? NaN;
  const value = of(0, 0);
  const [gx, gy] = [(of(1, 0) - of(-1, 0)) / 2, (of(0, 1) - of(0, -1)) / 2];
  const [xx, yy] = [of(1, 0) + of(-1, 0) - 2 * value, of(0, 1) + of(0, -1) - 2 * value];
  const xy = (of(1, 1) + of(-1, -1) - of(1, -1) - of(-1, 1)) / 4;
  const det = xx * yy - xy * xy;
  const [x, y] = [(xy * gy - yy * gx) / det, (xy * gx - xx * gy) / det];
  // a ridge has no top of its own: the cell is as good
  if (!(Math.abs(x) <= 1 && Math.abs(y) <= 1)) return { value, x: 0, y: 0 };
  return { value: value + (gx * x + gy * y) / 2, x, y };
}

/** Cells joined to the peak that are above a level; null where they reach the edge. */
function cellsAbove(beam: Float32Array, size: number, level: number): Set<number> | null {
  const peak = (size / 2) * (size + 1);
  const found = new Set([peak]);
  for (const at of found) {
    const [column, row] = [at % size, Math.floor(at / size)];
    if (column === 0 || row === 0 || column === size - 1 || row === size - 1) return null;
    for (const next of [at - 1, at + 1, at - size, at + size]) {
      if ((beam[next] ?? NaN) >= level) found.add(next);
    }
  }
  return found;
}

/** a, b, c of Σ over cells (ln B + a l² + 2b lm + c m²)² least, by Cramer's rule; NaN where cells do not tell them. */
function solve(
  [p = 0, q = 0, r = 0, s = 0, t = 0]: number[],
  [x = 0, y = 0, z = 0]: number[],
): [number, number, number] {
  // rows: l⁴ l³m l²m² | l³m l²m² lm³ | l²m² lm³ m⁴, the middle unknown is 2b
  const det = p * (r * t - s * s) - q * (q * t - r * s) + r * (q * s - r * r);
  const a = x * (r * t - s * s) - q * (y * t - s * z) + r * (y * s - r * z);
  const b = p * (y * t - s * z) - x * (q * t - r * s) + r * (q * z - r * y);
  const c = p * (r * z - y * s) - q * (q * z - y * r) + x * (q * s - r * r);
  return [a / det, b / det / 2, c / det];
}

function lobeOf([a, b, c]: [number, number, number], cellRad: number): MainLobe | null {
  const [middle, apart] = [(a + c) / 2, Math.hypot((a - c) / 2, b)];
  const fwhmRad = (steepness: number) => 2 * cellRad * Math.sqrt(Math.LN2 / steepness);
  if (!(middle - apart > 0 && Number.isFinite(middle))) return null;
  const turnedDeg = radToDeg(Math.atan2(2 * b, c - a) / 2) + 90;
  return {
    majorRad: fwhmRad(middle - apart),
    minorRad: fwhmRad(middle + apart),
    positionAngleDeg: apart <= 1e-9 * middle ? 0 : turnedDeg % 180,
  };
}
