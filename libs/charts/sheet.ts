import type { ChartRequest, Paper } from './request';
import type { Frame, Mark, SheetText, TextRole } from './scene';
import type { WayText } from './wayWords';
import { type Face, printable, textWidthMm, wrapped } from './typeface';

const papers: Readonly<Record<Paper, { readonly widthMm: number; readonly heightMm: number }>> = {
  a4: { widthMm: 210, heightMm: 297 },
  letter: { widthMm: 215.9, heightMm: 279.4 },
};

const sideMarginMm = 12;
const topMm = 11;
const footBaselineMm = 9;
const noteLineMm = 3.9;
const notePt = 8.5;
/** The numbers of steps hang left of their words. */
const hangMm = 5;
const panelGapMm = 6;

export interface Sheet {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly leftMm: number;
  readonly rightMm: number;
  readonly frame: Frame;
  /** Top of the strip that holds the key. */
  readonly keyTopMm: number;
  /** Where the inset stands, beside the notes; null without one. */
  readonly panel: PanelBox | null;
  readonly texts: readonly SheetText[];
  readonly marks: readonly Mark[];
}

export interface PanelSize {
  readonly widthMm: number;
  readonly heightMm: number;
}

export interface PanelBox extends PanelSize {
  readonly xMm: number;
  readonly yMm: number;
}

/** Writes lines of text, keeping count of the paragraphs. */
export class Typesetter {
  readonly texts: SheetText[] = [];
  private paragraph = 0;

  /** Starts a paragraph; the lines written next belong to it. */
  begin(): void {
    this.paragraph += 1;
  }

  write(role: TextRole, words: string, xMm: number, yMm: number, face: Face, sizePt: number, gray = 0): void {
    const text = printable(words, face);
    if (text === '') return;
    const widthMm = textWidthMm(text, face, sizePt);
    this.texts.push({
      role,
      paragraph: this.paragraph,
      text,
      xMm,
      yMm,
      widthMm,
      face,
      sizePt,
      gray,
      spacingPt: 0,
    });
  }

  writeRight(role: TextRole, text: string, rightMm: number, yMm: number, face: Face, sizePt: number): void {
    this.write(role, text, rightMm - textWidthMm(printable(text, face), face, sizePt), yMm, face, sizePt);
  }
}

/**
 * Lays out a sheet: title and event top left, instrument top right, the chart as large as the rest allows, the
 * strip for the key under it, then notes and cautions, and the foot line.
 */
export function layOut(
  request: ChartRequest,
  instrument: readonly string[],
  way: WayText | null,
  panel: PanelSize | null,
  keyHeightMm: number,
): Sheet {
  const { widthMm, heightMm } = papers[request.paper];
  const leftMm = sideMarginMm;
  const rightMm = widthMm - sideMarginMm;
  const text = new Typesetter();
  const headBottom = writeHead(text, request, instrument, leftMm, rightMm);

  const footY = heightMm - footBaselineMm;
  const footLines = wrapped(request.words.foot, 'sans', 8, rightMm - leftMm);
  const footTop = footY - (footLines.length - 1) * 3.6 - 4.4;
  const textRight = panel === null ? rightMm : rightMm - panel.widthMm - panelGapMm;
  const steps = (way?.steps ?? []).map((words) =>
    wrapped(words, 'sans', notePt, textRight - leftMm - hangMm),
  );
  const stepLines =
    steps.reduce((sum, lines) => sum + lines.length, 0) + (way === null || way.steps.length === 0 ? 0 : 1);
  const notes = [
    ...(way?.notes ?? []).map((words) => ({ words, face: 'sans' as const, role: 'step' as const })),
    ...request.words.cautions.map((words) => ({ words, face: 'bold' as const, role: 'caution' as const })),
    ...request.words.notes.map((words) => ({ words, face: 'sans' as const, role: 'note' as const })),
  ].map((note) => ({ ...note, lines: wrapped(note.words, note.face, notePt, textRight - leftMm) }));
  const noteLines = notes.reduce((sum, { lines }) => sum + lines.length, 0);
  const lineCount = noteLines + stepLines;
  const wordsHeight = lineCount === 0 ? 0 : lineCount * noteLineMm + (stepLines > 0 ? 1.2 : 0) + 2.5;
  const notesHeight = Math.max(wordsHeight, panel === null ? 0 : panel.heightMm + 3);

  const chartTop = headBottom + 3;
  const free = footTop - notesHeight - keyHeightMm - chartTop;
  const frame = frameFor(request, leftMm, rightMm, chartTop, Math.max(free, 60));
  const frameBottom = frame.shape === 'circle' ? frame.yMm + frame.radiusMm : frame.yMm + frame.heightMm;

  let noteY = frameBottom + keyHeightMm + 4.2;
  if (way !== null && steps.length > 0) {
    text.begin();
    text.write('step', way.heading, leftMm, noteY, 'bold', notePt);
    steps.forEach((lines, index) => {
      text.begin();
      lines.forEach((line, row) => {
        noteY += noteLineMm;
        if (row === 0) text.write('step', String(index + 1), leftMm, noteY, 'bold', notePt);
        text.write('step', line, leftMm + hangMm, noteY, 'sans', notePt);
      });
    });
    noteY += noteLineMm + 1.2;
  }
  for (const note of notes) {
    text.begin();
    for (const line of note.lines) {
      text.write(note.role, line, leftMm, noteY, note.face, notePt);
      noteY += noteLineMm;
    }
  }
  text.begin();
  footLines.forEach((line, index) => {
    text.write('foot', line, leftMm, footY - (footLines.length - 1 - index) * 3.6, 'sans', 8);
  });
  const marks: Mark[] = [
    {
      shape: 'polyline',
      role: 'rule',
      of: null,
      points: [
        [leftMm, footTop],
        [rightMm, footTop],
      ],
      stroke: { widthPt: 0.4, gray: 0 },
      fillGray: null,
      layer: 'over',
      clipped: false,
    },
  ];
  const panelBox =
    panel === null ? null : { ...panel, xMm: rightMm - panel.widthMm, yMm: frameBottom + keyHeightMm + 0.5 };
  return {
    widthMm,
    heightMm,
    leftMm,
    rightMm,
    frame,
    keyTopMm: frameBottom,
    panel: panelBox,
    texts: text.texts,
    marks,
  };
}

/** Gives the height at which the head ends. */
function writeHead(
  text: Typesetter,
  request: ChartRequest,
  instrument: readonly string[],
  leftMm: number,
  rightMm: number,
): number {
  const instrumentWidth = Math.max(
    ...instrument.map((line, index) =>
      textWidthMm(line, index === 0 ? 'bold' : 'sans', index === 0 ? 11 : 8.5),
    ),
  );
  const room = rightMm - leftMm - instrumentWidth - 8;
  const { title, subtitle } = request.words;
  text.begin();
  let y = topMm;
  const size = [22, 20, 18, 16].find((pt) => textWidthMm(title, 'serif', pt) <= room) ?? 15;
  for (const line of wrapped(title, 'serif', size, room)) {
    y += size * 0.353;
    text.write('title', line, leftMm, y, 'serif', size);
  }
  text.begin();
  y += 1.4;
  for (const line of wrapped(subtitle, 'sans', 9.5, room)) {
    y += 4.1;
    text.write('subtitle', line, leftMm, y, 'sans', 9.5);
  }
  text.begin();
  let right = topMm;
  instrument.forEach((line, index) => {
    right += index === 0 ? 4.2 : 4.1;
    text.writeRight(
      'instrument',
      line,
      rightMm,
      right,
      index === 0 ? 'bold' : 'sans',
      index === 0 ? 11 : 8.5,
    );
  });
  return Math.max(y, right) + 1;
}

function frameFor(
  request: ChartRequest,
  leftMm: number,
  rightMm: number,
  topMm: number,
  freeMm: number,
): Frame {
  const widthMm = rightMm - leftMm;
  if (request.scale === 'eye') {
    return { shape: 'rectangle', xMm: leftMm, yMm: topMm, widthMm, heightMm: freeMm };
  }
  const side = Math.min(widthMm, freeMm);
  const middle = (leftMm + rightMm) / 2;
  if (request.scale === 'eyepiece') {
    return { shape: 'circle', xMm: middle, yMm: topMm + side / 2, radiusMm: side / 2 };
  }
  return { shape: 'rectangle', xMm: middle - side / 2, yMm: topMm, widthMm: side, heightMm: side };
}
