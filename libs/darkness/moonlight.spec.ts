import { DEG, KM_PER_AU, toRad } from '#sky';
import { moonIlluminatedFraction, moonlightStrength, moonScatter } from './moonlight';

const MEAN = 384_400 / KM_PER_AU;

describe('moonlight', () => {
  it('is none while the Moon is down', () => {
    expect(moonlightStrength(-0.84 * DEG, 0, MEAN, 0.2)).toBe(0);
    expect(moonlightStrength(-60 * DEG, 0, MEAN, 0.2)).toBe(0);
    expect(moonlightStrength(0.1 * DEG, 0, MEAN, 0.2)).toBeGreaterThan(0);
  });

  it('comes up without a jump and grows with height', () => {
    const high = moonlightStrength(90 * DEG, 0, MEAN, 0.2);
    let before = 0;
    let greatest = 0;
    for (let h = -1; h <= 90; h += 0.01) {
      const now = moonlightStrength(h * DEG, 0, MEAN, 0.2);
      expect(now).toBeGreaterThanOrEqual(before);
      greatest = Math.max(greatest, now - before);
      before = now;
    }
    expect(greatest / high).toBeLessThan(0.0025);
  });

  it('follows the square of the distance and fades with phase alike before and after full', () => {
    const at = (phaseDeg: number, distance: number): number =>
      moonlightStrength(30 * DEG, toRad(phaseDeg), distance, 0.2);
    expect(at(40, 0.9 * MEAN) / at(40, MEAN)).toBeCloseTo(1 / 0.81, 12);
    expect(at(-40, MEAN)).toBe(at(40, MEAN));
    expect(at(90, MEAN)).toBeLessThan(at(40, MEAN));
  });

  it('scatters without a jump at ten degrees and keeps finite on the disc', () => {
    const at = (deg: number): number => moonScatter(Math.cos(toRad(deg)));
    for (let deg = 0.3; deg < 180; deg += 0.02) {
      expect(Math.abs(Math.log(at(deg + 0.02) / at(deg)))).toBeLessThan(0.15);
    }
    expect(moonScatter(1) / at(0.2)).toBeCloseTo(1, 6);
    expect(moonScatter(1 + 1e-15)).toBe(moonScatter(1));
    expect(moonScatter(-1 - 1e-15)).toBe(moonScatter(-1));
  });

  it('lights half the disc at quadrature', () => {
    expect(moonIlluminatedFraction(0)).toBe(1);
    expect(moonIlluminatedFraction(90 * DEG)).toBeCloseTo(0.5, 12);
    expect(moonIlluminatedFraction(180 * DEG)).toBeCloseTo(0, 12);
  });
});
