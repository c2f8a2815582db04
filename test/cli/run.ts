import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

export const root = join(__dirname, '..', '..');

export interface Ran {
  readonly status: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs a command of the built program as another program would, without npm in between. */
export function duskwright(args: readonly string[], input = ''): Ran {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [join(root, 'dist', 'apps', 'cli', 'main.js'), ...args],
    { cwd: root, input, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 },
  );
  return { status, stdout, stderr };
}

/** The JSON that a command prints; it must succeed. */
export function answer<T>(args: readonly string[], input = ''): T {
  const { status, stdout, stderr } = duskwright([...args, '--json'], input);
  if (status !== 0) throw new Error(`Exit status ${status}: ${stderr}`);
  return JSON.parse(stdout) as T;
}
