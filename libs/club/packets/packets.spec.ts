import { spawnSync } from 'node:child_process';
import { createWorkbench, judgeEvening, prepareSeason, prepareSite } from '#nights';
import { SHEET_NAMES } from '#print';
import { changeEvent, keepEvent, publishEvent } from '../events/events';
import { type EventView } from '../events/eventView';
import { smallClub, type TestClub, wholeDatabase } from '../fixtures/smallClub';
import { getNightProgramme } from '../programmes/programmes';
import { updateClub } from '../settings/club';
import { nightSite } from '../sites/nightSite';
import { getSite, updateSite } from '../sites/sites';
import { addElementSet, updateTarget } from '../targets/targets';
import { closePacketPool, listPackets, type PacketInput, previewPacket, printPacket } from './index';

// Whole packets are drawn here, on whatever else the machine is doing.
jest.setTimeout(60_000);

const DATE = '2027-02-13';
let club: TestClub;
let event: EventView;

beforeAll(async () => {
  club = await smallClub();
  await updateClub(club.database, { publicAddress: 'https://evenings.fernhollow.example' });
  const site = prepareSite(nightSite(await getSite(club.database, 'Brackenfold')));
  const { programme, weights } = await getNightProgramme(club.database, 'Winter lights');
  const judged = judgeEvening(createWorkbench(), prepareSeason(programme, DATE, DATE), site, weights, DATE);
  const wishes = { siteName: 'Brackenfold', programmeName: 'Winter lights', date: DATE, words: '' };
  const draft = await keepEvent(club.database, wishes, judged);
  event = await publishEvent(club.database, draft.id);
});

afterAll(async () => {
  await closePacketPool();
  await club.close();
});

function textOf(body: Buffer): string {
  const { stdout, status, stderr } = spawnSync('pdftotext', ['-layout', '-', '-'], { input: body });
  expect({ status, stderr: stderr.toString() }).toEqual({ status: 0, stderr: '' });
  return stdout.toString();
}

const print = (change: Partial<PacketInput> = {}, watch = {}) =>
  printPacket(club.database, { eventId: event.id, ...change }, watch);

it('draws the packet in a worker, tells its progress, and keeps what it was computed from', async () => {
  const seen: string[] = [];
  const packet = await print({}, { onProgress: (done: number, of: number) => seen.push(`${done}/${of}`) });
  expect(packet.fileName).toBe(`${DATE}-Brackenfold-${packet.revision}.pdf`);
  expect(seen).toEqual(Array.from({ length: packet.sheets }, (_, i) => `${i + 1}/${packet.sheets}`));
  const [kept] = await listPackets(club.database, event.id);
  expect(kept).toMatchObject({
    revision: packet.revision,
    changed: [],
    computedAt: '2027-01-05T12:00:00.000Z',
    printings: [{ paper: 'a4', sheets: [...SHEET_NAMES] }],
    imprint: { hours: { startsAt: event.startsAt, endsAt: event.endsAt } },
  });
});

it('prints the same bytes again, on another day', async () => {
  const first = await print();
  club.setNow('2027-01-20T09:00:00Z');
  const again = await print();
  club.setNow('2027-01-05T12:00:00Z');
  expect(again.body.equals(first.body)).toBe(true);
  expect(again.revision).toBe(first.revision);
});

it('shows each target inside its showing, at the times that every sheet prints', async () => {
  const pages = textOf((await print()).body).split('\f');
  const run = pages.find((page) => page.includes('Run sheet') && page.includes('What to say'))!;
  const shown = event.evening.showings.filter((showing) => showing.shown);
  expect(shown.length).toBeGreaterThan(1);
  const station = pages.filter((page) => page.includes('Station sheet')).join('\n');
  for (const { target } of shown) {
    const name = target.split(' ')[0]!;
    const [, from, to] = new RegExp(`(\\d\\d:\\d\\d)–(\\d\\d:\\d\\d) +\\d+ +${name}`).exec(run)!;
    expect(station).toContain(`${from!}–${to!}`);
    const showing = shown.find((one) => one.target === target)!;
    const ms = (clock: string) => Date.parse(`${DATE}T${clock}:00+01:00`);
    expect(showing.intervals.some(({ startMs, endMs }) => startMs <= ms(from!) && ms(to!) <= endMs)).toBe(
      true,
    );
  }
});

it('prints only the sheets asked for, on Letter', async () => {
  const packet = await print({ sheets: ['site', 'cover'], paper: 'letter' });
  expect(packet.sheets).toBe(2);
  const [site, cover] = textOf(packet.body).split('\f');
  expect(site).toContain('timber yard');
  expect(cover).toContain('Evening packet');
});

it('keeps breaks, under a revision of their own', async () => {
  const plain = await print({ sheets: ['runSheet'] });
  const broken = await print({ sheets: ['runSheet'], breaks: [{ from: '19:30', to: '19:45' }] });
  expect(textOf(broken.body)).toContain('Break: 19:30 to 19:45');
  expect(broken.revision).not.toBe(plain.revision);
});

it('says what has changed since, and goes back to the old revision when it is undone', async () => {
  const { revision } = await print({ sheets: ['cover'] });
  const changes = async () =>
    (await listPackets(club.database, event.id)).find((packet) => packet.revision === revision)!.changed;
  await changeEvent(club.database, event.id, { endsAt: `${DATE}T21:00:00+01:00` });
  expect(await changes()).toEqual(['the public hours have changed']);
  expect((await print({ sheets: ['cover'] })).revision).not.toBe(revision);
  await changeEvent(club.database, event.id, { endsAt: event.endsAt });
  expect(await changes()).toEqual([]);
  await updateSite(club.database, 'Brackenfold', { hazards: 'An open ditch.' });
  expect(await changes()).toEqual(['words on the sheets have changed']);
  await updateSite(club.database, 'Brackenfold', { hazards: '' });
  await updateTarget(club.database, 'Jupiter', { gloss: 'The great planet.' });
  expect(await changes()).toEqual(['words on the sheets have changed']);
  await updateTarget(club.database, 'Jupiter', { gloss: '' });
  expect((await print({ sheets: ['cover'] })).revision).toBe(revision);
  await addElementSet(club.database, 'C/2026 Q9 (Thistlewood)', {
    kind: 'comet',
    epoch: '2027-03-01',
    perihelionTime: '2027-03-14T09:00:00',
    perihelionDistanceAu: 0.912,
    eccentricity: 1.0004,
    inclinationDeg: 62.3,
    nodeDeg: 41.7,
    argumentOfPerihelionDeg: 133.2,
  });
  expect(await changes()).toEqual(['C/2026 Q9 (Thistlewood) has new elements (set 2, printed from set 1)']);
});

it.each([
  [{ eventId: 'nothing' }, 'event was "nothing"; give the id of an event.'],
  [{ sheets: [] }, 'at least one sheet'],
  [{ sheets: ['cover', 'cover'] }, 'each sheet once'],
  [{ sheets: ['backdrop'] }, 'sheets of a packet: cover, runSheet'],
  [{ paper: 'a5' }, 'a4 or letter'],
  [{ scales: ['wide'] }, 'scales of a chart: eye, binocular, eyepiece'],
  [{ leastLookMinutes: 2 }, 'minutes from 5 to 60'],
  [{ breaks: [{ from: '21:00', to: '20:45' }] }, 'a time after the break begins at 21:00'],
] as const)('refuses %j and keeps nothing', async (change, message) => {
  const before = await wholeDatabase(club.database);
  const printings = await club.database.client.packetPrinting.count();
  await expect(print(change as unknown as Partial<PacketInput>)).rejects.toMatchObject({
    name: 'ClubProblem',
    message: expect.stringContaining(message) as unknown,
  });
  expect(await wholeDatabase(club.database)).toBe(before);
  expect(await club.database.client.packetPrinting.count()).toBe(printings);
});

it('shows the same sheets on screen, and keeps nothing of it', async () => {
  const before = await wholeDatabase(club.database);
  const shown = await previewPacket(club.database, { eventId: event.id, sheets: ['runSheet', 'finder'] });
  const printed = await print({ sheets: ['runSheet', 'finder'] });
  expect(shown).toHaveLength(printed.sheets);
  expect(shown.map(({ name }) => name).slice(0, 2)).toEqual(['runSheet', 'finder']);
  for (const { svg } of shown) {
    expect(svg).toMatch(/^<svg /);
    expect(svg).toContain(printed.revision);
  }
  expect(await wholeDatabase(club.database)).toBe(before);
});

it('names a promised target that has been renamed since, rather than losing it', async () => {
  await updateTarget(club.database, 'Jupiter', { name: 'The great planet' });
  const { body } = await print({ sheets: ['runSheet'] });
  await updateTarget(club.database, 'The great planet', { name: 'Jupiter' });
  expect(textOf(body)).toContain('Jupiter: It is no longer on the programme under this name.');
});

it('stops when told to', async () => {
  const stop = new AbortController();
  const printing = print({}, { signal: stop.signal, onProgress: () => stop.abort() });
  await expect(printing).rejects.toMatchObject({ name: 'AbortError' });
});
