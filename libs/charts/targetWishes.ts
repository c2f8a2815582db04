import { type Disc, type LabelWish } from './labels';
import { spotsAround, spotsBeside } from './labelSpots';
import { labelRank } from './labelWords';
import type { ChartTarget } from './request';

/** The target's label may stand this far out before it is given up, millimetres. */
const targetLabelReachMm = 30;

/** True for a target that is one of the stars. */
export function isStarKind(kind: string): boolean {
  return kind === 'star' || kind === 'doubleStar';
}

/** The target's own name, in bold. */
export function targetWish(target: ChartTarget, owner: Disc): LabelWish {
  return {
    text: target.name,
    of: target.name,
    face: 'bold',
    sizePt: 11,
    gray: 0,
    spacingPt: 0,
    mayStray: true,
    isLed: true,
    rank: labelRank.target,
    owner,
    spots: spotsAround(owner, targetLabelReachMm),
  };
}

/** The time or date beside a tick of the path; the ends come first. */
export function pathWish(at: string, owner: Disc, index: number, count: number): LabelWish {
  const isEnd = index === 0 || index === count - 1;
  return {
    text: at,
    of: `path ${at}`,
    face: 'sans',
    sizePt: 8,
    gray: 0,
    spacingPt: 0,
    mayStray: false,
    rank: labelRank.path + (isEnd ? 0 : 0.1),
    owner,
    spots: spotsBeside(owner),
  };
}
