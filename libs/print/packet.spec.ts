import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildScene, type Paper } from '#charts';
import { constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import fc from 'fast-check';
import { type PacketContent } from './content';
import { drawPacket } from './drawPacket';
import { COMPUTED_MS, eveningContent } from './fixtures/eveningContent';
import { lineWidthMm } from './lettering';
import { type FinderOrder, packetSheets } from './packet';
import { type Ink, type PacketSheet, type Part, SHEET_NAMES, type SheetName } from './sheet';

// Whole packets are drawn here, on whatever else the machine is doing.
jest.setTimeout(60_000);

const degree = Math.PI / 180;
const folder = mkdtempSync(join(tmpdir(), 'duskwright-print-'));
const title = { title: 'Winter lights, packet', subject: 'Sheets of one evening', computedMs: COMPUTED_MS };

afterAll(() => {
  rmSync(folder, { recursive: true });
});

/** A real chart for the first two targets, a refusal for the third. */
function finders(paper: Paper): FinderOrder[] {
  return [0, 1, 2].map((index) => {
    const name = `Finder ${String(index)}`;
    return {
      title: name,
      target: name,
      scene: (foot) =>
        index === 2
          ? { refused: 'it stands below the horizon.' }
          : buildScene(loadStars(), deepSkyObjects(), constellationFigures(), {
              scale: 'binocular',
              fieldDeg: null,
              orientation: 'upright',
              paper,
              target: {
                name,
                raRad: (80 + 30 * index) * degree,
                decRad: 20 * degree,
                magnitude: 6,
                kind: 'openCluster',
                majorArcmin: 7,
                minorArcmin: 7,
                positionAngleDeg: null,
              },
              path: [],
              view: null,
              words: { title: name, subtitle: 'Brackenfold', notes: [], cautions: [], foot },
            }),
    };
  });
}

function sheetsOf(content: PacketContent, names: readonly SheetName[]): PacketSheet[] {
  const { count, sheets } = packetSheets(content, names, finders(content.paper));
  const all = [...sheets];
  expect(all).toHaveLength(count);
  return all;
}

/** What a program prints; a warning on its error output fails the test too. */
function tool(command: string, ...words: string[]): string {
  const { stdout, stderr, status } = spawnSync(command, words, { encoding: 'utf8' });
  expect({ command, stderr, status }).toEqual({ command, stderr: '', status: 0 });
  return stdout;
}

describe.each(['a4', 'letter'] as const)('a packet on %s', (paper) => {
  const content = eveningContent({ change: { paper } });
  const file = join(folder, `${paper}.pdf`);
  const progress: number[] = [];
  let sheets: PacketSheet[] = [];
  let plain = '';
  let pages: string[] = [];
  beforeAll(async () => {
    sheets = sheetsOf(content, SHEET_NAMES);
    writeFileSync(file, await drawPacket(sheets, title, (done) => progress.push(done)));
    const open = join(folder, `${paper}-open.pdf`);
    tool('qpdf', '--qdf', '--object-streams=disable', file, open);
    plain = readFileSync(open, 'latin1');
    pages = tool('pdftotext', '-layout', file, '-').split('\f').slice(0, -1);
  });

  it('is a sound file of the right paper, within 400 KB a page, its progress told', () => {
    expect(tool('qpdf', '--check', file)).toContain('No syntax or stream encoding errors found');
    const about = tool('pdfinfo', file);
    expect(about).toMatch(new RegExp(`Pages:\\s+${String(sheets.length)}\\n`));
    expect(about).toMatch(paper === 'a4' ? /595\.2\d+ x 841\.89/ : /612 x 792/);
    expect(readFileSync(file).length / sheets.length).toBeLessThan(400_000);
    expect(progress).toEqual(sheets.map((_, index) => index + 1));
  });

  it('is tagged, titled, says its language, and heads its tables', () => {
    expect(tool('pdfinfo', file)).toMatch(/Tagged:\s+yes/);
    expect(tool('pdfinfo', file)).toContain('Winter lights, packet');
    expect(plain).toMatch(/\/Lang \(en\)/);
    expect(plain).toMatch(/\/DisplayDocTitle true/);
    const structure = tool('pdfinfo', '-struct-text', file);
    expect(structure).toMatch(/H1[\s\S]*Winter lights[\s\S]*Table[\s\S]*TH[\s\S]*"What to say"[\s\S]*Figure/);
  });

  it('embeds every font, once', () => {
    const fonts = tool('pdffonts', file).trim().split('\n').slice(2);
    expect(fonts).toHaveLength(3);
    for (const font of fonts) expect(font).toMatch(/ yes yes yes /);
  });

  it('uses grey ink only', () => {
    const inks = [...plain.matchAll(/^([\d. ]+) (scn|SCN|rg|RG|k|K)$/gm)];
    expect(inks.length).toBeGreaterThan(50);
    for (const [, parts] of inks) expect(new Set(parts!.trim().split(/\s+/)).size).toBe(1);
    expect(plain).not.toMatch(/ (k|K)$/m);
    expect(plain).not.toMatch(/DeviceCMYK|\/Pattern cs|\/Shading/);
  });

  it('numbers every sheet and prints revision, elements and age on it', () => {
    pages.forEach((page, index) => {
      const words = page.replaceAll(/\s+/g, ' ');
      expect(words).toContain(`Sheet ${String(index + 1)} of ${String(sheets.length)}`);
      expect(words).toContain(`Packet ${content.revision}`);
      if (sheets[index]!.name === 'finder') return;
      expect(words).toMatch(/Comet Thistlewood: elements 1, epoch 2027-01-07, 31 days old/);
    });
  });

  it('has bookmarks to every sheet, charts and stations gathered', () => {
    const titles = [...plain.matchAll(/\/Title \(([^)]*)\)/g)].map(([, words]) => words);
    for (const words of [
      'Run sheet',
      'Finder charts',
      'Finder 0',
      'Stations',
      'Brackenfold',
      "Tonight's sky",
    ]) {
      expect(titles).toContain(words);
    }
  });

  it('says where the sheets stand, in the cover’s own list', () => {
    const cover = pages[0]!.replaceAll(/\s+/g, ' ');
    const first = (name: SheetName) => sheets.findIndex((sheet) => sheet.name === name) + 1;
    expect(cover).toContain(
      `Run sheet ${String(first('runSheet'))} · Finder charts ${String(first('finder'))}`,
    );
    expect(cover).toContain(
      `Handout for visitors ${String(first('handout'))} · Poster ${String(first('poster'))}`,
    );
  });

  it('prints the times of the run sheet on the station sheets', () => {
    const timesOn = (name: SheetName) =>
      pages
        .filter((_, index) => sheets[index]!.name === name)
        .flatMap((page) => page.match(/\d\d:\d\d–\d\d:\d\d/g) ?? [])
        .sort();
    expect(timesOn('runSheet')).toHaveLength(content.runSheet.slots.length);
    expect(timesOn('station')).toEqual(timesOn('runSheet'));
  });

  it('says why a chart is missing', () => {
    const index = sheets.findIndex(({ title: words }) => words === 'Finder 2');
    expect(pages[index]).toContain('There is no chart: it stands below the horizon.');
  });

  it('says for helpers what the club knows of the site', () => {
    const site = pages[sheets.findIndex(({ name }) => name === 'site')]!;
    for (const words of ['timber yard', 'open ditch', 'Call 112', 'Shuts 00:30']) {
      expect(site).toContain(words);
    }
  });

  it('gives the same bytes when printed again', async () => {
    const again = await drawPacket(sheetsOf(eveningContent({ change: { paper } }), SHEET_NAMES), title);
    expect(again.equals(readFileSync(file))).toBe(true);
  });
});

it('prints any of the sheets in any order', () => {
  fc.assert(
    fc.property(fc.shuffledSubarray([...SHEET_NAMES], { minLength: 1 }), (names) => {
      const order = sheetsOf(eveningContent(), names).map(({ name }) => name);
      expect([...new Set(order)]).toEqual(names);
    }),
    { numRuns: 12, seed: 2 },
  );
});

it('keeps the handout to one sheet of two sides and the poster to one, however much there is', () => {
  for (const [targets, schedule] of [
    [0, 0],
    [1, 1],
    [24, 12],
    [60, 60],
  ] as const) {
    const content = eveningContent({ targets, schedule });
    expect(sheetsOf(content, ['handout'])).toHaveLength(2);
    expect(sheetsOf(content, ['poster'])).toHaveLength(1);
  }
});

describe('on every sheet', () => {
  const words = fc.string({ unit: fc.constantFrom('a', 'm', 'W', 'é', ' ', '-', '.'), maxLength: 400 });

  it('text is 8 points or more, lines 0.3 or more, and nothing leaves the margins', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 16 }),
        fc.integer({ min: 0, max: 8 }),
        words,
        fc.constantFrom('a4' as const, 'letter' as const),
        (targets, schedule, prose, paper) => {
          const content = eveningContent({ targets, schedule });
          const text = SHEET_NAMES.filter((name) => name !== 'finder');
          const change = {
            paper,
            site: { ...content.site, directions: prose, hazards: prose, emergencyWords: prose },
            club: { ...content.club, name: prose.slice(0, 120), bringWords: prose, callOffWords: prose },
            event: { ...content.event, title: `Evening ${prose.slice(0, 100)}`, words: prose },
          };
          for (const sheet of sheetsOf({ ...content, ...change }, text)) {
            if (sheet.kind === 'chart') continue;
            for (const ink of [...sheet.ornaments, ...sheet.parts.flatMap(inkOf)]) {
              checkInk(ink, sheet.widthMm, sheet.heightMm);
            }
            expectNoOverlap(sheet.parts.flatMap(inkOf));
          }
        },
      ),
      { numRuns: 12, seed: 6 },
    );
  });
});

function inkOf({ ink, parts }: Part): Ink[] {
  return [...ink, ...parts.flatMap(inkOf)];
}

function checkInk(ink: Ink, widthMm: number, heightMm: number): void {
  const [left, right] = [8, widthMm - 8];
  switch (ink.shape) {
    case 'text': {
      expect(ink.sizePt).toBeGreaterThanOrEqual(8);
      expect(ink.xMm).toBeGreaterThan(left);
      expect(ink.xMm + lineWidthMm(ink.text, ink.face, ink.sizePt)).toBeLessThan(right);
      expect(ink.yMm).toBeGreaterThan(8);
      expect(ink.yMm).toBeLessThan(heightMm - 8);
      return;
    }
    case 'line':
      expect(ink.widthPt).toBeGreaterThanOrEqual(0.3);
      expect(ink.points.every(([x, y]) => x > left && x < right && y > 8 && y < heightMm - 8)).toBe(true);
      return;
    case 'area':
      expect(ink.points.every(([x, y]) => x > left && x < right && y > 8 && y < heightMm - 8)).toBe(true);
      return;
    case 'disc':
      if (ink.strokePt !== null) expect(ink.strokePt).toBeGreaterThanOrEqual(0.3);
  }
}

/** Letters of two texts may not touch: boxes of x-height, as wide as the words. */
function expectNoOverlap(ink: readonly Ink[]): void {
  const boxes = ink.flatMap((one) =>
    one.shape === 'text' && one.text !== ''
      ? [
          {
            text: one.text,
            left: one.xMm,
            right: one.xMm + lineWidthMm(one.text, one.face, one.sizePt),
            top: one.yMm - one.sizePt * 0.18,
            bottom: one.yMm,
          },
        ]
      : [],
  );
  for (let i = 0; i < boxes.length; i++) {
    for (let j = 0; j < i; j++) {
      const [a, b] = [boxes[i]!, boxes[j]!];
      const apart = a.right <= b.left || b.right <= a.left || a.bottom <= b.top || b.bottom <= a.top;
      if (!apart) throw new Error(`"${a.text}" stands over "${b.text}"`);
    }
  }
}
