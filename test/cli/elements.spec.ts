import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { cometElementSets } from '../../demo-data/orbits';
import { answer, duskwright } from './run';

// Each call starts a process of its own, on machines that may be busy.
jest.setTimeout(30_000);

const asOf = '2026-12-01';
const folder = mkdtempSync(join(tmpdir(), 'duskwright-elements-'));
const database = join(folder, 'demo.db');
const [oldFile, newFile] = cometElementSets(asOf).map((set, i) => {
  const file = join(folder, `set-${String(i)}.json`);
  writeFileSync(file, JSON.stringify([{ ...set, name: 'Ilvermere' }]));
  return file;
}) as [string, string];

beforeAll(() => {
  const { status, stderr } = duskwright(['demo', '--db', database, '--as-of', asOf]);
  if (status !== 0) throw new Error(stderr);
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

interface ShiftJson {
  readonly body: string;
  readonly shiftArcsec: number;
  readonly shiftArcmin: number;
  readonly positionAngleDeg: number;
  readonly direction: string;
  readonly magnitudeChange: number;
  readonly scales: readonly {
    readonly scale: string;
    readonly harmless: boolean;
    readonly fieldDeg: number;
  }[];
}

describe('elements compare', () => {
  const at = ['--site', '42,-7,500', '--at', '2027-01-01T20:00:00Z'];

  it('tells the shift in arcmin, in fields of each scale, and whether it can be seen', () => {
    const { bodies } = answer<{ bodies: ShiftJson[] }>(['elements', 'compare', oldFile, newFile, ...at]);
    expect(bodies).toHaveLength(1);
    const [shift] = bodies;
    expect(shift!.shiftArcmin).toBeCloseTo(shift!.shiftArcsec / 60, 12);
    expect(shift!.shiftArcmin).toBeGreaterThan(10);
    expect(shift!.scales.map(({ scale, fieldDeg }) => [scale, fieldDeg])).toEqual([
      ['eye', 60],
      ['binocular', 8],
      ['eyepiece', 1.5],
    ]);
    expect(shift!.scales.every(({ harmless }) => !harmless)).toBe(true);
  });

  it('finds no shift between a file and itself', () => {
    const { bodies } = answer<{ bodies: ShiftJson[] }>(['elements', 'compare', oldFile, oldFile, ...at]);
    expect(bodies[0]).toMatchObject({ shiftArcsec: 0, magnitudeChange: 0 });
    expect(bodies[0]!.scales.every(({ harmless }) => harmless)).toBe(true);
  });
});

describe('elements trust', () => {
  it('trusts the long-observed set and not the one of nine days', () => {
    const trust = (file: string) =>
      answer<{ bodies: { observedArcDays: number; eyepiece: { bad: number }; refresh: boolean }[] }>([
        'elements',
        'trust',
        file,
        '--body',
        'Ilvermere',
        '--date',
        '2026-12-12',
      ]).bodies[0]!;
    expect(trust(newFile)).toMatchObject({ observedArcDays: 107, refresh: false });
    expect(trust(oldFile)).toMatchObject({ observedArcDays: 9, refresh: true });
    expect(trust(newFile).eyepiece.bad).toBeLessThan(0.01);
    expect(trust(oldFile).eyepiece.bad).toBeGreaterThan(1);
  });

  test.each([
    [['--date', '2026-12-12', '--body', 'Nobody'], '--body was "Nobody"'],
    [['--body', 'Ilvermere'], '--date was left out'],
    [['--date', '2026-12-12', '--finder', '0'], '--finder was "0"'],
  ])('refuses %j with exit status 2', (args, message) => {
    const { status, stdout, stderr } = duskwright(['elements', 'trust', newFile, ...args]);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });
});

describe('elements load', () => {
  const target = ['--target', 'Comet Ilvermere', '--db', database];

  it('adds what is new of the target and says what that changes', () => {
    const loaded = answer<{
      sets: { number: number }[];
      held: number;
      change: { touched: { sentence: string; printAgain: string[] }[] };
    }>(['elements', 'load', oldFile, ...target]);
    expect(loaded.sets).toMatchObject([{ number: 3 }]);
    expect(loaded.change.touched).toHaveLength(1);
    expect(loaded.change.touched[0]!.printAgain).toContain('binocular');
    const { change } = answer<{ change: unknown }>(['elements', 'changes', ...target]);
    expect(change).toEqual(loaded.change);
    expect(answer(['elements', 'load', oldFile, ...target])).toMatchObject({
      sets: [],
      held: 1,
      change: null,
    });
  });

  it('loads the good lines, reports the bad ones, and ends with status 2', () => {
    const csv = [
      'designation,T,q,e,i,node,peri,epoch,H',
      'C/2026 J4,2027-03-12.1,1.2737,1.0003,61.97,334.4,149.64,2026-12-01,5.6',
      'C/2026 J4,2027-03-12.1,-1,1.0003,61.97,334.4,149.64,2026-12-01,5.6',
    ].join('\n');
    const { status, stdout, stderr } = duskwright(['elements', 'load', '-', ...target, '--json'], csv);
    expect(status).toBe(2);
    expect(stderr).toMatch(/^-: line 3, column \d+: error: /m);
    expect((JSON.parse(stdout) as { sets: unknown[] }).sets).toHaveLength(1);
  });

  test.each([
    [['elements', 'load', '/no/such/file', ...target], 'The file was "/no/such/file"'],
    [['elements', 'load', newFile, '--db', database], '--target was left out'],
    [['elements', 'load', newFile, '--target', 'Moon', '--db', database], 'does not move on an orbit'],
    [['elements', 'load', newFile, ...target, '--body', '2I'], 'Nothing in it is of 2I'],
  ])('refuses %j with exit status 2', (args, message) => {
    const { status, stdout, stderr } = duskwright(args);
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toContain(message);
  });
});
