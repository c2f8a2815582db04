/** Something wrong, or worth a second look, in what was read: where it stands and what would be right. */
export interface ElementProblem {
  /** Line of the text, from 1; for elements given by hand 1. */
  readonly line: number;
  /** Column in that line, from 1. */
  readonly column: number;
  /** An error kept the set from loading; a warning did not. */
  readonly severity: 'error' | 'warning';
  readonly message: string;
}

/** A problem of one field, before anybody knows where in a file that field stands. */
export interface FieldProblem {
  /** The field's name as in the JSON form; null where the set as a whole is meant. */
  readonly field: string | null;
  readonly severity: 'error' | 'warning';
  readonly message: string;
}

/** A stretch of foreign text as a message may quote it: short, printable, in quotation marks. */
export function quoted(text: string): string {
  const clean = Array.from(text.slice(0, 120), (c) => (isControl(c) ? '?' : c)).join('');
  return `"${clean.length > 40 ? `${clean.slice(0, 39)}…` : clean}"`;
}

function isControl(character: string): boolean {
  const code = character.charCodeAt(0);
  return code < 32 || (code >= 127 && code < 160);
}
