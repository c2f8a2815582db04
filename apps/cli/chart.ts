import { writeFileSync } from 'node:fs';
import { extname } from 'node:path';
import { type Command } from 'commander';
import { type ChartOrder, chartScene, drawChart, namedTarget, programVersion } from '#club';
import { BadInput } from './badInput';
import { elementFile } from './elementFile';
import { parseChoice, parseInstant, parseNumber, parsePlace, zoneOf } from './options';
import { printJson, say } from './output';
import { siteFromDatabase } from './siteFromDatabase';

interface ChartOptions {
  readonly target?: string;
  readonly elements?: string;
  readonly site?: string;
  readonly siteName?: string;
  readonly zone?: string;
  readonly at?: string;
  readonly scale: string;
  readonly field?: string;
  readonly orientation: string;
  readonly paper: string;
  readonly out?: string;
  readonly db?: string;
  readonly json?: boolean;
}

export function addChart(program: Command): void {
  program
    .command('chart')
    .description('a finder chart of one target, as PDF or SVG')
    .option('--target <NAME>', 'a planet, the Moon, a catalogued object or a body of --elements')
    .option('--elements <FILE>', 'orbital elements in any of the known formats')
    .option('--site <LAT,LON[,ELEVATION_M]>', 'decimal degrees, east positive, and metres')
    .option('--site-name <NAME>', 'a site of the database')
    .option('--zone <IANA_ZONE>', 'time zone of the printed times (else that of the place)')
    .option('--at <ISO_TIME>', 'the instant for which the chart holds, with its offset')
    .option('--scale <SCALE>', 'eye, binocular or eyepiece', 'binocular')
    .option('--field <DEG>', "width of the field in degrees (else the scale's usual)")
    .option('--orientation <WAY>', 'upright, rotated or mirrored', 'upright')
    .option('--paper <SIZE>', 'a4 or letter', 'a4')
    .option('--out <FILE>', 'where to write it: .pdf or .svg')
    .option('--db <FILE>', 'another database')
    .option('--json', 'print the scene as JSON')
    .action(async (options: ChartOptions) => {
      const order = await chartOrder(options);
      const scene = chartScene(order);
      if (options.out !== undefined) {
        const { body } = await drawChart(scene, order, formatOf(options.out));
        writeFileSync(options.out, body);
        if (options.json !== true) say(`Written: ${options.out}`);
      }
      if (options.json === true) printJson(scene);
    });
}

async function chartOrder(options: ChartOptions): Promise<ChartOrder> {
  const { target, at, site, siteName, out, json } = options;
  if (target === undefined) {
    throw new BadInput('target', '--target was left out; give the name of what is to be found.');
  }
  if (at === undefined) {
    throw new BadInput('at', '--at was left out; give an instant such as 2027-03-01T20:00:00Z.');
  }
  if (out === undefined && json !== true) {
    throw new BadInput('out', '--out was left out; give the file to write, ending in .pdf or .svg.');
  }
  if (out !== undefined) formatOf(out);
  const scale = parseChoice('scale', options.scale, ['eye', 'binocular', 'eyepiece']);
  const orientation = parseChoice('orientation', options.orientation, ['upright', 'rotated', 'mirrored']);
  const paper = parseChoice('paper', options.paper, ['a4', 'letter']);
  const fieldDeg =
    options.field === undefined ? null : parseNumber('field', options.field, 0.1, 120, 'degrees');
  const utcMs = parseInstant(at);
  const sets = options.elements === undefined ? [] : elementFile(options.elements).sets;
  return {
    target: namedTarget(target, sets),
    ...(await standOf(options.db, site, siteName, options.zone)),
    utcMs,
    scale,
    fieldDeg,
    orientation,
    paper,
    occasion: null,
    computedUtcMs: Date.now(),
    programVersion: programVersion(),
  };
}

async function standOf(
  db: string | undefined,
  site: string | undefined,
  siteName: string | undefined,
  zone: string | undefined,
): Promise<Pick<ChartOrder, 'observer' | 'zone' | 'siteName' | 'skyline'>> {
  if (siteName !== undefined) {
    const found = await siteFromDatabase(db, siteName);
    return {
      observer: found.observer,
      zone: zone ?? found.zone,
      siteName: found.name,
      skyline: found.horizon,
    };
  }
  if (site === undefined) {
    throw new BadInput(
      'site',
      '--site was left out; give LAT,LON or LAT,LON,ELEVATION_M, or --site-name NAME.',
    );
  }
  const place = parsePlace(site);
  const { latitudeDeg, longitudeDeg } = place;
  const words = `${Math.abs(latitudeDeg).toFixed(2)}° ${latitudeDeg < 0 ? 'S' : 'N'}, ${Math.abs(longitudeDeg).toFixed(2)}° ${longitudeDeg < 0 ? 'W' : 'E'}`;
  return { observer: place.observer, zone: zoneOf(zone, place), siteName: words };
}

function formatOf(file: string): 'pdf' | 'svg' {
  const ending = extname(file).toLowerCase();
  if (ending === '.pdf') return 'pdf';
  if (ending === '.svg') return 'svg';
  throw new BadInput('out', `--out was "${file}"; give a file that ends in .pdf or .svg.`);
}
