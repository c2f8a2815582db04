import { type ElementFrame } from './frame';

/**
 * What somebody knows of an orbit; any sufficient part is enough. Degrees, au, days, Julian years; times as
 * TT Julian dates.
 */
export interface GivenElements {
  readonly designation?: string | null | undefined;
  readonly name?: string | null | undefined;
  readonly kind?: 'comet' | 'asteroid' | null | undefined;
  readonly epochTtJd?: number | null | undefined;
  readonly perihelionTtJd?: number | null | undefined;
  readonly perihelionDistanceAu?: number | null | undefined;
  readonly aphelionDistanceAu?: number | null | undefined;
  readonly eccentricity?: number | null | undefined;
  readonly semiMajorAxisAu?: number | null | undefined;
  readonly meanAnomalyDeg?: number | null | undefined;
  readonly meanMotionDegPerDay?: number | null | undefined;
  readonly periodYears?: number | null | undefined;
  readonly inclinationDeg?: number | null | undefined;
  readonly nodeDeg?: number | null | undefined;
  readonly argumentOfPerihelionDeg?: number | null | undefined;
  /** Node plus argument of perihelion, which some lists give in place of the argument. */
  readonly longitudeOfPerihelionDeg?: number | null | undefined;
  readonly absoluteMagnitude?: number | null | undefined;
  /** n of a comet's law, G of an asteroid's. */
  readonly slope?: number | null | undefined;
  /** Which law the magnitude and slope belong to; by default the body's own kind. */
  readonly law?: 'comet' | 'asteroid' | null | undefined;
  /** What the angles refer to; the ecliptic and equinox J2000 unless declared. */
  readonly frame?: ElementFrame | null | undefined;
  readonly source?: string | null | undefined;
}
