import type { Interval } from '../units/time';

/** ICRS place: raDeg [0, 360), decDeg [-90, 90]. */
export type SkyPosition = { raDeg: number; decDeg: number };

/** WGS84: latitude north +, longitude east + (degrees), height above the ellipsoid (m). */
export type Geodetic = { latitudeDeg: number; longitudeDeg: number; heightM: number };

/** Earth-fixed Cartesian position, metres. */
export type Itrf = { x: number; y: number; z: number };

/** One corner of a horizon mask: piecewise linear in azimuth, wraps at 360°. */
export type HorizonPoint = { azimuthDeg: number; elevationDeg: number };

/** Azimuth north 0 through east 90; elevation geometric (no refraction). */
export type AzEl = { azimuthDeg: number; elevationDeg: number };

/** Drive of one axis, from rest to rest. */
export type Axis = { rateDegPerS: number; accelDegPerS2: number };

/** Az–el; equatorial (hour angle and declination); X–Y with its lower axis lying north–south or east–west. */
export type MountKind = 'az-el' | 'ha-dec' | 'xy-ns' | 'xy-ew';

/** Degrees, both ends within; maxDeg at least minDeg. */
export type AngleRange = { minDeg: number; maxDeg: number };

/**
 * What a mount keeps out of view. A limit that is absent does not bind; a mount with its drives fits as it is.
 *
 * azimuth     range of the motor: less than a turn leaves a dead zone
 * hourAngle   degrees, positive west of the meridian
 * x, y        x turns about the lower axis, y about the one that rides on it, both 0 at the zenith; xy-ns: x from the
 *             zenith toward east, y toward north; xy-ew: x toward north, y toward east
 * keyholeDeg  radius of the cone about the end of the lower axis: the zenith (az-el), north and south on the horizon
 *             (xy-ns), east and west (xy-ew)
 */
export type MountLimits =
  | { kind: 'az-el'; azimuth?: AngleRange; elevation?: AngleRange; keyholeDeg?: number }
  | { kind: 'ha-dec'; hourAngle?: AngleRange; declination?: AngleRange; keyholeDeg?: number }
  | { kind: 'xy-ns' | 'xy-ew'; x?: AngleRange; y?: AngleRange; keyholeDeg?: number };

/** An axis with its drive and what it reaches. */
export type DrivenAxis = Axis & AngleRange;

/** Az–el mount; the azimuth range is that of the cable, so it may exceed one turn. */
export type AzElMount = {
  kind: 'az-el';
  azimuth: DrivenAxis;
  elevation: DrivenAxis;
  settleSeconds: number;
};

/** Equatorial mount; hour angle in degrees, positive west of the meridian. */
export type HaDecMount = {
  kind: 'ha-dec';
  hourAngle: DrivenAxis;
  declination: DrivenAxis;
  settleSeconds: number;
};

/** X–Y mount; angles as MountLimits has them. */
export type XyMount = { kind: 'xy-ns' | 'xy-ew'; x: DrivenAxis; y: DrivenAxis; settleSeconds: number };

export type Mount = AzElMount | HaDecMount | XyMount;

/** Where a dish points, and the angle of the motor that turns its first axis: of az–el, the turn of the cable. */
export type Pointing = AzEl & { motorAzimuthDeg: number };

/** A station as the windows see it: limits in degrees of geometric elevation, both ends within. */
export type SkyStation = {
  site: Geodetic;
  minElevationDeg: number;
  maxElevationDeg?: number;
  horizon?: readonly HorizonPoint[];
  /** least distance from the Sun */
  sunLimitDeg?: number;
  mount?: MountLimits;
  /** times in which the station is not there */
  away?: readonly Interval[];
};

export type { Interval };
