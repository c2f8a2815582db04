import {
  type BlockResult,
  createWorkbench,
  type JudgedEvening,
  judgeEvening,
  prepareSeason,
  prepareSite,
  type Programme,
  type ScoreWeights,
  type SearchBlock,
  searchBlock,
  type Season,
} from '#nights';

export interface PrepareTask {
  readonly programme: Programme;
  readonly from: string;
  readonly to: string;
}

export interface BlockTask {
  readonly season: Season;
  readonly block: SearchBlock;
  readonly weights: ScoreWeights;
}

/** Runs in a worker thread: the tracks of a season. */
export function prepare({ programme, from, to }: PrepareTask): Season {
  return prepareSeason(programme, from, to);
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
