import { wrap180, wrap360 } from './conic';
import { figure, rounding } from './figures';
import { type OrbitAngles } from './frame';
import { type GivenElements } from './given';
import { type FieldProblem } from './problem';

/** The three angles of an orbit as given, checked. */
export function orbitOrientation(given: GivenElements): {
  readonly angles: OrbitAngles | null;
  readonly problems: readonly FieldProblem[];
} {
  const problems: FieldProblem[] = [];
  const inclination = given.inclinationDeg ?? null;
  const node = given.nodeDeg ?? null;
  const longitude = given.longitudeOfPerihelionDeg ?? null;
  const argument =
    given.argumentOfPerihelionDeg ?? (longitude === null || node === null ? null : longitude - node);
  if (inclination === null) problems.push(refusal('inclinationDeg', 'The inclination i is missing.'));
  else if (inclination < 0 || inclination > 180) {
    const message = `The inclination i is ${figure(inclination)} deg; it must lie between 0 and 180.`;
    problems.push(refusal('inclinationDeg', message));
  }
  if (node === null) problems.push(refusal('nodeDeg', 'The longitude of the ascending node is missing.'));
  if (argument === null) {
    problems.push(refusal('argumentOfPerihelionDeg', 'The argument of perihelion is missing.'));
  }
  if (inclination === null || node === null || argument === null || problems.length > 0) {
    return { angles: null, problems };
  }
  if (
    given.argumentOfPerihelionDeg !== null &&
    given.argumentOfPerihelionDeg !== undefined &&
    longitude !== null
  ) {
    const off = Math.abs(wrap180(longitude - node - argument));
    if (off > 2 * rounding(longitude) + rounding(node) + rounding(argument)) {
      const message =
        `The longitude of perihelion is given as ${figure(longitude)} deg, but node and argument add up to ` +
        `${figure(wrap360(node + argument))}: a difference of ${figure(off, 3)} deg. The argument is used.`;
      problems.push({ field: 'longitudeOfPerihelionDeg', severity: 'warning', message });
    }
  }
  return {
    angles: { inclinationDeg: inclination, nodeDeg: turn(node), argumentOfPerihelionDeg: turn(argument) },
    problems,
  };
}

/** An angle as given where it lies in [0, 360], for lists do write 360; else brought there. */
function turn(deg: number): number {
  return deg >= 0 && deg <= 360 ? deg : wrap360(deg);
}

function refusal(field: string, message: string): FieldProblem {
  return { field, severity: 'error', message };
}
