import type { Star, StarCatalogue } from '#catalogue';
import { starsInCone } from '#catalogue';
import { isInside, type Plate } from './plate';
import type { SkyPoint } from './projection';
import type { ChartScale } from './request';
import type { SheetPoint } from './scene';

/**
 * How deep a scale goes and how many dots its sheet bears. The eye's 5.5 is what a visitor sees from a good
 * public site, the finder's 9.5 what common binoculars show (common practice); the eyepiece takes all there is.
 * The counts are ours: more dots than these and nobody finds the pattern in them.
 */
const depth: Readonly<Record<ChartScale, { readonly faintest: number; readonly most: number }>> = {
  eye: { faintest: 5.5, most: 420 },
  binocular: { faintest: 9.5, most: 480 },
  eyepiece: { faintest: Infinity, most: 420 },
};

export interface DrawnStar {
  readonly star: Star;
  readonly at: SheetPoint;
}

/**
 * The stars a sheet shows, brightest first, and the magnitude (in tenths) to which it shows all of them.
 * `also` are shown whatever their magnitude, where they lie in the frame.
 */
export function starsFor(
  stars: StarCatalogue,
  plate: Plate,
  scale: ChartScale,
  hidden: (star: Star) => boolean,
  also: readonly Star[] = [],
): { readonly drawn: readonly DrawnStar[]; readonly faintestMagnitude: number } {
  // The catalogue's own end in tenths: its faintest star, at 10.999 say, belongs to a list to 11.0.
  const catalogueEnd = Math.ceil(stars.faintestMagnitude * 10 - 1e-9) / 10;
  const limit = Math.min(depth[scale].faintest, catalogueEnd);
  const { centre } = plate.projection;
  const cone = {
    raRad: centre.raRad,
    decRad: centre.decRad,
    // A millionth of a radian keeps stars on the very edge from being lost to rounding.
    radiusRad: plate.reachRad + 1e-6,
    faintestMagnitude: limit,
  };
  const drawn: DrawnStar[] = [];
  for (const star of starsInCone(stars, cone)) {
    if (drawn.length > depth[scale].most) break;
    const at = plate.toSheet(star);
    if (at !== null && isInside(plate.frame, at[0], at[1], 0) && !hidden(star)) drawn.push({ star, at });
  }
  const next = drawn[depth[scale].most];
  if (next === undefined) return { drawn: withAlso(drawn, also, plate), faintestMagnitude: limit };
  const faintestMagnitude = Math.floor(next.star.magnitude * 10 - 1e-9) / 10;
  const kept = drawn.filter(({ star }) => star.magnitude <= faintestMagnitude);
  return { drawn: withAlso(kept, also, plate), faintestMagnitude };
}

function withAlso(drawn: readonly DrawnStar[], also: readonly Star[], plate: Plate): readonly DrawnStar[] {
  const added: DrawnStar[] = [];
  for (const star of also) {
    const at = plate.toSheet(star);
    if (at === null || !isInside(plate.frame, at[0], at[1], 0)) continue;
    const isThere = drawn.some((one) => one.star.raRad === star.raRad && one.star.decRad === star.decRad);
    if (!isThere) added.push({ star, at });
  }
  if (added.length === 0) return drawn;
  return [...drawn, ...added].sort((one, other) => one.star.magnitude - other.star.magnitude);
}

/** Two places nearer than this are the same star: catalogues of bright doubles differ by a few arcseconds. */
const sameStarRad = 20 / 206265;

/** The index of the drawn star that stands at a place, or -1. */
export function starAt(drawn: readonly DrawnStar[], place: SkyPoint): number {
  return drawn.findIndex(({ star }) => {
    // Nearly every star is far away; its declination alone tells that.
    const along = star.decRad - place.decRad;
    if (along > sameStarRad || along < -sameStarRad) return false;
    const across = 2 * Math.sin((star.raRad - place.raRad) / 2) * Math.cos(place.decRad);
    return Math.hypot(across, along) < sameStarRad;
  });
}
