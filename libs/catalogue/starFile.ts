import {
  BAND_COUNT,
  BAND_HEIGHT,
  CELL_COUNT,
  bandStarts,
  bandSouth,
  cellOf,
  cellWidth,
  wrapTurn,
} from './skyCells';

/**
 * The star file, little-endian throughout:
 *
 *   0  8 bytes  'DUSKSTAR'
 *   8  uint32   format, 1
 *  12  uint32   number of stars
 *  16  uint32   number of declination bands
 *  20  uint32   number of cells
 *  24  int32    faintest magnitude, thousandths
 *  28  16 bytes catalogue version, ASCII, padded with zeros
 *  44  uint32   sum of all uint16 of the star columns, modulo 2^32
 *  48  uint32 × (cells + 1)  index of each cell's first star, then the number of stars
 *      uint16 × stars        right ascension inside the cell, 65536ths of its width
 *      uint16 × stars        declination inside the band, 65536ths of its height
 *      int16  × stars        V magnitude, thousandths
 *
 * Inside a cell stars stand brightest first, so a search to a bright limit stops early. Six bytes a star;
 * a place is kept to 0.06 arcsec, far below what a chart can show.
 */
const MAGIC = 'DUSKSTAR';
const FORMAT = 1;
const HEADER_BYTES = 48;
const VERSION_BYTES = 16;
const STEPS = 65536;

/** The star file in memory: typed arrays over the file's own bytes. */
export interface StarColumns {
  readonly version: string;
  readonly count: number;
  readonly faintestMagnitude: number;
  readonly cellStarts: Uint32Array;
  readonly raSteps: Uint16Array;
  readonly decSteps: Uint16Array;
  readonly milliMagnitudes: Int16Array;
}

/** One star on its way into the file: radians, V magnitude. */
export interface PlacedStar {
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
}

export class StarFileError extends Error {
  override readonly name = 'StarFileError';
}

/** Right ascension, radians, of a star that lies in the cell `column` of `band`. */
export const unpackRa = (band: number, column: number, step: number): number =>
  (column + (step + 0.5) / STEPS) * cellWidth(band);

/** Declination, radians, of a star of `band`. */
export const unpackDec = (band: number, step: number): number =>
  bandSouth(band) + ((step + 0.5) / STEPS) * BAND_HEIGHT;

const fraction = (value: number): number => Math.min(STEPS - 1, Math.max(0, Math.floor(value * STEPS)));

/** The sum that guards the star columns against a damaged file. */
export const checksum = (columns: StarColumns): number => {
  let sum = 0;
  for (let i = 0; i < columns.count; i++) {
    sum = (sum + columns.raSteps[i]! + columns.decSteps[i]! + (columns.milliMagnitudes[i]! & 0xffff)) >>> 0;
  }
  return sum;
};

const littleEndian = new Uint8Array(new Uint32Array([1]).buffer)[0] === 1;

const columnsOver = (
  bytes: Uint8Array,
  version: string,
  count: number,
  faintestMagnitude: number,
): StarColumns => {
  const { buffer, byteOffset } = bytes;
  const stars = byteOffset + HEADER_BYTES + 4 * (CELL_COUNT + 1);
  return {
    version,
    count,
    faintestMagnitude,
    cellStarts: new Uint32Array(buffer, byteOffset + HEADER_BYTES, CELL_COUNT + 1),
    raSteps: new Uint16Array(buffer, stars, count),
    decSteps: new Uint16Array(buffer, stars + 2 * count, count),
    milliMagnitudes: new Int16Array(buffer, stars + 4 * count, count),
  };
};

const sizeFor = (count: number): number => HEADER_BYTES + 4 * (CELL_COUNT + 1) + 6 * count;

/**
 * Packs stars into the bytes of a star file. Also gives, for each star in the order it came, its index in
 * the file, by which names refer to it. Throws where a magnitude or place cannot be held.
 */
export const packStars = (
  stars: readonly PlacedStar[],
  version: string,
): { readonly bytes: Uint8Array; readonly indexOf: Uint32Array } => {
  if (version.length > VERSION_BYTES) throw new StarFileError(`Version "${version}" is longer than 16.`);
  const cells = Uint32Array.from(stars, (star) => cellOf(star.raRad, star.decRad));
  const milli = Int16Array.from(stars, (star) => Math.round(star.magnitude * 1000));
  const order = Uint32Array.from(stars, (_, i) => i).sort(
    (a, b) => cells[a]! - cells[b]! || milli[a]! - milli[b]! || a - b,
  );
  const bytes = new Uint8Array(sizeFor(stars.length));
  const faintest = milli.reduce((most, value) => Math.max(most, value), -32768);
  const columns = columnsOver(bytes, version, stars.length, faintest / 1000);
  const indexOf = new Uint32Array(stars.length);
  let band = 0;
  order.forEach((from, to) => {
    const star = stars[from]!;
    const cell = cells[from]!;
    while (bandStarts[band + 1]! <= cell) band++;
    const column = cell - bandStarts[band]!;
    indexOf[from] = to;
    columns.cellStarts[cell + 1] = to + 1;
    columns.raSteps[to] = fraction(wrapTurn(star.raRad) / cellWidth(band) - column);
    columns.decSteps[to] = fraction((star.decRad - bandSouth(band)) / BAND_HEIGHT);
    columns.milliMagnitudes[to] = milli[from]!;
  });
  for (let cell = 1; cell <= CELL_COUNT; cell++) {
    columns.cellStarts[cell] = Math.max(columns.cellStarts[cell]!, columns.cellStarts[cell - 1]!);
  }
  const header = new DataView(bytes.buffer);
  bytes.set(Buffer.from(MAGIC, 'ascii'), 0);
  header.setUint32(8, FORMAT, true);
  header.setUint32(12, stars.length, true);
  header.setUint32(16, BAND_COUNT, true);
  header.setUint32(20, CELL_COUNT, true);
  header.setInt32(24, faintest, true);
  bytes.set(Buffer.from(version, 'ascii'), 28);
  header.setUint32(44, checksum(columns), true);
  return { bytes, indexOf };
};

/**
 * Reads the bytes of a star file; `wantedVersion` is the catalogue version the program was built with.
 * Throws a StarFileError which says what differs from what was expected.
 */
export const unpackStars = (file: Uint8Array, wantedVersion: string): StarColumns => {
  if (!littleEndian) throw new StarFileError('The star file needs a little-endian processor.');
  const bytes = file.byteOffset % 4 === 0 ? file : new Uint8Array(file);
  const header = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.byteLength < HEADER_BYTES || Buffer.from(bytes.subarray(0, 8)).toString('latin1') !== MAGIC) {
    throw new StarFileError(`Not a star file: it does not begin with ${MAGIC}. Build it again.`);
  }
  const expect = (what: string, found: number | string, wanted: number | string): void => {
    if (found !== wanted) {
      throw new StarFileError(`Star file: ${what} is ${found}, expected ${wanted}. Build it again.`);
    }
  };
  const count = header.getUint32(12, true);
  const version = Buffer.from(bytes.subarray(28, 28 + VERSION_BYTES))
    .toString('latin1')
    .replace(/\0+$/, '');
  expect('format', header.getUint32(8, true), FORMAT);
  expect('number of declination bands', header.getUint32(16, true), BAND_COUNT);
  expect('number of cells', header.getUint32(20, true), CELL_COUNT);
  expect('version', version, wantedVersion);
  expect('size in bytes', bytes.byteLength, sizeFor(count));
  const columns = columnsOver(bytes, version, count, header.getInt32(24, true) / 1000);
  expect('number of stars in the index', columns.cellStarts[CELL_COUNT]!, count);
  return columns;
};

/** The checksum that the file says its columns have; compare with `checksum`. */
export const writtenChecksum = (file: Uint8Array): number =>
  new DataView(file.buffer, file.byteOffset, file.byteLength).getUint32(44, true);
