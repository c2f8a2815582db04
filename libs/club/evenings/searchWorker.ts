import {
  type BlockResult,
  createWorkbench,
  type JudgedEvening,
  judgeEvening,
  prepareItems,
  prepareSite,
  prepareSky,
  type ProgrammeItem,
  type ScoreWeights,
  type SearchBlock,
  searchBlock,
  type Season,
  type SeasonItems,
  type SeasonSky,
} from '#nights';

export interface SkyTask {
  readonly from: string;
  readonly to: string;
}

export interface ItemsTask {
  readonly sky: SeasonSky;
  readonly items: readonly ProgrammeItem[];
}

export interface BlockTask {
  readonly season: Season;
  readonly block: SearchBlock;
  readonly weights: ScoreWeights;
}

/** Runs in a worker thread: what a season has without its programme. */
export function skyOfSeason({ from, to }: SkyTask): SeasonSky {
  return prepareSky(from, to);
}

/** Runs in a worker thread: tracks and limits of some items of a programme. */
export function itemsOfSeason({ sky, items }: ItemsTask): SeasonItems {
  return prepareItems(sky, items);
}

/** Runs in a worker thread: one stretch of evenings at one site. */
export function measureBlock({ season, block, weights }: BlockTask): BlockResult {
  return searchBlock(season, block, weights);
}

/** Runs in a worker thread: the evenings of a block in full, in its order. */
export function judgeBlock({ season, block, weights }: BlockTask): JudgedEvening[] {
  const bench = createWorkbench();
  const site = prepareSite(block.site);
  return block.dates.map((date) => judgeEvening(bench, season, site, weights, date));
}
