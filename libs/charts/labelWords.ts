import type { ConstellationFigure, Star, StarLabel } from '#catalogue';
import { isLarge, type PlacedObject } from './deepSky';
import type { DrawnStar } from './drawnStars';
import { type Disc, type LabelWish } from './labels';
import { spotsAround, spotsBeside, spotsLed, spotsRound } from './labelSpots';
import { isInside, type Plate } from './plate';
import type { SkyPoint } from './projection';
import type { ChartScale } from './request';
import type { SheetPoint } from './scene';

/** Who chooses a place first. Within a rank brighter things do. */
export const labelRank = {
  facing: 0,
  /** A named star right beside the target is what one aims at first; the target's own label has more room. */
  guideStar: 1,
  target: 2,
  /** The number of a step of the way stands on its arrow or nowhere. */
  step: 2.2,
  altitude: 2.5,
  path: 3,
  brightStar: 4,
  brightObject: 5,
  constellation: 6,
  object: 7,
  star: 8,
} as const;

/** Down to which magnitude stars carry their proper name, and any designation at all. */
const named: Readonly<Record<ChartScale, { readonly name: number; readonly letter: number }>> = {
  eye: { name: 2.3, letter: 4.2 },
  binocular: { name: 4.5, letter: 6.5 },
  eyepiece: { name: 6.5, letter: 11 },
};

/** How near the ring a named star must stand to be named before the target, millimetres. */
const besideMm = 6;
/** A proper name may stand this far from its dot where it finds no room beside it, millimetres. */
const nameReachMm = 3;
/** And the name of a star of the way, which must be found, this far with a line to it. */
const guideReachMm = 12;

/** Names of stars: the proper name where the star is bright enough, else its Greek letter or number. */
export function starWishes(
  drawn: readonly DrawnStar[],
  discs: readonly Disc[],
  scale: ChartScale,
  target: Disc,
  guides: readonly Star[] = [],
): LabelWish[] {
  return drawn.flatMap(({ star }, index) => {
    if (star.label === null) return [];
    const isGuide = guides.some(({ raRad, decRad }) => raRad === star.raRad && decRad === star.decRad);
    const text = isGuide ? guideWord(star.label, scale) : starWord(star.label, star.magnitude, scale);
    const owner = discs[index];
    if (text === null || owner === undefined) return [];
    const bright = text === star.label.name;
    const isBesideTarget =
      bright && Math.hypot(owner.xMm - target.xMm, owner.yMm - target.yMm) < target.radiusMm + besideMm;
    const rank =
      isBesideTarget || isGuide ? labelRank.guideStar : bright ? labelRank.brightStar : labelRank.star;
    return [
      {
        text,
        of: starKey(star.label),
        face: 'sans',
        sizePt: bright ? 8.5 : 8,
        gray: 0,
        spacingPt: 0,
        mayStray: false,
        rank: rank + Math.min(0.9, (star.magnitude + 2) / 20),
        owner,
        isLed: isGuide,
        spots: isGuide
          ? spotsLed(owner, nameReachMm, guideReachMm)
          : bright
            ? spotsAround(owner, nameReachMm)
            : spotsBeside(owner),
      } satisfies LabelWish,
    ];
  });
}

function starWord(label: StarLabel, magnitude: number, scale: ChartScale): string | null {
  const limits = named[scale];
  if (label.name !== null && magnitude <= limits.name) return label.name;
  if (magnitude > limits.letter) return null;
  // The wide sheet shows whose letters they are by its figures; the narrow ones must say so.
  if (scale === 'eye') return label.bayerLetter;
  if (label.bayer !== null) return scale === 'eyepiece' ? label.bayer : label.bayerLetter;
  if (label.flamsteed === null) return null;
  return scale === 'eyepiece' && label.constellation !== null
    ? `${String(label.flamsteed)} ${label.constellation}`
    : String(label.flamsteed);
}

/** A star of the way bears the name that its step in words calls it by. */
function guideWord(label: StarLabel, scale: ChartScale): string {
  if (label.name !== null) return label.name;
  return scale === 'eye' && label.bayerLetter !== null ? label.bayerLetter : starKey(label);
}

/** The shortest unambiguous name of a labelled star. */
export function starKey(label: StarLabel): string {
  if (label.bayer !== null) return label.bayer;
  if (label.flamsteed !== null && label.constellation !== null) {
    return `${String(label.flamsteed)} ${label.constellation}`;
  }
  return label.name ?? `HR ${String(label.hr)}`;
}

/** Deep-sky designations. A double star whose dot has a label of its own needs none. */
export function objectWishes(
  objects: readonly PlacedObject[],
  discs: readonly Disc[],
  drawn: readonly DrawnStar[],
): LabelWish[] {
  return objects.flatMap(({ object, at, size }, index) => {
    const owner = discs[index]!;
    if (object.kind === 'doubleStar' && drawn.some((star) => star.at === at && star.star.label !== null)) {
      return [];
    }
    const whole: Disc = { xMm: at[0], yMm: at[1], radiusMm: size.semiMajorMm + 0.4 };
    const near = spotsBeside(owner);
    const outside = spotsAround(whole, 3);
    return [
      {
        text: object.id,
        of: object.id,
        face: 'sans',
        sizePt: 8,
        gray: 0,
        spacingPt: 0,
        // The outline of something large says whose name it is; its middle may be far.
        mayStray: isLarge(size),
        rank:
          (object.magnitude <= 5 ? labelRank.brightObject : labelRank.object) +
          Math.min(0.9, Math.max(0, object.magnitude / 20)),
        owner,
        spots: isLarge(size)
          ? (text) => [...near(text), ...outside(text).map((spot) => ({ ...spot, cost: spot.cost + 2 }))]
          : near,
      } satisfies LabelWish,
    ];
  });
}

const constellationReachMm = 21;
/** A constellation with fewer of its figure's corners on the sheet than this goes unnamed. */
const leastCorners = 2;

/** Names of the constellations whose figures lie on the sheet, in spaced grey capitals. */
export function constellationWishes(
  figures: readonly ConstellationFigure[],
  plate: Plate,
  isHidden: (corner: SkyPoint) => boolean,
): LabelWish[] {
  return figures.flatMap((figure) => {
    const corners: SheetPoint[] = [];
    for (const corner of figure.lines.flat()) {
      const at = plate.toSheet(corner);
      if (at !== null && isInside(plate.frame, at[0], at[1], 2) && !isHidden(corner)) corners.push(at);
    }
    if (corners.length < leastCorners) return [];
    const centre = plate.toSheet({ raRad: figure.labelRaRad, decRad: figure.labelDecRad });
    const middle: SheetPoint =
      centre !== null &&
      isInside(plate.frame, centre[0], centre[1], 6) &&
      !isHidden({ raRad: figure.labelRaRad, decRad: figure.labelDecRad })
        ? centre
        : [
            corners.reduce((sum, [x]) => sum + x, 0) / corners.length,
            corners.reduce((sum, [, y]) => sum + y, 0) / corners.length,
          ];
    return [
      {
        text: figure.name.toUpperCase(),
        of: figure.abbreviation,
        face: 'serif',
        sizePt: 9,
        gray: 0.35,
        // More would make readers of the PDF's text take each letter for a word.
        spacingPt: 0.7,
        mayStray: false,
        rank: labelRank.constellation,
        owner: null,
        spots: spotsRound(middle, constellationReachMm),
      } satisfies LabelWish,
    ];
  });
}
