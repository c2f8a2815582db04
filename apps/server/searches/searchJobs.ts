import { type Database, type NightsJson, rankEvenings, type SeasonInput, toNightsJson } from '#club';
import { HttpException } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { problemOf, type ProblemBody } from '../problems/problemBody';

export type SearchState = 'running' | 'done' | 'cancelled' | 'failed';

/** A search as it is told. */
export interface SearchView {
  readonly id: string;
  readonly state: SearchState;
  /** Evenings judged, of all that are open; 0 of 0 until the season is prepared. */
  readonly progress: { readonly done: number; readonly total: number };
  readonly request: SeasonInput;
  readonly result: NightsJson | null;
  readonly problem: ProblemBody | null;
}

interface SearchJob extends SearchView {
  state: SearchState;
  progress: { done: number; total: number };
  result: NightsJson | null;
  problem: ProblemBody | null;
  readonly stop: AbortController;
}

/** Running at once, over all users: each uses every core. */
const MOST_RUNNING = 3;
/** Kept in all; the oldest finished one goes first. */
const MOST_KEPT = 20;

/** Searches that run in the worker pool while their asker looks in from time to time. Lost on a restart. */
export class SearchJobs {
  private readonly jobs = new Map<string, SearchJob>();

  constructor(private readonly database: Database) {}

  /** Starts a search; throws with status 429 where too many run already. */
  start(request: SeasonInput): SearchView {
    const running = [...this.jobs.values()].filter(({ state }) => state === 'running');
    if (running.length >= MOST_RUNNING) {
      throw new HttpException(
        `${String(MOST_RUNNING)} searches run already; wait for one or cancel it.`,
        429,
      );
    }
    const job: SearchJob = {
      id: randomUUID(),
      state: 'running',
      progress: { done: 0, total: 0 },
      request,
      result: null,
      problem: null,
      stop: new AbortController(),
    };
    this.jobs.set(job.id, job);
    this.forgetOldest();
    void this.run(job);
    return view(job);
  }

  /** A search by its id, or null. */
  find(id: string): SearchView | null {
    const job = this.jobs.get(id);
    return job === undefined ? null : view(job);
  }

  /** Stops a search where it runs and forgets it; false where there is none. */
  cancel(id: string): boolean {
    const job = this.jobs.get(id);
    if (job === undefined) return false;
    job.stop.abort();
    this.jobs.delete(id);
    return true;
  }

  /** Stops everything that runs. */
  stopAll(): void {
    for (const job of this.jobs.values()) job.stop.abort();
  }

  private async run(job: SearchJob): Promise<void> {
    try {
      const ranking = await rankEvenings(this.database, job.request, {
        onProgress: (done, total) => {
          job.progress = { done, total };
        },
        signal: job.stop.signal,
      });
      job.result = toNightsJson(ranking);
      job.state = 'done';
    } catch (error) {
      job.state = job.stop.signal.aborted ? 'cancelled' : 'failed';
      job.problem = job.state === 'failed' ? problemOf(error) : null;
    }
  }

  private forgetOldest(): void {
    for (const job of this.jobs.values()) {
      if (this.jobs.size <= MOST_KEPT) return;
      if (job.state !== 'running') this.jobs.delete(job.id);
    }
  }
}

function view({ id, state, progress, request, result, problem }: SearchJob): SearchView {
  return { id, state, progress, request, result, problem };
}
