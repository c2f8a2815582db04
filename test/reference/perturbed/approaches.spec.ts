import {
  eclipticToEquatorial,
  heliocentricState,
  motionPlace,
  perturbedMotion,
  subtract,
  type Vector,
} from '#sky';
import { arcsecBetween, elementsOf, type ElementRow, expected } from './fixtures';

type PlaceRow = readonly [body: string, days: number, ...bodyAndEarth: number[]];

const { elements, places } = expected<{ elements: ElementRow[]; places: PlaceRow[] }>('approaches.json');

const cases = elements.map((row) => {
  const rows = places.filter(([body]) => body === row[0]);
  return { name: row[0], epoch: row[1]!, orbit: elementsOf(row), rows };
});

/** Body and Earth as seen from the Sun. */
const vectorsOf = ([, , x, y, z, ex, ey, ez]: PlaceRow): readonly [body: Vector, earth: Vector] => [
  [x!, y!, z!],
  [ex!, ey!, ez!],
];

/** Arcsec seen from the Earth; 1 is promised. */
const WITHIN = 0.2;
/** The planetary places of libs/sky hold Saturn to 1e-6 au, a twenty-thousandth of this distance. */
const WITHIN_AT_SATURN = 1;

// Expected: SciPy's DOP853 with planets from the Swiss Ephemeris files; see README.md.
describe('motion past a planet, the Moon or the Sun', () => {
  it('is checked for fifteen bodies from 200 days before their epochs to 500 after', () => {
    expect(cases).toHaveLength(15);
    for (const { rows } of cases) expect(rows.length).toBeGreaterThanOrEqual(7);
  });

  test.each(cases)('agrees from the Earth for what $name', ({ name, epoch, orbit, rows }) => {
    const motion = perturbedMotion(orbit, epoch - 200, epoch + 500);
    for (const row of rows) {
      const [body, earth] = vectorsOf(row);
      const found = motionPlace(motion, epoch + row[1]);
      expect(arcsecBetween(subtract(found, earth), subtract(body, earth))).toBeLessThan(
        name.includes('Saturn') ? WITHIN_AT_SATURN : WITHIN,
      );
    }
  });

  it('is no conic: those that pass close end arcminutes from theirs', () => {
    for (const { epoch, orbit, rows } of cases.filter(({ name }) => name.startsWith('passes'))) {
      const last = rows.find(([, days]) => days === 500)!;
      const [body, earth] = vectorsOf(last);
      const conic = eclipticToEquatorial(heliocentricState(orbit, epoch + 500).position);
      expect(arcsecBetween(subtract(conic, earth), subtract(body, earth))).toBeGreaterThan(60);
    }
  });
});
