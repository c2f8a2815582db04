import { complete } from './complete';
import { headingMeaning } from './headings';
import { type ReadLine } from './mpcComet';
import { readNamedValues } from './namedValues';
import { type ElementProblem } from './problem';

interface Cell {
  readonly text: string;
  /** Column in the line, from 1. */
  readonly column: number;
}

/** The columns of a CSV file as its heading line names them. */
export interface CsvLayout {
  readonly separator: ',' | ';' | '\t';
  readonly headings: readonly string[];
}

/** Headings that must be understood before a line counts as the heading line of elements. */
const FEWEST_HEADINGS = 4;
const LONGEST_HEADINGS = 10_000;

/** The layout that a heading line declares, or null where the line is none. */
export function csvLayout(line: string): CsvLayout | null {
  if (line.length > LONGEST_HEADINGS) return null;
  for (const separator of ['\t', ';', ','] as const) {
    if (!line.includes(separator)) continue;
    const headings = cells(line, separator).cells.map((cell) => cell.text.trim());
    const understood = headings.filter((heading) => headingMeaning(heading) !== null);
    if (understood.length >= FEWEST_HEADINGS) return { separator, headings };
  }
  return null;
}

/** One line under the headings. With semicolons or tabs between columns a decimal comma is understood. */
export function readCsvLine(line: string, lineNumber: number, layout: CsvLayout): ReadLine {
  const { cells: row, unclosed } = cells(line, layout.separator);
  const problems: ElementProblem[] = [];
  const report = (column: number, severity: ElementProblem['severity'], message: string): void => {
    problems.push({ line: lineNumber, column, severity, message });
  };
  if (unclosed !== null) {
    report(unclosed, 'error', 'The quotation mark opened here is not closed on this line.');
    return { set: null, problems };
  }
  if (row.length > layout.headings.length) {
    const message = `This line has ${row.length} columns, the heading line ${layout.headings.length}; a value that holds "${layout.separator}" must stand in quotation marks.`;
    report(row[layout.headings.length]?.column ?? 1, 'error', message);
    return { set: null, problems };
  }
  const values = row.map((cell, index) => ({
    heading: layout.headings[index] ?? '',
    value: layout.separator === ',' ? cell.text : withDecimalPoint(cell.text),
  }));
  const columnOf = (index: number | null | undefined): number =>
    index === null || index === undefined ? 1 : (row[index]?.column ?? 1);
  const read = readNamedValues(values);
  for (const problem of read.problems) report(columnOf(problem.index), problem.severity, problem.message);
  if (problems.some((problem) => problem.severity === 'error')) return { set: null, problems };
  const { set, problems: found } = complete(read.given, {
    line: lineNumber,
    format: 'csv',
    observed: null,
    identity: null,
  });
  for (const problem of found) {
    report(columnOf(read.where.get(problem.field ?? '')), problem.severity, problem.message);
  }
  return { set, problems };
}

function withDecimalPoint(text: string): string {
  return /^\s*[+-]?\d+,\d+\s*$/.test(text) ? text.replace(',', '.') : text;
}

/** The cells of a line, quotation marks by RFC 4180; `unclosed` is the column of a mark without its partner. */
function cells(
  line: string,
  separator: string,
): { readonly cells: readonly Cell[]; readonly unclosed: number | null } {
  const found: Cell[] = [];
  let at = 0;
  for (;;) {
    const start = at;
    let text = '';
    if (line.charAt(at) === '"') {
      for (at += 1; ; at += 1) {
        const close = line.indexOf('"', at);
        if (close < 0) return { cells: found, unclosed: start + 1 };
        text += line.slice(at, close);
        at = close + 1;
        if (line.charAt(at) !== '"') break;
        text += '"';
      }
    }
    const next = line.indexOf(separator, at);
    const end = next < 0 ? line.length : next;
    found.push({ text: text + line.slice(at, end), column: start + 1 });
    if (next < 0) return { cells: found, unclosed: null };
    at = next + 1;
  }
}
