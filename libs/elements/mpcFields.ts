import { columnsOf, decimalAt, textAt } from './columns';
import { type ElementProblem, quoted } from './problem';

/** A field of a fixed-column line: its columns [from, to) counted from 0, what it is, and an example. */
export type Field = readonly [from: number, to: number, what: string, example: string];

/** A problem at a column counted from 0. */
export function fault(
  line: number,
  from: number,
  severity: ElementProblem['severity'],
  message: string,
): ElementProblem {
  return { line, column: from + 1, severity, message };
}

/** What to say of an optional field that could not be read. */
export function leftOut(line: string, lineNumber: number, [from, to, what, example]: Field): ElementProblem {
  const found = quoted(textAt(line, from, to));
  const message = `Expected the ${what}, like ${example}, or blanks in ${columnsOf(from, to)}; ${found} was left out.`;
  return fault(lineNumber, from, 'warning', message);
}

/** `leftOut` for those of the fields that hold something other than a number or blanks. */
export function unreadNumbers(line: string, lineNumber: number, fields: readonly Field[]): ElementProblem[] {
  return fields
    .filter(([from, to]) => Number.isNaN(decimalAt(line, from, to)))
    .map((field) => leftOut(line, lineNumber, field));
}
