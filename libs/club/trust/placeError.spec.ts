import fc from 'fast-check';
import { expectedPlaceError, type OrbitStanding } from './placeError';

const standing: OrbitStanding = {
  kind: 'comet',
  numbered: false,
  arcDays: 107,
  ageDays: 60,
  distanceAu: 1,
  leastSunDistanceAu: 1,
};

const standings = fc.record({
  kind: fc.constantFrom('comet' as const, 'asteroid' as const),
  numbered: fc.boolean(),
  arcDays: fc.option(fc.double({ min: 0, max: 40_000, noNaN: true })),
  ageDays: fc.double({ min: -4000, max: 4000, noNaN: true }),
  distanceAu: fc.double({ min: 0.01, max: 30, noNaN: true }),
  leastSunDistanceAu: fc.double({ min: 0.1, max: 30, noNaN: true }),
});

it('is the rule that its comment states, written out', () => {
  // 60 days from the epoch on an arc of 107: 1 + 120/107 = 2.1215; squared and halved 2.250, cubed 9.548 arcsec.
  const { parts, likelyArcsec, badArcsec } = expectedPlaceError(standing);
  const part = (cause: string) => parts.find((one) => one.cause === cause)!;
  expect(part('observations').likelyArcsec).toBeCloseTo(2.25, 2);
  expect(part('observations').badArcsec).toBeCloseTo(9.548, 2);
  // 1e-9 and 3e-8 au/day^2 over 60 days: 1.8e-6 and 5.4e-5 au, at 1 au 0.371 and 11.14 arcsec. The law of
  // Marsden, Sekanina and Yeomans (1973) is normalised to 1 at 1 au; its printed constants give that to 1%.
  expect(Math.abs(part('outgassing').likelyArcsec / 0.3713 - 1)).toBeLessThan(0.01);
  expect(Math.abs(part('outgassing').badArcsec / 11.138 - 1)).toBeLessThan(0.01);
  expect(part('reckoning').badArcsec).toBeCloseTo(0.6, 12);
  expect(badArcsec).toBeCloseTo(Math.hypot(...parts.map((one) => one.badArcsec)), 9);
  expect(likelyArcsec).toBeCloseTo(Math.hypot(...parts.map((one) => one.likelyArcsec)), 9);
});

it('knows no outgassing of asteroids, and next to none far from the Sun', () => {
  expect(expectedPlaceError({ ...standing, kind: 'asteroid' }).parts.map(({ cause }) => cause)).toEqual([
    'observations',
    'reckoning',
  ]);
  const far = expectedPlaceError({ ...standing, leastSunDistanceAu: 5 }).parts;
  expect(far.find(({ cause }) => cause === 'outgassing')!.badArcsec).toBeLessThan(0.01);
});

it('grows with age, shrinks with the arc, and stays within half the sky', () => {
  fc.assert(
    fc.property(standings, fc.double({ min: 1, max: 10, noNaN: true }), (one, factor) => {
      const { likelyArcsec, badArcsec } = expectedPlaceError(one);
      expect(likelyArcsec).toBeGreaterThan(0);
      expect(badArcsec).toBeGreaterThanOrEqual(likelyArcsec);
      expect(badArcsec).toBeLessThanOrEqual(648_000);
      const older = expectedPlaceError({ ...one, ageDays: one.ageDays * factor });
      expect(older.badArcsec).toBeGreaterThanOrEqual(badArcsec);
      if (one.arcDays === null) return;
      const longer = expectedPlaceError({ ...one, arcDays: one.arcDays * factor });
      expect(longer.badArcsec).toBeLessThanOrEqual(badArcsec);
    }),
  );
});
