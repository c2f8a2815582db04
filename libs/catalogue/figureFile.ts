/** A place of the sky in radians, J2000. */
export interface FigurePoint {
  readonly raRad: number;
  readonly decRad: number;
}

/** The lines that join the stars of a constellation, and where its name stands best. */
export interface ConstellationFigure {
  /** IAU abbreviation, 'Ori'. */
  readonly abbreviation: string;
  /** Latin name, 'Orion'. */
  readonly name: string;
  readonly lines: readonly (readonly FigurePoint[])[];
  readonly labelRaRad: number;
  readonly labelDecRad: number;
}

export class FigureFileError extends Error {
  override readonly name = 'FigureFileError';
}

const DEGREE = Math.PI / 180;
const COLUMNS = 'abbreviation\tname\tlabel\tlines';

const writePoint = ({ raRad, decRad }: FigurePoint): string => {
  const raDeg = (((raRad / DEGREE) % 360) + 360) % 360;
  return `${raDeg.toFixed(4)},${(decRad / DEGREE).toFixed(4)}`;
};

const readPoint = (text: string, line: number): FigurePoint => {
  const [ra, dec, ...more] = text.split(',').map(Number);
  if (!(ra! >= 0 && ra! <= 360 && Math.abs(dec!) <= 90) || more.length > 0) {
    throw new FigureFileError(`Figures, line ${line}: "${text}" is no place (right ascension, declination).`);
  }
  return { raRad: ra! * DEGREE, decRad: dec! * DEGREE };
};

/**
 * Text of a figure file: a line a constellation; places as right ascension and declination in degrees to 0.0001,
 * points of a line parted by spaces, lines by |.
 */
export const writeFigures = (figures: readonly ConstellationFigure[], comment: readonly string[]): string =>
  [
    ...comment.map((line) => `# ${line}`),
    COLUMNS,
    ...figures.map(({ abbreviation, name, lines, labelRaRad, labelDecRad }) =>
      [
        abbreviation,
        name,
        writePoint({ raRad: labelRaRad, decRad: labelDecRad }),
        lines.map((line) => line.map(writePoint).join(' ')).join('|'),
      ].join('\t'),
    ),
    '',
  ].join('\n');

/** Reads a figure file; throws a FigureFileError which names the line. */
export const readFigures = (text: string): ConstellationFigure[] => {
  const rows = text
    .split('\n')
    .map((line, i) => ({ line, at: i + 1 }))
    .filter(({ line }) => line !== '' && !line.startsWith('#'));
  if (rows.shift()?.line !== COLUMNS) {
    throw new FigureFileError(`Figures: expected the columns ${COLUMNS.replaceAll('\t', ', ')}.`);
  }
  return rows.map(({ line, at }) => {
    const [abbreviation, name, label, lines, ...more] = line.split('\t');
    if (lines === undefined || more.length > 0) {
      throw new FigureFileError(`Figures, line ${at}: expected 4 columns.`);
    }
    const { raRad, decRad } = readPoint(label!, at);
    return {
      abbreviation: abbreviation!,
      name: name!,
      lines: lines.split('|').map((stroke) => stroke.split(' ').map((point) => readPoint(point, at))),
      labelRaRad: raRad,
      labelDecRad: decRad,
    };
  });
};
