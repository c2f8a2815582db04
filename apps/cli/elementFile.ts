import { readFileSync } from 'node:fs';
import { type ElementReading, readElements } from '#elements';
import { BadInput } from './badInput';
import { say } from './output';

const read = new Map<string, ElementReading>();

/** The element sets of a file ('-' standard input); a batch reads each file once. Warnings go to standard error. */
export function elementFile(file: string): ElementReading {
  const known = read.get(file);
  if (known !== undefined) return known;
  let text: string;
  try {
    text = readFileSync(file === '-' ? 0 : file, 'utf8');
  } catch {
    throw new BadInput('elements', `--elements was "${file}"; give a file that can be read.`);
  }
  const reading = readElements(text);
  for (const { line, column, severity, message } of reading.problems) {
    say(`${file}: line ${line}, column ${column}: ${severity}: ${message}`);
  }
  read.set(file, reading);
  return reading;
}
