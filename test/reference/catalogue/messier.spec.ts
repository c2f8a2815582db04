import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import {
  AstroTime,
  RotateVector,
  Rotation_EQD_EQJ,
  Spherical,
  SphereFromVector,
  VectorFromSphere,
} from 'astronomy-engine';
import { type DeepSkyObject, deepSkyObjects, findDeepSky } from '#catalogue';

interface Row {
  readonly number: number;
  readonly raDeg: number;
  readonly decDeg: number;
  readonly magnitude: number;
}

/** Rows of the almanac's table, those of equinox 1986.5 brought to J2000 (nutation, 0.3', is below its rounding). */
const rows: Row[] = readFileSync(join(__dirname, 'messierTable.tsv'), 'utf8')
  .split('\n')
  .filter((line) => /^(M|There_is_no_M)\d/.test(line))
  .map((line) => {
    const [name, equinox, ra, dec, magnitude] = line.split('\t');
    const number = Number(/M(\d+)/.exec(name!)![1]);
    if (equinox === '2000') {
      return { number, raDeg: Number(ra), decDeg: Number(dec), magnitude: Number(magnitude) };
    }
    const date = new AstroTime((Number(equinox) - 2000) * 365.25);
    const vector = VectorFromSphere(new Spherical(Number(dec), Number(ra), 1), date);
    const { lon, lat } = SphereFromVector(RotateVector(Rotation_EQD_EQJ(date), vector));
    return { number, raDeg: lon, decDeg: lat, magnitude: Number(magnitude) };
  });

interface Place {
  readonly raDeg: number;
  readonly decDeg: number;
}

const arcminBetween = (a: Place, b: Place): number => {
  const north = (a.decDeg - b.decDeg) * 60;
  const east = (((a.raDeg - b.raDeg + 540) % 360) - 180) * 60 * Math.cos((a.decDeg * Math.PI) / 180);
  return Math.hypot(north, east);
};

const ofOurs = (number: number): DeepSkyObject => {
  const object = findDeepSky(`M ${number}`);
  if (!object) throw new Error(`M ${number} is missing.`);
  return object;
};

/** M 102 has no place in the table ("There is no M102"). */
const compared = rows.filter(({ number }) => number !== 102);

describe("the almanac's Messier table", () => {
  it('has a row for each of the 110, and so have we', () => {
    expect(rows.map(({ number }) => number)).toEqual(Array.from({ length: 110 }, (_, i) => i + 1));
    const ours = deepSkyObjects().filter(({ id }) => id.startsWith('M '));
    expect(ours.map(({ id }) => id)).toEqual(rows.map(({ number }) => `M ${number}`));
  });

  // Scattered clusters without a middle that all agree on; the table's place for M 41 also disagrees with its
  // own cluster number, C0644-206 (right ascension 6h 44m at 1950, which is 6h 46m at J2000, ours).
  const loose = new Set([41, 50, 67]);

  it("puts each object within 3' of our place (it is rounded to 1'), three loose clusters within their radius", () => {
    for (const row of compared) {
      const object = ofOurs(row.number);
      const limit = loose.has(row.number) ? object.majorArcmin / 2 : 3;
      expect([object.id, Math.max(limit, arcminBetween(object, row))]).toEqual([object.id, limit]);
    }
  });

  // The table gives these in blue or photographic light (redder or greener objects look fainter there), or, M 17
  // and M 40, without a decimal, and M 73 not at all; ours are visual.
  const otherwise = [17, 20, 21, 25, 26, 27, 29, 31, 32, 33, 34, 37, 39, 40, 44, 50, 52, 55, 73, 76, 97, 104];

  it('gives magnitudes within 0.5 of ours, save for the objects named here', () => {
    const apart = compared
      .filter(({ number, magnitude }) => Math.abs(ofOurs(number).magnitude - magnitude) > 0.5 + 1e-9)
      .map(({ number }) => number);
    expect(apart).toEqual(otherwise);
  });

  it('takes the four doubtful entries as the table does', () => {
    expect(ofOurs(40).kind).toBe('doubleStar');
    expect(ofOurs(73).kind).toBe('asterism');
    expect(ofOurs(91).otherNames).toContain('NGC 4548');
    expect(ofOurs(102).otherNames).toContain('NGC 5866');
  });
});
