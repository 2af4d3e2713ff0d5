import { numberText } from '@/app/_ui/format';

/** "45.6° N": hemispheres in words where a sign would have to be explained. */
export const latitudeText = (deg: number, decimals = 1): string =>
  `${numberText(Math.abs(deg), decimals)}° ${deg < 0 ? 'S' : 'N'}`;

/** "109.9° W". */
export const longitudeText = (deg: number, decimals = 1): string =>
  `${numberText(Math.abs(deg), decimals)}° ${deg < 0 ? 'W' : 'E'}`;
