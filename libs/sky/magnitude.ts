import { DEG, toDeg } from './angles';
import { type PlanetName } from './solarSystem';
import { type Brightness, type CometBrightness } from './target';

/** Half width of the range given for a comet's magnitude: misses of a magnitude are common practice. */
const COMET_RANGE = 1;

/** Total magnitude of a comet, r and Delta in au. */
export function cometMagnitude(law: CometBrightness, sunDistanceAu: number, distanceAu: number): number {
  return law.absoluteMagnitude + 5 * Math.log10(distanceAu) + 2.5 * law.activity * Math.log10(sunDistanceAu);
}

/** V magnitude of a minor planet by the H, G law (Bowell et al. 1989, full form), phase angle in radians. */
export function asteroidMagnitude(
  absoluteMagnitude: number,
  slope: number,
  sunDistanceAu: number,
  distanceAu: number,
  phaseAngleRad: number,
): number {
  // The law is stated to 120 degrees; beyond that it is held, being only a bound for so thin a crescent.
  const phase = Math.min(phaseAngleRad, 120 * DEG);
  const half = Math.tan(phase / 2);
  const sin = Math.sin(phase);
  const near = Math.exp(-90.56 * half * half);
  const ratio = sin / (0.119 + 1.341 * sin - 0.754 * sin * sin);
  const phi1 = near * (1 - 0.986 * ratio) + (1 - near) * Math.exp(-3.332 * half ** 0.631);
  const phi2 = near * (1 - 0.238 * ratio) + (1 - near) * Math.exp(-1.862 * half ** 1.218);
  return (
    absoluteMagnitude +
    5 * Math.log10(sunDistanceAu * distanceAu) -
    2.5 * Math.log10((1 - slope) * phi1 + slope * phi2)
  );
}

/** Magnitude of a small body and the brighter and fainter bounds to expect. */
export function smallBodyMagnitude(
  law: Brightness,
  sunDistanceAu: number,
  distanceAu: number,
  phaseAngleRad: number,
): { readonly magnitude: number; readonly range: readonly [bright: number, faint: number] } {
  if (law.kind === 'comet') {
    const magnitude = cometMagnitude(law, sunDistanceAu, distanceAu);
    return { magnitude, range: [magnitude - COMET_RANGE, magnitude + COMET_RANGE] };
  }
  const magnitude = asteroidMagnitude(
    law.absoluteMagnitude,
    law.slope,
    sunDistanceAu,
    distanceAu,
    phaseAngleRad,
  );
  // Rotation and the law itself: 0.3 mag covers the bright asteroids (common practice).
  return { magnitude, range: [magnitude - 0.3, magnitude + 0.3] };
}

/** Tilt of a planet's axis as seen from the Earth and from the Sun, planetocentric latitudes in radians. */
export interface AxisTilt {
  readonly subEarthRad: number;
  readonly subSunRad: number;
}

/**
 * V magnitude of a planet (Mallama and Hilton 2018, Astronomy and Computing 25, 10; the Mars rotation and
 * season terms left out, 0.06 mag). Phase angle in radians; `tilt` matters to Saturn and Uranus alone.
 */
export function planetMagnitude(
  planet: PlanetName,
  sunDistanceAu: number,
  distanceAu: number,
  phaseAngleRad: number,
  tilt: AxisTilt,
): number {
  return 5 * Math.log10(sunDistanceAu * distanceAu) + phaseTerm(planet, toDeg(phaseAngleRad), tilt);
}

function phaseTerm(planet: PlanetName, a: number, tilt: AxisTilt): number {
  switch (planet) {
    case 'Mercury':
      return polynomial(a, [-0.613, 6.328e-2, -1.6336e-3, 3.3644e-5, -3.4265e-7, 1.6893e-9, -3.0334e-12]);
    case 'Venus':
      return a < 163.7
        ? polynomial(a, [-4.384, -1.044e-3, 3.687e-4, -2.814e-6, 8.938e-9])
        : polynomial(a, [236.05828, -2.81914, 8.39034e-3]);
    case 'Mars':
      return polynomial(a, [-1.601, 0.02267, -1.302e-4]);
    case 'Jupiter':
      return polynomial(a, [-9.395, -3.7e-4, 6.16e-4]);
    case 'Saturn': {
      const sameSide = tilt.subEarthRad * tilt.subSunRad > 0;
      const sinTilt = sameSide ? Math.sin(Math.sqrt(tilt.subEarthRad * tilt.subSunRad)) : 0;
      return -8.914 - 1.825 * sinTilt + 0.026 * a - 0.378 * sinTilt * Math.exp(-2.25 * a);
    }
    case 'Uranus':
      return -7.11 - (8.4e-4 * (Math.abs(toDeg(tilt.subEarthRad)) + Math.abs(toDeg(tilt.subSunRad)))) / 2;
    case 'Neptune':
      return -7.0;
  }
}

/** V magnitude of the Moon at a phase angle, with its distances (Allen 1976, Astrophysical Quantities). */
export function moonMagnitude(sunDistanceAu: number, distanceAu: number, phaseAngleRad: number): number {
  const a = Math.abs(toDeg(phaseAngleRad));
  const meanDistanceAu = 384_400 / 149_597_870.7;
  return -12.73 + 0.026 * a + 4e-9 * a ** 4 + 5 * Math.log10((sunDistanceAu * distanceAu) / meanDistanceAu);
}

/** V magnitude of the Sun at a distance in au (Willmer 2018: -26.76 at 1 au). */
export function sunMagnitude(distanceAu: number): number {
  return -26.76 + 5 * Math.log10(distanceAu);
}

function polynomial(x: number, coefficients: readonly number[]): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
}
