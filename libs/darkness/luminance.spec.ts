import fc from 'fast-check';
import { luminanceToMag, magToLuminance, skyFromBortle } from './luminance';

describe('sky brightness', () => {
  it('converts there and back', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 25, noNaN: true }), (mag) => {
        expect(luminanceToMag(magToLuminance(mag))).toBeCloseTo(mag, 10);
      }),
    );
  });

  it('makes five magnitudes a hundredfold', () => {
    expect(magToLuminance(15) / magToLuminance(20)).toBeCloseTo(100, 1);
  });

  it('darkens from class 9 to class 1', () => {
    for (let i = 1; i < 9; i++) expect(skyFromBortle(i)).toBeGreaterThan(skyFromBortle(i + 1));
  });

  it.each([0, 10, 4.5, NaN])('refuses class %d and says what would be right', (classNumber) => {
    expect(() => skyFromBortle(classNumber)).toThrow(RangeError);
    expect(() => skyFromBortle(classNumber)).toThrow(/was .*; give a whole number from 1 to 9/);
  });
});
