import { jdToCalendar } from './calendar';
import { type ElementField, type ElementSet } from './elementSet';
import { packDate } from './packedDate';

/** A written line, or why the set does not fit the format. */
export type WrittenLine =
  { readonly line: string; readonly problem: null } | { readonly line: null; readonly problem: string };

/** Thrown inside this file only, where a value has no room in its columns. */
class NoRoom extends Error {}

/**
 * A set as one line of the Minor Planet Center's comet format; the format's own precision (q to 1e-6 au, T to
 * 1e-4 day) bounds what it keeps. Nothing that was only assumed is written.
 */
export function writeCometLine(set: ElementSet): WrittenLine {
  return fitted(() => {
    const time = jdToCalendar(set.perihelionTtJd, 4);
    const row = blankRow(168);
    const packed = set.packed ?? '';
    const numbered = /^\d{4}/.test(packed);
    put(row, numbered ? 1 : 13 - packed.length, 12, packed, 'designation');
    put(row, 15, 18, String(time.year).padStart(4), 'year of perihelion');
    put(row, 20, 21, String(time.month).padStart(2, '0'), 'month of perihelion');
    put(row, 23, 29, time.day.toFixed(4).padStart(7, '0'), 'day of perihelion');
    putNumber(row, 31, 39, set.perihelionDistanceAu, 6, 'perihelion distance');
    putNumber(row, 42, 49, set.eccentricity, 6, 'eccentricity');
    putNumber(row, 52, 59, set.argumentOfPerihelionDeg, 4, 'argument of perihelion');
    putNumber(row, 62, 69, set.nodeDeg, 4, 'node');
    putNumber(row, 72, 79, set.inclinationDeg, 4, 'inclination');
    if (set.epochTtJd !== null) {
      const epoch = jdToCalendar(set.epochTtJd, 5);
      if (!Number.isInteger(epoch.day)) throw new NoRoom('The format has whole days (0h TT) as epochs only.');
      put(row, 82, 85, String(epoch.year).padStart(4), 'epoch');
      put(row, 86, 89, two(epoch.month) + two(epoch.day), 'epoch');
    }
    putNumber(row, 92, 95, known(set, 'absoluteMagnitude', set.absoluteMagnitude), 1, 'absolute magnitude');
    putNumber(row, 97, 100, known(set, 'slope', set.slope), 1, 'slope n');
    put(row, 103, 158, set.label.slice(0, 56), 'name');
    put(row, 160, 168, set.source.slice(0, 9), 'reference');
    return row.join('').trimEnd();
  });
}

/**
 * A set as one line of the Minor Planet Center's minor-planet format. Ellipses with an epoch at 0h TT only, for the
 * format holds mean anomalies.
 */
export function writeMinorPlanetLine(set: ElementSet): WrittenLine {
  return fitted(() => {
    const { semiMajorAxisAu, meanMotionDegPerDay, meanAnomalyDeg } = set;
    if (semiMajorAxisAu === null || meanMotionDegPerDay === null || set.eccentricity >= 1) {
      throw new NoRoom('The minor-planet format holds ellipses only; write this orbit in the comet format.');
    }
    const epoch = set.epochTtJd === null ? null : packDate(set.epochTtJd);
    if (epoch === null || meanAnomalyDeg === null) {
      throw new NoRoom('The minor-planet format needs an epoch at 0h TT in the years 1000 to 3599.');
    }
    const row = blankRow(202);
    put(row, 1, 7, set.packed ?? '', 'designation');
    putNumber(row, 9, 13, known(set, 'absoluteMagnitude', set.absoluteMagnitude), 2, 'absolute magnitude');
    putNumber(row, 15, 19, known(set, 'slope', set.slope), 2, 'slope G');
    put(row, 21, 25, epoch, 'epoch');
    putNumber(row, 27, 35, meanAnomalyDeg, 5, 'mean anomaly');
    putNumber(row, 38, 46, set.argumentOfPerihelionDeg, 5, 'argument of perihelion');
    putNumber(row, 49, 57, set.nodeDeg, 5, 'node');
    putNumber(row, 60, 68, set.inclinationDeg, 5, 'inclination');
    putNumber(row, 71, 79, set.eccentricity, 7, 'eccentricity');
    putNumber(row, 81, 91, meanMotionDegPerDay, 8, 'mean motion');
    putNumber(row, 93, 103, semiMajorAxisAu, 7, 'semi-major axis');
    put(row, 108, 116, set.source.slice(0, 9), 'reference');
    const { observed } = set;
    if (observed !== null) {
      put(row, 106, 106, observed.uncertainty, 'uncertainty');
      putNumber(row, 118, 122, observed.observations, 0, 'number of observations');
      putNumber(row, 124, 126, observed.oppositions, 0, 'number of oppositions');
      const arc = observed.arc.endsWith('days') ? observed.arc.padStart(9) : observed.arc;
      put(row, 128, 136, arc, 'arc');
      putNumber(row, 138, 141, observed.rmsArcsec, 2, 'residual');
      put(row, 143, 145, observed.coarsePerturbers, 'perturbers');
      put(row, 147, 149, observed.precisePerturbers, 'perturbers');
      put(row, 151, 160, observed.computer, 'computer');
      put(row, 162, 165, observed.flags, 'flags');
      put(row, 195, 202, observed.lastObserved ?? '', 'last observation');
    }
    // Numbers stand in brackets at the right of eight columns, names and provisional designations after them.
    const number = /^\(\d+\)/.exec(set.label)?.[0] ?? '';
    const readable = `${number.padStart(8)} ${set.label.slice(number.length).trim()}`;
    put(row, 167, 194, readable.trimEnd().slice(0, 28), 'name');
    return row.join('').trimEnd();
  });
}

function known(set: ElementSet, field: ElementField, value: number | null): number | null {
  return set.assumed.includes(field) ? null : value;
}

function fitted(write: () => string): WrittenLine {
  try {
    return { line: write(), problem: null };
  } catch (error) {
    if (error instanceof NoRoom) return { line: null, problem: error.message };
    throw error;
  }
}

function blankRow(width: number): string[] {
  return new Array<string>(width).fill(' ');
}

/** Puts a text into columns from-to, counted from 1 as published. */
function put(row: string[], from: number, to: number, text: string, what: string): void {
  if (from < 1 || text.length > to - from + 1) {
    throw new NoRoom(`The ${what} "${text}" does not fit columns ${from}-${to}.`);
  }
  for (let i = 0; i < text.length; i++) row[from - 1 + i] = text.charAt(i);
}

function putNumber(
  row: string[],
  from: number,
  to: number,
  value: number | null,
  decimals: number,
  what: string,
): void {
  if (value !== null) put(row, from, to, value.toFixed(decimals).padStart(to - from + 1), what);
}

function two(value: number): string {
  return String(value).padStart(2, '0');
}
