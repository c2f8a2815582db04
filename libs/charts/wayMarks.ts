import { dotDiameterMm } from './dots';
import type { Disc, LabelWish, Spot, TextSize } from './labels';
import { spotsAround } from './labelSpots';
import { labelRank } from './labelWords';
import { type Box, type Line, piecesOutside } from './lines';
import { isInside, type Plate } from './plate';
import type { ChartTarget } from './request';
import type { Mark, SheetPoint, Stroke } from './scene';
import type { Hop, Way } from './way';

const stroke: Stroke = { widthPt: 1, gray: 0.3 };
const ringStroke: Stroke = { widthPt: 0.7, gray: 0 };
/** Clear paper between a landing's dot and the ring round it, millimetres. */
const ringGapMm = 0.8;
const headMm = 2.4;
/** A hop of which less than this lies on the sheet goes without its number, millimetres. */
const leastSeenMm = 4;
const insideMm = 3;
/** Of a line that carries its number at least this must be left, millimetres. */
const leastBesideMm = 7;

export interface PlacedWay {
  /** Each hop as a line on the sheet from ring to ring; it may leave the frame. */
  readonly lines: readonly Line[];
  /** The strokes of their arrowheads. */
  readonly barbs: readonly Line[];
  readonly wishes: readonly LabelWish[];
  /** The rings round the stars that hops start from and land on. */
  readonly discs: readonly Disc[];
  /** Given the boxes of the labels: the numbers stand in gaps of their lines. */
  readonly marks: (labels: readonly Box[]) => Mark[];
}

/** The rings, arrows and numbers of the way on a sheet. */
export function placeWay(
  way: Way,
  plate: Plate,
  target: ChartTarget,
  targetDisc: Disc,
  faintestMagnitude: number,
): PlacedWay {
  if (way.kind !== 'hops') return { lines: [], barbs: [], wishes: [], discs: [], marks: () => [] };
  const discOf = ({ from }: Hop): Disc | null => {
    const at = plate.toSheet(from.star);
    if (at === null) return null;
    const radiusMm = dotDiameterMm(from.star.magnitude, faintestMagnitude) / 2 + ringGapMm;
    return { xMm: at[0], yMm: at[1], radiusMm };
  };
  const discs = way.hops.map(discOf);
  const lines: Line[] = [];
  const wishes: LabelWish[] = [];
  way.hops.forEach((_, index) => {
    const from = discs[index]!;
    const to = index + 1 < discs.length ? discs[index + 1]! : targetDisc;
    if (from === null || to === null) return;
    const line = between(from, to);
    if (line === null) {
      // Too short to draw on this sheet; its number beside the star it starts from still says where it is.
      if (isInside(plate.frame, from.xMm, from.yMm, insideMm)) {
        wishes.push({ ...stepLabel(index + 1), owner: from, spots: spotsAround(from, 5) });
      }
      return;
    }
    lines.push(line);
    const seen = partInside(line, plate);
    if (seen !== null) wishes.push(numberWish(index + 1, line, seen));
  });
  const rings = discs.filter(
    (disc): disc is Disc => disc !== null && isInside(plate.frame, disc.xMm, disc.yMm, 0),
  );
  const shared = { role: 'way', of: target.name, layer: 'over', clipped: true } as const;
  return {
    lines,
    barbs: lines.flatMap((line): Line[] => {
      const [left, tip, right] = headOf(line);
      return [
        [left, tip],
        [tip, right],
      ];
    }),
    wishes,
    discs: rings,
    marks: (labels) => [
      ...rings.map((disc): Mark => ({
        ...shared,
        shape: 'circle',
        ...disc,
        stroke: ringStroke,
        fillGray: null,
      })),
      ...lines.flatMap((line) =>
        piecesOutside(line, labels, 0.5).map((points): Mark => ({
          ...shared,
          shape: 'polyline',
          points,
          stroke,
          fillGray: null,
        })),
      ),
      ...lines.map((line): Mark => ({
        ...shared,
        shape: 'polyline',
        points: headOf(line),
        stroke,
        fillGray: null,
      })),
    ],
  };
}

/** From the edge of one disc to the edge of another; null where they touch. */
function between(from: Disc, to: Disc): Line | null {
  const dx = to.xMm - from.xMm;
  const dy = to.yMm - from.yMm;
  const length = Math.hypot(dx, dy);
  const start = from.radiusMm + 0.3;
  const end = length - to.radiusMm - 0.5;
  if (end - start < 1) return null;
  const at = (mm: number): SheetPoint => [from.xMm + (dx * mm) / length, from.yMm + (dy * mm) / length];
  return [at(start), at(end)];
}

/** Two short strokes at the end of a line: an open arrowhead, unlike a path's filled one. */
function headOf([from, to]: Line): [SheetPoint, SheetPoint, SheetPoint] {
  const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
  const length = Math.min(headMm, 0.4 * Math.hypot(to[0] - from[0], to[1] - from[1]));
  const barb = (turn: number): SheetPoint => [
    to[0] - length * Math.cos(angle + turn),
    to[1] - length * Math.sin(angle + turn),
  ];
  return [barb(0.4), to, barb(-0.4)];
}

/** The shares of a line's length between which it lies inside the frame; null where too little does. */
function partInside([from, to]: Line, plate: Plate): readonly [number, number] | null {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const steps = Math.max(8, Math.ceil(length));
  let first = -1;
  let last = -1;
  for (let step = 0; step <= steps; step++) {
    const share = step / steps;
    const x = from[0] + (to[0] - from[0]) * share;
    const y = from[1] + (to[1] - from[1]) * share;
    if (!isInside(plate.frame, x, y, insideMm)) continue;
    if (first < 0) first = share;
    last = share;
  }
  return (last - first) * length < leastSeenMm || first < 0 ? null : [first, last];
}

function stepLabel(number: number): Omit<LabelWish, 'owner' | 'spots'> {
  return {
    text: String(number),
    of: `step ${String(number)}`,
    face: 'bold',
    sizePt: 10,
    gray: 0,
    spacingPt: 0,
    mayStray: true,
    rank: labelRank.step,
  };
}

/** The number of a hop: on its line, in the middle of what is seen of it, or farther along. */
function numberWish(number: number, line: Line, [first, last]: readonly [number, number]): LabelWish {
  return {
    ...stepLabel(number),
    owner: null,
    crosses: [line],
    spots: (size: TextSize): Spot[] =>
      [0.5, 0.42, 0.58, 0.34, 0.66, 0.26, 0.74, 0.18, 0.82].flatMap((part, order) => {
        const share = first + (last - first) * part;
        const x = line[0][0] + (line[1][0] - line[0][0]) * share;
        const y = line[0][1] + (line[1][1] - line[0][1]) * share;
        const dx = line[1][0] - line[0][0];
        const dy = line[1][1] - line[0][1];
        const length = Math.hypot(dx, dy);
        const aside = size.width / 2 + 1.4;
        // On a short line its number would leave nothing of it.
        const onLine = (last - first) * length >= size.width + leastBesideMm;
        return (onLine ? [0, 1, -1] : [1, -1]).map((side): Spot => ({
          xMm: x - size.width / 2 + (side * aside * -dy) / length,
          yMm: y + (size.above - size.below) / 2 + (side * (aside + 0.5) * dx) / length,
          cost: 0.3 * order + (side === 0 ? 0 : 1.2),
        }));
      }),
  };
}
