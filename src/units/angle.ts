export const RAD_PER_DEG = Math.PI / 180;
export const DEG_PER_RAD = 180 / Math.PI;
export const ARCSEC_PER_DEG = 3600;

/** Degrees to radians. */
export function degToRad(deg: number): number {
  return deg * RAD_PER_DEG;
}

/** Radians to degrees. */
export function radToDeg(rad: number): number {
  return rad * DEG_PER_RAD;
}

/**
 * An angle brought into one turn from zero.
 *
 * @param deg  any finite angle
 * @returns [0, 360)
 */
export function normalise360(deg: number): number {
  const turned = deg % 360;
  const positive = turned < 0 ? turned + 360 : turned;
  return positive >= 360 ? 0 : positive + 0;
}

/**
 * An angle brought into one turn about zero: the short way round.
 *
 * @param deg  any finite angle
 * @returns [-180, 180)
 */
export function normalise180(deg: number): number {
  return normalise360(deg + 180) - 180;
}

/**
 * Great-circle angle between two directions given by longitude-like and latitude-like angles.
 *
 * @param a  longitudeDeg (right ascension, azimuth), latitudeDeg (declination, elevation)
 * @param b  the other direction, in the same frame
 * @returns degrees [0, 180]
 *
 * Error   1e-13° at any separation (arctangent form, no loss near 0° or 180°)
 * Source  Vincenty, Survey Review 23, 88 (1975), spherical case
 */
export function angularSeparationDeg(
  a: { longitudeDeg: number; latitudeDeg: number },
  b: { longitudeDeg: number; latitudeDeg: number },
): number {
  const step = degToRad(b.longitudeDeg - a.longitudeDeg);
  const latA = degToRad(a.latitudeDeg);
  const latB = degToRad(b.latitudeDeg);
  const across = Math.cos(latB) * Math.sin(step);
  const along = Math.cos(latA) * Math.sin(latB) - Math.sin(latA) * Math.cos(latB) * Math.cos(step);
  const cosine = Math.sin(latA) * Math.sin(latB) + Math.cos(latA) * Math.cos(latB) * Math.cos(step);
  return radToDeg(Math.atan2(Math.hypot(across, along), cosine));
}

/**
 * Position angle of one direction as seen from another: from north through east.
 *
 * @param from  where it is measured; at a pole, north is along the meridian of its longitude
 * @param to    the other direction, in the same frame
 * @returns degrees [0, 360); 0 where both are the same
 *
 * Error   1e-13° but for directions closer than 1e-9°, or opposite ones
 * Source  spherical triangle with the pole (science)
 */
export function positionAngleDeg(
  from: { longitudeDeg: number; latitudeDeg: number },
  to: { longitudeDeg: number; latitudeDeg: number },
): number {
  const step = degToRad(to.longitudeDeg - from.longitudeDeg);
  const latFrom = degToRad(from.latitudeDeg);
  const latTo = degToRad(to.latitudeDeg);
  const east = Math.cos(latTo) * Math.sin(step);
  const north = Math.cos(latFrom) * Math.sin(latTo) - Math.sin(latFrom) * Math.cos(latTo) * Math.cos(step);
  return normalise360(radToDeg(Math.atan2(east, north)));
}
