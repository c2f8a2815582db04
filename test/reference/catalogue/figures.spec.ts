import { Constellation } from 'astronomy-engine';
import { type FigurePoint, constellationFigures, loadStars, starsInCone } from '#catalogue';

const DEGREE = Math.PI / 180;

const angle = (a: FigurePoint, b: FigurePoint): number => {
  const north = Math.sin((a.decRad - b.decRad) / 2);
  const east = Math.sin((a.raRad - b.raRad) / 2);
  return (
    (2 * Math.asin(Math.sqrt(north ** 2 + Math.cos(a.decRad) * Math.cos(b.decRad) * east ** 2))) / DEGREE
  );
};

/** True where a place of the constellation lies within `degrees` of the point (tried on a ring of 16). */
const isNear = ({ raRad, decRad }: FigurePoint, abbreviation: string, degrees: number): boolean => {
  const symbolAt = (ra: number, dec: number): string =>
    Constellation((((ra / DEGREE / 15) % 24) + 24) % 24, Math.max(-90, Math.min(90, dec / DEGREE))).symbol;
  if (symbolAt(raRad, decRad) === abbreviation) return true;
  return Array.from({ length: 16 }, (_, i) => (i * Math.PI) / 8).some(
    (turn) =>
      symbolAt(
        raRad + (degrees * DEGREE * Math.sin(turn)) / Math.cos(decRad),
        decRad + degrees * DEGREE * Math.cos(turn),
      ) === abbreviation,
  );
};

const figures = constellationFigures();

describe('constellation figures', () => {
  it('are 88, one for each of the constellations that astronomy-engine knows, with its Latin name', () => {
    expect(new Set(figures.map(({ abbreviation }) => abbreviation)).size).toBe(88);
    const known = new Map<string, string>();
    for (let ra = 0; ra < 24; ra += 0.1) {
      for (let dec = -90; dec <= 90; dec++) {
        const { symbol, name } = Constellation(ra, dec);
        known.set(symbol, name);
      }
    }
    // astronomy-engine 2.1.19 misspells three names and leaves the diaeresis out of one.
    known
      .set('Ant', 'Antlia')
      .set('Cam', 'Camelopardalis')
      .set('PsA', 'Piscis Austrinus')
      .set('Boo', 'Boötes');
    expect(new Map(figures.map(({ abbreviation, name }) => [abbreviation, name]))).toEqual(
      new Map([...known].sort()),
    );
  });

  it('run from star to star, each of V 6.5 or brighter', () => {
    const stars = loadStars();
    const points = new Set(figures.flatMap(({ lines }) => lines.flat()));
    for (const { raRad, decRad } of points) {
      const cone = { raRad, decRad, radiusRad: 1e-4 * DEGREE + 1e-6, faintestMagnitude: 6.5 };
      expect(starsInCone(stars, cone)[0]?.label?.hr).toEqual(expect.any(Number));
    }
    expect(points.size).toBeGreaterThan(700);
  });

  it('have lines of 0.03 to 35 degrees', () => {
    for (const { abbreviation, lines } of figures) {
      expect([abbreviation, lines.length > 0]).toEqual([abbreviation, true]);
      for (const line of lines) {
        expect([abbreviation, line.length >= 2]).toEqual([abbreviation, true]);
        line.slice(1).forEach((point, i) => {
          const length = angle(line[i]!, point);
          expect([abbreviation, length > 0.03 && length < 35]).toEqual([abbreviation, true]);
        });
      }
    }
  });

  it('begin and end every line in their constellation or within 3 degrees of it, and are named inside it', () => {
    for (const { abbreviation, lines, labelRaRad, labelDecRad } of figures) {
      for (const line of lines) {
        for (const end of [line[0]!, line.at(-1)!]) {
          expect([abbreviation, isNear(end, abbreviation, 3)]).toEqual([abbreviation, true]);
        }
      }
      const label = { raRad: labelRaRad, decRad: labelDecRad };
      expect([abbreviation, isNear(label, abbreviation, 3)]).toEqual([abbreviation, true]);
    }
  });

  it('lend a star to a neighbour only in the Charioteer and the Winged Horse', () => {
    const lent = figures.filter(({ abbreviation, lines }) =>
      lines
        .flat()
        .some(
          ({ raRad, decRad }) => Constellation(raRad / DEGREE / 15, decRad / DEGREE).symbol !== abbreviation,
        ),
    );
    expect(lent.map(({ abbreviation }) => abbreviation)).toEqual(['Aur', 'Peg']);
  });
});
