import { benchChart } from './chart';
import { benchElementsRead } from './elementsRead';
import { type Measurement } from './measurement';
import { benchPacket } from './packet';
import { benchSeason } from './season';
import { benchSkyCold } from './skyCold';
import { benchStarts } from './starts';
import { benchFixedTracks, benchPerturbedTracks } from './tracks';

/** What is measured, by the names it gives. Starting fresh clones takes minutes and is run when named. */
const benches: readonly {
  readonly names: readonly string[];
  readonly byName?: true;
  readonly run: () => Promise<Measurement[]>;
}[] = [
  { names: ['season-search', 'season-altitudes', 'season-memory'], run: benchSeason },
  { names: ['track-fixed-bodies'], run: benchFixedTracks },
  { names: ['track-perturbed'], run: benchPerturbedTracks },
  { names: ['elements-read'], run: benchElementsRead },
  { names: ['sky-cold'], run: benchSkyCold },
  { names: ['chart-warm'], run: benchChart },
  { names: ['packet', 'packet-memory'], run: benchPacket },
  { names: ['first-start', 'second-start'], byName: true, run: benchStarts },
];

async function main(args: readonly string[]): Promise<void> {
  const json = args.includes('--json');
  const wanted = args.filter((arg) => !arg.startsWith('--'));
  const known = benches.flatMap(({ names }) => names);
  const unknown = wanted.filter((name) => !known.includes(name));
  if (unknown.length > 0) {
    process.stderr.write(`There is no measurement ${unknown.join(', ')}; there are ${known.join(', ')}.\n`);
    process.exitCode = 2;
    return;
  }
  const chosen = benches.filter(({ names, byName }) =>
    wanted.length === 0 ? byName !== true : names.some((name) => wanted.includes(name)),
  );
  const results: Measurement[] = [];
  for (const { run } of chosen) {
    for (const result of await run()) {
      results.push(result);
      if (!json) process.stdout.write(`${inWords(result)}\n`);
    }
  }
  if (json) process.stdout.write(`${JSON.stringify(results, null, 2)}\n`);
}

function inWords({ name, value, unit, comparedTo, comparedValue, ratio, note }: Measurement): string {
  return (
    `${name}: ${value} ${unit}; ${comparedTo}: ${comparedValue} ${unit}; ratio ${ratio}` +
    (note === undefined ? '' : `\n    ${note}`)
  );
}

void main(process.argv.slice(2));
