import type { Disc } from './labels';
import type { Line } from './lines';
import { isInside, type Plate } from './plate';
import type { PathPoint } from './request';
import type { Mark, SheetPoint, Stroke } from './scene';

const line: Stroke = { widthPt: 0.7, gray: 0 };
const tickHalfMm = 1;
const arrowMm = 2.2;

export interface PlacedPath {
  readonly points: readonly { readonly at: string; readonly xMm: number; readonly yMm: number }[];
  /** The points inside the frame, with what to print beside each. */
  readonly inside: readonly { readonly at: string; readonly point: SheetPoint }[];
  readonly pieces: readonly Line[];
  readonly marks: readonly Mark[];
  /** The middle of the arrowhead, which labels must leave clear; null without one. */
  readonly arrow: SheetPoint | null;
}

/** A moving target's path: a thin line, a tick across it at each point, an arrowhead the way it goes. */
export function placePath(
  path: readonly PathPoint[],
  plate: Plate,
  of: string,
  covers: readonly Disc[] = [],
): PlacedPath {
  // Where a disc stands neither a tick nor its time can be read.
  const isCovered = ([x, y]: SheetPoint): boolean =>
    covers.some(({ xMm, yMm, radiusMm }) => Math.hypot(x - xMm, y - yMm) < radiusMm + 0.6);
  const placed = path.map((point) => ({ at: point.at, point: plate.toSheet(point) }));
  const points = placed.flatMap(({ at, point }) =>
    point === null || at === '' ? [] : [{ at, xMm: point[0], yMm: point[1] }],
  );
  const pieces: [SheetPoint, SheetPoint][] = [];
  for (let i = 1; i < placed.length; i++) {
    const from = placed[i - 1]!.point;
    const to = placed[i]!.point;
    if (from !== null && to !== null) pieces.push([from, to]);
  }
  const shared = { role: 'path', of, fillGray: null, layer: 'over', clipped: true } as const;
  const marks: Mark[] = runs(placed.map(({ point }) => point)).map((run) => ({
    ...shared,
    shape: 'polyline',
    points: run,
    stroke: line,
  }));
  placed.forEach(({ at, point }, index) => {
    if (point === null || at === '' || isCovered(point)) return;
    const before = placed[index - 1]?.point ?? point;
    const after = placed[index + 1]?.point ?? point;
    const length = Math.hypot(after[0] - before[0], after[1] - before[1]);
    if (length === 0) return;
    const across = [-(after[1] - before[1]) / length, (after[0] - before[0]) / length] as const;
    marks.push({
      ...shared,
      shape: 'polyline',
      points: [
        [point[0] - across[0] * tickHalfMm, point[1] - across[1] * tickHalfMm],
        [point[0] + across[0] * tickHalfMm, point[1] + across[1] * tickHalfMm],
      ],
      stroke: line,
    });
  });
  const last = endInside(pieces, plate);
  let arrow: SheetPoint | null = null;
  if (last !== null) {
    const head = arrowhead(last[0], last[1]);
    marks.push({ ...shared, ...head.mark, stroke: null, fillGray: 0 });
    arrow = head.middle;
  }
  const inside = placed.flatMap(({ at, point }) =>
    point !== null && at !== '' && isInside(plate.frame, point[0], point[1], 1) && !isCovered(point)
      ? [{ at, point }]
      : [],
  );
  return { points, inside, pieces, marks, arrow };
}

/** A filled triangle just past the end of a line, so that the last tick stays clear. */
function arrowhead(
  from: SheetPoint,
  to: SheetPoint,
): { mark: { shape: 'polygon'; points: SheetPoint[] }; middle: SheetPoint } {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const along = [(to[0] - from[0]) / length, (to[1] - from[1]) / length] as const;
  const at = (ahead: number, aside: number): SheetPoint => [
    to[0] + along[0] * ahead - along[1] * aside,
    to[1] + along[1] * ahead + along[0] * aside,
  ];
  const start = 1.1;
  const half = arrowMm * 0.38;
  return {
    mark: { shape: 'polygon', points: [at(start + arrowMm, 0), at(start, half), at(start, -half)] },
    middle: at(start + arrowMm / 2, 0),
  };
}

function runs(points: readonly (SheetPoint | null)[]): SheetPoint[][] {
  const found: SheetPoint[][] = [];
  let run: SheetPoint[] = [];
  for (const point of [...points, null]) {
    if (point !== null) {
      run.push(point);
      continue;
    }
    if (run.length > 1) found.push(run);
    run = [];
  }
  return found;
}

/** How far inside the frame an arrowhead's root must lie to be seen whole, millimetres. */
const arrowRoomMm = 4;

/** The last stretch of a path that the frame shows: from where it starts to the end, or to just inside the edge. */
function endInside(pieces: readonly Line[], plate: Plate): Line | null {
  for (const [from, to] of pieces.toReversed()) {
    const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
    for (let back = 0; back < length; back += 0.5) {
      const share = 1 - back / length;
      const at: SheetPoint = [from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share];
      if (isInside(plate.frame, at[0], at[1], arrowRoomMm)) return [from, at];
    }
  }
  return null;
}
