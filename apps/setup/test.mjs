// `npm test`: sets up what the tests need, then runs every test; arguments go to Jest.
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { prepare, root, run, say } from './steps.mjs';

/** Programs the tests use to look at what the project makes, and the Debian package of each. */
const programs = { chromium: 'chromium', qpdf: 'qpdf', pdffonts: 'poppler-utils' };

function ensurePrograms() {
  const missing = Object.entries(programs).filter(([program]) => !onPath(program));
  if (missing.length === 0) return;
  const packages = [...new Set(missing.map(([, debianPackage]) => debianPackage))];
  if (process.getuid?.() === 0 && existsSync('/etc/debian_version')) {
    say(`Installing ${packages.join(', ')} for the tests …`);
    run('apt-get', ['update', '-qq']);
    run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...packages], {
      DEBIAN_FRONTEND: 'noninteractive',
    });
    return;
  }
  say(
    `The tests need ${missing.map(([program]) => program).join(', ')}. ` +
      `On Debian or Ubuntu: sudo apt-get install ${packages.join(' ')}. ` +
      'Elsewhere install Chromium, qpdf and poppler and put them on the PATH.',
  );
  process.exit(1);
}

function onPath(program) {
  const folders = (process.env.PATH ?? '').split(process.platform === 'win32' ? ';' : ':');
  return folders.some((folder) => folder !== '' && existsSync(join(folder, program)));
}

await prepare();
ensurePrograms();
const jest = spawnSync(
  process.execPath,
  [
    '--disable-warning=ExperimentalWarning',
    join(root, 'node_modules', 'jest', 'bin', 'jest.js'),
    ...process.argv.slice(2),
  ],
  { cwd: root, stdio: 'inherit' },
);
process.exit(jest.status ?? 1);
