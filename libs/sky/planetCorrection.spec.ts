import { ARCSEC } from './angles';
import { planetCorrection } from './planetCorrection';
import { J2000_TT_JD } from './time';
import { norm, subtract } from './vector';

/** The least distance from the Earth that turns a step into an angle, au; the Earth's own as Venus sees it. */
const BODIES = [
  ['Earth', 0.27],
  ['Mercury', 0.55],
  ['Venus', 0.27],
  ['Mars', 0.37],
  ['Jupiter', 3.9],
  ['Saturn', 8],
  ['Uranus', 17],
  ['Neptune', 28.8],
] as const;
const FIRST = 2_451_536.5;
const PAST_LAST = FIRST + 22_528;

describe('planetCorrection', () => {
  test.each(BODIES)('of %s has no step where its pieces meet', (body, leastAu) => {
    let step = 0;
    for (let ttJd = FIRST + 16; ttJd < PAST_LAST; ttJd += 16) {
      const [before, after] = [planetCorrection(body, ttJd - 1e-6), planetCorrection(body, ttJd + 1e-6)];
      step = Math.max(step, norm(subtract(before, after)));
    }
    expect(step / leastAu / ARCSEC).toBeLessThan(0.1);
  });

  test.each(BODIES)('of %s is small, and nothing outside its years', (body) => {
    const size = norm(planetCorrection(body, J2000_TT_JD + 9000.3));
    expect(size).toBeGreaterThan(0);
    expect(size).toBeLessThan(4e-3);
    expect(planetCorrection(body, FIRST - 0.001)).toEqual([0, 0, 0]);
    expect(planetCorrection(body, PAST_LAST)).toEqual([0, 0, 0]);
    expect(planetCorrection(body, NaN)).toEqual([0, 0, 0]);
  });
});
