import { bodyTest, type ElementProblem, type ElementReading, type ElementSet, readElements } from '#elements';
import { z } from 'zod';
import { type ChangeNotice } from '../changes/changeNotice';
import { ClubProblem, problem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { prose } from '../input/fields';
import { elementSetColumns, type ElementSetView } from './elementSets';
import { keepSets } from './keepSets';
import { getTarget } from './targets';
import { orbitRow } from './targetRows';
import { type TargetRow, type TargetView } from './targetView';

const TEXT_RIGHT =
  'element sets as text: lines of the Minor Planet Center’s formats, CSV with a heading line, or JSON';

/** Element sets as text, in any form that the program reads. */
export const ElementText = z.strictObject({
  text: z
    .string({ error: TEXT_RIGHT })
    .min(1, { error: TEXT_RIGHT })
    .max(400_000, { error: 'at most 400000 characters; load longer files from the command line' })
    .meta({ description: TEXT_RIGHT }),
  /** Which body of the text is meant, where its names are not the target's. */
  body: z.string({ error: 'the name of a body in the text' }).trim().min(1).max(120).optional(),
  /** Where the text is from, in words; else what the sets say themselves. */
  source: prose(300).optional(),
});

export type ElementText = z.input<typeof ElementText>;

/** What became of a text or file of element sets. */
export interface LoadedElements {
  readonly target: TargetView;
  /** The sets that were added, in the order of their epochs. */
  readonly sets: readonly ElementSetView[];
  /** Sets of the target that were in use already and so were passed over. */
  readonly held: number;
  /** Other bodies in the text; they were left alone. At most twenty are named. */
  readonly others: readonly string[];
  readonly problems: readonly ElementProblem[];
  readonly change: ChangeNotice | null;
}

/** Which body of a reading is meant, and what to say of its source. */
export interface ElementWishes {
  readonly body?: string | undefined;
  readonly source?: string | undefined;
}

/** Adds the element sets of a text to a target (id or name), as `addElementReading` does. */
export async function addElementText(
  database: Database,
  target: string,
  input: ElementText,
): Promise<LoadedElements> {
  const { text, ...wishes } = checked(ElementText, input);
  return addElementReading(database, target, readElements(text), wishes);
}

/** The names under which a target's body may stand in a file of many, for picking it out. */
export async function elementNames(database: Database, target: string): Promise<readonly string[]> {
  return namesOf(await orbitRow(database, target));
}

/**
 * Adds to a target (id or name) what was read of its body: the sets with its designation or name, oldest epoch
 * first, all in one transaction. Bad lines are handed back with the good ones kept; where nothing can be
 * added because of them, or no set is of this body, a ClubProblem says so and nothing is changed.
 */
export async function addElementReading(
  database: Database,
  target: string,
  reading: ElementReading,
  { body, source }: ElementWishes = {},
): Promise<LoadedElements> {
  const row = await orbitRow(database, target);
  const tests = (body === undefined ? namesOf(row) : [body]).map(bodyTest);
  const own: ElementSet[] = [];
  const strangers = new Set<string>();
  for (const set of reading.sets) {
    if (tests.some((isMeant) => isMeant(set))) own.push(set);
    else strangers.add(set.label);
  }
  const others = [...strangers];
  if (own.length === 0) throw nothingOf(row, reading, others, body);
  const epoch = ({ epochTtJd }: ElementSet): number => epochTtJd ?? -Infinity;
  const columns = [...own]
    .sort((a, b) => epoch(a) - epoch(b))
    .map((set) => elementSetColumns(set, source ?? sourceWords(set)));
  const fresh = columns.filter((set) => !isInUse(set, row.elementSets[0]));
  const { sets, change } = await keepSets(database, row, fresh);
  return {
    target: await getTarget(database, row.id),
    sets,
    held: columns.length - fresh.length,
    others: others.slice(0, 20),
    problems: reading.problems,
    change,
  };
}

function namesOf({ name, elementSets }: TargetRow): readonly string[] {
  const designation = elementSets[0]?.designation ?? '';
  // People put the word in front of a comet's name; element files do not.
  return [...new Set([designation, name, name.replace(/^comet\s+/i, '')])].filter((text) => text !== '');
}

type SetColumns = ReturnType<typeof elementSetColumns>;

function isInUse(set: SetColumns, inUse: Prisma.ElementSetModel | undefined): boolean {
  if (inUse === undefined) return false;
  // Where it is from, and which of its fields were given, makes no other orbit of it.
  const fields = Object.keys(set) as (keyof SetColumns)[];
  return fields.every((field) => field === 'source' || field === 'givenText' || inUse[field] === set[field]);
}

/** What a set says of where it is from and of the observations behind it. */
function sourceWords({ source, observed }: ElementSet): string {
  const arc = observed?.arc ?? '';
  const days = /^(\d+) days$/.exec(arc);
  const years = /^(\d{4})-(\d{4})$/.exec(arc);
  const behind =
    days !== null
      ? `from ${days[1]!} days of observations`
      : years !== null
        ? `from observations of ${years[1]!} to ${years[2]!}`
        : '';
  return [source, behind].filter((part) => part !== '').join(', ');
}

function nothingOf(
  row: TargetRow,
  { problems }: ElementReading,
  others: readonly string[],
  body: string | undefined,
): ClubProblem {
  const errors = problems.filter(({ severity }) => severity === 'error');
  if (others.length === 0 && errors.length > 0) {
    return new ClubProblem(
      'invalid',
      errors.map(({ line, column, message }) => ({
        field: `text: line ${String(line)}, column ${String(column)}`,
        value: null,
        message: `Line ${String(line)}, column ${String(column)}: ${message}`,
      })),
    );
  }
  const wanted = body ?? namesOf(row).join(' or ');
  const there = others.length === 0 ? '' : `; it holds ${others.slice(0, 10).join(', ')}`;
  return problem(
    'invalid',
    body === undefined ? 'text' : 'body',
    body ?? null,
    `Nothing in it is of ${wanted}${there}. Name the body that is meant with body.`,
  );
}
