// `node apps/setup/migration.mjs NAME` writes the next migration: the SQL between the migrations there are
// and prisma/schema.prisma. NAME says in the past tense what changed, such as added_rain_dates.
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { missingMigration } from '../../libs/club/database/schemaEngine.mjs';
import { root, say } from './steps.mjs';

const name = process.argv[2] ?? '';
if (!/^[a-z][a-z0-9_]*$/.test(name)) {
  say(
    `The migration's name was "${name}"; give small letters, digits and underscores, such as added_rain_dates.`,
  );
  process.exit(2);
}
const folder = join(root, 'prisma', 'migrations');
mkdirSync(folder, { recursive: true });
writeFileSync(
  join(folder, 'migration_lock.toml'),
  '# Says which kind of database the migrations were written for.\nprovider = "sqlite"\n',
);
const sql = await missingMigration(folder, readFileSync(join(root, 'prisma', 'schema.prisma'), 'utf8'));
if (sql === null) {
  say('The schema is what the migrations make; no migration is needed.');
} else {
  const stamp = new Date().toISOString().replace(/\D/g, '').slice(0, 14);
  const migration = join(folder, `${stamp}_${name}`);
  mkdirSync(migration);
  writeFileSync(join(migration, 'migration.sql'), sql);
  say(`Wrote prisma/migrations/${stamp}_${name}/migration.sql.`);
}
