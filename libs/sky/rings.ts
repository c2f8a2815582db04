import { subLatitude } from './appearance';
import { skyAxes } from './moons';
import { KM_PER_AU } from './observer';
import { heliocentricPlace, LIGHT_DAYS_PER_AU, poleOf } from './solarSystem';
import { MS_PER_DAY } from './time';
import { dot, norm, rejected, subtract, unit, type Vector } from './vector';

/** Outer edge of Saturn's ring A, km (Cassini imaging; NASA planetary fact sheets, from memory). */
const OUTER_EDGE_KM = 136_775;
/** Inner edge of ring B, km: within it little light is left (the same source, from memory). */
const INNER_EDGE_KM = 92_000;

/** How Saturn's rings show themselves (Meeus 1998, chapter 45). */
export interface SaturnRings {
  /** Latitude of the observer over the plane of the rings, radians: positive where the northern face shows. */
  readonly tiltRad: number;
  /** Of the Sun likewise; where the signs differ the face that shows is unlit. */
  readonly sunTiltRad: number;
  /** Of the northern half of the minor axis, from north through east, J2000, radians. */
  readonly axisAngleRad: number;
  /** Axes of the outer edge, radians across. */
  readonly majorRad: number;
  readonly minorRad: number;
  /** Inner edge as a share of the outer. */
  readonly innerShare: number;
}

/** Saturn's rings at a UTC instant; `seen` leads from the observer to the planet, J2000, au. */
export function saturnRings(utcMs: number, seen: Vector): SaturnRings {
  const distance = norm(seen);
  const leftMs = utcMs - distance * LIGHT_DAYS_PER_AU * MS_PER_DAY;
  const pole = poleOf('Saturn', leftMs);
  const planet = heliocentricPlace('Saturn', leftMs);
  const tiltRad = subLatitude(pole, planet, subtract(planet, seen));
  const majorRad = 2 * Math.atan(OUTER_EDGE_KM / KM_PER_AU / distance);
  return {
    tiltRad,
    sunTiltRad: subLatitude(pole, planet, [0, 0, 0]),
    axisAngleRad: axisAngle(pole, seen),
    majorRad,
    minorRad: majorRad * Math.abs(Math.sin(tiltRad)),
    innerShare: INNER_EDGE_KM / OUTER_EDGE_KM,
  };
}

/** Position angle, from north through east in (-π, π], of an axis seen at the end of `seen`, same frame. */
export function axisAngle(axis: Vector, seen: Vector): number {
  const ahead = unit(seen);
  const { east, north } = skyAxes(ahead);
  const flat = rejected(axis, ahead);
  return Math.atan2(dot(flat, east), dot(flat, north));
}
