import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import PDFDocument from 'pdfkit';
import { constellationFigures, deepSkyObjects, loadStars } from '#catalogue';
import { buildScene } from './buildScene';
import { drawScene, renderPdf } from './pdf';
import type { ChartRequest, ChartScale, Paper } from './request';
import type { Scene } from './scene';

const degree = Math.PI / 180;
const folder = mkdtempSync(join(tmpdir(), 'duskwright-pdf-'));
const creationUtcMs = Date.UTC(2027, 2, 2, 18);

afterAll(() => {
  rmSync(folder, { recursive: true });
});

function sceneOf(scale: ChartScale, paper: Paper, more: Partial<ChartRequest> = {}): Scene {
  return buildScene(loadStars(), deepSkyObjects(), constellationFigures(), {
    scale,
    fieldDeg: null,
    orientation: 'upright',
    paper,
    target: {
      name: 'M 29',
      raRad: 305.983 * degree,
      decRad: 38.524 * degree,
      magnitude: 6.6,
      kind: 'openCluster',
      majorArcmin: 7,
      minorArcmin: 7,
      positionAngleDeg: null,
    },
    path: [],
    view:
      scale === 'eye'
        ? { utcMs: Date.parse('2027-08-10T21:30:00Z'), latitudeRad: 47 * degree, longitudeRad: 8 * degree }
        : null,
    words: {
      title: 'The cooling tower in Cygnus',
      subtitle: 'Saturday 14 August, Brackenfold, 22:30 (UTC+1)',
      notes: ['At −5 °C the battery tires ≈ twice as fast.'],
      cautions: ['Keep to red light.'],
      foot: 'Packet 3',
    },
    ...more,
  });
}

async function written(name: string, scene: Scene): Promise<string> {
  const file = join(folder, `${name}.pdf`);
  writeFileSync(file, await renderPdf(scene, { creationUtcMs }));
  return file;
}

/** What a program prints; a warning on its error output fails the test too. */
function tool(command: string, ...words: string[]): string {
  const { stdout, stderr, status } = spawnSync(command, words, { encoding: 'utf8' });
  expect({ command, stderr, status }).toEqual({ command, stderr: '', status: 0 });
  return stdout;
}

describe.each([
  ['eye', 'a4'],
  ['binocular', 'letter'],
  ['eyepiece', 'a4'],
] as const)('a %s sheet on %s', (scale, paper) => {
  const scene = sceneOf(scale, paper);
  let file = '';
  let plain = '';
  beforeAll(async () => {
    file = await written(scale, scene);
    const open = join(folder, `${scale}-open.pdf`);
    tool('qpdf', '--qdf', '--object-streams=disable', file, open);
    plain = readFileSync(open, 'latin1');
  });

  it('is a sound file of one page on the right paper, under 400 KB', () => {
    expect(tool('qpdf', '--check', file)).toContain('No syntax or stream encoding errors found');
    const about = tool('pdfinfo', file);
    expect(about).toMatch(/Pages:\s+1\n/);
    expect(about).toMatch(paper === 'a4' ? /595\.2\d+ x 841\.89/ : /612 x 792/);
    expect(readFileSync(file).length).toBeLessThan(400_000);
  });

  it('is tagged, titled and says its language', () => {
    const about = tool('pdfinfo', file);
    expect(about).toMatch(/Tagged:\s+yes/);
    expect(about).toContain('The cooling tower in Cygnus');
    expect(plain).toMatch(/\/Lang \(en\)/);
    expect(plain).toMatch(/\/DisplayDocTitle true/);
    expect(tool('pdfinfo', '-struct-text', file)).toMatch(/H1[\s\S]*The cooling tower[\s\S]*Figure/);
  });

  it('embeds every font as a subset that maps back to text', () => {
    const fonts = tool('pdffonts', file).trim().split('\n').slice(2);
    expect(fonts.length).toBeGreaterThanOrEqual(3);
    for (const font of fonts) expect(font).toMatch(/ yes yes yes /);
  });

  it('has its words as text: title, target, stars, notes', () => {
    const text = tool('pdftotext', '-layout', file, '-');
    expect(text).toContain('The cooling tower in Cygnus');
    expect(text).toContain('Packet 3');
    expect(text).toContain('At −5 °C the battery tires ≈ twice as fast.');
    for (const { text: label } of scene.labels) expect(text).toContain(label);
    if (scale === 'eye') for (const name of ['Vega', 'Deneb', 'CYGNUS']) expect(text).toContain(name);
  });

  it('uses grey ink only', () => {
    const inks = [...plain.matchAll(/^([\d. ]+) (scn|SCN|rg|RG|k|K)$/gm)];
    expect(inks.length).toBeGreaterThan(5);
    for (const [, parts] of inks) expect(new Set(parts!.trim().split(/\s+/)).size).toBe(1);
    expect(plain).not.toMatch(/ (k|K)$/m);
    expect(plain).not.toMatch(/DeviceCMYK|\/Pattern cs|\/Shading/);
  });

  it('has every star as a circle where the scene has it', () => {
    // The renderer starts a circle at its left end, "x y m", in points from the top left.
    const starts = [...plain.matchAll(/^([\d.]+) ([\d.]+) m$/gm)].map(
      ([, x, y]) => [Number(x), Number(y)] as const,
    );
    const pt = 72 / 25.4;
    const roundingPt = 0.002;
    const missing = scene.stars.filter(({ xMm, yMm, radiusMm }) => {
      const x = (xMm - radiusMm) * pt;
      return !starts.some(([a, b]) => Math.abs(a - x) < roundingPt && Math.abs(b - yMm * pt) < roundingPt);
    });
    expect(scene.stars.length).toBeGreaterThan(50);
    expect(missing).toEqual([]);
  });
});

describe('renderPdf', () => {
  it('gives the same bytes for the same scene and date', async () => {
    const scene = sceneOf('eyepiece', 'a4');
    const [one, other] = await Promise.all([
      renderPdf(scene, { creationUtcMs }),
      renderPdf(sceneOf('eyepiece', 'a4'), { creationUtcMs }),
    ]);
    expect(one.equals(other)).toBe(true);
    const later = await renderPdf(scene, { creationUtcMs: creationUtcMs + 86_400_000 });
    expect(later.equals(one)).toBe(false);
  });
});

describe('drawScene', () => {
  it('adds one page for each sheet to a document of several', async () => {
    const document = new PDFDocument({ autoFirstPage: false, tagged: true, lang: 'en' });
    const chunks: Buffer[] = [];
    document.on('data', (chunk: Buffer) => chunks.push(chunk));
    const ended = new Promise((resolve) => document.on('end', resolve));
    for (const scale of ['eye', 'binocular', 'eyepiece'] as const) drawScene(document, sceneOf(scale, 'a4'));
    document.end();
    await ended;
    const file = join(folder, 'several.pdf');
    writeFileSync(file, Buffer.concat(chunks));
    expect(tool('qpdf', '--check', file)).toContain('No syntax or stream encoding errors found');
    expect(tool('pdfinfo', file)).toMatch(/Pages:\s+3\n/);
    expect(tool('pdftotext', '-f', '2', '-l', '2', file, '-')).toContain('Binoculars or finder');
  });
});
