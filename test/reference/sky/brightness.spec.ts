import { place, type Place, PLANETS, type SolarBody, toDeg } from '#sky';
import { expected, solarTarget } from './expected';

type Row = readonly [SolarBody, utc: string, phase: number, elongation: number, magnitude: number | null];

const { rows } = expected<{ rows: Row[] }>('brightness.json');

/** Degrees; the reference counts aberration into the angle at both ends, 41 arcsec at most. */
const PHASE_DEG = 0.02;
const ELONGATION_DEG = 20 / 3600;
/**
 * The reference leaves the tilt of Uranus out (a constant 0.05 mag for it) and keeps its phase terms of at
 * most 0.02 mag, which the published law drops at the phase angles seen from the Earth.
 */
const MAGNITUDE = (body: SolarBody) => (body === 'Uranus' ? 0.06 : 0.01);

// Expected: the Swiss Ephemeris library's function for phenomena; see README.md.
describe('look of the planets and the Moon from the centre of the Earth', () => {
  it('is checked at 80 dates', () => {
    expect(rows).toHaveLength(640);
  });

  const worst = (body: SolarBody, miss: (found: Place, row: Row) => number) =>
    Math.max(
      ...rows
        .filter(([name]) => name === body)
        .map((row) => miss(place(solarTarget(body), Date.parse(row[1]), null), row)),
    );

  test.each(['Moon', ...PLANETS] as const)('agrees in phase and elongation for %s', (body) => {
    expect(worst(body, (found, row) => Math.abs(toDeg(found.phaseAngleRad!) - row[2]))).toBeLessThan(
      PHASE_DEG,
    );
    expect(worst(body, (found, row) => Math.abs(toDeg(found.elongationRad) - row[3]))).toBeLessThan(
      ELONGATION_DEG,
    );
  });

  test.each(PLANETS)('agrees in magnitude for %s', (body) => {
    expect(worst(body, (found, row) => Math.abs(found.magnitude! - row[4]!))).toBeLessThan(MAGNITUDE(body));
  });
});
