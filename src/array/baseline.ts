import { normalise180 } from '../units/angle';
import type { Vector3 } from '../units/vector';
import type { Geodetic, Itrf } from '../sky/types';

export type BaselineEnd = { code: string; site: Geodetic };

/** Two ends in their standing order: first is the western one. */
export type Baseline<S extends BaselineEnd> = { first: S; second: S };

/**
 * Vector from the first to the second station.
 *
 * @returns metres, Earth-fixed axes: second − first
 *
 * Source  TMS ch. 4
 */
export function baselineVector(first: Itrf, second: Itrf): Vector3 {
  return [second.x - first.x, second.y - first.y, second.z - first.z];
}

/** Length of a baseline in metres (the chord). */
export function baselineLengthM(first: Itrf, second: Itrf): number {
  return Math.hypot(...baselineVector(first, second));
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
