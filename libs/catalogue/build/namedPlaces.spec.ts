import { chooseNames, readNamedPlaces } from './namedPlaces';

const text = [
  '# comment',
  'Antares    ,alSco,ICRS,16,29,24.45970,-26,25,55.2094,-12.11,-23.3,-3.5,5.89,0.91,-26,11359',
  'Zero,zeTst,ICRS,00,00,00.0,-00,30,00.0,1000,-2000,0,0,4.5,0,0',
  'Algedi     ,al-1Cap,ICRS,20,17,38.86987,-12,30,29.5594,22.98,1.28,-25.79,5.73,4.27,-12, 5683',
  'Algedi     ,al-2Cap,ICRS,20,18,03.25595,-12,32,41.4684,62.63,2.66,0.7,30.82,3.58,-12, 5685',
  'Old one,xx,2000,20,18,03.25595,-12,32,41.4684,62.63,2.66,0.7,30.82,3.58,-12, 5685',
].join('\n');

const places = readNamedPlaces(text);
const ARCSEC = Math.PI / 648000;

describe('reading sefstars.txt', () => {
  it('takes the ICRS rows, minus signs on zero degrees too', () => {
    expect(places.map(({ name, designation, magnitude }) => [name, designation, magnitude])).toEqual([
      ['Antares', 'alSco', 0.91],
      ['Zero', 'zeTst', 4.5],
      ['Algedi', 'al-1Cap', 4.27],
      ['Algedi', 'al-2Cap', 3.58],
    ]);
    expect(places[0]!.raRad).toBeCloseTo(((16 + 29 / 60 + 24.4597 / 3600) * Math.PI) / 12, 12);
    expect(places[1]!.decRad).toBeCloseTo((-0.5 * Math.PI) / 180, 12);
  });

  it('reckons where a star stood 8.75 years before', () => {
    const { raRad, decRad, earlier } = places[1]!;
    expect(((raRad - earlier.raRad) * Math.cos(decRad)) / ARCSEC).toBeCloseTo(8.75, 6);
    expect((decRad - earlier.decRad) / ARCSEC).toBeCloseTo(-17.5, 6);
  });
});

describe('choosing names', () => {
  it('gives the rows asked for', () => {
    const chosen = chooseNames('# list\nAntares\nAlgedi | al-2Cap\n', places);
    expect(chosen.map(({ designation }) => designation)).toEqual(['alSco', 'al-2Cap']);
  });

  it.each([
    ['sefstars.txt has no "Vega"', 'Vega'],
    ['"Algedi" stands for al-1Cap, al-2Cap; say which', 'Algedi'],
  ])('refuses: %s', (message, list) => {
    expect(() => chooseNames(list, places)).toThrow(message);
  });
});
