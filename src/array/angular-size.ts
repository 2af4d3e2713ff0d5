import { SOLAR_GM, SPEED_OF_LIGHT } from '../units/constants';

/**
 * Angle under which a length lies, seen square on.
 *
 * @param linearM    length ≥ 0, metres
 * @param distanceM  > 0, metres
 * @returns radians [0, π)
 * @throws RangeError if a figure is not finite or out of range (programmer error)
 *
 * Error   1e-12 relative (tests/array/angular-size.test.ts)
 * Source  plane geometry: 2 atan(s/2d)
 */
export function angularSizeRad(linearM: number, distanceM: number): number {
  if (!(linearM >= 0 && Number.isFinite(linearM))) throw new RangeError(`Not a length: ${linearM}`);
  checkPositive(distanceM, 'distance');
  return 2 * Math.atan(linearM / (2 * distanceM));
}

/**
 * Length that lies under an angle: the inverse of angularSizeRad.
 *
 * @param angleRad   [0, π)
 * @param distanceM  > 0, metres
 * @returns metres
 * @throws RangeError if a figure is not finite or out of range (programmer error)
 */
export function linearSizeM(angleRad: number, distanceM: number): number {
  if (!(angleRad >= 0 && angleRad < Math.PI)) throw new RangeError(`Angle outside [0, π): ${angleRad}`);
  checkPositive(distanceM, 'distance');
  return 2 * distanceM * Math.tan(angleRad / 2);
}

/**
 * Schwarzschild radius of a black hole.
 *
 * @param solarMasses  > 0
 * @returns metres
 * @throws RangeError if the mass is not positive (programmer error)
 *
 * Error   1e-4 relative, the Sun's GM is nominal (tests/array/angular-size.test.ts)
 * Source  R_s = 2GM/c²
 */
export function schwarzschildRadiusM(solarMasses: number): number {
  checkPositive(solarMasses, 'mass');
  return (2 * SOLAR_GM * solarMasses) / SPEED_OF_LIGHT ** 2;
}

/**
 * Angle of a black hole's Schwarzschild radius: the radius, not the diameter, and not the shadow.
 *
 * @param solarMasses  > 0
 * @param distanceM    > 0, metres
 * @returns radians
 * @throws RangeError if a figure is not positive (programmer error)
 */
export function schwarzschildAngleRad(solarMasses: number, distanceM: number): number {
  return angularSizeRad(schwarzschildRadiusM(solarMasses), distanceM);
}

/**
 * Finest angle of a baseline, or the largest scale of the shortest one: λ/B.
 *
 * @param wavelengthM  > 0, metres
 * @param baselineM    projected length > 0, metres
 * @returns radians
 * @throws RangeError if a figure is not positive (programmer error)
 *
 * Source  TMS ch. 1: the fringe's own spacing, no factor for the shape of the array
 */
export function fringeSpacingRad(wavelengthM: number, baselineM: number): number {
  checkPositive(wavelengthM, 'wavelength');
  checkPositive(baselineM, 'baseline');
  return wavelengthM / baselineM;
}

function checkPositive(value: number, what: string): void {
  if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`Not a ${what}: ${value}`);
}
