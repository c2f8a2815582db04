import { distanceToLine, type Line } from './lines';
import type { Mark, SheetPoint } from './scene';

const widthPt = 1.2;
/** Clear paper between the ring and a dot beside it, millimetres. */
const clearMm = 0.35;
const smallestRadiusMm = 3.2;
/** Half of each of the four openings, degrees. */
const halfGapDeg = 14;
const tickMm = 2.4;

export interface TargetMark {
  readonly marks: readonly Mark[];
  /** Nothing may be written within this distance of the target. */
  readonly clearRadiusMm: number;
  /** The strokes outside the ring. */
  readonly strokes: readonly Line[];
}

interface Dot {
  readonly at: SheetPoint;
  readonly radiusMm: number;
}

/**
 * The target's mark: a ring open at its four diagonals, a short stroke pointing in through each opening from
 * outside. The radius is the one of a few that meets fewest dots; where a dot still stands in the way the ring
 * is opened for it, so that the mark hides no star.
 */
export function targetMark(
  at: SheetPoint,
  symbolRadiusMm: number,
  dots: readonly Dot[],
  of: string,
): TargetMark {
  const least = Math.max(smallestRadiusMm, symbolRadiusMm + 1.1);
  let radius = least;
  let fewest = Infinity;
  for (let tried = least; tried < least + 2.05; tried += 0.25) {
    const met = dots.filter((dot) => meets(dot, at, tried)).length;
    if (met < fewest) {
      fewest = met;
      radius = tried;
    }
  }
  const ring = { xMm: at[0], yMm: at[1], radiusMm: radius };
  const shared = {
    role: 'target',
    of,
    stroke: { widthPt, gray: 0 },
    fillGray: null,
    layer: 'over',
    clipped: true,
  } as const;
  const marks: Mark[] = arcsLeft(at, radius, dots).map(([fromDeg, toDeg]) => ({
    ...shared,
    shape: 'arc',
    ...ring,
    fromDeg,
    toDeg,
  }));
  const strokes: Line[] = [];
  for (const angleDeg of [45, 135, 225, 315]) {
    const angle = (angleDeg * Math.PI) / 180;
    const reach = (mm: number): SheetPoint => [at[0] + mm * Math.cos(angle), at[1] + mm * Math.sin(angle)];
    const from = reach(radius + 0.2);
    const to = reach(radius + tickMm);
    if (!dots.some((dot) => distanceToLine(dot.at, from, to) < dot.radiusMm + clearMm)) {
      marks.push({ ...shared, shape: 'polyline', points: [from, to] });
      strokes.push([from, to]);
    }
  }
  return { marks, clearRadiusMm: radius + 0.5, strokes };
}

function meets(dot: Dot, at: SheetPoint, radius: number): boolean {
  const distance = Math.hypot(dot.at[0] - at[0], dot.at[1] - at[1]);
  return Math.abs(distance - radius) < dot.radiusMm + clearMm;
}

/** The parts of the ring left after its four openings and those for dots, degrees. */
function arcsLeft(at: SheetPoint, radius: number, dots: readonly Dot[]): [number, number][] {
  const openings: [number, number][] = [45, 135, 225, 315].map((middle) => [
    middle - halfGapDeg,
    middle + halfGapDeg,
  ]);
  for (const dot of dots) {
    if (!meets(dot, at, radius)) continue;
    const middle = (Math.atan2(dot.at[1] - at[1], dot.at[0] - at[0]) * 180) / Math.PI;
    const half = (Math.asin(Math.min(1, (dot.radiusMm + clearMm) / radius)) * 180) / Math.PI;
    // Written once a turn earlier and once later, so that openings across 0 are whole.
    for (const turn of [-360, 0, 360]) openings.push([middle - half + turn, middle + half + turn]);
  }
  openings.sort((one, other) => one[0] - other[0]);
  const arcs: [number, number][] = [];
  let from = 45;
  for (const [start, end] of openings.concat([[405, 405]])) {
    if (start > from && from < 405) arcs.push([from, Math.min(start, 405)]);
    from = Math.max(from, end);
  }
  return arcs.filter(([start, end]) => end - start > 3);
}
