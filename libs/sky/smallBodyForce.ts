import { type Rates } from './dop853';
import { SUN_MU } from './orbit';
import {
  moonFromEarth,
  MOON_SHARE,
  perturberPlace,
  PERTURBERS,
  type PerturberTable,
  SUN_OVER_MASS,
} from './perturbers';
import { LIGHT_DAYS_PER_AU, RADIUS_KM } from './solarSystem';
import { KM_PER_AU } from './observer';
import { MS_PER_DAY } from './time';

/** Gravity's parameter of each perturber, au^3/day^2. */
const MU = Float64Array.from(PERTURBERS, (name) => SUN_MU / SUN_OVER_MASS[name]);
const EARTH_AND_MOON = PERTURBERS.indexOf('Earth and Moon');
/** Inside this distance the Earth and the Moon pull each for itself; outside they differ from one by 3e-5 of the pull. */
const MOON_COUNTS_WITHIN_AU = 0.05;
const EARTH_RADIUS_KM = 6_378.137;
const RADIUS_AU = Float64Array.from(
  PERTURBERS,
  (name) => (name === 'Earth and Moon' ? EARTH_RADIUS_KM : RADIUS_KM[name]) / KM_PER_AU,
);

/**
 * Rates of change of a small body's heliocentric place (au) and velocity (au/day), J2000 equator, in days of
 * TT since `epochTtMs`: the Sun, the eight planets and the Moon as points, with what their pull on the Sun
 * takes off, and general relativity of the Sun alone (first post-Newtonian term: IERS Conventions 2010,
 * Technical Note 36, equation 10.12, with beta and gamma 1). The table has to reach over every time asked for.
 */
export function smallBodyForce(table: PerturberTable, epochTtMs: number): Rates {
  const planet = new Float64Array(3);
  const perLightSquared = SUN_MU * LIGHT_DAYS_PER_AU ** 2;
  return (days, state, out) => {
    const x = state[0]!;
    const y = state[1]!;
    const z = state[2]!;
    const vx = state[3]!;
    const vy = state[4]!;
    const vz = state[5]!;
    const r2 = x * x + y * y + z * z;
    const r = Math.sqrt(r2);
    const perCube = perLightSquared / (r * r2);
    const radial = perCube * ((4 * SUN_MU) / r - (vx * vx + vy * vy + vz * vz)) - SUN_MU / (r * r2);
    const along = 4 * perCube * (x * vx + y * vy + z * vz);
    let ax = radial * x + along * vx;
    let ay = radial * y + along * vy;
    let az = radial * z + along * vz;

    const atTtMs = epochTtMs + days * MS_PER_DAY;
    for (let i = 0; i < MU.length; i++) {
      perturberPlace(table, i, atTtMs, planet);
      const px = planet[0]!;
      const py = planet[1]!;
      const pz = planet[2]!;
      const p2 = px * px + py * py + pz * pz;
      const onSun = MU[i]! / (p2 * Math.sqrt(p2));
      const dx = px - x;
      const dy = py - y;
      const dz = pz - z;
      const d2 = dx * dx + dy * dy + dz * dz;
      ax -= onSun * px;
      ay -= onSun * py;
      az -= onSun * pz;
      if (i === EARTH_AND_MOON && d2 < MOON_COUNTS_WITHIN_AU ** 2) {
        const [mx, my, mz] = moonFromEarth(atTtMs);
        for (const [share, far] of [
          [1 - MOON_SHARE, -MOON_SHARE],
          [MOON_SHARE, 1 - MOON_SHARE],
        ] as const) {
          const ex = dx + far * mx;
          const ey = dy + far * my;
          const ez = dz + far * mz;
          const e2 = ex * ex + ey * ey + ez * ez;
          const pull = (share * MU[i]!) / (e2 * Math.sqrt(e2));
          ax += pull * ex;
          ay += pull * ey;
          az += pull * ez;
        }
        continue;
      }
      const onBody = MU[i]! / (d2 * Math.sqrt(d2));
      ax += onBody * dx;
      ay += onBody * dy;
      az += onBody * dz;
    }
    out[0] = vx;
    out[1] = vy;
    out[2] = vz;
    out[3] = ax;
    out[4] = ay;
    out[5] = az;
  };
}

/** The body, by name, that a heliocentric place is inside of at a time in milliseconds of TT, or null. */
export function struckBody(table: PerturberTable, atTtMs: number, place: Float64Array): string | null {
  if (Math.hypot(place[0]!, place[1]!, place[2]!) < RADIUS_KM.Sun / KM_PER_AU) return 'the Sun';
  const planet = new Float64Array(3);
  for (let i = 0; i < PERTURBERS.length; i++) {
    perturberPlace(table, i, atTtMs, planet);
    if (i === EARTH_AND_MOON) {
      moonFromEarth(atTtMs).forEach((away, axis) => {
        planet[axis] = planet[axis]! - MOON_SHARE * away;
      });
    }
    const distance = Math.hypot(planet[0]! - place[0]!, planet[1]! - place[1]!, planet[2]! - place[2]!);
    if (distance < RADIUS_AU[i]!) return i === EARTH_AND_MOON ? 'the Earth' : PERTURBERS[i]!;
  }
  return null;
}
