import { type Command } from 'commander';
import { elementState, compareElements, namedTarget, perturbing } from '#club/sky';
import { parseDesignation, toCheckJson } from '#elements';
import { BadInput } from './badInput';
import { runBatch } from './batch';
import { elementFile } from './elementFile';
import { addElementsLoad } from './elementsLoad';
import { addElementsTrust } from './elementsTrust';
import { parseInstant, parsePlace, parseTtInstant } from './options';
import { print, printJson, say } from './output';

interface JsonOption {
  readonly json?: boolean;
}

interface StateOptions extends JsonOption {
  readonly body?: string;
  readonly at?: string;
  readonly twoBody?: boolean;
  readonly batch?: string;
}

/** The options that a line of a batch may carry too, there as text. */
interface StateLine {
  readonly body?: string;
  readonly at?: string;
  readonly twoBody?: boolean | string;
}

interface CompareOptions extends JsonOption {
  readonly site?: string;
  readonly at?: string;
}

export function addElements(program: Command): void {
  const elements = program.command('elements').description('orbital elements of comets and asteroids');

  elements
    .command('check <FILE>')
    .description('read element sets, complete them and say what is wrong; - reads standard input')
    .option('--json', 'print JSON')
    .action((file: string, { json }: JsonOption) => {
      const reading = elementFile(file);
      if (json === true) printJson(toCheckJson(reading));
      else {
        for (const set of reading.sets) {
          print(
            `${set.label}: ${set.orbitClass}; q ${set.perihelionDistanceAu.toFixed(4)} au, e ${set.eccentricity.toFixed(5)}, i ${set.inclinationDeg.toFixed(2)} degrees; given ${set.given.join(', ')}; derived ${set.derived.join(', ')}`,
          );
        }
        say(`${reading.sets.length} element sets, ${reading.problems.length} problems.`);
      }
      if (reading.problems.some(({ severity }) => severity === 'error')) process.exitCode = 2;
    });

  elements
    .command('state <FILE>')
    .description('heliocentric place of a body, au, J2000, at a TT instant')
    .option('--body <NAME>', 'name or designation')
    .option('--at <ISO_TIME>', 'TT instant')
    .option('--two-body', 'leave perturbations out')
    .option('--batch <FILE>', 'one JSON object of these options a line; - reads standard input')
    .option('--json', 'print JSON')
    .action(async (file: string, options: StateOptions) => {
      const { sets } = elementFile(file);
      const perturbed = perturbing();
      const answer = ({ body, at, twoBody }: StateLine) => {
        if (body === undefined) {
          throw new BadInput('body', '--body was left out; give the name of a body in the file.');
        }
        if (at === undefined) {
          throw new BadInput('at', '--at was left out; give a TT instant such as 2027-03-01T00:00:00.');
        }
        return elementState(
          namedTarget(body, sets),
          parseTtInstant(at),
          isTwoBody(twoBody ?? options.twoBody),
          perturbed,
        );
      };
      if (options.batch !== undefined) {
        const { allGood } = await runBatch(options.batch, ['body', 'at', 'twoBody'], answer);
        if (!allGood) process.exitCode = 2;
        return;
      }
      const state = answer(options);
      if (options.json === true) printJson(state);
      else print(`x ${state.heliocentricEcliptic.join('  ')} au, ecliptic J2000`);
    });

  elements
    .command('designation [TEXT]')
    .description('take a designation apart')
    .option('--batch <FILE>', 'one JSON object {"text":"…"} a line; - reads standard input')
    .option('--json', 'print JSON')
    .action(async (text: string | undefined, { json, batch }: JsonOption & { readonly batch?: string }) => {
      if (batch !== undefined) {
        const { allGood } = await runBatch(batch, ['text'], (line) => parseDesignation(line['text'] ?? ''));
        if (!allGood) process.exitCode = 2;
        return;
      }
      if (text === undefined) {
        throw new BadInput('text', 'The designation was left out; give one, such as "C/2031 K7".');
      }
      const designation = parseDesignation(text);
      if (json === true) printJson(designation);
      else {
        print(
          designation.problem ?? `${designation.canonical ?? text}, packed ${designation.packed ?? 'none'}`,
        );
      }
    });

  elements
    .command('compare <OLD> <NEW>')
    .description('what a new file of elements changes in the place and brightness of each body')
    .option('--site <LAT,LON[,ELEVATION_M]>', 'decimal degrees, east positive, and metres')
    .option('--at <ISO_TIME>', 'the instant, with its offset')
    .option('--json', 'print JSON')
    .action((before: string, after: string, { site, at, json }: CompareOptions) => {
      if (site === undefined) {
        throw new BadInput('site', '--site was left out; give LAT,LON or LAT,LON,ELEVATION_M.');
      }
      if (at === undefined) {
        throw new BadInput('at', '--at was left out; give an instant such as 2027-03-01T20:00:00Z.');
      }
      const shifts = compareElements(
        elementFile(before).sets,
        elementFile(after).sets,
        parsePlace(site).observer,
        parseInstant(at),
      );
      if (json === true) printJson(shifts);
      else {
        for (const { body, scales, ...shift } of shifts.bodies) {
          const { shiftArcsec, positionAngleDeg, direction, magnitudeChange } = shift;
          print(
            `${body}: ${shiftArcsec.toFixed(1)} arcsec towards the ${direction} (position angle ${positionAngleDeg.toFixed(0)} degrees)` +
              (magnitudeChange === null ? '' : `; ${magnitudeChange.toFixed(2)} mag`),
          );
          for (const { words } of scales) print(`  ${words}`);
        }
      }
    });

  addElementsTrust(elements);
  addElementsLoad(elements);
}

function isTwoBody(value: boolean | string | undefined): boolean {
  if (value === undefined || value === false || value === 'false') return false;
  if (value === true || value === 'true') return true;
  throw new BadInput('twoBody', `twoBody was ${JSON.stringify(value)}; give true or false.`);
}
