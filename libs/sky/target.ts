import { type OrbitalElements } from './orbit';
import { type Motion } from './perturbedMotion';
import { type SolarBody } from './solarSystem';

/** Total magnitude law of a comet: H + 5 log Delta + 2.5 n log r. */
export interface CometBrightness {
  readonly kind: 'comet';
  readonly absoluteMagnitude: number;
  /** n of the law; 4 where nothing better is known (common practice). */
  readonly activity: number;
}

/** The H, G law of a minor planet (IAU 1985). */
export interface AsteroidBrightness {
  readonly kind: 'asteroid';
  readonly absoluteMagnitude: number;
  readonly slope: number;
}

export type Brightness = CometBrightness | AsteroidBrightness;

/** The Sun, the Moon or a planet. */
export interface SolarSystemTarget {
  readonly kind: 'solarSystem';
  readonly name: string;
  readonly body: SolarBody;
}

/** A comet or asteroid. */
export interface OrbitTarget {
  readonly kind: 'orbit';
  readonly name: string;
  readonly elements: OrbitalElements;
  /** Its motion under the planets (withPerturbations); where absent it moves on the conic of its elements. */
  readonly motion?: Motion;
  readonly brightness: Brightness | null;
  /** Diameter of a comet's coma as it is expected to show, arcmin; 0 for a point. */
  readonly comaArcmin: number;
}

/** A star or deep-sky object at a J2000 place. */
export interface FixedTarget {
  readonly kind: 'fixed';
  readonly name: string;
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
  readonly majorArcmin: number;
  readonly minorArcmin: number;
}

export type SkyTarget = SolarSystemTarget | OrbitTarget | FixedTarget;
