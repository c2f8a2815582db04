import { eveningContent } from './fixtures/eveningContent';
import { packetSheets } from './packet';
import { type Ink, type Part, SHEET_NAMES } from './sheet';
import { renderSheetSvg } from './sheetSvg';

const inkOf = ({ ink, parts }: Part): Ink[] => [...ink, ...parts.flatMap(inkOf)];

describe('a sheet on screen', () => {
  const content = eveningContent();
  const change = { ...content, event: { ...content.event, title: 'Moon & <Mars> "tonight"\u0007' } };
  const names = SHEET_NAMES.filter((name) => name !== 'finder');
  const sheets = [...packetSheets(change, names, []).sheets];

  it('is well-formed XML of the paper’s size, hostile words included', () => {
    for (const sheet of sheets) {
      const svg = renderSheetSvg(sheet);
      expect(faultOf(svg)).toBeNull();
      expect(svg).toContain('viewBox="0 0 210 297"');
    }
  });

  it('has every word where the paper has it', () => {
    for (const sheet of sheets) {
      if (sheet.kind === 'chart') continue;
      const svg = renderSheetSvg(sheet);
      const places = [...svg.matchAll(/<text x="([\d.]+)" y="([\d.]+)"/g)].map(([, x, y]) => [x, y]);
      const expected = sheet.parts
        .flatMap(inkOf)
        .flatMap((ink) => (ink.shape === 'text' ? [[ink.xMm, ink.yMm]] : []));
      expect(places).toHaveLength(expected.length);
      expected.forEach(([x, y], index) => {
        expect(Number(places[index]![0])).toBeCloseTo(x!, 2);
        expect(Number(places[index]![1])).toBeCloseTo(y!, 2);
      });
    }
  });

  it('keeps tables and headings for those who listen', () => {
    const run = renderSheetSvg(sheets.find(({ name }) => name === 'runSheet')!);
    for (const role of ['heading', 'table', 'row', 'columnheader', 'cell', 'img']) {
      expect(run).toContain(`role="${role}"`);
    }
  });
});

/** What is wrong with a text as XML of elements, quoted attributes and the five entities; null where nothing is. */
function faultOf(xml: string): string | null {
  const open: string[] = [];
  const tag = /<(\/?)(\w+)((?:\s+[\w:-]+="[^"<&]*(?:&(?:amp|lt|gt|quot|apos);[^"<&]*)*")*)\s*(\/?)>/y;
  const text = /(?:[^<&\u0000-\u0008\u000b\u000c\u000e-\u001f]|&(?:amp|lt|gt|quot|apos);)+/y;
  for (let at = 0; at < xml.length;) {
    const reader = xml[at] === '<' ? tag : text;
    reader.lastIndex = at;
    const found = reader.exec(xml);
    if (found === null) return `cannot be read from ${JSON.stringify(xml.slice(at, at + 60))}`;
    at = reader.lastIndex;
    const [, closing, name, , empty] = found;
    if (reader === text || empty === '/') continue;
    if (closing !== '/') open.push(name!);
    else if (open.pop() !== name) return `</${name!}> closes nothing`;
  }
  return open.length === 0 ? null : `<${open[0]!}> stays open`;
}
