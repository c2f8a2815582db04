import { type JudgedEvening } from '#nights';
import { callOffEvent, changeEvent, keepEvent } from '../events/events';
import { smallClub, type TestClub, wholeDatabase } from '../fixtures/smallClub';
import { addElementSet, listElementSets } from '../targets/targets';
import { elementChanges, eventChanges } from './elementChanges';

const comet = 'C/2026 Q9 (Thistlewood)';
/** The set that the small club begins with. */
const first = {
  source: 'Invented for this test',
  kind: 'comet' as const,
  epoch: '2027-03-01',
  perihelionTime: '2027-03-14T05:20:00',
  perihelionDistanceAu: 0.91,
  eccentricity: 1.0004,
  inclinationDeg: 62.3,
  nodeDeg: 41.7,
  argumentOfPerihelionDeg: 133.2,
  absoluteMagnitude: 6.5,
  slope: 4,
};
const newer = { ...first, perihelionTime: '2027-03-14T09:00:00', perihelionDistanceAu: 0.911 };

/** What was judged then does not matter here: both accounts are judged anew. */
function judged(date: string): JudgedEvening {
  const startMs = Date.parse(`${date}T17:10:00Z`);
  return {
    site: 'Brackenfold',
    date,
    zone: 'Europe/Zurich',
    publicHours: { startMs, endMs: startMs + 150 * 60_000 },
    note: null,
    score: 50,
    parts: [],
    shown: 0,
    of: 0,
    showings: [],
    moon: { illuminatedFraction: 0, upMinutes: 0 },
    darkMinutes: 0,
  };
}

let club: TestClub;
beforeEach(async () => {
  club = await smallClub();
});
afterEach(() => club.close());

async function makeEventOn(date: string): Promise<string> {
  const wishes = { siteName: 'Brackenfold', programmeName: 'Winter lights', date, words: '' };
  return (await keepEvent(club.database, wishes, judged(date))).id;
}

it('lists the coming events that newer elements touch, when they come and ever after', async () => {
  const past = await makeEventOn('2027-01-02');
  const called = await makeEventOn('2027-02-05');
  await callOffEvent(club.database, called, { why: 'Fog.' });
  const coming = await makeEventOn('2027-02-06');
  club.setNow('2027-01-20T12:00:00Z');

  const { target, set, change } = await addElementSet(club.database, comet, newer);
  expect(target).toMatchObject({ name: comet, elementSets: 2 });
  expect(set.number).toBe(2);
  expect(change).toMatchObject({ target: comet, before: { number: 1 }, after: { number: 2 }, untouched: 0 });
  expect(change!.touched.map(({ date, events }) => [date, events.map(({ id }) => id)])).toEqual([
    ['2027-02-06', [coming]],
  ]);
  const [touched] = change!.touched;
  expect(touched!.shiftArcmin).toBeGreaterThan(2);
  expect(touched!.sentence).toMatch(
    /^New elements: C\/2026 Q9 \(Thistlewood\) stands .* of where charts printed before Wednesday,? 20 January show it: print /,
  );
  expect(change!.sentence).toMatch(
    /^The new elements of C\/2026 Q9 \(Thistlewood\) touch 1 coming evening: /,
  );

  expect(await elementChanges(club.database, comet)).toEqual(change);
  const byEvent = await eventChanges(club.database);
  expect([...byEvent.keys()]).toEqual([coming]);
  expect(byEvent.get(coming)).toEqual([{ target: comet, ...touched }]);
  expect(byEvent.has(past)).toBe(false);
  expect((await eventChanges(club.database, coming)).size).toBe(1);
  expect((await eventChanges(club.database, past)).size).toBe(0);

  // Once the evening is over nothing of it is told any more.
  club.setNow('2027-02-08T12:00:00Z');
  expect((await eventChanges(club.database)).size).toBe(0);
  expect(await elementChanges(club.database, comet)).toMatchObject({ touched: [], untouched: 0 });
});

it('judges an event by its own hours where they were moved', async () => {
  const id = await makeEventOn('2027-02-06');
  await changeEvent(club.database, id, {
    startsAt: '2027-02-06T18:30:00+01:00',
    endsAt: '2027-02-06T19:00:00+01:00',
  });
  club.setNow('2027-01-20T12:00:00Z');
  const { change } = await addElementSet(club.database, comet, newer);
  for (const { before, after } of change!.touched) {
    for (const { start, end } of [...before.intervals, ...after.intervals]) {
      expect(Date.parse(start)).toBeGreaterThanOrEqual(Date.parse('2027-02-06T17:30:00Z'));
      expect(Date.parse(end)).toBeLessThanOrEqual(Date.parse('2027-02-06T18:00:00Z'));
    }
  }
  expect(change!.touched[0]!.after.minutes).toBeGreaterThan(20);
});

it('compares an event with the elements it was judged by, however many came since', async () => {
  const id = await makeEventOn('2027-02-06');
  club.setNow('2027-01-20T12:00:00Z');
  await addElementSet(club.database, comet, newer);
  club.setNow('2027-01-21T12:00:00Z');
  const { change } = await addElementSet(club.database, comet, first);
  // Back to what it was judged by: the last set undoes what the one before it did.
  expect(change!.touched).toHaveLength(1);
  expect((await eventChanges(club.database)).get(id)).toBeUndefined();
});

it('finds nothing touched by a set that equals the one in use', async () => {
  await makeEventOn('2027-02-06');
  await makeEventOn('2027-02-13');
  club.setNow('2027-01-20T12:00:00Z');
  const { change } = await addElementSet(club.database, comet, first);
  expect(change).toMatchObject({
    touched: [],
    untouched: 2,
    sentence: `The new elements of ${comet} change nothing in the coming evenings.`,
  });
  expect((await eventChanges(club.database)).size).toBe(0);
});

it('says that there is nothing to compare while there is one set', async () => {
  expect(await elementChanges(club.database, comet)).toBeNull();
  await expect(elementChanges(club.database, 'Jupiter')).rejects.toMatchObject({ kind: 'conflict' });
  await expect(elementChanges(club.database, 'Nothing')).rejects.toMatchObject({ kind: 'notFound' });
});

it('refuses elements that cannot be followed to a coming evening, and keeps nothing', async () => {
  await makeEventOn('2027-02-06');
  const before = await wholeDatabase(club.database);
  await expect(addElementSet(club.database, comet, { ...newer, epoch: '1901-01-01' })).rejects.toMatchObject({
    kind: 'invalid',
  });
  expect(await wholeDatabase(club.database)).toBe(before);
  expect(await listElementSets(club.database, comet)).toHaveLength(1);
});
