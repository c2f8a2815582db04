import type { ConstellationFigure } from '../figureFile';
import type { StarLabel } from '../starLabels';

/** A star that a figure may run through. */
export interface FigureStar {
  readonly raRad: number;
  readonly decRad: number;
  readonly magnitude: number;
  readonly label: StarLabel;
}

const SUPERSCRIPT = /[¹²³⁴-⁹]$/;

const findStar = (stars: readonly FigureStar[], constellation: string, reference: string): FigureStar => {
  const [own, other] = reference.split(':');
  const abbreviation = other === undefined ? constellation : own!;
  const designation = other ?? own!;
  const inIt = stars.filter((star) => star.label.constellation === abbreviation);
  const exact = inIt.filter(({ label }) =>
    /^\d+$/.test(designation) ? label.flamsteed === Number(designation) : label.bayerLetter === designation,
  );
  const found =
    exact.length > 0
      ? exact
      : inIt.filter(({ label }) => label.bayerLetter?.replace(SUPERSCRIPT, '') === designation);
  const brightest = [...found].sort((a, b) => a.magnitude - b.magnitude)[0];
  if (!brightest) throw new Error(`Figures, ${constellation}: no star "${reference}".`);
  return brightest;
};

/** Middle of a figure: the mean direction of its stars, each taken once. */
const middle = (stars: Iterable<FigureStar>): { labelRaRad: number; labelDecRad: number } => {
  let [x, y, z] = [0, 0, 0];
  for (const { raRad, decRad } of stars) {
    x += Math.cos(decRad) * Math.cos(raRad);
    y += Math.cos(decRad) * Math.sin(raRad);
    z += Math.sin(decRad);
  }
  return { labelRaRad: Math.atan2(y, x), labelDecRad: Math.atan2(z, Math.hypot(x, y)) };
};

/** Turns figures.txt into places, by the stars' letters and numbers; throws where a reference finds no star. */
export const resolveFigures = (text: string, stars: readonly FigureStar[]): ConstellationFigure[] =>
  text
    .split('\n')
    .filter((line) => line.trim() !== '' && !line.startsWith('#'))
    .map((line) => {
      const parts = /^(\w{3}) ([A-Z][A-Za-zö ]+): (.+)$/.exec(line);
      if (!parts) throw new Error(`Figures: cannot read "${line}".`);
      const pieces = parts[3]!.split('||').map((piece) =>
        piece.split('|').map((stroke) =>
          stroke
            .trim()
            .split('-')
            .map((reference) => findStar(stars, parts[1]!, reference)),
        ),
      );
      return {
        abbreviation: parts[1]!,
        name: parts[2]!,
        lines: pieces.flat(),
        ...middle(new Set(pieces[0]!.flat())),
      };
    });
