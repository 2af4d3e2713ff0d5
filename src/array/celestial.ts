import { degToRad } from '../units/angle';
import { EARTH_ROTATION_RAD_PER_S } from '../units/constants';
import { add, cross, dot, rotateBack, scale, turnAboutZ } from '../units/vector';
import type { Vector3 } from '../units/vector';
import { apparentIcrs, catalogueDirection } from '../sky/direction';
import { earthFrameAt } from '../sky/engine';
import type { RotationOptions } from '../sky/position';
import type { SkyPosition } from '../sky/types';

/** A baseline as the source sees it, ICRS axes. */
export type CelestialBaseline = {
  /** catalogue direction */
  source: Vector3;
  /** metres, turned with the aberrated direction into the catalogue one */
  vector: Vector3;
  /** metres per second of UT1, the same turn */
  velocity: Vector3;
};

/**
 * An Earth-fixed baseline on ICRS axes at an instant, annual aberration taken up.
 *
 * @param baseline  metres, Earth-fixed: second − first
 * @param source    ICRS place
 * @param at        UTC; valid 1900–2100
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   as baselineUvw
 * Source  the smallest rotation that carries the apparent direction into the catalogue one (Rodrigues); the turn of
 *         aberration in time (2·10⁻¹¹ rad/s) is left out of the velocity
 */
export function celestialBaseline(
  baseline: Vector3,
  source: SkyPosition,
  at: Date,
  opts: RotationOptions = {},
): CelestialBaseline {
  const frame = earthFrameAt(at.getTime(), opts.dut1Seconds);
  const ofDate = turnAboutZ(baseline, -frame.gastRad);
  const velocityOfDate = scale(cross([0, 0, 1], ofDate), EARTH_ROTATION_RAD_PER_S);
  const catalogue = catalogueDirection(source);
  const apparent = apparentIcrs(source, frame);
  const carried = (v: Vector3) => carry(rotateBack(frame.icrsToDate, v), apparent, catalogue);
  return { source: catalogue, vector: carried(ofDate), velocity: carried(velocityOfDate) };
}

/** Axes of a source on ICRS axes: u east, v north, w toward it. Source: TMS eq. 4.1. */
export function uvwAxes(source: SkyPosition): readonly [Vector3, Vector3, Vector3] {
  const toward = catalogueDirection(source);
  const [ra, dec] = [degToRad(source.raDeg), degToRad(source.decDeg)];
  const [sinRa, cosRa, sinDec, cosDec] = [Math.sin(ra), Math.cos(ra), Math.sin(dec), Math.cos(dec)];
  return [[-sinRa, cosRa, 0], [-sinDec * cosRa, -sinDec * sinRa, cosDec], toward];
}

/** Turns a vector by the smallest rotation that carries one unit vector into another. Source: Rodrigues. */
export function carry(v: Vector3, from: Vector3, to: Vector3): Vector3 {
  const axis = cross(from, to);
  const once = cross(axis, v);
  return add(v, add(once, scale(cross(axis, once), 1 / (1 + dot(from, to)))));
}
