import { type CsvLayout, csvLayout, readCsvLine } from './csv';
import { type ElementSet } from './elementSet';
import { readJson } from './json';
import { lineKind } from './lineKind';
import { type ReadLine, readCometLine } from './mpcComet';
import { readMinorPlanetLine } from './mpcMinorPlanet';
import { type ElementProblem } from './problem';
import { type Wanted } from './wanted';

/** What came of the text so far, since it was last taken. */
export interface ElementBatch {
  readonly sets: readonly ElementSet[];
  readonly problems: readonly ElementProblem[];
  /** Lines gone through since the beginning. */
  readonly lines: number;
}

/** A reader that is fed a text in pieces of any size and gives out what it has read. */
export interface ElementReader {
  push(text: string): void;
  finish(): void;
  take(): ElementBatch;
}

/** Longest line that is looked at, and longest JSON document that is held, in characters. */
const LONGEST_LINE = 1_000_000;
const LONGEST_JSON = 32_000_000;

/**
 * A reader of element sets in any of the known formats, which it finds out by itself: JSON by its first bracket, CSV
 * by its heading line, the one-line formats by where their decimal points stand, line by line. With `wanted`, only
 * those bodies are given out and only their lines looked at closely. Memory holds a line at a time (JSON, which is
 * one document, as a whole). State is the point here: the text comes in pieces.
 */
export function elementReader(wanted: Wanted | null): ElementReader {
  let mode: 'undecided' | 'lines' | 'csv' | 'json' | 'overlong' = 'undecided';
  let layout: CsvLayout | null = null;
  let rest = '';
  let lineNumber = 0;
  let started = false;
  let anySet = false;
  let anyProblem = false;
  let skippingLine = false;
  let sets: ElementSet[] = [];
  let problems: ElementProblem[] = [];

  const keep = (read: ReadLine): void => {
    if (read.set !== null) {
      anySet = true;
      if (wanted === null || wanted.has(read.set)) sets.push(read.set);
    }
    for (const problem of read.problems) problems.push(problem);
  };
  const report = (column: number, message: string): void => {
    problems.push({ line: lineNumber, column, severity: 'error', message });
  };

  const readLine = (line: string): void => {
    lineNumber++;
    if (mode === 'csv') {
      if (line.trim() !== '' && !line.startsWith('#')) keep(readCsvLine(line, lineNumber, layout!));
      return;
    }
    if (mode === 'undecided') {
      layout = csvLayout(line);
      if (layout !== null) {
        mode = 'csv';
        return;
      }
    }
    const kind = lineKind(line);
    if (kind === 'minorPlanet') {
      mode = 'lines';
      if (wanted?.passesOver(line) === true) anySet = true;
      else keep(readMinorPlanetLine(line, lineNumber));
    } else if (kind === 'comet') {
      mode = 'lines';
      keep(readCometLine(line, lineNumber));
    } else if (kind === 'rule' && mode === 'undecided') {
      // What stood above a rule was the file's header, figures in it or not.
      problems = [];
    } else if (kind === 'unknown' || (kind === 'prose' && mode === 'lines')) {
      report(1, `${WHAT_A_LINE_IS} This is neither.`);
    }
  };

  const begin = (text: string): string => {
    const bare = text.startsWith('\uFEFF') ? text.slice(1) : text;
    const first = /\S/.exec(bare)?.[0];
    if (first === undefined) return bare;
    started = true;
    if (first === '{' || first === '[') mode = 'json';
    return bare;
  };

  const pushLines = (text: string): void => {
    let from = 0;
    for (let to = text.indexOf('\n'); to >= 0; to = text.indexOf('\n', from)) {
      const end = to > from && text.charCodeAt(to - 1) === 13 ? to - 1 : to;
      if (skippingLine) skippingLine = false;
      else if (end - from > LONGEST_LINE) overlong();
      else readLine(text.slice(from, end));
      from = to + 1;
    }
    rest = from === 0 ? text : text.slice(from);
    if (rest.length > LONGEST_LINE) {
      if (!skippingLine) overlong();
      skippingLine = true;
    }
    if (skippingLine) rest = '';
  };
  const overlong = (): void => {
    lineNumber++;
    report(LONGEST_LINE, `This line is longer than ${LONGEST_LINE} characters and was passed over.`);
  };

  const pieces: string[] = [];
  let held = 0;
  return {
    push(text) {
      if (mode === 'overlong') return;
      let more = rest === '' ? text : rest + text;
      rest = '';
      if (!started) more = begin(more);
      if (mode !== 'json') {
        pushLines(more);
        return;
      }
      held += more.length;
      if (held <= LONGEST_JSON) {
        pieces.push(more);
        return;
      }
      mode = 'overlong';
      pieces.length = 0;
      lineNumber = 1;
      report(
        1,
        'This JSON document is too long to be read at once; use CSV or the one-line formats instead.',
      );
    },
    finish() {
      if (mode === 'json') {
        const read = readJson(pieces.join(''));
        lineNumber = Math.max(1, ...read.sets.map((set) => set.line ?? 1));
        for (const set of read.sets) if (wanted === null || wanted.has(set)) sets.push(set);
        for (const problem of read.problems) problems.push(problem);
        return;
      }
      if (rest !== '' && !skippingLine) readLine(rest.endsWith('\r') ? rest.slice(0, -1) : rest);
      rest = '';
      if (!anySet && !anyProblem && problems.length === 0) {
        lineNumber = Math.max(1, lineNumber);
        problems.push({ line: 1, column: 1, severity: 'error', message: NOTHING_FOUND });
      }
    },
    take() {
      const batch = { sets, problems, lines: lineNumber };
      if (problems.length > 0) anyProblem = true;
      sets = [];
      problems = [];
      return batch;
    },
  };
}

const WHAT_A_LINE_IS =
  'Expected an orbit in the Minor Planet Center’s one-line format for comets or for minor planets.';
const NOTHING_FOUND =
  'There are no orbital elements here; expected lines in the Minor Planet Center’s comet or minor-planet format, ' +
  'CSV with a heading line (q, e, i, node, peri, T or epoch, a, M …), or JSON.';
