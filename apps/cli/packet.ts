import { writeFileSync } from 'node:fs';
import { type Command } from 'commander';
import { closePacketPool, type PacketInput, printPacket } from '#club';
import { BadInput } from './badInput';
import { printJson, say } from './output';
import { withDatabase } from './siteFromDatabase';

interface PacketOptions {
  readonly event?: string;
  readonly out?: string;
  readonly sheets?: string;
  readonly scales?: string;
  readonly paper?: string;
  readonly look?: string;
  readonly break: readonly string[];
  readonly db?: string;
  readonly json?: boolean;
}

export function addPacket(program: Command): void {
  program
    .command('packet')
    .description('the printed sheets of an event as one PDF')
    .option('--event <ID>', 'the event')
    .option('--out <FILE>', 'where to write it: .pdf')
    .option('--sheets <NAMES>', 'cover,runSheet,finder,station,site,handout,poster: any of them in any order')
    .option('--scales <SCALES>', 'finder charts at eye,binocular,eyepiece (else binocular)')
    .option('--paper <SIZE>', 'a4 or letter (else a4)')
    .option('--look <MINUTES>', 'the shortest look at a target (else 10)')
    .option(
      '--break <FROM-TO>',
      'local times in which nobody shows anything, such as 21:00-21:15; may be given again',
      (value: string, before: readonly string[]) => [...before, value],
      [],
    )
    .option('--db <FILE>', 'another database')
    .option('--json', 'print what was written as JSON')
    .action(async (options: PacketOptions) => {
      const { out, db, json } = options;
      if (out?.toLowerCase().endsWith('.pdf') !== true) {
        throw new BadInput(
          'out',
          `--out was ${out === undefined ? 'left out' : `"${out}"`}; give a file that ends in .pdf.`,
        );
      }
      const wishes = wishesOf(options);
      const onProgress = (done: number, count: number) => {
        if (process.stderr.isTTY) process.stderr.write(`\rSheet ${String(done)} of ${String(count)} `);
      };
      try {
        const packet = await withDatabase(db, (database) => printPacket(database, wishes, { onProgress }));
        if (process.stderr.isTTY) process.stderr.write('\r');
        writeFileSync(out, packet.body);
        const { revision, sheets } = packet;
        if (json === true) printJson({ out, revision, sheets, bytes: packet.body.length });
        else say(`Written: ${out}, ${String(sheets)} sheet${sheets === 1 ? '' : 's'}, revision ${revision}.`);
      } finally {
        await closePacketPool();
      }
    });
}

function wishesOf({ event, sheets, scales, paper, look, break: breaks }: PacketOptions): PacketInput {
  if (event === undefined) throw new BadInput('event', '--event was left out; give the id of an event.');
  return {
    eventId: event,
    ...(sheets !== undefined && { sheets: listOf(sheets) as NonNullable<PacketInput['sheets']> }),
    ...(scales !== undefined && { scales: listOf(scales) as NonNullable<PacketInput['scales']> }),
    ...(paper !== undefined && { paper: paper as NonNullable<PacketInput['paper']> }),
    ...(look !== undefined && { leastLookMinutes: Number(look) }),
    breaks: breaks.map((words) => {
      const [from = '', to = ''] = words.split('-');
      return { from, to };
    }),
  };
}

/** The words between commas; what they may be is checked where the packet is. */
function listOf(words: string): string[] {
  return words.split(',').map((word) => word.trim());
}
