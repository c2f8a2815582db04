// The migration engine, in WebAssembly: nothing native to download. Plain JavaScript, because it serves the
// set-up scripts, which run before anything is compiled, and a worker thread that Node loads by itself.
import { readFileSync, readdirSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3';
import { bindMigrationAwareSqlAdapterFactory } from '@prisma/driver-adapter-utils';

const filters = { externalTables: [], externalEnums: [] };

/**
 * Starts the engine on a database file (':memory:' for none), hands it to `use` and frees it afterwards.
 * `schema` is the text of schema.prisma.
 */
export async function withSchemaEngine(file, schema, use) {
  const binding = await import('@prisma/schema-engine-wasm/schema_engine_bg');
  const wasm = createRequire(import.meta.url)
    .resolve('@prisma/schema-engine-wasm/schema_engine_bg')
    .replace(/\.js$/, '.wasm');
  const { instance } = await WebAssembly.instantiate(readFileSync(wasm), {
    './schema_engine_bg.js': binding,
  });
  binding.__wbg_set_wasm(instance.exports);
  instance.exports.__wbindgen_start();
  const factory = bindMigrationAwareSqlAdapterFactory(new ScriptingSqlite({ url: file }));
  const engine = await binding.SchemaEngine.new(
    { datamodels: [['schema.prisma', schema]] },
    () => undefined,
    factory,
  );
  try {
    return await use(engine);
  } finally {
    engine.free();
  }
}

/** Applies every migration of the folder that the database lacks; gives the names of those applied. */
export async function applyMigrations(file, migrationsFolder, schema) {
  const migrationsList = readMigrations(migrationsFolder);
  return withSchemaEngine(file, schema, async (engine) => {
    const { appliedMigrationNames } = await engine.applyMigrations({ migrationsList, filters });
    return appliedMigrationNames;
  });
}

/** The SQL that turns a database with all of the folder's migrations into one of this schema; null: none needed. */
export async function missingMigration(migrationsFolder, schema) {
  const migrationsList = readMigrations(migrationsFolder);
  return withSchemaEngine(':memory:', schema, async (engine) => {
    const { exitCode, stdout } = await engine.diff({
      from:
        migrationsList.migrationDirectories.length === 0
          ? { tag: 'empty' }
          : { tag: 'migrations', ...migrationsList },
      to: { tag: 'schemaDatamodel', files: [{ path: 'schema.prisma', content: schema }] },
      script: true,
      exitCode: true,
      filters,
    });
    return exitCode === 2 ? stdout : null;
  });
}

/**
 * The engine replays whole migrations on its shadow database as single statements, which this driver refuses;
 * what comes without arguments is run as a script there.
 */
class ScriptingSqlite extends PrismaBetterSqlite3 {
  async connectToShadowDb() {
    const shadow = await super.connectToShadowDb();
    const single = shadow.executeRaw.bind(shadow);
    shadow.executeRaw = async (query) => {
      if (query.args.length > 0) return single(query);
      await shadow.executeScript(query.sql);
      return 0;
    };
    return shadow;
  }
}

/** Names of the folder's migrations, in the order they are applied. */
export function migrationNames(folder) {
  return readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name)
    .sort();
}

function readMigrations(folder) {
  return {
    baseDir: folder,
    lockfile: {
      path: 'migration_lock.toml',
      content: readFileSync(join(folder, 'migration_lock.toml'), 'utf8'),
    },
    shadowDbInitScript: '',
    migrationDirectories: migrationNames(folder).map((path) => ({
      path,
      migrationFile: {
        path: 'migration.sql',
        content: { tag: 'ok', value: readFileSync(join(folder, path, 'migration.sql'), 'utf8') },
      },
    })),
  };
}
