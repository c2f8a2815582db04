import { type JudgedEvening } from '#nights';
import { smallClub, type TestClub, wholeDatabase } from '../fixtures/smallClub';
import { clubCalendar } from '../feed/clubCalendar';
import { callOffEvent, changeEvent, getEvent, keepEvent, listEvents, publishEvent } from './events';

/** An evening as the search would give it, with figures of this test's own. */
function judged(date: string, change: Partial<JudgedEvening> = {}): JudgedEvening {
  const startMs = Date.parse(`${date}T18:10:20Z`);
  return {
    site: 'Brackenfold',
    date,
    zone: 'Europe/Zurich',
    publicHours: { startMs, endMs: startMs + 150 * 60_000 },
    note: null,
    score: 81.3,
    parts: [{ name: 'programme', points: 81.3, of: 100, why: 'All 4 targets can be shown.' }],
    shown: 1,
    of: 1,
    showings: [
      {
        target: 'Jupiter',
        shown: true,
        minutes: 60,
        intervals: [{ startMs, endMs: startMs + 3_600_000 }],
        best: {
          utcMs: startMs + 600_000,
          altitudeDeg: 41.4,
          azimuthDeg: 134,
          skyBrightness: 20.9,
          margin: 9.1,
        },
        why: 'From 19:10 to 20:10.',
        range: null,
      },
    ],
    moon: { illuminatedFraction: 0.12, upMinutes: 0 },
    darkMinutes: 120,
    ...change,
  };
}

const wishes = { siteName: 'brackenfold', programmeName: 'Winter lights', date: '2027-02-06', words: '' };

let club: TestClub;
beforeEach(async () => {
  club = await smallClub();
});
afterEach(() => club.close());

it('makes a draft of a judged evening, to whole minutes, with the first line of its history', async () => {
  const event = await keepEvent(club.database, wishes, judged('2027-02-06'));
  expect(event).toMatchObject({
    status: 'draft',
    sequence: 0,
    title: 'Winter lights at Brackenfold',
    date: '2027-02-06',
    startsAt: '2027-02-06T19:10:00+01:00',
    endsAt: '2027-02-06T21:40:00+01:00',
    site: { name: 'Brackenfold' },
    programme: { name: 'Winter lights' },
    publishedAt: null,
    steps: [{ number: 1, what: 'made', at: '2027-01-05T12:00:00.000Z' }],
  });
  expect(event.uid).toMatch(/^[0-9a-f-]{36}$/);
  expect(event.evening).toEqual(judged('2027-02-06'));
  expect(await clubCalendar(club.database)).not.toContain('BEGIN:VEVENT');
});

it('lives through publishing, a change and a calling off, with one identity and a rising revision', async () => {
  const { id, uid } = await keepEvent(club.database, wishes, judged('2027-02-06'));
  await changeEvent(club.database, id, { title: 'Jupiter for everyone' });
  expect((await getEvent(club.database, id)).sequence).toBe(0);

  club.setNow('2027-01-10T09:00:00Z');
  expect(await publishEvent(club.database, id)).toMatchObject({ status: 'published', sequence: 0, uid });

  club.setNow('2027-01-20T09:00:00Z');
  const changed = await changeEvent(club.database, id, {
    startsAt: '2027-02-06T19:30:00+01:00',
    why: 'Later dusk.',
  });
  expect(changed).toMatchObject({ sequence: 1, uid, startsAt: '2027-02-06T19:30:00+01:00' });
  expect(changed.steps.at(-1)).toMatchObject({
    number: 4,
    what: 'changed',
    at: '2027-01-20T09:00:00.000Z',
    why: 'Changed: start from 19:10 to 19:30. Later dusk.',
  });

  club.setNow('2027-02-06T15:00:00Z');
  expect(await callOffEvent(club.database, id, { why: 'Fog in the valley.' })).toMatchObject({
    status: 'calledOff',
    sequence: 2,
    uid,
    callOffWhy: 'Fog in the valley.',
  });
  const feed = await clubCalendar(club.database);
  for (const line of [`UID:${uid}`, 'STATUS:CANCELLED', 'SEQUENCE:2', 'DTSTAMP:20270206T150000Z']) {
    expect(feed).toContain(`${line}\r\n`);
  }
});

it('leaves no trace of a change that changes nothing', async () => {
  const { id } = await keepEvent(club.database, wishes, judged('2027-02-06'));
  await publishEvent(club.database, id);
  const before = await wholeDatabase(club.database);
  await changeEvent(club.database, id, { startsAt: '2027-02-06T18:10:00Z', words: '' });
  expect(await wholeDatabase(club.database)).toBe(before);
});

it('keeps a called-off draft out of the calendar', async () => {
  const { id } = await keepEvent(club.database, wishes, judged('2027-02-06'));
  expect(await callOffEvent(club.database, id, { why: 'No volunteers.' })).toMatchObject({ sequence: 0 });
  expect(await clubCalendar(club.database)).not.toContain('BEGIN:VEVENT');
});

it('takes a new event where the old one was called off', async () => {
  const first = await keepEvent(club.database, wishes, judged('2027-02-06'));
  await callOffEvent(club.database, first.id, { why: 'No volunteers.' });
  const second = await keepEvent(club.database, wishes, judged('2027-02-06'));
  expect(second.uid).not.toBe(first.uid);
  expect(await listEvents(club.database)).toHaveLength(2);
});

it('makes one event of an evening, however many ask at once', async () => {
  const asked = Array.from({ length: 12 }, () => keepEvent(club.database, wishes, judged('2027-02-06')));
  const answers = await Promise.allSettled(asked);
  expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
  for (const answer of answers) {
    if (answer.status === 'rejected') expect(answer.reason).toMatchObject({ kind: 'conflict' });
  }
  expect(await listEvents(club.database)).toHaveLength(1);
});

it('counts every change of many at once', async () => {
  const { id } = await keepEvent(club.database, wishes, judged('2027-02-06'));
  await publishEvent(club.database, id);
  await Promise.all(
    Array.from({ length: 10 }, (_, i) => changeEvent(club.database, id, { words: `Version ${String(i)}` })),
  );
  const { sequence, steps } = await getEvent(club.database, id);
  expect(sequence).toBe(10);
  expect(steps.map(({ number }) => number)).toEqual(Array.from({ length: 12 }, (_, i) => i + 1));
});

it('gives the calendar of one site alone', async () => {
  const here = await keepEvent(club.database, wishes, judged('2027-02-06'));
  const there = await keepEvent(
    club.database,
    { ...wishes, siteName: 'Wether Downs' },
    judged('2027-02-06', { site: 'Wether Downs', zone: 'Pacific/Auckland' }),
  );
  await publishEvent(club.database, here.id);
  await publishEvent(club.database, there.id);
  const feed = await clubCalendar(club.database, { site: 'Wether Downs' });
  expect(feed).toContain(there.uid);
  expect(feed).not.toContain(here.uid);
});

describe('refuses, and changes nothing:', () => {
  let id: string;
  beforeEach(async () => {
    ({ id } = await keepEvent(club.database, wishes, judged('2027-02-06')));
    await publishEvent(club.database, id);
  });

  const refusals: readonly (readonly [string, () => Promise<unknown>, string, string])[] = [
    [
      'a second event on the evening',
      () => keepEvent(club.database, wishes, judged('2027-02-06')),
      'conflict',
      'has an event on that evening already',
    ],
    [
      'an evening without public hours',
      () =>
        keepEvent(
          club.database,
          { ...wishes, date: '2027-06-21' },
          judged('2027-06-21', { publicHours: null, note: 'There is no civil dusk on this evening.' }),
        ),
      'conflict',
      'There is no civil dusk on this evening.',
    ],
    [
      'an unknown site',
      () => keepEvent(club.database, { ...wishes, siteName: 'Elsewhere' }, judged('2027-02-07')),
      'notFound',
      'siteName was "Elsewhere"; give the name of a site: there are Brackenfold, Wether Downs.',
    ],
    [
      'publishing twice',
      () => publishEvent(club.database, id),
      'conflict',
      'The event is published already.',
    ],
    [
      'an end before the start',
      () => changeEvent(club.database, id, { endsAt: '2027-02-06T19:00:00+01:00' }),
      'invalid',
      'endsAt was "2027-02-06T19:00:00+01:00"; give an end after the start.',
    ],
    [
      'a time on another day',
      () => changeEvent(club.database, id, { endsAt: '2027-02-08T19:00:00+01:00' }),
      'invalid',
      'give a time in the evening of 2027-02-06, from 2027-02-06T12:00:00.000+01:00',
    ],
    [
      'a time without its offset',
      () => changeEvent(club.database, id, { endsAt: '2027-02-06T21:00:00' }),
      'invalid',
      'give an instant with its offset, such as 2027-03-14T20:10:00+01:00',
    ],
    [
      'a calling off without reason',
      () => callOffEvent(club.database, id, { why: ' ' }),
      'invalid',
      'why was " "; give one line of text',
    ],
    [
      'an event nobody knows',
      () => getEvent(club.database, 'nothing'),
      'notFound',
      'event was "nothing"; give the id of an event.',
    ],
  ];
  it.each(refusals)('%s', async (_what, request, kind, message) => {
    const before = await wholeDatabase(club.database);
    await expect(request()).rejects.toMatchObject({
      kind,
      message: expect.stringContaining(message) as unknown,
    });
    expect(await wholeDatabase(club.database)).toBe(before);
  });

  it('a change after the calling off', async () => {
    await callOffEvent(club.database, id, { why: 'Fog.' });
    const before = await wholeDatabase(club.database);
    await expect(changeEvent(club.database, id, { words: 'More' })).rejects.toMatchObject({
      kind: 'conflict',
    });
    await expect(callOffEvent(club.database, id, { why: 'Fog.' })).rejects.toMatchObject({
      kind: 'conflict',
    });
    await expect(publishEvent(club.database, id)).rejects.toMatchObject({ kind: 'conflict' });
    expect(await wholeDatabase(club.database)).toBe(before);
  });
});
