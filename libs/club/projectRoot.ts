import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The project's root, found from this file's place in the sources as well as in dist. */
export const projectRoot: string = rootAbove(__dirname);

function rootAbove(folder: string): string {
  if (existsSync(join(folder, 'package.json'))) return folder;
  const above = dirname(folder);
  if (above === folder) throw new Error(`No package.json stands above ${__dirname}.`);
  return rootAbove(above);
}
