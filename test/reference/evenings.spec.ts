// Sunset to sunrise, twilights, moonrise and moonset against evenings.json, which evenings_reference.py makes
// with ERFA (Sun, precession-nutation, sidereal time) and Swiss Ephemeris (Moon) by brute-force search.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { type EveningLight, eveningLight } from '#darkness';
import { moonAltitude, moonSemidiameter, sunAltitude, toRad } from '#sky';

interface Expected {
  readonly utcMs: number;
  readonly degPerHour: number;
}

type Moment = Exclude<keyof EveningLight, 'darkMinutes'>;

type Row = Readonly<Record<Moment, Expected | null>> & {
  readonly latitudeDeg: number;
  readonly longitudeDeg: number;
  readonly elevationM: number;
  readonly date: string;
  readonly fromMs: number;
  readonly toMs: number;
  readonly darkMinutes: number;
};

const MOMENTS: readonly Moment[] = [
  'sunset',
  'civilDusk',
  'nauticalDusk',
  'astronomicalDusk',
  'astronomicalDawn',
  'nauticalDawn',
  'civilDawn',
  'sunrise',
  'moonrise',
  'moonset',
];

const { evenings } = JSON.parse(readFileSync(join(__dirname, 'evenings.json'), 'utf8')) as {
  evenings: readonly Row[];
};

/**
 * Seconds allowed: 2 where the body moves 3 degrees an hour or more in altitude, in proportion where slower.
 */
function allowedSeconds(degPerHour: number): number {
  return 2 * Math.max(1, 3 / Math.abs(degPerHour));
}

describe('the light of an evening against ERFA and Swiss Ephemeris', () => {
  it('has thirty evenings from 66 south to 69 north', () => {
    expect(evenings).toHaveLength(30);
    expect(Math.max(...evenings.map((row) => row.latitudeDeg))).toBe(69);
    expect(Math.min(...evenings.map((row) => row.latitudeDeg))).toBe(-66);
  });

  it.each(evenings.map((row) => [row.latitudeDeg, row.date, row] as const))(
    '%d degrees, %s',
    (_, __, row) => {
      const observer = {
        latitudeRad: toRad(row.latitudeDeg),
        longitudeRad: toRad(row.longitudeDeg),
        elevationM: row.elevationM,
      };
      const light = eveningLight(
        sunAltitude(observer),
        moonAltitude(observer),
        moonSemidiameter(observer),
        row.fromMs,
        row.toMs,
      );
      for (const moment of MOMENTS) {
        const expected = row[moment];
        const found = light[moment];
        if (expected === null || found === null) {
          expect([moment, found]).toEqual([moment, expected]);
          continue;
        }
        const off = Math.abs(found - expected.utcMs) / 1000;
        expect({ moment, off, within: off <= allowedSeconds(expected.degPerHour) }).toMatchObject({
          within: true,
        });
      }
      // Two edges, each of which may move by what is allowed for the slowest crossing of the evening.
      const slowest = Math.max(...MOMENTS.map((moment) => allowedSeconds(row[moment]?.degPerHour ?? 3)));
      expect(Math.abs(light.darkMinutes - row.darkMinutes) * 60).toBeLessThanOrEqual(2 * slowest);
    },
  );
});
