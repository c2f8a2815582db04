import { type Interval } from '#nights';
import { cellsOf, type StationGrid } from './stationGrid';
import { planStation } from './stationPlan';

/** A target that a station is to show, and when it can. */
export interface RunWish {
  readonly target: string;
  readonly station: string;
  /** Above 0; a heavier target keeps its place when time is short, and gets a longer look. */
  readonly weight: number;
  /** When it can be shown, in order, not overlapping. */
  readonly intervals: readonly Interval[];
  /** When it is shown best; null: any of its time is as good. */
  readonly bestMs: number | null;
}

export interface RunRules {
  readonly hours: Interval;
  /** Times in which no station shows anything. */
  readonly breaks: readonly Interval[];
  /** No look is shorter than this. */
  readonly leastLookMinutes: number;
}

/** One look: a station shows a target, from and to whole minutes. */
export interface RunSlot extends Interval {
  readonly target: string;
  readonly station: string;
}

export interface LeftOut {
  readonly target: string;
  readonly station: string;
  /** 'tooShort': it cannot be shown for a whole look at a stretch; 'noRoom': its station shows heavier ones. */
  readonly why: 'tooShort' | 'noRoom';
}

/** An event's programme in order. */
export interface RunSheet {
  readonly hours: Interval;
  readonly breaks: readonly Interval[];
  /** By start, then in the order of the stations. */
  readonly slots: readonly RunSlot[];
  readonly leftOut: readonly LeftOut[];
}

const MINUTE_MS = 60_000;
/** People keep to round times more easily. */
const ROUND_MINUTES = 5;

/**
 * Plans an event: each station works through its targets one after another, all stations in parallel. The
 * heaviest set of targets that fits is shown; among the orders that show it, the one in which each target comes
 * near its best, so that what sets or fades first goes first, and time is shared by weight. Looks start and end
 * at round times, or to the minute where a short showing would be lost by rounding.
 */
export function planRunSheet(wishes: readonly RunWish[], rules: RunRules): RunSheet {
  const stations = [...new Set(wishes.map(({ station }) => station))];
  const plans = stations.map((station) => {
    const own = wishes.filter((wish) => wish.station === station);
    return planStation(own, gridFor(own, rules));
  });
  const place = new Map(stations.map((station, index) => [station, index]));
  return {
    hours: rules.hours,
    breaks: rules.breaks,
    slots: plans
      .flatMap(({ slots }) => slots)
      .sort((a, b) => a.startMs - b.startMs || place.get(a.station)! - place.get(b.station)!),
    leftOut: plans.flatMap(({ leftOut }) => leftOut),
  };
}

function gridFor(wishes: readonly RunWish[], rules: RunRules): StationGrid {
  const round = gridOf(ROUND_MINUTES, rules);
  const fine = gridOf(1, rules);
  const isLost = wishes.some((wish) => fits(wish, fine) && !fits(wish, round));
  return isLost ? fine : round;
}

function gridOf(stepMinutes: number, { hours, breaks, leastLookMinutes }: RunRules): StationGrid {
  const stepMs = stepMinutes * MINUTE_MS;
  const first = Math.ceil(hours.startMs / stepMs);
  const count = Math.max(0, Math.floor(hours.endMs / stepMs) - first);
  return {
    stepMinutes,
    startMs: first * stepMs,
    count,
    leastCells: Math.max(1, Math.ceil(leastLookMinutes / stepMinutes)),
    isOpen: Array.from({ length: count }, (_, cell) => {
      const startMs = (first + cell) * stepMs;
      return breaks.every((rest) => rest.endMs <= startMs || rest.startMs >= startMs + stepMs);
    }),
  };
}

function fits(wish: RunWish, grid: StationGrid): boolean {
  let run = 0;
  for (const can of cellsOf(wish, grid)) {
    run = can ? run + 1 : 0;
    if (run >= grid.leastCells) return true;
  }
  return false;
}
