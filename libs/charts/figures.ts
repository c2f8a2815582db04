import type { ConstellationFigure } from '#catalogue';
import { type Box, type Line, piecesOutside } from './lines';
import type { Plate } from './plate';
import type { Mark, SheetPoint, Stroke } from './scene';

const stroke: Stroke = { widthPt: 0.5, gray: 0.5, dashMm: [1.6, 0.9] };
/** Clear paper between a line's end and the edge of its star's dot, millimetres. */
const gapMm = 0.8;

export interface FigureLine {
  readonly of: string;
  readonly line: Line;
}

/** The constellation lines of a sheet, each stopping short of the dots it joins. */
export function figureLines(
  figures: readonly ConstellationFigure[],
  plate: Plate,
  dotRadiusAt: (point: SheetPoint) => number,
): FigureLine[] {
  const lines: FigureLine[] = [];
  for (const figure of figures) {
    for (const line of figure.lines) {
      let before: SheetPoint | null = null;
      for (const corner of line) {
        const at = plate.toSheet(corner);
        // Most of the sky's lines miss the sheet; only the others are worth looking up their stars for.
        if (before !== null && at !== null && mayCross(plate, [before, at])) {
          const piece = shortened(before, at, dotRadiusAt(before) + gapMm, dotRadiusAt(at) + gapMm);
          if (piece !== null) lines.push({ of: figure.abbreviation, line: piece });
        }
        before = at;
      }
    }
  }
  return lines;
}

/** Clear paper between a line and a label it would run through, millimetres. */
const labelGapMm = 0.4;
/** A shorter remnant looks like dirt. */
const leastPieceMm = 1;

/** The marks of figure lines, each opened where a label stands across it. */
export function figureMarks(lines: readonly FigureLine[], labels: readonly Box[]): Mark[] {
  return lines.flatMap(({ of, line }) =>
    piecesOutside(line, labels, labelGapMm)
      .filter(([from, to]) => Math.hypot(to[0] - from[0], to[1] - from[1]) >= leastPieceMm)
      .map((points): Mark => ({
        shape: 'polyline',
        points,
        role: 'figure',
        of,
        stroke,
        fillGray: null,
        layer: 'under',
        clipped: true,
      })),
  );
}

function shortened(
  from: SheetPoint,
  to: SheetPoint,
  atStartMm: number,
  atEndMm: number,
): [SheetPoint, SheetPoint] | null {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  if (length <= atStartMm + atEndMm + 0.5) return null;
  const along = (mm: number): SheetPoint => [
    from[0] + ((to[0] - from[0]) * mm) / length,
    from[1] + ((to[1] - from[1]) * mm) / length,
  ];
  return [along(atStartMm), along(length - atEndMm)];
}

/** False where a line surely misses the frame, so that it need not be written at all. */
function mayCross(plate: Plate, [from, to]: readonly [SheetPoint, SheetPoint]): boolean {
  const { frame } = plate;
  const [left, top, right, bottom] =
    frame.shape === 'circle'
      ? [
          frame.xMm - frame.radiusMm,
          frame.yMm - frame.radiusMm,
          frame.xMm + frame.radiusMm,
          frame.yMm + frame.radiusMm,
        ]
      : [frame.xMm, frame.yMm, frame.xMm + frame.widthMm, frame.yMm + frame.heightMm];
  return !(
    Math.max(from[0], to[0]) < left ||
    Math.min(from[0], to[0]) > right ||
    Math.max(from[1], to[1]) < top ||
    Math.min(from[1], to[1]) > bottom
  );
}
