import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { Piscina } from 'piscina';
import { projectRoot } from '../projectRoot';

let pool: Piscina | null = null;

/**
 * The pool of search workers, started when first needed and kept: one thread a core. Workers run compiled
 * code, so a build must stand in dist/.
 */
export function searchPool(): Piscina {
  pool ??= new Piscina({
    filename: join(projectRoot, 'dist', 'libs', 'club', 'evenings', 'searchWorker.js'),
    maxThreads: availableParallelism(),
    // An idle pool does not keep threads for a server that searches once a day.
    minThreads: 0,
    idleTimeout: 30_000,
    // Fewer and cheaper collections of short-lived numbers.
    resourceLimits: { maxYoungGenerationSizeMb: 64 },
  });
  return pool;
}

/** Stops the workers, if any run; the next search starts them anew. */
export async function closeSearchPool(): Promise<void> {
  const running = pool;
  pool = null;
  await running?.destroy();
}
