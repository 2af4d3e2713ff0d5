/** Below this share of the coherence time the closed form loses digits and the series is exact. */
const SERIES_BELOW = 1e-3;

/**
 * Amplitude kept by a coherent sum through the atmosphere.
 *
 * @param seconds           integration time T ≥ 0
 * @param coherenceSeconds  the mode's coherence time t_c > 0
 * @returns C_atm (0, 1]; falls as √(2 t_c/T) for long T, so that SNR saturates
 * @throws RangeError if a time is out of range (programmer error)
 *
 * Error   1e-9 relative (tests/array/coherence.test.ts)
 * Source  C² = (2t_c/T)[1 − (t_c/T)(1 − e^(−T/t_c))], phase structure function 2τ/t_c; common practice, no source
 */
export function atmosphereCoherence(seconds: number, coherenceSeconds: number): number {
  if (!(seconds >= 0)) throw new RangeError(`Not a time: ${seconds}`);
  if (!(coherenceSeconds > 0)) throw new RangeError(`Not a coherence time: ${coherenceSeconds}`);
  const x = seconds / coherenceSeconds;
  if (x < SERIES_BELOW) return Math.sqrt(1 - x / 3 + (x * x) / 12 - (x * x * x) / 60);
  return Math.sqrt((2 / x) * (1 + Math.expm1(-x) / x));
}
