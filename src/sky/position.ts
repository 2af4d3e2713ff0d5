import { normalise360, radToDeg } from '../units/angle';
import { ASTRONOMICAL_UNIT_M } from '../units/constants';
import { angleBetween, rotateBack, scale, subtract, turnAboutZ } from '../units/vector';
import { apparentIcrs, apparentOfDate, earthFixed, horizontal } from './direction';
import { earthFrameAt, moonVector, sunVector } from './engine';
import { geodeticToItrf, siteFrame } from './site';
import type { AzEl, Geodetic, SkyPosition } from './types';

/** dut1Seconds = UT1 − UTC, |dut1| < 0.9 s, default 0 (0.9 s is 13.5″ of rotation). */
export type RotationOptions = { dut1Seconds?: number };

/**
 * Azimuth and elevation of a fixed source seen from a site.
 *
 * @param source  ICRS place: raDeg [0, 360), decDeg [-90, 90]
 * @param site    latitudeDeg north +, longitudeDeg east +, heightM above WGS84
 * @param at      UTC; valid 1900–2100
 * @returns azimuthDeg [0, 360) north 0 east 90; elevationDeg, geometric (no refraction)
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.1″ against ERFA atco13 (tests/sky/position.test.ts); limits as earthFrameAt
 * Source  precession, nutation, sidereal time: astronomy-engine; annual and diurnal aberration: Explanatory
 *         Supplement 3rd ed. 2013, ch. 7; sign conventions as ERFA hd2ae
 */
export function azEl(source: SkyPosition, site: Geodetic, at: Date, opts: RotationOptions = {}): AzEl {
  const frame = earthFrameAt(at.getTime(), opts.dut1Seconds);
  return horizontal(earthFixed(apparentOfDate(source, frame), frame.gastRad), siteFrame(site));
}

/**
 * Angle at the source from the north of date toward the zenith, positive after transit.
 *
 * @param source  ICRS place
 * @param site    geodetic place
 * @param at      UTC; valid 1900–2100
 * @returns degrees (-180, 180]; from the north of J2000 it differs by tenths of a degree, more near the poles
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.002° against ERFA hd2pa where el < 89° (tests/sky/position.test.ts); diurnal aberration is left out
 *         (0.3″ / tan of the zenith distance)
 * Source  spherical triangle (sign as ERFA hd2pa), both arguments times cos φ so that it holds at the Earth's poles
 */
export function parallacticAngleDeg(
  source: SkyPosition,
  site: Geodetic,
  at: Date,
  opts: RotationOptions = {},
): number {
  const frame = earthFrameAt(at.getTime(), opts.dut1Seconds);
  const { latitudeRad, longitudeRad } = siteFrame(site);
  const local = turnAboutZ(apparentOfDate(source, frame), frame.gastRad + longitudeRad);
  const hourAngle = -Math.atan2(local[1], local[0]);
  const cosDec = Math.hypot(local[0], local[1]);
  const cosLat = Math.cos(latitudeRad);
  return radToDeg(
    Math.atan2(
      cosLat * Math.sin(hourAngle),
      Math.sin(latitudeRad) * cosDec - cosLat * local[2] * Math.cos(hourAngle),
    ),
  );
}

/**
 * Greenwich mean sidereal time.
 *
 * @param at  UTC; valid 1900–2100
 * @returns hours [0, 24)
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 1e-7° against ERFA gmst06 (tests/sky/position.test.ts)
 * Source  IAU 2006 (Capitaine, Wallace & Chapront, A&A 412, 567, 2003), as astronomy-engine's apparent time less its
 *         equation of the equinoxes
 */
export function gmstHours(at: Date, opts: RotationOptions = {}): number {
  const frame = earthFrameAt(at.getTime(), opts.dut1Seconds);
  return normalise360(radToDeg(frame.gastRad - frame.equationOfEquinoxesRad)) / 15;
}

/**
 * Angle between a source and the centre of the Sun, both as seen from the geocentre.
 *
 * @param source  ICRS place; annual aberration is applied to it as to the Sun
 * @param at      UTC; valid 1900–2100
 * @returns degrees [0, 180]; the Sun's parallax (9″) is left out
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.001° against ERFA epv00 by way of astropy (tests/sky/position.test.ts)
 * Source  astronomy-engine (VSOP87 truncated)
 */
export function sunSeparationDeg(source: SkyPosition, at: Date): number {
  const frame = earthFrameAt(at.getTime());
  return radToDeg(angleBetween(apparentIcrs(source, frame), sunVector(at.getTime())));
}

/**
 * Angle between a source and the centre of the Moon.
 *
 * @param source  ICRS place; annual aberration is applied
 * @param at      UTC; valid 1900–2100
 * @param site    where the Moon is seen from; without it the geocentre, up to 1° away
 * @returns degrees [0, 180]
 * @throws RangeError if an input is not finite or out of range (programmer error)
 *
 * Error   ≤ 0.005° against ERFA moon98 by way of astropy (tests/sky/position.test.ts)
 * Source  astronomy-engine (Montenbruck & Pfleger series); parallax by the geocentric vector of the site
 */
export function moonSeparationDeg(source: SkyPosition, at: Date, site?: Geodetic): number {
  const frame = earthFrameAt(at.getTime());
  const moon = moonVector(at.getTime());
  const direction = apparentIcrs(source, frame);
  if (!site) return radToDeg(angleBetween(direction, moon));
  const { x, y, z } = geodeticToItrf(site);
  const ofDate = turnAboutZ([x, y, z], -frame.gastRad);
  const observer = scale(rotateBack(frame.icrsToDate, ofDate), 1 / ASTRONOMICAL_UNIT_M);
  return radToDeg(angleBetween(direction, subtract(moon, observer)));
}
