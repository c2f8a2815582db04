import { toRad } from '#sky';
import { brightnessLaw } from './brightness';
import { type ElementField, type ElementFormat, type ElementSet, type ObservationRecord } from './elementSet';
import { toEclipticJ2000 } from './frame';
import { type GivenElements } from './given';
import { identify, type Identity } from './identity';
import { orbitClass } from './orbitClass';
import { orbitOrientation } from './orbitOrientation';
import { type OrbitShape, orbitShape } from './orbitShape';
import { type OrbitTiming, orbitTiming } from './orbitTiming';
import { orbitWarnings } from './orbitWarnings';
import { type ElementProblem, type FieldProblem } from './problem';

/** A completed set, or null where something kept it from being one, and whatever is to be said about it. */
export interface Completion {
  readonly set: ElementSet | null;
  readonly problems: readonly (ElementProblem & { readonly field: string | null })[];
}

/** Where a set comes from; what only a file knows of it. */
export interface Origin {
  readonly line: number | null;
  readonly format: ElementFormat;
  readonly observed: ObservationRecord | null;
  /** The identity where the reader has worked it out already. */
  readonly identity: Identity | null;
}

/** Field names of the JSON form for the values that a set can be given by. */
const FIELD_OF = {
  epochTtJd: 'epoch',
  perihelionTtJd: 'perihelionTime',
  perihelionDistanceAu: 'perihelionDistanceAu',
  aphelionDistanceAu: 'aphelionDistanceAu',
  eccentricity: 'eccentricity',
  inclinationDeg: 'inclinationDeg',
  nodeDeg: 'nodeDeg',
  argumentOfPerihelionDeg: 'argumentOfPerihelionDeg',
  longitudeOfPerihelionDeg: 'longitudeOfPerihelionDeg',
  semiMajorAxisAu: 'semiMajorAxisAu',
  meanAnomalyDeg: 'meanAnomalyDeg',
  meanMotionDegPerDay: 'meanMotionDegPerDay',
  periodYears: 'periodYears',
  absoluteMagnitude: 'absoluteMagnitude',
  slope: 'slope',
} as const satisfies Partial<Record<keyof GivenElements, ElementField>>;

const GIVEN_KEYS = Object.keys(FIELD_OF) as (keyof typeof FIELD_OF)[];

/**
 * The whole set from any sufficient part of it: what follows is derived and listed apart from what was given.
 * Values that contradict each other are reported with the size of the contradiction and the set computed from the
 * pair that the message names; impossible or insufficient ones are refused with the reason (`set` is null).
 */
export function completeElements(given: GivenElements): Completion {
  const { set, problems } = complete(given, { line: null, format: 'hand', observed: null, identity: null });
  return { set, problems: problems.map((problem) => ({ line: 1, column: 1, ...problem })) };
}

/** `completeElements` for the readers: problems still carry fields, not places. */
export function complete(
  given: GivenElements,
  origin: Origin,
): { readonly set: ElementSet | null; readonly problems: readonly FieldProblem[] } {
  const infinite = GIVEN_KEYS.filter((key) => typeof given[key] === 'number' && !Number.isFinite(given[key]));
  if (infinite.length > 0) {
    return {
      set: null,
      problems: infinite.map((key) => refusal(FIELD_OF[key], `${given[key]} is not a finite number.`)),
    };
  }
  const identity = origin.identity ?? identify(given.designation ?? '', given.name ?? '');
  const shape = orbitShape(given);
  const oriented = orbitOrientation(given);
  if (!('eccentricity' in shape) || oriented.angles === null) {
    return { set: null, problems: [...identity.problems, ...shape.problems, ...oriented.problems] };
  }
  const { timing, problems: timingProblems } = orbitTiming(given, shape);
  const soFar = [...identity.problems, ...shape.problems, ...oriented.problems, ...timingProblems];
  if (timing === null) return { set: null, problems: soFar };

  const magnitude = given.absoluteMagnitude ?? null;
  const kind =
    given.kind ?? identity.parsed?.kind ?? given.law ?? (shape.eccentricity < 0.9 ? 'asteroid' : 'comet');
  const law = brightnessLaw(given.law ?? kind, magnitude, given.slope ?? null);
  const frame = given.frame ?? 'ecliptic J2000';
  const angles = toEclipticJ2000(oriented.angles, frame);
  const epochTtJd = given.epochTtJd ?? null;
  const { perihelionDistanceAu, eccentricity, semiMajorAxisAu, meanMotionDegPerDay, periodYears } = shape;
  const set: ElementSet = {
    line: origin.line,
    format: origin.format,
    designation: identity.designation,
    packed: identity.packed,
    name: identity.name,
    label: identity.label,
    kind,
    orbitClass: orbitClass(kind, perihelionDistanceAu, eccentricity, semiMajorAxisAu, periodYears),
    elements: {
      perihelionDistanceAu,
      eccentricity,
      inclinationRad: toRad(angles.inclinationDeg),
      nodeRad: toRad(angles.nodeDeg),
      argumentOfPerihelionRad: toRad(angles.argumentOfPerihelionDeg),
      perihelionTtJd: timing.perihelionTtJd,
      epochTtJd,
    },
    brightness: law.brightness,
    epochTtJd,
    perihelionTtJd: timing.perihelionTtJd,
    perihelionDistanceAu,
    eccentricity,
    inclinationDeg: angles.inclinationDeg,
    nodeDeg: angles.nodeDeg,
    argumentOfPerihelionDeg: angles.argumentOfPerihelionDeg,
    semiMajorAxisAu,
    meanAnomalyDeg: timing.meanAnomalyDeg,
    meanMotionDegPerDay,
    periodYears,
    absoluteMagnitude: magnitude,
    slope: law.slope,
    ...givenAndDerived(given, shape, timing, soFar),
    assumed: law.assumed ? ['slope'] : [],
    converted: frame === 'ecliptic J2000' ? null : { frame, ...oriented.angles },
    source: given.source ?? '',
    observed: origin.observed,
  };
  const problems = [...soFar, ...law.problems, ...orbitWarnings(identity.parsed, shape, magnitude)];
  return { set, problems };
}

/** What was given, without the values that others overruled, and what was derived. */
function givenAndDerived(
  given: GivenElements,
  shape: OrbitShape,
  timing: OrbitTiming,
  problems: readonly FieldProblem[],
): Pick<ElementSet, 'given' | 'derived'> {
  const listed: ElementField[] = [];
  const derived: ElementField[] = [];
  for (const key of GIVEN_KEYS) {
    const field = FIELD_OF[key];
    const wasGiven = given[key] !== null && given[key] !== undefined;
    if (wasGiven && !problems.some((problem) => problem.field === field)) listed.push(field);
    else if (isKnown(field, shape, timing)) derived.push(field);
  }
  return { given: listed, derived };
}

/** Whether a completed set has a value for a field that can be derived. */
function isKnown(field: ElementField, shape: OrbitShape, timing: OrbitTiming): boolean {
  switch (field) {
    case 'perihelionTime':
    case 'perihelionDistanceAu':
    case 'eccentricity':
    case 'argumentOfPerihelionDeg':
      return true;
    case 'meanAnomalyDeg':
      return timing.meanAnomalyDeg !== null;
    case 'semiMajorAxisAu':
    case 'meanMotionDegPerDay':
    case 'periodYears':
      return shape[field] !== null;
    default:
      return false;
  }
}

function refusal(field: string, message: string): FieldProblem {
  return { field, severity: 'error', message };
}
