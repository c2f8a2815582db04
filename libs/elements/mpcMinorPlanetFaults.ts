import { BLANK, columnsOf, decimalAt, isBlankAt, textAt } from './columns';
import { figure } from './figures';
import { fault, type Field } from './mpcFields';
import { packedDateAt } from './packedDate';
import { type ElementProblem, quoted } from './problem';

const ANGLES: readonly Field[] = [
  [26, 35, 'mean anomaly', '211.30457'],
  [37, 46, 'argument of perihelion', '96.41208'],
  [48, 57, 'longitude of the ascending node', '318.77530'],
];
const INCLINATION: Field = [59, 68, 'inclination', '7.26419'];
const ECCENTRICITY: Field = [70, 79, 'eccentricity', '0.1438207'];

/** Every reason why a minor-planet line is no orbit, each at its column. */
export function minorPlanetFaults(line: string, lineNumber: number): ElementProblem[] {
  const problems: ElementProblem[] = [];
  const refuse = (from: number, message: string): void => {
    problems.push(fault(lineNumber, from, 'error', message));
  };
  if (Number.isNaN(packedDateAt(line, 20))) {
    const found = isBlankAt(line, 20, 25) ? 'nothing' : quoted(textAt(line, 20, 25));
    refuse(20, `Expected the epoch as a packed date, like K31AB, in columns 21-25; found ${found}.`);
  }
  const unread = (field: Field): boolean => {
    const [from, to, what, example] = field;
    const value = decimalAt(line, from, to);
    if (Number.isFinite(value)) return false;
    const found = value === BLANK ? 'nothing' : quoted(textAt(line, from, to));
    refuse(from, `Expected the ${what}, like ${example}, in ${columnsOf(from, to)}; found ${found}.`);
    return true;
  };
  for (const field of ANGLES) {
    const [from, to, what] = field;
    const angle = decimalAt(line, from, to);
    if (!unread(field) && (angle < 0 || angle > 360)) {
      refuse(from, `The ${what} is ${figure(angle)} deg; here it must lie between 0 and 360.`);
    }
  }
  for (const field of [INCLINATION, ECCENTRICITY]) unread(field);
  const inclination = decimalAt(line, 59, 68);
  if (Number.isFinite(inclination) && (inclination < 0 || inclination > 180)) {
    refuse(59, `The inclination i is ${figure(inclination)} deg; it must lie between 0 and 180.`);
  }
  const e = decimalAt(line, 70, 79);
  if (e < 0) refuse(70, `The eccentricity e is ${figure(e)}; it must be 0 (a circle) or more.`);
  if (Number.isFinite(e) && e >= 1) {
    refuse(70, `The eccentricity e is ${figure(e)}; this format holds ellipses only, e below 1.`);
  }
  const n = decimalAt(line, 80, 91);
  const a = decimalAt(line, 92, 103);
  if (a === BLANK && n === BLANK) {
    refuse(
      92,
      'Expected the semi-major axis, like 2.6214873, in columns 93-103; found nothing, and no mean motion either.',
    );
  }
  if (Number.isNaN(n)) unread([80, 91, 'mean motion', '0.23221081']);
  if (Number.isNaN(a)) unread([92, 103, 'semi-major axis', '2.6214873']);
  if (n <= 0) refuse(80, `The mean motion n is ${figure(n)}; it must be above 0.`);
  if (a <= 0) refuse(92, `The semi-major axis a is ${figure(a)} au; it must be above 0.`);
  return problems;
}
