import { DEG, ARCMIN } from './angles';

/**
 * Refraction to add to a true (airless) altitude, radians, at 1010 hPa and 10 degrees C (Saemundsson 1986).
 * Meant for altitudes from 0 to 90 degrees, where it holds to 0.1 arcmin; below the horizon the value of -1
 * degree is faded out, so that altitude stays continuous.
 */
export function refractionTrueToApparent(altitudeRad: number): number {
  const degrees = altitudeRad / DEG;
  const clamped = Math.max(degrees, -1);
  const arcmin = 1.02 / Math.tan((clamped + 10.3 / (clamped + 5.11)) * DEG);
  const fade = degrees >= -1 ? 1 : Math.max(0, 1 - (-1 - degrees) / 4);
  return Math.max(0, arcmin * fade) * ARCMIN;
}

/** Refraction to take from an apparent altitude, radians, same air (Bennett 1982). */
export function refractionApparentToTrue(altitudeRad: number): number {
  const degrees = Math.max(altitudeRad / DEG, -1);
  return Math.max(0, 1 / Math.tan((degrees + 7.31 / (degrees + 4.4)) * DEG)) * ARCMIN;
}
