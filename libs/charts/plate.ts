import { type Turn, turnedBack } from './orientation';
import { halfWidthOf, type Projection, type SkyPoint } from './projection';
import type { Frame, SheetPoint } from './scene';

/** Sky to sheet and back, within a frame. */
export interface Plate {
  readonly frame: Frame;
  readonly xMm: number;
  readonly yMm: number;
  readonly mmPerRadian: number;
  readonly turn: Turn;
  readonly projection: Projection;
  /** Null where the projection cannot show the place; it may lie outside the frame. */
  readonly toSheet: (point: SkyPoint) => SheetPoint | null;
  readonly toSky: (xMm: number, yMm: number) => SkyPoint;
  /** The angle, radians, from the centre to the farthest corner of the frame. */
  readonly reachRad: number;
}

/** Lays a projection into a frame so that `fieldRad` fills its width. */
export function plateIn(frame: Frame, projection: Projection, turn: Turn, fieldRad: number): Plate {
  const round = frame.shape === 'circle';
  const halfWidth = round ? frame.radiusMm : frame.widthMm / 2;
  const halfHeight = round ? frame.radiusMm : frame.heightMm / 2;
  const xMm = round ? frame.xMm : frame.xMm + halfWidth;
  const yMm = round ? frame.yMm : frame.yMm + halfHeight;
  const mmPerRadian = halfWidth / halfWidthOf(projection.kind, fieldRad);
  const corner = (round ? halfWidth : Math.hypot(halfWidth, halfHeight)) / mmPerRadian;
  return {
    frame,
    xMm,
    yMm,
    mmPerRadian,
    turn,
    projection,
    reachRad: projection.kind === 'stereographic' ? 2 * Math.atan(corner / 2) : Math.atan(corner),
    toSheet: ({ raRad, decRad }) => {
      const flat = projection.forward(raRad, decRad);
      if (flat === null) return null;
      return [
        xMm + mmPerRadian * (turn.a * flat.x + turn.b * flat.y),
        yMm + mmPerRadian * (turn.c * flat.x + turn.d * flat.y),
      ];
    },
    toSky: (x, y) => {
      const { east, north } = turnedBack(turn, (x - xMm) / mmPerRadian, (y - yMm) / mmPerRadian);
      return projection.inverse(east, north);
    },
  };
}

/** True where a point lies in the frame and at least `marginMm` from its edge. */
export function isInside(frame: Frame, xMm: number, yMm: number, marginMm: number): boolean {
  if (frame.shape === 'circle') {
    return Math.hypot(xMm - frame.xMm, yMm - frame.yMm) <= frame.radiusMm - marginMm;
  }
  return (
    xMm >= frame.xMm + marginMm &&
    xMm <= frame.xMm + frame.widthMm - marginMm &&
    yMm >= frame.yMm + marginMm &&
    yMm <= frame.yMm + frame.heightMm - marginMm
  );
}
