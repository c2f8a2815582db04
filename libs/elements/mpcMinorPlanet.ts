import { toRad } from '#sky';
import { DEFAULT_SLOPE } from './brightness';
import { BLANK, decimalAt, textAt } from './columns';
import { axisFromMotion, meanMotion, periodFromMotion, wrap180 } from './conic';
import { type ElementField, type ElementSet } from './elementSet';
import { figure } from './figures';
import { identify } from './identity';
import { type ReadLine } from './mpcComet';
import { fault, type Field, unreadNumbers } from './mpcFields';
import { minorPlanetFaults } from './mpcMinorPlanetFaults';
import { observationRecord, recordFaults, recordIsFaulty } from './mpcObservations';
import { orbitClass } from './orbitClass';
import { packedDateAt } from './packedDate';
import { parseDesignation } from './parseDesignation';
import { type ElementProblem } from './problem';
import { asteroidDesignationAt } from './unpackDesignation';

/** Columns, counted from 0, in which this format has its decimal points. */
export const MINOR_PLANET_POINTS: readonly number[] = [29, 40, 51, 62, 71, 82, 95];

const GIVEN: readonly ElementField[] = [
  'epoch',
  'eccentricity',
  'inclinationDeg',
  'nodeDeg',
  'argumentOfPerihelionDeg',
  'semiMajorAxisAu',
  'meanAnomalyDeg',
  'meanMotionDegPerDay',
  'absoluteMagnitude',
  'slope',
];
const DERIVED: readonly ElementField[] = ['perihelionTime', 'perihelionDistanceAu', 'periodYears'];
const SLOPE_ASSUMED: readonly ElementField[] = ['slope'];
const NOTHING_ASSUMED: readonly ElementField[] = [];
const MAGNITUDES: readonly Field[] = [
  [8, 13, 'absolute magnitude H', '15.42'],
  [14, 19, 'slope G', '0.15'],
];
const NO_PROBLEMS: readonly ElementProblem[] = [];

/** Lists of fields for every mix of absent values, made once, for lines come by the million. */
const LISTS = Array.from({ length: 16 }, (_, absent) => {
  const gone = new Set<ElementField>();
  if (absent & 1) gone.add('absoluteMagnitude');
  if (absent & 2) gone.add('slope');
  if (absent & 4) gone.add('semiMajorAxisAu');
  if (absent & 8) gone.add('meanMotionDegPerDay');
  const motions = [...gone].filter((field) => field === 'semiMajorAxisAu' || field === 'meanMotionDegPerDay');
  return { given: GIVEN.filter((field) => !gone.has(field)), derived: [...DERIVED, ...motions] };
});

/** Half a unit of the last digits that the format carries. */
const HALF_AXIS = 0.5e-7;
const HALF_MOTION = 0.5e-8;

/**
 * One line of the Minor Planet Center's minor-planet format ("Export Format for Minor-Planet Orbits"). The
 * common, faultless line takes a straight way without any allocation but the set itself; a line with a fault is
 * gone through again to say where and what.
 */
export function readMinorPlanetLine(line: string, lineNumber: number): ReadLine {
  const epoch = packedDateAt(line, 20);
  const anomaly = decimalAt(line, 26, 35);
  const peri = decimalAt(line, 37, 46);
  const node = decimalAt(line, 48, 57);
  const inclination = decimalAt(line, 59, 68);
  const e = decimalAt(line, 70, 79);
  const motionGiven = decimalAt(line, 80, 91);
  const axisGiven = decimalAt(line, 92, 103);
  const magnitude = decimalAt(line, 8, 13);
  const slopeGiven = decimalAt(line, 14, 19);
  const sound =
    epoch === epoch &&
    anomaly >= 0 &&
    anomaly <= 360 &&
    peri >= 0 &&
    peri <= 360 &&
    node >= 0 &&
    node <= 360 &&
    inclination >= 0 &&
    inclination <= 180 &&
    e >= 0 &&
    e < 1 &&
    motionGiven > 0 &&
    axisGiven > 0 &&
    (axisGiven !== BLANK || motionGiven !== BLANK);
  if (!sound) return { set: null, problems: minorPlanetFaults(line, lineNumber) };

  const a = axisGiven === BLANK ? axisFromMotion(motionGiven) : axisGiven;
  const fromAxis = meanMotion(a);
  let n = motionGiven === BLANK ? fromAxis : motionGiven;
  let problems = NO_PROBLEMS;
  if (Math.abs(n - fromAxis) > 2 * (HALF_MOTION + (1.5 * HALF_AXIS * fromAxis) / a)) {
    problems = [contradiction(lineNumber, a, n, fromAxis)];
    n = fromAxis;
  }
  const perihelionDistanceAu = a * (1 - e);
  // By the motion that the axis implies, so that the mean anomaly at the epoch is kept to the last digit.
  const perihelionTtJd = epoch - wrap180(anomaly) / fromAxis;
  if (Math.abs(perihelionTtJd) > 9e7) {
    const far = `n = ${figure(n)} deg/day puts perihelion out of all reach.`;
    return { set: null, problems: [fault(lineNumber, 80, 'error', far)] };
  }
  const absoluteMagnitude = Number.isFinite(magnitude) ? magnitude : null;
  const slope = Number.isFinite(slopeGiven) ? slopeGiven : absoluteMagnitude === null ? null : DEFAULT_SLOPE;
  const lists =
    LISTS[
      (absoluteMagnitude === null ? 1 : 0) |
        (Number.isFinite(slopeGiven) ? 0 : 2) |
        (axisGiven === BLANK ? 4 : 0) |
        (motionGiven === BLANK || problems.length > 0 ? 8 : 0)
    ]!;

  const packed = textAt(line, 0, 7);
  const label = textAt(line, 166, 194);
  let designation = asteroidDesignationAt(line);
  if (designation === null) {
    const identity = identify(packed === '' ? label : packed, '');
    designation = identity.designation;
    if (identity.problems.length > 0) {
      problems = [...problems, ...identity.problems.map((p) => fault(lineNumber, 0, p.severity, p.message))];
    }
  }
  if (magnitude !== magnitude || slopeGiven !== slopeGiven) {
    problems = [...problems, ...unreadNumbers(line, lineNumber, MAGNITUDES)];
  }
  const observed = line.length > 103 ? observationRecord(line) : null;
  if (observed !== null && recordIsFaulty(line, observed)) {
    problems = [...problems, ...recordFaults(line, lineNumber)];
  }
  const periodYears = periodFromMotion(n);
  const set: ElementSet = {
    line: lineNumber,
    format: 'mpcMinorPlanet',
    designation,
    packed: packed === '' ? null : packed,
    name: label === '' || label === designation ? '' : properName(label, designation),
    label: label === '' ? designation : detached(label),
    kind: 'asteroid',
    orbitClass: orbitClass('asteroid', perihelionDistanceAu, e, a, periodYears),
    elements: {
      perihelionDistanceAu,
      eccentricity: e,
      inclinationRad: toRad(inclination),
      nodeRad: toRad(node),
      argumentOfPerihelionRad: toRad(peri),
      perihelionTtJd,
      epochTtJd: epoch,
    },
    brightness: absoluteMagnitude === null ? null : { kind: 'asteroid', absoluteMagnitude, slope: slope! },
    epochTtJd: epoch,
    perihelionTtJd,
    perihelionDistanceAu,
    eccentricity: e,
    inclinationDeg: inclination,
    nodeDeg: node,
    argumentOfPerihelionDeg: peri,
    semiMajorAxisAu: a,
    meanAnomalyDeg: anomaly,
    meanMotionDegPerDay: n,
    periodYears,
    absoluteMagnitude,
    slope,
    given: lists.given,
    derived: lists.derived,
    assumed:
      absoluteMagnitude !== null && lists !== LISTS[0] && !Number.isFinite(slopeGiven)
        ? SLOPE_ASSUMED
        : NOTHING_ASSUMED,
    converted: null,
    source: line.length > 107 ? textAt(line, 107, 116) : '',
    observed,
  };
  return { set, problems };
}

/** The name after the number in the readable column, where there is one. */
function properName(label: string, designation: string): string {
  if (label.startsWith(designation)) {
    const rest = label.slice(designation.length).trim();
    return /^\d/.test(rest) ? '' : detached(rest);
  }
  return parseDesignation(label).name ?? '';
}

/** A copy that does not keep the whole text alive which the line was cut from. */
function detached(text: string): string {
  return text.length < 13 ? text : Buffer.from(text, 'utf16le').toString('utf16le');
}

function contradiction(lineNumber: number, a: number, n: number, fromAxis: number): ElementProblem {
  const message =
    `The mean motion n is given as ${figure(n)} deg/day, but the semi-major axis ${figure(a)} au makes it ` +
    `${figure(fromAxis)}: a difference of ${figure(Math.abs(n - fromAxis), 3)} deg/day ` +
    `(${figure((100 * Math.abs(n - fromAxis)) / fromAxis, 2)} %). The axis is used.`;
  return fault(lineNumber, 80, 'warning', message);
}
