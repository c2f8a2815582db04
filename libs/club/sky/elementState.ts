import { type ElementSet, findBody } from '#elements';
import {
  ARCSEC,
  eclipticToEquatorial,
  equatorialToEcliptic,
  fromSpherical,
  heliocentricState,
  motionPlace,
  type Observer,
  place,
  positionAngle,
  separation,
  toDeg,
  ttJdToUtcMs,
  type Vector,
} from '#sky';
import { problem } from '../clubProblem';
import { type NamedTarget, orbitTarget } from './namedTarget';
import { perturbing, type Perturbing } from './perturbing';

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

/** How far a body's new elements move it from where the old ones put it. */
export interface ElementShift {
  readonly body: string;
  readonly shiftArcsec: number;
  /** Direction of the shift on the sky, from north through east. */
  readonly positionAngleDeg: number;
  /** New less old; null where either has no magnitude law. */
  readonly magnitudeChange: number | null;
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
      old === null ? [] : [shift(old, set, observer, utcMs, perturbed)],
    ),
    onlyOld: before.filter((set) => !known.has(set)).map(({ label }) => label),
    onlyNew: paired.filter(({ old }) => old === null).map(({ set }) => set.label),
  };
}

function shift(
  old: ElementSet,
  renewed: ElementSet,
  observer: Observer,
  utcMs: number,
  perturbed: Perturbing,
): ElementShift {
  const from = place(perturbed(orbitTarget(old), utcMs), utcMs, observer);
  const to = place(perturbed(orbitTarget(renewed), utcMs), utcMs, observer);
  const a = from.astrometric;
  const b = to.astrometric;
  return {
    body: renewed.label,
    shiftArcsec: separation(fromSpherical(a.raRad, a.decRad), fromSpherical(b.raRad, b.decRad)) / ARCSEC,
    positionAngleDeg: toDeg(positionAngle(a.raRad, a.decRad, b.raRad, b.decRad)),
    magnitudeChange: from.magnitude === null || to.magnitude === null ? null : to.magnitude - from.magnitude,
  };
}
