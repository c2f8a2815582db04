import { Body, HelioVector } from 'astronomy-engine';
import { type Chebyshev, evaluateChebyshev, fitChebyshev } from './chebyshev';
import { planetCorrection } from './planetCorrection';
import { geocentricMoon, heliocentricPlace, type PlanetName } from './solarSystem';
import { astroTime, jdToUtcMs, MS_PER_DAY, ttJdToUtcMs, utcMsToJd } from './time';
import { type Vector } from './vector';

/** What pulls on a small body besides the Sun; the Earth and the Moon pull as one except close by. */
export type Perturber = PlanetName | 'Earth and Moon';

/** Sun's mass over each system's (IAU 2009 system of astronomical constants). */
export const SUN_OVER_MASS: Readonly<Record<Perturber, number>> = {
  Mercury: 6_023_600,
  Venus: 408_523.719,
  'Earth and Moon': 328_900.5596,
  Mars: 3_098_703.59,
  Jupiter: 1_047.348644,
  Saturn: 3_497.9018,
  Uranus: 22_902.98,
  Neptune: 19_412.26,
};

/** Earth's mass over the Moon's (IAU 2009). */
export const EARTH_OVER_MOON = 81.3005691;
/** Share of the Earth and Moon together that is the Moon. */
export const MOON_SHARE = 1 / (1 + EARTH_OVER_MOON);

/**
 * In the order of a table's places: days in a piece and degree, which hold each to 3e-7 au. The outer planets
 * move slowly, but the Sun that they are measured from sways by 3e-6 au within a year.
 */
const PIECES: Readonly<Record<Perturber, readonly [days: number, degree: number]>> = {
  Mercury: [16, 9],
  Venus: [64, 11],
  'Earth and Moon': [64, 11],
  Mars: [128, 11],
  Jupiter: [128, 9],
  Saturn: [64, 9],
  Uranus: [64, 9],
  Neptune: [64, 9],
};
export const PERTURBERS = Object.keys(PIECES) as readonly Perturber[];

/**
 * Heliocentric places of the perturbers over a span, J2000 equator, au: fitted once and shared by all the
 * bodies of a season. Plain data.
 */
export interface PerturberTable {
  readonly fromTtJd: number;
  readonly toTtJd: number;
  /** One a perturber, in the order of PERTURBERS; times are milliseconds of TT. */
  readonly places: readonly Chebyshev[];
}

/** A TT Julian date in milliseconds of TT since the Unix epoch's date: the time of tables and motions. */
export function ttMs(ttJd: number): number {
  return jdToUtcMs(ttJd);
}

/** Fits the perturbers' places over a span of TT Julian dates, to 3e-7 au. */
export function perturberTable(fromTtJd: number, toTtJd: number): PerturberTable {
  return {
    fromTtJd,
    toTtJd,
    places: PERTURBERS.map((perturber) => {
      const [days, degree] = PIECES[perturber];
      const sample = (ms: number, out: Float64Array) => {
        out.set(placeOf(perturber, utcMsToJd(ms)));
      };
      return fitChebyshev(sample, 3, ttMs(fromTtJd), ttMs(toTtJd), days * MS_PER_DAY, degree);
    }),
  };
}

/** Writes a perturber's place at a time in milliseconds of TT into `out`. */
export function perturberPlace(
  table: PerturberTable,
  perturber: number,
  atTtMs: number,
  out: Float64Array,
): void {
  evaluateChebyshev(table.places[perturber]!, atTtMs, out);
}

/** Whether a table reaches over a whole span. */
export function tableCovers(table: PerturberTable, fromTtJd: number, toTtJd: number): boolean {
  return table.fromTtJd <= fromTtJd && table.toTtJd >= toTtJd;
}

/** The Moon from the Earth's centre at a time in milliseconds of TT, au, J2000 equator. */
export function moonFromEarth(atTtMs: number): Vector {
  return geocentricMoon(ttJdToUtcMs(utcMsToJd(atTtMs)));
}

function placeOf(perturber: Perturber, ttJd: number): Vector {
  const utcMs = ttJdToUtcMs(ttJd);
  if (perturber !== 'Earth and Moon') return heliocentricPlace(perturber, utcMs);
  const earth = HelioVector(Body.Earth, astroTime(utcMs));
  const correction = planetCorrection('Earth', ttJd);
  const moon = geocentricMoon(utcMs);
  return [
    earth.x + correction[0] + MOON_SHARE * moon[0],
    earth.y + correction[1] + MOON_SHARE * moon[1],
    earth.z + correction[2] + MOON_SHARE * moon[2],
  ];
}
