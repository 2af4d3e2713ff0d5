import { DEG_PER_RAD } from '../units/angle';
import { add, cross, dot, scale } from '../units/vector';
import type { Vector3 } from '../units/vector';
import { anglesOf, axisTriad, type AxisAngles } from './axes';
import type { SiteFrame } from './site';
import type { MountKind } from './types';

/** A mount's axes as an az–el mount's of another place: unit vectors in the Earth-fixed frame. */
export type AxisFrame = {
  kind: MountKind;
  /** the end of the first axis, where the second stands at 90° */
  along: Vector3;
  /** where both stand at 0° */
  zero: Vector3;
  /** where the first stands at 90° and the second at 0° */
  toward: Vector3;
  /** diurnal aberration of a unit direction along, at zero and toward */
  shift: Vector3;
  /** longitude of the end of the first axis; of a pole that of the site's meridian */
  longitudeRad: number;
  /** sine of the angle of the first axis from the equator */
  sinTilt: number;
  /** whether the first angle grows (1) or falls with time where a source goes all the way round the axis */
  way: 1 | -1;
};

/** Nearer to the Earth's axis than this is on it: rounding. */
const POLE = 1e-15;

/**
 * The axes of a mount at a site.
 *
 * @param site  from siteFrame
 *
 * Source  definition of the axes (MountLimits)
 */
export function axisFrame(kind: MountKind, site: SiteFrame): AxisFrame {
  const triad = axisTriad(kind, site.latitudeRad);
  const fixed = ([east, north, up]: Vector3) =>
    add(add(scale(site.east, east), scale(site.north, north)), scale(site.up, up));
  const [along, zero, toward] = [fixed(triad.along), fixed(triad.zero), fixed(triad.toward)];
  const shift = scale([dot(along, site.east), dot(zero, site.east), dot(toward, site.east)], site.eastSpeed);
  const isRightHanded = dot(cross(zero, toward), along) > 0;
  const isPole = Math.abs(along[0]) + Math.abs(along[1]) < POLE;
  return {
    kind,
    along,
    zero,
    toward,
    shift,
    longitudeRad: isPole ? site.longitudeRad : Math.atan2(along[1], along[0]),
    sinTilt: along[2],
    way: along[2] < 0 === isRightHanded ? 1 : -1,
  };
}

/**
 * Angles of the axes toward an Earth-fixed geocentric direction, diurnal aberration added.
 *
 * @param direction  unit vector, as of trackDirection
 * @returns degrees; first (−180, 180], of az–el the azimuth [0, 360); second [-90, 90]
 *
 * Error   rounding of axisAngles of horizontal (tests/sky/axis-frame.test.ts)
 */
export function anglesToward(frame: AxisFrame, [x, y, z]: Vector3): AxisAngles {
  const { along, zero, toward, shift } = frame;
  const a = x * along[0] + y * along[1] + z * along[2] + shift[0];
  const b = x * zero[0] + y * zero[1] + z * zero[2] + shift[1];
  const c = x * toward[0] + y * toward[1] + z * toward[2] + shift[2];
  const { firstDeg, secondDeg } = anglesOf(a, b, c);
  // a hair west of north is north, not 360°
  return { firstDeg: frame.kind === 'az-el' && firstDeg < 0 ? (firstDeg + 360) % 360 : firstDeg, secondDeg };
}

/**
 * Speed of the first axis that keeps up with a source.
 *
 * @param direction  unit vector, as of trackDirection
 * @returns degrees for each radian that the Earth turns, either sign; without end at the end of the axis
 */
export function firstRate(frame: AxisFrame, [x, y, z]: Vector3): number {
  const { zero, toward, shift } = frame;
  const b = x * zero[0] + y * zero[1] + z * zero[2] + shift[1];
  const c = x * toward[0] + y * toward[1] + z * toward[2] + shift[2];
  const byB = y * zero[0] - x * zero[1];
  const byC = y * toward[0] - x * toward[1];
  return (DEG_PER_RAD * (byC * b - byB * c)) / (b * b + c * c);
}
