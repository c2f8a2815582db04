import { type Command } from 'commander';
import { extinctionForElevation, type SiteSky, skyFromBortle } from '#darkness';
import { namedTarget, perturbing, type Perturbing, skyAnswer, type SkyAnswer } from '#club/sky';
import { BadInput } from './badInput';
import { runBatch } from './batch';
import { elementFile } from './elementFile';
import { parseInstant, parseNumber, parsePlace, type PlaceOption } from './options';
import { print, printJson } from './output';
import { siteFromDatabase } from './siteFromDatabase';

interface SkyOptions {
  readonly target?: string;
  readonly elements?: string;
  readonly site?: string;
  readonly siteName?: string;
  readonly at?: string;
  readonly skyMag?: string;
  readonly bortle?: string;
  readonly geocentric?: boolean;
  readonly batch?: string;
  readonly db?: string;
  readonly json?: boolean;
}

/** A dark rural sky, where nobody says what the site's is. */
const USUAL_SKY_MAG = 21.3;
const BATCH_KEYS = ['target', 'elements', 'site', 'at', 'skyMag', 'bortle', 'geocentric'];

export function addSky(program: Command): void {
  program
    .command('sky')
    .description('where one target stands at one instant, and the sky around it')
    .option('--target <NAME>', 'the Sun, the Moon, a planet, a catalogued object or a body of --elements')
    .option('--elements <FILE>', 'orbital elements in any of the known formats')
    .option('--site <LAT,LON[,ELEVATION_M]>', 'decimal degrees, east positive, and metres')
    .option('--site-name <NAME>', 'a site of the database')
    .option('--at <ISO_TIME>', 'the instant, with its offset')
    .option('--sky-mag <MAG>', `zenith sky in V mag/arcsec2 (else ${USUAL_SKY_MAG}, or the site's own)`)
    .option('--bortle <CLASS>', 'zenith sky as a Bortle class, 1 to 9')
    .option('--geocentric', 'from the centre of the Earth')
    .option('--batch <FILE>', 'one JSON object of these options a line; - reads standard input')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print JSON')
    .action(async (options: SkyOptions) => {
      if (options.batch !== undefined) {
        const perturbed = perturbing();
        const { allGood } = await runBatch(options.batch, BATCH_KEYS, (line) =>
          answerTo(line, null, perturbed),
        );
        if (!allGood) process.exitCode = 2;
        return;
      }
      const answer = answerTo(options, await namedSite(options));
      if (options.json === true) printJson(answer);
      else print(inWords(answer));
    });
}

/** Where from: a place with its sky. */
interface Stand {
  readonly observer: PlaceOption['observer'];
  readonly sky: SiteSky;
}

async function namedSite({ siteName, db }: SkyOptions): Promise<Stand | null> {
  if (siteName === undefined) return null;
  const { observer, sky } = await siteFromDatabase(db, siteName);
  return { observer, sky };
}

function answerTo(
  options: Omit<SkyOptions, 'geocentric'> & { readonly geocentric?: boolean | string },
  named: Stand | null = null,
  perturbed: Perturbing = perturbing(),
): SkyAnswer {
  if (options.target === undefined) {
    throw new BadInput('target', '--target was left out; give the name of what is to be seen.');
  }
  if (options.at === undefined) {
    throw new BadInput('at', '--at was left out; give an instant such as 2027-03-01T20:00:00Z.');
  }
  const utcMs = parseInstant(options.at);
  const sets = options.elements === undefined ? [] : elementFile(options.elements).sets;
  const { sky: target } = namedTarget(options.target, sets);
  const isGeocentric = options.geocentric === true || options.geocentric === 'true';
  return skyAnswer(target, utcMs, isGeocentric ? null : (named ?? standOf(options)), perturbed);
}

function standOf({ site, skyMag, bortle }: Pick<SkyOptions, 'site' | 'skyMag' | 'bortle'>): Stand {
  if (site === undefined) {
    throw new BadInput(
      'site',
      '--site was left out; give LAT,LON or LAT,LON,ELEVATION_M, or --site-name NAME, or --geocentric.',
    );
  }
  const { observer } = parsePlace(site);
  return {
    observer,
    sky: {
      zenithMagPerArcsec2:
        skyMag !== undefined
          ? parseNumber('sky-mag', skyMag, 15, 22.2, 'V mag/arcsec2')
          : bortle !== undefined
            ? skyFromBortle(Math.round(parseNumber('bortle', bortle, 1, 9, 'a class')))
            : USUAL_SKY_MAG,
      extinctionMagPerAirmass: extinctionForElevation(observer.elevationM),
      domes: [],
    },
  };
}

function inWords(answer: SkyAnswer): string {
  const lines = [`${answer.target} at ${answer.at}`];
  const { horizontal, astrometric, moon, sun } = answer;
  if (horizontal !== null) {
    lines.push(
      `  altitude ${horizontal.altitudeDeg.toFixed(2)} degrees, azimuth ${horizontal.azimuthDeg.toFixed(2)} degrees (airless; ${horizontal.refractedAltitudeDeg.toFixed(2)} with refraction)`,
    );
  }
  lines.push(
    `  RA ${astrometric.raDeg.toFixed(4)}, Dec ${astrometric.decDeg.toFixed(4)} degrees (J2000), in ${answer.constellation}`,
  );
  if (answer.magnitude !== null) lines.push(`  magnitude ${answer.magnitude.toFixed(1)}`);
  if (answer.distanceAu !== null) lines.push(`  distance ${answer.distanceAu.toFixed(4)} au`);
  lines.push(`  distance from the Sun in the sky ${answer.elongationDeg.toFixed(1)} degrees`);
  if (answer.skyBrightness !== null && answer.limitingMagnitude !== null) {
    lines.push(
      `  sky ${answer.skyBrightness.toFixed(2)} mag/arcsec2; faintest star for the naked eye ${answer.limitingMagnitude.toFixed(1)}`,
    );
  }
  if (moon !== null && sun !== null) {
    lines.push(
      `  Sun at ${sun.altitudeDeg.toFixed(1)} degrees; Moon at ${moon.altitudeDeg.toFixed(1)} degrees, ${Math.round(moon.illuminatedFraction * 100)}% lit, ${moon.separationDeg.toFixed(0)} degrees away`,
    );
  }
  return [...lines, ...answer.cautions.map((caution) => `  Caution: ${caution}`)].join('\n');
}
