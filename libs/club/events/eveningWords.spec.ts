import { type JudgedEvening, type Showing } from '#nights';
import { dateWords, directionWords, eveningSentence, timesWords } from './eveningWords';

const startMs = Date.parse('2027-03-13T19:10:20Z');
const evening = {
  site: 'Brackenfold',
  date: '2027-03-13',
  zone: 'Europe/Zurich',
  publicHours: { startMs, endMs: startMs + 150 * 60_000 },
  note: null,
  shown: 6,
  of: 7,
  moon: { illuminatedFraction: 0.434, upMinutes: 25.4 },
} as unknown as JudgedEvening;

const seen = (altitudeDeg: number, azimuthDeg: number): Showing =>
  ({ best: { altitudeDeg, azimuthDeg } }) as unknown as Showing;

it('says an evening as a sentence', () => {
  expect(eveningSentence(evening, 'en-GB')).toBe(
    'Saturday 13 March at Brackenfold: 6 of 7 targets, 20:10 to 22:40; the Moon, 43% lit, is up for 25 of 150 minutes.',
  );
  expect(eveningSentence({ ...evening, moon: { illuminatedFraction: 0.2, upMinutes: 0 } }, 'en-GB')).toMatch(
    /; no Moon\.$/,
  );
  expect(eveningSentence({ ...evening, moon: { illuminatedFraction: 1, upMinutes: 150 } }, 'en-GB')).toMatch(
    /the Moon, 100% lit, is up throughout\.$/,
  );
});

it('says why an evening has no public hours', () => {
  const bright = { ...evening, publicHours: null, note: 'There is no nautical dusk on this evening.' };
  expect(eveningSentence(bright, 'en-GB')).toBe(
    'Saturday 13 March at Brackenfold: There is no nautical dusk on this evening.',
  );
});

it("writes dates in the club's own manner", () => {
  expect(dateWords('2027-03-13', 'en-US', true)).toBe('Saturday, March 13, 2027');
  expect(dateWords('2027-03-13', 'de-CH')).toBe('Samstag, 13. März');
});

it('says heights and directions, and no direction almost overhead', () => {
  expect(directionWords(seen(24.4, 225))).toBe('24 degrees high in the south-west');
  expect(directionWords(seen(5, 359))).toBe('5 degrees high in the north');
  expect(directionWords(seen(87, 270))).toBe('87 degrees high, almost overhead');
  expect(directionWords({ best: null } as unknown as Showing)).toBe('not to be seen');
});

it('joins stretches of time across a change of the clocks', () => {
  const from = Date.parse('2027-03-28T00:30:00Z');
  expect(timesWords([{ startMs: from, endMs: from + 3_600_000 }], 'Europe/Zurich')).toBe('01:30 to 03:30');
});
