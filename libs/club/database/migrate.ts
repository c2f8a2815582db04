import BetterSqlite3 from 'better-sqlite3';
import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { Worker } from 'node:worker_threads';
import { projectRoot } from '../projectRoot';

const migrationsFolder = join(projectRoot, 'prisma', 'migrations');
const schemaFile = join(projectRoot, 'prisma', 'schema.prisma');
const workerFile = join(projectRoot, 'libs', 'club', 'database', 'migrationWorker.mjs');

/**
 * Applies the migrations that the file lacks and sets it to write-ahead logging. The engine is started only
 * when there is something to apply. Rejects where the file holds migrations this program does not know.
 */
export async function bringUpToDate(file: string): Promise<void> {
  const applied = new Set(appliedMigrations(file));
  const known = readdirSync(migrationsFolder, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name);
  const unknown = [...applied].filter((name) => !known.includes(name));
  if (unknown.length > 0) {
    throw new Error(
      `The database ${file} was written by a newer version of this program (it knows "${unknown.join('", "')}"). ` +
        'Start that version, or give another file; nothing was changed.',
    );
  }
  if (known.some((name) => !applied.has(name))) await applyInWorker(file);
}

function appliedMigrations(file: string): string[] {
  const database = new BetterSqlite3(file);
  try {
    database.pragma('journal_mode = WAL');
    const table = database.prepare("SELECT 1 FROM sqlite_master WHERE name = '_prisma_migrations'").get();
    if (table === undefined) return [];
    return database
      .prepare(
        'SELECT migration_name FROM _prisma_migrations WHERE finished_at IS NOT NULL AND rolled_back_at IS NULL',
      )
      .pluck()
      .all() as string[];
  } finally {
    database.close();
  }
}

function applyInWorker(file: string): Promise<void> {
  const schema = readFileSync(schemaFile, 'utf8');
  const worker = new Worker(workerFile, { workerData: { file, migrationsFolder, schema } });
  return new Promise((done, failed) => {
    worker.once('message', () => {
      worker.once('exit', () => {
        done();
      });
    });
    worker.once('error', failed);
  });
}
