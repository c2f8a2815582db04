/** Airless geometric topocentric altitude of a body's centre in radians at a UTC instant (epoch ms). */
export type AltitudeOf = (utcMs: number) => number;

/** The instant at which an altitude passes a level, and which way. */
export interface Crossing {
  readonly utcMs: number;
  readonly rising: boolean;
}

/** An altitude curve at instants between which it only rises or only falls. */
export interface AltitudeCurve {
  readonly altitude: AltitudeOf;
  readonly times: readonly number[];
  readonly values: readonly number[];
}

const COARSE_STEP_MS = 3_600_000;
const EDGE_MS = 1000;
const TURN_TOLERANCE_MS = 500;
const ROOT_TOLERANCE_MS = 1;

/**
 * Samples an altitude once so that any number of levels can be searched in it. Hourly samples come first;
 * then every highest and lowest point is found and added, so a body that dips under a level for a minute and
 * comes up again has two crossings, not none. Between two samples no third turn is looked for: a diurnal
 * curve has one upper and one lower turn a day except within a fraction of a degree of the poles.
 */
export function altitudeCurve(altitude: AltitudeOf, fromMs: number, toMs: number): AltitudeCurve {
  const coarse = coarseTimes(fromMs, toMs);
  const coarseValues = coarse.map(altitude);
  const times: number[] = [];
  const values: number[] = [];
  const add = (at: number, value: number): void => {
    times.push(at);
    values.push(value);
  };
  // A turn lies between the neighbours of the middle sample of three, on either side of that sample.
  let turn: Turn | null = null;
  for (let i = 0; i < coarse.length; i++) {
    const at = coarse[i]!;
    if (turn !== null && turn.at < at) {
      if (turn.at > times[times.length - 1]!) add(turn.at, turn.value);
      turn = null;
    }
    const value = coarseValues[i]!;
    if (i > 0 && i < coarse.length - 1) {
      const next = turnAmong(
        altitude,
        [coarse[i - 1]!, at, coarse[i + 1]!],
        [coarseValues[i - 1]!, value, coarseValues[i + 1]!],
      );
      if (next !== null && next.at < at) add(next.at, next.value);
      else if (next !== null && next.at > at) turn = next;
    }
    add(at, value);
  }
  return { altitude, times, values };
}

/** Every crossing of `level` (rad) by a sampled curve, in order, to about a millisecond. */
export function curveCrossings(curve: AltitudeCurve, levelRad: number): readonly Crossing[] {
  const { altitude, times, values } = curve;
  const found: Crossing[] = [];
  for (let i = 1; i < times.length; i++) {
    const before = values[i - 1]! - levelRad;
    const after = values[i]! - levelRad;
    if (before < 0 === after < 0) continue;
    const utcMs = rootBetween((t) => altitude(t) - levelRad, times[i - 1]!, before, times[i]!, after);
    found.push({ utcMs, rising: after >= 0 });
  }
  return found;
}

/**
 * Every instant in [fromMs, toMs] at which `altitude` passes `levelRad`, in order, each found to better than
 * 0.2 s. An altitude equal to the level counts as above it, so a curve that starts on the level and rises has
 * no crossing there. A dip through the level of less than about a second may go unseen.
 */
export function crossings(
  altitude: AltitudeOf,
  levelRad: number,
  fromMs: number,
  toMs: number,
): readonly Crossing[] {
  return curveCrossings(altitudeCurve(altitude, fromMs, toMs), levelRad);
}

interface Turn {
  readonly at: number;
  readonly value: number;
}

/**
 * Hourly instants, with one more just inside each end: without those a turn in the first or last hour hides.
 */
function coarseTimes(fromMs: number, toMs: number): number[] {
  const length = toMs - fromMs;
  if (!(length > 0)) return [fromMs];
  const steps = Math.max(1, Math.ceil(length / COARSE_STEP_MS));
  const times = [fromMs];
  if (length > 4 * EDGE_MS) times.push(fromMs + EDGE_MS);
  for (let i = 1; i < steps; i++) times.push(fromMs + (length * i) / steps);
  if (length > 4 * EDGE_MS) times.push(toMs - EDGE_MS);
  times.push(toMs);
  return times;
}

type Three = readonly [number, number, number];

/** The highest or lowest point bracketed by three samples, or null where they only rise or only fall. */
function turnAmong(altitude: AltitudeOf, at: Three, value: Three): Turn | null {
  if (value[1] > value[0] && value[1] >= value[2]) return lowest((t) => -altitude(t), at, value, -1);
  if (value[1] < value[0] && value[1] <= value[2]) return lowest(altitude, at, value, 1);
  return null;
}

/** Brent's minimum search (parabolas, golden section where they fail) inside a bracket already sampled. */
function lowest(f: AltitudeOf, at: Three, value: Three, sign: 1 | -1): Turn {
  const golden = 0.381966;
  let low = at[0];
  let high = at[2];
  let best = at[1];
  let bestValue = sign * value[1];
  // The bracket's ends serve as the second and third best points, so the first step is already a parabola.
  const leftIsBetter = sign * value[0] <= sign * value[2];
  let second = leftIsBetter ? low : high;
  let secondValue = sign * (leftIsBetter ? value[0] : value[2]);
  let third = leftIsBetter ? high : low;
  let thirdValue = sign * (leftIsBetter ? value[2] : value[0]);
  let step = high - low;
  let stepBefore = step;
  for (let n = 0; n < 60; n++) {
    const middle = 0.5 * (low + high);
    if (Math.abs(best - middle) <= 2 * TURN_TOLERANCE_MS - 0.5 * (high - low)) break;
    const r = (best - second) * (bestValue - thirdValue);
    const q = (best - third) * (bestValue - secondValue);
    const divisor = 2 * (q - r);
    const parabola = divisor === 0 ? Infinity : ((best - second) * r - (best - third) * q) / divisor;
    const landing = best + parabola;
    if (Math.abs(parabola) < 0.5 * Math.abs(stepBefore) && landing > low && landing < high) {
      stepBefore = step;
      step = parabola;
      const nearEnd = landing - low < 2 * TURN_TOLERANCE_MS || high - landing < 2 * TURN_TOLERANCE_MS;
      if (nearEnd) step = middle > best ? TURN_TOLERANCE_MS : -TURN_TOLERANCE_MS;
    } else {
      stepBefore = best < middle ? high - best : low - best;
      step = golden * stepBefore;
    }
    if (Math.abs(step) < TURN_TOLERANCE_MS) step = step > 0 ? TURN_TOLERANCE_MS : -TURN_TOLERANCE_MS;
    const trial = best + step;
    const trialValue = f(trial);
    if (trialValue <= bestValue) {
      if (trial < best) high = best;
      else low = best;
      [third, thirdValue] = [second, secondValue];
      [second, secondValue] = [best, bestValue];
      [best, bestValue] = [trial, trialValue];
    } else {
      if (trial < best) low = trial;
      else high = trial;
      if (trialValue <= secondValue) {
        [third, thirdValue] = [second, secondValue];
        [second, secondValue] = [trial, trialValue];
      } else if (trialValue <= thirdValue) {
        [third, thirdValue] = [trial, trialValue];
      }
    }
  }
  return { at: best, value: sign * bestValue };
}

/** Brent's root search between two instants whose values differ in sign (Brent 1973, chapter 4). */
function rootBetween(f: (t: number) => number, t0: number, f0: number, t1: number, f1: number): number {
  let [a, fa, b, fb] = [t0, f0, t1, f1];
  let [c, fc] = [a, fa];
  let step = b - a;
  let stepBefore = step;
  for (let n = 0; n < 100; n++) {
    if (fb > 0 === fc > 0) {
      [c, fc] = [a, fa];
      step = stepBefore = b - a;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, fa] = [b, fb];
      [b, fb] = [c, fc];
      [c, fc] = [a, fa];
    }
    const half = 0.5 * (c - b);
    if (fb === 0 || Math.abs(half) <= ROOT_TOLERANCE_MS) return b;
    if (Math.abs(stepBefore) >= ROOT_TOLERANCE_MS && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const u = fa / fc;
        const v = fb / fc;
        p = s * (2 * half * u * (u - v) - (b - a) * (v - 1));
        q = (u - 1) * (v - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      p = Math.abs(p);
      if (2 * p < Math.min(3 * half * q - Math.abs(ROOT_TOLERANCE_MS * q), Math.abs(stepBefore * q))) {
        stepBefore = step;
        step = p / q;
      } else {
        step = stepBefore = half;
      }
    } else {
      step = stepBefore = half;
    }
    [a, fa] = [b, fb];
    b += Math.abs(step) > ROOT_TOLERANCE_MS ? step : Math.sign(half) * ROOT_TOLERANCE_MS;
    fb = f(b);
  }
  return b;
}
