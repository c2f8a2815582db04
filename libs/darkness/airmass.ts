import { toDeg } from '#sky';

/**
 * Relative airmass at an apparent (refracted) altitude in radians: Kasten & Young 1989, Applied Optics 28,
 * 4735. 1 at the zenith, 37.92 at the horizon; an altitude below the horizon counts as the horizon.
 */
export function airmass(apparentAltitudeRad: number): number {
  const altitudeRad = Math.max(0, apparentAltitudeRad);
  return 1 / (Math.sin(altitudeRad) + 0.50572 * (toDeg(altitudeRad) + 6.07995) ** -1.6364);
}

/**
 * Visual extinction of a clear site in magnitudes per airmass, from its elevation in metres: the scattering
 * of the air, the haze of a lowland site and ozone (Green 1992, International Comet Quarterly 14, 55).
 */
export function extinctionForElevation(elevationM: number): number {
  const heightKm = elevationM / 1000;
  return 0.1451 * Math.exp(-heightKm / 7.996) + 0.12 * Math.exp(-heightKm / 1.5) + 0.016;
}
