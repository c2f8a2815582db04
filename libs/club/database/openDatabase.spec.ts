import BetterSqlite3 from 'better-sqlite3';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { projectRoot } from '../projectRoot';
import { closeDatabase, openDatabase } from './openDatabase';

describe('openDatabase', () => {
  let folder: string;
  let file: string;
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'duskwright-'));
    file = join(folder, 'below', 'club.db');
  });
  afterEach(() => {
    rmSync(folder, { recursive: true });
  });

  const instant = new Date('2027-01-02T03:04:05.678Z');
  const club = { name: 'Société du Crépuscule', createdAt: instant, updatedAt: instant };

  it('makes the folder and the tables, and a second opening keeps what was written', async () => {
    const first = await openDatabase({ file });
    await first.client.club.create({ data: club });
    await closeDatabase(first);

    const second = await openDatabase({ file });
    expect(await second.client.club.findMany()).toEqual([expect.objectContaining(club)]);
    await closeDatabase(second);

    const raw = new BetterSqlite3(file, { readonly: true });
    expect(raw.pragma('journal_mode', { simple: true })).toBe('wal');
    const names = raw.prepare('SELECT migration_name FROM _prisma_migrations').pluck().all();
    const written = readdirSync(join(projectRoot, 'prisma', 'migrations')).filter((name) =>
      /^\d{14}_/.test(name),
    );
    expect(names).toEqual(written.sort());
    raw.close();
  });

  it('holds rows to their owners', async () => {
    const database = await openDatabase({ file });
    await expect(
      database.client.clubDate.create({
        data: { clubId: 'nobody', date: '2027-05-01', name: 'Fair', createdAt: instant },
      }),
    ).rejects.toMatchObject({ code: 'P2003' });
    await closeDatabase(database);
  });

  it('tells of every commit, its own and those of others, and of nothing else', async () => {
    const database = await openDatabase({ file });
    const { changes, client } = database;
    const before = changes.version();
    await client.club.findMany();
    expect(changes.version()).toBe(before);
    await client.club.create({ data: club });
    const written = changes.version();
    expect(written).not.toBe(before);
    const other = new BetterSqlite3(file);
    other.prepare("UPDATE Club SET name = 'Another'").run();
    other.close();
    expect(changes.version()).not.toBe(written);
    await closeDatabase(database);
  });

  it('leaves a file of a newer program alone', async () => {
    await closeDatabase(await openDatabase({ file }));
    const raw = new BetterSqlite3(file);
    raw
      .prepare(
        "INSERT INTO _prisma_migrations (id, checksum, migration_name, finished_at) VALUES ('x', 'x', '29990101000000_later', 1)",
      )
      .run();
    raw.close();
    await expect(openDatabase({ file })).rejects.toThrow('29990101000000_later');
  });

  it('has migrations that make exactly the tables of the schema', () => {
    const script = `
      import { readFileSync } from 'node:fs';
      import { missingMigration } from './libs/club/database/schemaEngine.mjs';
      const sql = await missingMigration('prisma/migrations', readFileSync('prisma/schema.prisma', 'utf8'));
      process.stdout.write(JSON.stringify(sql));`;
    const run = spawnSync(process.execPath, ['--input-type=module', '-e', script], {
      cwd: projectRoot,
      encoding: 'utf8',
    });
    expect(run.stderr).toBe('');
    expect(JSON.parse(run.stdout)).toBeNull();
  });
});
