import { moonAltitude, place, SOLAR_BODIES, type SolarBody, sunHorizontal } from '#sky';
import { expected, horizontalMiss, observerOf, type ObserverRow, solarTarget } from './expected';

type Row = readonly [observer: number, utc: string, ...altitudesAndAzimuths: number[]];

const { observers, rows } = expected<{ observers: ObserverRow[]; rows: Row[] }>('horizontal.json');

/** Arcsec: several times the worst miss, and far below the 20 (Moon 8) that is promised. */
const TOLERANCE: Readonly<Record<SolarBody, number>> = {
  Sun: 1,
  Moon: 4,
  Mercury: 1,
  Venus: 1,
  Mars: 1,
  Jupiter: 1,
  Saturn: 1,
  Uranus: 1,
  Neptune: 1,
};
/** Azimuth means less and less towards the zenith. */
const NEAR_ZENITH_DEG = 89;

const cases = (body: SolarBody) =>
  rows.map(([observer, utc, ...values]) => {
    const column = 2 * SOLAR_BODIES.indexOf(body);
    return {
      observer: observerOf(observers[observer]!),
      utcMs: Date.parse(utc),
      altitudeDeg: values[column]!,
      azimuthDeg: values[column + 1]!,
    };
  });

// Expected: Swiss Ephemeris files (JPL DE431) with ERFA; see README.md.
describe('altitude and azimuth', () => {
  it('are checked at 144 places and dates over both hemispheres to latitude 69', () => {
    expect(rows).toHaveLength(144);
    const latitudes = observers.map(([latitude]) => latitude);
    expect(Math.max(...latitudes)).toBe(69);
    expect(Math.min(...latitudes)).toBe(-69);
    const years = new Set(rows.map(([, utc]) => utc.slice(0, 4)));
    expect([...years].sort()).toEqual(['2026', '2027', '2028', '2029', '2030', '2031']);
  });

  test.each(SOLAR_BODIES)('of %s agree with DE431 and ERFA', (body) => {
    let altitude = 0;
    let azimuth = 0;
    for (const { observer, utcMs, altitudeDeg, azimuthDeg } of cases(body)) {
      const miss = horizontalMiss(
        place(solarTarget(body), utcMs, observer).horizontal!,
        altitudeDeg,
        azimuthDeg,
      );
      altitude = Math.max(altitude, miss.altitude);
      if (Math.abs(altitudeDeg) < NEAR_ZENITH_DEG) azimuth = Math.max(azimuth, miss.azimuth);
    }
    expect(altitude).toBeLessThan(TOLERANCE[body]);
    expect(azimuth).toBeLessThan(TOLERANCE[body]);
  });

  it('of the Sun and the Moon agree also by the short way that searches take', () => {
    for (const { observer, utcMs, altitudeDeg, azimuthDeg } of cases('Sun')) {
      const miss = horizontalMiss(sunHorizontal(observer)(utcMs), altitudeDeg, azimuthDeg);
      expect(Math.max(miss.altitude, miss.azimuth)).toBeLessThan(TOLERANCE.Sun);
    }
    for (const { observer, utcMs, altitudeDeg } of cases('Moon')) {
      const altitudeRad = moonAltitude(observer)(utcMs);
      expect(horizontalMiss({ altitudeRad, azimuthRad: 0 }, altitudeDeg, 0).altitude).toBeLessThan(
        TOLERANCE.Moon,
      );
    }
  });
});
