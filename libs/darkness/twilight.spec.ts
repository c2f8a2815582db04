import { toRad } from '#sky';
import { luminanceToMag, magToLuminance } from './luminance';
import {
  patternExtinction,
  patternShare,
  patternSunAltitude,
  zenithTwilight,
  zenithTwilightMag,
} from './twilight';

describe('twilight at the zenith', () => {
  const total = (sunDeg: number): number =>
    luminanceToMag(zenithTwilight(toRad(sunDeg)) + magToLuminance(21.61));

  it('darkens without a jump or a turn from high Sun to full night', () => {
    const step = 0.01;
    for (let sunDeg = 60; sunDeg > -20; sunDeg -= step) {
      const change = total(sunDeg - step) - total(sunDeg);
      expect(change).toBeGreaterThanOrEqual(-1e-12);
      expect(change).toBeLessThan(1.6 * step);
    }
  });

  it('has no kink where one law takes over from another', () => {
    const slope = (sunDeg: number): number => (total(sunDeg - 0.005) - total(sunDeg)) / 0.005;
    for (const joint of [0, -3, -6, -15, -18]) {
      expect(slope(joint - 0.005)).toBeCloseTo(slope(joint + 0.01), 1);
    }
  });

  it('ends at 18 degrees exactly', () => {
    expect(zenithTwilight(toRad(-18.0001))).toBe(0);
    expect(zenithTwilight(toRad(-17.9))).toBeGreaterThan(0);
    expect(zenithTwilight(toRad(-90))).toBe(0);
  });

  it('is a plain day with the Sun up', () => {
    expect(zenithTwilightMag(-40)).toBeCloseTo(4, 1);
    expect(zenithTwilightMag(-90)).toBeGreaterThan(3.9);
  });
});

describe('the pattern of twilight', () => {
  it('holds the Sun between 3 and 12 degrees down', () => {
    expect(patternSunAltitude(toRad(-7))).toBeCloseTo(toRad(-7), 12);
    expect(patternSunAltitude(toRad(10))).toBeCloseTo(toRad(-3), 12);
    expect(patternSunAltitude(toRad(-16))).toBeCloseTo(toRad(-12), 12);
  });

  it('fades out by day', () => {
    expect(patternShare(toRad(-5))).toBe(1);
    expect(patternShare(toRad(-3))).toBe(1);
    expect(patternShare(toRad(3.5))).toBeCloseTo(0.5 ** 4, 12);
    expect(patternShare(toRad(11))).toBe(0);
  });

  it('does not divide by an impossibly clear air', () => {
    expect(patternExtinction(0)).toBe(0.1);
    expect(patternExtinction(0.3)).toBe(0.3);
  });
});
