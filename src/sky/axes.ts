import { degToRad, radToDeg } from '../units/angle';
import { dot } from '../units/vector';
import type { Vector3 } from '../units/vector';
import type { AngleRange, AzEl, DrivenAxis, Mount, MountKind, MountLimits } from './types';

/** Angles of a mount's axes, degrees; the first turns all the way round, the second rides on it. */
export type AxisAngles = { firstDeg: number; secondDeg: number };

/**
 * The range of the axis that turns about a fixed line: driven, as of a mount, or a limit that may not bind.
 */
export function firstAxis(mount: Mount): DrivenAxis;
export function firstAxis(limits: MountLimits): AngleRange | undefined;
export function firstAxis(limits: MountLimits): AngleRange | undefined {
  switch (limits.kind) {
    case 'az-el':
      return limits.azimuth;
    case 'ha-dec':
      return limits.hourAngle;
    case 'xy-ns':
    case 'xy-ew':
      return limits.x;
  }
}

/** The same of the axis that rides on the first. */
export function secondAxis(mount: Mount): DrivenAxis;
export function secondAxis(limits: MountLimits): AngleRange | undefined;
export function secondAxis(limits: MountLimits): AngleRange | undefined {
  switch (limits.kind) {
    case 'az-el':
      return limits.elevation;
    case 'ha-dec':
      return limits.declination;
    case 'xy-ns':
    case 'xy-ew':
      return limits.y;
  }
}

/** Unit vectors of a mount's axes: the end of the first, where both angles are 0°, where the first is 90° and the second 0°. */
export type AxisTriad = { along: Vector3; zero: Vector3; toward: Vector3 };

const EAST: Vector3 = [1, 0, 0];
const NORTH: Vector3 = [0, 1, 0];
const UP: Vector3 = [0, 0, 1];

/**
 * The axes of a kind of mount, by components toward east, north and up of the site.
 *
 * @param latitudeRad  of the site; of an equatorial mount alone it matters
 *
 * Source  definition of the axes (MountLimits); equatorial: the pole stands at the latitude in the north
 */
export function axisTriad(kind: MountKind, latitudeRad: number): AxisTriad {
  switch (kind) {
    case 'az-el':
      return { along: UP, zero: NORTH, toward: EAST };
    case 'ha-dec': {
      const [sin, cos] = [Math.sin(latitudeRad), Math.cos(latitudeRad)];
      return { along: [0, cos, sin], zero: [0, -sin, cos], toward: [-1, 0, 0] };
    }
    case 'xy-ns':
      return { along: NORTH, zero: UP, toward: EAST };
    case 'xy-ew':
      return { along: EAST, zero: UP, toward: NORTH };
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
 * Source  as axisTriad
 */
export function axisAngles(kind: MountKind, latitudeDeg: number, direction: AzEl): AxisAngles {
  const { azimuthDeg, elevationDeg } = direction;
  if (!Number.isFinite(azimuthDeg + elevationDeg + latitudeDeg))
    throw new RangeError(`Not a direction: ${azimuthDeg}, ${elevationDeg}`);
  if (kind === 'az-el') return { firstDeg: azimuthDeg, secondDeg: elevationDeg };
  const [az, el] = [degToRad(azimuthDeg), degToRad(elevationDeg)];
  const seen: Vector3 = [Math.cos(el) * Math.sin(az), Math.cos(el) * Math.cos(az), Math.sin(el)];
  const { along, zero, toward } = axisTriad(kind, degToRad(latitudeDeg));
  return anglesOf(dot(seen, along), dot(seen, zero), dot(seen, toward));
}

/** Angles of a direction by its parts along the end of the first axis, toward where both stand at 0°, and where the first stands at 90°. */
export function anglesOf(along: number, zero: number, toward: number): AxisAngles {
  return {
    firstDeg: radToDeg(Math.atan2(toward, zero)),
    secondDeg: radToDeg(Math.atan2(along, Math.sqrt(zero * zero + toward * toward))),
  };
}
