/** Cartesian triple; the unit and frame are those of its owner. */
export type Vector3 = readonly [number, number, number];

/** Rows of a 3 × 3 rotation. */
export type Matrix3 = readonly [Vector3, Vector3, Vector3];

export function dot(a: Vector3, b: Vector3): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

export function cross(a: Vector3, b: Vector3): Vector3 {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}

export function norm(a: Vector3): number {
  return Math.hypot(a[0], a[1], a[2]);
}

export function scale(a: Vector3, factor: number): Vector3 {
  return [a[0] * factor, a[1] * factor, a[2] * factor];
}

export function add(a: Vector3, b: Vector3): Vector3 {
  return [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
}

export function subtract(a: Vector3, b: Vector3): Vector3 {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
}

/**
 * The direction of a vector.
 *
 * @throws RangeError if the vector has no length (programmer error)
 */
export function unit(a: Vector3): Vector3 {
  const length = norm(a);
  if (!(length > 0)) throw new RangeError('A vector without length has no direction');
  return scale(a, 1 / length);
}

/** Matrix times column vector. */
export function rotate(m: Matrix3, a: Vector3): Vector3 {
  return [dot(m[0], a), dot(m[1], a), dot(m[2], a)];
}

/** Transposed matrix times column vector: the inverse rotation. */
export function rotateBack(m: Matrix3, a: Vector3): Vector3 {
  return [
    m[0][0] * a[0] + m[1][0] * a[1] + m[2][0] * a[2],
    m[0][1] * a[0] + m[1][1] * a[1] + m[2][1] * a[2],
    m[0][2] * a[0] + m[1][2] * a[1] + m[2][2] * a[2],
  ];
}

/**
 * The vector's components after its frame has turned about the third axis.
 *
 * @param angleRad  positive turns the frame from the first axis toward the second
 */
export function turnAboutZ(a: Vector3, angleRad: number): Vector3 {
  const c = Math.cos(angleRad);
  const s = Math.sin(angleRad);
  return [a[0] * c + a[1] * s, a[1] * c - a[0] * s, a[2]];
}

/**
 * Angle between two vectors, by the arctangent form (no loss near 0 and π).
 *
 * @returns radians [0, π]
 */
export function angleBetween(a: Vector3, b: Vector3): number {
  return Math.atan2(norm(cross(a, b)), dot(a, b));
}

/**
 * Unit vector of a longitude-like and a latitude-like angle.
 *
 * @param longitudeRad  from the first axis toward the second
 * @param latitudeRad   toward the third axis
 */
export function directionOf(longitudeRad: number, latitudeRad: number): Vector3 {
  const c = Math.cos(latitudeRad);
  return [c * Math.cos(longitudeRad), c * Math.sin(longitudeRad), Math.sin(latitudeRad)];
}
