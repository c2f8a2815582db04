import { writeFileSync } from 'node:fs';
import { type Command } from 'commander';
import { clubCalendar } from '#club';
import { BadInput } from './badInput';
import { printJson, say } from './output';
import { withDatabase } from './siteFromDatabase';

interface CalendarOptions {
  readonly siteName?: string;
  readonly out?: string;
  readonly db?: string;
  readonly json?: boolean;
}

export function addCalendar(program: Command): void {
  program
    .command('calendar')
    .description('the published events as an iCalendar file')
    .option('--out <FILE>', 'where to write it: .ics')
    .option('--site-name <NAME>', 'only the events at this site')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print what was written as JSON')
    .action(async ({ out, siteName, db, json }: CalendarOptions) => {
      if (out?.toLowerCase().endsWith('.ics') !== true) {
        throw new BadInput(
          'out',
          `--out was ${out === undefined ? 'left out' : `"${out}"`}; give a file that ends in .ics.`,
        );
      }
      const text = await withDatabase(db, (database) =>
        clubCalendar(database, siteName === undefined ? {} : { site: siteName }),
      );
      writeFileSync(out, text);
      const events = text.match(/^BEGIN:VEVENT\r?$/gm)?.length ?? 0;
      if (json === true) printJson({ out, events });
      else say(`Written: ${out}, ${events} event${events === 1 ? '' : 's'}.`);
    });
}
