import type { SheetPoint } from './scene';

/** A straight line between two points of the sheet, millimetres. */
export type Line = readonly [SheetPoint, SheetPoint];
export type Box = readonly [left: number, top: number, right: number, bottom: number];

/** Distance in millimetres from a point to the line between two others. */
export function distanceToLine(point: SheetPoint, from: SheetPoint, to: SheetPoint): number {
  const dx = to[0] - from[0];
  const dy = to[1] - from[1];
  const square = dx * dx + dy * dy;
  const along =
    square === 0
      ? 0
      : Math.max(0, Math.min(1, ((point[0] - from[0]) * dx + (point[1] - from[1]) * dy) / square));
  return Math.hypot(point[0] - from[0] - along * dx, point[1] - from[1] - along * dy);
}

/** True where a line comes nearer than `gapMm` to a box. */
export function comesNear(box: Box, [from, to]: Line, gapMm: number): boolean {
  const left = box[0] - gapMm;
  const top = box[1] - gapMm;
  const right = box[2] + gapMm;
  const bottom = box[3] + gapMm;
  if ((from[0] < left && to[0] < left) || (from[0] > right && to[0] > right)) return false;
  if ((from[1] < top && to[1] < top) || (from[1] > bottom && to[1] > bottom)) return false;
  const side = (x: number, y: number): number =>
    Math.sign((to[0] - from[0]) * (y - from[1]) - (to[1] - from[1]) * (x - from[0]));
  const first = side(left, top);
  if (first === side(right, top) && first === side(left, bottom) && first === side(right, bottom)) {
    return first === 0 && distanceToLine([left, top], from, to) === 0;
  }
  return true;
}

/** What is left of a line outside a set of boxes, each grown by `gapMm`, in order along the line. */
export function piecesOutside([from, to]: Line, boxes: readonly Box[], gapMm: number): Line[] {
  const hidden: [number, number][] = [];
  for (const box of boxes) {
    const span = spanInside([from, to], box, gapMm);
    if (span !== null) hidden.push(span);
  }
  hidden.sort((one, other) => one[0] - other[0]);
  const at = (share: number): SheetPoint => [
    from[0] + (to[0] - from[0]) * share,
    from[1] + (to[1] - from[1]) * share,
  ];
  const pieces: Line[] = [];
  let start = 0;
  for (const [enter, leave] of hidden) {
    if (enter > start) pieces.push([at(start), at(enter)]);
    start = Math.max(start, leave);
  }
  if (start < 1) pieces.push([at(start), to]);
  return pieces;
}

/** The shares of a line's length at which it enters and leaves a grown box (clipping after Liang & Barsky 1984). */
function spanInside(
  [from, to]: Line,
  [left, top, right, bottom]: Box,
  gapMm: number,
): [number, number] | null {
  if (
    (from[0] < left - gapMm && to[0] < left - gapMm) ||
    (from[0] > right + gapMm && to[0] > right + gapMm)
  ) {
    return null;
  }
  if (
    (from[1] < top - gapMm && to[1] < top - gapMm) ||
    (from[1] > bottom + gapMm && to[1] > bottom + gapMm)
  ) {
    return null;
  }
  let enter = 0;
  let leave = 1;
  for (const [start, step, low, high] of [
    [from[0], to[0] - from[0], left - gapMm, right + gapMm],
    [from[1], to[1] - from[1], top - gapMm, bottom + gapMm],
  ] as const) {
    if (step === 0) {
      if (start < low || start > high) return null;
      continue;
    }
    const one = (low - start) / step;
    const other = (high - start) / step;
    enter = Math.max(enter, Math.min(one, other));
    leave = Math.min(leave, Math.max(one, other));
  }
  return enter < leave ? [enter, leave] : null;
}
