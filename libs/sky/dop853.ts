import { DENSE, ERROR_3, ERROR_5, NODES, STAGES, type Weights } from './dop853Coefficients';

/** Place (3) and velocity (3) together: what is integrated. */
export const STATE_SIZE = 6;

/** Writes the rates of change of a state at a time: velocity (3) and acceleration (3). */
export type Rates = (time: number, state: Float64Array, out: Float64Array) => void;

/** How far one step may err: this share of the distance and of the speed, and never asked below the floors. */
export interface Tolerance {
  readonly relative: number;
  readonly placeFloor: number;
  readonly velocityFloor: number;
}

/** A step that was taken. What it lends is used again by the next step. */
export interface TakenStep {
  readonly from: number;
  /** Below `from` where the integration runs backwards. */
  readonly to: number;
  /** The state at `to`. */
  readonly state: Float64Array;
  /** The state at a time inside the step, to the accuracy of the step; costs three evaluations of the rates, once. */
  readonly inside: (time: number, out: Float64Array) => void;
}

/** Why an integration ended where it did. */
export type IntegrationEnd = 'done' | 'tooManySteps' | 'stepTooSmall';

/** Largest growth and shrinking of the step at once, and the margin under the step foreseen. */
const MOST_GROWTH = 6;
const MOST_SHRINKING = 1 / 3;
const SAFETY = 0.9;
/** A step below this share of the time itself is lost in its rounding. */
const SMALLEST_SHARE = 1e-15;

const DENSE_ORDERS = 7;

/** Rows of a tableau laid end to end, so that the inner loop runs over plain arrays. */
interface FlatRows {
  readonly ends: Int32Array;
  readonly bases: Int32Array;
  readonly weights: Float64Array;
}

const stages = flatten(STAGES);
const dense = flatten(DENSE);
const errors = flatten([ERROR_3, ERROR_5]);

/**
 * Integrates a state from one time to another, forwards or backwards, by DOP853: order 8 with the step fitted
 * to the tolerance, and a dense output of order 7 (Hairer, Nørsett & Wanner 1993, Solving Ordinary
 * Differential Equations I, section II.5 and its code).
 *
 * `state` holds the first state and, when all is done, the last. `taken` hears of each step. Ends early,
 * and says so, after `mostSteps` tries or where the step shrinks to nothing, as it does at a collision.
 */
export function integrate(
  rates: Rates,
  state: Float64Array,
  from: number,
  to: number,
  firstStep: number,
  tolerance: Tolerance,
  mostSteps: number,
  taken: (step: TakenStep) => void,
): IntegrationEnd {
  const allK = new Float64Array(NODES.length * STATE_SIZE);
  const k = NODES.map((_, stage) => allK.subarray(stage * STATE_SIZE, (stage + 1) * STATE_SIZE));
  const trial = new Float64Array(STATE_SIZE);
  const next = new Float64Array(STATE_SIZE);
  const error3 = new Float64Array(STATE_SIZE);
  const error5 = new Float64Array(STATE_SIZE);
  const direction = Math.sign(to - from);
  if (direction === 0) return 'done';

  const evaluate = (stage: number, time: number, at: Float64Array) => {
    rates(time, at, k[stage]!);
  };

  let time = from;
  let h = direction * Math.min(Math.abs(firstStep), Math.abs(to - from));
  let rejected = false;
  evaluate(0, time, state);
  for (let steps = 0; ; steps++) {
    if (steps >= mostSteps) return 'tooManySteps';
    if (!(Math.abs(h) > SMALLEST_SHARE * Math.abs(time) + Number.MIN_VALUE)) return 'stepTooSmall';
    const isLast = direction * (time + 1.0000001 * h - to) >= 0;
    if (isLast) h = to - time;
    const end = isLast ? to : time + h;

    for (let stage = 1; stage < 12; stage++) {
      weighted(stages, stage, allK, h, state, trial);
      evaluate(stage, time + NODES[stage]! * h, trial);
    }
    weighted(stages, 12, allK, h, state, next);
    evaluate(12, end, next);

    weighted(errors, 0, allK, h, null, error3);
    weighted(errors, 1, allK, h, null, error5);
    const error = errorNorm(error3, error5, state, next, tolerance);
    if (!(error <= 1)) {
      h *= error < Infinity ? Math.max(MOST_SHRINKING, SAFETY * error ** (-1 / 8)) : MOST_SHRINKING;
      rejected = true;
      continue;
    }

    taken({ from: time, to: end, state: next, inside: insideOf(time, h, state, next, allK, evaluate) });
    state.set(next);
    if (isLast) return 'done';
    allK.copyWithin(0, 12 * STATE_SIZE, 13 * STATE_SIZE);
    time = end;
    // Right after a rejection the step does not grow.
    const growth = Math.min(rejected ? 1 : MOST_GROWTH, SAFETY * error ** (-1 / 8));
    h *= Math.max(MOST_SHRINKING, growth);
    rejected = false;
  }
}

/** The dense output of a step, worked out when it is first asked for. */
function insideOf(
  from: number,
  h: number,
  start: Float64Array,
  end: Float64Array,
  allK: Float64Array,
  evaluate: (stage: number, time: number, at: Float64Array) => void,
): TakenStep['inside'] {
  let orders: Float64Array | null = null;
  return (time, out) => {
    orders ??= denseOrders(from, h, start, end, allK, evaluate);
    const x = (time - from) / h;
    for (let c = 0; c < STATE_SIZE; c++) {
      let sum = 0;
      for (let order = DENSE_ORDERS - 1; order >= 0; order--) {
        sum = (sum + orders[order * STATE_SIZE + c]!) * (order % 2 === 0 ? x : 1 - x);
      }
      out[c] = start[c]! + sum;
    }
  };
}

function denseOrders(
  from: number,
  h: number,
  start: Float64Array,
  end: Float64Array,
  allK: Float64Array,
  evaluate: (stage: number, time: number, at: Float64Array) => void,
): Float64Array {
  const at = new Float64Array(STATE_SIZE);
  for (let stage = 13; stage < 16; stage++) {
    weighted(stages, stage, allK, h, start, at);
    evaluate(stage, from + NODES[stage]! * h, at);
  }
  const orders = new Float64Array(DENSE_ORDERS * STATE_SIZE);
  for (let c = 0; c < STATE_SIZE; c++) {
    const moved = end[c]! - start[c]!;
    const first = h * allK[c]!;
    orders[c] = moved;
    orders[STATE_SIZE + c] = first - moved;
    orders[2 * STATE_SIZE + c] = 2 * moved - h * allK[12 * STATE_SIZE + c]! - first;
  }
  for (let row = 0; row < DENSE.length; row++) {
    weighted(dense, row, allK, h, null, at);
    orders.set(at, (3 + row) * STATE_SIZE);
  }
  return orders;
}

/** out = base + h times a row's weighted sum of the stages. */
function weighted(
  { ends, bases, weights }: FlatRows,
  row: number,
  allK: Float64Array,
  h: number,
  base: Float64Array | null,
  out: Float64Array,
): void {
  let s0 = 0;
  let s1 = 0;
  let s2 = 0;
  let s3 = 0;
  let s4 = 0;
  let s5 = 0;
  for (let i = row === 0 ? 0 : ends[row - 1]!; i < ends[row]!; i++) {
    const w = weights[i]!;
    const at = bases[i]!;
    s0 += w * allK[at]!;
    s1 += w * allK[at + 1]!;
    s2 += w * allK[at + 2]!;
    s3 += w * allK[at + 3]!;
    s4 += w * allK[at + 4]!;
    s5 += w * allK[at + 5]!;
  }
  out[0] = h * s0;
  out[1] = h * s1;
  out[2] = h * s2;
  out[3] = h * s3;
  out[4] = h * s4;
  out[5] = h * s5;
  if (base !== null) for (let c = 0; c < STATE_SIZE; c++) out[c] = out[c]! + base[c]!;
}

/** The step's error in units of what is allowed; both vectors are measured whole, so no axis is special. */
function errorNorm(
  error3: Float64Array,
  error5: Float64Array,
  before: Float64Array,
  after: Float64Array,
  { relative, placeFloor, velocityFloor }: Tolerance,
): number {
  const place = placeFloor + relative * Math.max(length(before, 0), length(after, 0));
  const velocity = velocityFloor + relative * Math.max(length(before, 3), length(after, 3));
  const third = (length(error3, 0) / place) ** 2 + (length(error3, 3) / velocity) ** 2;
  const fifth = (length(error5, 0) / place) ** 2 + (length(error5, 3) / velocity) ** 2;
  if (third === 0 && fifth === 0) return 0;
  return fifth / Math.sqrt((fifth + 0.01 * third) * STATE_SIZE);
}

function length(v: Float64Array, from: number): number {
  return Math.sqrt(v[from]! ** 2 + v[from + 1]! ** 2 + v[from + 2]! ** 2);
}

function flatten(rows: readonly Weights[]): FlatRows {
  const all = rows.flat();
  let end = 0;
  return {
    ends: Int32Array.from(rows, (row) => (end += row.length)),
    bases: Int32Array.from(all, ([stage]) => stage * STATE_SIZE),
    weights: Float64Array.from(all, ([, weight]) => weight),
  };
}
