/** bits per sample at each end; figures are per polarisation */
export type BaselineNoise = {
  sefd1Jy: number;
  sefd2Jy: number;
  /** all channels of one polarisation together */
  bandwidthHz: number;
  seconds: number;
  bits1: 1 | 2;
  bits2: 1 | 2;
};

/** One baseline of an image; products = parallel-hand products, 1 or 2. */
export type ImageBaseline = BaselineNoise & { products: 1 | 2 };

/**
 * Part of the signal-to-noise ratio that quantised sampling keeps.
 *
 * @param bits  1 or 2 a sample, at the Nyquist rate
 * @returns 2/π for one bit; 0.8812 for two bits (four equally spaced levels; 0.8825 at the free optimum)
 *
 * Error   two bits: 0.88115395 rounded to four digits (tests/array/sensitivity.test.ts)
 * Source  TMS ch. 8 (memory); 0.8812 maximised numerically by the reference
 */
export function efficiency(bits: 1 | 2): number {
  return bits === 1 ? 2 / Math.PI : 0.8812;
}

/**
 * Noise of one baseline: rms of the real (or imaginary) part of a visibility, one polarisation product.
 *
 * @param o  SEFDs in Jy at the elevation of the scan, per polarisation; bandwidthHz; seconds; bits of each end
 * @returns Jy; a mixed baseline takes √(η₁η₂)
 * @throws RangeError if a figure is not positive (programmer error)
 *
 * Error   1e-9 relative (tests/array/sensitivity.test.ts)
 * Source  TMS ch. 6: σ = (1/η) √(SEFD₁ SEFD₂ / (2 Δν T))
 */
export function baselineNoiseJy(o: BaselineNoise): number {
  const { sefd1Jy, sefd2Jy, bandwidthHz, seconds } = o;
  for (const figure of [sefd1Jy, sefd2Jy, bandwidthHz, seconds]) {
    if (!(figure > 0 && Number.isFinite(figure))) throw new RangeError(`Not a positive figure: ${figure}`);
  }
  const eta = Math.sqrt(efficiency(o.bits1) * efficiency(o.bits2));
  return Math.sqrt((sefd1Jy * sefd2Jy) / (2 * bandwidthHz * seconds)) / eta;
}

/**
 * Noise of an image with natural weights.
 *
 * @param baselines  each with its own time and bits
 * @returns Jy per beam; Infinity without baselines (nothing is measured)
 * @throws RangeError if a figure is not positive (programmer error)
 *
 * Error   1e-9 relative (tests/array/sensitivity.test.ts)
 * Source  TMS ch. 6: 1/σ² = Σ products/σ_ij²
 */
export function imageNoiseJy(baselines: readonly ImageBaseline[]): number {
  const weight = baselines.reduce((sum, b) => sum + b.products / baselineNoiseJy(b) ** 2, 0);
  return 1 / Math.sqrt(weight);
}
