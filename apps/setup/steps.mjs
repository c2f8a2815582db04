// Steps that turn a fresh clone into something that runs. Each looks first whether its work is done,
// so that a second run does nothing twice. Plain JavaScript: it runs before anything is installed.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, relative, sep } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

export const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const sourceFolders = ['apps', 'libs', 'demo-data', 'test'];

/** Installs the packages of package-lock.json unless exactly those are installed. */
export function ensurePackages() {
  const stamp = join(root, 'node_modules', '.duskwright-lock');
  const wanted = fingerprint([join(root, 'package-lock.json')]) + process.version;
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  say('Installing packages (once; a minute or two) …');
  run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  writeFileSync(stamp, wanted);
}

/** Generates the database client from prisma/schema.prisma unless it was made from this very schema. */
export function ensureDatabaseClient() {
  const schema = join(root, 'prisma', 'schema.prisma');
  const generated = join(root, 'libs', 'club', 'database', 'generated');
  const stamp = join(generated, '.schema');
  const wanted = fingerprint([schema, join(root, 'package-lock.json')]);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  say('Preparing the database client …');
  rmSync(generated, { recursive: true, force: true });
  // The native schema engine is not needed to generate the client, and may not be downloadable.
  run(
    process.execPath,
    [join(root, 'node_modules', 'prisma', 'build', 'index.js'), 'generate', '--schema', schema, '--no-hints'],
    {
      PRISMA_SCHEMA_ENGINE_BINARY: process.platform === 'win32' ? process.execPath : '/bin/true',
      CHECKPOINT_DISABLE: '1',
      PRISMA_HIDE_UPDATE_MESSAGE: '1',
    },
  );
  writeFileSync(stamp, wanted);
}

/** Compiles every changed TypeScript file to dist/, same tree, and drops what has no source any more. */
export async function compile() {
  const swc = await import(pathToFileURL(join(root, 'node_modules', '@swc', 'core', 'index.js')).href);
  const { transformFileSync } = swc.default;
  const options = JSON.parse(readFileSync(join(root, '.swcrc'), 'utf8'));
  delete options.$schema;
  const dist = join(root, 'dist');
  // Paths of the compiled files hang on the compiler's options: other options, everything anew.
  const stamp = join(dist, '.options');
  const wanted = fingerprint([join(root, '.swcrc'), join(root, 'package-lock.json')]);
  if (!existsSync(stamp) || readFileSync(stamp, 'utf8') !== wanted)
    rmSync(dist, { recursive: true, force: true });

  const kept = new Set([stamp]);
  let compiled = 0;
  for (const source of sourceFolders.flatMap((folder) => typescriptFiles(join(root, folder)))) {
    const target = join(dist, relative(root, source).replace(/\.ts$/, '.js'));
    kept.add(target).add(`${target}.map`);
    if (existsSync(target) && statSync(target).mtimeMs >= statSync(source).mtimeMs) continue;
    const { code, map } = transformFileSync(source, {
      ...options,
      swcrc: false,
      sourceFileName: relative(dirname(target), source).split(sep).join('/'),
    });
    mkdirSync(dirname(target), { recursive: true });
    writeFileSync(`${target}.map`, map);
    writeFileSync(target, `${code}\n//# sourceMappingURL=${target.split(sep).pop()}.map\n`);
    compiled += 1;
  }
  if (existsSync(dist)) {
    for (const file of allFiles(dist)) if (!kept.has(file)) rmSync(file);
  }
  mkdirSync(dist, { recursive: true });
  writeFileSync(stamp, wanted);
  if (compiled > 0) say(`Compiled ${compiled} files.`);
}

/** Packages, database client and compiled code, in that order. */
export async function prepare() {
  ensurePackages();
  ensureDatabaseClient();
  await compile();
}

/** Runs a command with this terminal and stops everything when it fails. */
export function run(command, args, extraEnvironment = {}) {
  const result = spawnSync(command, args, {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...extraEnvironment },
    shell: process.platform === 'win32' && command === 'npm',
  });
  if (result.status !== 0) {
    say(`"${command} ${args.join(' ')}" failed${result.error ? `: ${result.error.message}` : ''}.`);
    process.exit(result.status ?? 1);
  }
}

/** Progress goes to standard error: standard output belongs to results. */
export function say(message) {
  process.stderr.write(`${message}\n`);
}

function fingerprint(files) {
  const hash = createHash('sha256');
  for (const file of files) hash.update(readFileSync(file));
  return hash.digest('hex');
}

function typescriptFiles(folder) {
  return existsSync(folder)
    ? allFiles(folder).filter(
        (file) => file.endsWith('.ts') && !file.endsWith('.d.ts') && !file.endsWith('.spec.ts'),
      )
    : [];
}

function allFiles(folder) {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath ?? entry.path, entry.name));
}
