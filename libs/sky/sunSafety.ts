import { toRad } from './angles';

/** The Sun counts as up while its centre stands higher than this, airless: 34' of refraction, 16' of its disc. */
export const SUN_UP_RAD = toRad(-0.8333);

/** While the Sun is up no instrument is pointed nearer to it than this (common practice). */
export const SUN_CLEARANCE_RAD = toRad(15);

/** Whether something stands too near to a Sun that is up for any instrument to be pointed at it. */
export function isNearRisenSun(elongationRad: number, sunAltitudeRad: number): boolean {
  return sunAltitudeRad > SUN_UP_RAD && elongationRad < SUN_CLEARANCE_RAD;
}
