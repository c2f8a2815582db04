/** JSON with the place of every value, so that a problem in it can be shown where it stands. */
export type PlacedValue =
  | { readonly kind: 'object'; readonly offset: number; readonly members: readonly PlacedMember[] }
  | { readonly kind: 'array'; readonly offset: number; readonly items: readonly PlacedValue[] }
  | { readonly kind: 'string'; readonly offset: number; readonly text: string }
  | { readonly kind: 'number'; readonly offset: number; readonly text: string }
  | { readonly kind: 'literal'; readonly offset: number; readonly text: 'true' | 'false' | 'null' };

export interface PlacedMember {
  readonly key: string;
  readonly value: PlacedValue;
}

export interface PlacedJson {
  /** The values of the text, one or (as in JSON Lines) several; what stood whole before an error is kept. */
  readonly values: readonly PlacedValue[];
  readonly error: { readonly offset: number; readonly message: string } | null;
}

const DEEPEST = 40;
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const LITERAL = /true|false|null/y;

/** Reads JSON values one after another (RFC 8259), remembering where each begins. */
export function readPlacedJson(text: string): PlacedJson {
  let at = 0;
  let error: PlacedJson['error'] = null;

  const fail = (message: string): null => {
    error ??= { offset: at, message };
    return null;
  };
  const blank = (): void => {
    while (at < text.length && ' \t\r\n'.includes(text.charAt(at))) at++;
  };
  const match = (pattern: RegExp): string | null => {
    pattern.lastIndex = at;
    const found = pattern.exec(text);
    if (found === null) return null;
    at += found[0].length;
    return found[0];
  };
  const string = (): string | null => {
    const start = at;
    if (text.charAt(at) !== '"') return fail('Expected a text in double quotation marks.');
    let end = at + 1;
    while (end < text.length && text.charAt(end) !== '"') end += text.charAt(end) === '\\' ? 2 : 1;
    if (end >= text.length) return fail('The quotation mark opened here is not closed.');
    at = end + 1;
    try {
      return JSON.parse(text.slice(start, at)) as string;
    } catch {
      at = start;
      return fail('This text holds a line break or an escape that JSON does not know.');
    }
  };

  const value = (depth: number): PlacedValue | null => {
    blank();
    const offset = at;
    const first = text.charAt(at);
    if (first === '{' || first === '[') {
      if (depth >= DEEPEST) return fail(`Brackets are nested deeper than ${DEEPEST}.`);
      at++;
      return first === '{' ? object(offset, depth) : array(offset, depth);
    }
    if (first === '"') {
      const found = string();
      return found === null ? null : { kind: 'string', offset, text: found };
    }
    const number = match(NUMBER);
    if (number !== null) return { kind: 'number', offset, text: number };
    const literal = match(LITERAL);
    if (literal !== null) return { kind: 'literal', offset, text: literal as 'true' | 'false' | 'null' };
    return fail(at >= text.length ? 'The text ends where a value should stand.' : 'Expected a value.');
  };

  const array = (offset: number, depth: number): PlacedValue => {
    const items: PlacedValue[] = [];
    blank();
    if (text.charAt(at) === ']') {
      at++;
      return { kind: 'array', offset, items };
    }
    for (;;) {
      const item = value(depth + 1);
      // An object cut short by an error is not to be taken for a whole one.
      if (item === null || (error !== null && item.kind === 'object')) break;
      items.push(item);
      if (error !== null) break;
      blank();
      const next = text.charAt(at);
      if (next === ']' || next === ',') at++;
      if (next === ']') break;
      if (next !== ',') {
        fail('Expected a comma or the closing bracket ].');
        break;
      }
    }
    return { kind: 'array', offset, items };
  };

  const object = (offset: number, depth: number): PlacedValue => {
    const members: PlacedMember[] = [];
    blank();
    if (text.charAt(at) === '}') {
      at++;
      return { kind: 'object', offset, members };
    }
    for (;;) {
      blank();
      const key = string();
      if (key === null) break;
      blank();
      if (text.charAt(at) !== ':') {
        fail(`Expected a colon after "${key.slice(0, 40)}".`);
        break;
      }
      at++;
      const member = value(depth + 1);
      if (member === null) break;
      members.push({ key, value: member });
      if (error !== null) break;
      blank();
      const next = text.charAt(at);
      if (next === '}' || next === ',') at++;
      if (next === '}') break;
      if (next !== ',') {
        fail('Expected a comma or the closing bracket }.');
        break;
      }
    }
    return { kind: 'object', offset, members };
  };

  const values: PlacedValue[] = [];
  for (blank(); at < text.length && error === null; blank()) {
    const found = value(0);
    if (found === null) break;
    values.push(found);
  }
  return { values, error };
}
