import { geodeticToItrf, siteFrame } from '../sky/site';
import type { Geodetic, Itrf } from '../sky/types';
import { normalise180, normalise360, radToDeg } from '../units/angle';
import { dot } from '../units/vector';
import type { Vector3 } from '../units/vector';

export type BaselineEnd = { code: string; site: Geodetic };

/** Two ends in their standing order: first is the western one. */
export type Baseline<S extends BaselineEnd> = { first: S; second: S };

/**
 * Vector from the first to the second station.
 *
 * @returns metres, Earth-fixed axes: second − first; 0, 0, 0 where both stand at one place
 * @throws RangeError if a coordinate is not finite (programmer error)
 *
 * Source  TMS ch. 4
 */
export function baselineVector(first: Itrf, second: Itrf): Vector3 {
  const vector: Vector3 = [second.x - first.x, second.y - first.y, second.z - first.z];
  if (!vector.every(Number.isFinite)) throw new RangeError(`Not a baseline: ${vector.join(', ')}`);
  return vector;
}

/**
 * Length of a baseline in metres (the chord).
 *
 * @throws RangeError if a coordinate is not finite (programmer error)
 */
export function baselineLengthM(first: Itrf, second: Itrf): number {
  const [x, y, z] = baselineVector(first, second);
  return Math.hypot(x, y, z);
}

/** Where a baseline points, seen from its first station and on the sky. */
export type BaselineDirection = {
  lengthM: number;
  /** [0, 360), north 0 east 90; 0 where the second station is straight below */
  azimuthDeg: number;
  /** below 0 on the round Earth: the chord dips by half the angle between the stations */
  elevationDeg: number;
  /** of the point of the sky the baseline points at, of date [-90, 90] */
  declinationDeg: number;
  /** of that point, west of Greenwich [-180, 180): fixed, as the baseline turns with the Earth */
  greenwichHourAngleDeg: number;
};

/**
 * Length and direction of the chord from the first station to the second.
 *
 * @throws RangeError if an input is not finite or out of range, or both stand at one place (programmer error)
 *
 * Error   ≤ 1e-9° (tests/array/baseline.test.ts); the vertical is that of the ellipsoid
 * Source  TMS ch. 4
 */
export function baselineDirection(first: Geodetic, second: Geodetic): BaselineDirection {
  const vector = baselineVector(geodeticToItrf(first), geodeticToItrf(second));
  const [x, y, z] = vector;
  const lengthM = Math.hypot(x, y, z);
  if (!(lengthM > 0)) throw new RangeError('A baseline without length has no direction');
  const frame = siteFrame(first);
  const [east, north, up] = [dot(vector, frame.east), dot(vector, frame.north), dot(vector, frame.up)];
  return {
    lengthM,
    azimuthDeg: normalise360(radToDeg(Math.atan2(east, north))),
    elevationDeg: radToDeg(Math.atan2(up, Math.hypot(east, north))),
    declinationDeg: radToDeg(Math.atan2(z, Math.hypot(x, y))),
    greenwichHourAngleDeg: normalise180(-radToDeg(Math.atan2(y, x))),
  };
}

/**
 * Two stations in the order in which their baseline is stored, signed and labelled.
 *
 * @returns first = the western one (longitude −180…180, no thought of the date line), ties by code
 *
 * Source  definition of this project
 */
export function orderBaseline<S extends BaselineEnd>(a: S, b: S): Baseline<S> {
  return isBefore(a, b) ? { first: a, second: b } : { first: b, second: a };
}

/** All baselines of some stations, west to east by first, then by second; n(n − 1)/2 of them. */
export function baselinesOf<S extends BaselineEnd>(stations: readonly S[]): Baseline<S>[] {
  const ordered = [...stations].sort((a, b) => (isBefore(a, b) ? -1 : 1));
  return ordered.flatMap((first, index) => ordered.slice(index + 1).map((second) => ({ first, second })));
}

function isBefore(a: BaselineEnd, b: BaselineEnd): boolean {
  const [west, east] = [normalise180(a.site.longitudeDeg), normalise180(b.site.longitudeDeg)];
  return west === east ? a.code < b.code : west < east;
}
