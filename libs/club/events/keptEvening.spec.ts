import { type JudgedEvening } from '#nights';
import { toNightsJson } from '../evenings';
import { eveningAsText, eveningFromText } from './keptEvening';

const startMs = Date.parse('2027-02-06T18:10:20Z');
const interval = { startMs, endMs: startMs + 3_600_000 };
const evening: JudgedEvening = {
  site: 'Brackenfold',
  date: '2027-02-06',
  zone: 'Europe/Zurich',
  publicHours: interval,
  note: null,
  score: 81.3,
  parts: [],
  shown: 1,
  of: 1,
  showings: [
    {
      target: 'Comet',
      shown: true,
      minutes: 60,
      intervals: [interval],
      best: null,
      why: '',
      range: {
        magnitudes: 1,
        ifBrighter: { shown: true, minutes: 60, intervals: [interval] },
        ifFainter: { shown: false, minutes: 0, intervals: [] },
        matters: true,
        words: 'lost in the moonlight if it runs a magnitude faint',
      },
    },
  ],
  moon: { illuminatedFraction: 0.9, upMinutes: 60 },
  darkMinutes: 0,
};

it('keeps what another brightness changes', () => {
  expect(eveningFromText(eveningAsText(evening))).toEqual(evening);
});

it('reads evenings that were kept before ranges were judged', () => {
  const [showing] = evening.showings;
  // JSON leaves out what is undefined, as those evenings did.
  const old = JSON.stringify({ ...evening, showings: [{ ...showing, range: undefined }] });
  expect(old).not.toContain('range');
  expect(eveningFromText(old).showings).toEqual([{ ...showing, range: null }]);
});

it('gives other programs the cases with ISO instants', () => {
  const searched = { sites: 1, evenings: 1, targets: 1, steps: 0, milliseconds: 0 };
  const json = toNightsJson({ searched, evenings: [evening], rows: [], closed: [], habit: null });
  expect(json.evenings[0]!.showings[0]!.range).toEqual({
    magnitudes: 1,
    ifBrighter: {
      shown: true,
      minutes: 60,
      intervals: [{ start: '2027-02-06T18:10:20.000Z', end: '2027-02-06T19:10:20.000Z' }],
    },
    ifFainter: { shown: false, minutes: 0, intervals: [] },
    matters: true,
    words: 'lost in the moonlight if it runs a magnitude faint',
  });
});
