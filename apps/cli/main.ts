import { Command, CommanderError } from 'commander';
import { programVersion } from '#club/sky';
import { badInputOf } from './badInput';
import { say } from './output';

/** Each command's own file is loaded only when it is called, so that a quick question has a quick answer. */
const commands: Readonly<Record<string, (program: Command) => Promise<void>>> = {
  sky: async (program) => {
    (await import('./sky.js')).addSky(program);
  },
  evening: async (program) => {
    (await import('./evening.js')).addEvening(program);
  },
  nights: async (program) => {
    (await import('./nights.js')).addNights(program);
  },
  elements: async (program) => {
    (await import('./elements.js')).addElements(program);
  },
  chart: async (program) => {
    (await import('./chart.js')).addChart(program);
  },
  packet: async (program) => {
    (await import('./packet.js')).addPacket(program);
  },
  calendar: async (program) => {
    (await import('./calendar.js')).addCalendar(program);
  },
  demo: async (program) => {
    (await import('./demo.js')).addDemo(program);
  },
};

/** Exit statuses of the contract: 0 good, 2 bad input with nothing written, 1 any other failure. */
async function main(args: readonly string[]): Promise<void> {
  const program = new Command('duskwright')
    .description(
      "Picks the evenings, prints the charts and shares the schedule of a club's public viewing nights.",
    )
    .version(programVersion())
    .showHelpAfterError('(add --help for the options)')
    .exitOverride()
    .configureOutput({ writeErr: (text) => process.stderr.write(text) });
  const named = commands[args[0] ?? ''];
  for (const add of named === undefined ? Object.values(commands) : [named]) await add(program);
  for (const command of program.commands) command.exitOverride().copyInheritedSettings(program);
  try {
    await program.parseAsync(args, { from: 'user' });
  } catch (error) {
    if (error instanceof CommanderError) {
      process.exitCode = error.exitCode === 0 ? 0 : 2;
      return;
    }
    const wrong = badInputOf(error);
    if (wrong !== null) {
      say(wrong.message);
      process.exitCode = 2;
      return;
    }
    say(error instanceof Error ? error.message : String(error));
    process.exitCode = 1;
  }
}

void main(process.argv.slice(2));
