/** No dot is smaller: what a photocopier keeps and a dim lamp shows, millimetres across. */
export const smallestDotMm = 0.25;
/** Larger discs would hide their neighbours, millimetres across. */
export const largestDotMm = 3;
/** The dot of the faintest star on a sheet, millimetres across. */
const faintestDotMm = 0.35;
/**
 * How fast dots grow: 1 would make ink proportional to light, which prints the bright stars as blots; much less
 * and the patterns drown. One value for every scale and sheet (trade practice; no published rule).
 */
const growth = 0.8;

/**
 * The diameter in millimetres of a star's dot on a sheet whose faintest stars are of magnitude `faintest`:
 * 0.35 mm × 10^(0.2 × 0.8 × (faintest − magnitude)), from 0.25 to 3 mm. Common practice.
 */
export function dotDiameterMm(magnitude: number, faintest: number): number {
  const diameter = faintestDotMm * 10 ** (0.2 * growth * (faintest - magnitude));
  return Math.min(largestDotMm, Math.max(smallestDotMm, diameter));
}
