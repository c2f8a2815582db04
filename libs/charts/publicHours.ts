import { type Disc, type LabelWish } from './labels';
import { spotsAround } from './labelSpots';
import { labelRank } from './labelWords';
import { isInside, type Plate } from './plate';
import type { ChartRequest } from './request';
import type { Mark } from './scene';

const radiusMm = 0.9;
/** Nearer than this the two places are one to the eye, and the path's ticks say enough. */
const leastApartMm = 2.5;

export interface PlacedHours {
  readonly marks: readonly Mark[];
  readonly discs: readonly Disc[];
  readonly wishes: readonly LabelWish[];
}

/** Where a moving target stands as the public hours begin and end: small open circles on its path. */
export function placeHours(hours: ChartRequest['publicHours'], plate: Plate, of: string): PlacedHours {
  const nothing: PlacedHours = { marks: [], discs: [], wishes: [] };
  if (hours === undefined) return nothing;
  const opens = plate.toSheet(hours.opens);
  const closes = plate.toSheet(hours.closes);
  if (opens === null || closes === null) return nothing;
  if (Math.hypot(opens[0] - closes[0], opens[1] - closes[1]) < leastApartMm) return nothing;
  const marks: Mark[] = [];
  const discs: Disc[] = [];
  const wishes: LabelWish[] = [];
  for (const [at, point, word] of [
    [opens, hours.opens, 'opens'],
    [closes, hours.closes, 'closes'],
  ] as const) {
    if (!isInside(plate.frame, at[0], at[1], radiusMm)) continue;
    const disc: Disc = { xMm: at[0], yMm: at[1], radiusMm };
    marks.push({
      shape: 'circle',
      role: 'place',
      of,
      ...disc,
      stroke: { widthPt: 0.8, gray: 0 },
      fillGray: 1,
      layer: 'over',
      clipped: true,
    });
    discs.push(disc);
    wishes.push({
      text: `${word} ${point.at}`,
      of: word,
      face: 'sans',
      sizePt: 8,
      gray: 0,
      spacingPt: 0,
      mayStray: false,
      rank: labelRank.path - 0.3,
      owner: disc,
      spots: spotsAround(disc, 4),
    });
  }
  return { marks, discs, wishes };
}
