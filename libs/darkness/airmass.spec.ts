import { toRad } from '#sky';
import { airmass, extinctionForElevation } from './airmass';

describe('airmass', () => {
  it('is one at the zenith and never less than the plane-parallel layer asks high up', () => {
    expect(airmass(toRad(90))).toBeCloseTo(1, 3);
    expect(airmass(toRad(45))).toBeCloseTo(Math.SQRT2, 2);
  });

  it('falls steadily from the horizon to the zenith', () => {
    for (let h = 0; h < 90; h += 0.25) expect(airmass(toRad(h + 0.25))).toBeLessThan(airmass(toRad(h)));
  });

  it('stays at the horizon value below it', () => {
    expect(airmass(toRad(-5))).toBe(airmass(0));
  });
});

describe('extinction', () => {
  it('is less on a mountain', () => {
    const heights = [0, 300, 1000, 2500, 4200].map(extinctionForElevation);
    expect([...heights].sort((a, b) => b - a)).toEqual(heights);
    expect(heights[0]).toBeCloseTo(0.1451 + 0.12 + 0.016, 12);
  });
});
