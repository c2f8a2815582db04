import { type OrbitTarget, toRad, ttJdToUtcMs } from '#sky';
import { bodyMotion } from './bodyMotion';

/** Meeus 1998, Astronomical Algorithms (2nd ed.), example 33.b: comet Encke on 1990 October 6.0 TT. */
const encke: OrbitTarget = {
  kind: 'orbit',
  name: "Meeus's example 33.b",
  elements: {
    perihelionDistanceAu: 2.2091404 * (1 - 0.8502196),
    eccentricity: 0.8502196,
    inclinationRad: toRad(11.94524),
    nodeRad: toRad(334.75006),
    argumentOfPerihelionRad: toRad(186.23352),
    perihelionTtJd: 2448193.04502,
    epochTtJd: null,
  },
  brightness: null,
  comaArcmin: 5,
};
const UTC = ttJdToUtcMs(2448170.5);

it('points the tail away from the Sun', () => {
  // Computed for the same example with ERFA: the Sun at position angle 123.248, the tail at 303.248 degrees.
  const { tailPositionAngleDeg, words } = bodyMotion(encke, 'comet', UTC);
  expect(Math.abs(tailPositionAngleDeg! - 303.248)).toBeLessThan(0.02);
  expect(words).toMatch(
    /a tail would point west-north-west \(position angle 303 degrees\), away from the Sun\.$/,
  );
});

it('tells the motion of an hour, as a day of it shows', () => {
  const motion = bodyMotion(encke, 'comet', UTC);
  // A day's worth of hours, summed, against the way from one end of the day to the other, nearly straight.
  let sum = 0;
  for (let hour = -11.5; hour < 12; hour++) {
    sum += bodyMotion(encke, 'comet', UTC + hour * 3_600_000).arcminPerHour;
  }
  expect(Math.abs(sum / 24 / motion.arcminPerHour - 1)).toBeLessThan(0.01);
  expect(motion.arcminPerHour).toBeGreaterThan(1);
  expect(
    motion.words.startsWith(
      `It moves ${motion.arcminPerHour.toFixed(1)} arcmin an hour towards the ${motion.direction}`,
    ),
  ).toBe(true);
});

it('knows no tail of an asteroid', () => {
  const { tailPositionAngleDeg, words } = bodyMotion(encke, 'asteroid', UTC);
  expect(tailPositionAngleDeg).toBeNull();
  expect(words).not.toMatch(/tail/);
});
