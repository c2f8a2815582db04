import { createReadStream, createWriteStream, mkdtempSync, rmSync } from 'node:fs';
import { once } from 'node:events';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readElementStream } from '#elements';
import { measurement, type Measurement, median } from './measurement';

const LINES = 200_000;
const RUNS = 3;

/**
 * Lines a second of the element reader on an invented minor-planet file, every set completed, beside a reader
 * that only splits the same file into lines; and with one body picked out of it.
 */
export async function benchElementsRead(): Promise<Measurement[]> {
  const folder = mkdtempSync(join(tmpdir(), 'duskwright-elements-'));
  try {
    const file = join(folder, 'minor-planets.txt');
    await writeInvented(file);
    await readAll(file);
    await splitOnly(file);
    const reading: number[] = [];
    const picking: number[] = [];
    const splitting: number[] = [];
    let peakMb = 0;
    for (let run = 0; run < RUNS; run++) {
      // Splitting is over in a moment, so one look at it says little.
      for (let look = 0; look < 3; look++) splitting.push(await rate(() => splitOnly(file)));
      const watch = watchMemory();
      reading.push(await rate(() => readAll(file)));
      peakMb = Math.max(peakMb, watch.stop());
      picking.push(await rate(() => readAll(file, ['123456'])));
    }
    const read = median(reading);
    const split = median(splitting);
    const note =
      `${String(LINES)} lines, each set completed; memory of the whole process at most ${peakMb.toFixed(0)} MB ` +
      `meanwhile; picking out one body ${(median(picking) / 1000).toFixed(0)} thousand lines/s`;
    return [
      {
        ...measurement(
          'elements-read',
          read,
          'lines/s',
          'splitting the same file into lines, nothing else',
          split,
          note,
        ),
        // Of a rate more is better.
        ratio: Number((read / split).toPrecision(4)),
      },
    ];
  } finally {
    rmSync(folder, { recursive: true });
  }
}

async function rate(work: () => Promise<number>): Promise<number> {
  const start = performance.now();
  const lines = await work();
  if (lines !== LINES) throw new Error(`${String(lines)} lines came of ${String(LINES)}.`);
  return (lines * 1000) / (performance.now() - start);
}

/** Reads every line and gives their number; throws where a line of the invented file is not understood. */
async function readAll(file: string, wanted?: readonly string[]): Promise<number> {
  let lines = 0;
  let sets = 0;
  for await (const batch of readElementStream(
    createReadStream(file),
    wanted === undefined ? {} : { wanted },
  )) {
    if (batch.problems.length > 0) throw new Error(JSON.stringify(batch.problems[0]));
    sets += batch.sets.length;
    lines = batch.lines;
  }
  const due = wanted === undefined ? LINES : wanted.length;
  if (sets !== due) throw new Error(`${String(sets)} sets came of ${String(due)}.`);
  return lines;
}

async function splitOnly(file: string): Promise<number> {
  let lines = 0;
  let length = 0;
  let rest = '';
  for await (const chunk of createReadStream(file, 'latin1')) {
    const text = rest + (chunk as string);
    let from = 0;
    for (let to = text.indexOf('\n'); to >= 0; to = text.indexOf('\n', from)) {
      length += text.slice(from, to).length;
      lines++;
      from = to + 1;
    }
    rest = text.slice(from);
  }
  if (length === 0) throw new Error('The file is empty.');
  return lines;
}

/** The largest resident memory of the process, in MB, looked at every few milliseconds. */
function watchMemory(): { readonly stop: () => number } {
  let most = process.memoryUsage.rss();
  const timer = setInterval(() => {
    most = Math.max(most, process.memoryUsage.rss());
  }, 5);
  return {
    stop: () => {
      clearInterval(timer);
      return most / 1_048_576;
    },
  };
}

/** Invented numbered minor planets in the published one-line format, all columns filled. */
async function writeInvented(file: string): Promise<void> {
  const out = createWriteStream(file);
  let block = '';
  for (let i = 0; i < LINES; i++) {
    block += `${inventedLine(i + 1)}\n`;
    if (block.length < 1 << 20 && i < LINES - 1) continue;
    if (!out.write(block)) await once(out, 'drain');
    block = '';
  }
  out.end();
  await once(out, 'close');
}

/** Scattered but repeatable, 0 to below 1. */
function scatter(seed: number): number {
  const x = Math.sin(seed) * 43_758.5453;
  return x - Math.floor(x);
}

const GAUSS_DEG_PER_DAY = 0.9856076686;

function inventedLine(number: number): string {
  const share = (part: number): number => scatter(number * 7 + part);
  const axis = 1.8 + 1.6 * share(1);
  const motion = GAUSS_DEG_PER_DAY / axis ** 1.5;
  const angle = (part: number, most: number): string => (most * share(part)).toFixed(5).padStart(9);
  const parts = [
    packedNumber(number).padEnd(7),
    (8 + 12 * share(2)).toFixed(2).padStart(5),
    ' 0.15',
    'K31AB',
    angle(3, 360),
    ` ${angle(4, 360)}`,
    ` ${angle(5, 360)}`,
    ` ${angle(6, 30)}`,
    ` ${(0.4 * share(7)).toFixed(7)}`,
    motion.toFixed(8).padStart(11),
    axis.toFixed(7).padStart(11),
    ` 0 MPO999993   412   9 2009-2030 0.48 M-v 3Ek Invented   0000 `,
  ];
  const orbit = parts.join(' ').slice(0, 166).padEnd(166);
  return `${orbit}${`(${String(number)})`.padStart(8)}`.padEnd(194) + '20301104';
}

const BASE_62 = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** Five places: digits, from 100000 on with a letter in front. */
function packedNumber(number: number): string {
  if (number < 100_000) return String(number).padStart(5, '0');
  return `${BASE_62[Math.floor(number / 10_000)]!}${String(number % 10_000).padStart(4, '0')}`;
}
