/** Points of the uv plane, wavelengths, each standing for itself and its conjugate; without weights each counts one. */
export type UvPoints = { u: Float64Array; v: Float64Array; weight?: Float64Array };

/**
 * Refuses points of which no beam can be made.
 *
 * @param furthest  largest |u| and |v| that will do, wavelengths
 * @throws RangeError if none is given, lengths differ, one is not finite or lies too far out, a weight is below 0 or
 *         not finite, or all weights are 0 (programmer error)
 */
export function checkUvPoints({ u, v, weight }: UvPoints, furthest = Number.MAX_VALUE): void {
  if (u.length === 0) throw new RangeError('No points of the uv plane');
  if (v.length !== u.length || (weight && weight.length !== u.length)) {
    throw new RangeError(`Not points: ${u.length} u, ${v.length} v, ${weight?.length ?? 'no'} weights`);
  }
  for (let k = 0; k < u.length; k += 1) {
    const x = u[k] ?? NaN;
    const y = v[k] ?? NaN;
    if (x <= furthest && x >= -furthest && y <= furthest && y >= -furthest) continue;
    throw new RangeError(`Not a point within ${furthest} wavelengths: ${x}, ${y}`);
  }
  if (weight) checkWeights(weight);
}

function checkWeights(weight: Float64Array): void {
  let sum = 0;
  for (const w of weight) {
    if (!(w >= 0)) throw new RangeError(`Not a weight: ${w}`);
    sum += w;
  }
  if (!(sum > 0 && Number.isFinite(sum))) throw new RangeError(`Weights that sum to ${sum}`);
}
