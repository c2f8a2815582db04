const POINTS = [
  'north',
  'north-north-east',
  'north-east',
  'east-north-east',
  'east',
  'east-south-east',
  'south-east',
  'south-south-east',
  'south',
  'south-south-west',
  'south-west',
  'west-south-west',
  'west',
  'west-north-west',
  'north-west',
  'north-north-west',
] as const;

/** The nearest of the sixteen compass points, in words, of an angle from north through east in degrees. */
export function pointWords(angleDeg: number): string {
  return POINTS[((Math.round(angleDeg / 22.5) % 16) + 16) % 16]!;
}
