import { isCalendarDay } from './calendar';
import { decimalAt, isBlankAt, textAt } from './columns';
import { type ObservationRecord } from './elementSet';
import { type Field, leftOut, unreadNumbers } from './mpcFields';
import { type ElementProblem } from './problem';

/** Columns 106-202 of a minor-planet line, without the name. */
export function observationRecord(line: string): ObservationRecord {
  const observations = decimalAt(line, 117, 122);
  const oppositions = decimalAt(line, 123, 126);
  const rms = decimalAt(line, 137, 141);
  return {
    uncertainty: textAt(line, 105, 106),
    observations: Number.isFinite(observations) ? observations : null,
    oppositions: Number.isFinite(oppositions) ? oppositions : null,
    arc: textAt(line, 127, 136),
    rmsArcsec: Number.isFinite(rms) ? rms : null,
    coarsePerturbers: textAt(line, 142, 145),
    precisePerturbers: textAt(line, 146, 149),
    computer: textAt(line, 150, 160),
    flags: textAt(line, 161, 165),
    lastObserved: lastObservation(line),
  };
}

/** The eight digits of the last observation's day, or null where the columns hold no date. */
function lastObservation(line: string): string | null {
  if (line.length < 202) return null;
  for (let i = 194; i < 202; i++) {
    const digit = line.charCodeAt(i) - 48;
    if (digit < 0 || digit > 9) return null;
  }
  const day = line.slice(194, 202);
  return isCalendarDay(Number(day.slice(0, 4)), Number(day.slice(4, 6)), Number(day.slice(6))) ? day : null;
}

/** Whether any of those columns held something unreadable. */
export function recordIsFaulty(line: string, observed: ObservationRecord): boolean {
  return (
    (observed.observations === null && !isBlankAt(line, 117, 122)) ||
    (observed.oppositions === null && !isBlankAt(line, 123, 126)) ||
    (observed.rmsArcsec === null && !isBlankAt(line, 137, 141)) ||
    (observed.lastObserved === null && !isBlankAt(line, 194, 202))
  );
}

const RECORD: readonly Field[] = [
  [117, 122, 'number of observations', '412'],
  [123, 126, 'number of oppositions', '9'],
  [137, 141, 'residual', '0.48'],
];

/** What was unreadable in them. */
export function recordFaults(line: string, lineNumber: number): ElementProblem[] {
  const problems = unreadNumbers(line, lineNumber, RECORD);
  if (lastObservation(line) === null && !isBlankAt(line, 194, 202)) {
    problems.push(leftOut(line, lineNumber, [194, 202, 'day of the last observation', '20301104']));
  }
  return problems;
}
