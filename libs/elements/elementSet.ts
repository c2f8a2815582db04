import { type Brightness, type OrbitalElements } from '#sky';
import { type ElementFrame, type OrbitAngles } from './frame';

/** The form in which a set came. */
export type ElementFormat = 'mpcComet' | 'mpcMinorPlanet' | 'csv' | 'json' | 'hand';

/** The quantities of a set that can be given or derived, named as in the JSON form. */
export type ElementField =
  | 'epoch'
  | 'perihelionTime'
  | 'perihelionDistanceAu'
  | 'aphelionDistanceAu'
  | 'eccentricity'
  | 'inclinationDeg'
  | 'nodeDeg'
  | 'argumentOfPerihelionDeg'
  | 'longitudeOfPerihelionDeg'
  | 'semiMajorAxisAu'
  | 'meanAnomalyDeg'
  | 'meanMotionDegPerDay'
  | 'periodYears'
  | 'absoluteMagnitude'
  | 'slope';

/** What the minor-planet format says of the observations behind an orbit, as written there, trimmed. */
export interface ObservationRecord {
  /** Uncertainty U, 0 (best) to 9, or a letter; empty where not given. */
  readonly uncertainty: string;
  readonly observations: number | null;
  readonly oppositions: number | null;
  /** Years of the first and last observation (`2009-2030`), or the arc of a single opposition (`38 days`). */
  readonly arc: string;
  readonly rmsArcsec: number | null;
  /** Perturbers by the format's codes, coarse and precise. */
  readonly coarsePerturbers: string;
  readonly precisePerturbers: string;
  readonly computer: string;
  /** Four hexadecimal digits. */
  readonly flags: string;
  /** Day of the last observation, YYYYMMDD. */
  readonly lastObserved: string | null;
}

/**
 * One body's orbital elements, complete: what was given, and everything that follows from it. Angles refer to
 * the ecliptic and equinox J2000, times are TT, years Julian.
 */
export interface ElementSet {
  /** Line of the text where the set begins, from 1; null where it was given by hand. */
  readonly line: number | null;
  readonly format: ElementFormat;
  /** Designation in full without the name (`C/2031 K7`, `999P`, `(912345)`, `2031 KQ12`), else as written. */
  readonly designation: string;
  /** The Minor Planet Center's packed designation, or null where there is none. */
  readonly packed: string | null;
  /** Proper name; empty for a body without one. */
  readonly name: string;
  /** Designation and name together, as people write them: `C/2031 K7 (Ashgrove)`, `999P/Wren-Okafor`. Never empty. */
  readonly label: string;
  readonly kind: 'comet' | 'asteroid';
  /** The kind of orbit in plain words. */
  readonly orbitClass: string;
  readonly elements: OrbitalElements;
  readonly brightness: Brightness | null;
  /** When the elements osculate; null where the set does not say. */
  readonly epochTtJd: number | null;
  readonly perihelionTtJd: number;
  readonly perihelionDistanceAu: number;
  readonly eccentricity: number;
  readonly inclinationDeg: number;
  readonly nodeDeg: number;
  readonly argumentOfPerihelionDeg: number;
  /** Negative for a hyperbola, null for a parabola. */
  readonly semiMajorAxisAu: number | null;
  /** At the epoch: in [0, 360) for an ellipse, signed for a hyperbola; null for a parabola or without epoch. */
  readonly meanAnomalyDeg: number | null;
  readonly meanMotionDegPerDay: number | null;
  /** Null unless the orbit is an ellipse. */
  readonly periodYears: number | null;
  readonly absoluteMagnitude: number | null;
  /** n of a comet's law (H + 5 log Delta + 2.5 n log r), G of an asteroid's; null without a magnitude. */
  readonly slope: number | null;
  readonly given: readonly ElementField[];
  readonly derived: readonly ElementField[];
  /** Values that were neither given nor follow from others but are the trade's defaults. */
  readonly assumed: readonly ElementField[];
  /** The frame and angles as given, where they were not of the ecliptic and equinox J2000. */
  readonly converted: (OrbitAngles & { readonly frame: ElementFrame }) | null;
  /** Where the set was published, as the set says (`MPC 99991`); empty where it does not. */
  readonly source: string;
  readonly observed: ObservationRecord | null;
}
