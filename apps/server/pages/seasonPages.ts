import {
  type Database,
  listClubDates,
  listInstruments,
  listProgrammes,
  listSites,
  listTargets,
  rankEvenings,
  type Ranking,
} from '#club';
import { createHash } from 'node:crypto';

/** What the front page asks for. */
export interface PageSearch {
  readonly from: string;
  readonly to: string;
  readonly programmeName: string;
  readonly limit: number;
}

/** Rankings kept; each is a few hundred kilobytes at most. */
const MOST_KEPT = 8;
/** Searches at once, whoever asks: a page can be asked for by anybody, with any dates. */
const MOST_RUNNING = 2;

/** The front page's searches, kept by everything they were worked out from. */
export class SeasonPages {
  private readonly kept = new Map<string, Promise<Ranking>>();
  private running = 0;

  constructor(private readonly database: Database) {}

  /** The ranking, or null while it is still being worked out after `patienceMs`, or has to wait its turn. */
  async find(search: PageSearch, patienceMs: number): Promise<Ranking | null> {
    const key = await this.keyOf(search);
    let ranking = this.kept.get(key);
    if (ranking === undefined) {
      if (this.running >= MOST_RUNNING) return null;
      ranking = this.run(search);
      this.kept.set(key, ranking);
      // A search that failed is tried anew, not remembered.
      ranking.catch(() => this.kept.delete(key));
      for (const old of this.kept.keys()) if (this.kept.size > MOST_KEPT) this.kept.delete(old);
    }
    return within(ranking, patienceMs);
  }

  private async run(search: PageSearch): Promise<Ranking> {
    this.running += 1;
    try {
      return await rankEvenings(this.database, search);
    } finally {
      this.running -= 1;
    }
  }

  private async keyOf(search: PageSearch): Promise<string> {
    const inputs = await Promise.all([
      listSites(this.database),
      listTargets(this.database),
      listInstruments(this.database),
      listProgrammes(this.database),
      listClubDates(this.database),
    ]);
    return createHash('sha256')
      .update(JSON.stringify([search, inputs]))
      .digest('hex');
  }
}

async function within<T>(promise: Promise<T>, patienceMs: number): Promise<T | null> {
  let timer: NodeJS.Timeout | undefined;
  const patience = new Promise<null>((resolve) => {
    timer = setTimeout(resolve, patienceMs, null);
  });
  try {
    return await Promise.race([promise, patience]);
  } finally {
    clearTimeout(timer);
  }
}
