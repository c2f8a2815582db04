import {
  LONGEST_REACH_DAYS,
  type Motion,
  type OrbitalElements,
  type PerturberTable,
  perturberTable,
  type SkyTarget,
  ttJdToUtcMs,
  utcMsToTtJd,
  withPerturbations,
} from '#sky';
import { problem } from '../clubProblem';

/** Gives a comet or asteroid its motion under the planets around a UTC instant; any other target as it is. */
export type Perturbing = (target: SkyTarget, utcMs: number) => SkyTarget;

/** How much more than was asked for is worked out once a body is asked about a second time. */
const FURTHER_DAYS = 200;
/** What withPerturbations adds on either side, and a day. */
const MARGIN_DAYS = 21;
/** How near to the end of a motion an instant may lie, for the light time. */
const LIGHT_DAYS = 2;

/**
 * Perturbed motion for single instants. It remembers the motions and the planets' table, so that a thousand
 * places of a body cost little more than one: keep it for as long as one piece of work lasts.
 *
 * Throws a ClubProblem of kind 'invalid' where a body cannot be followed to an instant.
 */
export function perturbing(): Perturbing {
  const motions = new WeakMap<OrbitalElements, Motion>();
  let table: PerturberTable | null = null;

  const tableOver = (firstTtJd: number, lastTtJd: number): PerturberTable => {
    if (table === null) {
      table = perturberTable(firstTtJd, lastTtJd);
    } else if (firstTtJd < table.fromTtJd || lastTtJd > table.toTtJd) {
      table = perturberTable(
        firstTtJd < table.fromTtJd ? firstTtJd - FURTHER_DAYS : table.fromTtJd,
        lastTtJd > table.toTtJd ? lastTtJd + FURTHER_DAYS : table.toTtJd,
      );
    }
    return table;
  };

  return (target, utcMs) => {
    if (target.kind !== 'orbit' || target.elements.epochTtJd === null) return target;
    const ttJd = utcMsToTtJd(utcMs);
    const known = motions.get(target.elements);
    if (known !== undefined && ttJd - LIGHT_DAYS >= known.fromTtJd && ttJd <= known.toTtJd) {
      return { ...target, motion: known };
    }
    const more = known === undefined ? 0 : FURTHER_DAYS;
    const from = Math.min(ttJd - more, (known?.fromTtJd ?? Infinity) + MARGIN_DAYS);
    const to = Math.max(ttJd + more, (known?.toTtJd ?? -Infinity) - MARGIN_DAYS);
    const first = Math.min(from - MARGIN_DAYS, target.elements.epochTtJd);
    const last = Math.max(to + MARGIN_DAYS, target.elements.epochTtJd);
    try {
      const planets = last - first <= LONGEST_REACH_DAYS ? tableOver(first, last) : null;
      const moved = withPerturbations(target, ttJdToUtcMs(from), ttJdToUtcMs(to), planets);
      if (moved.motion !== undefined) motions.set(target.elements, moved.motion);
      return moved;
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      throw problem('invalid', 'target', target.name, error.message);
    }
  };
}
