import type { Orientation } from './request';

/**
 * Takes (east, north) on the flat sky to (right, down) on the sheet: right = a·east + b·north,
 * down = c·east + d·north. Its columns are unit vectors at right angles, so it only turns and mirrors.
 */
export interface Turn {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
}

/**
 * The turn for an instrument. Upright at angle 0 has north up and east left, as the sky is seen from below.
 * `upAngleRad` is the direction, from north through east, that an upright sheet has at its top; rotated turns
 * that picture half round, mirrored exchanges its left and right.
 */
export function turnFor(orientation: Orientation, upAngleRad: number): Turn {
  const sin = Math.sin(upAngleRad);
  const cos = Math.cos(upAngleRad);
  const upright: Turn = { a: -cos, b: sin, c: -sin, d: -cos };
  if (orientation === 'rotated') return { a: -upright.a, b: -upright.b, c: -upright.c, d: -upright.d };
  if (orientation === 'mirrored') return { a: -upright.a, b: -upright.b, c: upright.c, d: upright.d };
  return upright;
}

/** Undoes a turn: (right, down) back to (east, north). The inverse of such a matrix is its transpose. */
export function turnedBack(turn: Turn, right: number, down: number): { east: number; north: number } {
  return { east: turn.a * right + turn.c * down, north: turn.b * right + turn.d * down };
}

/** The angle on the sheet, radians from right through down, of a position angle counted north through east. */
export function sheetAngle(turn: Turn, positionAngleRad: number): number {
  const east = Math.sin(positionAngleRad);
  const north = Math.cos(positionAngleRad);
  return Math.atan2(turn.c * east + turn.d * north, turn.a * east + turn.b * north);
}
