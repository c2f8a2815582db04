import { createWorkbench } from './measure';
import { type ScoreWeights } from './programme';
import { figureEvening } from './judge';
import { type Season } from './season';
import { type NightSite } from './site';
import { prepareSite } from './siteInstant';

/** A stretch of evenings at one site: the unit of work that a search hands to a worker. */
export interface SearchBlock {
  readonly site: NightSite;
  readonly dates: readonly string[];
}

/** What a search keeps of one evening: enough to rank it and to draw a season sheet. */
export interface EveningRow {
  readonly site: string;
  readonly date: string;
  readonly score: number;
  readonly shown: number;
  readonly darkMinutes: number;
  /** Null where the evening has no public hours. */
  readonly startMs: number | null;
  readonly endMs: number | null;
}

export interface BlockResult {
  readonly rows: readonly EveningRow[];
  /** Places and instants that were evaluated. */
  readonly steps: number;
}

/** Measures every evening of a block. */
export function searchBlock(season: Season, block: SearchBlock, weights: ScoreWeights): BlockResult {
  const bench = createWorkbench();
  const site = prepareSite(block.site);
  const rows = block.dates.map((date): EveningRow => {
    const { answer, light, score, shown } = figureEvening(bench, season, site, weights, date, false);
    return {
      site: site.site.name,
      date,
      score,
      shown,
      darkMinutes: light.darkMinutes,
      startMs: answer.hours?.startMs ?? null,
      endMs: answer.hours?.endMs ?? null,
    };
  });
  return { rows, steps: bench.steps };
}

/** Best first: by score, then the earlier date, then the site's name. */
export function bestFirst(a: EveningRow, b: EveningRow): number {
  return b.score - a.score || compare(a.date, b.date) || compare(a.site, b.site);
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
