import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { drawPacket, type PacketSheet, packetSheets } from '#print';
import { toRad } from '#sky';
import { skyAbove } from '../../../libs/club/packets/skyAbove';
import { eveningContent } from '../../../libs/print/fixtures/eveningContent';
import cases from './skyMap.json';

// The expected heights and azimuths are ERFA's; skyMap.py beside this file made them. The map is read back from
// the finished PDF: where its stars are printed, not where they were meant to be.

// Whole packets are drawn here, on whatever else the machine is doing.
jest.setTimeout(60_000);

const folder = mkdtempSync(join(tmpdir(), 'duskwright-map-'));
afterAll(() => {
  rmSync(folder, { recursive: true });
});

const PT = 72 / 25.4;

describe.each(cases)('the map of the sky over $site', ({ site, utc, stars, ...place }) => {
  const sky = skyAbove(
    {
      latitudeRad: toRad(place.latitudeDeg),
      longitudeRad: toRad(place.longitudeDeg),
      elevationM: place.elevationM,
    },
    Date.parse(utc),
    [],
  );

  it('has every star within 0.02 degrees of ERFA', () => {
    for (const star of stars) {
      const found = sky.stars.find(({ name }) => name === star.name);
      expect(found).toBeDefined();
      const across = Math.cos(toRad(star.altitudeDeg));
      const turn = ((found!.azimuthDeg - star.azimuthDeg + 540) % 360) - 180;
      expect([star.name, Math.abs(found!.altitudeDeg - star.altitudeDeg) < 0.02]).toEqual([star.name, true]);
      expect([star.name, Math.abs(turn * across) < 0.02]).toEqual([star.name, true]);
    }
  });

  it('prints their dots within 0.05 mm of where the stereographic formula puts ERFA’s places', async () => {
    const content = eveningContent({ targets: 1, change: { sky } });
    const level = { ...content, site: { ...content.site, name: site, horizon: [] } };
    const sheets: PacketSheet[] = [...packetSheets(level, ['handout'], []).sheets];
    const [front] = sheets;
    if (front?.kind !== 'text') throw new Error('The handout begins with its map.');
    const [rim] = front.parts
      .flatMap(({ ink }) => ink)
      .flatMap((ink) => (ink.shape === 'disc' ? [ink] : []))
      .toSorted((a, b) => b.radiusMm - a.radiusMm);
    const dots = await dotsOf(sheets);
    for (const { name, altitudeDeg, azimuthDeg } of stars) {
      const far = rim!.radiusMm * Math.tan(toRad(90 - altitudeDeg) / 2);
      const x = rim!.xMm - far * Math.sin(toRad(azimuthDeg));
      const y = rim!.yMm - far * Math.cos(toRad(azimuthDeg));
      const nearest = Math.min(...dots.map(([dotX, dotY]) => Math.hypot(dotX - x, dotY - y)));
      expect([name, nearest < 0.05]).toEqual([name, true]);
    }
  });
});

/** Middles of the filled circles of the first page, millimetres from its top left. */
async function dotsOf(sheets: readonly PacketSheet[]): Promise<(readonly [number, number])[]> {
  const [file, open] = [join(folder, 'map.pdf'), join(folder, 'map-open.pdf')];
  writeFileSync(file, await drawPacket(sheets, { title: 'Map', subject: 'Map', computedMs: 0 }));
  const ran = spawnSync('qpdf', ['--qdf', '--object-streams=disable', '--pages', '.', '1', '--', file, open]);
  expect([ran.status, ran.stderr.toString()]).toEqual([0, '']);
  // PDFKit starts a circle at its left end and draws the first quarter to its top.
  const quarter = /^([\d.]+) ([\d.]+) m\n[\d.]+ [\d.]+ [\d.]+ [\d.]+ ([\d.]+) [\d.]+ c$/gm;
  return [...readFileSync(open, 'latin1').matchAll(quarter)].map(
    ([, , y, x]) => [Number(x) / PT, Number(y) / PT] as const,
  );
}
