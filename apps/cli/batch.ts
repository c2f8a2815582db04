import { createReadStream } from 'node:fs';
import { createInterface } from 'node:readline';
import { BadInput, badInputOf } from './badInput';
import { print } from './output';

/**
 * Answers one JSON object of options a line, in order, from a file or standard input ('-'). A line that is
 * wrong is answered in its place with `{"error":{"field","message"}}`; the result says whether any was.
 */
export async function runBatch(
  file: string,
  known: readonly string[],
  answer: (options: Readonly<Record<string, string>>) => unknown,
): Promise<{ readonly allGood: boolean }> {
  const input = file === '-' ? process.stdin : createReadStream(file);
  let allGood = true;
  for await (const line of createInterface({ input, crlfDelay: Infinity })) {
    if (line.trim() === '') continue;
    try {
      print(JSON.stringify(answer(parseLine(line, known))));
    } catch (error) {
      const wrong = badInputOf(error);
      if (wrong === null) throw error;
      allGood = false;
      print(JSON.stringify({ error: wrong }));
    }
  }
  return { allGood };
}

function parseLine(line: string, known: readonly string[]): Record<string, string> {
  let parsed: unknown;
  try {
    parsed = JSON.parse(line);
  } catch {
    throw new BadInput('', `The line is not JSON: ${line.slice(0, 60)}`);
  }
  if (parsed === null || typeof parsed !== 'object' || Array.isArray(parsed)) {
    throw new BadInput('', `The line was ${line.slice(0, 60)}; give one JSON object of options.`);
  }
  const options: Record<string, string> = {};
  for (const [key, value] of Object.entries(parsed)) {
    if (!known.includes(key)) {
      throw new BadInput(key, `${key} is not an option here; the options are ${known.join(', ')}.`);
    }
    if (typeof value !== 'string' && typeof value !== 'number' && typeof value !== 'boolean') {
      throw new BadInput(key, `${key} was ${JSON.stringify(value)}; give it as text.`);
    }
    options[key] = String(value);
  }
  return options;
}
