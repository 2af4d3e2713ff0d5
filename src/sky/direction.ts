import { degToRad, normalise360, radToDeg } from '../units/angle';
import { add, directionOf, dot, rotate, scale, turnAboutZ, unit } from '../units/vector';
import type { Vector3 } from '../units/vector';
import type { EarthFrame } from './engine';
import type { SiteFrame } from './site';
import type { AzEl, SkyPosition } from './types';

/**
 * Unit vector of a catalogue place.
 *
 * @param source  ICRS: raDeg any finite angle, decDeg [-90, 90]
 * @throws RangeError if an input is not finite or out of range (programmer error)
 */
export function catalogueDirection(source: SkyPosition): Vector3 {
  if (!Number.isFinite(source.raDeg))
    throw new RangeError(`Right ascension is not a number: ${source.raDeg}`);
  if (!(Math.abs(source.decDeg) <= 90)) throw new RangeError(`Declination outside ±90°: ${source.decDeg}`);
  return directionOf(degToRad(source.raDeg), degToRad(source.decDeg));
}

/**
 * A direction as an observer moving with the given velocity sees it.
 *
 * @param direction  unit vector at rest
 * @param velocity   of the observer, in units of c, same axes
 * @returns unit vector
 *
 * Source  special relativity; Explanatory Supplement 3rd ed. 2013, ch. 7 (memory); the same form as ERFA ab, without its
 *         solar-potential term (0.4 µas)
 */
export function aberrated(direction: Vector3, velocity: Vector3): Vector3 {
  const along = dot(direction, velocity);
  const inverseGamma = Math.sqrt(1 - dot(velocity, velocity));
  return unit(add(scale(direction, inverseGamma), scale(velocity, 1 + along / (1 + inverseGamma))));
}

/** Geocentric apparent direction of a catalogue place, ICRS axes: annual aberration only. */
export function apparentIcrs(source: SkyPosition, frame: EarthFrame): Vector3 {
  return aberrated(catalogueDirection(source), frame.velocity);
}

/** Geocentric apparent direction of a catalogue place on the true equator and equinox of date. */
export function apparentOfDate(source: SkyPosition, frame: EarthFrame): Vector3 {
  return rotate(frame.icrsToDate, apparentIcrs(source, frame));
}

/**
 * The same for loops over sources: of a catalogue direction, written into an array.
 *
 * @param direction  from catalogueDirection
 * @param at         index at which the three components begin
 *
 * Error   as apparentOfDate, to rounding
 */
export function placeOfDate(direction: Vector3, frame: EarthFrame, into: Float64Array, at: number): void {
  const [x, y, z] = direction;
  const [vx, vy, vz] = frame.velocity;
  const [first, second, third] = frame.icrsToDate;
  const inverseGamma = Math.sqrt(1 - (vx * vx + vy * vy + vz * vz));
  const byVelocity = 1 + (x * vx + y * vy + z * vz) / (1 + inverseGamma);
  const ax = x * inverseGamma + vx * byVelocity;
  const ay = y * inverseGamma + vy * byVelocity;
  const az = z * inverseGamma + vz * byVelocity;
  const shrink = 1 / Math.sqrt(ax * ax + ay * ay + az * az);
  into[at] = shrink * (first[0] * ax + first[1] * ay + first[2] * az);
  into[at + 1] = shrink * (second[0] * ax + second[1] * ay + second[2] * az);
  into[at + 2] = shrink * (third[0] * ax + third[1] * ay + third[2] * az);
}

/** The same direction on Earth-fixed axes (no polar motion). */
export function earthFixed(ofDate: Vector3, gastRad: number): Vector3 {
  return turnAboutZ(ofDate, gastRad);
}

/** Azimuth and elevation of an Earth-fixed geocentric direction, diurnal aberration added. */
export function horizontal(direction: Vector3, site: SiteFrame): AzEl {
  const east = dot(direction, site.east) + site.eastSpeed;
  const north = dot(direction, site.north);
  const up = dot(direction, site.up);
  return {
    azimuthDeg: normalise360(radToDeg(Math.atan2(east, north))),
    elevationDeg: radToDeg(Math.atan2(up, Math.hypot(east, north))),
  };
}
