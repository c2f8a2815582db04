import { type FieldProblem, quoted } from './problem';
import { readFrame } from './frame';
import { type GivenElements } from './given';
import { headingMeaning } from './headings';
import { readTime } from './readTime';

/** A value under its heading, as text; where it stands is the caller's to know. */
export interface NamedValue {
  readonly heading: string;
  readonly value: string;
}

/** A problem with one of the values, by its place in the list, or with a field. */
export interface NamedProblem extends FieldProblem {
  readonly index: number | null;
}

const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d{1,3})?$/i;

/**
 * Elements from values under headings, as a line of CSV, a JSON object or a form gives them. Empty values are passed
 * over, headings of other matters too; what cannot be read is refused by name. `where` gives, for each field that
 * was found, its place in the list.
 */
export function readNamedValues(values: readonly NamedValue[]): {
  readonly given: GivenElements;
  readonly where: ReadonlyMap<string, number>;
  readonly problems: readonly NamedProblem[];
} {
  const found: Record<string, number | string> = {};
  const where = new Map<string, number>();
  const problems: NamedProblem[] = [];
  const frames: string[] = [];
  let law: 'comet' | 'asteroid' | undefined;
  let kind: 'comet' | 'asteroid' | undefined;

  values.forEach(({ heading, value }, index) => {
    const meaning = headingMeaning(heading);
    const written = value.trim();
    if (meaning === null || written === '') return;
    const refuse = (message: string): void => {
      problems.push({ index, field: heading, severity: 'error', message });
    };
    const keep = (key: string, result: number | string): void => {
      if (key in found && found[key] !== result) {
        refuse(`${heading} is given twice, as ${found[key]} and as ${result}; keep one.`);
        return;
      }
      found[key] = result;
      where.set(key, index);
    };
    if (meaning.kind === 'number') {
      const numeral = written.replace(/\u2212/g, '-').replace(/\s*°$/, '');
      if (!NUMBER.test(numeral) || !Number.isFinite(Number(numeral))) {
        refuse(`${heading} is ${quoted(written)}; expected a number, like 0.764213.`);
        return;
      }
      if (meaning.law !== undefined) law ??= meaning.law;
      keep(meaning.key, Number(numeral) * (meaning.factor ?? 1));
    } else if (meaning.kind === 'time') {
      const time = readTime(written);
      if (time.ttJd === null) {
        refuse(`${heading}: ${time.problem}.`);
        return;
      }
      if (time.note !== null) {
        problems.push({ index, field: heading, severity: 'warning', message: `${heading}: ${time.note}.` });
      }
      keep(meaning.key, time.ttJd);
    } else if (meaning.kind === 'frame') {
      frames.push(written);
      where.set('frame', index);
    } else if (meaning.key === 'bodyKind') {
      kind = /comet/i.test(written)
        ? 'comet'
        : /asteroid|minor|planet/i.test(written)
          ? 'asteroid'
          : undefined;
      if (kind === undefined) refuse(`${heading} is ${quoted(written)}; expected comet or asteroid.`);
    } else {
      keep(meaning.key, written);
    }
  });

  const frame = frames.length === 0 ? undefined : readFrame(frames.join(' '));
  if (frame === null) {
    const message =
      `The frame ${quoted(frames.join(' '))} is not known; declare ecliptic or equator and J2000 or B1950, ` +
      'or leave it out for the ecliptic of J2000.';
    problems.push({ index: where.get('frame') ?? null, field: 'frame', severity: 'error', message });
  }
  return { given: { ...found, law, kind, frame }, where: fieldPlaces(where), problems };
}

/** Places by the field names that problems carry. */
function fieldPlaces(where: ReadonlyMap<string, number>): ReadonlyMap<string, number> {
  const places = new Map(where);
  const epoch = where.get('epochTtJd');
  const perihelion = where.get('perihelionTtJd');
  if (epoch !== undefined) places.set('epoch', epoch);
  if (perihelion !== undefined) places.set('perihelionTime', perihelion);
  return places;
}
