import { Body, RotationAxis } from 'astronomy-engine';
import { wrapPi } from './angles';
import { axisAngle } from './rings';
import { LIGHT_DAYS_PER_AU } from './solarSystem';
import { astroTime, MS_PER_DAY } from './time';
import { cross, dot, norm, scale, unit, type Vector } from './vector';

/** How the Moon's face is turned: the selenographic place that stands in the middle of its disc. */
export interface Libration {
  /** East on the Moon, towards Mare Crisium, positive: more of that limb shows. Radians. */
  readonly longitudeRad: number;
  /** North positive: more of the northern limb shows. Radians. */
  readonly latitudeRad: number;
  /** Position angle of the Moon's north pole, from north through east, J2000, radians. */
  readonly axisAngleRad: number;
}

/**
 * The Moon's total libration at a UTC instant; `seen` leads from the observer (for topocentric values) or the
 * Earth's centre to the Moon, J2000, au. By the IAU rotation elements of the Moon (Archinal and others 2011) in
 * astronomy-engine; they agree with the fuller theory of Meeus 1998, chapter 53, to some hundredths of a degree.
 */
export function moonLibration(utcMs: number, seen: Vector): Libration {
  const leftMs = utcMs - norm(seen) * LIGHT_DAYS_PER_AU * MS_PER_DAY;
  const { north, spin } = RotationAxis(Body.Moon, astroTime(leftMs));
  const pole: Vector = [north.x, north.y, north.z];
  // The prime meridian is counted from the node of the Moon's equator on that of J2000.
  const node = unit(cross([0, 0, 1], pole));
  const towards = scale(unit(seen), -1);
  const turn = Math.atan2(dot(towards, cross(pole, node)), dot(towards, node));
  return {
    longitudeRad: wrapPi(turn - (spin * Math.PI) / 180),
    latitudeRad: Math.asin(Math.max(-1, Math.min(1, dot(towards, pole)))),
    axisAngleRad: axisAngle(pole, seen),
  };
}
