import { dotDiameterMm, largestDotMm, smallestDotMm } from './dots';

describe('dotDiameterMm', () => {
  it('depends only on how far above the sheet’s limit a star is', () => {
    expect(dotDiameterMm(3, 6)).toBeCloseTo(dotDiameterMm(8, 11), 12);
  });

  it('grows by one factor a magnitude between its bounds', () => {
    const factor = dotDiameterMm(4, 6) / dotDiameterMm(5, 6);
    expect(dotDiameterMm(3, 6) / dotDiameterMm(4, 6)).toBeCloseTo(factor, 12);
    expect(factor).toBeCloseTo(10 ** (0.2 * 0.8), 12);
  });

  it('stays within what prints and what hides nothing', () => {
    expect(dotDiameterMm(-26.7, 5.5)).toBe(largestDotMm);
    expect(dotDiameterMm(12, 5.5)).toBe(smallestDotMm);
    expect(dotDiameterMm(5.5, 5.5)).toBe(0.35);
    expect(smallestDotMm).toBe(0.25);
  });
});
