import {
  createWorkbench,
  DEFAULT_WEIGHTS,
  judgeEvening,
  prepareSeason,
  prepareSite,
  type ProgrammeItem,
} from '#nights';
import { MS_PER_DAY, type OrbitTarget, place, utcMsToTtJd, withPerturbations } from '#sky';
import fc from 'fast-check';
import { inventedComet, inventedProgramme, inventedSite, programmeItem } from '../../nights/fixtures';
import { eveningChange, type PlannedEvening } from './eveningChange';

const date = '2027-04-02';
const site = inventedSite();
const old: OrbitTarget = {
  ...(inventedComet('2027-04-12T00:00:00Z') as OrbitTarget),
  brightness: { kind: 'comet', absoluteMagnitude: 5, activity: 4 },
};

function withElements(change: Partial<OrbitTarget['elements']>): OrbitTarget {
  const epochTtJd = utcMsToTtJd(Date.parse('2027-02-01T00:00:00Z'));
  return { ...old, elements: { ...old.elements, epochTtJd, ...change } };
}

function planned(change: Partial<ProgrammeItem> = {}): PlannedEvening {
  return { site, programme: inventedProgramme(), item: programmeItem(old, change), date };
}

const before = withElements({});

it('finds nothing changed by a set that equals the old one', () => {
  fc.assert(
    fc.property(
      fc.record({
        perihelionDistanceAu: fc.double({ min: 0.3, max: 2.5, noNaN: true }),
        eccentricity: fc.double({ min: 0.1, max: 1.2, noNaN: true }),
        inclinationRad: fc.double({ min: 0, max: Math.PI, noNaN: true }),
        nodeRad: fc.double({ min: 0, max: 6.28, noNaN: true }),
      }),
      (elements) => {
        expect(eveningChange(planned(), withElements(elements), withElements({ ...elements }))).toBeNull();
      },
    ),
    { numRuns: 12 },
  );
});

it('measures the shift between two places worked out one by one', () => {
  const after = withElements({ perihelionDistanceAu: before.elements.perihelionDistanceAu + 0.004 });
  const change = eveningChange(planned(), before, after)!;
  const at = (target: OrbitTarget) =>
    place(withPerturbations(target, change.utcMs, change.utcMs + MS_PER_DAY), change.utcMs, site.observer);
  const a = at(before).astrometric;
  const b = at(after).astrometric;
  // By the haversine, which is another formula than the program's.
  const hav = (x: number): number => Math.sin(x / 2) ** 2;
  const h = hav(b.decRad - a.decRad) + Math.cos(a.decRad) * Math.cos(b.decRad) * hav(b.raRad - a.raRad);
  const arcmin = ((2 * Math.asin(Math.sqrt(h))) / Math.PI) * 180 * 60;
  expect(arcmin).toBeGreaterThan(2);
  expect(Math.abs(change.shift.shiftArcmin - arcmin)).toBeLessThan(0.001);
  // By the four-part formula for the position angle (Meeus 1998, chapter 17).
  const angle = Math.atan2(
    Math.sin(b.raRad - a.raRad),
    Math.cos(a.decRad) * Math.tan(b.decRad) - Math.sin(a.decRad) * Math.cos(b.raRad - a.raRad),
  );
  const positionAngleDeg = ((angle / Math.PI) * 180 + 360) % 360;
  expect(Math.abs(change.shift.positionAngleDeg - positionAngleDeg)).toBeLessThan(0.01);
  expect(change.shift.magnitudeChange).toBeCloseTo(at(after).magnitude! - at(before).magnitude!, 6);
  for (const { fieldDeg, fieldFraction, shiftMm, harmless, scale } of change.shift.scales) {
    expect(fieldFraction).toBeCloseTo(arcmin / 60 / fieldDeg, 6);
    expect(harmless).toBe(shiftMm < 0.5);
    expect(change.printAgain.includes(scale)).toBe(!harmless);
  }
});

it('judges both accounts as each is judged by itself', () => {
  // Two magnitudes fainter: its showing shrinks or goes.
  const after = { ...before, brightness: { kind: 'comet', absoluteMagnitude: 7, activity: 4 } as const };
  const change = eveningChange(planned(), before, after)!;
  for (const [target, showing] of [
    [before, change.before],
    [after, change.after],
  ] as const) {
    const season = prepareSeason(inventedProgramme({ items: [programmeItem(target)] }), date, date);
    const alone = judgeEvening(createWorkbench(), season, prepareSite(site), DEFAULT_WEIGHTS, date);
    expect(alone.showings[0]).toEqual(showing);
  }
  expect(change.shift.shiftArcsec).toBe(0);
  expect(change.printAgain).toEqual([]);
  expect(change.shift.magnitudeChange).toBeCloseTo(2, 9);
});

test.each([
  ['lost', before, { ...before, brightness: { kind: 'comet', absoluteMagnitude: 15, activity: 4 } }],
  ['gained', { ...before, brightness: { kind: 'comet', absoluteMagnitude: 15, activity: 4 } }, before],
] as const)('says that a showing is %s', (showing, from, to) => {
  const change = eveningChange(planned(), from, to)!;
  expect(change.showing).toBe(showing);
  expect(change.before.shown).toBe(showing === 'lost');
  expect(change.after.shown).toBe(showing === 'gained');
});

it('says nothing of an evening on which the body is shown by neither', () => {
  const faint = (h: number): OrbitTarget => ({
    ...before,
    brightness: { kind: 'comet', absoluteMagnitude: h, activity: 4 },
  });
  expect(eveningChange(planned(), faint(15), faint(16))).toBeNull();
});
