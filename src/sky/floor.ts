import { degToRad } from '../units/angle';
import { horizonElevationDeg, prepareHorizon } from './horizon';
import type { Horizon } from './horizon';
import type { SiteFrame } from './site';
import type { HorizonPoint } from './types';

/**
 * The lowest elevation all round a station, the stricter of mask and limit, cut into arcs along which declination only
 * rises or only falls: a source of any declination crosses an arc once or not at all.
 */
export type Floor = {
  site: SiteFrame;
  sinLat: number;
  cosLat: number;
  /** arc k runs from corner k to corner k + 1, azimuth rising through one turn; the last corner is the first again */
  azimuthRad: Float64Array;
  elevationRad: Float64Array;
  /** sine of the declination at each corner */
  sinDec: Float64Array;
  northRad: number;
  southRad: number;
  horizon: Horizon;
  /** the limit that holds where the mask is lower */
  lowestDeg: number;
};

type Corner = { azimuthRad: number; elevationRad: number };

/** Where the sine of declination changes by less than this there is nothing to tell apart. */
const LEAST_CHANGE = 1e-12;
const ROOT_STEPS = 60;
const ROOT = 1e-10;

/**
 * A mask and a lowest elevation made ready for many sources.
 *
 * @param lowestDeg  [-90, 90]
 * @param points     corners of the mask; none is no mask
 * @returns the floor, or the one elevation in degrees where it is level all round
 * @throws RangeError if a corner is not finite or its elevation outside ±90° (programmer error)
 *
 * Error   ends of arcs ≤ 10⁻¹⁵ in the sine of declination
 * Source  sin δ = sin φ sin h + cos φ cos h cos A along each side of the mask; its turns by Newton's rule
 */
export function prepareFloor(
  site: SiteFrame,
  lowestDeg: number,
  points: readonly HorizonPoint[] | undefined,
): Floor | number {
  const horizon = prepareHorizon(points);
  if (!horizon || horizon.highestDeg <= lowestDeg) return lowestDeg;
  if (horizon.lowestDeg === horizon.highestDeg) return horizon.highestDeg;
  const [sinLat, cosLat] = [Math.sin(site.latitudeRad), Math.cos(site.latitudeRad)];
  const sides = raised(horizon, degToRad(lowestDeg));
  const corners = sides.flatMap((from, index) => {
    const to = sides[index + 1];
    return to ? [from, ...turnsAlong(sinLat, cosLat, from, to)] : [from];
  });
  const sinDec = corners.map(
    ({ azimuthRad, elevationRad }) =>
      sinLat * Math.sin(elevationRad) + cosLat * Math.cos(elevationRad) * Math.cos(azimuthRad),
  );
  // round the turn the same corner, so the same number
  sinDec[sinDec.length - 1] = sinDec[0] ?? NaN;
  const at = (azimuthDeg: number) =>
    Math.max(degToRad(lowestDeg), degToRad(horizonElevationDeg(horizon, azimuthDeg)));
  return {
    site,
    sinLat,
    cosLat,
    azimuthRad: Float64Array.from(corners, ({ azimuthRad }) => azimuthRad),
    elevationRad: Float64Array.from(corners, ({ elevationRad }) => elevationRad),
    sinDec: Float64Array.from(sinDec),
    northRad: at(0),
    southRad: at(180),
    horizon,
    lowestDeg,
  };
}

/** The corners of the mask through one turn, raised to the lowest elevation, with a corner where it dips below. */
function raised({ corners }: Horizon, lowestRad: number): Corner[] {
  const found: Corner[] = [];
  // the first of the mask's corners is the last one a turn earlier
  corners.slice(1).forEach((corner, index, all) => {
    const here = radiansOf(corner);
    const before = all[index - 1];
    const crossing = before && crossingAt(radiansOf(before), here, lowestRad);
    if (crossing) found.push(crossing);
    const lifted = { ...here, elevationRad: Math.max(here.elevationRad, lowestRad) };
    found.push(lifted);
  });
  return found.filter((corner, index) => {
    const [before, after] = [found[index - 1], found[index + 1]];
    return !(
      before?.elevationRad === lowestRad &&
      corner.elevationRad === lowestRad &&
      after?.elevationRad === lowestRad
    );
  });
}

function crossingAt(from: Corner, to: Corner, levelRad: number): Corner | null {
  const [below, above] = [from.elevationRad - levelRad, to.elevationRad - levelRad];
  if (below * above >= 0) return null;
  const along = below / (below - above);
  return { azimuthRad: from.azimuthRad + along * (to.azimuthRad - from.azimuthRad), elevationRad: levelRad };
}

function radiansOf({ azimuthDeg, elevationDeg }: HorizonPoint): Corner {
  return { azimuthRad: degToRad(azimuthDeg), elevationRad: degToRad(elevationDeg) };
}

/** Points between two corners at which declination turns. */
function turnsAlong(sinLat: number, cosLat: number, from: Corner, to: Corner): Corner[] {
  const byAz = to.azimuthRad - from.azimuthRad;
  const byEl = to.elevationRad - from.elevationRad;
  const slope = (along: number) => {
    const [az, el] = [from.azimuthRad + along * byAz, from.elevationRad + along * byEl];
    return (
      byEl * (sinLat * Math.cos(el) - cosLat * Math.sin(el) * Math.cos(az)) -
      byAz * cosLat * Math.cos(el) * Math.sin(az)
    );
  };
  const bend = (along: number) => {
    const [az, el] = [from.azimuthRad + along * byAz, from.elevationRad + along * byEl];
    const level = cosLat * Math.cos(el) * Math.cos(az);
    return (
      2 * byEl * byAz * cosLat * Math.sin(el) * Math.sin(az) -
      byEl * byEl * (sinLat * Math.sin(el) + level) -
      byAz * byAz * level
    );
  };
  const [rising, way] = [Math.abs(byEl), Math.abs(byEl) + Math.abs(byAz)];
  const bound = (order: number) => Math.abs(sinLat) * rising ** order + cosLat * way ** order;
  const found: number[] = [];
  addRoots({ slope, bend, mostBend: bound(2), mostChange: bound(3) }, 0, 1, found);
  return found.map((along) => ({
    azimuthRad: from.azimuthRad + along * byAz,
    elevationRad: from.elevationRad + along * byEl,
  }));
}

/** First and second derivative of declination's sine along a side, with bounds on the second and third. */
type Shape = {
  slope: (along: number) => number;
  bend: (along: number) => number;
  mostBend: number;
  mostChange: number;
};

/**
 * Roots of a slope strictly between two points, rising: a stretch is halved until its bounds say that there is none, or
 * that the slope only rises or only falls.
 */
function addRoots(shape: Shape, left: number, right: number, into: number[]): void {
  const { slope, bend, mostBend, mostChange } = shape;
  const length = right - left;
  const [atLeft, atRight] = [slope(left), slope(right)];
  if (Math.abs(atLeft) > mostBend * length || Math.abs(atRight) > mostBend * length) return;
  if (mostBend * length * length < LEAST_CHANGE) return;
  if (Math.abs(bend(left)) > mostChange * length) {
    if (atLeft * atRight < 0) into.push(rootBetween(slope, bend, left, right, atLeft < 0));
    return;
  }
  const middle = (left + right) / 2;
  addRoots(shape, left, middle, into);
  if (slope(middle) === 0) into.push(middle);
  addRoots(shape, middle, right, into);
}

/** By Newton's rule within a closing bracket. */
function rootBetween(
  f: (x: number) => number,
  derivative: (x: number) => number,
  left: number,
  right: number,
  isRising: boolean,
): number {
  let [low, high, at] = [left, right, (left + right) / 2];
  for (let step = 0; step < ROOT_STEPS; step += 1) {
    const value = f(at);
    if (value < 0 === isRising) low = at;
    else high = at;
    let next = at - value / derivative(at);
    if (!(next > low && next < high)) next = (low + high) / 2;
    if (Math.abs(next - at) < ROOT) return next;
    at = next;
  }
  return at;
}
