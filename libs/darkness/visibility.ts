import { ARCMIN } from '#sky';
import { FULL_PAIR, type View, magToCandela, viewLimit } from './contrast';
import { DEFAULT_OBSERVING, type Instrument, type Observing, checkInstrument } from './instrument';

/** A target as the eye meets it, before extinction. */
export interface VisibleObject {
  /** Total V magnitude. */
  readonly magnitude: number;
  /** Apparent size; 0 for a point. */
  readonly majorArcmin: number;
  readonly minorArcmin: number;
  /**
   * The bright middle of a condensed comet or galaxy, where known: it often shows when the whole does not.
   */
  readonly coreArcmin?: number;
  readonly coreMagnitude?: number;
}

/** Ovals longer than this times their width show as if they were this long for their width (Crumey 2014). */
const LONGEST_OVAL = 7;

/** Area in steradians of an oval, 0 for a point. A width left at 0 counts as the narrowest fitting one. */
export function ovalArea(majorArcmin: number, minorArcmin: number): number {
  const major = Math.max(majorArcmin, minorArcmin) * ARCMIN;
  const minor = Math.max(Math.min(majorArcmin, minorArcmin) * ARCMIN, major / LONGEST_OVAL);
  return 0.25 * Math.PI * major * minor;
}

/** The views an instrument offers, one a power. Throws an InstrumentError where a number makes no sense. */
export function viewsOf(instrument: Instrument, observing: Observing = DEFAULT_OBSERVING): readonly View[] {
  checkInstrument(instrument);
  const { pupilMm, fieldFactor } = observing;
  const observerFactor = fieldFactor * (instrument.eyes === 1 ? Math.SQRT2 : 1);
  if (instrument.kind === 'nakedEye') {
    return [{ apertureMm: pupilMm, magnification: 1, dimming: 1, observerFactor, pupilMm }];
  }
  return instrument.magnifications.map((magnification) => ({
    apertureMm: instrument.apertureMm,
    magnification,
    dimming: 1 / instrument.transmission,
    observerFactor,
    pupilMm,
  }));
}

/** Skies brighter than this (mag/arcsec2) are outside the tests of the law through instruments. */
const BRIGHT_SKY = 12;
/**
 * Magnitudes an instrument falls short of the law for each magnitude by which a sky is brighter than that.
 */
const BRIGHT_SKY_LOSS = 0.5;

/** The best of several views: the faintest magnitude that shows in any, for an area in steradians. */
export function bestViewLimit(views: readonly View[], skyMagPerArcsec2: number, areaSr: number): number {
  const skyCd = magToCandela(skyMagPerArcsec2);
  const loss = BRIGHT_SKY_LOSS * Math.max(0, BRIGHT_SKY - skyMagPerArcsec2);
  let best = -Infinity;
  for (const view of views) {
    const limit = viewLimit(FULL_PAIR, view, skyCd, areaSr) - (view.magnification > 1 ? loss : 0);
    if (limit > best) best = limit;
  }
  return best;
}

/**
 * The faintest V magnitude at which an object of a given apparent size (arcmin; 0 for a point) shows in an
 * instrument against a sky of V mag/arcsec2, at the best of its powers: Crumey 2014 (MNRAS 442, 2600) with
 * its full-range pair of curves, good to a few tenths. The laboratory thresholds behind it reach daylight,
 * and for the naked eye no other law takes over in bright twilight. Magnifying instruments do not keep up
 * with it there, with stars spread by the air and stray light over the field; on skies brighter than 12
 * mag/arcsec2 they lose half a magnitude per magnitude. That is our model, set so that 200 mm shows
 * third-magnitude stars by day (common practice). Throws an InstrumentError for an instrument without a
 * usable aperture, power or transmission.
 */
export function limitingMagnitude(
  instrument: Instrument,
  skyMagPerArcsec2: number,
  majorArcmin: number,
  minorArcmin: number,
  observing: Observing = DEFAULT_OBSERVING,
): number {
  return bestViewLimit(viewsOf(instrument, observing), skyMagPerArcsec2, ovalArea(majorArcmin, minorArcmin));
}

/** The faintest star an instrument shows against a sky of V mag/arcsec2, before extinction. */
export function telescopeReach(
  instrument: Instrument,
  skyMagPerArcsec2: number,
  observing: Observing = DEFAULT_OBSERVING,
): number {
  return limitingMagnitude(instrument, skyMagPerArcsec2, 0, 0, observing);
}

/**
 * By how many magnitudes an object is brighter than the faintest that shows: positive where it can be seen,
 * against a sky of V mag/arcsec2 at its place and with `extinctionMag` of dimming on its way. Where a core is
 * given, the better of the whole and the core; a core is dimmed alike.
 */
export function visibilityMargin(
  instrument: Instrument,
  object: VisibleObject,
  skyMagPerArcsec2: number,
  extinctionMag: number,
  observing: Observing = DEFAULT_OBSERVING,
): number {
  const views = viewsOf(instrument, observing);
  const marginOf = (magnitude: number, areaSr: number): number =>
    bestViewLimit(views, skyMagPerArcsec2, areaSr) - magnitude - extinctionMag;
  const whole = marginOf(object.magnitude, ovalArea(object.majorArcmin, object.minorArcmin));
  if (object.coreMagnitude === undefined) return whole;
  const core = object.coreArcmin ?? 0;
  return Math.max(whole, marginOf(object.coreMagnitude, ovalArea(core, core)));
}

/** Above this luminance the eye sees by day vision. */
const DAY_VISION_NL = 1500;

/**
 * The faintest star for a keen naked eye against a sky in nanolambert with `extinctionMag` of dimming:
 * Schaefer 1990 (PASP 102, 212) after Hecht 1947, both branches, without an observer's factor. It drops by
 * 0.08 mag where day vision takes over, as published. Crumey's law (`limitingMagnitude`) is preferred.
 */
export function nakedEyeLimit(luminanceNl: number, extinctionMag: number): number {
  const night = luminanceNl < DAY_VISION_NL;
  const scale = 10 ** (night ? -9.8 : -8.35);
  const response = 10 ** (night ? -1.9 : -5.9);
  const illuminance = scale * (1 + Math.sqrt(response * luminanceNl)) ** 2;
  return -16.57 - 2.5 * Math.log10(illuminance) - extinctionMag;
}
