import { type Cone, type Star, countInCone, loadStars, namedStars, starsInCone } from './stars';
import { CELL_COUNT, bandStarts } from './skyCells';
import { unpackDec, unpackRa } from './starFile';
import { CATALOGUE_VERSION } from './version';

const DEGREE = Math.PI / 180;

const began = performance.now();
const stars = loadStars();
const loadMs = performance.now() - began;

/** Unit vectors of all stars, straight from the columns, for the search by brute force. */
const vectors = (() => {
  const { cellStarts, raSteps, decSteps } = stars.columns;
  const xyz = new Float64Array(3 * stars.count);
  let band = 0;
  for (let cell = 0; cell < CELL_COUNT; cell++) {
    while (bandStarts[band + 1]! <= cell) band++;
    for (let i = cellStarts[cell]!; i < cellStarts[cell + 1]!; i++) {
      const ra = unpackRa(band, cell - bandStarts[band]!, raSteps[i]!);
      const dec = unpackDec(band, decSteps[i]!);
      xyz[3 * i] = Math.cos(dec) * Math.cos(ra);
      xyz[3 * i + 1] = Math.cos(dec) * Math.sin(ra);
      xyz[3 * i + 2] = Math.sin(dec);
    }
  }
  return xyz;
})();

const bruteCount = ({ raRad, decRad, radiusRad, faintestMagnitude }: Cone): number => {
  const [x, y, z] = [
    Math.cos(decRad) * Math.cos(raRad),
    Math.cos(decRad) * Math.sin(raRad),
    Math.sin(decRad),
  ];
  const chordSquared = (2 * Math.sin(radiusRad / 2)) ** 2;
  const faintest = Math.round(faintestMagnitude * 1000);
  let count = 0;
  for (let i = 0; i < stars.count; i++) {
    if (stars.columns.milliMagnitudes[i]! > faintest) continue;
    const [east, north, up] = [vectors[3 * i]! - x, vectors[3 * i + 1]! - y, vectors[3 * i + 2]! - z];
    if (east * east + north * north + up * up <= chordSquared) count++;
  }
  return count;
};

const cone = (raDeg: number, decDeg: number, radiusDeg: number, faintestMagnitude: number): Cone => ({
  raRad: raDeg * DEGREE,
  decRad: decDeg * DEGREE,
  radiusRad: radiusDeg * DEGREE,
  faintestMagnitude,
});

/** Cones spread over the sky by the golden angle: repeatable, no two alike. */
const spread = Array.from({ length: 30 }, (_, i) =>
  cone(i * 137.508, (Math.asin((2 * i + 1) / 30 - 1) * 180) / Math.PI, 0.2 + (i % 7) * 2.3, 7 + (i % 5)),
);

describe('star catalogue', () => {
  it('has 895,219 stars to V 11, 9,096 of them labelled, and is loaded once', () => {
    expect(stars.count).toBe(895_219);
    expect(stars.faintestMagnitude).toBe(10.999);
    expect(stars.version).toBe(CATALOGUE_VERSION);
    expect(stars.names.indices.length).toBe(9096);
    expect(loadStars()).toBe(stars);
    process.stdout.write(`star catalogue loaded in ${loadMs.toFixed(0)} ms\n`);
  });

  it.each(spread)('finds in the cone %j what brute force finds', (place) => {
    expect(countInCone(stars, place)).toBe(bruteCount(place));
  });

  it.each([
    ['north pole', cone(0, 90, 1, 11)],
    ['north pole from beside it', cone(123, 89.5, 2, 11)],
    ['south pole', cone(77, -90, 3, 10)],
    ['south pole from beside it', cone(200, -88, 2.5, 11)],
    ['rim on the pole', cone(10, 88, 2, 11)],
    ['across 0h', cone(0, 10, 3, 10)],
    ['across 0h, from 24h', cone(359.9, -40, 2, 10)],
    ['right ascension of minus one turn', cone(-360.1, 5, 2, 10)],
    ['a hemisphere', cone(100, 20, 90, 6)],
    ['more than a hemisphere', cone(100, -20, 130, 6)],
    ['the whole sky', cone(100, 20, 180, 8)],
  ])('%s', (_name, place) => {
    const found = starsInCone(stars, place);
    expect(found.length).toBe(bruteCount(place));
    expect(found.length).toBeGreaterThan(0);
    expect(countInCone(stars, place)).toBe(found.length);
  });

  it('gives stars brightest first, none fainter than asked, the limit itself included', () => {
    const found = starsInCone(stars, cone(84, 0, 10, 6.5));
    expect(found.slice(0, 3).map(({ label }) => label?.name)).toEqual(['Rigel', 'Betelgeuse', 'Bellatrix']);
    expect(found.every((star, i) => i === 0 || star.magnitude >= found[i - 1]!.magnitude)).toBe(true);
    const last = found.at(-1)!;
    expect(countInCone(stars, cone(84, 0, 10, last.magnitude))).toBe(found.length);
    expect(countInCone(stars, cone(84, 0, 10, last.magnitude - 0.001))).toBeLessThan(found.length);
  });

  it('finds a star in a cone of no radius at its own place', () => {
    const [vega] = namedStars(stars).filter(({ label }) => label!.name === 'Vega');
    const { raRad, decRad } = vega!;
    expect(starsInCone(stars, { raRad, decRad, radiusRad: 0, faintestMagnitude: 11 })).toEqual([vega]);
  });

  it('labels stars by name, letter and number', () => {
    const of = (name: string): Star => namedStars(stars).find(({ label }) => label!.name === name)!;
    expect(of('Vega').label).toEqual({
      name: 'Vega',
      bayer: 'α Lyr',
      bayerLetter: 'α',
      flamsteed: 3,
      constellation: 'Lyr',
      hr: 7001,
    });
    expect(of('Arkab Posterior').label!.bayer).toBe('β² Sgr');
    expect(of('Alcor').label).toMatchObject({ bayer: null, flamsteed: 80, constellation: 'UMa', hr: 5062 });
    expect(namedStars(stars)[0]!.label!.name).toBe('Sirius');
    expect(namedStars(stars)).toHaveLength(9096);
    expect(namedStars(stars).filter(({ label }) => label!.name).length).toBe(272);
  });

  it.each([
    ['raRad is NaN', cone(NaN, 0, 1, 6)],
    ['decRad is 1.5882496193148399; it must lie between', cone(0, 91, 1, 6)],
    ['radiusRad is -0.017453292519943295; it must lie between 0 and π', cone(0, 0, -1, 6)],
    ['faintestMagnitude is not a number', cone(0, 0, 1, NaN)],
  ])('refuses a cone where %s', (message, place) => {
    expect(() => starsInCone(stars, place)).toThrow(RangeError);
    expect(() => countInCone(stars, place)).toThrow(message);
  });

  it('answers a cone of 1 degree to V 11 fast enough for any chart', () => {
    const times = Array.from({ length: 300 }, (_, i) => {
      const start = performance.now();
      starsInCone(stars, cone(i * 137.508, (Math.asin(i / 150 - 1) * 180) / Math.PI, 1, 11));
      return performance.now() - start;
    }).sort((a, b) => a - b);
    process.stdout.write(
      `cone of 1 degree to V 11: median ${times[150]!.toFixed(3)} ms, worst ${times[299]!.toFixed(2)} ms\n`,
    );
    expect(times[150]!).toBeLessThan(2);
  });
});
