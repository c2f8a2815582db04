import fc from 'fast-check';
import { ARCSEC, toDeg, toRad } from './angles';
import {
  angularDiameter,
  illuminatedFraction,
  parallacticAngle,
  phaseAngle,
  positionAngle,
  subLatitude,
} from './appearance';
import { KM_PER_AU } from './observer';
import { RADIUS_KM } from './solarSystem';
import { cross, dot, fromSpherical, norm, scale, separation, subtract, unit } from './vector';

const lon = fc.double({ min: 0, max: 2 * Math.PI, noNaN: true });
const lat = fc.double({ min: -1.55, max: 1.55, noNaN: true });

describe('positionAngle', () => {
  it('of Spica from Arcturus agrees with ERFA', () => {
    // ERFA 2.0.0, pas, on the places of Meeus's example 17.a: 203.3084 degrees.
    const found = positionAngle(toRad(213.9154), toRad(19.1825), toRad(201.2983), toRad(-11.1614));
    expect(Math.abs(toDeg(found) - 203.3084)).toBeLessThan(1e-4);
  });

  it('runs from north through east', () => {
    expect(toDeg(positionAngle(1, 0, 1, 0.01))).toBeCloseTo(0, 9);
    expect(toDeg(positionAngle(1, 0, 1.01, 0))).toBeCloseTo(90, 9);
    expect(toDeg(positionAngle(1, 0, 1, -0.01))).toBeCloseTo(180, 9);
    expect(toDeg(positionAngle(0.005, 0, -0.005, 0))).toBeCloseTo(270, 9);
  });

  it('leads to the other place along a great circle', () => {
    fc.assert(
      fc.property(lon, lat, lon, lat, (ra1, dec1, ra2, dec2) => {
        const from = fromSpherical(ra1, dec1);
        const to = fromSpherical(ra2, dec2);
        const away = separation(from, to);
        fc.pre(away > 1e-4 && away < Math.PI - 1e-4);
        const angle = positionAngle(ra1, dec1, ra2, dec2);
        const east = unit(cross([0, 0, 1], from));
        const north = cross(from, east);
        const towards = unit(subtract(to, scale(from, dot(from, to))));
        expect(Math.cos(angle)).toBeCloseTo(dot(towards, north), 9);
        expect(Math.sin(angle)).toBeCloseTo(dot(towards, east), 9);
      }),
    );
  });
});

describe('parallacticAngle', () => {
  it('agrees with ERFA', () => {
    // ERFA 2.0.0, hd2pa: hour angle 30, declination 10, latitude 45 degrees: 30.9307.
    expect(Math.abs(toDeg(parallacticAngle(toRad(30), toRad(10), toRad(45))) - 30.9307)).toBeLessThan(1e-4);
  });

  it('is the position angle of the zenith', () => {
    fc.assert(
      fc.property(lon, lat, lat, (hourAngle, dec, latitude) => {
        const zenith = positionAngle(-hourAngle, dec, 0, latitude);
        const found = parallacticAngle(hourAngle, dec, latitude);
        expect(Math.abs(Math.sin((zenith - found) / 2))).toBeLessThan(1e-9);
      }),
    );
  });
});

describe('phaseAngle and illuminatedFraction', () => {
  it("agree with Meeus's example 48.a, the Moon", () => {
    // Meeus (2nd ed.) example 48.a, 1992 Apr 12.0 TT: places of Moon and Sun, phase angle and lit fraction.
    const moon = fromSpherical(toRad(134.6885), toRad(13.7684), 368_410);
    const sun = fromSpherical(toRad(20.6579), toRad(8.6964), 149_971_520);
    const angle = phaseAngle(subtract(moon, sun), moon);
    expect(Math.abs(toDeg(angle) - 69.0756)).toBeLessThan(2e-4);
    expect(illuminatedFraction(angle)).toBeCloseTo(0.6786, 4);
    const limb = positionAngle(toRad(134.6885), toRad(13.7684), toRad(20.6579), toRad(8.6964));
    expect(toDeg(limb)).toBeCloseTo(285, 1);
  });

  it('give the lit share of a cut disc', () => {
    expect(illuminatedFraction(0)).toBe(1);
    expect(illuminatedFraction(Math.PI / 2)).toBeCloseTo(0.5, 15);
    expect(illuminatedFraction(Math.PI)).toBe(0);
  });
});

describe('angularDiameter', () => {
  // Meeus (2nd ed.), chapter 55, from memory: semidiameters at 1 au, arcsec, equatorial; since then the
  // adopted radii have moved by up to 0.7%.
  test.each([
    ['Sun', 959.63, 0.001],
    ['Mercury', 3.36, 0.003],
    ['Mars', 4.68, 0.003],
    ['Jupiter', 98.44, 0.003],
    ['Saturn', 82.73, 0.006],
    ['Uranus', 35.02, 0.008],
  ] as const)('has the semidiameter of %s at 1 au', (body, arcsec, share) => {
    const found = angularDiameter(RADIUS_KM[body] / KM_PER_AU, 1) / 2 / ARCSEC;
    expect(Math.abs(found / arcsec - 1)).toBeLessThan(share);
  });

  it('never exceeds half a turn, and is exact for a near sphere', () => {
    expect(angularDiameter(1, 2)).toBeCloseTo(Math.PI / 3, 15);
    expect(angularDiameter(1, 1)).toBe(Math.PI);
    expect(angularDiameter(1, 0.5)).toBe(Math.PI);
  });
});

describe('subLatitude', () => {
  it('is the height of the viewer over the equator', () => {
    const pole = fromSpherical(0.4, 1.1);
    const planet = fromSpherical(2, 0.1, 9);
    expect(subLatitude(pole, planet, subtract(planet, scale(pole, -2)))).toBeCloseTo(Math.PI / 2, 7);
    const equatorial = unit(cross(pole, planet));
    expect(subLatitude(pole, planet, subtract(planet, equatorial))).toBeCloseTo(0, 12);
    expect(norm(pole)).toBeCloseTo(1, 15);
  });
});
