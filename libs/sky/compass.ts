const POINTS = [
  ['N', 'north'],
  ['NNE', 'north-north-east'],
  ['NE', 'north-east'],
  ['ENE', 'east-north-east'],
  ['E', 'east'],
  ['ESE', 'east-south-east'],
  ['SE', 'south-east'],
  ['SSE', 'south-south-east'],
  ['S', 'south'],
  ['SSW', 'south-south-west'],
  ['SW', 'south-west'],
  ['WSW', 'west-south-west'],
  ['W', 'west'],
  ['WNW', 'west-north-west'],
  ['NW', 'north-west'],
  ['NNW', 'north-north-west'],
] as const;

/** A point of the compass: 'SSW', 'south-south-west', and its angle from north through east. */
export interface CompassPoint {
  readonly letters: string;
  readonly word: string;
  readonly azimuthRad: number;
}

/** The sixteen points, from north through east. */
export const COMPASS: readonly CompassPoint[] = POINTS.map(([letters, word], i) => ({
  letters,
  word,
  azimuthRad: (i * Math.PI) / 8,
}));

/** The nearest of the sixteen points, or of the eight that people say, to an angle from north through east. */
export function compassPoint(angleRad: number, of: 8 | 16): CompassPoint {
  const nearest = Math.round((angleRad * of) / (2 * Math.PI));
  return COMPASS[(((nearest % of) + of) % of) * (16 / of)]!;
}
