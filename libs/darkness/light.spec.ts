import { DEG } from '#sky';
import { type AltitudeOf } from './crossings';
import { eveningLight } from './light';

const HOUR = 3_600_000;
const DAY = 24 * HOUR;
const FROM = Date.UTC(2027, 2, 1, 12);

/** A body at a fixed declination that culminates `lateHours` after the interval begins. */
function circling(latitudeDeg: number, declinationDeg: number, lateHours = 0, periodHours = 24): AltitudeOf {
  const [lat, dec] = [latitudeDeg * DEG, declinationDeg * DEG];
  return (utcMs) => {
    const angle = (2 * Math.PI * ((utcMs - FROM) / HOUR - lateHours)) / periodHours;
    return Math.asin(Math.sin(lat) * Math.sin(dec) + Math.cos(lat) * Math.cos(dec) * Math.cos(angle));
  };
}

/** The hour at which that body sinks through an altitude, from the closed formula. */
function setsAfter(latitudeDeg: number, declinationDeg: number, altitudeDeg: number): number {
  const [lat, dec, alt] = [latitudeDeg * DEG, declinationDeg * DEG, altitudeDeg * DEG];
  const cosine = (Math.sin(alt) - Math.sin(lat) * Math.sin(dec)) / (Math.cos(lat) * Math.cos(dec));
  return (Math.acos(cosine) / (2 * Math.PI)) * 24;
}

const never: AltitudeOf = () => -40 * DEG;
const semidiameter: AltitudeOf = () => 0.26 * DEG;

describe('eveningLight', () => {
  it('finds every crossing where the closed formula puts it', () => {
    const light = eveningLight(circling(47, -8), never, semidiameter, FROM, FROM + DAY);
    const expected = [-0.8333, -6, -12, -18].map((level) => setsAfter(47, -8, level) * HOUR);
    const dusks = [light.sunset, light.civilDusk, light.nauticalDusk, light.astronomicalDusk];
    const dawns = [light.sunrise, light.civilDawn, light.nauticalDawn, light.astronomicalDawn];
    expected.forEach((after, i) => {
      expect(Math.abs(dusks[i]! - FROM - after)).toBeLessThan(20);
      expect(Math.abs(dawns[i]! - (FROM + DAY - after))).toBeLessThan(20);
    });
    expect(light.moonrise).toBeNull();
    expect(light.moonset).toBeNull();
    expect(light.darkMinutes).toBeCloseTo((DAY - 2 * expected[3]!) / 60_000, 2);
  });

  it('says null for the midnight sun, the polar night and a night without full darkness', () => {
    const midnightSun = eveningLight(circling(70, 22), never, semidiameter, FROM, FROM + DAY);
    expect(midnightSun).toMatchObject({ sunset: null, civilDusk: null, sunrise: null, darkMinutes: 0 });

    const polarNight = eveningLight(circling(70, -23), never, semidiameter, FROM, FROM + DAY);
    expect(polarNight).toMatchObject({ sunset: null, sunrise: null });
    expect(polarNight.civilDusk).not.toBeNull();
    expect(polarNight.astronomicalDawn).not.toBeNull();

    const lightNight = eveningLight(circling(55, 20), never, semidiameter, FROM, FROM + DAY);
    expect(lightNight).toMatchObject({ astronomicalDusk: null, astronomicalDawn: null, darkMinutes: 0 });
    expect(lightNight.nauticalDusk).not.toBeNull();
  });

  it('counts a Sun that never comes near the horizon as darkness all round', () => {
    const light = eveningLight(() => -30 * DEG, never, semidiameter, FROM, FROM + DAY);
    expect(light.darkMinutes).toBe(1440);
    expect(light.astronomicalDusk).toBeNull();
  });

  it('takes the Moon at its upper limb', () => {
    const moon = circling(40, 10, 30, 24.84);
    const light = eveningLight(() => -30 * DEG, moon, semidiameter, FROM, FROM + DAY);
    expect(moon(light.moonrise!) / DEG).toBeCloseTo(-0.5667 - 0.26, 6);
    expect(moon(light.moonrise! + 60_000)).toBeGreaterThan(moon(light.moonrise!));
    expect(moon(light.moonset!) / DEG).toBeCloseTo(-0.5667 - 0.26, 6);
    expect(light.moonset! < light.moonrise!).toBe(true);
    expect(light.darkMinutes).toBeCloseTo((light.moonrise! - light.moonset!) / 60_000, 6);
  });

  it('measures darkness the Moon splits in two', () => {
    // Up for the two hours around midnight only: a body that just clears the horizon.
    const moon = circling(60, -29, 12);
    const sun = circling(60, -15);
    const light = eveningLight(sun, moon, semidiameter, FROM, FROM + DAY);
    const night = light.astronomicalDawn! - light.astronomicalDusk!;
    const up = light.moonset! - light.moonrise!;
    expect(light.moonrise!).toBeGreaterThan(light.astronomicalDusk!);
    expect(light.moonset!).toBeLessThan(light.astronomicalDawn!);
    expect(light.darkMinutes).toBeCloseTo((night - up) / 60_000, 6);
  });
});
