import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { closeDatabase, closeSearchPool, listEvents, openDatabase } from '#club';
import { loadDemo } from '#demo-data';

// Whole packets are drawn here, on whatever else the machine is doing.
jest.setTimeout(60_000);

const root = join(__dirname, '..', '..');
const folder = mkdtempSync(join(tmpdir(), 'duskwright-packet-'));
const db = join(folder, 'club.db');
const out = join(folder, 'packet.pdf');
let event = '';

beforeAll(async () => {
  const database = await openDatabase({ file: db, now: () => new Date('2026-12-01T12:00:00Z') });
  await loadDemo(database, { asOf: '2026-12-01' });
  event = (await listEvents(database))[0]!.id;
  await closeSearchPool();
  await closeDatabase(database);
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

function packet(...words: string[]) {
  rmSync(out, { force: true });
  const main = join(root, 'dist', 'apps', 'cli', 'main.js');
  return spawnSync(process.execPath, [main, 'packet', '--db', db, ...words], { cwd: root, encoding: 'utf8' });
}

it('writes the sheets asked for and says so, the same bytes each time', () => {
  const wanted = ['--event', event, '--out', out, '--sheets', 'runSheet,cover', '--break', '19:00-19:10'];
  const first = packet(...wanted, '--json');
  expect([first.status, first.stderr]).toEqual([0, '']);
  const bytes = readFileSync(out);
  expect(JSON.parse(first.stdout)).toEqual({
    out,
    sheets: 2,
    bytes: bytes.length,
    revision: expect.stringMatching(/^[0-9A-HJKMNP-TV-Z]{6}$/) as unknown,
  });
  const second = packet(...wanted);
  expect([second.status, second.stdout]).toEqual([0, '']);
  expect(second.stderr).toContain(', 2 sheets, revision ');
  expect(readFileSync(out).equals(bytes)).toBe(true);
});

it.each([
  [['--event', 'EVENT'], '--out was left out; give a file that ends in .pdf.'],
  [['--out', 'OUT', '--event', 'nobody'], 'event was "nobody"; give the id of an event.'],
  [['--out', 'OUT', '--event', 'EVENT', '--sheets', 'cover,menu'], 'sheets of a packet: cover, runSheet'],
  [['--out', 'OUT', '--event', 'EVENT', '--break', 'soon'], 'breaks[0].from'],
])('refuses %j with exit status 2 and writes nothing', (words, message) => {
  const named = words.map((word) => ({ EVENT: event, OUT: out })[word] ?? word);
  const { status, stderr } = packet(...named);
  expect(stderr).toContain(message);
  expect(status).toBe(2);
  expect(existsSync(out)).toBe(false);
});
