import { ASTRONOMICAL_UNIT_M, SPEED_OF_LIGHT } from './constants';

export const M_PER_MM = 1e-3;
export const M_PER_KM = 1e3;

/** Path of light in a Julian year of 365.25 days, exact by definition. Source: IAU Style Manual (1989), table 7 (memory). */
export const LIGHT_YEAR_M = SPEED_OF_LIGHT * 365.25 * 86_400;

/** 648 000/π astronomical units. Source: IAU 2015 resolution B2, note 4. */
export const PARSEC_M = (ASTRONOMICAL_UNIT_M * 648_000) / Math.PI;

/** Nominal. Source: IAU 2015 resolution B3. */
export const SOLAR_RADIUS_M = 6.957e8;

/**
 * Wavelength of a frequency in vacuum.
 *
 * @param hz  frequency > 0
 * @returns metres
 * @throws RangeError if the frequency is not positive (programmer error)
 *
 * Error   rounding
 * Source  λ = c/ν
 */
export function wavelengthM(hz: number): number {
  return SPEED_OF_LIGHT / positive(hz, 'frequency');
}

/**
 * Frequency of a wavelength in vacuum.
 *
 * @param metres  wavelength > 0
 * @returns Hz
 * @throws RangeError if the wavelength is not positive (programmer error)
 *
 * Error   rounding
 * Source  ν = c/λ
 */
export function frequencyHz(metres: number): number {
  return SPEED_OF_LIGHT / positive(metres, 'wavelength');
}

function positive(value: number, what: string): number {
  if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`Not a ${what}: ${value}`);
  return value;
}
