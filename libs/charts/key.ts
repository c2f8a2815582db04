import { dotDiameterMm, largestDotMm } from './dots';
import { sheetAngle, type Turn } from './orientation';
import { fieldWords } from './instrument';
import { nextFrameDashMm } from './nextFrame';
import type { ChartRequest, ChartScale, Orientation } from './request';
import type { Mark, SheetPoint, SheetText, Stroke } from './scene';
import { type Sheet, Typesetter } from './sheet';
import { smallSymbolMm, type SymbolKind, symbolMarks, symbolWords } from './symbols';
import { textWidthMm } from './typeface';

/** What the key has to explain. */
export interface KeyContent {
  readonly scale: ChartScale;
  readonly orientation: Orientation;
  readonly turn: Turn;
  readonly mmPerRadian: number;
  readonly faintestMagnitude: number;
  readonly brightestMagnitude: number;
  readonly symbols: readonly SymbolKind[];
  readonly targetName: string;
  readonly hasPath: boolean;
  readonly hasHours: boolean;
  readonly hasTail: boolean;
  readonly hasWay: boolean;
  readonly hasFigures: boolean;
  readonly hasAltitudes: boolean;
  readonly next: ChartRequest['next'];
  /** Position angle (radians) of the way up in the sky, for sheets that have north at the top; else null. */
  readonly upAngleRad: number | null;
  readonly showsDirections: boolean;
}

const line: Stroke = { widthPt: 0.8, gray: 0 };
const textPt = 8;
const rowMm = 4.6;
/** Under the last row. */
const underMm = 1.2;
const firstRowMm = 6.6;

/** The strip under the chart: directions, scale, how the view is turned, dots and symbols, those used only. */
export function drawKey(
  sheet: Sheet,
  content: KeyContent,
): { marks: Mark[]; texts: SheetText[]; heightMm: number } {
  const marks: Mark[] = [];
  const text = new Typesetter();
  const top = sheet.keyTopMm;
  let x = sheet.leftMm;
  if (content.showsDirections) {
    text.begin();
    x = drawDirections(marks, text, content, x, top);
  }
  text.begin();
  x = drawScaleBar(marks, text, content, x, top);
  drawDots(marks, text, content, x, sheet.rightMm, top + firstRowMm);
  text.begin();
  const last = drawSymbols(marks, text, content, x, sheet.rightMm, top + firstRowMm + rowMm);
  return { marks, texts: text.texts, heightMm: last - top + underMm };
}

const shared = { role: 'key', of: null, layer: 'over', clipped: false } as const;

function strokeLine(from: SheetPoint, to: SheetPoint, stroke: Stroke = line): Mark {
  return { ...shared, shape: 'polyline', points: [from, to], stroke, fillGray: null };
}

function arrow(marks: Mark[], from: SheetPoint, angleRad: number, lengthMm: number): void {
  const at = (ahead: number, aside: number): SheetPoint => [
    from[0] + ahead * Math.cos(angleRad) - aside * Math.sin(angleRad),
    from[1] + ahead * Math.sin(angleRad) + aside * Math.cos(angleRad),
  ];
  marks.push(strokeLine(from, at(lengthMm - 1.5, 0)));
  marks.push({
    ...shared,
    shape: 'polygon',
    points: [at(lengthMm, 0), at(lengthMm - 2, 0.7), at(lengthMm - 2, -0.7)],
    stroke: null,
    fillGray: 0,
  });
}

/** North and east, the way up in the sky, and the F that shows how the picture is turned. Gives the new x. */
function drawDirections(
  marks: Mark[],
  text: Typesetter,
  content: KeyContent,
  x: number,
  top: number,
): number {
  const centred = (word: string, middle: SheetPoint, face: 'bold' | 'sans'): void => {
    const width = textWidthMm(word, face, textPt);
    text.write('key', word, middle[0] - width / 2, middle[1] + 1, face, textPt);
  };
  const length = 6.5;
  const north = sheetAngle(content.turn, 0);
  const east = sheetAngle(content.turn, Math.PI / 2);
  // The pair's middle, not its corner, stays in the middle of its box, whichever way it is turned.
  const corner: SheetPoint = [
    x + 8 - (length / 2) * (Math.cos(north) + Math.cos(east)),
    top + 12.5 - (length / 2) * (Math.sin(north) + Math.sin(east)),
  ];
  for (const [angle, word] of [
    [north, 'N'],
    [east, 'E'],
  ] as const) {
    arrow(marks, corner, angle, length);
    centred(
      word,
      [corner[0] + (length + 2) * Math.cos(angle), corner[1] + (length + 2) * Math.sin(angle)],
      'bold',
    );
  }
  let next = x + 20;
  drawTurnedF(marks, content.orientation, [next + 5, top + 10.5]);
  centred('an F in view', [next + 5, top + 19], 'sans');
  next += 19;
  if (content.upAngleRad !== null) {
    const up = sheetAngle(content.turn, content.upAngleRad);
    const middle: SheetPoint = [next + 6, top + 10.5];
    arrow(marks, [middle[0] - 4 * Math.cos(up), middle[1] - 4 * Math.sin(up)], up, 8);
    centred('overhead', [middle[0], top + 19], 'sans');
    next += 16;
  }
  return next + 2;
}

/** A capital F as the instrument shows it: 5 mm high, drawn as a shape so that it can be mirrored. */
function drawTurnedF(marks: Mark[], orientation: Orientation, middle: SheetPoint): void {
  const outline: readonly SheetPoint[] = [
    [-1.7, 2.6],
    [-1.7, -2.6],
    [1.7, -2.6],
    [1.7, -1.7],
    [-0.7, -1.7],
    [-0.7, -0.5],
    [1, -0.5],
    [1, 0.4],
    [-0.7, 0.4],
    [-0.7, 2.6],
  ];
  const across = orientation === 'upright' ? 1 : -1;
  const down = orientation === 'rotated' ? -1 : 1;
  marks.push({
    ...shared,
    shape: 'polygon',
    points: outline.map(([x, y]) => [middle[0] + across * x, middle[1] + down * y]),
    stroke: null,
    fillGray: 0,
  });
}

const roundArcmin = [1, 2, 5, 10, 15, 30, 60, 120, 300, 600, 1200, 1800];

/** A bar of a round number of degrees or minutes, as long as 42 mm allow. Gives the new x. */
function drawScaleBar(marks: Mark[], text: Typesetter, content: KeyContent, x: number, top: number): number {
  const longestMm = 42;
  const mmPerArcmin = (content.mmPerRadian * Math.PI) / 180 / 60;
  const arcmin = roundArcmin.findLast((minutes) => minutes * mmPerArcmin <= longestMm) ?? 1;
  const length = arcmin * mmPerArcmin;
  const y = top + 10;
  marks.push(strokeLine([x, y], [x + length, y]));
  for (const end of [x, x + length / 2, x + length]) marks.push(strokeLine([end, y - 1.2], [end, y + 1.2]));
  const words = arcmin < 60 ? `${String(arcmin)}′` : `${String(arcmin / 60)}°`;
  text.write('key', words, x + length / 2 - textWidthMm(words, 'bold', 8.5) / 2, y - 2.6, 'bold', 8.5);
  const gloss = glossFor(content.scale);
  gloss.forEach((part, index) => {
    text.write('key', part, x, y + 5 + index * 3.6, 'sans', textPt);
  });
  return x + Math.max(length, ...gloss.map((part) => textWidthMm(part, 'sans', textPt))) + 9;
}

function glossFor(scale: ChartScale): string[] {
  if (scale === 'eye') return ['A fist at arm’s length', 'covers about 10°'];
  return ['The full Moon', 'is about 30′ (½°) wide'];
}

/** Dots of whole magnitudes, brightest to faintest on this sheet. */
function drawDots(
  marks: Mark[],
  text: Typesetter,
  content: KeyContent,
  x: number,
  right: number,
  y: number,
): void {
  const faintest = Math.floor(content.faintestMagnitude);
  // All that reach the largest dot look alike; one of them stands for the rest.
  let brightest = Math.ceil(content.brightestMagnitude);
  while (dotDiameterMm(brightest + 1, content.faintestMagnitude) >= largestDotMm) brightest += 1;
  const standsForMore = brightest > Math.ceil(content.brightestMagnitude);
  const caption = 'Magnitude:';
  text.write('key', caption, x, y, 'sans', textPt);
  let at = x + textWidthMm(caption, 'sans', textPt) + 2.5;
  for (let magnitude = brightest; magnitude <= faintest; magnitude++) {
    const radiusMm = dotDiameterMm(magnitude, content.faintestMagnitude) / 2;
    marks.push({
      ...shared,
      shape: 'circle',
      xMm: at + radiusMm,
      yMm: y - 1,
      radiusMm,
      stroke: null,
      fillGray: 0,
    });
    const number = magnitude < 0 ? `−${String(-magnitude)}` : String(magnitude);
    const word = standsForMore && magnitude === brightest ? `${number} or brighter` : number;
    text.write('key', word, at + 2 * radiusMm + 0.8, y, 'sans', textPt);
    at += 2 * radiusMm + 0.8 + textWidthMm(word, 'sans', textPt) + 2.6;
  }
  const gloss = ['(small number: bright star)', '(small: bright)'].find(
    (words) => at + textWidthMm(words, 'sans', textPt) <= right,
  );
  if (gloss !== undefined) text.write('key', gloss, at, y, 'sans', textPt);
}

/** The other signs used on the sheet, flowing into rows. Gives the baseline of the last. */
function drawSymbols(
  marks: Mark[],
  text: Typesetter,
  content: KeyContent,
  left: number,
  right: number,
  firstY: number,
): number {
  const iconMm = 6;
  let x = left;
  let y = firstY;
  const item = (words: string, draw: (middle: SheetPoint) => void): void => {
    const width = iconMm + 1 + textWidthMm(words, 'sans', textPt);
    if (x > left && x + width > right) {
      x = left;
      y += rowMm;
    }
    draw([x + iconMm / 2, y - 1]);
    text.write('key', words, x + iconMm + 1, y, 'sans', textPt);
    x += width + 4.5;
  };
  item(content.targetName, (middle) => {
    for (const start of [-31, 59, 149, 239]) {
      marks.push({
        ...shared,
        shape: 'arc',
        xMm: middle[0],
        yMm: middle[1],
        radiusMm: 1.7,
        fromDeg: start,
        toDeg: start + 62,
        stroke: { widthPt: 1.1, gray: 0 },
        fillGray: null,
      });
    }
  });
  if (content.hasPath) {
    item('its path, with times', (middle) => {
      marks.push(strokeLine([middle[0] - 3, middle[1]], [middle[0] + 3, middle[1]]));
      marks.push(strokeLine([middle[0], middle[1] - 1], [middle[0], middle[1] + 1]));
    });
  }
  if (content.hasHours) {
    item('where it stands as we open and close', (middle) => {
      marks.push({
        ...shared,
        shape: 'circle',
        xMm: middle[0],
        yMm: middle[1],
        radiusMm: 0.9,
        stroke: line,
        fillGray: 1,
      });
    });
  }
  if (content.hasTail) {
    item('which way its tail points', (middle) => {
      for (const rise of [-0.9, 0, 0.9]) {
        marks.push(
          strokeLine([middle[0] - 2.5, middle[1]], [middle[0] + 2.5, middle[1] + rise], {
            widthPt: 0.6,
            gray: 0,
          }),
        );
      }
    });
  }
  if (content.hasWay) {
    item('the way there, step by step', (middle) => {
      const tip: SheetPoint = [middle[0] + 3, middle[1]];
      const stroke: Stroke = { widthPt: 1, gray: 0.3 };
      marks.push(strokeLine([middle[0] - 3, middle[1]], tip, stroke));
      marks.push(strokeLine([tip[0] - 2, tip[1] - 0.8], tip, stroke));
      marks.push(strokeLine([tip[0] - 2, tip[1] + 0.8], tip, stroke));
    });
  }
  const { next } = content;
  if (next !== undefined) {
    const sheet = next.scale === 'eyepiece' ? 'eyepiece' : 'binocular';
    item(`${sheet} sheet, ${fieldWords(next.fieldDeg)}`, (middle) => {
      marks.push(
        strokeLine([middle[0] - 3, middle[1]], [middle[0] + 3, middle[1]], {
          widthPt: 0.6,
          gray: 0,
          dashMm: nextFrameDashMm,
        }),
      );
    });
  }
  if (content.hasFigures) {
    item('constellation line', (middle) => {
      marks.push(
        strokeLine([middle[0] - 3, middle[1]], [middle[0] + 3, middle[1]], {
          widthPt: 0.5,
          gray: 0.5,
          dashMm: [1.6, 0.9],
        }),
      );
    });
  }
  for (const kind of content.symbols) {
    item(symbolWords[kind], (middle) => {
      if (kind === 'doubleStar') {
        marks.push({
          ...shared,
          shape: 'circle',
          xMm: middle[0],
          yMm: middle[1],
          radiusMm: 0.7,
          stroke: null,
          fillGray: 0,
        });
      }
      const symbol = symbolMarks({
        at: middle,
        kind,
        semiMajorMm: kind === 'galaxy' ? 1.9 : kind === 'doubleStar' ? 0.7 : kind === 'point' ? 0.5 : 1.3,
        semiMinorMm: kind === 'galaxy' ? smallSymbolMm : 1.3,
        angleDeg: 0,
        role: 'key',
        of: null,
        widthPt: 0.7,
      });
      marks.push(...symbol.map((mark) => ({ ...mark, clipped: false })));
    });
  }
  if (content.hasAltitudes) {
    item('height above the horizon, at the sides', (middle) => {
      marks.push(strokeLine([middle[0] - 2, middle[1] - 1.6], [middle[0] - 2, middle[1] + 1.6]));
      marks.push(strokeLine([middle[0] - 2, middle[1]], [middle[0] + 0.2, middle[1]]));
    });
  }
  return y;
}
