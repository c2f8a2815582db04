import { type Command } from 'commander';
import { eveningAnswer, type EveningAnswer } from '#club/sky';
import { type Observer } from '#sky';
import { BadInput } from './badInput';
import { runBatch } from './batch';
import { parseDate, parsePlace, zoneOf } from './options';
import { print, printJson } from './output';
import { siteFromDatabase } from './siteFromDatabase';

interface EveningOptions {
  readonly site?: string;
  readonly siteName?: string;
  readonly zone?: string;
  readonly date?: string;
  readonly batch?: string;
  readonly db?: string;
  readonly json?: boolean;
}

export function addEvening(program: Command): void {
  program
    .command('evening')
    .description('the light of one evening: sunset, twilights, Moon and darkness')
    .option('--site <LAT,LON[,ELEVATION_M]>', 'decimal degrees, east positive, and metres')
    .option('--site-name <NAME>', 'a site of the database')
    .option('--zone <IANA_ZONE>', 'time zone (else that of the place)')
    .option('--date <YYYY-MM-DD>', 'the date on which the evening begins')
    .option('--batch <FILE>', 'one JSON object of these options a line; - reads standard input')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print JSON')
    .action(async (options: EveningOptions) => {
      if (options.batch !== undefined) {
        const { allGood } = await runBatch(options.batch, ['site', 'zone', 'date'], (line) => answerTo(line));
        if (!allGood) process.exitCode = 2;
        return;
      }
      const { siteName } = options;
      const named = siteName === undefined ? null : await siteFromDatabase(options.db, siteName);
      const answer = answerTo(options, named);
      if (options.json === true) printJson(answer);
      else print(await inWords(answer));
    });
}

function answerTo(
  { site, zone, date }: Pick<EveningOptions, 'site' | 'zone' | 'date'>,
  named: { readonly observer: Observer; readonly zone: string } | null = null,
): EveningAnswer {
  if (date === undefined) throw new BadInput('date', '--date was left out; give it as YYYY-MM-DD.');
  const day = parseDate('date', date);
  if (named !== null) return eveningAnswer(named.observer, named.zone, day);
  if (site === undefined) {
    throw new BadInput(
      'site',
      '--site was left out; give LAT,LON or LAT,LON,ELEVATION_M, or --site-name NAME.',
    );
  }
  const place = parsePlace(site);
  return eveningAnswer(place.observer, zoneOf(zone, place), day);
}

async function inWords(answer: EveningAnswer): Promise<string> {
  const { DateTime } = await import('luxon');
  const clock = (iso: string | null) =>
    iso === null ? 'none' : DateTime.fromISO(iso, { zone: answer.zone }).toFormat('HH:mm:ss');
  return [
    `Evening of ${answer.date}, times in ${answer.zone}`,
    `  sunset ${clock(answer.sunset)}; dusk: civil ${clock(answer.civilDusk)}, nautical ${clock(answer.nauticalDusk)}, astronomical ${clock(answer.astronomicalDusk)}`,
    `  dawn: astronomical ${clock(answer.astronomicalDawn)}, nautical ${clock(answer.nauticalDawn)}, civil ${clock(answer.civilDawn)}; sunrise ${clock(answer.sunrise)}`,
    `  Moon ${Math.round(answer.moon.illuminatedFraction * 100)}% lit, rises ${clock(answer.moonrise)}, sets ${clock(answer.moonset)}`,
    `  dark and moonless for ${Math.round(answer.darkMinutes)} minutes`,
  ].join('\n');
}
