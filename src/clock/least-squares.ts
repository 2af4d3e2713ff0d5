/** A polynomial about an epoch, value = Σ c[k] tᵏ, with the covariance of its coefficients. */
export type Polynomial = {
  /** c[0] … c[degree], in units of y over units of t to the power k */
  coefficients: readonly number[];
  /** row-major (degree + 1)² */
  covariance: readonly number[];
  /** Σ w (y − value)² */
  chiSquare: number;
  degreesOfFreedom: number;
};

/**
 * Weighted least squares of a polynomial.
 *
 * @param t       centred near zero by the caller: the normal equations are solved as they are, t scaled to its own range
 * @param weights 1/σ² of each y, or all 1
 * @param degree  0, 1 or 2; at most the number of different t less one
 * @returns the covariance is the inverse of AᵀWA: multiply by χ²/dof where the weights are relative only
 * @throws RangeError if the t do not carry the degree (programmer error)
 *
 * Error   9 significant digits on NIST's Norris data (tests/clock/fit.test.ts)
 * Source  normal equations, solved by Gauss–Jordan elimination with pivots (memory)
 */
export function fitPolynomial(
  t: readonly number[],
  y: readonly number[],
  weights: readonly number[],
  degree: number,
): Polynomial {
  const size = degree + 1;
  const scale = Math.max(...t.map(Math.abs)) || 1;
  const normal = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const right = new Array<number>(size).fill(0);
  t.forEach((time, index) => {
    const powers = powersOf(time / scale, degree);
    const weight = weights[index] ?? 1;
    for (let row = 0; row < size; row++) {
      const weighted = weight * (powers[row] ?? 0);
      right[row] = (right[row] ?? 0) + weighted * (y[index] ?? 0);
      const line = normal[row] ?? [];
      for (let column = 0; column < size; column++)
        line[column] = (line[column] ?? 0) + weighted * (powers[column] ?? 0);
    }
  });
  const inverse = invert(normal);
  const scaled = inverse.map((row) =>
    row.reduce((sum, value, column) => sum + value * (right[column] ?? 0), 0),
  );
  const chiSquare = t.reduce((sum, time, index) => {
    const residual = (y[index] ?? 0) - valueOf(scaled, time / scale);
    return sum + (weights[index] ?? 1) * residual * residual;
  }, 0);
  return {
    coefficients: scaled.map((value, power) => value / scale ** power),
    covariance: inverse.flatMap((row, power) => row.map((value, other) => value / scale ** (power + other))),
    chiSquare,
    degreesOfFreedom: t.length - size,
  };
}

const powersOf = (t: number, degree: number): number[] =>
  Array.from({ length: degree + 1 }, (_, power) => t ** power);

export const valueOf = (coefficients: readonly number[], t: number): number =>
  coefficients.reduceRight((sum, coefficient) => sum * t + coefficient, 0);

/** gᵀ C g for g = (1, t, t² …): the variance of the polynomial's value at t. */
export function varianceOf(covariance: readonly number[], degree: number, t: number): number {
  const powers = powersOf(t, degree);
  return powers.reduce(
    (sum, power, row) =>
      sum +
      powers.reduce(
        (line, other, column) => line + power * other * (covariance[row * (degree + 1) + column] ?? 0),
        0,
      ),
    0,
  );
}

function invert(matrix: readonly (readonly number[])[]): number[][] {
  const size = matrix.length;
  const work = matrix.map((row, index) => [
    ...row,
    ...Array.from({ length: size }, (_, k) => (k === index ? 1 : 0)),
  ]);
  for (let column = 0; column < size; column++) {
    let best = column;
    for (let row = column + 1; row < size; row++)
      if (Math.abs(at(work, row, column)) > Math.abs(at(work, best, column))) best = row;
    const pivot = at(work, best, column);
    if (!(Math.abs(pivot) > 1e-14 * Math.abs(at(matrix, 0, 0))))
      throw new RangeError('The times do not carry a polynomial of this degree.');
    [work[column], work[best]] = [work[best] ?? [], work[column] ?? []];
    work[column] = (work[column] ?? []).map((value) => value / pivot);
    for (let row = 0; row < size; row++) {
      if (row === column) continue;
      const factor = at(work, row, column);
      work[row] = (work[row] ?? []).map((value, k) => value - factor * at(work, column, k));
    }
  }
  return work.map((row) => row.slice(size));
}

const at = (matrix: readonly (readonly number[])[], row: number, column: number): number =>
  matrix[row]?.[column] ?? 0;
