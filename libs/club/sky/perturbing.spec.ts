import {
  heliocentric,
  MS_PER_DAY,
  type OrbitTarget,
  separation,
  toRad,
  utcMsToTtJd,
  withPerturbations,
} from '#sky';
import { elementState } from './elementState';
import { type NamedTarget } from './namedTarget';
import { perturbing } from './perturbing';
import { skyAnswer } from './skyAnswer';

const EPOCH_MS = Date.parse('2027-01-01T00:00:00Z');
const target: OrbitTarget = {
  kind: 'orbit',
  name: 'invented asteroid',
  elements: {
    perihelionDistanceAu: 2.3,
    eccentricity: 0.18,
    inclinationRad: toRad(9),
    nodeRad: toRad(130),
    argumentOfPerihelionRad: toRad(280),
    perihelionTtJd: utcMsToTtJd(EPOCH_MS) + 200,
    epochTtJd: utcMsToTtJd(EPOCH_MS),
  },
  brightness: { kind: 'asteroid', absoluteMagnitude: 6, slope: 0.15 },
  comaArcmin: 0,
};
const arcsec = (rad: number) => (rad * 180 * 3600) / Math.PI;

describe('perturbing', () => {
  it('gives the same places in any order as a motion worked out at once', () => {
    const perturbed = perturbing();
    const whole = withPerturbations(target, EPOCH_MS - 500 * MS_PER_DAY, EPOCH_MS + 900 * MS_PER_DAY);
    for (const days of [400, 401, -300, 700, 0, 410, -450, 880]) {
      const utcMs = EPOCH_MS + days * MS_PER_DAY;
      const moved = perturbed(target, utcMs);
      if (moved.kind !== 'orbit') throw new Error('another target came back');
      expect(arcsec(separation(heliocentric(moved, utcMs), heliocentric(whole, utcMs)))).toBeLessThan(0.01);
    }
  });

  it('works a body out once for instants close together', () => {
    const perturbed = perturbing();
    const motionAt = (days: number) => {
      const moved = perturbed(target, EPOCH_MS + days * MS_PER_DAY);
      return moved.kind === 'orbit' ? moved.motion : undefined;
    };
    expect(motionAt(300)).toBeDefined();
    expect(motionAt(301)).toBe(motionAt(300));
  });

  it('says in the terms of the request which body cannot be followed', () => {
    const old = { ...target, elements: { ...target.elements, epochTtJd: 2_400_000.5 } };
    expect(() => perturbing()(old, EPOCH_MS)).toThrow(
      expect.objectContaining({
        name: 'ClubProblem',
        message: expect.stringContaining('100 years') as string,
      }),
    );
  });
});

describe('answers about a body with an epoch', () => {
  const named: NamedTarget = { sky: target, kind: 'asteroid', deepSky: null, origin: null };
  const later = EPOCH_MS + 500 * MS_PER_DAY;

  it('take the planets into account unless two-body places are asked for', () => {
    const ttJd = utcMsToTtJd(later);
    const moved = elementState(named, ttJd);
    const conic = elementState(named, ttJd, true);
    const miss = arcsec(separation(moved.heliocentricEquatorial, conic.heliocentricEquatorial));
    expect(miss).toBeGreaterThan(10);
    expect(arcsec(separation(moved.heliocentricEcliptic, conic.heliocentricEcliptic))).toBeCloseTo(miss, 6);
    expect(elementState(named, target.elements.epochTtJd!).heliocentricEcliptic[0]).toBeCloseTo(
      elementState(named, target.elements.epochTtJd!, true).heliocentricEcliptic[0],
      12,
    );
  });

  it('put it in the sky where its motion does', () => {
    const moved = withPerturbations(target, later, later);
    const answer = skyAnswer(target, later, null);
    expect(answer).toEqual(skyAnswer(moved, later, null));
    const conic = { ...target, elements: { ...target.elements, epochTtJd: null } };
    expect(answer.astrometric).not.toEqual(skyAnswer(conic, later, null).astrometric);
  });
});
