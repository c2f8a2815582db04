import { isoTt } from './calendar';
import { type ElementField, type ElementSet } from './elementSet';
import { type ElementProblem } from './problem';
import { type ElementReading } from './readElements';

/** A set as `elements check` prints it: degrees, au, Julian years, times ISO TT, null where undefined. */
export interface CheckedSet {
  readonly line: number | null;
  readonly designation: string;
  readonly name: string | null;
  readonly label: string;
  readonly kind: 'comet' | 'asteroid';
  readonly class: string;
  readonly epoch: string | null;
  readonly epochTtJd: number | null;
  readonly perihelionTime: string;
  readonly perihelionTtJd: number;
  readonly perihelionDistanceAu: number;
  readonly eccentricity: number;
  readonly inclinationDeg: number;
  readonly nodeDeg: number;
  readonly argumentOfPerihelionDeg: number;
  readonly semiMajorAxisAu: number | null;
  readonly meanAnomalyDeg: number | null;
  readonly meanMotionDegPerDay: number | null;
  readonly periodYears: number | null;
  readonly absoluteMagnitude: number | null;
  readonly slope: number | null;
  readonly packed: string | null;
  readonly source: string | null;
  readonly given: readonly ElementField[];
  readonly derived: readonly ElementField[];
  readonly assumed: readonly ElementField[];
  readonly converted: ElementSet['converted'];
}

/** What `elements check --json` prints. */
export function toCheckJson(reading: ElementReading): {
  readonly sets: readonly CheckedSet[];
  readonly problems: readonly ElementProblem[];
} {
  return {
    sets: reading.sets.map(toCheckedSet),
    problems: reading.problems.map(({ line, column, severity, message }) => ({
      line,
      column,
      severity,
      message,
    })),
  };
}

/** One set of `toCheckJson`; read back by `readElements`, it gives the same set. */
export function toCheckedSet(set: ElementSet): CheckedSet {
  return {
    line: set.line,
    designation: set.designation,
    name: set.name === '' ? null : set.name,
    label: set.label,
    kind: set.kind,
    class: set.orbitClass,
    epoch: set.epochTtJd === null ? null : isoTt(set.epochTtJd),
    epochTtJd: set.epochTtJd,
    perihelionTime: isoTt(set.perihelionTtJd),
    perihelionTtJd: set.perihelionTtJd,
    perihelionDistanceAu: set.perihelionDistanceAu,
    eccentricity: set.eccentricity,
    inclinationDeg: set.inclinationDeg,
    nodeDeg: set.nodeDeg,
    argumentOfPerihelionDeg: set.argumentOfPerihelionDeg,
    semiMajorAxisAu: set.semiMajorAxisAu,
    meanAnomalyDeg: set.meanAnomalyDeg,
    meanMotionDegPerDay: set.meanMotionDegPerDay,
    periodYears: set.periodYears,
    absoluteMagnitude: set.absoluteMagnitude,
    slope: set.slope,
    packed: set.packed,
    source: set.source === '' ? null : set.source,
    given: set.given,
    derived: set.derived,
    assumed: set.assumed,
    converted: set.converted,
  };
}
