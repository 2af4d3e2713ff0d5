import { NARROW, narrowKernel, wideKernel } from './spread-kernel';
import type { UvPoints } from './uv-points';

/**
 * The half of a uv grid with u ≥ 0, ready for transforms along v: two lines of constant u are one complex row.
 *
 * Line r holds u = r − before cells; v runs from −cells/2. The conjugate half is not stored.
 */
export type UvLines = {
  cells: number;
  /** lines before u = 0, to which the kernel of points near it reaches; even, ≥ 4 */
  before: number;
  /** even; lines from here on are empty */
  used: number;
  /** line r, cell c at ((r >> 1) · cells + c) · 2 + (r & 1) */
  values: Float64Array;
};

/**
 * Spreads points on lines by the wide kernel; a point with u < 0 is its conjugate's. Cost: 0.4 µs a point.
 *
 * @param uv      |u|, |v| · perCell within 0.45 · cells
 * @param perCell  cells per wavelength
 * @param into    cleared lines; `used` is set
 *
 * Source  convolutional gridding (TMS ch. 10)
 */
export function spreadUv(uv: UvPoints, perCell: number, into: UvLines): void {
  const { width, at } = wideKernel;
  const { cells, before, values } = into;
  const along = new Float64Array(width);
  let last = 0;
  for (let k = 0; k < uv.u.length; k += 1) {
    const half = (uv.u[k] ?? NaN) < 0 ? -perCell : perCell;
    const x = half * (uv.u[k] ?? NaN) + before - width / 2;
    const y = half * (uv.v[k] ?? NaN) + cells / 2 - width / 2;
    const [line, cell] = [Math.floor(x) + 1, Math.floor(y) + 1];
    const weight = uv.weight ? (uv.weight[k] ?? NaN) : 1;
    last = Math.max(last, line);
    for (let j = 0; j < width; j += 1) along[j] = weight * at(cell + j - y - width / 2);
    for (let i = 0; i < width; i += 1) {
      const across = at(line + i - x - width / 2);
      const start = 2 * (((line + i) >> 1) * cells + cell) + ((line + i) & 1);
      for (let j = 0; j < width; j += 1) {
        values[start + 2 * j] = (values[start + 2 * j] ?? NaN) + across * (along[j] ?? NaN);
      }
    }
  }
  into.used = Math.max(2 * before, 2 * ((last + width + 1) >> 1));
}

/** The same by the narrow kernel, for many points: no call and no inner loop. Cost: 12 ns a point. */
export function spreadManyUv({ u, v, weight }: UvPoints, perCell: number, into: UvLines): void {
  const { q1, q2, p2, p3 } = NARROW;
  const { cells, before, values } = into;
  const row = 2 * cells;
  const toLine = before - narrowKernel.width / 2;
  const toCell = cells / 2 - narrowKernel.width / 2;
  let last = 0;
  for (let k = 0; k < u.length; k += 1) {
    const half = (u[k] ?? NaN) < 0 ? -perCell : perCell;
    const x = half * (u[k] ?? NaN) + toLine;
    const y = half * (v[k] ?? NaN) + toCell;
    const line = (x | 0) + 1;
    const cell = (y | 0) + 1;
    if (line > last) last = line;
    const w = weight ? (weight[k] ?? NaN) : 1;
    const g = cell - y;
    const g1 = 1 - g;
    const gg = g * g1;
    const a = w * g * g * (p2 + p3 * g);
    const b = w * (1 + gg * (q1 + gg * q2));
    const c = w * g1 * g1 * (p2 + p3 * g1);
    const f = line - x;
    const f1 = 1 - f;
    const ff = f * f1;
    let share = f * f * (p2 + p3 * f);
    let at = (line >> 1) * row + 2 * cell + (line & 1);
    values[at] = (values[at] ?? NaN) + share * a;
    values[at + 2] = (values[at + 2] ?? NaN) + share * b;
    values[at + 4] = (values[at + 4] ?? NaN) + share * c;
    share = 1 + ff * (q1 + ff * q2);
    at = ((line + 1) >> 1) * row + 2 * cell + ((line + 1) & 1);
    values[at] = (values[at] ?? NaN) + share * a;
    values[at + 2] = (values[at + 2] ?? NaN) + share * b;
    values[at + 4] = (values[at + 4] ?? NaN) + share * c;
    share = f1 * f1 * (p2 + p3 * f1);
    at = ((line + 2) >> 1) * row + 2 * cell + (line & 1);
    values[at] = (values[at] ?? NaN) + share * a;
    values[at + 2] = (values[at + 2] ?? NaN) + share * b;
    values[at + 4] = (values[at + 4] ?? NaN) + share * c;
  }
  into.used = Math.max(2 * before, 2 * ((last + narrowKernel.width + 1) >> 1));
}
