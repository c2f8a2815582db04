import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The folder that holds package.json, so that data files are found from the source and from dist alike. */
const projectRoot = (from: string): string => {
  let folder = from;
  while (!existsSync(join(folder, 'package.json'))) {
    const parent = dirname(folder);
    if (parent === folder) throw new Error(`No package.json in any folder above ${from}.`);
    folder = parent;
  }
  return folder;
};

/** Full path of a data file that lies in libs/catalogue. */
export const cataloguePath = (name: string): string => join(projectRoot(__dirname), 'libs/catalogue', name);
