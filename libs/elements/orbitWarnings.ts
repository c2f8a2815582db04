import { type Designation } from './designation';
import { figure } from './figures';
import { type OrbitShape } from './orbitShape';
import { type FieldProblem } from './problem';

/** Radius of the Sun, au (IAU 2015 nominal value, 695700 km). */
const SUN_RADIUS_AU = 0.00465047;
/** Period that parts P/ from C/, years (the 1994 resolution of the IAU). */
const PERIODIC_YEARS = 200;

/**
 * What about an orbit deserves a second look though it is possible: a prefix that the orbit does not bear out,
 * and values out of all custom. A numbered comet has been seen at more than one perihelion and is rightly P/
 * whatever its period.
 */
export function orbitWarnings(
  parsed: Designation | null,
  shape: OrbitShape,
  absoluteMagnitude: number | null,
): FieldProblem[] {
  const { perihelionDistanceAu: q, eccentricity: e, periodYears } = shape;
  const problems: FieldProblem[] = [];
  const warn = (field: string, message: string): void => {
    problems.push({ field, severity: 'warning', message });
  };
  const prefix = parsed?.prefix ?? null;
  const years = periodYears === null ? '' : `${figure(periodYears, 4)} years`;
  if (prefix === 'P' && parsed?.number === null) {
    if (periodYears === null) {
      warn('designation', `P/ means a periodic comet, but e = ${figure(e)} never returns.`);
    } else if (periodYears > PERIODIC_YEARS) {
      warn('designation', `P/ means a period under ${PERIODIC_YEARS} years, but this orbit takes ${years}.`);
    }
  }
  if (prefix === 'C' && periodYears !== null && periodYears < PERIODIC_YEARS) {
    warn('designation', `C/ means a period over ${PERIODIC_YEARS} years, but this orbit takes ${years}.`);
  }
  if (prefix === 'I' && e <= 1) {
    warn('designation', `I/ means an interstellar object, but e = ${figure(e)} is bound to the Sun.`);
  }
  if (prefix === 'X') warn('designation', 'X/ means a comet without a known orbit, but here is one.');
  if (parsed?.kind === 'asteroid' && e >= 1) {
    warn(
      'eccentricity',
      `An asteroid's designation with an open orbit (e = ${figure(e)}) is out of the ordinary.`,
    );
  }
  if (q < SUN_RADIUS_AU) {
    warn('perihelionDistanceAu', `q = ${figure(q)} au lies inside the Sun (radius ${SUN_RADIUS_AU} au).`);
  }
  if (q > 100) warn('perihelionDistanceAu', `q = ${figure(q)} au is farther out than any known body's.`);
  if (e > 10) warn('eccentricity', `e = ${figure(e)} is far above any known orbit's (6.1, from memory).`);
  if (absoluteMagnitude !== null && (absoluteMagnitude < -5 || absoluteMagnitude > 36)) {
    warn('absoluteMagnitude', `An absolute magnitude of ${figure(absoluteMagnitude)} is out of all custom.`);
  }
  return problems;
}
