import { readFileSync } from 'node:fs';
import { cataloguePath } from './files';
import { foldName } from './foldName';

export type DeepSkyKind =
  | 'galaxy'
  | 'openCluster'
  | 'globularCluster'
  | 'planetaryNebula'
  | 'diffuseNebula'
  | 'supernovaRemnant'
  | 'clusterWithNebula'
  | 'doubleStar'
  | 'asterism'
  | 'starCloud';

const KINDS: ReadonlySet<string> = new Set<DeepSkyKind>([
  'galaxy',
  'openCluster',
  'globularCluster',
  'planetaryNebula',
  'diffuseNebula',
  'supernovaRemnant',
  'clusterWithNebula',
  'doubleStar',
  'asterism',
  'starCloud',
]);

/** The two stars of a double; the angle is that of the fainter from the brighter, from north through east. */
export interface DoubleStar {
  readonly magnitudes: readonly [number, number];
  readonly separationArcsec: number;
  readonly positionAngleDeg: number;
  /** What visitors see, 'gold and blue'. */
  readonly colours: string;
}

/** Something beyond the solar system worth showing. Places are J2000. */
export interface DeepSkyObject {
  /** 'M 31', 'NGC 869', 'Albireo'. */
  readonly id: string;
  /** 'Andromeda Galaxy', 'NGC 224'. */
  readonly otherNames: readonly string[];
  readonly kind: DeepSkyKind;
  readonly raDeg: number;
  readonly decDeg: number;
  /** Integrated V magnitude. */
  readonly magnitude: number;
  readonly majorArcmin: number;
  readonly minorArcmin: number;
  /** Of the longer axis, from north through east; null where the object is round or the angle unknown. */
  readonly positionAngleDeg: number | null;
  /** Light years; null where its stars lie at different distances or none is agreed. */
  readonly distanceLy: number | null;
  /** IAU abbreviation. */
  readonly constellation: string;
  readonly double?: DoubleStar;
  /** One plain sentence for visitors. */
  readonly gloss: string;
}

const COLUMNS =
  'id otherNames kind constellation raDeg decDeg magnitude major minor positionAngle distanceLy ' +
  'magnitudeA magnitudeB separation pairAngle colours gloss';

export class DeepSkyListError extends Error {
  override readonly name = 'DeepSkyListError';
}

const readObject = (line: string, at: number): DeepSkyObject => {
  const cells = line.split('\t');
  if (cells.length !== 17) {
    throw new DeepSkyListError(`Deep-sky list, line ${at}: ${cells.length} columns, expected 17.`);
  }
  const text = (column: number): string => cells[column]!;
  const number = (column: number): number => {
    const value = Number(text(column));
    if (text(column) === '' || !Number.isFinite(value)) {
      throw new DeepSkyListError(
        `Deep-sky list, line ${at}: "${text(column)}" in column ${column + 1} is no number.`,
      );
    }
    return value;
  };
  const numberOrNull = (column: number): number | null => (text(column) === '' ? null : number(column));
  const kind = text(2);
  if (!KINDS.has(kind)) throw new DeepSkyListError(`Deep-sky list, line ${at}: unknown kind "${kind}".`);
  return {
    id: text(0),
    otherNames: text(1) === '' ? [] : text(1).split(';'),
    kind: kind as DeepSkyKind,
    raDeg: number(4),
    decDeg: number(5),
    magnitude: number(6),
    majorArcmin: number(7),
    minorArcmin: number(8),
    positionAngleDeg: numberOrNull(9),
    distanceLy: numberOrNull(10),
    constellation: text(3),
    ...(text(15) !== '' && {
      double: {
        magnitudes: [number(11), number(12)],
        separationArcsec: number(13),
        positionAngleDeg: number(14),
        colours: text(15),
      },
    }),
    gloss: text(16),
  };
};

/** Reads a deep-sky list; throws a DeepSkyListError which names the line. */
export const readDeepSkyList = (content: string): DeepSkyObject[] => {
  const lines = content
    .split('\n')
    .map((line, i) => ({ line, at: i + 1 }))
    .filter(({ line }) => line !== '' && !line.startsWith('#'));
  const head = lines.shift();
  if (head?.line !== COLUMNS.replaceAll(' ', '\t')) {
    throw new DeepSkyListError(`Deep-sky list: expected the columns ${COLUMNS}, tab-separated.`);
  }
  return lines.map(({ line, at }) => readObject(line, at));
};

let list: readonly DeepSkyObject[] | null = null;
let byName: ReadonlyMap<string, DeepSkyObject> | null = null;

/** The deep-sky list: the Messier objects in order, then showpieces and doubles. Needs no star file. */
export const deepSkyObjects = (): readonly DeepSkyObject[] => {
  list ??= readDeepSkyList(readFileSync(cataloguePath('deepSky.tsv'), 'utf8'));
  return list;
};

/**
 * The object of a name or number, or null. Capitals, spaces, accents and punctuation do not matter, 'Messier' may
 * be written for M and a Greek letter spelt out. A name of several objects gives the first of the list.
 */
export const findDeepSky = (name: string): DeepSkyObject | null => {
  if (!byName) {
    const names = new Map<string, DeepSkyObject>();
    const objects = deepSkyObjects();
    for (const object of objects) names.set(foldName(object.id), object);
    for (const object of objects) {
      for (const other of object.otherNames) {
        if (!names.has(foldName(other))) names.set(foldName(other), object);
      }
    }
    byName = names;
  }
  return byName.get(foldName(name)) ?? null;
};
