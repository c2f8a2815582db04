import fc from 'fast-check';
import { ARCMIN, DEG, toRad } from './angles';
import { refractionApparentToTrue, refractionTrueToApparent } from './refraction';

const altitude = (minDeg: number) => fc.double({ min: minDeg, max: 90, noNaN: true }).map((deg) => deg * DEG);

describe('refraction', () => {
  it("agrees with Meeus's example 16.a", () => {
    // Meeus (2nd ed.) example 16.a: apparent 0.5 degrees 28.754'; true 33.246' 24.618'.
    expect(refractionApparentToTrue(toRad(0.5)) / ARCMIN).toBeCloseTo(28.754, 3);
    expect(refractionTrueToApparent(33.246 * ARCMIN) / ARCMIN).toBeCloseTo(24.618, 3);
  });

  it('lifts the horizon by the conventional 34 arcmin, to half of one', () => {
    // 34' is the Astronomical Almanac's constant for rising and setting.
    expect(Math.abs(refractionApparentToTrue(0) / ARCMIN - 34)).toBeLessThan(0.5);
  });

  it('is never negative, and nothing at the zenith', () => {
    fc.assert(
      fc.property(altitude(-90), (rad) => {
        expect(refractionTrueToApparent(rad)).toBeGreaterThanOrEqual(0);
        expect(refractionApparentToTrue(rad)).toBeGreaterThanOrEqual(0);
      }),
    );
    expect(refractionTrueToApparent(Math.PI / 2) / ARCMIN).toBeLessThan(0.01);
  });

  it('keeps the order of altitudes, below the horizon too', () => {
    fc.assert(
      fc.property(altitude(-90), fc.double({ min: 0.001, max: 5, noNaN: true }), (low, moreDeg) => {
        const high = low + moreDeg * DEG;
        fc.pre(high <= Math.PI / 2);
        expect(high + refractionTrueToApparent(high)).toBeGreaterThan(low + refractionTrueToApparent(low));
      }),
    );
  });

  it('there and back are consistent to 0.1 arcmin above the horizon', () => {
    // Meeus, chapter 16: the two formulas are consistent to within 0.1 arcmin.
    fc.assert(
      fc.property(altitude(0), (rad) => {
        const apparent = rad + refractionTrueToApparent(rad);
        const back = apparent - refractionApparentToTrue(apparent);
        expect(Math.abs(back - rad) / ARCMIN).toBeLessThan(0.1);
      }),
    );
  });
});
