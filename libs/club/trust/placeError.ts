/** What is known of a body's orbit that bears on how far its place may be off. */
export interface OrbitStanding {
  readonly kind: 'comet' | 'asteroid';
  /** Whether it carries a permanent number: it was followed through several returns. */
  readonly numbered: boolean;
  /** Days of observations behind the elements; null where nobody says. */
  readonly arcDays: number | null;
  /** Days from the elements' epoch to the instant; negative before the epoch. */
  readonly ageDays: number;
  /** From the observer, au. */
  readonly distanceAu: number;
  /** The least distance from the Sun between the epoch and the instant, au. */
  readonly leastSunDistanceAu: number;
}

/** Between what the place may be off, arcsec: a good case and a bad one, not bounds. */
export interface PlaceError {
  readonly likelyArcsec: number;
  readonly badArcsec: number;
  /** What the two come from, largest first, in the bad case. */
  readonly parts: readonly ErrorPart[];
}

export interface ErrorPart {
  readonly cause: 'observations' | 'outgassing' | 'reckoning';
  readonly likelyArcsec: number;
  readonly badArcsec: number;
}

const ARCSEC_PER_RAD = 206_264.806;
/** Half the sky: a place that is off by more is no place at all. */
const MOST_ARCSEC = 180 * 3600;

/** Days of observations assumed where nobody says: of a numbered body, of a comet or asteroid just found. */
const ARC_NUMBERED_DAYS = 2000;
const ARC_NEW_DAYS = 30;

/** What a well-determined orbit is off at its own epoch, arcsec. */
const FIT_LIKELY_ARCSEC = 0.5;
const FIT_BAD_ARCSEC = 1;

/**
 * Acceleration by outgassing at 1 au from the Sun, au/day^2: a quiet and a lively comet (the range of A1 in
 * published lists, from memory).
 */
const OUTGASSING_LIKELY = 1e-9;
const OUTGASSING_BAD = 3e-8;

/**
 * How far a body's place may be off: a rule of thumb of this program, common practice in what it takes into
 * account and made for one question only, whether the body will be in the field. It is no error bar: a
 * circular with covariances knows better.
 *
 * - observations: an orbit fitted to an arc of A days is off by 0.5 to 1 arcsec at its epoch, and t days from it
 *   by (1 + 2t/A)^2 to (1 + 2t/A)^3 times that, since place, motion and curvature are each known the worse the
 *   shorter the arc. Newly found bodies have short arcs and drift fast. An unknown arc counts as 30 days, that
 *   of a numbered body as 2000.
 * - outgassing (comets): not modelled here; an acceleration of 1e-9 to 3e-8 au/day^2 at 1 au, falling off with
 *   the Sun's distance as water ice boils away (Marsden, Sekanina and Yeomans 1973), acts from the epoch on:
 *   a t^2 / 2, seen from the body's distance.
 * - reckoning: this program's own motion under the planets, within 3 arcsec at 300 days from the epoch and 6 at
 *   700 (checked in test/reference/perturbed).
 */
export function expectedPlaceError(standing: OrbitStanding): PlaceError {
  const t = Math.abs(standing.ageDays);
  const parts = [
    observationPart(standing, t),
    ...(standing.kind === 'comet' ? [outgassingPart(standing, t)] : []),
    { cause: 'reckoning' as const, likelyArcsec: 0.1, badArcsec: Math.max(0.1, (3 * t) / 300) },
  ].sort((a, b) => b.badArcsec - a.badArcsec);
  const sum = (of: (part: ErrorPart) => number): number =>
    Math.min(MOST_ARCSEC, Math.hypot(...parts.map(of)));
  return {
    likelyArcsec: sum(({ likelyArcsec }) => likelyArcsec),
    badArcsec: sum(({ badArcsec }) => badArcsec),
    parts,
  };
}

/** The arc that the rule counts with, days. */
export function arcCounted({ arcDays, numbered }: Pick<OrbitStanding, 'arcDays' | 'numbered'>): number {
  const arc = arcDays ?? (numbered ? ARC_NUMBERED_DAYS : ARC_NEW_DAYS);
  // One night's observations give no orbit; two nights' hardly do.
  return Math.max(2, arc);
}

function observationPart(standing: OrbitStanding, t: number): ErrorPart {
  const growth = 1 + (2 * t) / arcCounted(standing);
  return {
    cause: 'observations',
    likelyArcsec: Math.min(MOST_ARCSEC, FIT_LIKELY_ARCSEC * growth ** 2),
    badArcsec: Math.min(MOST_ARCSEC, FIT_BAD_ARCSEC * growth ** 3),
  };
}

function outgassingPart({ distanceAu, leastSunDistanceAu }: OrbitStanding, t: number): ErrorPart {
  const atOneAu = (0.5 * t * t * waterIce(leastSunDistanceAu) * ARCSEC_PER_RAD) / distanceAu;
  return {
    cause: 'outgassing',
    likelyArcsec: Math.min(MOST_ARCSEC, OUTGASSING_LIKELY * atOneAu),
    badArcsec: Math.min(MOST_ARCSEC, OUTGASSING_BAD * atOneAu),
  };
}

/** How fast water ice turns to vapour at a distance from the Sun, 1 at 1 au (Marsden, Sekanina and Yeomans 1973). */
function waterIce(sunDistanceAu: number): number {
  const ratio = sunDistanceAu / 2.808;
  return 0.111262 * ratio ** -2.15 * (1 + ratio ** 5.093) ** -4.6142;
}
