/**
 * Crumey 2014 (MNRAS 442, 2600): the least contrast at which an eye sees a uniform disc on a sky, fitted to
 * laboratory thresholds. Two curves of the sky's luminance describe it: the contrast times area of discs too
 * small to be seen as discs, and the contrast of boundless ones.
 */
export interface ContrastPair {
  /** Contrast times area, steradians, for small discs; `x` is luminance in cd/m2 to the power -1/4. */
  readonly small: (x: number) => number;
  /** Contrast of a boundless disc. */
  readonly large: (x: number) => number;
}

/** Crumey's eqs 25 and 28, 39 and 40: night to daylight. */
export const FULL_PAIR: ContrastPair = {
  small: (x) => (Math.sqrt((5.949e-8 * x - 2.389e-7) * x + 2.459e-7) + 4.12e-4 * x - 4.225e-4) ** 2,
  large: (x) => Math.sqrt((9.606e-6 * x - 4.112e-5) * x + 5.019e-5) + 4.837e-3 * x - 4.884e-3,
};

/** One way of looking: an aperture at one power, or the naked eye as an aperture of one pupil at power 1. */
export interface View {
  readonly apertureMm: number;
  readonly magnification: number;
  /** How much the optics dim, 1 or more (Crumey's F_t). */
  readonly dimming: number;
  /** Field factor with the loss from using one eye in it (Crumey's phi). */
  readonly observerFactor: number;
  readonly pupilMm: number;
}

/** Below this luminance (cd/m2) an eye does not gain by a darker background. */
const DARKEST_CD = 1e-5;

/** Luminance in cd/m2 of a sky in V mag/arcsec2, as Crumey converts. */
export function magToCandela(mag: number): number {
  return 10 ** ((12.58 - mag) / 2.5);
}

/**
 * The faintest V magnitude of a disc of `areaSr` steradians (0 for a point) that shows in one view against a
 * sky of `skyCd` cd/m2 (Crumey 2014, eqs 41-44, 66-68, 81-88). Extinction is the object's own affair.
 */
export function viewLimit(pair: ContrastPair, view: View, skyCd: number, areaSr: number): number {
  const { apertureMm, magnification, dimming, observerFactor, pupilMm } = view;
  const exitPupil = apertureMm / magnification;
  const filled = Math.min(exitPupil, pupilMm) / pupilMm;
  const gathered = Math.max(exitPupil, pupilMm) / apertureMm;
  const seenCd = Math.max(DARKEST_CD, (filled * filled * skyCd) / dimming);
  const x = seenCd ** -0.25;
  const small = pair.small(x);
  const pointLimit =
    -13.99 - 2.5 * Math.log10(gathered * gathered * dimming * observerFactor * seenCd * small);
  if (areaSr <= 0) return pointLimit;
  const q = blend(seenCd);
  const seenArea = (areaSr * magnification * magnification * pair.large(x)) / small;
  return pointLimit - (2.5 / q) * Math.log10(seenArea ** q + 1);
}

/** How gradually small discs turn into large ones (Crumey's q, eqs 42-44). */
function blend(seenCd: number): number {
  if (seenCd < 0.193) return 0.6;
  if (seenCd < 3.4) return 0.8861 + 0.4 * Math.log10(seenCd);
  return 1.146 - 0.0885 * Math.log10(seenCd);
}
