import { type ElementSet, findBody } from '#elements';
import {
  eclipticToEquatorial,
  equatorialToEcliptic,
  heliocentricState,
  motionPlace,
  type Observer,
  ttJdToUtcMs,
  type Vector,
} from '#sky';
import { problem } from '../clubProblem';
import { type NamedTarget, orbitTarget } from './namedTarget';
import { perturbing, type Perturbing } from './perturbing';
import { placeShift, type PlaceShift } from './placeShift';

/** Heliocentric place of a body in au, J2000, without light time. */
export interface ElementState {
  readonly heliocentricEcliptic: Vector;
  readonly heliocentricEquatorial: Vector;
}

/**
 * Where a body's elements put it at a TT Julian date: under the planets where they name an epoch, and by
 * `twoBody` or without an epoch on their conic. A piece of work over many bodies shares one `perturbed`.
 */
export function elementState(
  { sky }: NamedTarget,
  ttJd: number,
  twoBody = false,
  perturbed: Perturbing = perturbing(),
): ElementState {
  if (sky.kind !== 'orbit') {
    throw problem('invalid', 'body', sky.name, `body was ${sky.name}; give a body of the element file.`);
  }
  const moving = twoBody ? sky : perturbed(sky, ttJdToUtcMs(ttJd));
  if (moving.kind === 'orbit' && moving.motion !== undefined) {
    const place = motionPlace(moving.motion, ttJd);
    return { heliocentricEcliptic: equatorialToEcliptic(place), heliocentricEquatorial: place };
  }
  const { position } = heliocentricState(sky.elements, ttJd);
  return { heliocentricEcliptic: position, heliocentricEquatorial: eclipticToEquatorial(position) };
}

/** How far a body's new elements move it from where the old ones put it, and what of it a chart shows. */
export interface ElementShift extends PlaceShift {
  readonly body: string;
}

/** The shift of every body that both lists hold, from a place at a UTC instant; and those only one holds. */
export function compareElements(
  before: readonly ElementSet[],
  after: readonly ElementSet[],
  observer: Observer,
  utcMs: number,
): {
  readonly bodies: readonly ElementShift[];
  readonly onlyOld: readonly string[];
  readonly onlyNew: readonly string[];
} {
  const perturbed = perturbing();
  const paired = after.map((set) => ({ set, old: findBody(before, set.label) }));
  const known = new Set(paired.map(({ old }) => old));
  return {
    bodies: paired.flatMap(({ set, old }) =>
      old === null
        ? []
        : [
            {
              body: set.label,
              ...placeShift(
                perturbed(orbitTarget(old), utcMs),
                perturbed(orbitTarget(set), utcMs),
                utcMs,
                observer,
              ),
            },
          ],
    ),
    onlyOld: before.filter((set) => !known.has(set)).map(({ label }) => label),
    onlyNew: paired.filter(({ old }) => old === null).map(({ set }) => set.label),
  };
}
