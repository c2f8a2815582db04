import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { create, type Font } from 'fontkit';

/** The three faces of every sheet: text, what must be seen first, and titles. */
export type Face = 'sans' | 'bold' | 'serif';

const files: Readonly<Record<Face, string>> = {
  sans: 'NotoSans-Regular.ttf',
  bold: 'NotoSans-Bold.ttf',
  serif: 'GentiumPlus-Regular.ttf',
};

const loaded = new Map<Face, Font>();

/** The parsed font file of a face, read once; documents share it, each embedding its own subset. */
export function fontOf(face: Face): Font {
  let font = loaded.get(face);
  if (font === undefined) {
    font = create(readFileSync(join(projectRoot(__dirname), 'libs/charts/fonts', files[face])));
    loaded.set(face, font);
  }
  return font;
}

/** The font file of a face as bytes, for whoever serves it to a browser. */
export function fontFile(face: Face): Buffer {
  return readFileSync(join(projectRoot(__dirname), 'libs/charts/fonts', files[face]));
}

export const mmPerPt = 25.4 / 72;

/** Widths laid out word by word, as the PDF renderer does, in thousandths of an em. */
const words = new Map<string, number>();
const mostWords = 5000;

/** The width in millimetres of a line of text, kerning included, at a size in points. */
export function textWidthMm(text: string, face: Face, sizePt: number, spacingPt = 0): number {
  let thousandths = 0;
  for (const word of text.split(/(?<=[ \t])/)) {
    const key = `${face} ${word}`;
    let width = words.get(key);
    if (width === undefined) {
      const font = fontOf(face);
      width = (font.layout(word).advanceWidth * 1000) / font.unitsPerEm;
      if (words.size >= mostWords) words.clear();
      words.set(key, width);
    }
    thousandths += width;
  }
  return ((thousandths * sizePt) / 1000 + spacingPt * Math.max(0, [...text].length - 1)) * mmPerPt;
}

/** Height of a capital letter above the baseline, millimetres. */
export function capHeightMm(face: Face, sizePt: number): number {
  const font = fontOf(face);
  return (font.capHeight / font.unitsPerEm) * sizePt * mmPerPt;
}

/** How far letters such as g and β reach below the baseline, millimetres (measured on these faces). */
export function descentMm(sizePt: number): number {
  return 0.24 * sizePt * mmPerPt;
}

/** Signs that a face lacks and what stands for them. */
const standIns: Readonly<Record<string, string>> = {
  '\u202f': '\u00a0',
  '\t': ' ',
};
const surelyThere = /^[ -~\u00a0-\u017f]*$/;

/**
 * The text with every sign in it one that the face can print: stand-ins for signs it lacks, letters without
 * their accents where only those are missing, else "?".
 */
export function printable(text: string, face: Face): string {
  if (surelyThere.test(text)) return text;
  const font = fontOf(face);
  const has = (sign: string): boolean => font.hasGlyphForCodePoint(sign.codePointAt(0)!);
  return [...text]
    .map((sign) => {
      if (has(sign)) return sign;
      const standIn = standIns[sign] ?? sign.normalize('NFKD')[0]!;
      return has(standIn) ? standIn : '?';
    })
    .join('');
}

/** Breaks text into lines no wider than `widthMm`, at spaces (not at hard ones); a longer word stands alone. */
export function wrapped(text: string, face: Face, sizePt: number, widthMm: number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/[ \t\n]+/).filter((part) => part !== '')) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && textWidthMm(longer, face, sizePt) > widthMm) {
      lines.push(line);
      line = word;
    } else {
      line = longer;
    }
  }
  if (line !== '') lines.push(line);
  return lines;
}

function projectRoot(from: string): string {
  let folder = from;
  while (!existsSync(join(folder, 'package.json'))) {
    const above = dirname(folder);
    if (above === folder) throw new Error(`no package.json in or above ${from}; the fonts lie beside it`);
    folder = above;
  }
  return folder;
}
