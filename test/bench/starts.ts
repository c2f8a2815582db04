import { execFileSync, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { projectRoot } from '#club';
import { measurement, type Measurement } from './measurement';

const LIMIT_MS = 15 * 60_000;

/** From a fresh clone with an empty package cache to the first page, and once more from the same clone. */
export async function benchStarts(): Promise<Measurement[]> {
  const folder = mkdtempSync(join(tmpdir(), 'duskwright-start-'));
  try {
    execFileSync('git', ['clone', '--quiet', projectRoot, join(folder, 'clone')]);
    const first = await startToPage(folder);
    const second = await startToPage(folder);
    return [
      measurement('first-start', first / 1000, 's', 'bound', 240, 'cold package cache'),
      measurement('second-start', second / 1000, 's', 'bound', 10),
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

async function startToPage(folder: string): Promise<number> {
  const port = await freePort();
  const started = performance.now();
  const server = spawn('npm', ['start'], {
    cwd: join(folder, 'clone'),
    stdio: 'ignore',
    detached: true,
    env: { ...process.env, DUSKWRIGHT_PORT: String(port), npm_config_cache: join(folder, 'cache') },
  });
  try {
    while (performance.now() - started < LIMIT_MS) {
      const answer = await fetch(`http://127.0.0.1:${port}/`).catch(() => null);
      if (answer?.ok === true && (await answer.text()).includes('</html>')) {
        return performance.now() - started;
      }
      await wait(50);
    }
    throw new Error('No page came within 15 minutes.');
  } finally {
    process.kill(-server.pid!, 'SIGTERM');
    await wait(1000);
  }
}

function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer().once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => {
        if (address !== null && typeof address === 'object') resolve(address.port);
        else reject(new Error('No port was given.'));
      });
    });
  });
}
