import { type Command } from 'commander';
import { type BodyTrust, bodyTrust, orbitTarget, perturbing } from '#club';
import { type ElementSet, findBody } from '#elements';
import { BadInput } from './badInput';
import { elementFile } from './elementFile';
import { parseDate, parseNumber } from './options';
import { print, printJson } from './output';

interface TrustOptions {
  readonly body?: string;
  readonly date?: string;
  readonly finder: string;
  readonly eyepiece: string;
  readonly json?: boolean;
}

const DAY_MS = 86_400_000;

export function addElementsTrust(elements: Command): void {
  elements
    .command('trust <FILE>')
    .description('how far the places of the bodies in a file can be trusted on an evening')
    .option('--body <NAME>', 'only this one')
    .option('--date <YYYY-MM-DD>', 'the evening')
    .option('--finder <DEG>', "width of the finder's field", '6')
    .option('--eyepiece <DEG>', "width of the eyepiece's field", '0.75')
    .option('--json', 'print JSON')
    .action((file: string, { body, date, finder, eyepiece, json }: TrustOptions) => {
      if (date === undefined) throw new BadInput('date', '--date was left out; give it as YYYY-MM-DD.');
      const evening = parseDate('date', date);
      const fields = {
        finderDeg: parseNumber('finder', finder, 0.01, 180, 'degrees'),
        eyepieceDeg: parseNumber('eyepiece', eyepiece, 0.01, 180, 'degrees'),
      };
      const perturbed = perturbing();
      const bodies = chosen(elementFile(file).sets, body).map((set): BodyTrust => {
        const { kind, designation, source, observed, epochTtJd } = set;
        const trusted = { target: orbitTarget(set), kind, designation, source, observed, epochTtJd };
        return bodyTrust(trusted, Date.parse(evening) + DAY_MS, fields, perturbed);
      });
      if (json === true) printJson({ date: evening, bodies });
      else for (const { words, motion } of bodies) print(`${words} ${motion.words}`);
    });
}

function chosen(sets: readonly ElementSet[], body: string | undefined): readonly ElementSet[] {
  if (body === undefined) return sets;
  const found = findBody(sets, body);
  if (found !== null) return [found];
  const there = sets.slice(0, 20).map(({ label }) => label);
  throw new BadInput(
    'body',
    `--body was "${body}"; give a body of the file: ${there.length === 0 ? 'it holds none' : there.join(', ')}.`,
  );
}
