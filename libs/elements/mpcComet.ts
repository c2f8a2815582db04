import { calendarToJd, isCalendarDay } from './calendar';
import { BLANK, columnsOf, decimalAt, isBlankAt, textAt } from './columns';
import { complete } from './complete';
import { type ElementSet } from './elementSet';
import { identify, type Identity, labelOf } from './identity';
import { parseDesignation } from './parseDesignation';
import { type ElementProblem, type FieldProblem, quoted } from './problem';

/** A line as read: its set, or null where it has none, and what is to be said about it. */
export interface ReadLine {
  readonly set: ElementSet | null;
  readonly problems: readonly ElementProblem[];
}

interface Column {
  readonly field: string;
  readonly from: number;
  readonly to: number;
  readonly what: string;
  readonly example: string;
}

const column = (field: string, from: number, to: number, what: string, example: string): Column => ({
  field,
  from: from - 1,
  to,
  what,
  example,
});

/**
 * Columns of the Minor Planet Center's one-line comet format, from its "Ephemerides and Orbital Elements Format:
 * Comets"; counted from 1 as published.
 */
const COLUMNS = {
  number: column('designation', 1, 4, 'number', '0999'),
  type: column('designation', 5, 5, 'orbit type', 'C'),
  provisional: column('designation', 6, 12, 'packed designation', 'K31K070'),
  year: column('perihelionTime', 15, 18, 'year of perihelion', '2032'),
  month: column('perihelionTime', 20, 21, 'month of perihelion', '02'),
  day: column('perihelionTime', 23, 29, 'day of perihelion', '11.4837'),
  q: column('perihelionDistanceAu', 31, 39, 'perihelion distance', '0.764213'),
  e: column('eccentricity', 42, 49, 'eccentricity', '1.000248'),
  peri: column('argumentOfPerihelionDeg', 52, 59, 'argument of perihelion', '143.2097'),
  node: column('nodeDeg', 62, 69, 'longitude of the ascending node', '61.8840'),
  i: column('inclinationDeg', 72, 79, 'inclination', '96.3152'),
  epochYear: column('epoch', 82, 85, 'year of the epoch', '2032'),
  epochMonth: column('epoch', 86, 87, 'month of the epoch', '02'),
  epochDay: column('epoch', 88, 89, 'day of the epoch', '17'),
  magnitude: column('absoluteMagnitude', 92, 95, 'absolute magnitude', '7.5'),
  slope: column('slope', 97, 100, 'slope n', '4.0'),
  name: column('name', 103, 158, 'name', 'C/2031 K7 (Ashgrove)'),
  source: column('source', 160, 168, 'reference', 'MPC 99991'),
} as const;

const FIELD_COLUMN = new Map<string, number>();
for (const { field, from } of Object.values(COLUMNS)) {
  if (!FIELD_COLUMN.has(field)) FIELD_COLUMN.set(field, from + 1);
}

/** Columns, counted from 0, in which this format has its decimal points. */
export const COMET_POINTS: readonly number[] = [24, 32, 42, 54, 64, 74];

/** One line of the Minor Planet Center's comet format. */
export function readCometLine(line: string, lineNumber: number): ReadLine {
  const problems: ElementProblem[] = [];
  const report = (severity: 'error' | 'warning', at: number, message: string): void => {
    problems.push({ line: lineNumber, column: at, severity, message });
  };
  const need = (c: Column): number => {
    const value = decimalAt(line, c.from, c.to);
    if (value !== BLANK && !Number.isNaN(value)) return value;
    const found = value === BLANK ? 'nothing' : quoted(textAt(line, c.from, c.to));
    const parabola = c === COLUMNS.e ? ' (1.000000 for a parabola)' : '';
    report(
      'error',
      c.from + 1,
      `Expected the ${c.what}, like ${c.example}, in ${columnsOf(c.from, c.to)}${parabola}; found ${found}.`,
    );
    return NaN;
  };
  const optional = (c: Column): number | null => {
    const value = decimalAt(line, c.from, c.to);
    if (value === BLANK) return null;
    if (!Number.isNaN(value)) return value;
    const found = quoted(textAt(line, c.from, c.to));
    report(
      'warning',
      c.from + 1,
      `Expected the ${c.what}, like ${c.example}, or blanks in ${columnsOf(c.from, c.to)}; ${found} was left out.`,
    );
    return null;
  };

  const identity = cometIdentity(line);
  const perihelionTtJd = dateOf(need(COLUMNS.year), need(COLUMNS.month), need(COLUMNS.day));
  if (Number.isNaN(perihelionTtJd) && problems.length === 0) {
    const found = quoted(textAt(line, COLUMNS.year.from, COLUMNS.day.to));
    report('error', 15, `Expected the date of perihelion, like 2032 02 11.4837; ${found} is none.`);
  }
  const q = need(COLUMNS.q);
  const e = need(COLUMNS.e);
  const angle = (c: Column): number => {
    const value = need(c);
    if (value < 0 || value > 360) {
      report('error', c.from + 1, `The ${c.what} is ${value} deg; here it must lie between 0 and 360.`);
    }
    return value;
  };
  const peri = angle(COLUMNS.peri);
  const node = angle(COLUMNS.node);
  const inclination = need(COLUMNS.i);
  let epochTtJd: number | null = null;
  if (!isBlankAt(line, COLUMNS.epochYear.from, COLUMNS.epochDay.to)) {
    epochTtJd = dateOf(...([COLUMNS.epochYear, COLUMNS.epochMonth, COLUMNS.epochDay].map(need) as Triple));
    if (Number.isNaN(epochTtJd)) {
      const found = quoted(textAt(line, COLUMNS.epochYear.from, COLUMNS.epochDay.to));
      const unread = problems.some((problem) => problem.column >= 82 && problem.severity === 'error');
      if (!unread) report('error', 82, `Expected the epoch as a date, like 20320217; ${found} is none.`);
    }
  }
  const absoluteMagnitude = optional(COLUMNS.magnitude);
  const slope = optional(COLUMNS.slope);
  if (problems.some((problem) => problem.severity === 'error')) return { set: null, problems };

  const { set, problems: found } = complete(
    {
      kind: 'comet',
      perihelionTtJd,
      perihelionDistanceAu: q,
      eccentricity: e,
      argumentOfPerihelionDeg: peri,
      nodeDeg: node,
      inclinationDeg: inclination,
      epochTtJd,
      absoluteMagnitude,
      slope,
      source: textAt(line, COLUMNS.source.from - 1, line.length),
    },
    { line: lineNumber, format: 'mpcComet', observed: null, identity },
  );
  for (const problem of found) {
    report(problem.severity, FIELD_COLUMN.get(problem.field ?? '') ?? 1, problem.message);
  }
  return { set, problems };
}

type Triple = [number, number, number];

function dateOf(year: number, month: number, day: number): number {
  const exists = Number.isInteger(year) && year >= -4712 && isCalendarDay(year, month, day);
  return exists ? calendarToJd(year, month, day) : NaN;
}

/** Who the line is about: columns 1-12, and the readable name, which must agree with them. */
function cometIdentity(line: string): Identity {
  const packed = textAt(line, 0, 12);
  const label = textAt(line, COLUMNS.name.from, COLUMNS.name.to);
  if (packed === '') return identify(label, '');
  const written = parseDesignation(packed);
  if (!written.valid || written.canonical === null) {
    const identity = identify(label, '');
    if (identity.parsed === null) {
      const kept = identify(packed, label);
      return { ...kept, packed, label: label || kept.label };
    }
    const message = `${written.problem ?? ''} The readable name ${quoted(label)} is used in its place.`;
    return { ...identity, problems: [{ field: 'designation', severity: 'warning', message }] };
  }
  const readable = label === '' ? null : parseDesignation(label);
  const problems: FieldProblem[] = [];
  if (readable?.valid === true && readable.canonical !== written.canonical) {
    const message = `Columns 1-12 say ${written.canonical}, the name says ${quoted(label)}; columns 1-12 are used.`;
    problems.push({ field: 'name', severity: 'warning', message });
  }
  const name = (readable?.valid === true ? readable.name : label) ?? '';
  return {
    designation: written.canonical,
    packed,
    name,
    label: label === '' ? labelOf(written, written.canonical, name) : label,
    parsed: written,
    problems,
  };
}
