import { spawnSync } from 'node:child_process';
import { projectRoot } from '#club';
import { measurement, type Measurement, median, timed } from './measurement';

/** `sky` from the command line, everything from the shell's point of view, beside npm and Node doing nothing. */
export function benchSkyCold(): Promise<Measurement[]> {
  const question = ['--target', 'Mars', '--site', '47.1,8.2,600', '--at', '2027-03-01T20:00:00Z', '--json'];
  const sky = ['run', '--silent', 'duskwright', '--', 'sky', ...question];
  const run = (args: readonly string[]) =>
    timed(() => {
      const { status, stderr } = spawnSync('npm', args, { cwd: projectRoot, encoding: 'utf8' });
      if (status !== 0) throw new Error(`npm ${args.join(' ')} failed: ${stderr}`);
    });
  run(sky);
  const cold = median(Array.from({ length: 5 }, () => run(sky)));
  const bare = median(
    Array.from({ length: 5 }, () => run(['run', '--silent', 'duskwright', '--', '--version'])),
  );
  return Promise.resolve([
    measurement('sky-cold', cold, 'ms', '`duskwright --version` the same way', bare, 'median of 5'),
  ]);
}
