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

/** Az–el mount; the azimuth range is that of the cable, so it may exceed one turn. */
export type AzElMount = {
  kind: 'az-el';
  azimuth: Axis & { minDeg: number; maxDeg: number };
  elevation: Axis & { minDeg: number; maxDeg: number };
  settleSeconds: number;
};

export type Mount = AzElMount;

/** Where a dish points and which turn of the cable it is on. */
export type Pointing = AzEl & { motorAzimuthDeg: number };

export type SkyStation = {
  site: Geodetic;
  minElevationDeg: number;
  maxElevationDeg?: number;
  horizon?: HorizonPoint[];
  sunLimitDeg?: number;
};

export type { Interval };
