import fc from 'fast-check';
import { halfWidthOf, projectionAbout, type ProjectionKind } from './projection';

const degree = Math.PI / 180;
const kinds: ProjectionKind[] = ['stereographic', 'gnomonic'];

function vector(raRad: number, decRad: number): [number, number, number] {
  return [Math.cos(decRad) * Math.cos(raRad), Math.cos(decRad) * Math.sin(raRad), Math.sin(decRad)];
}

/** Angle between two directions by the cross product, which keeps its digits when they are close. */
function apart(one: [number, number, number], other: [number, number, number]): number {
  const [a, b, c] = one;
  const [d, e, f] = other;
  return Math.atan2(Math.hypot(b * f - c * e, c * d - a * f, a * e - b * d), a * d + b * e + c * f);
}

describe.each(kinds)('%s projection', (kind) => {
  it('comes back to where it started, poles and 0h included', () => {
    const ra = fc.double({ min: 0, max: 2 * Math.PI, noNaN: true });
    const dec = fc.double({ min: -Math.PI / 2, max: Math.PI / 2, noNaN: true });
    let tried = 0;
    fc.assert(
      fc.property(ra, dec, ra, dec, (ra0, dec0, raRad, decRad) => {
        const projection = projectionAbout(kind, ra0, dec0);
        const flat = projection.forward(raRad, decRad);
        if (flat === null) return true;
        tried += 1;
        const back = projection.inverse(flat.x, flat.y);
        expect(back.raRad).toBeGreaterThanOrEqual(0);
        expect(back.raRad).toBeLessThan(2 * Math.PI + 1e-12);
        // Far from the centre a rounding error of the plane is magnified on the sphere, hence 1e-9.
        expect(apart(vector(back.raRad, back.decRad), vector(raRad, decRad))).toBeLessThan(1e-9);
        return true;
      }),
      { seed: 12, numRuns: 500 },
    );
    expect(tried).toBeGreaterThan(100);
  });

  it('puts its centre at nothing, nothing', () => {
    expect(projectionAbout(kind, 1, 0.5).forward(1, 0.5)).toEqual({ x: 0, y: 0 });
    expect(projectionAbout(kind, 7, 0.5).inverse(0, 0).raRad).toBeCloseTo(7 - 2 * Math.PI, 12);
  });

  it('shows a place at half the field at the half width', () => {
    const at = projectionAbout(kind, 0, 0).forward(20 * degree, 0);
    expect(at?.x).toBeCloseTo(halfWidthOf(kind, 40 * degree), 12);
  });
});

describe('what cannot be shown', () => {
  it('is the far side, without a number', () => {
    expect(projectionAbout('gnomonic', 0, 0).forward(86 * degree, 0)).toBeNull();
    expect(projectionAbout('gnomonic', 0, 0).forward(Math.PI, 0)).toBeNull();
    expect(projectionAbout('stereographic', 0, 0).forward(Math.PI, 0)).toBeNull();
    expect(projectionAbout('stereographic', 0, 0).forward(Math.PI / 2, 0)?.x).toBeCloseTo(2, 12);
  });
});
