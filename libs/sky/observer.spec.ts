import fc from 'fast-check';
import { toRad } from './angles';
import { axialDistances, KM_PER_AU, type Observer, observerVector } from './observer';
import { norm } from './vector';

const anyObserver = fc.record({
  latitudeRad: fc.double({ min: -Math.PI / 2, max: Math.PI / 2, noNaN: true }),
  longitudeRad: fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }),
  elevationM: fc.double({ min: -400, max: 9000, noNaN: true }),
});

describe('axialDistances', () => {
  it("agrees with Meeus's example 11.a", () => {
    // Meeus (2nd ed.) example 11.a: latitude 33d21'22", 1706 m; in radii of 6378.14 km.
    const { fromAxis, fromEquator } = axialDistances({
      latitudeRad: toRad(33 + 21 / 60 + 22 / 3600),
      longitudeRad: toRad(-116.8625),
      elevationM: 1706,
    });
    expect(Math.abs((fromEquator * KM_PER_AU) / 6378.14 - 0.546861)).toBeLessThan(1e-6);
    expect(Math.abs((fromAxis * KM_PER_AU) / 6378.14 - 0.836339)).toBeLessThan(1e-6);
  });

  it('has the radii of WGS84 at the equator and the pole', () => {
    const at = (latitudeRad: number) => axialDistances({ latitudeRad, longitudeRad: 0, elevationM: 0 });
    expect(at(0).fromAxis * KM_PER_AU).toBeCloseTo(6378.137, 9);
    expect(at(0).fromEquator).toBe(0);
    // WGS84 polar radius, NIMA TR8350.2.
    expect(at(Math.PI / 2).fromEquator * KM_PER_AU).toBeCloseTo(6356.7523142, 6);
    expect(at(-Math.PI / 2).fromEquator * KM_PER_AU).toBeCloseTo(-6356.7523142, 6);
  });
});

describe('observerVector', () => {
  it('lies on the ellipsoid, as high above it as the observer, and turns with the sidereal angle', () => {
    fc.assert(
      fc.property(anyObserver, fc.double({ min: -10, max: 10, noNaN: true }), (observer: Observer, angle) => {
        const [x, y, z] = observerVector(observer, angle);
        const { fromAxis, fromEquator } = axialDistances(observer);
        expect(Math.hypot(x, y)).toBeCloseTo(fromAxis, 15);
        expect(z).toBe(fromEquator);
        expect(x * Math.sin(angle) - y * Math.cos(angle)).toBeCloseTo(0, 15);
        const km = norm([x, y, z]) * KM_PER_AU;
        expect(km).toBeGreaterThan(6356.7 - 0.401);
        expect(km).toBeLessThan(6378.2 + 9.001);
      }),
    );
  });
});
