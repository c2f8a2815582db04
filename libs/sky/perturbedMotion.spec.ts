import { ARCSEC, toRad } from './angles';
import { eclipticToEquatorial, heliocentricState, type OrbitalElements, type State } from './orbit';
import { motionFromState, motionPlace, motionState, perturbedMotion } from './perturbedMotion';
import { perturberTable } from './perturbers';
import { heliocentricPlace } from './solarSystem';
import { ttJdToUtcMs } from './time';
import { add, norm, separation, subtract } from './vector';

const EPOCH = 2_461_000.5;
const invented: OrbitalElements = {
  perihelionDistanceAu: 1.3,
  eccentricity: 0.62,
  inclinationRad: toRad(11),
  nodeRad: toRad(200),
  argumentOfPerihelionRad: toRad(35),
  perihelionTtJd: EPOCH + 150,
  epochTtJd: EPOCH,
};
const table = perturberTable(EPOCH - 800, EPOCH + 800);

const gap = (a: State, b: State) => norm(subtract(a.position, b.position));

describe('perturbedMotion', () => {
  it('starts from the conic at the epoch and leaves it by what the planets do', () => {
    const motion = perturbedMotion(invented, EPOCH - 100, EPOCH + 700, table);
    const conicAt = (ttJd: number) => eclipticToEquatorial(heliocentricState(invented, ttJd).position);
    const missAt = (ttJd: number) => separation(motionPlace(motion, ttJd), conicAt(ttJd)) / ARCSEC;
    expect(norm(subtract(motionPlace(motion, EPOCH), conicAt(EPOCH)))).toBeLessThan(1e-13);
    expect(missAt(EPOCH + 10)).toBeLessThan(1);
    expect(missAt(EPOCH + 700)).toBeGreaterThan(10);
  });

  it('returns to where it came from: forth 700 days and back', () => {
    const forth = motionState(
      motionFromState(startOf(invented), EPOCH, EPOCH, EPOCH + 700, table),
      EPOCH + 700,
    );
    const back = motionState(motionFromState(forth, EPOCH + 700, EPOCH, EPOCH + 700, table), EPOCH);
    expect(gap(back, startOf(invented))).toBeLessThan(1e-9);
    expect(norm(subtract(back.velocity, startOf(invented).velocity))).toBeLessThan(1e-11);
  });

  it('has no seams: place and velocity agree across pieces, and the velocity is the rate of the place', () => {
    const motion = perturbedMotion(invented, EPOCH - 300, EPOCH + 300, table);
    expect(motion.boundsTtMs).toHaveLength(motion.pieces.length + 1);
    const day = 86_400_000;
    for (let i = 1; i < motion.pieces.length; i++) {
      const ttJd = motion.boundsTtMs[i]! / day + 2_440_587.5;
      const before = motionState(motion, ttJd - 1e-3);
      const at = motionState(motion, ttJd);
      const after = motionState(motion, ttJd + 1e-3);
      const rate = subtract(after.position, before.position).map((d) => d / 2e-3);
      expect(Math.hypot(...rate.map((d, axis) => d - at.velocity[axis]!))).toBeLessThan(5e-9);
    }
  });

  it.each([
    ['the epoch before the span', EPOCH + 200, EPOCH + 600],
    ['the epoch inside', EPOCH - 300, EPOCH + 300],
    ['the epoch after', EPOCH - 700, EPOCH - 250],
  ])('covers the span it was asked for with %s', (_, from, to) => {
    const whole = perturbedMotion(invented, EPOCH - 720, EPOCH + 720, table);
    const part = perturbedMotion(invented, from, to, table);
    for (const ttJd of [from, from + 0.3 * (to - from), to]) {
      expect(gap(motionState(part, ttJd), motionState(whole, ttJd))).toBeLessThan(1e-9);
    }
    expect(() => motionPlace(part, from - 1)).toThrow(RangeError);
    expect(() => motionPlace(part, to + 1)).toThrow(/outside/);
    expect(() => motionPlace(part, NaN)).toThrow(RangeError);
  });

  it('makes a table where the given one does not reach', () => {
    const short = perturberTable(EPOCH - 5, EPOCH + 5);
    const own = perturbedMotion(invented, EPOCH, EPOCH + 90, short);
    const shared = perturbedMotion(invented, EPOCH, EPOCH + 90, table);
    expect(norm(subtract(motionPlace(own, EPOCH + 90), motionPlace(shared, EPOCH + 90)))).toBeLessThan(1e-9);
  });

  it('crosses to a worker as it is', () => {
    const motion = perturbedMotion(invented, EPOCH, EPOCH + 300, table);
    const copy = structuredClone(motion);
    expect(motionPlace(copy, EPOCH + 123.4)).toEqual(motionPlace(motion, EPOCH + 123.4));
  });

  it.each([
    ['no epoch', { epochTtJd: null }, EPOCH + 10, /no epoch/],
    ['an epoch of long ago', { epochTtJd: EPOCH - 50_000 }, EPOCH + 10, /more than 100 years/],
    ['an empty span', {}, EPOCH, /end has to be later/],
    ['no number', { epochTtJd: NaN }, EPOCH + 10, /100 years/],
  ] as const)('refuses %s with the reason', (_, change, to, reason) => {
    expect(() => perturbedMotion({ ...invented, ...change }, EPOCH, to)).toThrow(reason);
  });

  it('says which planet a body would strike, and when', () => {
    const near = EPOCH + 40;
    const jupiter = (ttJd: number) => heliocentricPlace('Jupiter', ttJdToUtcMs(ttJd));
    const drift = subtract(jupiter(near + 0.5), jupiter(near - 0.5));
    // A thousandth of an au above Jupiter and falling straight at it: 0.03 days away, or less.
    const above: State = {
      position: add(jupiter(near), [0.001, 0, 0]),
      velocity: add(drift, [-0.03, 0, 0]),
    };
    expect(() => motionFromState(above, near, near, near + 30, table)).toThrow(
      /strikes Jupiter on 2025-12-31/,
    );
    expect(() => motionFromState(above, near, near - 30, near, table)).not.toThrow();
  });

  it('says so of a body that falls into the Sun', () => {
    const falling: State = { position: [0.5, 0, 0], velocity: [0, 0, 0] };
    expect(() => motionFromState(falling, EPOCH, EPOCH, EPOCH + 400, table)).toThrow(
      /strikes the Sun on 2025-12-1[0-9]/,
    );
  });

  it('gives up with a reason on a body that circles the Sun in hours, instead of hanging', () => {
    const circling = { ...invented, perihelionDistanceAu: 0.008, eccentricity: 0 };
    expect(() => perturbedMotion(circling, EPOCH, EPOCH + 780, table)).toThrow(/more than 25000 steps/);
  });
});

function startOf(elements: OrbitalElements): State {
  const { position, velocity } = heliocentricState(elements, elements.epochTtJd!);
  return { position: eclipticToEquatorial(position), velocity: eclipticToEquatorial(velocity) };
}
