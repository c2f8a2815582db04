import { DEG, KM_PER_AU, toDeg } from '#sky';

/** Natural logarithm of one magnitude's ratio, negative: exp(FADING * m) dims by m magnitudes. */
export const FADING = -0.4 * Math.LN10;

const MEAN_DISTANCE_KM = 384_400;

const RAYLEIGH = 10 ** 5.36;
const AEROSOL = 10 ** 6.15;
const AEROSOL_PER_DEGREE = -Math.LN10 / 40;
const NEAR_DEG = 10;
const NEAR_AEROSOL = 6.2e7;
const MOON_RADIUS_DEG = 0.25;

/**
 * Heights of the Moon's centre between which its light on the sky grows from nothing to the published law.
 */
const MOON_LIGHT_FROM = -0.8333 * DEG;
const MOON_LIGHT_FULL = 5 * DEG;

/**
 * Airmass for sky light at a height whose sine is `sinAltitude`: Krisciunas & Schaefer 1991 (PASP 103, 1033,
 * eq. 3). It stays at 5 on the horizon, because light is scattered into the path all along it.
 */
export function skyAirmass(sinAltitude: number): number {
  return 1 / Math.sqrt(0.04 + 0.96 * sinAltitude * sinAltitude);
}

/** Lit fraction of the Moon's disc, 0 to 1, from its phase angle in radians (0 at full Moon). */
export function moonIlluminatedFraction(phaseAngleRad: number): number {
  return 0.5 * (1 + Math.cos(phaseAngleRad));
}

/**
 * How strongly moonlight is scattered towards the eye at a given cosine of the angle from the Moon
 * (Krisciunas & Schaefer 1991, eqs 16-21). Within 10 degrees the paper's near branch starts 14% lower than
 * its far branch ends; the larger of the two keeps the curve unbroken.
 */
export function moonScatter(cosSeparation: number): number {
  const cosine = cosSeparation > 1 ? 1 : cosSeparation < -1 ? -1 : cosSeparation;
  const separationDeg = toDeg(Math.acos(cosine));
  let aerosol = AEROSOL * Math.exp(AEROSOL_PER_DEGREE * separationDeg);
  if (separationDeg < NEAR_DEG) {
    const angle = separationDeg > MOON_RADIUS_DEG ? separationDeg : MOON_RADIUS_DEG;
    const near = NEAR_AEROSOL / (angle * angle);
    if (near > aerosol) aerosol = near;
  }
  return RAYLEIGH * (1.06 + cosine * cosine) + aerosol;
}

/**
 * Moonlight entering the air, dimmed on its way in: the part of Krisciunas & Schaefer 1991 (eqs 15 and 20)
 * that is the same all over the sky. Times `moonScatter` and the share scattered along the line of sight it
 * gives nanolambert. Zero with the Moon down. The distance factor is our addition, and so is the smooth
 * growth while the Moon's centre climbs from -0.83 to 5 degrees: the published airmass, at most 5, lets far
 * too much light past the horizon, so that moonrise would be a jump. Above 5 degrees the law is as
 * published. The surge within 7 degrees of full and eclipses are left out.
 */
export function moonlightStrength(
  altitudeRad: number,
  phaseAngleRad: number,
  distanceAu: number,
  extinction: number,
): number {
  if (altitudeRad <= MOON_LIGHT_FROM) return 0;
  const phaseDeg = toDeg(Math.abs(phaseAngleRad));
  const inAir = skyAirmass(Math.sin(Math.max(0, altitudeRad)));
  const magnitude = 3.84 + 0.026 * phaseDeg + 4e-9 * phaseDeg ** 4 + extinction * inAir;
  const nearness = MEAN_DISTANCE_KM / (distanceAu * KM_PER_AU);
  const climb = Math.min(1, (altitudeRad - MOON_LIGHT_FROM) / (MOON_LIGHT_FULL - MOON_LIGHT_FROM));
  return Math.exp(FADING * magnitude) * nearness * nearness * climb * climb * (3 - 2 * climb);
}
