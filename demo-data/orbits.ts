import { earthState, equatorialToEcliptic, MS_PER_DAY, toDeg, wrapTwoPi } from '#sky';
import { type ElementSetInput } from '#club';

/**
 * The invented bodies of the demo. Their orbits are turned and timed by where the Earth stands around the day
 * the demo is built, so that they are well placed in the evenings of the coming season whenever that is; a
 * test tries every month of the year.
 */

/** A shape of orbit, with its node counted from the Earth's heliocentric longitude on a reference day. */
interface InventedOrbit {
  readonly kind: 'comet' | 'asteroid';
  readonly designation: string;
  readonly perihelionDistanceAu: number;
  readonly eccentricity: number;
  readonly inclinationDeg: number;
  readonly nodeFromEarthDeg: number;
  readonly argumentOfPerihelionDeg: number;
  readonly perihelionAfterDays: number;
  readonly earthAfterDays: number;
  readonly absoluteMagnitude: number;
  /** n of a comet's law, G of an asteroid's. */
  readonly slope: number;
}

export const COMET_NAME = 'Ilvermere';
export const BELT_ASTEROID_NAME = 'Corvane';
export const NEAR_ASTEROID_NAME = 'Lindeth';

function comet(asOf: string): InventedOrbit {
  return {
    kind: 'comet',
    designation: cometDesignation(asOf),
    perihelionDistanceAu: 1.273699,
    eccentricity: 1.000302,
    inclinationDeg: 61.9664,
    nodeFromEarthDeg: 204.9627,
    argumentOfPerihelionDeg: 149.6428,
    perihelionAfterDays: 101.1133,
    earthAfterDays: 60,
    absoluteMagnitude: 5.6,
    slope: 4,
  };
}

const BELT_ASTEROID: InventedOrbit = {
  kind: 'asteroid',
  designation: '(999031)',
  perihelionDistanceAu: 2.1043,
  eccentricity: 0.0931,
  inclinationDeg: 33.6277,
  nodeFromEarthDeg: 234.051,
  argumentOfPerihelionDeg: 7.2857,
  perihelionAfterDays: -123.2883,
  earthAfterDays: 40,
  absoluteMagnitude: 3.9,
  slope: 0.15,
};

const NEAR_ASTEROID: InventedOrbit = {
  kind: 'asteroid',
  designation: '(999078)',
  perihelionDistanceAu: 1.155638,
  eccentricity: 0.488929,
  inclinationDeg: 13.4056,
  nodeFromEarthDeg: 264.3283,
  argumentOfPerihelionDeg: 118.879,
  perihelionAfterDays: 116.6445,
  earthAfterDays: 40,
  absoluteMagnitude: 8.6,
  slope: 0.15,
};

/** The comet's first elements, from few observations, and the better ones that replaced them. */
export function cometElementSets(asOf: string): readonly [old: ElementSetInput, renewed: ElementSetInput] {
  const orbit = comet(asOf);
  const early: InventedOrbit = {
    ...orbit,
    perihelionDistanceAu: orbit.perihelionDistanceAu + 0.0019,
    eccentricity: 1,
    inclinationDeg: orbit.inclinationDeg + 0.061,
    perihelionAfterDays: orbit.perihelionAfterDays - 0.38,
  };
  return [
    { ...elements(early, asOf, -110), source: 'Invented circular 1, from 9 days of observations' },
    { ...elements(orbit, asOf, -12), source: 'Invented circular 4, from 107 days of observations' },
  ];
}

export function beltAsteroidElements(asOf: string): ElementSetInput {
  return { ...elements(BELT_ASTEROID, asOf, -25), source: 'Invented circular 2' };
}

export function nearAsteroidElements(asOf: string): ElementSetInput {
  return { ...elements(NEAR_ASTEROID, asOf, -25), source: 'Invented circular 3' };
}

/** "C/2026 K4": the half-month 200 days before, and an order in it. */
export function cometDesignation(asOf: string): string {
  const found = new Date(Date.parse(asOf) - 200 * MS_PER_DAY);
  // The letter I is left out of the half-months.
  const letter = 'ABCDEFGHJKLMNOPQRSTUVWXY'[2 * found.getUTCMonth() + (found.getUTCDate() > 15 ? 1 : 0)]!;
  return `C/${found.getUTCFullYear()} ${letter}4`;
}

function elements(orbit: InventedOrbit, asOf: string, epochAfterDays: number): ElementSetInput {
  const start = Date.parse(asOf);
  const node = earthLongitudeDeg(start + orbit.earthAfterDays * MS_PER_DAY) + orbit.nodeFromEarthDeg;
  return {
    kind: orbit.kind,
    designation: orbit.designation,
    epoch: ttDay(start + epochAfterDays * MS_PER_DAY),
    perihelionTime: ttTime(start + orbit.perihelionAfterDays * MS_PER_DAY),
    perihelionDistanceAu: orbit.perihelionDistanceAu,
    eccentricity: orbit.eccentricity,
    inclinationDeg: orbit.inclinationDeg,
    nodeDeg: Math.round((((node % 360) + 360) % 360) * 1e4) / 1e4,
    argumentOfPerihelionDeg: orbit.argumentOfPerihelionDeg,
    absoluteMagnitude: orbit.absoluteMagnitude,
    slope: orbit.slope,
  };
}

/** The Earth's heliocentric longitude, J2000 ecliptic, degrees. */
function earthLongitudeDeg(utcMs: number): number {
  const [x, y] = equatorialToEcliptic(earthState(utcMs).position);
  return toDeg(wrapTwoPi(Math.atan2(y, x)));
}

function ttDay(ms: number): string {
  return new Date(ms).toISOString().slice(0, 10);
}

function ttTime(ms: number): string {
  return new Date(ms).toISOString().slice(0, 19);
}
