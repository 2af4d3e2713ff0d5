import { degToRad, normalise360, radToDeg } from '../units/angle';
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
  const [dec, lat] = [degToRad(decDeg), degToRad(latitudeDeg)];
  return Array.from({ length: 360 / STEP_DEG + 1 }, (_, step) => {
    const hour = degToRad(step * STEP_DEG - 180);
    const east = -Math.cos(dec) * Math.sin(hour);
    const north = Math.sin(dec) * Math.cos(lat) - Math.cos(dec) * Math.sin(lat) * Math.cos(hour);
    const up = Math.sin(dec) * Math.sin(lat) + Math.cos(dec) * Math.cos(lat) * Math.cos(hour);
    return {
      azimuthDeg: normalise360(radToDeg(Math.atan2(east, north))),
      elevationDeg: radToDeg(Math.asin(Math.max(-1, Math.min(1, up)))),
    };
  });
}
