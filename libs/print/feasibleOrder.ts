import { type StationGrid } from './stationGrid';
import { type Job } from './stationPlan';

/** Up to this many targets every subset is weighed (4096 of them); beyond, the heaviest are fitted in turn. */
const MOST_WEIGHED = 12;

/**
 * An order in which the heaviest set of jobs that fits can be shown, each for the least look; those that do not
 * fit come last. Exact for up to twelve jobs: of every subset the earliest end is known from the subsets with
 * one job less, since ending a set earlier never leaves less room for the next.
 */
export function feasibleOrder(jobs: readonly Job[], grid: StationGrid): readonly Job[] {
  const shown = jobs.length <= MOST_WEIGHED ? heaviestSet(jobs, grid) : fittedInTurn(jobs, grid);
  return [...shown, ...jobs.filter((job) => !shown.includes(job))];
}

function heaviestSet(jobs: readonly Job[], { leastCells }: StationGrid): Job[] {
  const sets = 1 << jobs.length;
  const ends = new Float64Array(sets).fill(Infinity);
  const last = new Int8Array(sets).fill(-1);
  const weights = new Float64Array(sets);
  ends[0] = 0;
  let best = 0;
  for (let set = 1; set < sets; set++) {
    for (let i = 0; i < jobs.length; i++) {
      const bit = 1 << i;
      if ((set & bit) === 0) continue;
      weights[set] = weights[set ^ bit]! + jobs[i]!.wish.weight;
      const end = endAfter(jobs[i]!, ends[set ^ bit]!, leastCells);
      if (end < ends[set]!) {
        ends[set] = end;
        last[set] = i;
      }
    }
    if (ends[set]! < Infinity && weights[set]! > weights[best]!) best = set;
  }
  const order: Job[] = [];
  for (let set = best; set > 0; set ^= 1 << last[set]!) order.unshift(jobs[last[set]!]!);
  return order;
}

function fittedInTurn(jobs: readonly Job[], { leastCells }: StationGrid): Job[] {
  let order: Job[] = [];
  for (const job of jobs.toSorted((a, b) => b.wish.weight - a.wish.weight)) {
    let kept: Job[] | null = null;
    let earliest = Infinity;
    for (let at = 0; at <= order.length; at++) {
      const tried = order.toSpliced(at, 0, job);
      const end = tried.reduce((cell, next) => endAfter(next, cell, leastCells), 0);
      if (end < earliest) [kept, earliest] = [tried, end];
    }
    if (kept !== null) order = kept;
  }
  return order;
}

/** The cell at which a job's least look ends when it begins at `cell` or as soon after as it can. */
function endAfter({ room }: Job, cell: number, leastCells: number): number {
  for (let start = cell; start < room.length; start++) {
    if (room[start]! >= leastCells) return start + leastCells;
  }
  return Infinity;
}
