import { type ClubProblem, problem } from '../clubProblem';
import { valueInWords } from './checked';

interface Named {
  readonly id: string;
  readonly name: string;
}

/** The row of that id or name (case and blanks around it do not matter), or undefined. */
export function findNamed<T extends Named>(rows: readonly T[], idOrName: string): T | undefined {
  const folded = fold(idOrName);
  return (
    rows.find((row) => row.id === idOrName || row.name === idOrName) ??
    rows.find((row) => fold(row.name) === folded)
  );
}

/** Like findNamed, but throws a ClubProblem that lists the names there are. */
export function requireNamed<T extends Named>(
  rows: readonly T[],
  idOrName: string,
  what: string,
  field: string,
): T {
  const found = findNamed(rows, idOrName);
  if (found === undefined) throw unknownName(rows, idOrName, what, field);
  return found;
}

/** Says that there is no such thing, and which there are. */
export function unknownName(
  rows: readonly Named[],
  value: unknown,
  what: string,
  field: string,
): ClubProblem {
  const names = rows.map((row) => row.name);
  const known =
    names.length === 0 ? `none has been entered yet` : `there are ${names.slice(0, 30).join(', ')}`;
  return problem(
    'notFound',
    field,
    value,
    `${field} was ${valueInWords(value)}; give the name of a ${what}: ${known}.`,
  );
}

/** Refuses a name that another row of the kind has already. */
export function refuseTakenName(
  rows: readonly Named[],
  name: string,
  what: string,
  ownId: string | null = null,
): void {
  const taken = rows.find((row) => row.id !== ownId && fold(row.name) === fold(name));
  if (taken === undefined) return;
  throw problem(
    'conflict',
    'name',
    name,
    `name was ${valueInWords(name)}; give a name that no other ${what} has.`,
  );
}

function fold(name: string): string {
  return name.trim().toLocaleLowerCase('en');
}
