import { readFileSync } from 'node:fs';
import { cataloguePath } from './files';
import { bandStarts, visitCellsInCone } from './skyCells';
import { type StarColumns, unpackDec, unpackRa, unpackStars } from './starFile';
import { type StarLabel, type StarNames, readStarNames } from './starLabels';
import { CATALOGUE_VERSION } from './version';

/** A star as charts need it: ICRS place of epoch J2000 in radians, V magnitude. */
export interface Star {
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
  readonly label: StarLabel | null;
}

/** The star file in memory, immutable. Ask it through `starsInCone`, `countInCone` and `namedStars`. */
export interface StarCatalogue {
  readonly version: string;
  /** Number of stars. */
  readonly count: number;
  /** V magnitude of the faintest star. */
  readonly faintestMagnitude: number;
  readonly columns: StarColumns;
  readonly names: StarNames;
}

/** A round piece of sky. Right ascension may be any angle, declination -π/2 … π/2, radius 0 … π. */
export interface Cone {
  readonly raRad: number;
  readonly decRad: number;
  readonly radiusRad: number;
  /** Faintest V magnitude wanted, itself included. */
  readonly faintestMagnitude: number;
}

let loaded: StarCatalogue | null = null;

/** The star catalogue, read from stars.bin and starNames.tsv on the first call and kept. */
export const loadStars = (): StarCatalogue => {
  if (loaded) return loaded;
  const columns = unpackStars(readFileSync(cataloguePath('stars.bin')), CATALOGUE_VERSION);
  const names = readStarNames(readFileSync(cataloguePath('starNames.tsv'), 'utf8'), columns.count);
  loaded = {
    version: columns.version,
    count: columns.count,
    faintestMagnitude: columns.faintestMagnitude,
    columns,
    names,
  };
  return loaded;
};

const checkCone = ({ raRad, decRad, radiusRad, faintestMagnitude }: Cone): void => {
  if (!Number.isFinite(raRad)) throw new RangeError(`raRad is ${raRad}; it must be a finite angle.`);
  if (!(Math.abs(decRad) <= Math.PI / 2 + 1e-12)) {
    throw new RangeError(`decRad is ${decRad}; it must lie between -π/2 and π/2.`);
  }
  if (!(radiusRad >= 0 && radiusRad <= Math.PI)) {
    throw new RangeError(`radiusRad is ${radiusRad}; it must lie between 0 and π.`);
  }
  if (Number.isNaN(faintestMagnitude)) throw new RangeError('faintestMagnitude is not a number.');
};

/**
 * Calls `take` with each star of the cone, cell by cell. The separation is compared as a haversine, which
 * stays exact for the narrowest cones.
 */
const visitStars = (
  columns: StarColumns,
  cone: Cone,
  take: (index: number, raRad: number, decRad: number) => void,
): void => {
  checkCone(cone);
  const { cellStarts, raSteps, decSteps, milliMagnitudes } = columns;
  const faintest = Math.floor(cone.faintestMagnitude * 1000 + 1e-6);
  const halfRadius = Math.sin(cone.radiusRad / 2);
  const rim = halfRadius * halfRadius;
  const cosCentre = Math.cos(cone.decRad);
  visitCellsInCone(cone.raRad, cone.decRad, cone.radiusRad, (cell, band) => {
    const end = cellStarts[cell + 1]!;
    const column = cell - bandStarts[band]!;
    for (let i = cellStarts[cell]!; i < end; i++) {
      if (milliMagnitudes[i]! > faintest) break;
      const decRad = unpackDec(band, decSteps[i]!);
      const north = Math.sin((decRad - cone.decRad) / 2);
      const northSquared = north * north;
      if (northSquared > rim) continue;
      const raRad = unpackRa(band, column, raSteps[i]!);
      const east = Math.sin((raRad - cone.raRad) / 2);
      if (northSquared + Math.cos(decRad) * cosCentre * east * east <= rim) take(i, raRad, decRad);
    }
  });
};

/** The stars of a cone to its faintest magnitude, brightest first; right across 0h and at the poles. */
export const starsInCone = (stars: StarCatalogue, cone: Cone): Star[] => {
  const found: Star[] = [];
  const { milliMagnitudes } = stars.columns;
  visitStars(stars.columns, cone, (index, raRad, decRad) => {
    found.push({
      raRad,
      decRad,
      magnitude: milliMagnitudes[index]! / 1000,
      label: stars.names.labelOf(index),
    });
  });
  return found.sort((a, b) => a.magnitude - b.magnitude);
};

/** How many stars `starsInCone` would give, without making them. */
export const countInCone = (stars: StarCatalogue, cone: Cone): number => {
  let count = 0;
  visitStars(stars.columns, cone, () => {
    count++;
  });
  return count;
};

const readNamed = ({ columns, names }: StarCatalogue): Star[] => {
  const { cellStarts, raSteps, decSteps, milliMagnitudes } = columns;
  const named: Star[] = [];
  let cell = 0;
  let band = 0;
  for (const index of names.indices) {
    while (cellStarts[cell + 1]! <= index) cell++;
    while (bandStarts[band + 1]! <= cell) band++;
    named.push({
      raRad: unpackRa(band, cell - bandStarts[band]!, raSteps[index]!),
      decRad: unpackDec(band, decSteps[index]!),
      magnitude: milliMagnitudes[index]! / 1000,
      label: names.labelOf(index),
    });
  }
  return named.sort((a, b) => a.magnitude - b.magnitude);
};

const namedOf = new WeakMap<StarCatalogue, readonly Star[]>();

/** Every star that has a label (a name, letter or number), brightest first. Made once and kept. */
export const namedStars = (stars: StarCatalogue): readonly Star[] => {
  let named = namedOf.get(stars);
  if (!named) {
    named = readNamed(stars);
    namedOf.set(stars, named);
  }
  return named;
};
