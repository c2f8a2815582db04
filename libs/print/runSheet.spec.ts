import fc from 'fast-check';
import { planRunSheet, type RunRules, type RunSheet, type RunWish } from './runSheet';

const MINUTE = 60_000;
const START = Date.parse('2027-02-06T18:10:00Z');
const at = (minutes: number): number => START + minutes * MINUTE;

function wish(target: string, from: number, to: number, change: Partial<RunWish> = {}): RunWish {
  return {
    target,
    station: 'Reflector',
    weight: 1,
    intervals: [{ startMs: at(from), endMs: at(to) }],
    bestMs: null,
    ...change,
  };
}

const rules: RunRules = { hours: { startMs: at(0), endMs: at(150) }, breaks: [], leastLookMinutes: 10 };

const order = (sheet: RunSheet): string[] => sheet.slots.map(({ target }) => target);

it('shows first what sets first', () => {
  const sheet = planRunSheet(
    [
      wish('stays', 0, 150, { bestMs: at(0) }),
      wish('sets late', 0, 90, { bestMs: at(0) }),
      wish('sets soon', 0, 40, { bestMs: at(0) }),
    ],
    rules,
  );
  expect(order(sheet)).toEqual(['sets soon', 'sets late', 'stays']);
});

it('waits with what still rises', () => {
  const sheet = planRunSheet(
    [wish('rises', 0, 150, { bestMs: at(150) }), wish('sinks', 0, 150, { bestMs: at(0) })],
    rules,
  );
  expect(order(sheet)).toEqual(['sinks', 'rises']);
});

it('keeps the heavier target where only one has room', () => {
  const sheet = planRunSheet([wish('light', 0, 15), wish('heavy', 0, 15, { weight: 2 })], rules);
  expect(order(sheet)).toEqual(['heavy']);
  expect(sheet.leftOut).toEqual([{ target: 'light', station: 'Reflector', why: 'noRoom' }]);
});

it('gives a heavier target the longer look', () => {
  const [light, heavy] = planRunSheet([wish('light', 0, 150), wish('heavy', 0, 150, { weight: 2 })], rules)
    .slots.toSorted((a, b) => a.target.localeCompare(b.target))
    .map(({ startMs, endMs }) => (endMs - startMs) / MINUTE)
    .toReversed();
  expect(light! + heavy!).toBe(150);
  expect(heavy! / light!).toBeGreaterThan(1.5);
});

it('keeps a short showing by leaving the round times', () => {
  const sheet = planRunSheet([wish('brief', 33, 45)], rules);
  expect(sheet.slots).toHaveLength(1);
  expect(sheet.slots[0]!.startMs).toBeGreaterThanOrEqual(at(33));
  expect(sheet.slots[0]!.endMs).toBeLessThanOrEqual(at(45));
});

it('says which target cannot be shown long enough', () => {
  expect(planRunSheet([wish('glimpse', 33, 41)], rules).leftOut).toEqual([
    { target: 'glimpse', station: 'Reflector', why: 'tooShort' },
  ]);
});

it('plans a programme of sixty targets, which no search of every order could', () => {
  const many = Array.from({ length: 60 }, (_, i) =>
    wish(`T${String(i)}`, (i * 7) % 90, 60 + ((i * 13) % 90), {
      bestMs: at((i * 11) % 150),
      weight: 1 + (i % 3),
    }),
  );
  const sheet = planRunSheet(many, rules);
  expect(sheet.slots.length).toBeGreaterThan(10);
});

describe('for any programme', () => {
  const interval = fc
    .tuple(fc.integer({ min: 0, max: 140 }), fc.integer({ min: 1, max: 100 }))
    .map(([from, length]) => ({ startMs: at(from), endMs: at(Math.min(180, from + length)) }));
  const wishes = (most: number) =>
    fc
      .array(
        fc.record({
          station: fc.constantFrom('Reflector', 'Binoculars'),
          weight: fc.integer({ min: 1, max: 5 }),
          interval,
          second: fc.option(fc.integer({ min: 5, max: 40 })),
          best: fc.option(fc.double({ min: 0, max: 1, noNaN: true })),
        }),
        { maxLength: most },
      )
      .map((rows) =>
        rows.map(({ station, weight, interval: one, second, best }, index): RunWish => {
          const next = { startMs: one.endMs + 5 * MINUTE, endMs: one.endMs + (5 + (second ?? 0)) * MINUTE };
          return {
            target: `T${String(index)}`,
            station,
            weight,
            intervals: second === null ? [one] : [one, next],
            bestMs: best === null ? null : one.startMs + best * (one.endMs - one.startMs),
          };
        }),
      );
  const breaks = fc.constantFrom([], [{ startMs: at(60), endMs: at(72) }]);

  it('keeps every look whole inside a showing, the hours and the breaks, one at a time a station', () => {
    fc.assert(
      fc.property(wishes(9), breaks, (all, rests) => {
        const sheet = planRunSheet(all, { ...rules, breaks: rests });
        for (const slot of sheet.slots) {
          const { intervals, station } = all.find(({ target }) => target === slot.target)!;
          expect(slot.station).toBe(station);
          expect(slot.endMs - slot.startMs).toBeGreaterThanOrEqual(10 * MINUTE);
          expect(intervals.some(({ startMs, endMs }) => startMs <= slot.startMs && endMs >= slot.endMs)).toBe(
            true,
          );
          expect(slot.startMs >= rules.hours.startMs && slot.endMs <= rules.hours.endMs).toBe(true);
          expect(rests.every((rest) => rest.endMs <= slot.startMs || rest.startMs >= slot.endMs)).toBe(true);
          expect(
            sheet.slots.some(
              (other) =>
                other !== slot &&
                other.station === slot.station &&
                other.startMs < slot.endMs &&
                other.endMs > slot.startMs,
            ),
          ).toBe(false);
        }
        const named = [...order(sheet), ...sheet.leftOut.map(({ target }) => target)];
        expect(named.toSorted()).toEqual(all.map(({ target }) => target).toSorted());
        expect(planRunSheet(all, { ...rules, breaks: rests })).toEqual(sheet);
      }),
      { numRuns: 150, seed: 4 },
    );
  });

  it('shows the heaviest set there is, as trying every order finds it', () => {
    fc.assert(
      fc.property(wishes(5), (all) => {
        const sheet = planRunSheet(all, rules);
        for (const station of new Set(all.map((one) => one.station))) {
          const own = all.filter((one) => one.station === station);
          const weight = own
            .filter(({ target }) => order(sheet).includes(target))
            .reduce((sum, one) => sum + one.weight, 0);
          // The scheduler keeps to round times unless that loses a showing; trying every order here does not.
          const looks = sheet.slots.filter((slot) => slot.station === station);
          const minutes = looks.every(({ startMs }) => startMs % (5 * MINUTE) === 0) ? 5 : 1;
          expect(weight).toBeGreaterThanOrEqual(heaviest(own, minutes));
        }
      }),
      { numRuns: 150, seed: 5 },
    );
  });
});

/** Greatest weight over all orders of all subsets, each look begun as early as it can. */
function heaviest(left: readonly RunWish[], step: number, fromMs = rules.hours.startMs): number {
  let most = 0;
  for (const one of left) {
    for (let startMs = Math.ceil(fromMs / MINUTE / step) * step * MINUTE; ; startMs += step * MINUTE) {
      const endMs = startMs + 10 * MINUTE;
      if (endMs > rules.hours.endMs) break;
      if (!one.intervals.some((part) => part.startMs <= startMs && part.endMs >= endMs)) continue;
      const rest = left.filter((other) => other !== one);
      most = Math.max(most, one.weight + heaviest(rest, step, endMs));
      break;
    }
  }
  return most;
}
