import { type Face, fontFile } from '#charts';
import { create, type Font } from 'fontkit';

export const MM_PER_PT = 25.4 / 72;

const loaded = new Map<Face, Font>();

/** The parsed font of a face, read once; every packet shares it and embeds its own subset. */
export function fontOf(face: Face): Font {
  let font = loaded.get(face);
  if (font === undefined) {
    font = create(fontFile(face));
    loaded.set(face, font);
  }
  return font;
}

/** Widths of single signs in thousandths of an em, by face. */
const widths: Readonly<Record<Face, Map<string, number>>> = {
  sans: new Map(),
  bold: new Map(),
  serif: new Map(),
};

/**
 * The width of a line of text in millimetres at a size in points, letters as wide as each by itself: the PDF
 * writer draws some pairs closer, so a line takes no more room than this. Laying every word out as it does would
 * take most of the time of a packet.
 */
export function lineWidthMm(text: string, face: Face, sizePt: number): number {
  const known = widths[face];
  let thousandths = 0;
  for (const sign of text) {
    let width = known.get(sign);
    if (width === undefined) {
      const font = fontOf(face);
      width = (font.glyphForCodePoint(sign.codePointAt(0)!).advanceWidth * 1000) / font.unitsPerEm;
      known.set(sign, width);
    }
    thousandths += width;
  }
  return (thousandths * sizePt * MM_PER_PT) / 1000;
}

/** Signs that a face may lack and what stands for them. */
const STAND_INS: Readonly<Record<string, string>> = { '−': '–', '≈': '~', '‑': '-', '\u202f': '\u00a0' };

/** The text with every sign in it one that the face can print; what has no stand-in becomes "?". */
export function printable(text: string, face: Face): string {
  const clean = text.replaceAll(/\s/gu, (sign) => (sign === '\u00a0' || sign === '\u202f' ? sign : ' '));
  if (/^[ -~\u00a0-\u017f]*$/.test(clean)) return clean;
  const font = fontOf(face);
  const has = (sign: string): boolean => font.hasGlyphForCodePoint(sign.codePointAt(0)!);
  return [...clean]
    .map((sign) => {
      if (has(sign)) return sign;
      const standIn = STAND_INS[sign] ?? sign.normalize('NFKD')[0]!;
      return has(standIn) ? standIn : '?';
    })
    .join('');
}

/**
 * Breaks text into lines no wider than `widthMm`, at spaces and after hyphens; a word wider than that is cut.
 * Line ends of the text are kept.
 */
export function wrapped(text: string, face: Face, sizePt: number, widthMm: number): string[] {
  return text.split(/\r?\n/).flatMap((paragraph) => {
    const lines: string[] = [];
    let line = '';
    for (const word of printable(paragraph, face)
      .split(/ +/)
      .filter((part) => part !== '')) {
      const pieces = word.split(/(?<=\p{L}-)(?=\p{L})/u).flatMap((part) => cut(part, face, sizePt, widthMm));
      pieces.forEach((piece, index) => {
        const longer = line === '' || index > 0 ? `${line}${piece}` : `${line} ${piece}`;
        if (line !== '' && lineWidthMm(longer, face, sizePt) > widthMm) {
          lines.push(line);
          line = piece;
        } else {
          line = longer;
        }
      });
    }
    return line === '' ? lines : [...lines, line];
  });
}

/** A word in pieces that each fit the width: whole, unless it is wider by itself. */
function cut(word: string, face: Face, sizePt: number, widthMm: number): string[] {
  if (lineWidthMm(word, face, sizePt) <= widthMm) return [word];
  const pieces: string[] = [];
  let piece = '';
  for (const sign of word) {
    if (piece !== '' && lineWidthMm(piece + sign, face, sizePt) > widthMm) {
      pieces.push(piece);
      piece = sign;
    } else {
      piece += sign;
    }
  }
  return [...pieces, piece];
}
