import { type LabelledIndex, StarNamesError, readStarNames, writeStarNames } from './starLabels';

const vega: LabelledIndex = {
  index: 7,
  label: { name: 'Vega', bayer: 'α Lyr', bayerLetter: 'α', flamsteed: 3, constellation: 'Lyr', hr: 7001 },
};
const nameless: LabelledIndex = {
  index: 2,
  label: { name: null, bayer: null, bayerLetter: null, flamsteed: null, constellation: null, hr: 5491 },
};
const double: LabelledIndex = {
  index: 9,
  label: { name: null, bayer: 'β² Sgr', bayerLetter: 'β²', flamsteed: null, constellation: 'Sgr', hr: 7343 },
};

describe('star names', () => {
  it('come back as they were written, in the order of the star file', () => {
    const text = writeStarNames([vega, nameless, double], '1', 10, ['Source: a test.']);
    const names = readStarNames(text, 10);
    expect([...names.indices]).toEqual([2, 7, 9]);
    for (const { index, label } of [vega, nameless, double]) expect(names.labelOf(index)).toEqual(label);
    expect(names.labelOf(7)).toBe(names.labelOf(7));
    for (const index of [0, 1, 3, 8, 10]) expect(names.labelOf(index)).toBeNull();
  });

  it('are refused with another star file', () => {
    const text = writeStarNames([vega], '1', 10, []);
    expect(() => readStarNames(text, 11)).toThrow(StarNamesError);
    expect(() => readStarNames(text, 11)).toThrow('belong to 10 stars, the star file has 11');
  });

  const head = 'star\thr\tbayer\tflamsteed\tconstellation\tname';

  it.each([
    ['star\thr\n', 'line 1: expected the columns'],
    ['', 'line 1: expected the columns'],
    [`# note\n${head}\n10\t2\t\t\t\t\n`, 'line 3: star 10 should lie above -1 and below 10'],
    [`${head}\n4\t2\t\t\t\t\n4\t3\t\t\t\t\n`, 'line 3: star 4 should lie above 4'],
    [`${head}\n4\t2\t\t\t\t\n\n`, 'line 3: star NaN'],
  ])('name the line that is wrong: %j', (text, message) => {
    expect(() => readStarNames(text, 10)).toThrow(StarNamesError);
    expect(() => readStarNames(text, 10)).toThrow(message);
  });

  it('name a line of too few columns when its star is asked for', () => {
    const names = readStarNames(`${head}\n1\t2\n`, 10);
    expect(() => names.labelOf(1)).toThrow(StarNamesError);
    expect(() => names.labelOf(1)).toThrow('line 2: expected 6 columns');
  });
});
