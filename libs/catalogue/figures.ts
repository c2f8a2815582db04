import { readFileSync } from 'node:fs';
import { type ConstellationFigure, readFigures } from './figureFile';
import { cataloguePath } from './files';

let read: readonly ConstellationFigure[] | null = null;

/** The figures of all 88 constellations; read from figures.tsv on the first call and kept. Needs no star file. */
export const constellationFigures = (): readonly ConstellationFigure[] => {
  read ??= readFigures(readFileSync(cataloguePath('figures.tsv'), 'utf8'));
  return read;
};
