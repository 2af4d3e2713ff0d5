import FFT from 'fft.js';
import type { UvLines } from './uv-spread';

/** What a transform needs for one size, made once. */
export type EvenTransform = {
  fft: FFT;
  /** half of the field's side: it is read at −half … half − 1 */
  half: number;
  row: Float64Array;
  turned: Float64Array;
  /** after the transform along v: for each m ≥ 0 all lines, complex */
  mixed: Float64Array;
};

/**
 * Tables and buffers of a transform.
 *
 * @param cells  of the padded grid along an axis, a power of 2
 * @param half   half of the field's side, ≤ cells/4
 * @param lines  most lines that will be transformed
 */
export function evenTransform(cells: number, half: number, lines: number): EvenTransform {
  return {
    fft: new FFT(cells),
    half,
    row: new Float64Array(2 * cells),
    turned: new Float64Array(2 * cells),
    mixed: new Float64Array(2 * lines * (half + 2)),
  };
}

/**
 * The real, even field of a real uv half-plane: Σ g cos(2π(ul + vm)/cells), brought to a peak of 1.
 *
 * @param lines  half-plane of spread points; it is left cleared
 * @param field  2·half × 2·half, row-major, row = m, column = l, middle at (half, half)
 * @param cure   factors for cells 0 … half along either axis
 *
 * Error   rounding: 1e-12 of the peak, then that of Float32
 * Source  two real lines in one complex transform, one spectrum even and one odd; half of m and of u is enough as
 *         the field is even
 */
export function transformEven(
  plan: EvenTransform,
  lines: UvLines,
  field: Float32Array,
  cure: Float64Array,
): void {
  for (let line = 0; line < lines.used; line += 2) alongV(plan, lines, line);
  const { half } = plan;
  plan.row.fill(0);
  const unit = 1 / (peakOf(plan, lines) * (cure[0] ?? NaN) ** 2);
  for (let m = 0; m <= half; m += 2) {
    alongU(plan, lines, m);
    layRow(plan, 0, lines.cells, field, m, unit * (cure[m] ?? NaN), cure);
    if (m < half) layRow(plan, 1, lines.cells, field, m + 1, unit * (cure[m + 1] ?? NaN), cure);
  }
}

/** Two lines at once; their spectra are told apart and laid down for each m. */
function alongV({ fft, half, turned, mixed }: EvenTransform, lines: UvLines, line: number): void {
  const { cells, used, values } = lines;
  const row = values.subarray(line * cells, (line + 2) * cells);
  fft.transform(turned, row);
  row.fill(0);
  for (let m = 0; m <= half; m += 1) {
    const here = 2 * m;
    const there = m === 0 ? 0 : 2 * (cells - m);
    const sign = (m & 1) === 0 ? 0.5 : -0.5; // v starts at −cells/2
    const re = turned[here] ?? NaN;
    const im = turned[here + 1] ?? NaN;
    const reThere = turned[there] ?? NaN;
    const imThere = turned[there + 1] ?? NaN;
    const at = 2 * (m * used + line);
    mixed[at] = sign * (re + reThere);
    mixed[at + 1] = sign * (im - imThere);
    mixed[at + 2] = sign * (im + imThere);
    mixed[at + 3] = sign * (reThere - re);
  }
}

/** What alongU gives for l = m = 0. */
function peakOf({ mixed }: EvenTransform, { used }: UvLines): number {
  let sum = 0;
  for (let line = 0; line < used; line += 1) sum += mixed[2 * line] ?? NaN;
  return 2 * sum;
}

/** Rows m and m + 1 at once: the first is the real part, the second the imaginary one. */
function alongU({ fft, row, turned, mixed }: EvenTransform, lines: UvLines, m: number): void {
  const { cells, before, used } = lines;
  const one = 2 * (m * used + before);
  const other = one + 2 * used;
  for (let u = 1; u < before; u += 1) {
    foldBack(mixed, one, u);
    foldBack(mixed, other, u);
  }
  row[0] = 2 * (mixed[one] ?? NaN);
  row[1] = 2 * (mixed[other] ?? NaN);
  for (let u = 1; u < used - before; u += 1) {
    const a = mixed[one + 2 * u] ?? NaN;
    const b = mixed[one + 2 * u + 1] ?? NaN;
    const c = mixed[other + 2 * u] ?? NaN;
    const d = mixed[other + 2 * u + 1] ?? NaN;
    row[2 * u] = a - d;
    row[2 * u + 1] = b + c;
    row[2 * (cells - u)] = a + d;
    row[2 * (cells - u) + 1] = c - b;
  }
  fft.transform(turned, row);
}

/** What was spread to a line before u = 0 is its conjugate's. */
function foldBack(mixed: Float64Array, origin: number, u: number): void {
  const [here, there] = [origin + 2 * u, origin - 2 * u];
  mixed[here] = (mixed[here] ?? NaN) + (mixed[there] ?? NaN);
  mixed[here + 1] = (mixed[here + 1] ?? NaN) - (mixed[there + 1] ?? NaN);
}

/** Row m of the field by what was turned for it; the row after the last, m = half, is laid at −m, backwards. */
function layRow(
  { half, turned }: EvenTransform,
  part: 0 | 1,
  cells: number,
  field: Float32Array,
  m: number,
  down: number,
  cure: Float64Array,
): void {
  const sense = m < half ? 1 : -1;
  const middle = (half + sense * m) * 2 * half + half;
  field[middle] = down * (cure[0] ?? NaN) * (turned[part] ?? NaN);
  for (let l = 1; l < half; l += 1) {
    const factor = down * (cure[l] ?? NaN);
    field[middle + sense * l] = factor * (turned[2 * l + part] ?? NaN);
    field[middle - sense * l] = factor * (turned[2 * (cells - l) + part] ?? NaN);
  }
  const edge = down * (cure[half] ?? NaN);
  field[middle - half] = edge * (turned[2 * (m < half ? cells - half : half) + part] ?? NaN);
  if (m > 0 && m < half) layImage(field, half, m, edge * (turned[2 * half + part] ?? NaN));
}

/** Row −m: the field is even, so it is row m backwards; its first cell, at −half, has no twin in the field. */
function layImage(field: Float32Array, half: number, m: number, edge: number): void {
  const side = 2 * half;
  const [from, to] = [(half + m) * side, (half - m) * side];
  field[to] = edge;
  for (let column = 1; column < side; column += 1) field[to + side - column] = field[from + column] ?? NaN;
}
