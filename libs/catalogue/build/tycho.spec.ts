import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readTycho } from './tycho';

const card = (text: string): string => text.padEnd(80);

/** One FITS header-and-data unit, padded to whole blocks. */
const unit = (rows: number, data: Buffer): Buffer => {
  const width = rows === 0 ? 0 : data.length / rows;
  const cards = [
    card('BITPIX  =                    8'),
    card(`NAXIS   =                    ${rows === 0 ? 0 : 2}`),
    ...(rows === 0
      ? []
      : [card(`NAXIS1  = ${String(width).padStart(20)}`), card(`NAXIS2  = ${String(rows).padStart(20)}`)]),
    card('END'),
  ];
  const pad = (bytes: Buffer, fill: string): Buffer =>
    Buffer.concat([bytes, Buffer.alloc((2880 - (bytes.length % 2880)) % 2880, fill)]);
  return Buffer.concat([pad(Buffer.from(cards.join(''), 'latin1'), ' '), pad(data, '\0')]);
};

const SCALE = 2147483647.5;

/** A star index of the three units that are read, the others empty. */
const starIndex = (stars: readonly (readonly [number, number, number, number])[]): Buffer => {
  const range = Buffer.alloc(56);
  [-1, -1, -1, 1, 1, 1, SCALE].forEach((value, i) => range.writeDoubleLE(value, 8 * i));
  const places = Buffer.alloc(12 * stars.length);
  const magnitudes = Buffer.alloc(4 * stars.length);
  stars.forEach(([x, y, z, magnitude], i) => {
    [x, y, z].forEach((axis, k) => places.writeUInt32LE(Math.round((axis + 1) * SCALE), 12 * i + 4 * k));
    magnitudes.writeFloatBE(magnitude, 4 * i);
  });
  const units = Array.from({ length: 14 }, () => unit(0, Buffer.alloc(0)));
  units[10] = unit(7, range);
  units[11] = unit(stars.length, places);
  units[13] = unit(stars.length, magnitudes);
  return Buffer.concat(units);
};

describe('reading the Tycho-2 index', () => {
  const folder = mkdtempSync(join(tmpdir(), 'tycho-'));
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });
  const fileOf = (bytes: Buffer): string => {
    const path = join(folder, 'index.fits');
    writeFileSync(path, bytes);
    return path;
  };

  it('gives places and V_T to the limit asked for', () => {
    const path = fileOf(
      starIndex([
        [0, 1, 0, 5.5],
        [0.6, 0, -0.8, 10.25],
        [0, 0, 1, 11.75],
      ]),
    );
    const stars = readTycho(path, 11);
    expect(stars.map(({ magnitude }) => magnitude)).toEqual([5.5, 10.25]);
    expect(stars[0]!.raRad).toBeCloseTo(Math.PI / 2, 8);
    expect(stars[1]!.decRad).toBeCloseTo(Math.asin(-0.8), 8);
  });

  it('leaves out the row without a place', () => {
    expect(
      readTycho(
        fileOf(
          starIndex([
            [1, 0, 0, 1.905],
            [0, 1, 0, 4],
          ]),
        ),
        11,
      ),
    ).toHaveLength(1);
  });

  it('refuses a vector that is no direction', () => {
    expect(() => readTycho(fileOf(starIndex([[0.5, 0, 0, 4]])), 11)).toThrow(
      'star 0 has a vector of length 0.49999',
    );
  });

  it('refuses a file cut off inside a header', () => {
    expect(() => readTycho(fileOf(starIndex([[0, 1, 0, 4]]).subarray(0, 4000)), 11)).toThrow(
      'inside a header',
    );
  });
});
