import { setMaxListeners } from 'node:events';
import {
  bestFirst,
  type BlockResult,
  type ClubDate,
  datesBetween,
  type EveningRow,
  habitCost,
  type HabitCost,
  habitDates,
  habitWords,
  type JudgedEvening,
  type NightSite,
  type Programme,
  type ScoreWeights,
  type SearchBlock,
  type Season,
  type SeasonItems,
  type SeasonSky,
  whyClosed,
} from '#nights';
import { type BlockTask, type ItemsTask, type SkyTask } from './searchWorker';
import { withSharedArrays } from './sharedArrays';
import { searchPool } from './workerPool';

/** A season to search: what is promised, where, and on which dates. */
export interface SeasonSearch {
  readonly sites: readonly NightSite[];
  readonly programme: Programme;
  readonly clubDates: readonly ClubDate[];
  /** 'YYYY-MM-DD', both included. */
  readonly from: string;
  readonly to: string;
  readonly weights: ScoreWeights;
  /** How many evenings to return in full. */
  readonly limit: number;
}

export interface SearchWatch {
  /** Called as evenings are done, of all that are open. */
  readonly onProgress?: (done: number, total: number) => void;
  /** Aborting it rejects the search with an AbortError and frees the workers. */
  readonly signal?: AbortSignal;
}

export interface ClosedEvening {
  readonly site: string;
  readonly date: string;
  readonly why: string;
}

export interface Ranking {
  readonly searched: {
    readonly sites: number;
    readonly evenings: number;
    readonly targets: number;
    /** Places worked out: one target at one site and instant each. */
    readonly steps: number;
    readonly milliseconds: number;
  };
  /** Best first, in full. */
  readonly evenings: readonly JudgedEvening[];
  /** Every open evening's figures, best first. */
  readonly rows: readonly EveningRow[];
  readonly closed: readonly ClosedEvening[];
  readonly habit: HabitCost | null;
}

/** Evenings in one unit of work: long enough to be worth sending, short enough to show progress. */
const BLOCK_EVENINGS = 46;
/** Items whose tracks are computed in one go: what they share (planets' table, limits) is worth some. */
const ITEMS_AT_ONCE = 10;

/** Ranks every open evening of a season over all its sites, in the worker pool. */
export async function searchSeason(search: SeasonSearch, watch: SearchWatch = {}): Promise<Ranking> {
  const started = performance.now();
  watch.signal?.throwIfAborted();
  const pool = searchPool();
  const signal = watch.signal && AbortSignal.any([watch.signal]);
  // Every block waits on it; Node would warn of a leak after ten.
  if (signal) setMaxListeners(0, signal);
  const inWorker = <Result>(name: string, task: unknown): Promise<Result> =>
    pool.run(task, { name, ...(signal && { signal }) }) as Promise<Result>;
  const dates = datesBetween(search.from, search.to);
  const closed: ClosedEvening[] = [];
  const blocks = search.sites.flatMap((site): SearchBlock[] => {
    const open = dates.filter((date) => {
      const why = whyClosed(site, search.programme, search.clubDates, date);
      if (why !== null) closed.push({ site: site.name, date, why });
      return why === null;
    });
    return chunks(open, BLOCK_EVENINGS).map((part) => ({ site, dates: part }));
  });
  const total = blocks.reduce((sum, block) => sum + block.dates.length, 0);
  const { weights } = search;
  const season = await preparedSeason(search, inWorker);

  let done = 0;
  watch.onProgress?.(done, total);
  const results = await Promise.all(
    blocks.map(async (block) => {
      const task: BlockTask = { season, block, weights };
      const result = await inWorker<BlockResult>('measureBlock', task);
      done += block.dates.length;
      watch.onProgress?.(done, total);
      return result;
    }),
  );
  const rows = results.flatMap((result) => result.rows).sort(bestFirst);
  const evenings = await judgedInFull(search, rows.slice(0, search.limit), (block) =>
    inWorker<JudgedEvening[]>('judgeBlock', { season, block, weights } satisfies BlockTask),
  );
  const { habit } = search.programme;
  return {
    searched: {
      sites: search.sites.length,
      evenings: total,
      targets: search.programme.items.length,
      steps: results.reduce((sum, { steps }) => sum + steps, 0),
      milliseconds: Math.round(performance.now() - started),
    },
    evenings,
    rows,
    closed,
    habit: habit === null ? null : habitCost(habitWords(habit), rows, habitDates(habit, dates)),
  };
}

type InWorker = <Result>(name: string, task: unknown) => Promise<Result>;

/** The season's tracks, shared out among the workers. */
async function preparedSeason({ programme, from, to }: SeasonSearch, inWorker: InWorker): Promise<Season> {
  const sky = await inWorker<SeasonSky>('skyOfSeason', { from, to } satisfies SkyTask);
  const parts = await Promise.all(
    chunks(programme.items, ITEMS_AT_ONCE).map((items) =>
      inWorker<SeasonItems>('itemsOfSeason', { sky, items } satisfies ItemsTask),
    ),
  );
  return withSharedArrays({
    programme,
    ...sky,
    tracks: parts.flatMap(({ tracks }) => tracks),
    limits: parts.flatMap(({ limits }) => limits),
  });
}

/** The rows' evenings in full, in the order of the rows. */
async function judgedInFull(
  { sites }: SeasonSearch,
  rows: readonly EveningRow[],
  judge: (block: SearchBlock) => Promise<readonly JudgedEvening[]>,
): Promise<readonly JudgedEvening[]> {
  const blocks = sites.flatMap((site): SearchBlock[] => {
    const dates = rows.filter((row) => row.site === site.name).map(({ date }) => date);
    return chunks(dates, BLOCK_EVENINGS).map((part) => ({ site, dates: part }));
  });
  const judged = new Map<string, JudgedEvening>();
  for (const evening of (await Promise.all(blocks.map(judge))).flat()) {
    judged.set(`${evening.date} ${evening.site}`, evening);
  }
  return rows.map(({ date, site }) => judged.get(`${date} ${site}`)!);
}

function chunks<T>(all: readonly T[], size: number): T[][] {
  const parts: T[][] = [];
  for (let i = 0; i < all.length; i += size) parts.push(all.slice(i, i + size));
  return parts;
}
