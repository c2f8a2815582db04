import { type GivenElements } from './given';

/** What a heading or JSON key can stand for. */
export type HeadingMeaning =
  | { readonly kind: 'time'; readonly key: 'epochTtJd' | 'perihelionTtJd' }
  | { readonly kind: 'text'; readonly key: 'designation' | 'name' | 'source' | 'bodyKind' }
  | { readonly kind: 'frame'; readonly key: 'frame' }
  | {
      readonly kind: 'number';
      readonly key: Exclude<
        keyof GivenElements,
        'designation' | 'name' | 'source' | 'kind' | 'law' | 'frame' | 'epochTtJd' | 'perihelionTtJd'
      >;
      /** The brightness law that the heading belongs to, and the factor from the column to n or G. */
      readonly law?: 'comet' | 'asteroid';
      readonly factor?: number;
    };

const number = (
  key: Extract<HeadingMeaning, { kind: 'number' }>['key'],
  law?: 'comet' | 'asteroid',
  factor?: number,
): HeadingMeaning => ({
  kind: 'number',
  key,
  ...(law === undefined ? {} : { law }),
  ...(factor === undefined ? {} : { factor }),
});
const text = (key: Extract<HeadingMeaning, { kind: 'text' }>['key']): HeadingMeaning => ({
  kind: 'text',
  key,
});
const time = (key: Extract<HeadingMeaning, { kind: 'time' }>['key']): HeadingMeaning => ({
  kind: 'time',
  key,
});
const FRAME: HeadingMeaning = { kind: 'frame', key: 'frame' };

/** K1 = 2.5 n in the comet's law. */
const K1_TO_N = 0.4;

/** The trade's symbols, where capitals and small letters differ in meaning. */
const SYMBOLS = new Map<string, HeadingMeaning>([
  ['q', number('perihelionDistanceAu')],
  ['Q', number('aphelionDistanceAu')],
  ['e', number('eccentricity')],
  ['i', number('inclinationDeg')],
  ['node', number('nodeDeg')],
  ['Ω', number('nodeDeg')],
  ['peri', number('argumentOfPerihelionDeg')],
  ['w', number('argumentOfPerihelionDeg')],
  ['ω', number('argumentOfPerihelionDeg')],
  ['ϖ', number('longitudeOfPerihelionDeg')],
  ['T', time('perihelionTtJd')],
  ['epoch', time('epochTtJd')],
  ['a', number('semiMajorAxisAu')],
  ['M', number('meanAnomalyDeg')],
  ['n', number('meanMotionDegPerDay')],
  ['P', number('periodYears')],
  ['H', number('absoluteMagnitude')],
  ['G', number('slope', 'asteroid')],
  ['M1', number('absoluteMagnitude', 'comet')],
  ['K1', number('slope', 'comet', K1_TO_N)],
]);

/** English names and the names of the JSON form, small letters only, with nothing but letters and figures. */
const NAMES = new Map<string, HeadingMeaning>([
  ['designation', text('designation')],
  ['desig', text('designation')],
  ['object', text('designation')],
  ['body', text('designation')],
  ['name', text('name')],
  ['propername', text('name')],
  ['kind', text('bodyKind')],
  ['source', text('source')],
  ['reference', text('source')],
  ['frame', FRAME],
  ['referenceframe', FRAME],
  ['plane', FRAME],
  ['referenceplane', FRAME],
  ['equinox', FRAME],
  ['epochofelements', time('epochTtJd')],
  ['epoch', time('epochTtJd')],
  ['perihelion', time('perihelionTtJd')],
  ['perihelionttjd', time('perihelionTtJd')],
  ['epochttjd', time('epochTtJd')],
  ['epochtt', time('epochTtJd')],
  ['perihelionpassage', time('perihelionTtJd')],
  ['perihelionmeanlongitude', number('longitudeOfPerihelionDeg')],
  ['g', number('slope', 'asteroid')],
  ['slopeg', number('slope', 'asteroid')],
  ['slopeparameterg', number('slope', 'asteroid')],
  ['h', number('absoluteMagnitude')],
  ['totalmagnitude', number('absoluteMagnitude', 'comet')],
  ['absolutetotalmagnitude', number('absoluteMagnitude', 'comet')],
  ['cometmagnitudeslope', number('slope', 'comet', K1_TO_N)],
  ['tp', time('perihelionTtJd')],
]);

const SPELLINGS: readonly (readonly [HeadingMeaning, readonly string[]])[] = [
  [number('perihelionDistanceAu'), ['perihelion distance', 'distance at perihelion']],
  [number('aphelionDistanceAu'), ['aphelion distance', 'distance at aphelion']],
  [number('eccentricity'), ['eccentricity']],
  [number('inclinationDeg'), ['inclination', 'incl']],
  [
    number('nodeDeg'),
    [
      'node',
      'ascending node',
      'longitude of the ascending node',
      'longitude of ascending node',
      'longitude of node',
    ],
  ],
  [
    number('argumentOfPerihelionDeg'),
    [
      'peri',
      'argument of perihelion',
      'argument of the perihelion',
      'perihelion argument',
      'arg of perihelion',
    ],
  ],
  [number('longitudeOfPerihelionDeg'), ['longitude of perihelion', 'longitude of the perihelion']],
  [
    time('perihelionTtJd'),
    [
      'perihelion time',
      'time of perihelion',
      'perihelion date',
      'date of perihelion',
      'time of perihelion passage',
    ],
  ],
  [number('semiMajorAxisAu'), ['semi-major axis', 'semimajor axis', 'mean distance']],
  [number('meanAnomalyDeg'), ['mean anomaly']],
  [number('meanMotionDegPerDay'), ['mean motion', 'mean daily motion', 'daily motion']],
  [number('periodYears'), ['period', 'orbital period']],
  [number('absoluteMagnitude'), ['absolute magnitude']],
  [number('slope'), ['slope', 'slope parameter', 'magnitude slope']],
];
for (const [meaning, spellings] of SPELLINGS) {
  for (const spelling of spellings) {
    const name = bare(spelling);
    for (const unit of [
      '',
      'au',
      'deg',
      'degrees',
      'degperday',
      'degday',
      'degd',
      'years',
      'yr',
      'tt',
      'mag',
    ]) {
      if (!NAMES.has(name + unit)) NAMES.set(name + unit, meaning);
    }
  }
}

/**
 * What a heading or key means: the standard symbols (q, e, i, node, peri, T, epoch, a, M, n, P, H, G, M1, K1, Greek
 * letters too), their English names, or the names of the JSON form; a unit in brackets is passed over. Symbols of
 * one letter go by their case, and by the other case only where that could mean nothing else. Null for the rest.
 */
export function headingMeaning(heading: string): HeadingMeaning | null {
  if (heading.length > 80) return null;
  const plain = heading
    .normalize('NFC')
    .replace(/\u2126/g, 'Ω')
    .replace(/[([].*$/, '')
    .trim()
    .replace(/[.:]$/, '');
  const symbol = SYMBOLS.get(plain);
  if (symbol !== undefined) return symbol;
  const named = NAMES.get(bare(plain));
  if (named !== undefined) return named;
  const other = plain === plain.toUpperCase() ? plain.toLowerCase() : plain.toUpperCase();
  return /^(e|i|a|h|g|t|m1|k1|w)$/i.test(plain) ? (SYMBOLS.get(other) ?? null) : null;
}

function bare(words: string): string {
  return words.toLowerCase().replace(/[^a-z0-9]/g, '');
}
