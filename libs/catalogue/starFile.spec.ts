import { readFileSync } from 'node:fs';
import { cataloguePath } from './files';
import { CELL_COUNT, bandOf, bandStarts, cellOf } from './skyCells';
import {
  type PlacedStar,
  StarFileError,
  checksum,
  packStars,
  unpackDec,
  unpackRa,
  unpackStars,
  writtenChecksum,
} from './starFile';
import { CATALOGUE_VERSION } from './version';

const ARCSEC = Math.PI / 648000;

const stars: PlacedStar[] = [
  { raRad: 0, decRad: 0, magnitude: 5.001 },
  { raRad: 6.2831853, decRad: 0.01, magnitude: -1.46 },
  { raRad: 0.001, decRad: 0.002, magnitude: 2 },
  { raRad: 3, decRad: Math.PI / 2, magnitude: 10.9994 },
  { raRad: -1, decRad: -Math.PI / 2, magnitude: 7.25 },
  { raRad: 2.345678, decRad: -0.876543, magnitude: 6.5 },
];

describe('star file', () => {
  it('gives back every star at the index it told, to 0.1 arcsec and 0.001 mag', () => {
    const { bytes, indexOf } = packStars(stars, 'test');
    const columns = unpackStars(bytes, 'test');
    expect([columns.count, columns.version, columns.faintestMagnitude]).toEqual([6, 'test', 10.999]);
    stars.forEach((star, i) => {
      const at = indexOf[i]!;
      const cell = cellOf(star.raRad, star.decRad);
      const band = bandOf(star.decRad);
      expect(columns.cellStarts[cell]!).toBeLessThanOrEqual(at);
      expect(columns.cellStarts[cell + 1]!).toBeGreaterThan(at);
      const ra = unpackRa(band, cell - bandStarts[band]!, columns.raSteps[at]!);
      const dec = unpackDec(band, columns.decSteps[at]!);
      const east = Math.sin((ra - star.raRad) / 2) * 2 * Math.cos(star.decRad);
      expect(Math.hypot(east, dec - star.decRad) / ARCSEC).toBeLessThan(0.1);
      expect(columns.milliMagnitudes[at]).toBe(Math.round(star.magnitude * 1000));
    });
  });

  it('keeps the stars of a cell brightest first', () => {
    const { indexOf } = packStars(stars, 'test');
    expect(indexOf[2]!).toBeLessThan(indexOf[0]!);
  });

  it('is read from bytes at any offset', () => {
    const { bytes } = packStars(stars, 'test');
    const shifted = new Uint8Array(bytes.length + 1);
    shifted.set(bytes, 1);
    expect(unpackStars(shifted.subarray(1), 'test').count).toBe(6);
  });

  const broken = (change: (bytes: Uint8Array, header: DataView) => Uint8Array): (() => unknown) => {
    const { bytes } = packStars(stars, 'test');
    const changed = change(bytes, new DataView(bytes.buffer));
    return () => unpackStars(changed, 'test');
  };

  it.each([
    ['does not begin with DUSKSTAR', (bytes: Uint8Array) => bytes.fill(65, 0, 1)],
    ['does not begin with DUSKSTAR', (bytes: Uint8Array) => bytes.subarray(0, 20)],
    [
      'format is 2, expected 1',
      (bytes: Uint8Array, header: DataView) => (header.setUint32(8, 2, true), bytes),
    ],
    [
      `size in bytes is ${48 + 4 * (CELL_COUNT + 1) + 36}, expected ${48 + 4 * (CELL_COUNT + 1) + 42}`,
      (bytes: Uint8Array, header: DataView) => (header.setUint32(12, 7, true), bytes),
    ],
    [
      'number of cells is 5, expected 10312',
      (bytes: Uint8Array, header: DataView) => (header.setUint32(20, 5, true), bytes),
    ],
    ['version is trst, expected test', (bytes: Uint8Array) => bytes.fill(114, 29, 30)],
    [
      'number of stars in the index is 5, expected 6',
      (bytes: Uint8Array, header: DataView) => (header.setUint32(48 + 4 * CELL_COUNT, 5, true), bytes),
    ],
  ])('is refused where its %s', (message, change) => {
    expect(broken(change)).toThrow(StarFileError);
    expect(broken(change)).toThrow(message);
  });

  it('as shipped has the stars it counts, whole', () => {
    const file = readFileSync(cataloguePath('stars.bin'));
    const columns = unpackStars(file, CATALOGUE_VERSION);
    expect(columns.count).toBe(895_219);
    expect(file.length).toBe(5_412_614);
    expect(checksum(columns)).toBe(writtenChecksum(file));
    expect(columns.faintestMagnitude).toBe(10.999);
  });

  it('as shipped has no cell whose stars are out of order', () => {
    const { cellStarts, milliMagnitudes } = unpackStars(
      readFileSync(cataloguePath('stars.bin')),
      CATALOGUE_VERSION,
    );
    let disorder = 0;
    for (let cell = 0; cell < CELL_COUNT; cell++) {
      for (let i = cellStarts[cell]! + 1; i < cellStarts[cell + 1]!; i++) {
        if (milliMagnitudes[i]! < milliMagnitudes[i - 1]!) disorder++;
      }
    }
    expect(disorder).toBe(0);
  });
});
