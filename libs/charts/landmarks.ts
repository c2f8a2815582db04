import type { Star } from '#catalogue';
import type { SkyPoint } from './projection';

const degree = Math.PI / 180;

/** Stars as unit vectors, in order of declination, so that those near a place are found without a look at all. */
export interface StarField {
  readonly stars: readonly Star[];
  readonly decs: Float64Array;
  readonly vectors: Float64Array;
}

/** A star, or two close together, that a person at a finder can tell from what is round it. */
export interface Landmark {
  readonly star: Star;
  /** The fainter star of a close pair; null for a star by itself. */
  readonly partner: Star | null;
  /** How many stars near it could be taken for it. */
  readonly rivals: number;
}

/** Lays stars out for `visitNear`. */
export function starField(stars: readonly Star[]): StarField {
  const sorted = [...stars].sort((one, other) => one.decRad - other.decRad);
  const decs = Float64Array.from(sorted, ({ decRad }) => decRad);
  const vectors = new Float64Array(3 * sorted.length);
  for (let i = 0; i < sorted.length; i++) {
    const { raRad, decRad } = sorted[i]!;
    const across = Math.cos(decRad);
    vectors[3 * i] = across * Math.cos(raRad);
    vectors[3 * i + 1] = across * Math.sin(raRad);
    vectors[3 * i + 2] = Math.sin(decRad);
  }
  return { stars: sorted, decs, vectors };
}

/** Calls `visit` with the index and separation (radians) of each star within a radius of a place. */
export function visitNear(
  field: StarField,
  place: SkyPoint,
  radiusRad: number,
  visit: (index: number, separationRad: number) => void,
): void {
  const { decs, vectors } = field;
  const [x, y, z] = vectorOf(place);
  // The chord, unlike the cosine, stays exact for stars close together.
  const chord = 2 * Math.sin(radiusRad / 2);
  const longest = chord * chord;
  const top = place.decRad + radiusRad;
  const count = decs.length;
  for (let i = firstFrom(decs, place.decRad - radiusRad); i < count && decs[i]! <= top; i++) {
    const dx = vectors[3 * i]! - x;
    const dy = vectors[3 * i + 1]! - y;
    const dz = vectors[3 * i + 2]! - z;
    const square = dx * dx + dy * dy + dz * dz;
    if (square <= longest) visit(i, 2 * Math.asin(Math.min(1, Math.sqrt(square) / 2)));
  }
}

/** Rivals are looked for this far round a star: what stays in view beside it in a finder put roughly on it. */
export const surroundingsRad = 1.8 * degree;
/** A rival is at most this much fainter, magnitudes. */
const rivalFainter = 0.6;
const pairRad = (12 / 60) * degree;
const pairDifference = 1.2;

/** What a finder's user makes of a star: whether it is one of a pair, and how much could be taken for it. */
export function landmarkOf(field: StarField, index: number): Landmark {
  const star = field.stars[index]!;
  let partner: Star | null = null;
  let rivals = 0;
  const faintestRival = star.magnitude + rivalFainter;
  visitNear(field, star, surroundingsRad, (other, separation) => {
    if (other === index) return;
    const candidate = field.stars[other]!;
    const isPair = separation < pairRad && Math.abs(candidate.magnitude - star.magnitude) < pairDifference;
    if (isPair) {
      if (candidate.magnitude < star.magnitude) rivals += 1;
      else if (partner === null || candidate.magnitude < partner.magnitude) partner = candidate;
    } else if (candidate.magnitude <= faintestRival) {
      rivals += 1;
    }
  });
  return { star, partner, rivals };
}

function firstFrom(decs: Float64Array, decRad: number): number {
  let low = 0;
  let high = decs.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (decs[middle]! < decRad) low = middle + 1;
    else high = middle;
  }
  return low;
}

function vectorOf({ raRad, decRad }: SkyPoint): [number, number, number] {
  const across = Math.cos(decRad);
  return [across * Math.cos(raRad), across * Math.sin(raRad), Math.sin(decRad)];
}

/** The angle between two places, radians, by the haversine, which is exact for near places. */
export function separationOf(one: SkyPoint, other: SkyPoint): number {
  const north = Math.sin((one.decRad - other.decRad) / 2);
  const east = Math.sin((one.raRad - other.raRad) / 2);
  const square = north * north + Math.cos(one.decRad) * Math.cos(other.decRad) * east * east;
  return 2 * Math.asin(Math.min(1, Math.sqrt(square)));
}
