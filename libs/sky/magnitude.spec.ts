import fc from 'fast-check';
import { toRad } from './angles';
import {
  asteroidMagnitude,
  type AxisTilt,
  cometMagnitude,
  moonMagnitude,
  planetMagnitude,
  smallBodyMagnitude,
  sunMagnitude,
} from './magnitude';
import { PLANETS } from './solarSystem';

const upright: AxisTilt = { subEarthRad: 0, subSunRad: 0 };

describe('planetMagnitude', () => {
  // Mallama and Hilton 2018, test output that the authors publish beside their program.
  test.each([
    ['Mercury', 0.413629222334, 0.92644808718613, 90.1662, 0.181],
    ['Venus', 0.721480714554, 0.37762511206278, 124.1348, -4.916],
    ['Jupiter', 4.957681473205, 3.95393078136013, 0.3431, -2.934],
  ] as const)("gives the authors' magnitude of %s", (planet, r, distance, phaseDeg, magnitude) => {
    const found = planetMagnitude(planet, r, distance, toRad(phaseDeg), upright);
    expect(Math.abs(found - magnitude)).toBeLessThanOrEqual(0.0005);
  });

  it('has its two laws of Venus meet to 0.05 mag', () => {
    const at = (deg: number) => planetMagnitude('Venus', 0.72, 0.28, toRad(deg), upright);
    expect(Math.abs(at(163.699) - at(163.701))).toBeLessThan(0.05);
  });

  it('brightens Saturn by its rings, whichever side is seen, and not by their dark side', () => {
    const at = (subEarth: number, subSun: number) =>
      planetMagnitude('Saturn', 9.5, 8.5, toRad(2), {
        subEarthRad: toRad(subEarth),
        subSunRad: toRad(subSun),
      });
    expect(at(26, 26)).toBeCloseTo(at(-26, -26), 12);
    // 1.825 sin 26 and 0.378 sin 26 exp(-2.25 x 2), by hand from the published law.
    expect(at(0, 0) - at(26, 26)).toBeCloseTo(0.80003 + 0.00184, 4);
    expect(at(1, -1)).toBe(at(0, 0));
  });

  it('goes by the inverse square of both distances', () => {
    const distance = fc.double({ min: 0.1, max: 40, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...PLANETS), distance, distance, (planet, r, delta) => {
        const near = planetMagnitude(planet, r, delta, 0.05, upright);
        expect(planetMagnitude(planet, 10 * r, delta, 0.05, upright) - near).toBeCloseTo(5, 9);
        expect(planetMagnitude(planet, r, 10 * delta, 0.05, upright) - near).toBeCloseTo(5, 9);
      }),
    );
  });
});

describe('cometMagnitude', () => {
  it('follows the total magnitude law', () => {
    // 10 + 5 log 0.824281 + 10 log 0.652575 = 10 - 0.41962 - 1.85370, by hand.
    const law = { kind: 'comet', absoluteMagnitude: 10, activity: 4 } as const;
    expect(cometMagnitude(law, 0.652575, 0.824281)).toBeCloseTo(7.7267, 4);
  });

  it('comes with a magnitude either way', () => {
    const law = { kind: 'comet', absoluteMagnitude: 6, activity: 4 } as const;
    const { magnitude, range } = smallBodyMagnitude(law, 1, 1, 0.5);
    expect(magnitude).toBe(6);
    expect(range).toEqual([5, 7]);
  });
});

describe('asteroidMagnitude', () => {
  it('is H at unit distances and full phase, whatever the slope', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.6, noNaN: true }), (slope) => {
        expect(asteroidMagnitude(7.3, slope, 1, 1, 0)).toBeCloseTo(7.3, 12);
      }),
    );
  });

  // Bowell et al. 1989, the short form of the same law: phi = exp(-A tan^B), which the full form meets to
  // 0.05 mag from 1 degree on.
  it('agrees with the short form of the law to 0.05 mag', () => {
    for (const slope of [0.12, 0.15, 0.25]) {
      for (let deg = 1; deg <= 120; deg++) {
        const half = Math.tan(toRad(deg) / 2);
        const phi1 = Math.exp(-3.33 * half ** 0.63);
        const phi2 = Math.exp(-1.87 * half ** 1.22);
        const short = -2.5 * Math.log10((1 - slope) * phi1 + slope * phi2);
        expect(Math.abs(asteroidMagnitude(0, slope, 1, 1, toRad(deg)) - short)).toBeLessThan(0.05);
      }
    }
  });

  it('has the magnitude of Ceres that libastro gives', () => {
    // libastro 4.1.4, short form: H 3.34, G 0.12, r 2.97706, Delta 2.55825, phase 19.309: 8.76.
    expect(Math.abs(asteroidMagnitude(3.34, 0.12, 2.97706, 2.55825, toRad(19.309)) - 8.76)).toBeLessThan(
      0.03,
    );
  });

  it('fades with phase', () => {
    let before = -Infinity;
    for (let deg = 0; deg <= 120; deg += 0.25) {
      const magnitude = asteroidMagnitude(0, 0.15, 1, 1, toRad(deg));
      expect(magnitude).toBeGreaterThan(before);
      before = magnitude;
    }
  });
});

describe('moonMagnitude and sunMagnitude', () => {
  const meanDistanceAu = 384_400 / 149_597_870.7;

  it('have the published brightness at mean distance', () => {
    // Allen, Astrophysical Quantities: full Moon -12.73; V = 0.026 a + 4e-9 a^4: at 90 degrees 2.60 fainter.
    expect(moonMagnitude(1, meanDistanceAu, 0)).toBeCloseTo(-12.73, 12);
    expect(moonMagnitude(1, meanDistanceAu, Math.PI / 2) + 12.73).toBeCloseTo(2.34 + 0.26244, 6);
    // Willmer 2018, Astrophysical Journal Supplement 236, 47: V = -26.76 (Vega system).
    expect(sunMagnitude(1)).toBe(-26.76);
  });

  it('make the nearer Moon brighter and the farther Sun fainter', () => {
    expect(moonMagnitude(1, 0.93 * meanDistanceAu, 0)).toBeLessThan(moonMagnitude(1, meanDistanceAu, 0));
    expect(sunMagnitude(1.0167) - sunMagnitude(0.9833)).toBeCloseTo(5 * Math.log10(1.0167 / 0.9833), 12);
  });
});
