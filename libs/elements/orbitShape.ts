import { axisFromMotion, meanMotion, motionFromPeriod, periodFromMotion } from './conic';
import { type ElementField } from './elementSet';
import { type GivenElements } from './given';
import { figure, rounding } from './figures';
import { type FieldProblem } from './problem';

/** Size and form of an orbit. */
export interface OrbitShape {
  readonly perihelionDistanceAu: number;
  readonly eccentricity: number;
  readonly semiMajorAxisAu: number | null;
  readonly meanMotionDegPerDay: number | null;
  readonly periodYears: number | null;
  readonly problems: readonly FieldProblem[];
}

/** What kept the shape from being known. */
export interface NoShape {
  readonly problems: readonly FieldProblem[];
}

/** Beyond these a value is a slip of the pen or of the unit, and the arithmetic would lose its footing. */
const REACH = { nearest: 1e-6, farthest: 1e6, eccentricity: 1e4 } as const;

type Axis = readonly [value: number, field: ElementField];

/**
 * Perihelion distance and eccentricity from any two of q, e, a (or n, or P) and Q, then the rest. Values
 * beyond the two that are needed are checked against them; a difference that rounding cannot explain is
 * reported with its size, and the pair named first here that was given is used: q e, q a, q Q, a e, a Q, Q e.
 */
export function orbitShape(given: GivenElements): OrbitShape | NoShape {
  const refused = impossible(given);
  if (refused.length > 0) return { problems: refused };
  const q = given.perihelionDistanceAu ?? null;
  const e = given.eccentricity ?? null;
  const far = given.aphelionDistanceAu ?? null;
  const axis = axisOf(given, e);
  const pair = fromPair(q, e, axis?.[0] ?? null, far);
  if (pair === null) return { problems: [missing(given)] };
  const [perihelion, eccentricity, used] = pair;
  if (!(perihelion > 0) || !(eccentricity >= 0) || !Number.isFinite(perihelion + eccentricity)) {
    const message =
      `${used} give a perihelion distance of ${figure(perihelion)} au and an eccentricity of ` +
      `${figure(eccentricity)}; an orbit needs q above 0 and e of 0 or more.`;
    return { problems: [{ field: null, severity: 'error', message }] };
  }
  if (perihelion < REACH.nearest || perihelion > REACH.farthest || eccentricity > REACH.eccentricity) {
    const message =
      `${used} give q = ${figure(perihelion)} au and e = ${figure(eccentricity)}, which no body has: ` +
      'q is given in au, and the largest e known is 6.1 (from memory).';
    return { problems: [{ field: null, severity: 'error', message }] };
  }
  const problems = contradictions(given, perihelion, eccentricity, used);
  const kept = (field: ElementField, value: number | null | undefined): number | null =>
    problems.some((problem) => problem.field === field) ? null : (value ?? null);
  const axisGiven = kept('semiMajorAxisAu', given.semiMajorAxisAu);
  const a = eccentricity === 1 ? null : (axisGiven ?? perihelion / (1 - eccentricity));
  const n = a === null ? null : (kept('meanMotionDegPerDay', given.meanMotionDegPerDay) ?? meanMotion(a));
  const closed = eccentricity < 1 && n !== null;
  return {
    perihelionDistanceAu: perihelion,
    eccentricity,
    semiMajorAxisAu: a,
    meanMotionDegPerDay: n,
    periodYears: closed ? (kept('periodYears', given.periodYears) ?? periodFromMotion(n)) : null,
    problems,
  };
}

function impossible(given: GivenElements): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const refuse = (field: ElementField, message: string): void => {
    problems.push({ field, severity: 'error', message });
  };
  const { eccentricity: e, perihelionDistanceAu: q, semiMajorAxisAu: a } = given;
  const positive = (value: number | null | undefined, field: ElementField, what: string): void => {
    if (value !== null && value !== undefined && !(value > 0)) {
      refuse(field, `${what} is ${figure(value)}; it must be above 0.`);
    }
  };
  positive(q, 'perihelionDistanceAu', 'The perihelion distance q');
  positive(given.aphelionDistanceAu, 'aphelionDistanceAu', 'The aphelion distance Q');
  positive(given.meanMotionDegPerDay, 'meanMotionDegPerDay', 'The mean motion n');
  positive(given.periodYears, 'periodYears', 'The period P');
  if (e !== null && e !== undefined && e < 0) {
    refuse('eccentricity', `The eccentricity e is ${figure(e)}; it must be 0 (a circle) or more.`);
  }
  const hasAxis = a !== null && a !== undefined;
  if (hasAxis && a === 0) refuse('semiMajorAxisAu', 'The semi-major axis a is 0; no orbit has that.');
  if (e === null || e === undefined) {
    if (hasAxis && a < 0 && (q === null || q === undefined)) {
      refuse('semiMajorAxisAu', `The semi-major axis a is ${figure(a)}; below 0 needs e or q as well.`);
    }
    return problems;
  }
  const conic = e === 1 ? 'A parabola (e = 1)' : 'A hyperbola (e above 1)';
  if (hasAxis && e < 1 && a < 0) {
    refuse('semiMajorAxisAu', `The semi-major axis a is ${figure(a)}; with e = ${figure(e)} it is above 0.`);
  }
  if (hasAxis && e === 1) {
    refuse('semiMajorAxisAu', `${conic} has no semi-major axis, but a is ${figure(a)}; leave it out.`);
  }
  if (hasAxis && e > 1 && a > 0) {
    refuse('semiMajorAxisAu', `${conic} has a semi-major axis below 0, but a is ${figure(a)}.`);
  }
  if (e >= 1) {
    if (given.periodYears) refuse('periodYears', `${conic} has no period; leave P out.`);
    if (given.aphelionDistanceAu) refuse('aphelionDistanceAu', `${conic} has no aphelion; leave Q out.`);
    if (e === 1 && given.meanMotionDegPerDay) {
      refuse('meanMotionDegPerDay', `${conic} has no mean motion; leave n out.`);
    }
  }
  return problems;
}

/** The semi-major axis as given, or from the mean motion or period; below zero for a hyperbola. */
function axisOf(given: GivenElements, e: number | null): Axis | null {
  if (given.semiMajorAxisAu !== null && given.semiMajorAxisAu !== undefined) {
    return [given.semiMajorAxisAu, 'semiMajorAxisAu'];
  }
  const sign = e !== null && e > 1 ? -1 : 1;
  if (given.meanMotionDegPerDay) {
    return [sign * axisFromMotion(given.meanMotionDegPerDay), 'meanMotionDegPerDay'];
  }
  return given.periodYears ? [axisFromMotion(motionFromPeriod(given.periodYears)), 'periodYears'] : null;
}

function fromPair(
  q: number | null,
  e: number | null,
  a: number | null,
  far: number | null,
): readonly [q: number, e: number, used: string] | null {
  if (q !== null && e !== null) return [q, e, 'q and e'];
  if (q !== null && a !== null) return [q, 1 - q / a, 'q and the semi-major axis'];
  if (q !== null && far !== null) return [q, (far - q) / (far + q), 'q and Q'];
  if (a !== null && e !== null) return [a * (1 - e), e, 'the semi-major axis and e'];
  if (a !== null && far !== null) return [2 * a - far, far / a - 1, 'the semi-major axis and Q'];
  if (far !== null && e !== null) return [(far * (1 - e)) / (1 + e), e, 'Q and e'];
  return null;
}

function missing(given: GivenElements): FieldProblem {
  const has = (value: number | null | undefined): boolean => value !== null && value !== undefined;
  if (has(given.eccentricity)) {
    const message =
      'The size of the orbit is missing: give q, or the semi-major axis a, the mean motion n or the period P.';
    return { field: 'perihelionDistanceAu', severity: 'error', message };
  }
  const message = has(given.perihelionDistanceAu)
    ? 'The eccentricity e is missing; write 1 if the orbit is meant as a parabola.'
    : 'Size and form of the orbit are missing: give the perihelion distance q and the eccentricity e, or a and e.';
  return { field: 'eccentricity', severity: 'error', message };
}

function contradictions(given: GivenElements, q: number, e: number, used: string): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const compare = (
    value: number | null | undefined,
    expected: number,
    slack: number,
    what: readonly [field: ElementField, name: string, unit: string],
  ): void => {
    if (value === null || value === undefined) return;
    const difference = Math.abs(value - expected);
    if (difference <= rounding(value) + slack * Math.abs(expected)) return;
    const share = (100 * difference) / Math.abs(expected);
    const [field, name, unit] = what;
    const message =
      `${name} is given as ${figure(value)}${unit}, but ${used} make it ${figure(expected)}${unit}: ` +
      `a difference of ${figure(difference, 3)}${unit} (${figure(share, 2)} %). The set is computed from ${used}.`;
    problems.push({ field, severity: 'warning', message });
  };
  const share = (value: number | null | undefined): number => (value ? rounding(value) / Math.abs(value) : 0);
  const slackE = rounding(given.eccentricity ?? 0);
  const slackAxis = given.semiMajorAxisAu
    ? share(given.semiMajorAxisAu)
    : share(given.perihelionDistanceAu) + slackE / Math.max(Math.abs(1 - e), 1e-12);
  const slackShape = share(given.perihelionDistanceAu) + slackE / Math.max(Math.abs(1 - e), 1e-12);
  if (e !== 1) {
    const a = q / (1 - e);
    compare(given.semiMajorAxisAu, a, slackShape, ['semiMajorAxisAu', 'The semi-major axis a', ' au']);
    const n = meanMotion(a);
    const slackMotion = 1.5 * slackAxis;
    compare(given.meanMotionDegPerDay, n, slackMotion, [
      'meanMotionDegPerDay',
      'The mean motion n',
      ' deg/day',
    ]);
    if (e < 1) {
      const period = periodFromMotion(n);
      compare(given.periodYears, period, slackMotion, ['periodYears', 'The period P', ' years']);
      const far = a * (1 + e);
      compare(given.aphelionDistanceAu, far, slackShape + slackAxis, [
        'aphelionDistanceAu',
        'The aphelion distance Q',
        ' au',
      ]);
    }
  }
  return problems;
}
