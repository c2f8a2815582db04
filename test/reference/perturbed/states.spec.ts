import { motionFromState, motionPlace, type State, type Vector } from '#sky';
import { arcsecBetween } from './fixtures';

const EPOCH = 2_459_000.5;

/**
 * Heliocentric ICRF states at JD 2459000.5 TT fitted to the Swiss Ephemeris by the authors of the project's
 * methods (SciPy, other code than here), and where that ephemeris has the bodies later, au.
 */
const CASES: readonly { name: string; state: State; later: readonly (readonly [number, Vector])[] }[] = [
  {
    name: 'Ceres',
    state: {
      position: [2.205954587799, -1.592871882711, -1.200270503231],
      velocity: [0.00634853911, 0.006920949484, 0.001970840562],
    },
    later: [
      [100, [2.70665097, -0.82533036, -0.94027689]],
      [1000, [-2.50315254, 0.05637195, 0.53613367]],
    ],
  },
  {
    name: 'Pallas',
    state: {
      position: [0.667731132313, -3.212385518824, 0.588409378856],
      velocity: [0.008364454816, 0.000622617496, -0.000716100886],
    },
    later: [
      [300, [2.68649461, -2.00487384, 0.20509547]],
      [1000, [-1.11238299, 1.79869177, -0.27856123]],
    ],
  },
];

describe('motion from a fitted state', () => {
  test.each(CASES)('keeps $name within 0.05 arcsec of the ephemeris for 1,000 days', ({ state, later }) => {
    const motion = motionFromState(state, EPOCH, EPOCH, EPOCH + 1000);
    for (const [days, place] of later) {
      const found = motionPlace(motion, EPOCH + days);
      expect(arcsecBetween(found, place)).toBeLessThan(0.05);
      expect(Math.hypot(found[0] - place[0], found[1] - place[1], found[2] - place[2])).toBeLessThan(5e-7);
    }
  });
});
