import { FigureFileError, readFigures, writeFigures } from './figureFile';
import { constellationFigures } from './figures';

describe('constellation figures', () => {
  it('are 88, read once', () => {
    expect(constellationFigures()).toHaveLength(88);
    expect(constellationFigures()).toBe(constellationFigures());
  });

  it('come back as they were written', () => {
    const text = writeFigures(constellationFigures(), ['A test.']);
    const back = readFigures(text);
    expect(writeFigures(back, ['A test.'])).toBe(text);
    expect(back).toEqual(constellationFigures());
  });

  it('draw the belt of Orion', () => {
    const orion = constellationFigures().find(({ abbreviation }) => abbreviation === 'Ori')!;
    expect(orion.name).toBe('Orion');
    const belt = orion.lines[1]!.map(({ raRad, decRad }) =>
      [raRad, decRad].map((angle) => Number(((angle * 180) / Math.PI).toFixed(2))),
    );
    // Mintaka, Alnilam, Alnitak (J2000, from memory).
    expect(belt).toEqual([
      [83, -0.3],
      [84.05, -1.2],
      [85.19, -1.94],
    ]);
  });

  const head = 'abbreviation\tname\tlabel\tlines';

  it.each([
    ['expected the columns', 'Ori\tOrion\t1,2\t1,2 3,4\n'],
    ['line 3: expected 4 columns', `# note\n${head}\nOri\tOrion\t1,2\n`],
    ['line 2: "1,95" is no place', `${head}\nOri\tOrion\t1,2\t1,95 3,4\n`],
    ['line 2: "one,2" is no place', `${head}\nOri\tOrion\tone,2\t1,2 3,4\n`],
    ['line 2: "5" is no place', `${head}\nOri\tOrion\t1,2\t1,2 5\n`],
  ])('are refused where spoilt: %s', (message, text) => {
    expect(() => readFigures(text)).toThrow(FigureFileError);
    expect(() => readFigures(text)).toThrow(message);
  });
});
