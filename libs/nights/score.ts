import { DEG } from '#sky';
import { type MeasuredTarget } from './measure';
import { type MoonWish, type ScoreWeights } from './programme';
import { type Season } from './season';
import { type SiteInstant } from './siteInstant';

/** The share, 0 to 1, that an evening earns of each part of the score, and the figures behind it. */
export interface EveningShares {
  programme: number;
  darkness: number;
  height: number;
  moon: number;
  /** Figures of the words: mean of the greatest altitudes of what is shown (rad), minutes of full darkness, … */
  meanHighestAltitudeRad: number;
  fullyDarkShare: number;
  moonUpShare: number;
  moonHighShare: number;
  moonIlluminatedFraction: number;
}

/** Darkness counts from nothing at the end of civil twilight to full at astronomical dusk. */
const CIVIL_RAD = -6 * DEG;
const ASTRONOMICAL_RAD = -18 * DEG;
/** A target this high earns all of the height part: higher, its air hardly thins any more. */
const SIN_HIGH = Math.sin(60 * DEG);
/** A Moon to be shown should stand this high. */
const MOON_SHOWN_RAD = 10 * DEG;
/** The Moon's centre when its upper limb is on the sea-level horizon, near enough for a share of steps. */
const MOON_UP_RAD = -0.83 * DEG;

/**
 * What an evening earns, from its measured targets and the coarse steps of its public hours.
 *
 * - programme: share of the programme shown, by weight;
 * - darkness: mean over the steps of how far the Sun is down between -6 (none) and -18 degrees (full);
 * - height: mean over what is shown, by weight, of the sine of its greatest altitude, full at 60 degrees;
 * - moon: wished dark, the share of steps without it, a lit part f counting as 1 - f; welcome, the share of
 *   steps with it above 10 degrees, less when it is nearly full and drowns the rest; indifferent, all.
 *
 * The measures are our own; what an outreach evening needs is common practice.
 */
export function eveningShares(
  season: Season,
  targets: readonly MeasuredTarget[],
  steps: readonly SiteInstant[],
): EveningShares {
  let weightAll = 0;
  let weightShown = 0;
  let height = 0;
  let altitude = 0;
  season.programme.items.forEach(({ weight }, i) => {
    weightAll += weight;
    const target = targets[i]!;
    if (!target.shown) return;
    weightShown += weight;
    height += weight * Math.min(1, target.highestSine / SIN_HIGH);
    altitude += weight * Math.asin(target.highestSine);
  });
  let dark = 0;
  let fullyDark = 0;
  let moonUp = 0;
  let moonHigh = 0;
  for (const step of steps) {
    const depth = (CIVIL_RAD - step.sunAltitudeRad) / (CIVIL_RAD - ASTRONOMICAL_RAD);
    dark += Math.min(1, Math.max(0, depth));
    if (depth >= 1) fullyDark++;
    if (step.moonAltitudeRad > MOON_UP_RAD) moonUp++;
    if (step.moonAltitudeRad > MOON_SHOWN_RAD) moonHigh++;
  }
  const count = steps.length;
  const lit = steps[count >> 1]!.moonIlluminatedFraction;
  return {
    programme: weightShown / weightAll,
    darkness: dark / count,
    height: weightShown > 0 ? height / weightShown : 0,
    moon: moonShare(season.programme.moon, lit, moonUp / count, moonHigh / count),
    meanHighestAltitudeRad: weightShown > 0 ? altitude / weightShown : 0,
    fullyDarkShare: fullyDark / count,
    moonUpShare: moonUp / count,
    moonHighShare: moonHigh / count,
    moonIlluminatedFraction: lit,
  };
}

function moonShare(wish: MoonWish, lit: number, upShare: number, highShare: number): number {
  switch (wish) {
    case 'dark':
      return 1 - upShare * lit;
    case 'welcome':
      return highShare * (lit > 0.8 ? 1 - (lit - 0.8) / 0.4 : 1);
    case 'indifferent':
      return 1;
  }
}

/** The score: the parts' points, each to a hundredth, summed. */
export function scoreOf(shares: EveningShares, weights: ScoreWeights): number {
  return roundPoints(
    roundPoints(shares.programme * weights.programme) +
      roundPoints(shares.darkness * weights.darkness) +
      roundPoints(shares.height * weights.height) +
      roundPoints(shares.moon * weights.moon),
  );
}

export function roundPoints(points: number): number {
  return Math.round(points * 100) / 100;
}
