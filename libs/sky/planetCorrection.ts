import { TABLE } from './planetCorrectionTable';
import { type PlanetName } from './solarSystem';
import { type Vector } from './vector';

/** Days in a piece and degree of its Chebyshev series, in the file's order; build/planetCorrections.py has the same. */
const PIECES: Readonly<Record<PlanetName | 'Earth', readonly [days: number, degree: number]>> = {
  Mercury: [16, 7],
  Venus: [128, 11],
  Earth: [16, 7],
  Mars: [256, 15],
  Jupiter: [512, 11],
  Saturn: [1024, 11],
  Uranus: [1024, 11],
  Neptune: [1024, 11],
};
const FIRST_TT_JD = 2_451_536.5;
const DAYS = 22_528;

interface Series {
  readonly unitAu: number;
  readonly days: number;
  readonly degree: number;
  /** [piece][axis][order], in units of `unitAu`. */
  readonly coefficients: Int16Array;
}

let loaded: Readonly<Record<PlanetName | 'Earth', Series>> | null = null;

/**
 * What JPL's DE431 adds to the planetary library's heliocentric place of a planet or the Earth, au, J2000
 * equator, from December 1999 to August 2061; nothing outside. The library's shortened theory is 2 arcsec off
 * for the Earth and up to 25 for a planet; with this the error is hundredths.
 */
export function planetCorrection(body: PlanetName | 'Earth', ttJd: number): Vector {
  const since = ttJd - FIRST_TT_JD;
  if (!(since >= 0 && since < DAYS)) return [0, 0, 0];
  loaded ??= load();
  const { unitAu, days, degree, coefficients } = loaded[body];
  const piece = Math.floor(since / days);
  const x = (2 * since) / days - 2 * piece - 1;
  const base = piece * 3 * (degree + 1);
  const axis = (first: number): number => {
    let b1 = 0;
    let b2 = 0;
    for (let j = degree; j > 0; j--) {
      const b0 = coefficients[first + j]! + 2 * x * b1 - b2;
      b2 = b1;
      b1 = b0;
    }
    return unitAu * (coefficients[first]! + x * b1 - b2);
  };
  return [axis(base), axis(base + degree + 1), axis(base + 2 * (degree + 1))];
}

function load(): Readonly<Record<PlanetName | 'Earth', Series>> {
  const bytes = Buffer.from(TABLE, 'base64');
  let at = 0;
  const series = Object.entries(PIECES).map(([body, [days, degree]]) => {
    const unitAu = bytes.readDoubleLE(at);
    const coefficients = new Int16Array((DAYS / days) * 3 * (degree + 1));
    coefficients.forEach((_, i) => {
      coefficients[i] = bytes.readInt16LE(at + 8 + 2 * i);
    });
    at += 8 + coefficients.byteLength;
    return [body, { unitAu, days, degree, coefficients }];
  });
  return Object.fromEntries(series) as Readonly<Record<PlanetName | 'Earth', Series>>;
}
