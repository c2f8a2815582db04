import { parseDesignation } from '#elements';
import { MS_PER_DAY, type OrbitTarget, place, utcMsToTtJd } from '#sky';
import { type BodyMotion, bodyMotion } from '../sky/bodyMotion';
import { perturbing, type Perturbing } from '../sky/perturbing';
import { placeShift } from '../sky/placeShift';
import { type ObservedArc, observedArc, type ArcSources } from './observedArc';
import { expectedPlaceError, type PlaceError } from './placeError';
import { trustWords } from './trustWords';

/** Widths of the fields that an expected error is measured by, degrees (common practice: a finder, a low power). */
export interface TrustFields {
  readonly finderDeg: number;
  readonly eyepieceDeg: number;
}

export const USUAL_TRUST_FIELDS: TrustFields = { finderDeg: 6, eyepieceDeg: 0.75 };

/** A set of elements and what is known of its standing. */
export interface TrustedBody extends ArcSources {
  readonly target: OrbitTarget;
  readonly kind: 'comet' | 'asteroid';
}

/** An expected error as a share of a field's width. */
export interface FieldShare {
  readonly fieldDeg: number;
  readonly likely: number;
  readonly bad: number;
}

/** How far the place of a comet or asteroid can be trusted at one instant. */
export interface BodyTrust {
  readonly body: string;
  /** ISO, UTC. */
  readonly at: string;
  /** Days from the epoch to the instant; null where the set names no epoch. */
  readonly ageDays: number | null;
  /** How far the planets have pulled it off the conic of its elements since the epoch, as seen from the Earth's centre. */
  readonly movedByPlanetsArcsec: number | null;
  readonly observedArcDays: number | null;
  readonly arcFrom: ObservedArc['from'] | null;
  /** Null where the set names no epoch: nobody can tell. */
  readonly expectedError: PlaceError | null;
  readonly finder: FieldShare | null;
  readonly eyepiece: FieldShare | null;
  /** Whether newer elements should be had before charts are printed (common practice). */
  readonly refresh: boolean;
  /** How it moves across the sky meanwhile, and where a tail would point. */
  readonly motion: BodyMotion;
  /** One line for a page, and the whole account with the rule it rests on. */
  readonly line: string;
  readonly words: string;
}

/** Elements of a comet older than this are refreshed before charts are printed; of a body just found, this (common practice). */
const COMET_DAYS = 30;
const NEW_DAYS = 7;
const NEW_ARC_DAYS = 60;
/** Asteroids are looked after far less often. */
const ASTEROID_DAYS = 400;

/** Steps in which the way from the epoch to the instant is looked at for the nearest distance to the Sun. */
const SUN_STEPS = 24;

/**
 * How far a body's place can be trusted at a UTC instant: the age of its elements, what the planets have done
 * since, and the error to expect by the rule of `expectedPlaceError`, as shares of two fields. Throws a
 * ClubProblem where the body cannot be followed to the instant.
 */
export function bodyTrust(
  body: TrustedBody,
  utcMs: number,
  fields: TrustFields = USUAL_TRUST_FIELDS,
  perturbed: Perturbing = perturbing(),
): BodyTrust {
  const { target, kind, designation } = body;
  const { epochTtJd } = target.elements;
  const arc = observedArc(body);
  const numbered = parseDesignation(designation).number !== null;
  const moving = perturbed(target, utcMs);
  const common = {
    body: target.name,
    motion: bodyMotion(moving, kind, utcMs),
    at: new Date(utcMs).toISOString(),
    observedArcDays: arc?.days ?? null,
    arcFrom: arc?.from ?? null,
  };
  if (epochTtJd === null) {
    const facts = { ...common, ageDays: null, movedByPlanetsArcsec: null, expectedError: null };
    const told = { ...facts, finder: null, eyepiece: null, refresh: true };
    return { ...told, ...trustWords(told, kind, numbered) };
  }
  const ageDays = utcMsToTtJd(utcMs) - epochTtJd;
  const seen = place(moving, utcMs, null);
  const expectedError = expectedPlaceError({
    kind,
    numbered,
    arcDays: arc?.days ?? null,
    ageDays,
    distanceAu: seen.distanceAu!,
    leastSunDistanceAu: leastSunDistance(target, utcMs, ageDays),
  });
  const share = (fieldDeg: number): FieldShare => ({
    fieldDeg,
    likely: expectedError.likelyArcsec / 3600 / fieldDeg,
    bad: expectedError.badArcsec / 3600 / fieldDeg,
  });
  const eyepiece = share(fields.eyepieceDeg);
  const isNew = !numbered && (arc === null || arc.days < NEW_ARC_DAYS);
  const most = isNew ? NEW_DAYS : kind === 'comet' ? COMET_DAYS : ASTEROID_DAYS;
  const told = {
    ...common,
    ageDays,
    movedByPlanetsArcsec: placeShift(target, moving, utcMs, null).shiftArcsec,
    expectedError,
    finder: share(fields.finderDeg),
    eyepiece,
    refresh: Math.abs(ageDays) > most || eyepiece.bad > 0.5,
  };
  return { ...told, ...trustWords(told, kind, numbered) };
}

/** The least distance from the Sun on the way from the epoch to the instant, au; on the conic, which is near enough. */
function leastSunDistance(target: OrbitTarget, utcMs: number, ageDays: number): number {
  const conic: OrbitTarget = { ...target };
  let least = Infinity;
  for (let i = 0; i <= SUN_STEPS; i++) {
    const at = utcMs - (ageDays * MS_PER_DAY * i) / SUN_STEPS;
    least = Math.min(least, place(conic, at, null).sunDistanceAu!);
  }
  return least;
}
