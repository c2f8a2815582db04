import { type Command } from 'commander';
import { findClub } from '#club';
import { loadDemo } from '#demo-data';
import { BadInput } from './badInput';
import { parseDate } from './options';
import { printJson, say } from './output';
import { withDatabase } from './siteFromDatabase';

interface DemoOptions {
  readonly asOf?: string;
  readonly db?: string;
  readonly json?: boolean;
}

export function addDemo(program: Command): void {
  program
    .command('demo')
    .description('load the invented demo club into an empty database')
    .option('--as-of <YYYY-MM-DD>', 'the day around which it is built (else today)')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print what was loaded as JSON')
    .action(async ({ asOf, db, json }: DemoOptions) => {
      const day = parseDate('as-of', asOf ?? new Date().toISOString().slice(0, 10));
      const loaded = await withDatabase(db, async (database) => {
        const present = await findClub(database);
        if (present !== null) {
          throw new BadInput(
            'db',
            `The database already holds the club "${present.name}"; give --db with a new file.`,
          );
        }
        return loadDemo(database, { asOf: day });
      });
      if (json === true) printJson(loaded);
      else say(`Loaded the demo club "${loaded.club}": ${loaded.sites} sites, ${loaded.targets} targets.`);
    });
}
