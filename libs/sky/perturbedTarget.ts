import { LONGEST_REACH_DAYS, perturbedMotion } from './perturbedMotion';
import { type PerturberTable, perturberTable } from './perturbers';
import { type SkyTarget } from './target';
import { utcMsToTtJd } from './time';

/**
 * A track reaches 2 days past its season, its last piece up to 16 days past that, and light left the body
 * hours before it is seen.
 */
const MARGIN_DAYS = 20;

/**
 * The target with its motion under the planets from one UTC instant to another, 20 days to spare on either
 * side, so that `place` and `buildTrack` follow that. A target that is no orbit, or whose elements name no
 * epoch, comes back as it is: on its conic. Perturbations count from the first day: the two-body orbit stays
 * good to an arcsecond for about 30 days, but not for a body that passes a planet meanwhile.
 *
 * `table` (perturbersFor) is shared by all the targets of a season. Throws a RangeError that names the target
 * where its motion cannot be followed: a strike, or an epoch more than a hundred years away.
 */
export function withPerturbations<T extends SkyTarget>(
  target: T,
  fromUtcMs: number,
  toUtcMs: number,
  table?: PerturberTable | null,
): T {
  if (target.kind !== 'orbit' || target.elements.epochTtJd === null) return target;
  const [fromTtJd, toTtJd] = withMargin(fromUtcMs, toUtcMs);
  try {
    return { ...target, motion: perturbedMotion(target.elements, fromTtJd, toTtJd, table ?? null) };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw new RangeError(`${target.name}: ${error.message}`, { cause: error });
  }
}

/** The planets' table that serves all of the targets from one UTC instant to another; null where none needs it. */
export function perturbersFor(
  targets: readonly SkyTarget[],
  fromUtcMs: number,
  toUtcMs: number,
): PerturberTable | null {
  const [fromTtJd, toTtJd] = withMargin(fromUtcMs, toUtcMs);
  // An epoch out of reach is left to be refused when its own body's turn comes.
  const within = targets.flatMap((target) => {
    const epoch = target.kind === 'orbit' ? target.elements.epochTtJd : null;
    return epoch !== null && Math.max(toTtJd - epoch, epoch - fromTtJd) <= LONGEST_REACH_DAYS ? [epoch] : [];
  });
  return within.length === 0
    ? null
    : perturberTable(Math.min(fromTtJd, ...within), Math.max(toTtJd, ...within));
}

function withMargin(fromUtcMs: number, toUtcMs: number): readonly [fromTtJd: number, toTtJd: number] {
  return [utcMsToTtJd(fromUtcMs) - MARGIN_DAYS, utcMsToTtJd(toUtcMs) + MARGIN_DAYS];
}
