import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { projectionAbout, type ProjectionKind } from '#charts';

interface Checked {
  readonly kind: ProjectionKind;
  /** Latitude and longitude, degrees. */
  readonly centre: readonly [number, number];
  readonly point: readonly [number, number];
}

const published = JSON.parse(readFileSync(join(__dirname, 'projections.json'), 'utf8')) as {
  readonly snyder: readonly (Checked & { readonly x: number; readonly y: number })[];
  readonly astropy: readonly (Checked & { readonly plottedXDeg: number; readonly yDeg: number })[];
};

const degree = Math.PI / 180;

function flat({ kind, centre, point }: Checked): { x: number; y: number } {
  const at = projectionAbout(kind, centre[1] * degree, centre[0] * degree).forward(
    point[1] * degree,
    point[0] * degree,
  );
  if (at === null) throw new Error('the published point must be on the map');
  return at;
}

describe('projections against published numbers', () => {
  it.each(published.snyder)('gives Snyder’s $kind example to its seven decimals', (example) => {
    const { x, y } = flat(example);
    expect(x).toBeCloseTo(example.x, 7);
    expect(y).toBeCloseTo(example.y, 7);
  });

  it.each(published.astropy)(
    'gives astropy’s $kind place to a thousandth of an arcsecond or so',
    (example) => {
      const { x, y } = flat(example);
      expect(-x / degree).toBeCloseTo(example.plottedXDeg, 6);
      expect(y / degree).toBeCloseTo(example.yDeg, 6);
    },
  );
});
