import { closeSync, fstatSync, openSync, readSync } from 'node:fs';
import type { PlacedStar } from '../starFile';

const BLOCK = 2880;
const CARD = 80;

interface Unit {
  readonly start: number;
  readonly bytes: number;
  readonly rows: number;
}

/** Where the data of each header-and-data unit of a FITS file lies (FITS standard 4.0, section 3). */
const readUnits = (file: number): Unit[] => {
  const size = fstatSync(file).size;
  const units: Unit[] = [];
  const block = Buffer.alloc(BLOCK);
  let at = 0;
  while (at < size) {
    const numbers = new Map<string, number>();
    let ended = false;
    while (!ended) {
      if (readSync(file, block, 0, BLOCK, at) < BLOCK) throw new Error('FITS file ends inside a header.');
      at += BLOCK;
      for (let card = 0; card < BLOCK; card += CARD) {
        const text = block.toString('latin1', card, card + CARD);
        const keyword = text.slice(0, 8).trim();
        if (keyword === 'END') ended = true;
        else if (text[8] === '=') numbers.set(keyword, Number.parseFloat(text.slice(10)));
      }
    }
    const axes = numbers.get('NAXIS') ?? 0;
    let bytes = axes === 0 ? 0 : Math.abs(numbers.get('BITPIX') ?? 8) / 8;
    for (let axis = 1; axis <= axes; axis++) bytes *= numbers.get(`NAXIS${axis}`) ?? 0;
    units.push({ start: at, bytes, rows: numbers.get('NAXIS2') ?? 0 });
    at += Math.ceil(bytes / BLOCK) * BLOCK;
  }
  return units;
};

/** Places (degrees) of rows that are no stars. */
const ERRATA: readonly (readonly [number, number])[] = [
  // V_T 1.905 where there is no such star: a row whose place was missing.
  [0, 0],
  // "V_T 5.03" 3.8 arcsec from γ Piscis Austrini, whose companion is of magnitude 8 (from memory).
  [343.13016, -32.87569],
];

const isErratum = (x: number, y: number, z: number): boolean =>
  ERRATA.some(([raDeg, decDeg]) => {
    const [ra, dec] = [(raDeg * Math.PI) / 180, (decDeg * Math.PI) / 180];
    const away = Math.hypot(
      x - Math.cos(dec) * Math.cos(ra),
      y - Math.cos(dec) * Math.sin(ra),
      z - Math.sin(dec),
    );
    return away < 1e-6;
  });

const RANGE_UNIT = 10;
const STARS_UNIT = 11;
const MAGNITUDE_UNIT = 13;

/**
 * The stars of the Tycho-2 index file to V_T `faintest`: place in radians, `magnitude` still V_T.
 * Unit 10 holds minimum x y z, maximum x y z and scale (float64, little-endian); unit 11 three uint32 a star
 * (unit vector = value / scale + minimum); unit 13 V_T (float32, big-endian).
 */
export const readTycho = (path: string, faintest: number): PlacedStar[] => {
  const file = openSync(path, 'r');
  try {
    const units = readUnits(file);
    const read = (index: number, bytesPerRow: number): Buffer => {
      const unit = units[index];
      if (!unit) throw new Error(`${path}: no header-and-data unit ${index}.`);
      if (bytesPerRow > 0 && unit.bytes !== unit.rows * bytesPerRow) {
        throw new Error(
          `${path}: unit ${index} is ${unit.bytes} bytes, expected ${unit.rows * bytesPerRow}.`,
        );
      }
      const bytes = Buffer.alloc(unit.bytes);
      readSync(file, bytes, 0, unit.bytes, unit.start);
      return bytes;
    };
    const range = read(RANGE_UNIT, 0);
    const places = read(STARS_UNIT, 12);
    const magnitudes = read(MAGNITUDE_UNIT, 4);
    const scale = range.readDoubleLE(48);
    const stars: PlacedStar[] = [];
    for (let i = 0; i * 4 < magnitudes.length; i++) {
      const magnitude = magnitudes.readFloatBE(i * 4);
      if (magnitude > faintest) continue;
      const axis = (k: number): number =>
        places.readUInt32LE(i * 12 + k * 4) / scale + range.readDoubleLE(k * 8);
      const [x, y, z] = [axis(0), axis(1), axis(2)];
      const length = Math.hypot(x, y, z);
      if (Math.abs(length - 1) > 1e-6) {
        throw new Error(`${path}: star ${i} has a vector of length ${length}.`);
      }
      if (isErratum(x, y, z)) continue;
      stars.push({ raRad: Math.atan2(y, x), decRad: Math.asin(z / length), magnitude });
    }
    return stars;
  } finally {
    closeSync(file);
  }
};
