import { readElements, writeCometLine } from '#elements';
import { smallClub, type TestClub, wholeDatabase } from '../fixtures/smallClub';
import { addElementReading, addElementText, elementNames } from './loadElements';
import { listElementSets } from './targets';

const comet = 'C/2026 Q9 (Thistlewood)';

/** Invented sets of the small club's comet and of another. */
const CSV = [
  'designation,T,q,e,i,node,peri,epoch,H',
  'C/2026 Q9,2027-03-14.3,0.9112,1.0003,62.3,41.7,133.2,2027-02-10,6.5',
  'C/2026 Q9,2027-03-14.25,0.9108,1.0003,62.3,41.7,133.2,2027-01-10,6.5',
  'C/2026 Q9,2027-13-14,0.9108,1.0003,62.3,41.7,133.2,2027-01-10,6.5',
  'C/2026 R2,2027-05-14.25,1.9,1,12.3,141.7,33.2,2027-01-10,8.5',
].join('\n');

let club: TestClub;
beforeEach(async () => {
  club = await smallClub();
});
afterEach(() => club.close());

it('takes the sets of the target, oldest epoch first, and hands back the bad lines', async () => {
  const loaded = await addElementText(club.database, comet, { text: CSV, source: 'A circular' });
  expect(loaded.sets.map(({ number, epoch, source }) => [number, epoch?.slice(0, 10), source])).toEqual([
    [2, '2027-01-10', 'A circular'],
    [3, '2027-02-10', 'A circular'],
  ]);
  expect(loaded.others).toEqual(['C/2026 R2']);
  expect(loaded.problems.filter(({ severity }) => severity === 'error')).toMatchObject([
    { line: 4, column: 11 },
  ]);
  expect(loaded.target).toMatchObject({
    elementSets: 3,
    elements: { number: 3, perihelionDistanceAu: 0.9112 },
  });
  expect(loaded.change).toMatchObject({ before: { number: 1 }, after: { number: 3 } });
  expect(await listElementSets(club.database, comet)).toHaveLength(3);
});

it('passes over what is in use already', async () => {
  const text = CSV.split('\n').slice(0, 2).join('\n');
  expect((await addElementText(club.database, comet, { text })).held).toBe(0);
  const again = await addElementText(club.database, comet, { text });
  expect(again).toMatchObject({ sets: [], held: 1, change: null });
  expect(await listElementSets(club.database, comet)).toHaveLength(2);
});

it('reads a pasted line of the one-line format, and JSON', async () => {
  const [set] = readElements(CSV).sets;
  const { line } = writeCometLine(set!);
  const loaded = await addElementText(club.database, comet, { text: `${line!}\n` });
  expect(loaded).toMatchObject({ problems: [], sets: [{ number: 2, kind: 'comet', eccentricity: 1.0003 }] });
  const json = JSON.stringify([
    {
      designation: 'C/2026 Q9',
      kind: 'comet',
      epoch: '2027-02-20T00:00:00',
      perihelionTime: '2027-03-14T08:00:00',
      perihelionDistanceAu: 0.9113,
      eccentricity: 1.0002,
      inclinationDeg: 62.3,
      nodeDeg: 41.7,
      argumentOfPerihelionDeg: 133.2,
      absoluteMagnitude: 6.8,
      slope: 4,
    },
  ]);
  expect(await addElementText(club.database, comet, { text: json })).toMatchObject({
    problems: [],
    sets: [{ number: 3, perihelionDistanceAu: 0.9113 }],
  });
});

it('takes another body where it is named', async () => {
  const loaded = await addElementReading(club.database, comet, readElements(CSV), { body: 'C/2026 R2' });
  expect(loaded.sets).toMatchObject([{ number: 2, designation: 'C/2026 R2', perihelionDistanceAu: 1.9 }]);
});

it('keeps in its source how long the body was observed', async () => {
  const line =
    'K31K12Q 19.07  0.15 K31AB  34.90216  271.05533  122.68014    4.81377  0.5120884  0.31967626   2.1183406  6 E2031-L07    61   1   38 days 0.37 M-v 3Ek Invented   0804          2031 KQ12          20310628';
  const { sets } = await addElementText(club.database, comet, { text: line, body: '2031 KQ12' });
  expect(sets).toMatchObject([{ source: 'E2031-L07, from 38 days of observations' }]);
});

test.each([
  ['no elements at all', 'Dear all, clear skies.', 'Line 1, column 1: '],
  [
    'only bad lines',
    CSV.split('\n')
      .filter((_, i) => i === 0 || i === 3)
      .join('\n'),
    'Line 2, column 11: ',
  ],
  [
    'another body',
    CSV.split('\n')
      .filter((_, i) => i === 0 || i === 4)
      .join('\n'),
    'it holds C/2026 R2',
  ],
])('refuses a text with %s and changes nothing', async (_, text, message) => {
  const before = await wholeDatabase(club.database);
  await expect(addElementText(club.database, comet, { text })).rejects.toMatchObject({
    kind: 'invalid',
    message: expect.stringContaining(message) as unknown,
  });
  expect(await wholeDatabase(club.database)).toBe(before);
});

it('names the body as a file may have it', async () => {
  expect(await elementNames(club.database, comet)).toEqual(['C/2026 Q9', comet]);
  await expect(elementNames(club.database, 'Moon')).rejects.toMatchObject({ kind: 'conflict' });
});
