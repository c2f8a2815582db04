/** A place or direction in space; the frame and unit are said where one is used. */
export type Vector = readonly [number, number, number];

export function dot(a: Vector, b: Vector): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

export function cross(a: Vector, b: Vector): Vector {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}

export function norm(a: Vector): number {
  return Math.hypot(a[0], a[1], a[2]);
}

export function scale(a: Vector, factor: number): Vector {
  return [a[0] * factor, a[1] * factor, a[2] * factor];
}

export function add(a: Vector, b: Vector): Vector {
  return [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
}

export function subtract(a: Vector, b: Vector): Vector {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
}

/** The direction of a vector that is not zero. */
export function unit(a: Vector): Vector {
  return scale(a, 1 / norm(a));
}

/** What is left of a vector when its part along a unit vector is taken away. */
export function rejected(a: Vector, along: Vector): Vector {
  return subtract(a, scale(along, dot(a, along)));
}

/** Angle between two vectors, radians in [0, π]; exact for small and for nearly opposite directions. */
export function separation(a: Vector, b: Vector): number {
  return Math.atan2(norm(cross(a, b)), dot(a, b));
}

/** A vector from longitude and latitude (or right ascension and declination), radians, and length. */
export function fromSpherical(lonRad: number, latRad: number, distance = 1): Vector {
  const c = Math.cos(latRad) * distance;
  return [c * Math.cos(lonRad), c * Math.sin(lonRad), Math.sin(latRad) * distance];
}

/** Longitude in [0, 2π), latitude in [-π/2, π/2] and length of a vector. */
export function toSpherical(a: Vector): {
  readonly lonRad: number;
  readonly latRad: number;
  readonly distance: number;
} {
  const lon = Math.atan2(a[1], a[0]);
  return {
    lonRad: lon < 0 ? lon + 2 * Math.PI : lon,
    latRad: Math.atan2(a[2], Math.hypot(a[0], a[1])),
    distance: norm(a),
  };
}

/** A rotation as its three rows. */
export type Matrix = readonly [Vector, Vector, Vector];

export function rotate(matrix: Matrix, a: Vector): Vector {
  return [dot(matrix[0], a), dot(matrix[1], a), dot(matrix[2], a)];
}

/** The inverse of a rotation, applied. */
export function rotateBack(matrix: Matrix, a: Vector): Vector {
  return add(add(scale(matrix[0], a[0]), scale(matrix[1], a[1])), scale(matrix[2], a[2]));
}
