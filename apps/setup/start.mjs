// `npm start`: from a fresh clone to the first page with one command.
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { prepare, root } from './steps.mjs';

await prepare();
const server = spawn(
  process.execPath,
  ['--enable-source-maps', join(root, 'dist', 'apps', 'server', 'main.js')],
  {
    cwd: root,
    stdio: 'inherit',
  },
);
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code, signal) => process.exit(code ?? (signal ? 0 : 1)));
