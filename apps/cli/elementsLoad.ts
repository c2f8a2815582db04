import { createReadStream } from 'node:fs';
import { type Command } from 'commander';
import {
  addElementReading,
  type ChangeNotice,
  type Database,
  elementChanges,
  elementNames,
  type ElementWishes,
  type LoadedElements,
} from '#club';
import { collectElements } from '#elements';
import { BadInput } from './badInput';
import { print, printJson, say } from './output';
import { withDatabase } from './siteFromDatabase';

interface TargetOptions {
  readonly target?: string;
  readonly db?: string;
  readonly json?: boolean;
}

interface LoadOptions extends TargetOptions {
  readonly body?: string;
  readonly source?: string;
}

export function addElementsLoad(elements: Command): void {
  elements
    .command('load <FILE>')
    .description('add the newer element sets that a file has of a target; - reads standard input')
    .option('--target <NAME>', 'the target of the club')
    .option('--body <NAME>', "the body in the file (else by the target's designation and name)")
    .option('--source <WORDS>', 'where the file is from (else what it says itself)')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print JSON')
    .action(async (file: string, options: LoadOptions) => {
      const { target, body, source } = options;
      if (target === undefined) throw noTarget();
      const loaded = await withDatabase(options.db, (database) =>
        load(database, file, target, { body, source }),
      );
      for (const { line, column, severity, message } of loaded.problems) {
        say(`${file}: line ${String(line)}, column ${String(column)}: ${severity}: ${message}`);
      }
      if (options.json === true) printJson(loaded);
      else {
        const count = loaded.sets.length;
        const held = loaded.held === 0 ? '' : `; ${String(loaded.held)} in use already`;
        say(`${String(count)} element set${count === 1 ? '' : 's'} added to ${loaded.target.name}${held}.`);
        if (loaded.change !== null) printNotice(loaded.change);
      }
      if (loaded.problems.some(({ severity }) => severity === 'error')) process.exitCode = 2;
    });

  elements
    .command('changes')
    .description(
      "what a target's newest element set changes in the coming evenings, beside the one before it",
    )
    .option('--target <NAME>', 'the target of the club')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print JSON')
    .action(async ({ target, db, json }: TargetOptions) => {
      if (target === undefined) throw noTarget();
      const change = await withDatabase(db, (database) => elementChanges(database, target));
      if (json === true) printJson({ change });
      else if (change === null) say('The target has only one element set.');
      else printNotice(change);
    });
}

/** Only the target's own body is picked out of the file, however long it is. */
async function load(
  database: Database,
  file: string,
  target: string,
  wishes: ElementWishes,
): Promise<LoadedElements> {
  const wanted = wishes.body === undefined ? await elementNames(database, target) : [wishes.body];
  const input = file === '-' ? process.stdin : createReadStream(file);
  const reading = await collectElements(input as AsyncIterable<Uint8Array>, { wanted }).catch(
    (error: unknown) => {
      if (error instanceof Error && 'code' in error && 'syscall' in error) {
        throw new BadInput('file', `The file was "${file}"; give one that can be read.`);
      }
      throw error;
    },
  );
  return addElementReading(database, target, reading, wishes);
}

function printNotice({ sentence, touched }: ChangeNotice): void {
  print(sentence);
  for (const evening of touched) {
    print(`\n${evening.date} at ${evening.site}, ${evening.programme}: ${evening.sentence}`);
    for (const { words } of evening.scales) print(`  ${words}`);
  }
}

function noTarget(): BadInput {
  return new BadInput('target', '--target was left out; give the name of a target that moves on an orbit.');
}
