import { type Face, type Paper } from '#charts';
import { lineWidthMm, MM_PER_PT, printable, wrapped } from './lettering';
import {
  FOOT_BASELINE_MM,
  FOOT_LINE_MM,
  type Ink,
  PAPER_SIZES,
  type Part,
  type PaperSize,
  type SheetName,
  SIDE_MM,
  type Tag,
  type TextSheet,
  TOP_MM,
} from './sheet';

/** What stands at the head and foot of every page of a sheet. */
export interface SheetHead {
  readonly name: SheetName;
  readonly paper: Paper;
  readonly title: string;
  readonly subtitle: string;
  /** Top right: what sheet it is, then for whom. */
  readonly corner: readonly string[];
  /** Of the title, larger than usual: for what is read from afar. */
  readonly titlePt?: number;
  /** Of the foot, which is written when the sheets are numbered. */
  readonly footLines: number;
}

export interface TextStyle {
  readonly face: Face;
  readonly sizePt: number;
  readonly gray?: number;
}

export interface Box {
  readonly leftMm: number;
  readonly topMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
}

export interface Column {
  readonly head: string;
  /** Of the table's width; all shares together make 1. */
  readonly share: number;
  readonly style: TextStyle;
}

export const BODY: TextStyle = { face: 'sans', sizePt: 10 };
export const BOLD: TextStyle = { face: 'bold', sizePt: 10 };
export const SMALL: TextStyle = { face: 'sans', sizePt: 8.5 };

const LEADING = 1.38;
const HEAD_STYLE: TextStyle = { face: 'bold', sizePt: 8.5 };

/** Height of one line, millimetres. */
export function lineMm({ sizePt }: TextStyle): number {
  return sizePt * MM_PER_PT * LEADING;
}

/** Lines of text below each other; the first baseline lies one line below `topMm`, less a little. */
export function textInk(lines: readonly string[], leftMm: number, topMm: number, style: TextStyle): Ink[] {
  const lead = lineMm(style);
  return lines.map((text, index) => ({
    shape: 'text',
    text,
    xMm: leftMm,
    yMm: topMm + (index + 1) * lead - 0.28 * style.sizePt * MM_PER_PT,
    face: style.face,
    sizePt: style.sizePt,
    gray: style.gray ?? 0,
  }));
}

/** One line set so that its middle (0.5), left (0) or right end (1) lies at a point; y is the baseline. */
export function lineAt(words: string, xMm: number, yMm: number, style: TextStyle, anchor = 0): Ink {
  const text = printable(words, style.face);
  return {
    shape: 'text',
    text,
    xMm: xMm - anchor * lineWidthMm(text, style.face, style.sizePt),
    yMm,
    face: style.face,
    sizePt: style.sizePt,
    gray: style.gray ?? 0,
  };
}

export function rule(fromMm: number, toMm: number, yMm: number, widthPt = 0.4, gray = 0): Ink {
  return {
    shape: 'line',
    points: [
      [fromMm, yMm],
      [toMm, yMm],
    ],
    widthPt,
    gray,
  };
}

/** Fills pages from the top down. What does not fit goes on a further page with the same head. */
export class Composer {
  readonly size: PaperSize;
  private readonly pages: { parts: Part[]; ornaments: Ink[] }[] = [];
  private yMm = 0;
  private leftMm = SIDE_MM;
  private rightMm: number;
  private topMm = 0;

  constructor(private readonly head: SheetHead) {
    this.size = PAPER_SIZES[head.paper];
    this.rightMm = this.size.widthMm - SIDE_MM;
    this.newPage();
  }

  get bottomMm(): number {
    return this.size.heightMm - FOOT_BASELINE_MM - this.head.footLines * FOOT_LINE_MM - 2.5;
  }

  get pageCount(): number {
    return this.pages.length;
  }

  get freeMm(): number {
    return this.bottomMm - this.yMm;
  }

  get widthMm(): number {
    return this.rightMm - this.leftMm;
  }

  get y(): number {
    return this.yMm;
  }

  /** Goes on in a column that begins at the height where this one began, or lower where `topMm` says so. */
  column(leftMm: number, rightMm: number, topMm = this.topMm): void {
    this.leftMm = leftMm;
    this.rightMm = rightMm;
    this.yMm = topMm;
  }

  /** Back to the page's whole width, at a height. */
  wholeWidth(topMm: number): void {
    this.column(SIDE_MM, this.size.widthMm - SIDE_MM, topMm);
  }

  gap(heightMm: number): void {
    this.yMm += heightMm;
  }

  rule(widthPt = 0.4): void {
    this.page.ornaments.push(rule(this.leftMm, this.rightMm, this.yMm, widthPt));
  }

  ornament(...ink: readonly Ink[]): void {
    this.page.ornaments.push(...ink);
  }

  /** A heading that does not stay alone at the foot of a page. */
  heading(words: string, sizePt = 12, keepMm = 12): void {
    const style: TextStyle = { face: 'serif', sizePt };
    const lines = wrapped(words, style.face, sizePt, this.widthMm);
    const height = lines.length * lineMm(style);
    this.need(height + keepMm);
    this.add({ tag: 'H2', ink: textInk(lines, this.leftMm, this.yMm, style), parts: [] });
    this.yMm += height + 0.8;
  }

  /** A paragraph; a page that ends cuts it between lines. */
  paragraph(words: string, style: TextStyle = BODY, { tag = 'P' as Tag, indentMm = 0 } = {}): void {
    const lines = wrapped(words, style.face, style.sizePt, this.widthMm - indentMm);
    const lead = lineMm(style);
    let from = 0;
    while (from < lines.length) {
      if (this.freeMm < lead) this.newPage();
      const count = Math.max(1, Math.min(lines.length - from, Math.floor(this.freeMm / lead + 1e-9)));
      const part = lines.slice(from, from + count);
      this.add({ tag, ink: textInk(part, this.leftMm + indentMm, this.yMm, style), parts: [] });
      this.yMm += count * lead;
      from += count;
    }
  }

  /** Paragraphs each led by a dash. */
  list(items: readonly string[], style: TextStyle = BODY): void {
    for (const item of items) {
      this.need(lineMm(style));
      const [page, y] = [this.page, this.yMm];
      const before = page.parts.length;
      this.paragraph(item, style, { indentMm: 4 });
      const first = page.parts[before];
      if (first === undefined) continue;
      page.parts[before] = { ...first, ink: [...textInk(['–'], this.leftMm, y, style), ...first.ink] };
      this.yMm += 0.5;
    }
  }

  /** A line to write on: its words, then a rule to the right edge. */
  blank(words: string, style: TextStyle = BODY): void {
    const height = lineMm(style) + 3.2;
    this.need(height);
    const baseline = this.yMm + height - 1.4;
    this.add({ tag: 'P', ink: [lineAt(words, this.leftMm, baseline, style)], parts: [] });
    const from = this.leftMm + lineWidthMm(printable(words, style.face), style.face, style.sizePt) + 2;
    this.page.ornaments.push(rule(from, this.rightMm, baseline + 0.6, 0.4));
    this.yMm += height;
  }

  /** A figure of a height, drawn into its box; it moves to the next page where it does not fit. */
  figure(alt: string, heightMm: number, draw: (box: Box) => readonly Ink[]): void {
    this.need(heightMm);
    const box = { leftMm: this.leftMm, topMm: this.yMm, widthMm: this.widthMm, heightMm };
    this.add({ tag: 'Figure', alt, ink: draw(box), parts: [] });
    this.yMm += heightMm;
  }

  /** A table; rows are not cut, and each page repeats the head. */
  table(columns: readonly Column[], rows: readonly (readonly string[])[], padMm = 1.1): void {
    const gutter = 3;
    let table = this.beginTable(columns, gutter);
    for (const cells of rows) {
      const lines = columns.map(({ share, style }, index) =>
        wrapped(cells[index] ?? '', style.face, style.sizePt, share * this.widthMm - gutter),
      );
      const height =
        Math.max(...lines.map((own, index) => own.length * lineMm(columns[index]!.style))) + 2 * padMm;
      if (this.freeMm < height) {
        this.newPage();
        table = this.beginTable(columns, gutter);
      }
      let x = this.leftMm;
      const parts = columns.map(({ share, style }, index): Part => {
        const ink = textInk(lines[index]!, x, this.yMm + padMm, style);
        x += share * this.widthMm;
        // Without heads above, the first cell is the row's.
        return index === 0 && columns.every(({ head }) => head === '')
          ? { tag: 'TH', scope: 'Row', ink, parts: [] }
          : { tag: 'TD', ink, parts: [] };
      });
      table.push({ tag: 'TR', ink: [], parts });
      this.yMm += height;
      this.page.ornaments.push(rule(this.leftMm, this.rightMm, this.yMm, 0.3, 0.45));
    }
  }

  /** Goes on with a new page. */
  newPage(): void {
    const { widthMm } = this.size;
    this.pages.push({ parts: [], ornaments: [] });
    const { corner, subtitle } = this.head;
    const title = this.pages.length === 1 ? this.head.title : `${this.head.title}, continued`;
    const rightMm = widthMm - SIDE_MM;
    const cornerWidth = Math.max(
      0,
      ...corner.map((words, i) => lineWidthMm(words, i === 0 ? 'bold' : 'sans', i === 0 ? 11 : 8.5)),
    );
    const room = rightMm - SIDE_MM - cornerWidth - 8;
    const sizePt =
      [this.head.titlePt ?? 22, 22, 20, 18, 16].find((pt) => lineWidthMm(title, 'serif', pt) <= room) ?? 15;
    const ink: Ink[] = [];
    let y = TOP_MM;
    for (const line of wrapped(title, 'serif', sizePt, room)) {
      y += sizePt * MM_PER_PT;
      ink.push(lineAt(line, SIDE_MM, y, { face: 'serif', sizePt }));
    }
    this.add({ tag: this.pages.length === 1 ? 'H1' : 'P', ink, parts: [] });
    // Large letters reach far below their line.
    y += Math.max(1.4, 0.28 * sizePt * MM_PER_PT - 1);
    const under = wrapped(subtitle, 'sans', 9.5, room);
    this.add({
      tag: 'P',
      ink: under.map((line, i) => lineAt(line, SIDE_MM, y + (i + 1) * 4.1, { face: 'sans', sizePt: 9.5 })),
      parts: [],
    });
    y += under.length * 4.1;
    let right = TOP_MM;
    const inCorner = corner
      .filter((words) => words !== '')
      .map((words, i): Ink => {
        right += i === 0 ? 4.2 : 4.1;
        return lineAt(words, rightMm, right, i === 0 ? { face: 'bold', sizePt: 11 } : SMALL, 1);
      });
    this.add({ tag: 'P', ink: inCorner, parts: [] });
    this.yMm = Math.max(y, right) + 5;
    this.topMm = this.yMm;
  }

  /** Makes sure that a height fits, on a new page where need be. */
  need(heightMm: number): void {
    if (this.freeMm < heightMm && this.yMm > this.topMm) this.newPage();
  }

  sheets(): TextSheet[] {
    return this.pages.map(({ parts, ornaments }, index) => ({
      kind: 'text',
      name: this.head.name,
      title: this.head.title,
      continued: index > 0,
      ...this.size,
      parts: parts.filter(({ ink, parts: within }) => ink.length + within.length > 0),
      ornaments,
    }));
  }

  private get page(): { parts: Part[]; ornaments: Ink[] } {
    return this.pages.at(-1)!;
  }

  private add(part: Part): void {
    this.page.parts.push(part);
  }

  private beginTable(columns: readonly Column[], gutter: number): Part[] {
    this.need(lineMm(HEAD_STYLE) + 14);
    const rows: Part[] = [];
    let x = this.leftMm;
    let height = 0;
    const parts = columns.map(({ head, share }): Part => {
      const lines = wrapped(head, HEAD_STYLE.face, HEAD_STYLE.sizePt, share * this.widthMm - gutter);
      height = Math.max(height, lines.length * lineMm(HEAD_STYLE));
      const ink = textInk(lines, x, this.yMm, HEAD_STYLE);
      x += share * this.widthMm;
      return { tag: 'TH', scope: 'Column', ink, parts: [] };
    });
    if (columns.some(({ head }) => head !== '')) {
      rows.push({ tag: 'TR', ink: [], parts });
      this.yMm += height + 0.8;
    }
    this.add({ tag: 'Table', ink: [], parts: rows });
    this.page.ornaments.push(rule(this.leftMm, this.rightMm, this.yMm, 0.8));
    return rows;
  }
}
