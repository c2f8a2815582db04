import { type Face, renderSvg } from '#charts';
import { lineWidthMm, MM_PER_PT } from './lettering';
import { type Ink, type PacketSheet, type Part, type Tag, type TextSheet } from './sheet';

const FAMILIES: Readonly<Record<Face, string>> = {
  sans: 'font-family="Noto Sans, sans-serif"',
  bold: 'font-family="Noto Sans, sans-serif" font-weight="700"',
  serif: 'font-family="Gentium Plus, serif"',
};

/** How readers of a screen are told what a part is. */
const ROLES: Readonly<Partial<Record<Tag, string>>> = {
  H1: 'role="heading" aria-level="1"',
  H2: 'role="heading" aria-level="2"',
  Table: 'role="table"',
  TR: 'role="row"',
  TH: 'role="columnheader"',
  TD: 'role="cell"',
};

/** A sheet as one SVG picture in millimetres, the same in geometry as on paper, its text real. */
export function renderSheetSvg(sheet: PacketSheet): string {
  return sheet.kind === 'chart' ? renderSvg(sheet.scene) : textSheetSvg(sheet);
}

function textSheetSvg({ title, widthMm, heightMm, parts, ornaments }: TextSheet): string {
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${mm(widthMm)}mm" height="${mm(heightMm)}mm"`,
    ` viewBox="0 0 ${mm(widthMm)} ${mm(heightMm)}" lang="en" aria-label="${escaped(title)}">`,
    `<rect width="${mm(widthMm)}" height="${mm(heightMm)}" fill="#fff"/>`,
    `<g aria-hidden="true">${ornaments.map(inkSvg).join('')}</g>`,
    parts.map(partSvg).join(''),
    '</svg>\n',
  ].join('');
}

function partSvg({ tag, alt, scope, ink, parts }: Part): string {
  const inside = ink.map(inkSvg).join('') + parts.map(partSvg).join('');
  if (alt !== undefined) return `<g role="img" aria-label="${escaped(alt)}">${inside}</g>`;
  const role = scope === 'Row' ? 'role="rowheader"' : ROLES[tag];
  return role === undefined ? `<g>${inside}</g>` : `<g ${role}>${inside}</g>`;
}

function inkSvg(ink: Ink): string {
  switch (ink.shape) {
    case 'text':
      return (
        `<text x="${mm(ink.xMm)}" y="${mm(ink.yMm)}" ${FAMILIES[ink.face]} ` +
        `font-size="${mm(ink.sizePt * MM_PER_PT)}" fill="${grey(ink.gray)}" ` +
        // Where the page lacks our fonts, words still take the room they have on paper.
        `textLength="${mm(lineWidthMm(ink.text, ink.face, ink.sizePt))}" lengthAdjust="spacingAndGlyphs">` +
        `${escaped(ink.text)}</text>`
      );
    case 'line': {
      const dash = ink.dashMm === undefined ? '' : ` stroke-dasharray="${ink.dashMm.map(mm).join(' ')}"`;
      return `<polyline points="${points(ink.points)}" fill="none" stroke="${grey(ink.gray)}" stroke-width="${mm(ink.widthPt * MM_PER_PT)}"${dash}/>`;
    }
    case 'area':
      return `<polygon points="${points(ink.points)}" fill="${grey(ink.gray)}"/>`;
    case 'disc': {
      const fill = ink.fillGray === null ? 'none' : grey(ink.fillGray);
      const stroke =
        ink.strokePt === null ? '' : ` stroke="#000" stroke-width="${mm(ink.strokePt * MM_PER_PT)}"`;
      return `<circle cx="${mm(ink.xMm)}" cy="${mm(ink.yMm)}" r="${mm(ink.radiusMm)}" fill="${fill}"${stroke}/>`;
    }
  }
}

function points(all: readonly (readonly [number, number])[]): string {
  return all.map(([x, y]) => `${mm(x)},${mm(y)}`).join(' ');
}

/** A number to a thousandth of a millimetre, as short as can be. */
function mm(value: number): string {
  return String(Math.round(value * 1000) / 1000 + 0);
}

function grey(gray: number): string {
  const level = Math.round(gray * 255)
    .toString(16)
    .padStart(2, '0');
  return `#${level}${level}${level}`;
}

const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

function escaped(text: string): string {
  return (
    text
      // Control characters have no place in XML at all.
      .replaceAll(/[\u0000-\u0008\u000b\u000c\u000e-\u001f]/g, '')
      .replaceAll(/[&<>"]/g, (sign) => ENTITIES[sign]!)
  );
}
