import { type Chebyshev, evaluateChebyshev, fitChebyshev } from './chebyshev';
import { integrate, STATE_SIZE, type TakenStep, type Tolerance } from './dop853';
import { eclipticToEquatorial, heliocentricState, type OrbitalElements, type State, SUN_MU } from './orbit';
import { type PerturberTable, perturberTable, tableCovers, ttMs } from './perturbers';
import { smallBodyForce, struckBody } from './smallBodyForce';
import { MS_PER_DAY, utcMsToJd } from './time';
import { type Vector } from './vector';

/**
 * Heliocentric motion of a body over a span, J2000 equator: one polynomial a step of the integration, so that
 * a perihelion or a close approach is as finely divided as it needs. Plain data: it crosses to a worker.
 */
export interface Motion {
  readonly fromTtJd: number;
  readonly toTtJd: number;
  /** Ends of the pieces in milliseconds of TT, rising; one more than the pieces. */
  readonly boundsTtMs: Float64Array;
  /** Place (au) and velocity (au/day), 6 components. */
  readonly pieces: readonly Chebyshev[];
}

/** Longest reach from the epoch. Planets' places and elements alike are poorer long before that. */
export const LONGEST_REACH_DAYS = 36_525;

/** 700 days forth and back end within 1e-9 au of the start, which a test holds. */
const TOLERANCE: Tolerance = { relative: 1e-12, placeFloor: 1e-14, velocityFloor: 1e-16 };
const MOST_STEPS = 25_000;
/** Degree of the integrator's own polynomial, which the pieces keep whole. */
const PIECE_DEGREE = 7;

/**
 * The motion between two TT Julian dates from elements that osculate at their epoch, integrated under the
 * Sun, the eight planets and the Moon by DOP853. `table` spares the fitting of the planets where it reaches
 * from the epoch over the span; else one is made.
 *
 * Throws a RangeError that says why where the elements have no epoch, the span is empty or reaches more than
 * a hundred years from the epoch, or the body would strike the Sun or a planet.
 */
export function perturbedMotion(
  elements: OrbitalElements,
  fromTtJd: number,
  toTtJd: number,
  table: PerturberTable | null = null,
): Motion {
  const { epochTtJd } = elements;
  if (epochTtJd === null) {
    throw new RangeError('The elements have no epoch; perturbed motion needs the instant they osculate at.');
  }
  const { position, velocity } = heliocentricState(elements, epochTtJd);
  const start = { position: eclipticToEquatorial(position), velocity: eclipticToEquatorial(velocity) };
  return motionFromState(start, epochTtJd, fromTtJd, toTtJd, table);
}

/** The same from a heliocentric place (au) and velocity (au/day), J2000 equator, at an epoch. */
export function motionFromState(
  start: State,
  epochTtJd: number,
  fromTtJd: number,
  toTtJd: number,
  table: PerturberTable | null = null,
): Motion {
  const first = Math.min(epochTtJd, fromTtJd);
  const last = Math.max(epochTtJd, toTtJd);
  if (!(fromTtJd < toTtJd)) {
    throw new RangeError(`The span was TT ${dayOf(fromTtJd)} to ${dayOf(toTtJd)}; its end has to be later.`);
  }
  if (!(last - first <= LONGEST_REACH_DAYS)) {
    throw new RangeError(
      `The epoch ${dayOf(epochTtJd)} is more than 100 years from TT ${dayOf(fromTtJd)} to ${dayOf(toTtJd)}; ` +
        'use elements with an epoch nearer to it.',
    );
  }
  const planets = table !== null && tableCovers(table, first, last) ? table : perturberTable(first, last);
  const epochMs = ttMs(epochTtJd);
  const rates = smallBodyForce(planets, epochMs);
  const pieces: Chebyshev[] = [];

  const advance = (state: Float64Array, from: number, to: number, keep: boolean) => {
    const r = Math.hypot(state[0]!, state[1]!, state[2]!);
    // A hundredth of the time in which the body would turn through a radian about the Sun.
    const firstStep = 0.01 * Math.sqrt((r * r * r) / SUN_MU);
    const end = integrate(rates, state, from, to, firstStep, TOLERANCE, MOST_STEPS, (step) => {
      const endMs = epochMs + step.to * MS_PER_DAY;
      const struck = struckBody(planets, endMs, step.state);
      if (struck !== null) throw strike(struck, endMs);
      if (keep) pieces.push(pieceOf(step, epochMs));
    });
    if (end !== 'done') {
      throw new RangeError(
        `The motion could not be followed from ${dayOf(epochTtJd)} to TT ${dayOf(epochTtJd + to)}: ` +
          (end === 'tooManySteps'
            ? `it takes more than ${MOST_STEPS} steps, for the body keeps too near to the Sun or a planet.`
            : 'the body comes too close to the Sun or a planet.'),
      );
    }
    return state;
  };

  const begin = Float64Array.of(...start.position, ...start.velocity);
  const from = fromTtJd - epochTtJd;
  const to = toTtJd - epochTtJd;
  if (from >= 0) advance(advance(begin, 0, from, false), from, to, true);
  else if (to <= 0) advance(advance(begin, 0, to, false), to, from, true);
  else {
    advance(begin.slice(), 0, from, true);
    advance(begin, 0, to, true);
  }
  pieces.sort((a, b) => a.fromMs - b.fromMs);
  const boundsTtMs = Float64Array.from([...pieces.map(({ fromMs }) => fromMs), ttMs(toTtJd)]);
  return { fromTtJd, toTtJd, boundsTtMs, pieces };
}

/** Heliocentric place at a TT Julian date, au, J2000 equator. Throws a RangeError outside the motion's span. */
export function motionPlace(motion: Motion, ttJd: number): Vector {
  const s = stateAt(motion, ttJd);
  return [s[0]!, s[1]!, s[2]!];
}

/** Heliocentric place (au) and velocity (au/day), J2000 equator. Throws a RangeError outside the span. */
export function motionState(motion: Motion, ttJd: number): State {
  const s = stateAt(motion, ttJd);
  return { position: [s[0]!, s[1]!, s[2]!], velocity: [s[3]!, s[4]!, s[5]!] };
}

function stateAt({ fromTtJd, toTtJd, boundsTtMs, pieces }: Motion, ttJd: number): Float64Array {
  if (!(ttJd >= fromTtJd && ttJd <= toTtJd)) {
    throw new RangeError(
      `The body's motion was worked out from TT ${dayOf(fromTtJd)} to ${dayOf(toTtJd)}; ${dayOf(ttJd)} is outside.`,
    );
  }
  const at = ttMs(ttJd);
  let low = 0;
  let high = pieces.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (boundsTtMs[middle]! <= at) low = middle;
    else high = middle - 1;
  }
  const out = new Float64Array(STATE_SIZE);
  evaluateChebyshev(pieces[low]!, at, out);
  return out;
}

function pieceOf({ from, to, inside }: TakenStep, epochMs: number): Chebyshev {
  const low = epochMs + Math.min(from, to) * MS_PER_DAY;
  const high = epochMs + Math.max(from, to) * MS_PER_DAY;
  const sample = (ms: number, out: Float64Array) => {
    inside((ms - epochMs) / MS_PER_DAY, out);
  };
  return fitChebyshev(sample, STATE_SIZE, low, high, high - low, PIECE_DEGREE);
}

function strike(body: string, atTtMs: number): RangeError {
  return new RangeError(
    `By these elements the body strikes ${body} on ${dayOf(utcMsToJd(atTtMs))}; check them, or end the span before.`,
  );
}

/** The calendar day of a Julian date, or the number itself where there is none. */
function dayOf(jd: number): string {
  const ms = ttMs(jd);
  return Math.abs(ms) <= 8.64e15 ? new Date(ms).toISOString().slice(0, 10) : `JD ${jd}`;
}
