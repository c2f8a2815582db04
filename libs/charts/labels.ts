import { type Box, comesNear, type Line } from './lines';
import { isInside } from './plate';
import type { Frame, SceneLabel, SheetPoint } from './scene';
import { capHeightMm, descentMm, type Face, mmPerPt, printable, textWidthMm } from './typeface';

/** How large a line of text is, millimetres: `above` and `below` its baseline. */
export interface TextSize {
  readonly width: number;
  readonly above: number;
  readonly below: number;
}

/** A place a label may take: the left end of its baseline. Lower cost is better. */
export interface Spot {
  readonly xMm: number;
  readonly yMm: number;
  readonly cost: number;
}

/** A label that would like to stand on the sheet. */
export interface LabelWish {
  readonly text: string;
  readonly of: string;
  readonly face: Face;
  readonly sizePt: number;
  readonly gray: number;
  readonly spacingPt: number;
  /** Lower ranks choose first. */
  readonly rank: number;
  /** The disc it belongs to, which it may touch; null for a label of an area. */
  readonly owner: Disc | null;
  /** True where it may stand nearer to another disc than to its own: the target's, set in bold. */
  readonly mayStray: boolean;
  readonly spots: (size: TextSize) => readonly Spot[];
}

/** A round thing that no label may cover. */
export interface Disc {
  readonly xMm: number;
  readonly yMm: number;
  readonly radiusMm: number;
}

export interface Surroundings {
  readonly frame: Frame;
  readonly discs: readonly Disc[];
  /** Lines that no label may cross. */
  readonly walls: readonly Line[];
  /** Lines that a label had better not cross. */
  readonly threads: readonly Line[];
  /** Says where a label may not stand for reasons of its own: star names on the ground, say. */
  readonly isBarred: (box: Box, wish: LabelWish) => boolean;
}

/** Between a label and its own dot. */
const ownGapMm = 0.5;
/** The least between a label and any dot but its own. */
const otherGapMm = 0.6;
/** A label is nearer to its own dot than to any other by at least this. */
const nearerByMm = 0.1;
const betweenLabelsMm = 0.5;
const frameGapMm = 0.9;
const wallGapMm = 0.35;
const threadCost = 3;

/**
 * Gives each wish, best rank first, the cheapest of its spots that keeps clear of every disc, wall, other label
 * and the frame. A wish without such a spot is left out.
 */
export function placeLabels(wishes: readonly LabelWish[], around: Surroundings): SceneLabel[] {
  const boxes: Box[] = [];
  const labels: SceneLabel[] = [];
  const ranked = wishes.map((wish, order) => ({
    wish: { ...wish, text: printable(wish.text, wish.face) },
    order,
  }));
  ranked.sort((one, other) => one.wish.rank - other.wish.rank || one.order - other.order);
  for (const { wish } of ranked) {
    const size = sizeOf(wish);
    let best: { spot: Spot; box: Box; cost: number } | null = null;
    for (const spot of wish.spots(size)) {
      if (best !== null && spot.cost >= best.cost) continue;
      const box: Box = [spot.xMm, spot.yMm - size.above, spot.xMm + size.width, spot.yMm + size.below];
      if (!isFree(box, wish, boxes, around)) continue;
      const crossed = around.threads.filter((line) => comesNear(box, line, 0.2)).length;
      const cost = spot.cost + threadCost * crossed;
      if (best === null || cost < best.cost) best = { spot, box, cost };
    }
    if (best === null) continue;
    boxes.push(best.box);
    labels.push({
      text: wish.text,
      of: wish.of,
      xMm: best.spot.xMm,
      yMm: best.spot.yMm,
      widthMm: size.width,
      box: [...best.box],
      face: wish.face,
      sizePt: wish.sizePt,
      gray: wish.gray,
      spacingPt: wish.spacingPt,
    });
  }
  return labels;
}

/** The eight spots beside a disc, right first, then left, above and below, then the corners. */
export function spotsBeside({ xMm, yMm, radiusMm }: Disc): (size: TextSize) => Spot[] {
  const gap = radiusMm + ownGapMm;
  const corner = gap * Math.SQRT1_2;
  return ({ width, above, below }) => {
    const middle = yMm + (above - below) / 2;
    return [
      { xMm: xMm + gap, yMm: middle, cost: 0 },
      { xMm: xMm - gap - width, yMm: middle, cost: 0.5 },
      { xMm: xMm + corner, yMm: yMm - corner - below, cost: 0.7 },
      { xMm: xMm + corner, yMm: yMm + corner + above, cost: 0.8 },
      { xMm: xMm - width / 2, yMm: yMm - gap - below, cost: 0.9 },
      { xMm: xMm - width / 2, yMm: yMm + gap + above, cost: 1 },
      { xMm: xMm - corner - width, yMm: yMm - corner - below, cost: 1.1 },
      { xMm: xMm - corner - width, yMm: yMm + corner + above, cost: 1.2 },
    ];
  };
}

/** Spots for a label that must find room: round a disc in sixteen directions, ever farther out. */
export function spotsAround(disc: Disc, reachMm: number): (size: TextSize) => Spot[] {
  const beside = spotsBeside(disc);
  return (size) => {
    const spots = beside(size);
    const { width, above, below } = size;
    for (let gap = 1.5; gap <= reachMm; gap += 1.5) {
      for (let step = 0; step < 16; step++) {
        const angle = (step * Math.PI) / 8;
        const distance = disc.radiusMm + gap;
        // The nearest point of the box, not its middle, stands at that distance.
        const dx = Math.cos(angle) * (distance + width / 2);
        const dy = Math.sin(angle) * (distance + (above + below) / 2);
        spots.push({
          xMm: disc.xMm + dx - width / 2,
          yMm: disc.yMm + dy + (above - below) / 2,
          cost: 1.5 + 0.4 * gap,
        });
      }
    }
    return spots;
  };
}

/** Spots for the name of an area: on its middle, then ever farther round it, out to `reachMm`. */
export function spotsRound(middle: SheetPoint, reachMm: number): (size: TextSize) => Spot[] {
  return ({ width, above, below }) => {
    const spots: Spot[] = [];
    const put = (dx: number, dy: number): void => {
      spots.push({
        xMm: middle[0] + dx - width / 2,
        yMm: middle[1] + dy + (above - below) / 2,
        cost: 0.15 * Math.hypot(dx, dy),
      });
    };
    put(0, 0);
    for (let ring = 3; ring <= reachMm; ring += 3) {
      const steps = 8 + 2 * Math.round(ring / 3);
      for (let step = 0; step < steps; step++) {
        const angle = (2 * Math.PI * step) / steps;
        put(ring * Math.cos(angle), ring * Math.sin(angle));
      }
    }
    return spots;
  };
}

/** One spot only, its text centred on a point. */
export function spotAt(middle: SheetPoint): (size: TextSize) => Spot[] {
  return ({ width, above, below }) => [
    { xMm: middle[0] - width / 2, yMm: middle[1] + (above - below) / 2, cost: 0 },
  ];
}

const hangs = /[gjpqyQçβγζημξρφχψςʹ,;()/]/;
const rises = /[bdfhklißβδζθλξφψ]/;

function sizeOf(wish: LabelWish): TextSize {
  const cap = capHeightMm(wish.face, wish.sizePt);
  return {
    width: textWidthMm(wish.text, wish.face, wish.sizePt, wish.spacingPt),
    // Ascenders of these faces stand 8 % of the size above their capitals.
    above: cap + (rises.test(wish.text) ? 0.08 * wish.sizePt * mmPerPt : 0),
    below: hangs.test(wish.text) ? descentMm(wish.sizePt) : 0.02 * wish.sizePt * mmPerPt,
  };
}

function isFree(box: Box, wish: LabelWish, boxes: readonly Box[], around: Surroundings): boolean {
  const [left, top, right, bottom] = box;
  const { frame, discs, walls } = around;
  if (
    !isInside(frame, left, top, frameGapMm) ||
    !isInside(frame, right, top, frameGapMm) ||
    !isInside(frame, left, bottom, frameGapMm) ||
    !isInside(frame, right, bottom, frameGapMm)
  ) {
    return false;
  }
  for (const other of boxes) {
    if (
      left < other[2] + betweenLabelsMm &&
      right > other[0] - betweenLabelsMm &&
      top < other[3] + betweenLabelsMm &&
      bottom > other[1] - betweenLabelsMm
    ) {
      return false;
    }
  }
  const gap =
    wish.owner === null || wish.mayStray
      ? otherGapMm
      : Math.max(otherGapMm, distanceBetween(box, wish.owner) + nearerByMm);
  for (const disc of discs) {
    const reach = disc.radiusMm + gap;
    // Nearly every disc is far away; comparing edges first spares it the square.
    if (disc.xMm <= left - reach || disc.xMm >= right + reach) continue;
    if (disc.yMm <= top - reach || disc.yMm >= bottom + reach || disc === wish.owner) continue;
    const dx = disc.xMm < left ? left - disc.xMm : disc.xMm > right ? disc.xMm - right : 0;
    const dy = disc.yMm < top ? top - disc.yMm : disc.yMm > bottom ? disc.yMm - bottom : 0;
    if (dx * dx + dy * dy < reach * reach) return false;
  }
  return !walls.some((line) => comesNear(box, line, wallGapMm)) && !around.isBarred(box, wish);
}

/** The clear distance from a box to a disc, millimetres; negative where the disc's middle lies deep inside. */
function distanceBetween([left, top, right, bottom]: Box, disc: Disc): number {
  const dx = Math.max(left - disc.xMm, 0, disc.xMm - right);
  const dy = Math.max(top - disc.yMm, 0, disc.yMm - bottom);
  return Math.hypot(dx, dy) - disc.radiusMm;
}
