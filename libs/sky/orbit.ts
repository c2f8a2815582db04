import { ARCSEC } from './angles';
import { type Vector } from './vector';

/** Gaussian gravitational constant, au^1.5/day, and its square. */
export const GAUSS_K = 0.01720209895;
export const SUN_MU = GAUSS_K * GAUSS_K;

/** An osculating conic about the Sun, referred to the ecliptic and equinox J2000. */
export interface OrbitalElements {
  readonly perihelionDistanceAu: number;
  /** 0 a circle, below 1 an ellipse, 1 a parabola, above 1 a hyperbola. */
  readonly eccentricity: number;
  readonly inclinationRad: number;
  readonly nodeRad: number;
  readonly argumentOfPerihelionRad: number;
  readonly perihelionTtJd: number;
  /** When the elements osculate; null where the set does not say. */
  readonly epochTtJd: number | null;
}

export interface State {
  readonly position: Vector;
  readonly velocity: Vector;
}

/** Place in the plane of the orbit: along the perihelion direction and 90 degrees on, au and au/day. */
export interface PlaneState {
  readonly x: number;
  readonly y: number;
  readonly vx: number;
  readonly vy: number;
  readonly radius: number;
}

/** cos and sin of the mean obliquity of J2000 (IAU 1976, 84381.448 arcsec), which small-body elements use. */
const OBLIQUITY = 84_381.448 * ARCSEC;
const COS_OBLIQUITY = Math.cos(OBLIQUITY);
const SIN_OBLIQUITY = Math.sin(OBLIQUITY);

export function eclipticToEquatorial(v: Vector): Vector {
  return [v[0], v[1] * COS_OBLIQUITY - v[2] * SIN_OBLIQUITY, v[1] * SIN_OBLIQUITY + v[2] * COS_OBLIQUITY];
}

export function equatorialToEcliptic(v: Vector): Vector {
  return [v[0], v[1] * COS_OBLIQUITY + v[2] * SIN_OBLIQUITY, -v[1] * SIN_OBLIQUITY + v[2] * COS_OBLIQUITY];
}

/** Stumpff functions c1, c2, c3 of z (Danby 1988, chapter 6); the series near zero keeps every digit. */
function stumpff(z: number): readonly [c1: number, c2: number, c3: number] {
  let c2: number;
  let c3: number;
  if (Math.abs(z) < 0.1) {
    c2 = 0;
    c3 = 0;
    for (let j = 8, term2 = 1 / 6.402373705728e15, term3 = 1 / 1.21645100408832e17; j >= 0; j--) {
      c2 = c2 * -z + term2;
      c3 = c3 * -z + term3;
      term2 *= (2 * j + 2) * (2 * j + 1);
      term3 *= (2 * j + 3) * (2 * j + 2);
    }
  } else if (z > 0) {
    const root = Math.sqrt(z);
    c2 = (1 - Math.cos(root)) / z;
    c3 = (root - Math.sin(root)) / (z * root);
  } else {
    const root = Math.sqrt(-z);
    c2 = (1 - Math.cosh(root)) / z;
    c3 = (Math.sinh(root) - root) / (-z * root);
  }
  return [1 - z * c3, c2, c3];
}

/**
 * Place in the orbit's plane at a number of days after perihelion, for every eccentricity by one method:
 * universal variables from perihelion (Danby 1988, Fundamentals of Celestial Mechanics, chapter 6), the
 * root by Laguerre's method (Conway 1986, Celestial Mechanics 39, 199) inside a bracket that a bisection
 * keeps whenever a step would leave it.
 *
 * @param q perihelion distance in au, above 0
 * @param e eccentricity, 0 or more
 */
export function planeState(q: number, e: number, daysFromPerihelion: number): PlaneState {
  const beta = (SUN_MU * (1 - e)) / q;
  let days = daysFromPerihelion;
  if (e < 1) {
    const period = (2 * Math.PI * (q / (1 - e)) ** 1.5) / GAUSS_K;
    days -= period * Math.round(days / period);
  }
  const s = Math.sign(days) * solveTime(q, e, beta, Math.abs(days));
  const z = beta * s * s;
  const [c1, c2] = stumpff(z);
  const radius = q + SUN_MU * e * s * s * c2;
  const along = Math.sqrt(SUN_MU * q * (1 + e));
  return {
    x: q - SUN_MU * s * s * c2,
    y: along * s * c1,
    vx: (-SUN_MU * s * c1) / radius,
    vy: (along * (1 - z * c2)) / radius,
    radius,
  };
}

/** The universal variable s >= 0 at which `days` >= 0 have passed since perihelion. */
function solveTime(q: number, e: number, beta: number, days: number): number {
  if (days === 0) return 0;
  let low = 0;
  let high = days / q;
  if (e < 1) high = Math.min(high, Math.PI / Math.sqrt(beta));
  // The cubic that is exact for the parabola is a good start for every conic.
  let s = Math.min(e > 0 ? cubicRoot(q, (SUN_MU * e) / 6, days) : high, high);
  for (let i = 0; i < 60; i++) {
    const [c1, c2, c3] = stumpff(beta * s * s);
    const f = q * s + SUN_MU * e * s * s * s * c3 - days;
    if (f > 0) high = s;
    else low = s;
    const slope = q + SUN_MU * e * s * s * c2;
    const curve = SUN_MU * e * s * c1;
    const laguerre = s - (5 * f) / (slope + Math.sqrt(Math.abs(16 * slope * slope - 20 * f * curve)));
    const next = laguerre >= low && laguerre <= high ? laguerre : (low + high) / 2;
    const step = Math.abs(next - s);
    s = next;
    if (step <= 1e-15 * s) break;
  }
  return s;
}

/** The one real root of a s + b s^3 = t, for a, b > 0 and t >= 0. */
function cubicRoot(a: number, b: number, t: number): number {
  const p = a / (3 * b);
  const h = t / (2 * b);
  const u = Math.cbrt(h + Math.sqrt(h * h + p * p * p));
  return u > 0 ? Math.max(0, u - p / u) : 0;
}

/** Unit vectors towards perihelion (P) and 90 degrees on in the direction of motion (Q), ecliptic J2000. */
export function orbitAxes(elements: OrbitalElements): { readonly p: Vector; readonly q: Vector } {
  const cosNode = Math.cos(elements.nodeRad);
  const sinNode = Math.sin(elements.nodeRad);
  const cosPeri = Math.cos(elements.argumentOfPerihelionRad);
  const sinPeri = Math.sin(elements.argumentOfPerihelionRad);
  const cosInc = Math.cos(elements.inclinationRad);
  const sinInc = Math.sin(elements.inclinationRad);
  return {
    p: [
      cosNode * cosPeri - sinNode * sinPeri * cosInc,
      sinNode * cosPeri + cosNode * sinPeri * cosInc,
      sinPeri * sinInc,
    ],
    q: [
      -cosNode * sinPeri - sinNode * cosPeri * cosInc,
      -sinNode * sinPeri + cosNode * cosPeri * cosInc,
      cosPeri * sinInc,
    ],
  };
}

/** Heliocentric place (au) and velocity (au/day) of a two-body orbit at a TT Julian date, ecliptic J2000. */
export function heliocentricState(elements: OrbitalElements, ttJd: number): State {
  const { perihelionDistanceAu, eccentricity, perihelionTtJd } = elements;
  const plane = planeState(perihelionDistanceAu, eccentricity, ttJd - perihelionTtJd);
  const { p, q } = orbitAxes(elements);
  return {
    position: [
      plane.x * p[0] + plane.y * q[0],
      plane.x * p[1] + plane.y * q[1],
      plane.x * p[2] + plane.y * q[2],
    ],
    velocity: [
      plane.vx * p[0] + plane.vy * q[0],
      plane.vx * p[1] + plane.vy * q[1],
      plane.vx * p[2] + plane.vy * q[2],
    ],
  };
}
