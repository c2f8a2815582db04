import fc from 'fast-check';
import { ARCMIN, ARCSEC, DEG, HOUR, toDeg, toRad, wrapPi, wrapTwoPi } from './angles';

const anyAngle = fc.double({ min: -1e4, max: 1e4, noNaN: true });

describe('units of angle', () => {
  it('nest as they should', () => {
    expect(60 * ARCMIN).toBeCloseTo(DEG, 15);
    expect(3600 * ARCSEC).toBeCloseTo(DEG, 15);
    expect(24 * HOUR).toBeCloseTo(2 * Math.PI, 14);
    expect(toRad(180)).toBe(Math.PI);
  });

  it('turn back into themselves', () => {
    fc.assert(
      fc.property(anyAngle, (angle) => {
        expect(Math.abs(toRad(toDeg(angle)) - angle)).toBeLessThanOrEqual(1e-15 * Math.abs(angle));
      }),
    );
  });
});

describe('wrapTwoPi and wrapPi', () => {
  it('keep to their ranges and to the same direction', () => {
    fc.assert(
      fc.property(anyAngle, (angle) => {
        const positive = wrapTwoPi(angle);
        const signed = wrapPi(angle);
        expect(positive).toBeGreaterThanOrEqual(0);
        expect(positive).toBeLessThan(2 * Math.PI);
        expect(signed).toBeGreaterThan(-Math.PI);
        expect(signed).toBeLessThanOrEqual(Math.PI);
        for (const wrapped of [positive, signed]) {
          expect(Math.abs(Math.sin((wrapped - angle) / 2))).toBeLessThan(1e-11);
        }
      }),
    );
  });

  test.each([
    [0, 0, 0],
    [Math.PI, Math.PI, Math.PI],
    [-Math.PI, Math.PI, Math.PI],
    [2 * Math.PI, 0, 0],
    [-1e-17, 0, 0],
    [1.5 * Math.PI, 1.5 * Math.PI, -0.5 * Math.PI],
  ])('%d has its place at the seam', (angle, positive, signed) => {
    expect(wrapTwoPi(angle)).toBeCloseTo(positive, 15);
    expect(wrapPi(angle)).toBeCloseTo(signed, 15);
  });
});
