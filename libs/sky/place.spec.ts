import fc from 'fast-check';
import { ARCMIN, ARCSEC, HOUR, toDeg, toRad, wrapPi } from './angles';
import { positionAngle, subLatitude } from './appearance';
import { type Observer } from './observer';
import { type Direction, heliocentric, horizontalPlace, place, whenLightLeft } from './place';
import { earthState, poleOf, type SolarBody, SOLAR_BODIES } from './solarSystem';
import { type OrbitTarget, type SkyTarget, type SolarSystemTarget } from './target';
import { ttJdToUtcMs } from './time';
import { fromSpherical, separation } from './vector';

const solar = (body: SolarBody): SolarSystemTarget => ({ kind: 'solarSystem', name: body, body });
const miss = (found: Direction, raRad: number, decRad: number) =>
  separation(fromSpherical(found.raRad, found.decRad), fromSpherical(raRad, decRad)) / ARCSEC;
const sexagesimal = (whole: number, minutes: number, seconds: number) =>
  whole + minutes / 60 + seconds / 3600;

// Worked examples of Meeus, Astronomical Algorithms (2nd ed.), their dates in TT.
describe('apparent place', () => {
  it('of the Sun agrees with example 25.b', () => {
    // 1992 Oct 13.0: 13h13m30.749s, -7d47'01.74".
    const found = place(solar('Sun'), ttJdToUtcMs(2_448_908.5), null).apparent;
    const arcsec = miss(found, sexagesimal(13, 13, 30.749) * HOUR, toRad(-sexagesimal(7, 47, 1.74)));
    expect(arcsec).toBeLessThan(2.5);
  });

  it('of the Moon agrees with example 47.a', () => {
    // 1992 Apr 12.0: 134.688470, +13.768368 degrees, 368409.7 km; the theory is good to 10 arcsec.
    const found = place(solar('Moon'), ttJdToUtcMs(2_448_724.5), null);
    expect(miss(found.apparent, toRad(134.68847), toRad(13.768368))).toBeLessThan(10);
    expect(Math.abs(found.distanceAu! * 149_597_870.7 - 368_409.7)).toBeLessThan(20);
  });

  it('of Venus agrees with example 33.a', () => {
    // 1992 Dec 20.0: 21h04m41.454s, -18d53'16.84".
    const found = place(solar('Venus'), ttJdToUtcMs(2_448_976.5), null);
    const arcsec = miss(
      found.apparent,
      sexagesimal(21, 4, 41.454) * HOUR,
      toRad(-sexagesimal(18, 53, 16.84)),
    );
    expect(arcsec).toBeLessThan(20);
    // Example 41.a, the same instant: lit fraction 0.647.
    expect(found.illuminatedFraction).toBeCloseTo(0.647, 3);
  });

  it('of Mars is shifted by parallax as in example 40.a', () => {
    // 2003 Aug 28, 3h17m UT, at Palomar: +1.29s in right ascension, -14.1" in declination.
    const utcMs = Date.parse('2003-08-28T03:17:00Z');
    const palomar: Observer = {
      latitudeRad: toRad(sexagesimal(33, 21, 22)),
      longitudeRad: -7.790_833_33 * HOUR,
      elevationM: 1706,
    };
    const centre = place(solar('Mars'), utcMs, null).apparent;
    const seen = place(solar('Mars'), utcMs, palomar).apparent;
    expect((wrapPi(seen.raRad - centre.raRad) / HOUR) * 3600).toBeCloseTo(1.29, 1);
    expect((seen.decRad - centre.decRad) / ARCSEC).toBeCloseTo(-14.1, 0);
  });
});

describe('look', () => {
  it("has the Moon's phase of example 48.a", () => {
    // 1992 Apr 12.0 TT: phase angle 69.0756, lit fraction 0.6786, bright limb 285.0.
    const utcMs = ttJdToUtcMs(2_448_724.5);
    const moon = place(solar('Moon'), utcMs, null);
    const sun = place(solar('Sun'), utcMs, null);
    expect(Math.abs(toDeg(moon.phaseAngleRad!) - 69.0756)).toBeLessThan(41 / 3600);
    // Ours is the angle between the paths that the light took; aberration at both ends moves it by up to 41".
    expect(Math.abs(moon.illuminatedFraction! - 0.6786)).toBeLessThan(0.0002);
    const limb = positionAngle(
      moon.apparent.raRad,
      moon.apparent.decRad,
      sun.apparent.raRad,
      sun.apparent.decRad,
    );
    expect(toDeg(limb)).toBeCloseTo(285, 1);
  });

  it("tilts Saturn's rings as in example 45.a", () => {
    // 1992 Dec 16.0 TT: B = 16.442, B' = 14.679 degrees.
    const utcMs = ttJdToUtcMs(2_448_972.5);
    const earth = earthState(utcMs).position;
    const saturn = whenLightLeft((ms) => heliocentric(solar('Saturn'), ms), earth, utcMs);
    const pole = poleOf('Saturn', utcMs);
    expect(Math.abs(toDeg(subLatitude(pole, saturn, earth)) - 16.442)).toBeLessThan(0.02);
    expect(Math.abs(toDeg(subLatitude(pole, saturn, [0, 0, 0])) - 14.679)).toBeLessThan(0.02);
  });

  it('turns the tail of a comet away from the Sun', () => {
    // Elements and date of example 33.b; position angle of the Sun computed with ERFA (pas): 123.248.
    const comet: OrbitTarget = {
      kind: 'orbit',
      name: 'example 33.b',
      elements: {
        perihelionDistanceAu: 2.2091404 * (1 - 0.8502196),
        eccentricity: 0.8502196,
        inclinationRad: toRad(11.94524),
        nodeRad: toRad(334.75006),
        argumentOfPerihelionRad: toRad(186.23352),
        perihelionTtJd: 2_448_193.04502,
        epochTtJd: null,
      },
      brightness: { kind: 'comet', absoluteMagnitude: 10, activity: 4 },
      comaArcmin: 6,
    };
    const utcMs = ttJdToUtcMs(2_448_170.5);
    const found = place(comet, utcMs, null);
    const sun = place(solar('Sun'), utcMs, null).astrometric;
    const { raRad, decRad } = found.astrometric;
    expect(Math.abs(toDeg(positionAngle(raRad, decRad, sun.raRad, sun.decRad)) - 123.248)).toBeLessThan(
      0.005,
    );
    // Meeus gives r = 0.652475 and Delta = 0.824280 for the instant; the law is 10 + 5 log Delta + 10 log r.
    expect(found.magnitude).toBeCloseTo(7.73, 2);
    expect(found.angularDiameterRad).toBeCloseTo(6 * ARCMIN, 12);
  });

  // Extremes as almanacs and planetary fact sheets round them (from memory), arcsec, equatorial.
  test.each([
    ['Sun', 1886, 1953],
    ['Moon', 1761, 2011],
    ['Mercury', 4.5, 13],
    ['Venus', 9.5, 66],
    ['Mars', 3.4, 25.7],
    ['Jupiter', 30.4, 50.2],
    ['Saturn', 14.5, 20.8],
    ['Uranus', 3.3, 4.1],
    ['Neptune', 2.1, 2.4],
  ] as const)(
    'keeps the diameter of %s in its known range, and goes over most of it',
    (body, least, most) => {
      const diameters = Array.from({ length: 300 }, (_, i) => {
        const utcMs = Date.parse('2026-01-01T00:00:00Z') + i * 7.22 * 86_400_000;
        return place(solar(body), utcMs, null).angularDiameterRad! / ARCSEC;
      });
      const [smallest, largest] = [Math.min(...diameters), Math.max(...diameters)];
      expect(smallest).toBeGreaterThan(least);
      expect(largest).toBeLessThan(most);
      expect(largest / smallest).toBeGreaterThan(1 + 0.2 * (most / least - 1));
    },
  );
});

describe('horizontalPlace', () => {
  it("agrees with Meeus's example 13.b", () => {
    // Venus, 1987 Apr 10, 19h21m UT, Washington, hour angle 64.352133: azimuth 68.0337 from south, altitude
    // 15.1249.
    const ofDate = fromSpherical(toRad(347.3193375), toRad(-6.719892));
    const localSidereal = toRad(347.3193375 + 64.352133);
    const found = horizontalPlace(ofDate, localSidereal, toRad(sexagesimal(38, 55, 17)));
    expect(Math.abs(toDeg(found.azimuthRad) - 248.0337)).toBeLessThan(1e-4);
    expect(Math.abs(toDeg(found.altitudeRad) - 15.1249)).toBeLessThan(1e-4);
  });

  it('puts the pole at the latitude, due north or below the south', () => {
    for (const deg of [-69, -30, 10, 69]) {
      const found = horizontalPlace([0, 0, 1], 1.234, toRad(deg));
      expect(toDeg(found.altitudeRad)).toBeCloseTo(deg, 12);
      expect(Math.sin(found.azimuthRad / 2)).toBeCloseTo(0, 12);
    }
  });

  it('is a rotation: it keeps the angle between any two directions', () => {
    const lon = fc.double({ min: 0, max: 2 * Math.PI, noNaN: true });
    const lat = fc.double({ min: -Math.PI / 2, max: Math.PI / 2, noNaN: true });
    fc.assert(
      fc.property(lon, lat, lon, lat, lon, lat, (ra1, dec1, ra2, dec2, sidereal, latitude) => {
        const [a, b] = [fromSpherical(ra1, dec1), fromSpherical(ra2, dec2)];
        const [up1, up2] = [a, b].map((v) => horizontalPlace(v, sidereal, latitude));
        const before = separation(a, b);
        // Azimuth runs the other way round than right ascension; the angle between does not care.
        const after = separation(
          fromSpherical(up1!.azimuthRad, up1!.altitudeRad),
          fromSpherical(up2!.azimuthRad, up2!.altitudeRad),
        );
        expect(Math.abs(after - before)).toBeLessThan(1e-12);
      }),
    );
  });
});

describe('place', () => {
  const sites = fc.record({
    latitudeRad: fc.double({ min: -1.2, max: 1.2, noNaN: true }),
    longitudeRad: fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }),
    elevationM: fc.double({ min: 0, max: 4000, noNaN: true }),
  });
  const instants = fc.integer({ min: Date.parse('2026-01-01T00:00Z'), max: Date.parse('2031-12-31T00:00Z') });

  it('differs between observer and centre by no more than the parallax', () => {
    fc.assert(
      fc.property(fc.constantFrom(...SOLAR_BODIES), sites, instants, (body, observer, utcMs) => {
        const centre = place(solar(body), utcMs, null);
        const seen = place(solar(body), utcMs, observer);
        const shift = miss(seen.apparent, centre.apparent.raRad, centre.apparent.decRad);
        // 8.794 arcsec at 1 au (IAU 1976), a little more from a mountain.
        expect(shift).toBeLessThan((8.794 * 1.001) / Math.min(seen.distanceAu!, centre.distanceAu!));
        expect(Math.abs(seen.distanceAu! - centre.distanceAu!)).toBeLessThan(4.3e-5);
      }),
      { numRuns: 60 },
    );
  });

  it('leaves out what has no meaning for the target', () => {
    const star: SkyTarget = {
      kind: 'fixed',
      name: 'a star',
      raRad: 1,
      decRad: 0.5,
      magnitude: 2.5,
      majorArcmin: 0,
      minorArcmin: 0,
    };
    const utcMs = Date.parse('2027-03-01T20:00:00Z');
    expect(place(star, utcMs, null)).toMatchObject({
      horizontal: null,
      distanceAu: null,
      sunDistanceAu: null,
      phaseAngleRad: null,
      illuminatedFraction: null,
      angularDiameterRad: null,
      magnitude: 2.5,
      magnitudeRange: [2.5, 2.5],
    });
    expect(place({ ...star, majorArcmin: 90 }, utcMs, null).angularDiameterRad).toBeCloseTo(
      1.5 * (Math.PI / 180),
      12,
    );
    expect(place(solar('Sun'), utcMs, null)).toMatchObject({ phaseAngleRad: null, elongationRad: 0 });
  });
});
