import { spawnSync } from 'node:child_process';
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { allowed, forbiddenImport } from './arrows.cjs';

const root = join(__dirname, '..', '..');

describe('import directions', () => {
  test.each([
    ['libs/sky/orbit.ts', '#darkness'],
    ['libs/darkness/light.ts', '#nights'],
    ['libs/nights/judge.ts', '#catalogue'],
    ['libs/charts/pdf.ts', '#nights'],
    ['libs/calendar/feed.ts', '#sky'],
    ['libs/nights/judge.ts', '../sky/orbit'],
    ['libs/club/sites/sites.ts', '../../nights/judge'],
    ['libs/sky/orbit.ts', 'node:fs'],
    ['libs/nights/judge.ts', '@nestjs/common'],
    ['libs/charts/pdf.ts', '@prisma/client'],
    ['libs/catalogue/stars.ts', 'node:http'],
    ['libs/club/sites/sites.ts', '../../../apps/server/main'],
    ['apps/web/main.ts', '#club'],
    ['libs/club/sites/sites.ts', '#demo-data'],
  ])('%s may not import %s', (file, source) => {
    expect(forbiddenImport(file, source)).toMatch(/may not import|by its public name/);
  });

  test.each([
    ['libs/darkness/light.ts', '#sky'],
    ['libs/nights/judge.ts', './score'],
    ['libs/charts/pdf.ts', '#catalogue'],
    ['libs/charts/typeface.ts', 'node:fs'],
    ['libs/club/sky/skyAnswer.ts', '#darkness'],
    ['apps/cli/sky.ts', '#club/sky'],
    ['apps/server/main.ts', '@nestjs/core'],
    ['libs/nights/judge.spec.ts', 'node:fs'],
  ])('%s may import %s', (file, source) => {
    expect(forbiddenImport(file, source)).toBeNull();
  });

  it('know every part that there is', () => {
    const parts = ['libs', 'apps'].flatMap((top) =>
      readdirSync(join(root, top), { withFileTypes: true })
        .filter((entry) => entry.isDirectory() && entry.name !== 'setup')
        .map((entry) => `${top}/${entry.name}`),
    );
    expect(parts.filter((part) => !(part in allowed))).toEqual([]);
  });

  it('fail the lint as part of it', () => {
    const { stdout, status } = spawnSync(
      process.execPath,
      [
        join(root, 'node_modules', 'eslint', 'bin', 'eslint.js'),
        '--stdin',
        '--stdin-filename',
        join(root, 'libs', 'sky', 'invented.ts'),
      ],
      { cwd: root, input: "export { judgeEvening } from '#nights';\n", encoding: 'utf8' },
    );
    expect(stdout).toContain('libs/sky may not import libs/nights');
    expect(status).toBe(1);
  });
});
