import { DEG } from '#sky';
import {
  type AltitudeCurve,
  type AltitudeOf,
  type Crossing,
  altitudeCurve,
  curveCrossings,
} from './crossings';

/** Sun's centre, airless: 34' of refraction and 16' of semidiameter at a sea-level horizon. */
const SUN_RISE_SET = -0.8333 * DEG;
const CIVIL = -6 * DEG;
const NAUTICAL = -12 * DEG;
const ASTRONOMICAL = -18 * DEG;
/** The Moon's upper limb, airless: 34' of refraction. */
const MOON_LIMB = -0.5667 * DEG;

const MS_PER_MINUTE = 60_000;

/**
 * The light of one evening. Instants are UTC epoch milliseconds, the first of their kind in the interval
 * searched, or null where there is none: under the midnight sun `sunset` is null, in polar night too, and
 * where the Sun stays above -18 degrees `astronomicalDusk` is null.
 */
export interface EveningLight {
  readonly sunset: number | null;
  readonly civilDusk: number | null;
  readonly nauticalDusk: number | null;
  readonly astronomicalDusk: number | null;
  readonly astronomicalDawn: number | null;
  readonly nauticalDawn: number | null;
  readonly civilDawn: number | null;
  readonly sunrise: number | null;
  readonly moonrise: number | null;
  readonly moonset: number | null;
  /** Minutes with the Sun below -18 degrees and the Moon's upper limb below the horizon. */
  readonly darkMinutes: number;
}

/**
 * Sunset to sunrise, the three twilights, moonrise and moonset between two instants (UTC ms; by custom one
 * local noon to the next). Sun: centre at -0.8333 (rise and set), -6, -12, -18 degrees airless. Moon: upper
 * limb at -0.5667 degrees airless, so its centre at that less the semidiameter of the moment. Both for a
 * sea-level horizon. Dusks and sets are downward crossings, dawns and rises upward ones, each within 0.2 s of
 * what the altitude functions give. `darkMinutes` is the exact measure of the dark intervals, not a count.
 */
export function eveningLight(
  sun: AltitudeOf,
  moon: AltitudeOf,
  moonSemidiameterRad: AltitudeOf,
  fromMs: number,
  toMs: number,
): EveningLight {
  const sunCurve = altitudeCurve(sun, fromMs, toMs);
  const limbCurve = altitudeCurve((t) => moon(t) + moonSemidiameterRad(t), fromMs, toMs);
  const horizon = curveCrossings(sunCurve, SUN_RISE_SET);
  const civil = curveCrossings(sunCurve, CIVIL);
  const nautical = curveCrossings(sunCurve, NAUTICAL);
  const astronomical = curveCrossings(sunCurve, ASTRONOMICAL);
  const moonHorizon = curveCrossings(limbCurve, MOON_LIMB);
  return {
    sunset: first(horizon, false),
    civilDusk: first(civil, false),
    nauticalDusk: first(nautical, false),
    astronomicalDusk: first(astronomical, false),
    astronomicalDawn: first(astronomical, true),
    nauticalDawn: first(nautical, true),
    civilDawn: first(civil, true),
    sunrise: first(horizon, true),
    moonrise: first(moonHorizon, true),
    moonset: first(moonHorizon, false),
    darkMinutes:
      overlapMs(
        below(sunCurve, ASTRONOMICAL, astronomical, toMs),
        below(limbCurve, MOON_LIMB, moonHorizon, toMs),
      ) / MS_PER_MINUTE,
  };
}

function first(found: readonly Crossing[], rising: boolean): number | null {
  return found.find((crossing) => crossing.rising === rising)?.utcMs ?? null;
}

type Interval = readonly [startMs: number, endMs: number];

/** The intervals in which a curve is below a level, from its crossings of that level. */
function below(curve: AltitudeCurve, levelRad: number, found: readonly Crossing[], toMs: number): Interval[] {
  const intervals: Interval[] = [];
  let since: number | null = curve.values[0]! < levelRad ? curve.times[0]! : null;
  for (const { utcMs, rising } of found) {
    if (rising && since !== null) intervals.push([since, utcMs]);
    since = rising ? null : utcMs;
  }
  if (since !== null) intervals.push([since, toMs]);
  return intervals;
}

function overlapMs(left: readonly Interval[], right: readonly Interval[]): number {
  let total = 0;
  for (const [leftStart, leftEnd] of left) {
    for (const [rightStart, rightEnd] of right) {
      total += Math.max(0, Math.min(leftEnd, rightEnd) - Math.max(leftStart, rightStart));
    }
  }
  return total;
}
