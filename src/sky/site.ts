import { angularSeparationDeg, degToRad, radToDeg } from '../units/angle';
import { EARTH_ROTATION_RAD_PER_S, SPEED_OF_LIGHT, WGS84 } from '../units/constants';
import type { Vector3 } from '../units/vector';
import type { Geodetic, Itrf } from './types';

const A = WGS84.equatorialRadiusM;
const F = WGS84.flattening;
const E2 = F * (2 - F);
/** Below this radius latitude and height lose their meaning; no station stands there. */
const LEAST_RADIUS_M = 100_000;
/** Mean radius (2a + b)/3 of WGS84. Source: Moritz, Geodetic Reference System 1980, J. Geodesy 74, 128 (2000). */
export const MEAN_RADIUS_M = A * (1 - F / 3);

/**
 * Earth-fixed Cartesian position of a geodetic place.
 *
 * @param g  latitudeDeg [-90, 90] north +, longitudeDeg east +, heightM above WGS84
 * @returns metres; x toward the meridian of Greenwich, y toward 90° east, z toward north
 * @throws RangeError if an input is not finite or the latitude is out of range (programmer error)
 *
 * Error   ≤ 2e-6 m against ERFA gd2gc (tests/sky/site.test.ts; limited by the digits of the reference)
 * Source  NIMA TR8350.2, 3rd ed. 2000, eq. 4-14
 */
export function geodeticToItrf(g: Geodetic): Itrf {
  checkSite(g);
  const lat = degToRad(g.latitudeDeg);
  const lon = degToRad(g.longitudeDeg);
  const curvature = A / Math.sqrt(1 - E2 * Math.sin(lat) ** 2);
  const axisDistance = (curvature + g.heightM) * Math.cos(lat);
  return {
    x: axisDistance * Math.cos(lon),
    y: axisDistance * Math.sin(lon),
    z: (curvature * (1 - E2) + g.heightM) * Math.sin(lat),
  };
}

/**
 * Geodetic place of an Earth-fixed Cartesian position.
 *
 * @param p  metres, at least 100 km from the geocentre
 * @returns latitudeDeg [-90, 90]; longitudeDeg [-180, 180], 0 at the poles; heightM above WGS84
 * @throws RangeError if a coordinate is not finite or the place lies within 100 km of the geocentre
 *
 * Error   ≤ 1e-9° and 1e-4 m against ERFA gc2gd, to 36 000 km of height; round trip < 1 mm
 *         (tests/sky/site.test.ts)
 * Source  Bowring, Survey Review 23, 323 (1976), iterated on the reduced latitude
 */
export function itrfToGeodetic(p: Itrf): Geodetic {
  const radius = Math.hypot(p.x, p.y, p.z);
  if (!(Number.isFinite(radius) && radius >= LEAST_RADIUS_M)) {
    throw new RangeError(`Not a place outside the Earth's core: ${p.x}, ${p.y}, ${p.z}`);
  }
  const axisDistance = Math.hypot(p.x, p.y);
  const polarRadius = A * (1 - F);
  let lat = Math.atan2(p.z, axisDistance * (1 - E2));
  for (let step = 0; step < 6; step += 1) {
    const reduced = Math.atan2((1 - F) * Math.sin(lat), Math.cos(lat));
    lat = Math.atan2(
      p.z + (E2 / (1 - E2)) * polarRadius * Math.sin(reduced) ** 3,
      axisDistance - E2 * A * Math.cos(reduced) ** 3,
    );
  }
  const sin = Math.sin(lat);
  const heightM = axisDistance * Math.cos(lat) + p.z * sin - A * Math.sqrt(1 - E2 * sin * sin);
  return {
    latitudeDeg: radToDeg(lat),
    longitudeDeg: axisDistance === 0 ? 0 : radToDeg(Math.atan2(p.y, p.x)),
    heightM,
  };
}

/**
 * Great-circle distance of two places, on the sphere of the mean radius: heights and flattening are left out.
 *
 * @param a  geodetic place; its geodetic latitude is taken for the sphere's
 * @param b  the other
 * @returns metres [0, 20 015 115]
 * @throws RangeError if an input is not finite or the latitude is out of range (programmer error)
 *
 * Error   ≤ 0.57 % of the geodesic on WGS84 (along a meridian at the equator), ≤ 0.12 % from 10 000 km on
 *         (tests/sky/site.test.ts)
 * Source  spherical trigonometry, arctangent form: no loss for near or opposite places
 */
export function greatCircleM(a: Geodetic, b: Geodetic): number {
  checkSite(a);
  checkSite(b);
  return MEAN_RADIUS_M * degToRad(angularSeparationDeg(a, b));
}

/**
 * Straight distance of two places through the Earth: the length of their baseline.
 *
 * @returns metres
 * @throws RangeError if an input is not finite or the latitude is out of range (programmer error)
 *
 * Error   as geodeticToItrf
 */
export function chordM(a: Geodetic, b: Geodetic): number {
  const [from, to] = [geodeticToItrf(a), geodeticToItrf(b)];
  return Math.hypot(to.x - from.x, to.y - from.y, to.z - from.z);
}

/** A site made ready for many directions: its axes in the Earth-fixed frame and its speed of rotation. */
export type SiteFrame = {
  east: Vector3;
  north: Vector3;
  up: Vector3;
  longitudeRad: number;
  latitudeRad: number;
  /** eastward speed of the ground in units of c: diurnal aberration, radians */
  eastSpeed: number;
};

/**
 * The local axes of a site.
 *
 * @param g  geodetic place; the vertical is that of the ellipsoid (deflections of the vertical are left out: a
 *           mount's pointing model holds them)
 * @throws RangeError if an input is not finite or the latitude is out of range (programmer error)
 *
 * Source  TMS ch. 4; diurnal aberration: Explanatory Supplement 3rd ed. 2013, ch. 7 (memory)
 */
export function siteFrame(g: Geodetic): SiteFrame {
  const { x, y } = geodeticToItrf(g);
  const latitudeRad = degToRad(g.latitudeDeg);
  const longitudeRad = degToRad(g.longitudeDeg);
  const sinLat = Math.sin(latitudeRad);
  const cosLat = Math.cos(latitudeRad);
  const sinLon = Math.sin(longitudeRad);
  const cosLon = Math.cos(longitudeRad);
  return {
    east: [-sinLon, cosLon, 0],
    north: [-sinLat * cosLon, -sinLat * sinLon, cosLat],
    up: [cosLat * cosLon, cosLat * sinLon, sinLat],
    longitudeRad,
    latitudeRad,
    eastSpeed: (EARTH_ROTATION_RAD_PER_S * Math.hypot(x, y)) / SPEED_OF_LIGHT,
  };
}

function checkSite(g: Geodetic): void {
  if (!(Math.abs(g.latitudeDeg) <= 90)) throw new RangeError(`Latitude outside ±90°: ${g.latitudeDeg}`);
  if (!Number.isFinite(g.longitudeDeg)) throw new RangeError(`Longitude is not a number: ${g.longitudeDeg}`);
  if (!Number.isFinite(g.heightM)) throw new RangeError(`Height is not a number: ${g.heightM}`);
}
