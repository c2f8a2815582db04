import { ARCSEC, toRad } from './angles';
import { perturbersFor, withPerturbations } from './perturbedTarget';
import { heliocentric, place } from './place';
import { type OrbitTarget, type SkyTarget } from './target';
import { MS_PER_DAY, utcMsToTtJd } from './time';
import { buildTrack, seasonFrame, trackPlace } from './track';
import { fromSpherical, separation } from './vector';

const from = Date.parse('2027-01-10T00:00:00Z');
const to = Date.parse('2028-01-10T00:00:00Z');

const asteroid: OrbitTarget = {
  kind: 'orbit',
  name: 'invented asteroid',
  elements: {
    perihelionDistanceAu: 2.1,
    eccentricity: 0.2,
    inclinationRad: toRad(14),
    nodeRad: toRad(77),
    argumentOfPerihelionRad: toRad(150),
    perihelionTtJd: utcMsToTtJd(from) + 90,
    epochTtJd: utcMsToTtJd(from) - 300,
  },
  brightness: { kind: 'asteroid', absoluteMagnitude: 5, slope: 0.15 },
  comaArcmin: 0,
};
const comet: OrbitTarget = {
  ...asteroid,
  name: 'invented comet',
  elements: {
    ...asteroid.elements,
    perihelionDistanceAu: 0.05,
    eccentricity: 1,
    epochTtJd: utcMsToTtJd(from) + 60,
  },
};
const conicOnly: OrbitTarget = { ...asteroid, elements: { ...asteroid.elements, epochTtJd: null } };
const mars: SkyTarget = { kind: 'solarSystem', name: 'Mars', body: 'Mars' };

describe('withPerturbations', () => {
  it.each([asteroid, comet].map((target) => [target.name, target] as const))(
    'lets the track of an %s follow its place to 0.1 arcsec over a season',
    (_, target) => {
      const moved = withPerturbations(target, from, to);
      const frame = seasonFrame(from, to);
      const track = buildTrack(moved, frame);
      const out = new Float64Array(3);
      let worst = 0;
      for (let i = 0; i < 120; i++) {
        const utcMs = from + ((i * 0.6180339887) % 1) * (to - from);
        trackPlace(track, utcMs, out);
        const { apparent } = place(moved, utcMs, null);
        const direction = fromSpherical(apparent.raRad, apparent.decRad);
        worst = Math.max(worst, separation([out[0]!, out[1]!, out[2]!], direction));
      }
      expect(worst / ARCSEC).toBeLessThan(0.1);
    },
  );

  it('works from the ends of the frame of a season', () => {
    const frame = seasonFrame(from, to);
    const moved = withPerturbations(asteroid, frame.fromMs, frame.toMs);
    expect(() => buildTrack(moved, frame)).not.toThrow();
  });

  it('moves a body off its conic by arcseconds in a season, and by nothing at its epoch', () => {
    const moved = withPerturbations(asteroid, from, to);
    const miss = (utcMs: number) =>
      separation(heliocentric(moved, utcMs), heliocentric(asteroid, utcMs)) / ARCSEC;
    expect(miss(to)).toBeGreaterThan(10);
    const atEpoch = from - 300 * MS_PER_DAY;
    const near = withPerturbations(asteroid, atEpoch, atEpoch);
    expect(separation(heliocentric(near, atEpoch), heliocentric(asteroid, atEpoch)) / ARCSEC).toBeLessThan(
      0.01,
    );
  });

  it('leaves alone what has no epoch or is no orbit', () => {
    expect(withPerturbations(conicOnly, from, to)).toBe(conicOnly);
    expect(withPerturbations(mars, from, to)).toBe(mars);
  });

  it('names the target that cannot be followed', () => {
    const old = { ...asteroid, elements: { ...asteroid.elements, epochTtJd: 2_400_000.5 } };
    expect(() => withPerturbations(old, from, to)).toThrow(/^invented asteroid: The epoch 1858-11-17/);
  });

  it('refuses a place outside of the motion instead of leaping to the conic', () => {
    const moved = withPerturbations(asteroid, from, to);
    expect(() => place(moved, to + 40 * MS_PER_DAY, null)).toThrow(RangeError);
  });
});

describe('perturbersFor', () => {
  it('reaches over the epochs of all and the whole span, so that every target shares it', () => {
    const table = perturbersFor([mars, asteroid, comet, conicOnly], from, to)!;
    expect(table.fromTtJd).toBeLessThanOrEqual(asteroid.elements.epochTtJd!);
    expect(table.toTtJd).toBeGreaterThanOrEqual(utcMsToTtJd(to) + 20);
    const shared = withPerturbations(comet, from, to, table);
    const own = withPerturbations(comet, from, to);
    expect(separation(heliocentric(shared, to), heliocentric(own, to)) / ARCSEC).toBeLessThan(0.001);
  });

  it('is not made where no target needs it', () => {
    expect(perturbersFor([mars, conicOnly], from, to)).toBeNull();
  });
});
