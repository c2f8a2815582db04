import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { answer, duskwright } from './run';

const folder = mkdtempSync(join(tmpdir(), 'duskwright-cli-'));
const database = join(folder, 'demo.db');

interface NightsJson {
  readonly searched: { readonly evenings: number; readonly sites: number };
  readonly evenings: readonly {
    readonly site: string;
    readonly date: string;
    readonly score: number;
    readonly shown: number;
    readonly of: number;
    readonly publicHours: { readonly start: string; readonly end: string };
    readonly parts: readonly {
      readonly name: string;
      readonly points: number;
      readonly of: number;
      readonly why: string;
    }[];
    readonly showings: readonly { readonly shown: boolean; readonly minutes: number }[];
  }[];
}

beforeAll(() => {
  const { status, stderr } = duskwright(['demo', '--db', database, '--as-of', '2026-12-01']);
  if (status !== 0) throw new Error(stderr);
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('nights', () => {
  it('ranks the evenings of a season with their reasons', () => {
    const nights = answer<NightsJson>([
      'nights',
      '--db',
      database,
      '--from',
      '2026-12-01',
      '--to',
      '2027-02-28',
      '--limit',
      '7',
    ]);
    expect(nights.evenings).toHaveLength(7);
    expect(nights.searched.sites).toBe(5);
    nights.evenings.forEach((evening, i) => {
      if (i > 0) expect(evening.score).toBeLessThanOrEqual(nights.evenings[i - 1]!.score);
      expect(evening.parts.reduce((sum, { points }) => sum + points, 0)).toBeCloseTo(evening.score, 9);
      expect(evening.shown).toBe(evening.showings.filter(({ shown }) => shown).length);
      expect(evening.of).toBe(evening.showings.length);
    });
  });

  it('keeps to the sites and programme that are named', () => {
    const nights = answer<NightsJson>([
      'nights',
      '--db',
      database,
      '--from',
      '2026-12-01',
      '--to',
      '2026-12-31',
      '--site-name',
      'Hollin Top',
      '--programme',
      'Faint and far',
    ]);
    expect(new Set(nights.evenings.map(({ site }) => site))).toEqual(new Set(['Hollin Top']));
    expect(nights.evenings).toHaveLength(31);
    expect(nights.evenings[0]!.of).toBe(6);
  });

  test.each([
    [['--from', '2026-12-01', '--to', '2026-11-01'], 'to was "2026-11-01"'],
    [['--from', '2026-12-01', '--to', '2036-11-01'], 'at most five years'],
    [['--from', '2026-13-01', '--to', '2026-11-01'], '--from was "2026-13-01"'],
    [['--from', '2026-12-01', '--to', '2026-12-31', '--site-name', 'Nowhere'], '"Nowhere"'],
    [['--from', '2026-12-01', '--to', '2026-12-31', '--programme', 'Nothing'], '"Nothing"'],
  ])('refuses %j with exit status 2', (args, message) => {
    const { status, stdout, stderr } = duskwright(['nights', '--db', database, ...args, '--json']);
    expect(stderr).toContain(message);
    expect(stdout).toBe('');
    expect(status).toBe(2);
  });
});

describe('sky and evening', () => {
  it('take a site of the database with its own sky and zone', () => {
    const at = ['--site-name', 'Hollin Top', '--db', database];
    expect(answer(['sky', '--target', 'M 42', ...at, '--at', '2027-01-09T20:00:00Z'])).toMatchObject({
      target: 'M 42',
      constellation: 'Ori',
    });
    expect(answer(['evening', ...at, '--date', '2027-01-09'])).toMatchObject({ zone: 'Europe/Madrid' });
  });
});

describe('chart', () => {
  it('writes PDF and SVG, and prints the scene', () => {
    const at = ['--site-name', 'Hollin Top', '--db', database, '--at', '2027-01-09T20:00:00Z'];
    for (const ending of ['pdf', 'svg']) {
      const out = join(folder, `m31.${ending}`);
      const scene = answer<{ fieldDeg: number; stars: unknown[]; target: { xMm: number } }>([
        'chart',
        '--target',
        'M 31',
        ...at,
        '--scale',
        'binocular',
        '--field',
        '7',
        '--out',
        out,
      ]);
      expect(scene.fieldDeg).toBe(7);
      expect(scene.stars.length).toBeGreaterThan(20);
      expect(readFileSync(out).subarray(0, 5).toString()).toBe(ending === 'pdf' ? '%PDF-' : '<svg ');
    }
  });

  test.each([
    [['--scale', 'sideways'], '--scale was "sideways"'],
    [['--field', '0'], '--field was "0"'],
    [['--field', '200'], '--field was "200"'],
    [['--target', 'Sun'], 'target was the Sun'],
    [['--out', 'chart.gif'], '--out was "chart.gif"'],
  ])('refuses %j and writes nothing', (args, message) => {
    const out = join(folder, 'refused.pdf');
    const given = ['--target', 'M 31', '--site', '42,-7', '--at', '2027-01-09T20:00:00Z', '--out', out];
    const { status, stderr } = duskwright(['chart', ...given, ...args]);
    expect(stderr).toContain(message);
    expect(status).toBe(2);
    expect(existsSync(out)).toBe(false);
  });

  it('refuses what stands beside a Sun that is up', () => {
    const { status, stderr } = duskwright([
      'chart',
      '--target',
      'M 45',
      '--site',
      '42,-7',
      '--at',
      '2027-05-20T12:00:00Z',
      '--out',
      join(folder, 'x.pdf'),
    ]);
    expect(stderr).toMatch(/stands \d+\.\d degrees from a Sun that is up/);
    expect(status).toBe(2);
  });
});

describe('calendar', () => {
  it('writes the published events', () => {
    const out = join(folder, 'club.ics');
    expect(answer(['calendar', '--db', database, '--out', out])).toEqual({ out, events: 1 });
    expect(readFileSync(out, 'utf8')).toMatch(/^BEGIN:VCALENDAR\r\n[^]*END:VCALENDAR\r\n$/);
  });
});

describe('demo', () => {
  it('leaves a database alone that already holds a club', () => {
    const { status, stderr } = duskwright(['demo', '--db', database]);
    expect(stderr).toContain('already holds the club "Arvenn Marches Stargazers"');
    expect(status).toBe(2);
  });
});
