import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Star, loadStars, namedStars, starsInCone } from '#catalogue';

const DEGREE = Math.PI / 180;
const ARCSEC = DEGREE / 3600;

interface Row {
  readonly hr: number;
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
}

const rows: Row[] = readFileSync(join(__dirname, 'brightStars.tsv'), 'utf8')
  .split('\n')
  .filter((line) => /^\d/.test(line))
  .map((line) => {
    const [hr, ra, dec, magnitude] = line.split('\t').map(Number);
    return { hr: hr!, raRad: ra! * DEGREE, decRad: dec! * DEGREE, magnitude: magnitude! };
  });

const arcsecBetween = (a: Row | Star, b: Row | Star): number => {
  const north = Math.sin((a.decRad - b.decRad) / 2);
  const east = Math.sin((a.raRad - b.raRad) / 2);
  return (
    (2 * Math.asin(Math.sqrt(north ** 2 + Math.cos(a.decRad) * Math.cos(b.decRad) * east ** 2))) / ARCSEC
  );
};

const stars = loadStars();
const around = (place: Row | Star, radiusArcsec: number, faintestMagnitude: number): Star[] =>
  starsInCone(stars, {
    raRad: place.raRad,
    decRad: place.decRad,
    radiusRad: radiusArcsec * ARCSEC,
    faintestMagnitude,
  });

describe('the Bright Star Catalogue', () => {
  it('has 9,096 entries, each labelled once in the star file', () => {
    expect(rows).toHaveLength(9096);
    const numbers = namedStars(stars).map(({ label }) => label!.hr!);
    expect(numbers.sort((a, b) => a - b)).toEqual(rows.map(({ hr }) => hr).sort((a, b) => a - b));
  });

  const toNakedEye = rows.filter(({ magnitude }) => magnitude <= 6.5);

  it('finds each of its 8,404 stars to V 6.5 once within 30 arcsec, in its place and of its magnitude', () => {
    expect(toNakedEye).toHaveLength(8404);
    const far: number[] = [];
    for (const row of toNakedEye) {
      const found = around(row, 30, 11).filter(({ label }) => label?.hr === row.hr);
      expect([row.hr, found.map(({ magnitude }) => magnitude)]).toEqual([row.hr, [row.magnitude]]);
      if (arcsecBetween(row, found[0]!) > 6) far.push(row.hr);
    }
    // 61 Cygni moves 5 arcsec a year; the Bright Star Catalogue's place is not of J2000 (the star file's is).
    expect(far).toEqual([8085]);
  });

  const brighter = starsInCone(stars, { raRad: 0, decRad: 0, radiusRad: Math.PI, faintestMagnitude: 6.5 });

  it('knows every pair of stars to V 6.5 nearer than 5 arcsec: none is one star drawn twice', () => {
    const strangers = brighter.filter((star) => !star.label && around(star, 5, 6.5).length > 1);
    expect(strangers).toEqual([]);
  });

  it('knows all stars to V 6 but three well-known companions (θ Sco B, 145 CMa B, x Vel B)', () => {
    const strangers = brighter.filter(({ label, magnitude }) => !label && magnitude <= 6);
    expect(strangers.map((star) => around(star, 60, 5)[0]!.label?.hr)).toEqual([6553, 2764, 4180]);
  });
});

describe('places published in the Hipparcos catalogue (ICRS, J2000; from memory)', () => {
  it.each([
    ['Sirius', '06 45 08.917', '-16 42 58.02', -1.46],
    ['Vega', '18 36 56.336', '+38 47 01.28', 0.03],
    ['Polaris', '02 31 49.095', '+89 15 50.79', 2.02],
    ['Betelgeuse', '05 55 10.305', '+07 24 25.43', 0.5],
    ['Fomalhaut', '22 57 39.046', '-29 37 20.05', 1.16],
    ['Canopus', '06 23 57.110', '-52 41 44.38', -0.72],
  ])('%s', (name, hours, degrees, magnitude) => {
    const [h, m, s] = hours.split(' ').map(Number);
    const [d, arcmin, arcsec] = degrees.split(' ').map((part) => Math.abs(Number(part)));
    const sign = degrees.startsWith('-') ? -1 : 1;
    const place = {
      hr: 0,
      magnitude,
      raRad: (h! + m! / 60 + s! / 3600) * 15 * DEGREE,
      decRad: sign * (d! + arcmin! / 60 + arcsec! / 3600) * DEGREE,
    };
    const star = namedStars(stars).find(({ label }) => label!.name === name);
    expect(arcsecBetween(place, star!)).toBeLessThan(0.1);
    expect(star!.magnitude).toBe(magnitude);
  });
});
