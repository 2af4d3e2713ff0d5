import { degToRad, radToDeg } from '../units/angle';
import type { AzEl, DrivenAxis, Mount, MountKind } from './types';

/** Angles of a mount's axes, degrees; the first turns all the way round, the second rides on it. */
export type AxisAngles = { firstDeg: number; secondDeg: number };

/** The axis that turns about a fixed line. */
export function firstAxis(mount: Mount): DrivenAxis {
  switch (mount.kind) {
    case 'az-el':
      return mount.azimuth;
    case 'ha-dec':
      return mount.hourAngle;
    case 'xy-ns':
    case 'xy-ew':
      return mount.x;
  }
}

/** The axis that rides on the first. */
export function secondAxis(mount: Mount): DrivenAxis {
  switch (mount.kind) {
    case 'az-el':
      return mount.elevation;
    case 'ha-dec':
      return mount.declination;
    case 'xy-ns':
    case 'xy-ew':
      return mount.y;
  }
}

/** As the words of a sentence. */
export const AXIS_WORDS: Readonly<Record<MountKind, { first: string; second: string }>> = {
  'az-el': { first: 'azimuth', second: 'elevation' },
  'ha-dec': { first: 'hour angle', second: 'declination' },
  'xy-ns': { first: 'X', second: 'Y' },
  'xy-ew': { first: 'X', second: 'Y' },
};

/**
 * Angles of the axes of a mount that points in a direction.
 *
 * @param latitudeDeg  of the site; of an equatorial mount alone it matters
 * @param direction    azimuth and elevation, degrees
 * @returns first: azimuth as given (az-el), hour angle or x, (−180, 180]; second [-90, 90]. At the end of the first
 *          axis its angle is 0
 * @throws RangeError if an input is not finite (programmer error)
 *
 * Error   rounding
 * Source  definition of the axes (MountLimits); equatorial: rotation by the latitude about east–west (science)
 */
export function axisAngles(kind: MountKind, latitudeDeg: number, direction: AzEl): AxisAngles {
  const { azimuthDeg, elevationDeg } = direction;
  if (!Number.isFinite(azimuthDeg + elevationDeg + latitudeDeg))
    throw new RangeError(`Not a direction: ${azimuthDeg}, ${elevationDeg}`);
  if (kind === 'az-el') return { firstDeg: azimuthDeg, secondDeg: elevationDeg };
  const [az, el] = [degToRad(azimuthDeg), degToRad(elevationDeg)];
  const [east, north, up] = [Math.cos(el) * Math.sin(az), Math.cos(el) * Math.cos(az), Math.sin(el)];
  if (kind === 'ha-dec') {
    const [sin, cos] = [Math.sin(degToRad(latitudeDeg)), Math.cos(degToRad(latitudeDeg))];
    return angles(-east, up * cos - north * sin, up * sin + north * cos);
  }
  return kind === 'xy-ns' ? angles(east, up, north) : angles(north, up, east);
}

function angles(across: number, toward: number, along: number): AxisAngles {
  return {
    firstDeg: radToDeg(Math.atan2(across, toward)),
    secondDeg: radToDeg(Math.atan2(along, Math.sqrt(across * across + toward * toward))),
  };
}
