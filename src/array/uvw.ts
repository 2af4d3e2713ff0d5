import { rotate } from '../units/vector';
import type { RotationOptions } from '../sky/position';
import type { Itrf, SkyPosition } from '../sky/types';
import { baselineVector } from './baseline';
import { celestialBaseline, uvwAxes } from './celestial';

/** metres */
export type Uvw = { u: number; v: number; w: number };

/**
 * Components of a baseline at a source: u east, v north, w toward it.
 *
 * @param first   Earth-fixed place, metres
 * @param second  Earth-fixed place; baseline = second − first
 * @param source  ICRS place
 * @param at      UTC; valid 1900–2100
 * @param opts    dut1Seconds = UT1 − UTC, default 0
 * @returns metres; divide by the wavelength for wavelengths
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * The direction is the one with annual aberration, the axes are kept to the north of ICRS: the baseline is turned by
 * the smallest rotation that carries the apparent direction into the catalogue one, then projected on the catalogue
 * basis. The catalogue direction alone differs by up to 10⁻⁴ of the length; axes of date are turned by tenths of a
 * degree.
 *
 * Error   ≤ 3·10⁻⁶ of the length against ERFA with aberration, ≤ 2·10⁻⁴ against the catalogue direction
 *         (tests/array/uvw.test.ts); limits as earthFrameAt
 * Source  TMS eq. 4.1
 */
export function baselineUvw(
  first: Itrf,
  second: Itrf,
  source: SkyPosition,
  at: Date,
  opts: RotationOptions = {},
): Uvw {
  const { vector } = celestialBaseline(baselineVector(first, second), source, at, opts);
  const [u, v, w] = rotate(uvwAxes(source), vector);
  return { u, v, w };
}
