/**
 * Sky brightness is measured in V magnitudes per square arcsecond but adds up as luminance, here in
 * nanolambert (1 nL = 1e-5/pi cd/m2), by the conversion of Krisciunas & Schaefer 1991 (PASP 103, 1033, eq.
 * 1).
 */
const SCALE_NL = 34.08;
const OFFSET = 20.7233;
const PER_MAGNITUDE = 0.92104;

/** Luminance in nanolambert of a sky of `mag` V magnitudes per square arcsecond. */
export function magToLuminance(mag: number): number {
  return SCALE_NL * Math.exp(OFFSET - PER_MAGNITUDE * mag);
}

/** V magnitudes per square arcsecond of a sky of `nanolambert` (more than 0). */
export function luminanceToMag(nanolambert: number): number {
  return (OFFSET - Math.log(nanolambert / SCALE_NL)) / PER_MAGNITUDE;
}

/**
 * The brightest sky that still counts as each class 1 to 7, mag/arcsec2 at the zenith. Bortle 2001 gave no
 * photometry; these limits are common practice, and tables of them differ by some tenths.
 */
const CLASS_LIMITS = [21.99, 21.89, 21.69, 20.49, 19.5, 18.94, 18.38] as const;
const DARKEST = 22.0;
/** Classes 8 and 9 have no agreed limits: our choice, a suburb's edge and a city centre. */
const CLASS_8 = 18.1;
const CLASS_9 = 17.5;

/**
 * A zenith sky brightness in V mag/arcsec2 for a Bortle class, 1 to 9: the middle of the class's usual range.
 * A stand-in for sites nobody has measured; let a measured value override it. Throws a RangeError for
 * anything but a whole class.
 */
export function skyFromBortle(classNumber: number): number {
  if (!Number.isInteger(classNumber) || classNumber < 1 || classNumber > 9) {
    throw new RangeError(`Bortle class was ${String(classNumber)}; give a whole number from 1 to 9.`);
  }
  if (classNumber === 9) return CLASS_9;
  if (classNumber === 8) return CLASS_8;
  const brightest = CLASS_LIMITS[classNumber - 1]!;
  const darkest = classNumber === 1 ? DARKEST : CLASS_LIMITS[classNumber - 2]!;
  return 0.5 * (brightest + darkest);
}
