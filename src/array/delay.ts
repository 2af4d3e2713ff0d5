import { SPEED_OF_LIGHT } from '../units/constants';
import { dot } from '../units/vector';
import type { RotationOptions } from '../sky/position';
import type { Itrf, SkyPosition } from '../sky/types';
import { baselineVector } from './baseline';
import { celestialBaseline } from './celestial';

/**
 * Geometric delay of a baseline: arrival at the second station minus arrival at the first.
 *
 * @param first   Earth-fixed place, metres
 * @param second  Earth-fixed place
 * @param source  ICRS place; annual aberration is applied
 * @param at      UTC; valid 1900–2100
 * @param opts    dut1Seconds = UT1 − UTC, default 0: 0.1 s of it is up to 0.15 µs on 6000 km, so a read-out says which
 * @returns seconds, negative when the second station is nearer to the source; rate, s/s
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 3·10⁻⁶ of |b|/c (as −w/c, tests/array/uvw.test.ts); rate ≤ 2·10⁻⁴ of |b|ω/c against ERFA's catalogue
 *         direction (tests/array/delay.test.ts). Left out: the second station's motion during the delay (up to
 *         0.03 µs), relativity, atmosphere, polar motion
 * Source  science: τ = −b·ŝ/c (TMS ch. 4), its derivative with the Earth’s rotation
 */
export function geometricDelay(
  first: Itrf,
  second: Itrf,
  source: SkyPosition,
  at: Date,
  opts: RotationOptions = {},
): { seconds: number; rate: number } {
  const seen = celestialBaseline(baselineVector(first, second), source, at, opts);
  return {
    seconds: -dot(seen.vector, seen.source) / SPEED_OF_LIGHT,
    rate: -dot(seen.velocity, seen.source) / SPEED_OF_LIGHT,
  };
}

/**
 * Fringe rate of a baseline before the correlator takes it out.
 *
 * @param rate   of the delay, s/s, as geometricDelay gives it
 * @param skyHz  sky frequency > 0
 * @returns Hz, with the sign of the rate; at most 3.1·10⁻⁶ ν between two stations on the ground
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   rounding
 * Source  ν dτ/dt (TMS ch. 4)
 */
export function fringeRateHz(rate: number, skyHz: number): number {
  if (!Number.isFinite(rate)) throw new RangeError(`Not a rate: ${rate}`);
  if (!(skyHz > 0 && Number.isFinite(skyHz))) throw new RangeError(`Not a frequency: ${skyHz}`);
  return rate * skyHz;
}
