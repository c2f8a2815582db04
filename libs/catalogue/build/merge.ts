import type { PlacedStar } from '../starFile';
import type { BrightStar } from './brightStars';
import type { NamedPlace, Place } from './namedPlaces';
import { ARCSEC, nearbyIn, separation } from './nearby';

/**
 * V_T - V: the median over the stars of both catalogues (measured by the build, which reports it). The index
 * file has no B_T, so the colour term of the Tycho-2 transformation, V = V_T - 0.090 (B_T - V_T), cannot be
 * applied star by star; +0.06 is that term at B_T - V_T = 0.7, a common colour.
 */
export const VT_MINUS_V = 0.06;

/** How far apart the two catalogues may put one star: the text rounds right ascension to 5.4 arcsec. */
const NEAR = 30 * ARCSEC;
/** Within this a match is accepted whatever the magnitudes say (variable stars). */
const SAME_PLACE = 8 * ARCSEC;
const GREATEST_DIFFERENCE = 1.5;
const GREATEST_DIFFERENCE_SAME_PLACE = 5;
/** A bright star and its row in sefstars.txt are one if they are this near (more if it moves) and as bright as this. */
const SAME_ROW = 6 * ARCSEC;
const FASTEST = 30 * ARCSEC;
const SAME_ROW_MAGNITUDES = 0.6;
/** Farther than this from the Bright Star Catalogue's place, Tycho-2's is of another epoch or of a blend. */
const DOUBTFUL = 6 * ARCSEC;

export interface MergedStar extends PlacedStar {
  readonly bright: BrightStar | null;
}

interface Pair {
  readonly bright: number;
  readonly tycho: number;
  readonly cost: number;
}

/** A bright star with its row in sefstars.txt, where it has one. */
interface KnownStar {
  readonly entry: BrightStar;
  readonly row: NamedPlace | null;
}

/** Finds each bright star's row, the likeliest first, no place given to two stars. */
const findRows = (bright: readonly BrightStar[], places: readonly NamedPlace[]): KnownStar[] => {
  const near = nearbyIn(places);
  const candidates = bright.flatMap((entry, i) =>
    near(entry, FASTEST).flatMap((at) => {
      const row = places[at]!;
      const apart = separation(row, entry);
      const difference = Math.abs(row.magnitude - entry.magnitude);
      const allowed = SAME_ROW + separation(row, row.earlier) / 2;
      if (apart > allowed || difference > SAME_ROW_MAGNITUDES) return [];
      return [{ i, row, cost: apart / SAME_ROW + difference / SAME_ROW_MAGNITUDES }];
    }),
  );
  const rows = new Map<number, NamedPlace>();
  const taken = new Set<string>();
  for (const { i, row } of candidates.sort((a, b) => a.cost - b.cost)) {
    const place = `${row.raRad} ${row.decRad}`;
    if (rows.has(i) || taken.has(place)) continue;
    rows.set(i, row);
    taken.add(place);
  }
  return bright.map((entry, i) => ({ entry, row: rows.get(i) ?? null }));
};

/**
 * Pairs bright stars with Tycho-2 stars one to one, the likeliest first: near in place and in magnitude. The
 * brightest Tycho-2 stars (its first supplement) stand in the index file where they were at J1991.25, so a
 * star that moves fast is looked for there too.
 */
const pairUp = (bright: readonly KnownStar[], tycho: readonly PlacedStar[]): Map<number, number> => {
  const nearby = nearbyIn(tycho);
  const pairs: Pair[] = [];
  bright.forEach(({ entry, row }, i) => {
    const candidates = new Set([...nearby(entry, NEAR), ...(row ? nearby(row.earlier, NEAR) : [])]);
    for (const t of candidates) {
      const star = tycho[t]!;
      const apart = Math.min(separation(entry, star), row ? separation(row.earlier, star) : Infinity);
      const difference = Math.abs(star.magnitude - VT_MINUS_V - entry.magnitude);
      const allowed = apart <= SAME_PLACE ? GREATEST_DIFFERENCE_SAME_PLACE : GREATEST_DIFFERENCE;
      if (difference <= allowed) {
        pairs.push({ bright: i, tycho: t, cost: apart / (4 * ARCSEC) + difference / 0.3 });
      }
    }
  });
  pairs.sort((a, b) => a.cost - b.cost);
  const tychoOf = new Map<number, number>();
  const taken = new Set<number>();
  for (const { bright: i, tycho: t } of pairs) {
    if (tychoOf.has(i) || taken.has(t)) continue;
    tychoOf.set(i, t);
    taken.add(t);
  }
  return tychoOf;
};

/**
 * Where a bright star stands in the index file as it was at J1991.25, its companion there does too; both move
 * together through space. Gives the companions' places brought to J2000 by the bright star's motion.
 */
const moveCompanions = (
  tycho: readonly PlacedStar[],
  knownOf: ReadonlyMap<number, KnownStar>,
  near: (place: Place, radiusRad: number) => number[],
): Map<number, Place> => {
  const places = new Map<number, Place>();
  for (const [t, { row }] of knownOf) {
    const star = tycho[t]!;
    if (!row || separation(row, row.earlier) < 2 * ARCSEC) continue;
    if (separation(star, row.earlier) > separation(star, row) / 2) continue;
    for (const other of near(star, 15 * ARCSEC)) {
      if (other === t || knownOf.has(other)) continue;
      places.set(other, {
        raRad: tycho[other]!.raRad + row.raRad - row.earlier.raRad,
        decRad: tycho[other]!.decRad + row.decRad - row.earlier.decRad,
      });
    }
  }
  return places;
};

const combined = (a: number, b: number): number => -2.5 * Math.log10(10 ** (-0.4 * a) + 10 ** (-0.4 * b));

/**
 * The unmatched companions of a matched star whose light its Bright Star Catalogue magnitude includes: it is
 * better explained by them all together than by the star alone. So near (ten arcsec, half a millimetre on the
 * closest chart) one dot of the joint magnitude is what a chart should show.
 */
const joinCompanions = (
  tycho: readonly PlacedStar[],
  t: number,
  entry: BrightStar,
  knownOf: ReadonlyMap<number, KnownStar>,
  near: (place: Place, radiusRad: number) => number[],
): number[] => {
  const own = tycho[t]!.magnitude - VT_MINUS_V;
  const companions = near(tycho[t]!, 10 * ARCSEC).filter((other) => other !== t && !knownOf.has(other));
  const together = companions.reduce(
    (sum, other) => combined(sum, tycho[other]!.magnitude - VT_MINUS_V),
    own,
  );
  const explains = Math.abs(together - entry.magnitude) < Math.abs(own - entry.magnitude);
  return own - together > 0.05 && explains ? companions : [];
};

/** What the merge did, for the build's report. */
export interface MergeReport {
  readonly matched: number;
  readonly added: number;
  readonly medianVtMinusV: number;
  readonly spreadVtMinusV: number;
  readonly joinedCompanions: number;
  readonly placedBySefstars: number;
  readonly placedByBrightStars: number;
}

/**
 * One list of all stars to `faintest`: the Tycho-2 stars, and every bright star that Tycho-2 lacks.
 *
 * Place of a bright star: from sefstars.txt where that has it (ICRS, J2000); else from Tycho-2, unless that
 * stands more than 6 arcsec from the Bright Star Catalogue's place; else from the Bright Star Catalogue.
 * Magnitude of a bright star: from the Bright Star Catalogue; where that is the light of a close pair which
 * Tycho-2 has as two stars, they become one. All others: Tycho-2 place, V = V_T - 0.06.
 */
export const mergeStars = (
  tycho: readonly PlacedStar[],
  bright: readonly BrightStar[],
  places: readonly NamedPlace[],
  faintest: number,
): { readonly stars: MergedStar[]; readonly report: MergeReport } => {
  const known = findRows(bright, places);
  const tychoOf = pairUp(known, tycho);
  const knownOf = new Map([...tychoOf].map(([i, t]) => [t, known[i]!]));
  const near = nearbyIn(tycho);
  const count = { joinedCompanions: 0, placedBySefstars: 0, placedByBrightStars: 0 };
  const differences: number[] = [];

  const placeOf = ({ entry, row }: KnownStar, star: PlacedStar | null): Place => {
    if (row) {
      count.placedBySefstars++;
      return row;
    }
    if (star && separation(star, entry) <= DOUBTFUL) return star;
    count.placedByBrightStars++;
    return entry;
  };

  const joined = new Set(
    [...knownOf].flatMap(([t, { entry }]) => joinCompanions(tycho, t, entry, knownOf, near)),
  );
  count.joinedCompanions = joined.size;
  const moved = moveCompanions(tycho, knownOf, near);
  const stars: MergedStar[] = [];
  tycho.forEach((star, t) => {
    const found = knownOf.get(t);
    if (!found) {
      if (joined.has(t)) return;
      const own = star.magnitude - VT_MINUS_V;
      const { raRad, decRad } = moved.get(t) ?? star;
      if (own <= faintest) stars.push({ raRad, decRad, magnitude: own, bright: null });
      return;
    }
    differences.push(star.magnitude - found.entry.magnitude);
    const { raRad, decRad } = placeOf(found, star);
    stars.push({ raRad, decRad, magnitude: found.entry.magnitude, bright: found.entry });
  });
  known.forEach((star, i) => {
    if (tychoOf.has(i)) return;
    const { raRad, decRad } = placeOf(star, null);
    stars.push({ raRad, decRad, magnitude: star.entry.magnitude, bright: star.entry });
  });
  differences.sort((a, b) => a - b);
  const quantile = (part: number): number => differences[Math.floor(part * (differences.length - 1))] ?? 0;
  return {
    stars,
    report: {
      matched: tychoOf.size,
      added: bright.length - tychoOf.size,
      medianVtMinusV: quantile(0.5),
      spreadVtMinusV: (quantile(0.84) - quantile(0.16)) / 2,
      ...count,
    },
  };
};
