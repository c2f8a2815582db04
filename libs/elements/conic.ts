import { GAUSS_K, toDeg } from '#sky';

/** Days in a Julian year, the year in which periods are given. */
export const YEAR_DAYS = 365.25;
const K_DEG = toDeg(GAUSS_K);

/** Mean motion in degrees a day of an orbit with this semi-major axis (au, its size counts): k / |a|^1.5. */
export function meanMotion(semiMajorAxisAu: number): number {
  const a = Math.abs(semiMajorAxisAu);
  return K_DEG / (a * Math.sqrt(a));
}

/** Size of the semi-major axis in au of an orbit with this mean motion in degrees a day. */
export function axisFromMotion(meanMotionDegPerDay: number): number {
  return Math.cbrt((K_DEG / meanMotionDegPerDay) ** 2);
}

/** Period in Julian years of a mean motion in degrees a day. */
export function periodFromMotion(meanMotionDegPerDay: number): number {
  return 360 / (meanMotionDegPerDay * YEAR_DAYS);
}

/** Mean motion in degrees a day of a period in Julian years. */
export function motionFromPeriod(periodYears: number): number {
  return 360 / (periodYears * YEAR_DAYS);
}

/** The same angle in [0, 360), degrees. */
export function wrap360(deg: number): number {
  if (deg >= 0 && deg < 360) return deg;
  const wrapped = deg % 360;
  const positive = wrapped < 0 ? wrapped + 360 : wrapped;
  return positive === 360 ? 0 : positive;
}

/** The same angle in (-180, 180], degrees. */
export function wrap180(deg: number): number {
  const wrapped = wrap360(deg);
  return wrapped > 180 ? wrapped - 360 : wrapped;
}
