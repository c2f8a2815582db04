import { type z } from 'zod';
import { ClubProblem, type FieldProblem } from '../clubProblem';

/**
 * The input as the schema takes it. Throws a ClubProblem of kind 'invalid' that lists everything wrong with
 * it. The schemas of this library word their messages as what would be right ("degrees from -90 to 90");
 * this makes whole sentences of them.
 */
export function checked<T extends z.ZodType>(schema: T, input: unknown): z.output<T> {
  const result = schema.safeParse(input, { error: rightFor });
  if (result.success) return result.data;
  throw new ClubProblem(
    'invalid',
    result.error.issues.flatMap((issue) => inWords(issue, input)),
  );
}

/** Field paths as people write them: `horizon[3].azimuthDeg`. */
export function fieldPath(path: readonly PropertyKey[]): string {
  return path
    .map((step, index) =>
      typeof step === 'number' ? `[${String(step)}]` : `${index === 0 ? '' : '.'}${String(step)}`,
    )
    .join('');
}

/** What was left out, or how a value reads in a sentence. */
export function valueInWords(value: unknown): string {
  if (value === undefined) return 'left out';
  const text = typeof value === 'number' ? String(value) : JSON.stringify(value);
  return text.length > 80 ? `${text.slice(0, 77)}…` : text;
}

function inWords(issue: z.core.$ZodIssue, input: unknown): FieldProblem[] {
  if (issue.code === 'unrecognized_keys') {
    const within = at(input, issue.path);
    return issue.keys.map((key) => {
      const field = fieldPath([...issue.path, key]);
      const value = (within as Readonly<Record<string, unknown>>)[key];
      return { field, value, message: `${field} is not a field that is known here; leave it out.` };
    });
  }
  const field = fieldPath(issue.path);
  const value = at(input, issue.path);
  const name = field === '' ? 'The request' : field;
  return [
    { field, value: value ?? null, message: `${name} was ${valueInWords(value)}; give ${issue.message}.` },
  ];
}

function at(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, step) =>
      value !== null && typeof value === 'object'
        ? (value as Readonly<Record<PropertyKey, unknown>>)[step]
        : undefined,
    input,
  );
}

/** What would be right where a schema does not say it itself. */
function rightFor(issue: z.core.$ZodRawIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return TYPE_WORDS[issue.expected] ?? issue.expected;
    case 'invalid_value':
      return `one of ${issue.values.map((value) => String(value)).join(', ')}`;
    case 'too_small':
      return `${issue.inclusive === false ? 'more than' : 'at least'} ${amount(issue.minimum, issue.origin)}`;
    case 'too_big':
      return `${issue.inclusive === false ? 'less than' : 'at most'} ${amount(issue.maximum, issue.origin)}`;
    default:
      return 'another value';
  }
}

const TYPE_WORDS: Readonly<Record<string, string>> = {
  string: 'text',
  number: 'a finite number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object with named fields',
};

function amount(count: number | bigint, origin: string): string {
  if (origin === 'string') return `${String(count)} character${count === 1 ? '' : 's'}`;
  if (origin === 'array') return `${String(count)} entr${count === 1 ? 'y' : 'ies'}`;
  return String(count);
}
