/** Radians in a degree, an arcminute, an arcsecond and an hour of right ascension. */
export const DEG = Math.PI / 180;
export const ARCMIN = DEG / 60;
export const ARCSEC = DEG / 3600;
export const HOUR = 15 * DEG;

const TURN = 2 * Math.PI;

/** Radians to degrees. */
export function toDeg(rad: number): number {
  return rad / DEG;
}

/** Degrees to radians. */
export function toRad(deg: number): number {
  return deg * DEG;
}

/** The same angle in [0, 2π), radians. */
export function wrapTwoPi(rad: number): number {
  const wrapped = rad % TURN;
  if (wrapped >= 0) return wrapped;
  // A tiny negative angle would round up to a whole turn.
  return wrapped + TURN < TURN ? wrapped + TURN : 0;
}

/** The same angle in (-π, π], radians. */
export function wrapPi(rad: number): number {
  const wrapped = wrapTwoPi(rad);
  return wrapped > Math.PI ? wrapped - TURN : wrapped;
}
