import { type Command } from 'commander';
import { closeSearchPool, rankEvenings, toNightsJson } from '#club';
import { clockWords, type JudgedEvening } from '#nights';
import { DateTime } from 'luxon';
import { BadInput } from './badInput';
import { parseDate, parseNumber } from './options';
import { print, printJson, say } from './output';
import { withDatabase } from './siteFromDatabase';

interface NightsOptions {
  readonly from?: string;
  readonly to?: string;
  readonly siteName?: readonly string[];
  readonly programme?: string;
  readonly limit?: string;
  readonly db?: string;
  readonly json?: boolean;
}

const LINES = 10;

export function addNights(program: Command): void {
  program
    .command('nights')
    .description('what evenings are worth holding, best first')
    .option('--from <YYYY-MM-DD>', 'first date of the season')
    .option('--to <YYYY-MM-DD>', 'last date of the season')
    .option('--site-name <NAME...>', 'only these sites')
    .option('--programme <NAME>', 'what is to be shown (else the first programme)')
    .option('--limit <N>', 'how many evenings to give')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print JSON')
    .action(async (options: NightsOptions) => {
      const { from, to, siteName, programme, limit, db } = options;
      if (from === undefined) throw new BadInput('from', '--from was left out; give it as YYYY-MM-DD.');
      if (to === undefined) throw new BadInput('to', '--to was left out; give it as YYYY-MM-DD.');
      const most =
        limit === undefined
          ? undefined
          : Math.trunc(parseNumber('limit', limit, 1, 100_000, 'a whole number'));
      const request = {
        from: parseDate('from', from),
        to: parseDate('to', to),
        ...(siteName && { siteNames: [...siteName] }),
        ...(programme !== undefined && { programmeName: programme }),
        ...(most === undefined ? options.json !== true && { limit: LINES } : { limit: most }),
      };
      const shows = process.stderr.isTTY && options.json !== true;
      const ranking = await withDatabase(db, (database) =>
        rankEvenings(database, request, {
          onProgress: (done, total) => {
            if (shows && done === total) say(`${total} evenings judged.`);
          },
        }),
      ).finally(closeSearchPool);
      if (options.json === true) {
        printJson(toNightsJson(ranking));
        return;
      }
      const { searched, evenings, habit } = ranking;
      print(
        `${searched.evenings} evenings at ${searched.sites} sites for ${searched.targets} targets in ${searched.milliseconds} ms; the best ${evenings.length}:`,
      );
      for (const evening of evenings) print(`\n${inWords(evening)}`);
      if (habit !== null) {
        print(
          `\nThe habit, ${habit.words}, scores ${habit.averageScore.toFixed(1)} on average; the best evening of each month ${habit.freeAverageScore.toFixed(1)}.`,
        );
      }
    });
}

function inWords(evening: JudgedEvening): string {
  const day = DateTime.fromISO(evening.date).toFormat('cccc d LLLL yyyy');
  const { publicHours, zone } = evening;
  const hours =
    publicHours === null
      ? 'no public hours'
      : `${clockWords(publicHours.startMs, zone)} to ${clockWords(publicHours.endMs, zone)}`;
  return [
    `${day} at ${evening.site}, ${hours}: ${evening.score.toFixed(1)} points, ${evening.shown} of ${evening.of} targets`,
    ...evening.parts.map(({ name, points, of, why }) => `  ${name} ${points.toFixed(1)} of ${of}: ${why}`),
    ...evening.showings.map(
      ({ target, shown, why, range }) =>
        `  ${shown ? '+' : '-'} ${target}: ${why}${range?.matters === true ? ` Its brightness is a forecast: ${range.words}.` : ''}`,
    ),
  ].join('\n');
}
