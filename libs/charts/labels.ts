import { type Box, comesNear, type Line } from './lines';
import { type DiscGrid, discGrid } from './discGrid';
import { chooseSpots } from './labelSearch';
import { isLeaderFree, leaderTo } from './leader';
import { isInside } from './plate';
import type { Frame, SceneLabel } from './scene';
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
  /** True where it may stand nearer to another disc than to its own, since a line leads to that. */
  readonly strays?: boolean;
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
  /** True where a thin line leads to the owner from a spot that stands off it. */
  readonly isLed?: boolean;
  /** Walls that it may stand on: the number of a step on its own arrow. */
  readonly crosses?: readonly Line[];
  readonly spots: (size: TextSize) => readonly Spot[];
}

/** A round thing that no label may cover. */
export interface Disc {
  readonly xMm: number;
  readonly yMm: number;
  readonly radiusMm: number;
  /** Of the dot itself where the disc takes in a ring or strokes round it. */
  readonly dotMm?: number;
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

/** The least between a label and any dot but its own. */
const otherGapMm = 0.6;
/** A label is nearer to its own dot than to any other by at least this. */
const nearerByMm = 0.1;
const betweenLabelsMm = 0.5;
const frameGapMm = 0.9;
const wallGapMm = 0.35;
const leaderGapMm = 0.2;
const threadCost = 3;

/** No label needs more choices than this; an area's name has hundreds of spots that differ little. */
const mostSpots = 16;
/** One rank is worth this many of the next, so that a label gives way to many lesser ones only. */
const rankWorth = 4;
const leastWorth = 60;
const lastRank = 9;

interface Candidate {
  readonly spot: Spot;
  readonly box: Box;
  readonly leader: Line | null;
  readonly cost: number;
}

/**
 * Gives labels their spots so that each keeps clear of every disc, wall, other label and the frame, as many and as
 * well placed as can be found, better ranks first. A label without such a spot is left out.
 */
export function placeLabels(wishes: readonly LabelWish[], around: Surroundings): SceneLabel[] {
  const ranked = wishes.map((wish, order) => ({
    wish: { ...wish, text: printable(wish.text, wish.face) },
    order,
  }));
  ranked.sort((one, other) => one.wish.rank - other.wish.rank || one.order - other.order);
  const grid = discGrid(around.discs);
  const labels = ranked.map(({ wish }) => {
    const size = sizeOf(wish);
    return { wish, size, candidates: candidatesOf(wish, size, around, grid) };
  });
  const chosen = chooseSpots(
    labels.map(({ wish, candidates }) => ({
      costs: candidates.map(({ cost }) => cost),
      worth: leastWorth * rankWorth ** Math.max(0, lastRank - wish.rank),
    })),
    neighbours(labels.map(({ candidates }) => candidates)),
    (a, i, b, j) => clash(labels[a]!.candidates[i]!, labels[b]!.candidates[j]!),
  );
  return labels.flatMap(({ wish, size, candidates }, index) => {
    const taken = candidates[chosen[index]!];
    return taken === undefined
      ? []
      : [
          {
            text: wish.text,
            of: wish.of,
            xMm: taken.spot.xMm,
            yMm: taken.spot.yMm,
            widthMm: size.width,
            box: [...taken.box] as const,
            face: wish.face,
            sizePt: wish.sizePt,
            gray: wish.gray,
            spacingPt: wish.spacingPt,
            ...(taken.leader === null ? {} : { leader: taken.leader }),
          },
        ];
  });
}

/** The free spots of a label, cheapest first. */
function candidatesOf(wish: LabelWish, size: TextSize, around: Surroundings, grid: DiscGrid): Candidate[] {
  const spots = [...wish.spots(size)].sort((one, other) => one.cost - other.cost);
  const found: Candidate[] = [];
  for (const spot of spots) {
    const box: Box = [spot.xMm, spot.yMm - size.above, spot.xMm + size.width, spot.yMm + size.below];
    if (!isFree(box, wish, spot, around, grid)) continue;
    const { owner } = wish;
    const leader = wish.isLed === true && owner !== null ? leaderTo(box, owner) : null;
    if (spot.strays === true && leader === null) continue;
    if (leader !== null && owner !== null && !isLeaderFree(leader, owner, around.discs)) continue;
    const crossed = around.threads.filter((line) => comesNear(box, line, 0.2)).length;
    found.push({ spot, box, leader, cost: spot.cost + threadCost * crossed });
    if (found.length === mostSpots) break;
  }
  return found.sort((one, other) => one.cost - other.cost);
}

/** For each label, the others of which some spot overlaps one of its own. */
function neighbours(candidates: readonly (readonly Candidate[])[]): number[][] {
  const reach = candidates.map((spots): Box | null =>
    spots.length === 0
      ? null
      : [
          Math.min(...spots.map((spot) => reachOf(spot, 0))),
          Math.min(...spots.map((spot) => reachOf(spot, 1))),
          Math.max(...spots.map((spot) => reachOf(spot, 2))),
          Math.max(...spots.map((spot) => reachOf(spot, 3))),
        ],
  );
  const near: number[][] = candidates.map(() => []);
  for (let a = 0; a < reach.length; a++) {
    for (let b = a + 1; b < reach.length; b++) {
      const one = reach[a]!;
      const other = reach[b]!;
      if (one === null || other === null || !overlap(one, other)) continue;
      if (candidates[a]!.some((spot) => candidates[b]!.some((rival) => clash(spot, rival)))) {
        near[a]!.push(b);
        near[b]!.push(a);
      }
    }
  }
  return near;
}

/** How far a spot reaches to one side (0 left, 1 top, 2 right, 3 bottom), its leader included. */
function reachOf({ box, leader }: Candidate, side: 0 | 1 | 2 | 3): number {
  if (leader === null) return box[side];
  const ends = [leader[0][side % 2]!, leader[1][side % 2]!];
  return side < 2 ? Math.min(box[side], ...ends) : Math.max(box[side], ...ends);
}

function clash(one: Candidate, other: Candidate): boolean {
  return (
    overlap(one.box, other.box) ||
    (one.leader !== null && comesNear(other.box, one.leader, leaderGapMm)) ||
    (other.leader !== null && comesNear(one.box, other.leader, leaderGapMm))
  );
}

function overlap(one: Box, other: Box): boolean {
  return (
    one[0] < other[2] + betweenLabelsMm &&
    one[2] > other[0] - betweenLabelsMm &&
    one[1] < other[3] + betweenLabelsMm &&
    one[3] > other[1] - betweenLabelsMm
  );
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

function isFree(box: Box, wish: LabelWish, spot: Spot, around: Surroundings, grid: DiscGrid): boolean {
  const [left, top, right, bottom] = box;
  const { frame, walls } = around;
  if (
    !isInside(frame, left, top, frameGapMm) ||
    !isInside(frame, right, top, frameGapMm) ||
    !isInside(frame, left, bottom, frameGapMm) ||
    !isInside(frame, right, bottom, frameGapMm)
  ) {
    return false;
  }
  const gap =
    wish.owner === null || wish.mayStray || spot.strays === true
      ? otherGapMm
      : Math.max(otherGapMm, distanceBetween(box, wish.owner) + nearerByMm);
  const isTooNear = (disc: Disc): boolean => {
    if (disc === wish.owner) return false;
    const reach = disc.radiusMm + gap;
    const dx = disc.xMm < left ? left - disc.xMm : disc.xMm > right ? disc.xMm - right : 0;
    const dy = disc.yMm < top ? top - disc.yMm : disc.yMm > bottom ? disc.yMm - bottom : 0;
    return dx * dx + dy * dy < reach * reach;
  };
  if (grid.someNear(box, gap, isTooNear)) return false;
  return (
    !walls.some((line) => comesNear(box, line, wallGapMm) && wish.crosses?.includes(line) !== true) &&
    !around.isBarred(box, wish)
  );
}

/** The clear distance from a box to a disc, millimetres; negative where the disc's middle lies deep inside. */
function distanceBetween([left, top, right, bottom]: Box, disc: Disc): number {
  const dx = Math.max(left - disc.xMm, 0, disc.xMm - right);
  const dy = Math.max(top - disc.yMm, 0, disc.yMm - bottom);
  return Math.hypot(dx, dy) - (disc.dotMm ?? disc.radiusMm);
}
