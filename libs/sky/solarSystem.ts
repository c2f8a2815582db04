import {
  Body,
  GeoMoon,
  HelioState,
  HelioVector,
  Rotation_EQJ_EQD,
  RotationAxis,
  type RotationMatrix,
} from 'astronomy-engine';
import { planetCorrection } from './planetCorrection';
import { astroTime, MS_PER_DAY, utcMsToTtJd } from './time';
import { type State } from './orbit';
import { add, type Matrix, rotate, type Vector } from './vector';

/** The bodies whose places come from the planetary library. */
export type SolarBody = 'Sun' | 'Moon' | PlanetName;
export type PlanetName = 'Mercury' | 'Venus' | 'Mars' | 'Jupiter' | 'Saturn' | 'Uranus' | 'Neptune';

export const PLANETS: readonly PlanetName[] = [
  'Mercury',
  'Venus',
  'Mars',
  'Jupiter',
  'Saturn',
  'Uranus',
  'Neptune',
];
export const SOLAR_BODIES: readonly SolarBody[] = ['Sun', 'Moon', ...PLANETS];

/** Days that light needs for one au (IAU 2012 au, exact speed of light). */
export const LIGHT_DAYS_PER_AU = 1 / 173.1446326847;

/** Equatorial radii in km (IAU Working Group on Cartographic Coordinates 2015; Sun IAU 2015 nominal). */
export const RADIUS_KM: Readonly<Record<SolarBody, number>> = {
  Sun: 695_700,
  Moon: 1_737.4,
  Mercury: 2_440.53,
  Venus: 6_051.8,
  Mars: 3_396.19,
  Jupiter: 71_492,
  Saturn: 60_268,
  Uranus: 25_559,
  Neptune: 24_764,
};

/** Heliocentric Earth, place (au) and velocity (au/day), J2000 equator. */
export function earthState(utcMs: number): State {
  const s = HelioState(Body.Earth, astroTime(utcMs));
  const position = add([s.x, s.y, s.z], planetCorrection('Earth', utcMsToTtJd(utcMs)));
  return { position, velocity: [s.vx, s.vy, s.vz] };
}

/** Geometric heliocentric place of a body, au, J2000 equator. The Moon's is the Earth's plus its own orbit. */
export function heliocentricPlace(body: SolarBody, utcMs: number): Vector {
  if (body === 'Sun') return [0, 0, 0];
  if (body === 'Moon') return add(earthState(utcMs).position, geocentricMoon(utcMs));
  const v = HelioVector(body as Body, astroTime(utcMs));
  return add([v.x, v.y, v.z], planetCorrection(body, utcMsToTtJd(utcMs)));
}

/** Geometric geocentric Moon, au, J2000 equator. */
export function geocentricMoon(utcMs: number): Vector {
  const v = GeoMoon(astroTime(utcMs));
  return [v.x, v.y, v.z];
}

/** Rotation from the J2000 equator to the true equator and equinox of date (precession and nutation). */
export function j2000ToDate(utcMs: number): Matrix {
  return toMatrix(Rotation_EQJ_EQD(astroTime(utcMs)));
}

/** Unit vector along the north pole of a planet, J2000 equator (IAU rotation elements). */
export function poleOf(body: SolarBody, utcMs: number): Vector {
  const { x, y, z } = RotationAxis(body as Body, astroTime(utcMs)).north;
  return [x, y, z];
}

/**
 * Apparent geocentric Moon, au, true equator of date: where it stood one light time ago. Moon and
 * observer share the Earth's motion about the Sun, so its annual aberration cancels against that.
 */
export function apparentMoon(utcMs: number): Vector {
  const lightMs = (384_400 / 149_597_870.7) * LIGHT_DAYS_PER_AU * MS_PER_DAY;
  return rotate(j2000ToDate(utcMs), geocentricMoon(utcMs - lightMs));
}

function toMatrix({ rot }: RotationMatrix): Matrix {
  // The library keeps columns first.
  return [
    [rot[0]![0]!, rot[1]![0]!, rot[2]![0]!],
    [rot[0]![1]!, rot[1]![1]!, rot[2]![1]!],
    [rot[0]![2]!, rot[1]![2]!, rot[2]![2]!],
  ];
}
