import { type Disc, type LabelWish } from './labels';
import { spotsBeside } from './labelSpots';
import { labelRank } from './labelWords';
import type { Line } from './lines';
import { sheetAngle, type Turn } from './orientation';
import type { Mark, SheetPoint, Stroke } from './scene';

const stroke: Stroke = { widthPt: 0.6, gray: 0 };
/** The fan starts clear of the target's ring and is as long as one sees at a glance, millimetres. */
const fanMm = 9;
const clearMm = 2.2;
const halfSpreadRad = 0.1;

export interface PlacedTail {
  readonly marks: readonly Mark[];
  readonly lines: readonly Line[];
  readonly wishes: readonly LabelWish[];
}

/**
 * Which way a comet's tail points: a narrow fan outside the target's ring. Its length says nothing; nobody knows
 * that beforehand.
 */
export function placeTail(tailDeg: number | null, turn: Turn, target: Disc, of: string): PlacedTail {
  if (tailDeg === null) return { marks: [], lines: [], wishes: [] };
  const angle = sheetAngle(turn, (tailDeg * Math.PI) / 180);
  const from = target.radiusMm + clearMm;
  const point = (mm: number, aside: number): SheetPoint => [
    target.xMm + mm * Math.cos(angle + aside),
    target.yMm + mm * Math.sin(angle + aside),
  ];
  const lines: Line[] = [-halfSpreadRad, 0, halfSpreadRad].map((aside) => [
    point(from, aside),
    point(from + (aside === 0 ? fanMm : fanMm - 1.5), aside),
  ]);
  const tip = point(from + fanMm, 0);
  const owner: Disc = { xMm: tip[0], yMm: tip[1], radiusMm: 0.3 };
  return {
    lines,
    marks: lines.map((points): Mark => ({
      shape: 'polyline',
      role: 'tail',
      of,
      points,
      stroke,
      fillGray: null,
      layer: 'over',
      clipped: true,
    })),
    wishes: [
      {
        text: 'tail',
        of: 'tail',
        face: 'sans',
        sizePt: 8,
        gray: 0,
        spacingPt: 0,
        mayStray: false,
        rank: labelRank.path + 0.2,
        owner,
        spots: spotsBeside(owner),
      },
    ],
  };
}
