import { heliocentricState, planeState, eclipticToEquatorial, type OrbitalElements } from './orbit';
import { ARCSEC, HOUR, toDeg, toRad } from './angles';
import { type OrbitTarget } from './target';
import { place } from './place';
import { ttJdToUtcMs } from './time';
import { fromSpherical, separation } from './vector';

const anomaly = (q: number, e: number, days: number) => {
  const { x, y, radius } = planeState(q, e, days);
  const nu = toDeg(Math.atan2(y, x));
  return { nu: nu < 0 ? nu + 360 : nu, radius };
};

describe('planeState', () => {
  // Meeus, Astronomical Algorithms (2nd ed.), chapter 35, p. 247, and example 34.a: one in the last digit.
  test.each([
    [0.921326, 1, 138.4783, 102.74426, 2.364192],
    [0.1, 0.987, 254.9, 164.50029, 4.063777],
    [0.123456, 0.99997, -30.47, 221.9119, 0.965053],
    [3.363943, 1.05731, 1237.1, 109.40598, 10.668551],
    [0.5871018, 0.9672746, 20, 52.85331, 0.729116],
    [1.487469, 1, 112.5642, 66.78862, 2.133911],
  ])('agrees with Meeus for q %d, e %d, %d days', (q, e, days, nu, radius) => {
    const found = anomaly(q, e, days);
    expect(Math.abs(found.nu - nu)).toBeLessThan(1.01e-5);
    expect(Math.abs(found.radius - radius)).toBeLessThan(1.01e-6);
  });

  // Computed with 60-digit arithmetic beside METHODS: the hyperbola, the sungrazer and the far near-parabola.
  test.each([
    [2.006521, 3.356191, 200, 75.5864667, 4.762286311],
    [0.005553, 0.999925, 10, 167.9796554, 0.504807471],
    [1, 0.99999, 1.7e7, 178.6758989, 7219.66644],
  ])('keeps its digits for q %d, e %d, %d days', (q, e, days, nu, radius) => {
    const found = anomaly(q, e, days);
    expect(Math.abs(found.nu - nu)).toBeLessThan(1e-7);
    expect(Math.abs(found.radius / radius - 1)).toBeLessThan(1e-9);
  });

  it('starts at perihelion and is even in time', () => {
    expect(planeState(0.7, 0.3, 0)).toMatchObject({ x: 0.7, y: 0, radius: 0.7 });
    const before = planeState(0.7, 1.1, -33);
    const after = planeState(0.7, 1.1, 33);
    expect(before.x).toBe(after.x);
    expect(before.y).toBe(-after.y);
  });
});

describe('heliocentricState', () => {
  it("gives JPL's place of Ceres from equatorial elements", () => {
    // JPL Horizons, JD 2458886.5 TDB, as quoted in the tests of the Skyfield library.
    const a = 2.768873850275102;
    const e = 0.07705857791518426;
    const mean = toRad(138.2501360489816);
    const mu = 2.9591220828559093e-4;
    const elements: OrbitalElements = {
      perihelionDistanceAu: a * (1 - e),
      eccentricity: e,
      inclinationRad: toRad(27.18528770987308),
      nodeRad: toRad(23.36112629072238),
      argumentOfPerihelionRad: toRad(132.8964361683606),
      perihelionTtJd: 2458886.5 - mean / Math.sqrt(mu / a ** 3),
      epochTtJd: 2458886.5,
    };
    const { position } = heliocentricState(elements, 2458886.5);
    [1.33898182, -2.24634734, -1.33185153].forEach((expected, axis) => {
      expect(Math.abs(position[axis]! - expected)).toBeLessThan(1.5e-8);
    });
  });
});

describe('place of a comet', () => {
  it("agrees with Meeus's example 33.b", () => {
    // Meeus (2nd ed.) example 33.b, 1990 Oct 6.0 TT.
    const comet: OrbitTarget = {
      kind: 'orbit',
      name: 'example 33.b',
      elements: {
        perihelionDistanceAu: 2.2091404 * (1 - 0.8502196),
        eccentricity: 0.8502196,
        inclinationRad: toRad(11.94524),
        nodeRad: toRad(334.75006),
        argumentOfPerihelionRad: toRad(186.23352),
        perihelionTtJd: 2448192.5 + 0.54502,
        epochTtJd: null,
      },
      brightness: null,
      comaArcmin: 0,
    };
    const seen = place(comet, ttJdToUtcMs(2448170.5), null);
    const published = fromSpherical((10 + 34 / 60 + 14.2 / 3600) * HOUR, toRad(19 + 9 / 60 + 31 / 3600));
    const found = fromSpherical(seen.astrometric.raRad, seen.astrometric.decRad);
    // The Earth's own place comes from a shortened planetary theory, good to 2 arcsec.
    expect(separation(found, published) / ARCSEC).toBeLessThan(2);
    expect(toDeg(seen.elongationRad)).toBeCloseTo(40.51, 1);
  });
});

describe('eclipticToEquatorial', () => {
  it('uses the obliquity of IAU 1976', () => {
    expect(eclipticToEquatorial([0, 1, 0])[2]).toBeCloseTo(0.397777155932, 11);
    expect(eclipticToEquatorial([0, 1, 0])[1]).toBeCloseTo(0.917482062069, 11);
  });
});
