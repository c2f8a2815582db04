import { complete } from './complete';
import { type ElementSet } from './elementSet';
import { headingMeaning } from './headings';
import { readNamedValues } from './namedValues';
import { type PlacedMember, type PlacedValue, readPlacedJson } from './placedJson';
import { type ElementProblem } from './problem';

type PlacedObject = Extract<PlacedValue, { kind: 'object' }>;

/**
 * Element sets from JSON: one object, an array of them, an object with `sets`, or one object a line. Keys are those of
 * the program's own output or the standard symbols; what an object lists as `derived` or `assumed` is derived anew.
 */
export function readJson(text: string): {
  readonly sets: readonly ElementSet[];
  readonly problems: readonly ElementProblem[];
} {
  const placeOf = placesOf(text);
  const { values, error } = readPlacedJson(text);
  const sets: ElementSet[] = [];
  const problems: ElementProblem[] = [];
  const report = (offset: number, severity: ElementProblem['severity'], message: string): void => {
    problems.push({ ...placeOf(offset), severity, message });
  };
  values.forEach((value, index) => {
    const cutShort = error !== null && index === values.length - 1;
    for (const item of candidates(value, cutShort)) {
      if (item.kind === 'object') readObject(item, placeOf, sets, problems);
      else if (!cutShort) {
        report(item.offset, 'error', 'Expected an element set as an object: { "designation": …, "q": … }.');
      }
    }
  });
  if (error !== null) report(error.offset, 'error', error.message);
  else if (sets.length === 0 && problems.length === 0) {
    report(0, 'error', 'There are no element sets here; expected objects in an array or under "sets".');
  }
  return { sets, problems };
}

/** The values that should be element sets; an object that an error cut short is left out. */
function candidates(value: PlacedValue, cutShort: boolean): readonly PlacedValue[] {
  if (value.kind === 'array') return value.items;
  if (value.kind === 'object') {
    const list = value.members.find(
      ({ key, value: member }) => (key === 'sets' || key === 'elements') && member.kind === 'array',
    )?.value;
    if (list?.kind === 'array') return list.items;
    return cutShort ? [] : [value];
  }
  return [value];
}

function readObject(
  object: PlacedObject,
  placeOf: (offset: number) => { readonly line: number; readonly column: number },
  sets: ElementSet[],
  problems: ElementProblem[],
): void {
  const passedOver = new Set([
    ...listed(object, 'derived'),
    ...listed(object, 'assumed'),
    ...coarserTimes(object),
  ]);
  const members = object.members.filter(({ key }) => !passedOver.has(key));
  const own: ElementProblem[] = [];
  const report = (offset: number, severity: ElementProblem['severity'], message: string): void => {
    own.push({ ...placeOf(offset), severity, message });
  };
  const readable = members.filter(({ key, value }) => {
    if (value.kind === 'string' || value.kind === 'number') return true;
    const isNull = value.kind === 'literal' && value.text === 'null';
    if (!isNull && headingMeaning(key) !== null) {
      report(value.offset, 'error', `Expected a number or text for "${key}".`);
    }
    return false;
  });
  const values = readable.map(({ key, value }) => ({ heading: key, value: textOf(value) }));
  const read = readNamedValues(values);
  const offsetOf = (index: number | null | undefined): number =>
    (index === null || index === undefined ? undefined : readable[index]?.value.offset) ?? object.offset;
  for (const problem of read.problems) report(offsetOf(problem.index), problem.severity, problem.message);
  if (!own.some((problem) => problem.severity === 'error')) {
    const law = read.given.law ?? read.given.kind ?? undefined;
    const { set, problems: found } = complete(
      { ...read.given, law },
      { line: placeOf(object.offset).line, format: 'json', observed: null, identity: null },
    );
    for (const problem of found) {
      report(offsetOf(read.where.get(problem.field ?? '')), problem.severity, problem.message);
    }
    if (set !== null) sets.push(set);
  }
  problems.push(...own);
}

/** Times that stand in the object a second time, as Julian dates to more digits. */
function coarserTimes(object: PlacedObject): string[] {
  return (['epoch', 'perihelionTime'] as const).filter((field) => {
    const finer = field === 'epoch' ? 'epochTtJd' : 'perihelionTtJd';
    return object.members.some(({ key, value }) => key === finer && value.kind === 'number');
  });
}

function listed(object: PlacedObject, key: string): string[] {
  const list: PlacedMember | undefined = object.members.find((member) => member.key === key);
  if (list?.value.kind !== 'array') return [];
  return list.value.items.flatMap((item) => (item.kind === 'string' ? jsonKeys(item.text) : []));
}

/** A field's key and that of its Julian date. */
function jsonKeys(field: string): readonly string[] {
  if (field === 'perihelionTime') return [field, 'perihelionTtJd'];
  return field === 'epoch' ? [field, 'epochTtJd'] : [field];
}

function textOf(value: PlacedValue): string {
  return value.kind === 'object' || value.kind === 'array' ? '' : value.text;
}

/** Line and column of an offset, by a search in the line starts. */
function placesOf(text: string): (offset: number) => { readonly line: number; readonly column: number } {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return (offset) => {
    let low = 0;
    let high = starts.length - 1;
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (starts[middle]! <= offset) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: offset - starts[low]! + 1 };
  };
}
