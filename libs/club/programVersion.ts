import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { projectRoot } from './projectRoot';

/** The program's version, as sheets print it. */
export function programVersion(): string {
  const { version } = JSON.parse(readFileSync(join(projectRoot, 'package.json'), 'utf8')) as {
    readonly version: string;
  };
  return version;
}

/** Where the database stands unless another is named. */
export function usualDatabaseFile(): string {
  return process.env['DUSKWRIGHT_DB'] ?? join(projectRoot, '.duskwright', 'duskwright.db');
}
