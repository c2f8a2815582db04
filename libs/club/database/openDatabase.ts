import { mkdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, resolve } from 'node:path';
import type * as Watching from './changeWatch';
import type * as Connecting from './connect';
import { type ChangeWatch } from './changeWatch';
import { type PrismaClient } from './generated/client';
import type * as Migrating from './migrate';

/** An open database and the clock that stamps what is written to it. */
export interface Database {
  readonly client: PrismaClient;
  /** The present moment; a fixed one makes tests and demo data repeat. */
  readonly now: () => Date;
  readonly file: string;
  /** Tells whether anything was written, by this or another program. */
  readonly changes: ChangeWatch;
}

/** Where the database is, and optionally whose clock stamps its rows (default: the machine's). */
export interface DatabasePlace {
  readonly file: string;
  readonly now?: () => Date;
}

/**
 * Opens the database of a file, makes the folder and the file where they are missing, and brings its tables
 * up to date. Close it with `closeDatabase`. Rejects where a newer program wrote the file.
 *
 * The database driver is loaded here and not before: importing this library stays cheap for commands that
 * need no database.
 */
export async function openDatabase({ file, now = () => new Date() }: DatabasePlace): Promise<Database> {
  const path = resolve(file);
  mkdirSync(dirname(path), { recursive: true });
  const later = createRequire(__filename);
  const { bringUpToDate } = later('./migrate') as typeof Migrating;
  const { connect } = later('./connect') as typeof Connecting;
  const { watchChanges } = later('./changeWatch') as typeof Watching;
  await bringUpToDate(path);
  return { client: await connect(path), now, file: path, changes: watchChanges(path) };
}

/** Writes what is pending and lets go of the file. */
export async function closeDatabase(database: Database): Promise<void> {
  database.changes.close();
  await database.client.$disconnect();
}
