import { projectRoot } from '#club';
import { type ChildProcess, spawn, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

// These look at the compiled program, which `npm test` builds first.
const dist = join(projectRoot, 'dist');

describe('the server as a program', () => {
  const folder = mkdtempSync(join(tmpdir(), 'duskwright-'));
  const environment = { ...process.env, DUSKWRIGHT_DB: join(folder, 'club.db'), DUSKWRIGHT_PORT: '0' };
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });

  const start = (extra: Readonly<Record<string, string>> = {}): ChildProcess =>
    spawn(process.execPath, [join(dist, 'apps', 'server', 'main.js')], { env: { ...environment, ...extra } });

  async function ready(server: ChildProcess): Promise<string> {
    let said = '';
    server.stdout!.setEncoding('utf8');
    for await (const text of server.stdout!) {
      said += String(text);
      const address = /http:\/\/localhost:\d+/.exec(said)?.[0];
      if (address !== undefined) return address;
    }
    throw new Error(`The server ended without an address; it said "${said}".`);
  }

  const ended = (server: ChildProcess): Promise<number | null> =>
    new Promise((resolve) =>
      server.once('exit', (code) => {
        resolve(code);
      }),
    );

  const read = async (address: string): Promise<unknown> => (await fetch(address)).json();

  it('loads the demo club once, keeps it, and stops when told to', async () => {
    const first = start();
    const address = await ready(first);
    const club = await read(`${address}/api/club`);
    const sites = (await read(`${address}/api/sites`)) as readonly unknown[];
    expect(sites.length).toBeGreaterThanOrEqual(4);
    const firstEnd = ended(first);
    first.kill('SIGTERM');
    expect(await firstEnd).toBe(0);

    const second = start();
    const again = await ready(second);
    expect(await read(`${again}/api/club`)).toEqual(club);
    expect(await read(`${again}/api/sites`)).toEqual(sites);
    const secondEnd = ended(second);
    second.kill('SIGINT');
    expect(await secondEnd).toBe(0);
  }, 120_000);

  it('says which setting is wrong, and does not start', () => {
    const run = spawnSync(process.execPath, [join(dist, 'apps', 'server', 'main.js')], {
      env: { ...environment, DUSKWRIGHT_PORT: '70000' },
      encoding: 'utf8',
    });
    expect(run.status).toBe(1);
    expect(run.stderr).toContain('DUSKWRIGHT_PORT was "70000"; give a whole number from 0 to 65535.');
  }, 30_000);
});

it('loads neither database nor server nor worker pool for commands that need none of them', () => {
  const script = `
    require(${JSON.stringify(join(dist, 'libs', 'club', 'index.js'))});
    const heavy = /node_modules.(@prisma|better-sqlite3|@nestjs|piscina)|database.generated/;
    process.stdout.write(JSON.stringify(Object.keys(require.cache).filter((file) => heavy.test(file))));`;
  const { stdout } = spawnSync(process.execPath, ['-e', script], { encoding: 'utf8' });
  expect(JSON.parse(stdout)).toEqual([]);
}, 30_000);
