import { localSky, positionAngle } from './horizon';

const degree = Math.PI / 180;
const arcsec = degree / 3600;

/**
 * Altitude and azimuth worked another way: precession by the angles of Lieske 1977 (IAU 1976), Greenwich mean
 * sidereal time and the horizon formulas of Meeus, Astronomical Algorithms, 2nd edition, 12.4, 13.5 and 13.6.
 */
function byHand(raRad: number, decRad: number, utcMs: number, latitude: number, longitude: number) {
  const jd = utcMs / 86400000 + 2440587.5;
  const t = (jd - 2451545) / 36525;
  const zeta = (2306.2181 * t + 0.30188 * t * t + 0.017998 * t ** 3) * arcsec;
  const z = (2306.2181 * t + 1.09468 * t * t + 0.018203 * t ** 3) * arcsec;
  const theta = (2004.3109 * t - 0.42665 * t * t - 0.041833 * t ** 3) * arcsec;
  const a = Math.cos(decRad) * Math.sin(raRad + zeta);
  const b = Math.cos(theta) * Math.cos(decRad) * Math.cos(raRad + zeta) - Math.sin(theta) * Math.sin(decRad);
  const c = Math.sin(theta) * Math.cos(decRad) * Math.cos(raRad + zeta) + Math.cos(theta) * Math.sin(decRad);
  const ra = Math.atan2(a, b) + z;
  const dec = Math.asin(c);
  const sidereal = (280.46061837 + 360.98564736629 * (jd - 2451545) + 0.000387933 * t * t) * degree;
  const hour = sidereal + longitude - ra;
  const southAzimuth = Math.atan2(
    Math.sin(hour),
    Math.cos(hour) * Math.sin(latitude) - Math.tan(dec) * Math.cos(latitude),
  );
  return {
    altitudeRad: Math.asin(
      Math.sin(latitude) * Math.sin(dec) + Math.cos(latitude) * Math.cos(dec) * Math.cos(hour),
    ),
    azimuthRad: southAzimuth + Math.PI,
  };
}

describe('localSky', () => {
  const cases: [string, number, number, number, number][] = [
    ['2027-03-14T20:45:00Z', 47, 8, 120, 20],
    ['2031-11-02T03:10:00Z', -33.9, 151.2, 6, -72],
    ['2026-12-24T22:00:00Z', 69.6, 18.9, 300, 88],
    ['2028-06-21T12:00:00Z', 0, -78.5, 0.5, 0.5],
  ];

  it.each(cases)('stands as worked by hand at %s, latitude %d', (iso, latitude, longitude, ra, dec) => {
    const utcMs = Date.parse(iso);
    const sky = localSky({ utcMs, latitudeRad: latitude * degree, longitudeRad: longitude * degree });
    const got = sky.altAz({ raRad: ra * degree, decRad: dec * degree });
    const expected = byHand(ra * degree, dec * degree, utcMs, latitude * degree, longitude * degree);
    // Nutation, which the hand formulas leave out, reaches 18 arcseconds; UT1 is taken as UTC by both.
    const allowed = 25 * arcsec;
    expect(Math.abs(got.altitudeRad - expected.altitudeRad)).toBeLessThan(allowed);
    const turn = Math.cos(got.altitudeRad) * Math.sin(got.azimuthRad - expected.azimuthRad);
    expect(Math.abs(turn)).toBeLessThan(allowed);
    expect(Math.cos(got.azimuthRad - expected.azimuthRad)).toBeGreaterThan(0);
  });

  it('finds the place at an altitude and azimuth, and back', () => {
    const sky = localSky({ utcMs: Date.UTC(2027, 2, 14, 20), latitudeRad: 0.8, longitudeRad: 0.1 });
    for (const [altitude, azimuth] of [
      [0, 0],
      [0.4, 2],
      [1.5, 6],
      [-0.3, 4],
    ] as const) {
      const back = sky.altAz(sky.placeAt(altitude, azimuth));
      expect(back.altitudeRad).toBeCloseTo(altitude, 10);
      expect(Math.cos(back.azimuthRad - azimuth)).toBeCloseTo(1, 10);
    }
  });
});

describe('positionAngle', () => {
  it('gives the published Arcturus to Spica angle (coordinates of Meeus, example 17.a; ERFA 203.3084)', () => {
    const from = { raRad: 213.9154 * degree, decRad: 19.1825 * degree };
    const to = { raRad: 201.2983 * degree, decRad: -11.1614 * degree };
    expect((positionAngle(from, to) / degree + 360) % 360).toBeCloseTo(203.3084, 3);
  });
});
