import { feasibleOrder } from './feasibleOrder';
import { type LeftOut, type RunSlot, type RunWish } from './runSheet';
import { cellsOf, type StationGrid } from './stationGrid';

/** One target of the queue, ready to be placed. */
export interface Job {
  readonly wish: RunWish;
  /** For each cell, how many cells from it on it can be shown without a gap. */
  readonly room: Int32Array;
  /** Goodness of the cells before each cell, summed; each cell brings more than 0 and at most 1. */
  readonly goodness: Float64Array;
}

/** What showing one more target is worth beside showing the others better: always more. */
const SHOWN = 1e6;
/** Goodness that a look at the far end of a showing has beside one at its best. */
const WORST_GOODNESS = 0.3;
/** Steps of the search for a better order, in looks tried; bounds the time a long programme takes. */
const MOST_LOOKS_TRIED = 3_000_000;

/** One station's queue: which of its targets it shows, in which order, from when to when. */
export function planStation(
  wishes: readonly RunWish[],
  grid: StationGrid,
): { readonly slots: readonly RunSlot[]; readonly leftOut: readonly LeftOut[] } {
  const jobs = wishes.map((wish) => jobOf(wish, grid));
  const fitting = jobs.filter(({ room }) => room.some((cells) => cells >= grid.leastCells));
  const looks = lookLengths(grid);
  const order = bestOrder(fitting, grid, looks);
  const slots = placed(order, grid, looks);
  return {
    slots,
    leftOut: jobs.flatMap((job): LeftOut[] => {
      const { target, station } = job.wish;
      if (slots.some((slot) => slot.target === target)) return [];
      return [{ target, station, why: fitting.includes(job) ? 'noRoom' : 'tooShort' }];
    }),
  };
}

function jobOf(wish: RunWish, grid: StationGrid): Job {
  const can = cellsOf(wish, grid);
  const room = new Int32Array(grid.count + 1);
  for (let cell = grid.count - 1; cell >= 0; cell--) room[cell] = can[cell]! ? room[cell + 1]! + 1 : 0;
  const stepMs = grid.stepMinutes * 60_000;
  const goodness = new Float64Array(grid.count + 1);
  for (let cell = 0; cell < grid.count; cell++) {
    goodness[cell + 1] = goodness[cell]! + goodnessAt(wish, grid.startMs + (cell + 0.5) * stepMs);
  }
  return { wish, room, goodness };
}

/**
 * How good an instant is for a target: 1 at its best, falling to the ends of its showing. So a target that is
 * soon lost loses more by waiting than one that stays, and comes first.
 */
function goodnessAt({ intervals, bestMs }: RunWish, utcMs: number): number {
  if (bestMs === null) return 1;
  const edge = utcMs < bestMs ? intervals[0]!.startMs : intervals.at(-1)!.endMs;
  const share = Math.min(1, Math.abs(utcMs - bestMs) / Math.max(1, Math.abs(edge - bestMs)));
  return 1 - (1 - WORST_GOODNESS) * share;
}

/** Lengths a look may have, in cells, rising: the least one, then in steps of five minutes, later of fifteen. */
function lookLengths(grid: StationGrid): number[] {
  const lengths = [grid.leastCells];
  for (let minutes = 5; minutes <= grid.count * grid.stepMinutes; minutes += minutes < 60 ? 5 : 15) {
    const cells = minutes / grid.stepMinutes;
    if (cells > grid.leastCells) lengths.push(cells);
  }
  return lengths;
}

/** Climbs from the best of three orders by moving one target at a time, as long as that helps. */
function bestOrder(jobs: readonly Job[], grid: StationGrid, looks: readonly number[]): readonly Job[] {
  const lastMs = ({ wish }: Job) => wish.intervals.at(-1)!.endMs;
  const bestMs = ({ wish }: Job) => wish.bestMs ?? (wish.intervals[0]!.startMs + lastMs({ wish } as Job)) / 2;
  const starts = [
    feasibleOrder(jobs, grid),
    jobs.toSorted((a, b) => lastMs(a) - lastMs(b) || bestMs(a) - bestMs(b)),
    jobs.toSorted((a, b) => bestMs(a) - bestMs(b) || lastMs(a) - lastMs(b)),
  ];
  let best: readonly Job[] = jobs;
  let worth = -1;
  for (const order of starts) {
    const value = worthOf(order, grid, looks);
    if (value > worth) [best, worth] = [order, value];
  }
  let tries = MOST_LOOKS_TRIED / Math.max(1, jobs.length * grid.count * looks.length);
  for (let improved = true; improved && tries > 0;) {
    improved = false;
    for (let from = 0; from < best.length && tries > 0; from++) {
      for (let to = 0; to < best.length && tries > 0; to++) {
        if (to === from) continue;
        tries -= 1;
        const order = best.toSpliced(from, 1).toSpliced(to, 0, best[from]!);
        const value = worthOf(order, grid, looks);
        if (value <= worth * (1 + 1e-12)) continue;
        [best, worth] = [order, value];
        improved = true;
      }
    }
  }
  return best;
}

/** What the targets of an order are worth, from each of them and each cell on; the last row is all zero. */
function worthTable(order: readonly Job[], grid: StationGrid, looks: readonly number[]): Float64Array[] {
  const width = grid.count + 1;
  const table = Array.from({ length: order.length + 1 }, () => new Float64Array(width));
  for (let i = order.length - 1; i >= 0; i--) {
    const job = order[i]!;
    const later = table[i + 1]!;
    const row = table[i]!;
    row[grid.count] = later[grid.count]!;
    for (let cell = grid.count - 1; cell >= 0; cell--) {
      let best = Math.max(later[cell]!, row[cell + 1]!);
      for (const length of looks) {
        if (length > job.room[cell]!) break;
        best = Math.max(best, lookWorth(job, cell, length) + later[cell + length]!);
      }
      row[cell] = best;
    }
  }
  return table;
}

/** A longer look is worth more, but less and less, so that time is shared, in proportion to the weights. */
function lookWorth({ wish, goodness }: Job, cell: number, length: number): number {
  const sum = goodness[cell + length]! - goodness[cell]!;
  return wish.weight * SHOWN + (Math.sqrt(wish.weight) * sum) / Math.sqrt(length);
}

function worthOf(order: readonly Job[], grid: StationGrid, looks: readonly number[]): number {
  return worthTable(order, grid, looks)[0]![0]!;
}

/** The looks of an order's best plan. */
function placed(order: readonly Job[], grid: StationGrid, looks: readonly number[]): RunSlot[] {
  const table = worthTable(order, grid, looks);
  const stepMs = grid.stepMinutes * 60_000;
  const slots: RunSlot[] = [];
  let cell = 0;
  for (let i = 0; i < order.length; i++) {
    const job = order[i]!;
    const row = table[i]!;
    const later = table[i + 1]!;
    const worth = row[cell]!;
    if (later[cell] === worth) continue;
    while (row[cell + 1] === worth) cell += 1;
    const length = looks.find(
      (cells) => cells <= job.room[cell]! && worth === lookWorth(job, cell, cells) + later[cell + cells]!,
    );
    if (length === undefined) continue;
    const startMs = grid.startMs + cell * stepMs;
    const { target, station } = job.wish;
    slots.push({ target, station, startMs, endMs: startMs + length * stepMs });
    cell += length;
  }
  return slots;
}
