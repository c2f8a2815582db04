import { type DeepSkyKind, type DeepSkyObject, findDeepSky } from '#catalogue';
import { type ElementSet, findBody } from '#elements';
import {
  type FixedTarget,
  MS_PER_DAY,
  type OrbitTarget,
  SOLAR_BODIES,
  type SkyTarget,
  toRad,
  withPerturbations,
} from '#sky';
import { problem } from '../clubProblem';

/** A target as it was named, with all that is known of it. */
export interface NamedTarget {
  readonly sky: SkyTarget;
  /** What it is, for charts and words. */
  readonly kind: 'Sun' | 'Moon' | 'planet' | 'comet' | 'asteroid' | DeepSkyKind;
  readonly deepSky: DeepSkyObject | null;
  /** Where a moving body's elements come from; null for all others. */
  readonly origin: ElementsOrigin | null;
}

/** The element set behind a place, as a sheet tells it. */
export interface ElementsOrigin {
  /** Null where the set does not say. */
  readonly epochTtJd: number | null;
  /** In words; empty where unknown. */
  readonly source: string;
}

/**
 * The target of a name: the Sun, the Moon or a planet; a body of the element sets given; or a catalogued
 * object. Case and blanks do not matter. Throws a ClubProblem of kind 'invalid' where nothing answers to it.
 */
export function namedTarget(name: string, sets: readonly ElementSet[] = []): NamedTarget {
  const wanted = name.trim();
  const body = SOLAR_BODIES.find((known) => known.toLowerCase() === wanted.toLowerCase());
  if (body !== undefined) {
    return {
      sky: { kind: 'solarSystem', name: body, body },
      kind: body === 'Sun' || body === 'Moon' ? body : 'planet',
      deepSky: null,
      origin: null,
    };
  }
  const elementSet = findBody(sets, wanted);
  if (elementSet !== null) {
    return { sky: orbitTarget(elementSet), kind: elementSet.kind, deepSky: null, origin: elementSet };
  }
  const deepSky = findDeepSky(wanted);
  if (deepSky !== null) return { sky: fixedTarget(deepSky), kind: deepSky.kind, deepSky, origin: null };
  const bodies = sets.slice(0, 20).map(({ label }) => label);
  throw problem(
    'invalid',
    'target',
    name,
    `target was ${JSON.stringify(name)}; give the Sun, the Moon, a planet, a catalogued object such as "M 31"` +
      (bodies.length > 0
        ? `, or a body of the element sets: ${bodies.join(', ')}.`
        : ', or a body of an element file.'),
  );
}

/** A catalogued object as a fixed target. A double star counts as a point. */
export function fixedTarget(object: DeepSkyObject): FixedTarget {
  const isPoint = object.kind === 'doubleStar';
  return {
    kind: 'fixed',
    name: object.id,
    raRad: toRad(object.raDeg),
    decRad: toRad(object.decDeg),
    magnitude: object.magnitude,
    majorArcmin: isPoint ? 0 : object.majorArcmin,
    minorArcmin: isPoint ? 0 : object.minorArcmin,
  };
}

/** Coma diameter in arcminutes to judge a comet by where nobody has said better (common practice: a few). */
const USUAL_COMA_ARCMIN = 5;

/** A body of an element set as a moving target. */
export function orbitTarget(set: ElementSet, comaArcmin: number | null = null): OrbitTarget {
  return {
    kind: 'orbit',
    name: set.label,
    elements: set.elements,
    brightness: set.brightness,
    comaArcmin: comaArcmin ?? (set.kind === 'comet' ? USUAL_COMA_ARCMIN : 0),
  };
}

/** How far round an instant a moving target's chart looks, days; withPerturbations adds twenty on either side. */
const AROUND_MS = 5 * MS_PER_DAY;

/** A comet or asteroid with its motion under the planets around a UTC instant; any other target as it is. */
export function movedTarget(target: NamedTarget, utcMs: number): NamedTarget {
  const { sky } = target;
  return sky.kind !== 'orbit' || sky.motion !== undefined
    ? target
    : { ...target, sky: withPerturbations(sky, utcMs - AROUND_MS, utcMs + AROUND_MS) };
}
