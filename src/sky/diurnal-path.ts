import { degToRad, normalise360 } from '../units/angle';
import { add, scale } from '../units/vector';
import { anglesOf, axisTriad } from './axes';
import type { AzEl } from './types';

const STEP_DEG = 2;

/**
 * The path of a declination over the sky of a site in one turn of the Earth: for drawings.
 *
 * @param decDeg       apparent declination, [-90, 90]
 * @param latitudeDeg  geodetic, [-90, 90]
 * @returns azimuth [0, 360) and elevation [-90, 90] for hour angles −180° to 180°, each 2°
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   diurnal aberration left out: 0.3″
 * Source  rotation of hour angle and declination into azimuth and elevation (science)
 */
export function diurnalPath(decDeg: number, latitudeDeg: number): AzEl[] {
  if (!(Math.abs(decDeg) <= 90 && Math.abs(latitudeDeg) <= 90))
    throw new RangeError(`Not a declination and a latitude: ${decDeg}, ${latitudeDeg}`);
  const dec = degToRad(decDeg);
  const { along, zero, toward } = axisTriad('ha-dec', degToRad(latitudeDeg));
  return Array.from({ length: 360 / STEP_DEG + 1 }, (_, step) => {
    const hour = degToRad(step * STEP_DEG - 180);
    const across = add(scale(zero, Math.cos(hour)), scale(toward, Math.sin(hour)));
    const [east, north, up] = add(scale(along, Math.sin(dec)), scale(across, Math.cos(dec)));
    const { firstDeg, secondDeg } = anglesOf(up, north, east);
    return { azimuthDeg: normalise360(firstDeg), elevationDeg: secondDeg };
  });
}
