import type { Star } from '#catalogue';
import type { SkyPoint } from './projection';

const degree = Math.PI / 180;

/** Stars as unit vectors, in order of declination, so that those near a place are found without a look at all. */
export interface StarField {
  readonly stars: readonly Star[];
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
  const vectors = new Float64Array(3 * sorted.length);
  sorted.forEach(({ raRad, decRad }, index) => {
    vectors.set(vectorOf({ raRad, decRad }), 3 * index);
  });
  return { stars: sorted, vectors };
}

/** Calls `visit` with the index and separation (radians) of each star within a radius of a place. */
export function visitNear(
  field: StarField,
  place: SkyPoint,
  radiusRad: number,
  visit: (index: number, separationRad: number) => void,
): void {
  const { stars, vectors } = field;
  const [x, y, z] = vectorOf(place);
  // The chord, unlike the cosine, stays exact for stars close together.
  const longest = (2 * Math.sin(radiusRad / 2)) ** 2;
  const top = place.decRad + radiusRad;
  for (let i = firstFrom(stars, place.decRad - radiusRad); i < stars.length; i++) {
    if (stars[i]!.decRad > top) break;
    const square =
      (vectors[3 * i]! - x) ** 2 + (vectors[3 * i + 1]! - y) ** 2 + (vectors[3 * i + 2]! - z) ** 2;
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

function firstFrom(stars: readonly Star[], decRad: number): number {
  let low = 0;
  let high = stars.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (stars[middle]!.decRad < decRad) low = middle + 1;
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
