import { BINOCULAR_10X50 } from '#darkness';
import { type OrbitTarget, type SkyTarget } from '#sky';
import { galaxy, inventedComet, inventedProgramme, inventedSite, planet, programmeItem } from './fixtures';
import { judgeEvening } from './judge';
import { createWorkbench } from './measure';
import { DEFAULT_WEIGHTS } from './programme';
import { type Showing } from './result';
import { prepareSeason, type Season } from './season';
import { prepareSite } from './siteInstant';
import { clockWords } from './words';

const site = prepareSite(inventedSite());
const from = '2027-03-05';
const to = '2027-05-20';

/** An invented comet or asteroid as bright as wanted. */
function body(absoluteMagnitude: number, kind: 'comet' | 'asteroid' = 'comet'): OrbitTarget {
  const comet = inventedComet('2027-04-12T00:00:00Z') as OrbitTarget;
  return {
    ...comet,
    name: `${kind} ${String(absoluteMagnitude)}`,
    brightness:
      kind === 'comet' ? { kind, absoluteMagnitude, activity: 4 } : { kind, absoluteMagnitude, slope: 0.15 },
  };
}

function seasonOf(targets: readonly SkyTarget[], first = from, last = to): Season {
  const items = targets.map((target) => programmeItem(target, { instrument: BINOCULAR_10X50 }));
  return prepareSeason(inventedProgramme({ items }), first, last);
}

function showings(season: Season, date: string): readonly Showing[] {
  return judgeEvening(createWorkbench(), season, site, DEFAULT_WEIGHTS, date).showings;
}

const dates = Array.from({ length: 75 }, (_, i) =>
  new Date(Date.parse(from) + i * 86_400_000).toISOString().slice(0, 10),
);

it('is null for planets, deep-sky objects and bodies without a magnitude law', () => {
  const season = seasonOf([planet('Jupiter'), galaxy(202.5, 47.2), { ...body(7), brightness: null }]);
  for (const showing of showings(season, dates[20]!)) expect(showing.range).toBeNull();
});

test.each([
  ['comet', 1],
  ['asteroid', 0.3],
] as const)('judges a %s as the same body %s magnitudes brighter and fainter is judged', (kind, by) => {
  // The faint and bright cases stand beside bodies whose law is that much fainter or brighter.
  let changed = 0;
  for (const h of [4, 6, 7.5]) {
    const season = seasonOf([body(h, kind), body(h - by, kind), body(h + by, kind)]);
    for (const date of dates) {
      const [base, brighter, fainter] = showings(season, date);
      const { range } = base!;
      expect(range!.magnitudes).toBe(by);
      for (const [known, judged] of [
        [range!.ifBrighter, brighter!],
        [range!.ifFainter, fainter!],
      ] as const) {
        expect(known.shown).toBe(judged.shown);
        expect(known.intervals).toHaveLength(judged.intervals.length);
        expect(Math.abs(known.minutes - judged.minutes)).toBeLessThan(0.05);
        known.intervals.forEach(({ startMs, endMs }, i) => {
          expect(Math.abs(startMs - judged.intervals[i]!.startMs)).toBeLessThan(1);
          expect(Math.abs(endMs - judged.intervals[i]!.endMs)).toBeLessThan(1);
        });
      }
      expect(range!.ifBrighter.minutes).toBeGreaterThanOrEqual(base!.minutes);
      expect(range!.ifFainter.minutes).toBeLessThanOrEqual(base!.minutes);
      if (range!.ifFainter.shown !== base!.shown) changed++;
    }
  }
  expect(changed).toBeGreaterThan(3);
});

it('says what changes, and in which light a fainter comet is lost', () => {
  const seen = new Set<string>();
  for (const h of [4, 6, 7.5, 9]) {
    const season = seasonOf([body(h)]);
    for (const date of dates) {
      const { showings: all, moon } = judgeEvening(createWorkbench(), season, site, DEFAULT_WEIGHTS, date);
      const [showing] = all;
      const { words, ifFainter, ifBrighter } = showing!.range!;
      const kind = words.replace(/\d\d:\d\d/g, 'T').replace(/\d+/g, 'N');
      seen.add(kind);
      if (words.startsWith('lost in the moonlight')) expect(moon.upMinutes).toBeGreaterThan(0);
      if (/^lost|^too faint/.test(words)) expect(ifFainter.intervals).toEqual([]);
      const later = /^from (\d\d:\d\d) if it runs a magnitude faint/.exec(words);
      if (later !== null) {
        expect(clockWords(ifFainter.intervals[0]!.startMs, 'Europe/Zurich')).toBe(later[1]);
        expect(ifFainter.intervals[0]!.startMs).toBeGreaterThan(showing!.intervals[0]!.startMs);
      }
      if (words.startsWith('the same if')) {
        // Each edge lies within a minute of the expected one in either case.
        expect(ifBrighter.minutes - ifFainter.minutes).toBeLessThan(4 * showing!.intervals.length);
      }
    }
  }
  expect([...seen]).toEqual(
    expect.arrayContaining([
      'the same if it runs a magnitude bright or faint',
      'from T if it runs a magnitude faint',
      'lost in the moonlight if it runs a magnitude faint; from T if it runs a magnitude bright',
      'T to T if it runs a magnitude bright',
    ]),
  );
});
