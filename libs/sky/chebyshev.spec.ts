import { evaluateChebyshev, fitChebyshev } from './chebyshev';

describe('fitChebyshev', () => {
  const polynomial = (x: number) => 3 - 2 * x + 0.5 * x ** 2 - 0.125 * x ** 5;

  it('gives back a polynomial of its own degree', () => {
    const fit = fitChebyshev((ms, out) => out.set([polynomial(ms / 1000), 7]), 2, -2000, 3000, 1250, 5);
    expect(fit.segments).toBe(4);
    const out = new Float64Array(2);
    for (let ms = -2000; ms <= 3000; ms += 37) {
      evaluateChebyshev(fit, ms, out);
      expect(out[0]).toBeCloseTo(polynomial(ms / 1000), 11);
      expect(out[1]).toBeCloseTo(7, 12);
    }
  });

  it('covers the whole span where the pieces do not divide it', () => {
    const fit = fitChebyshev((ms, out) => out.set([Math.sin(ms / 300)]), 1, 0, 1000, 300, 9);
    expect(fit.segments).toBe(4);
    const out = new Float64Array(1);
    for (let ms = 0; ms <= 1000; ms += 13) {
      evaluateChebyshev(fit, ms, out);
      expect(out[0]).toBeCloseTo(Math.sin(ms / 300), 9);
    }
  });

  it('converges as fast as the series of a smooth function', () => {
    const worst = (degree: number) => {
      const fit = fitChebyshev((x, out) => out.set([Math.exp(x)]), 1, -1, 1, 2, degree);
      const out = new Float64Array(1);
      let miss = 0;
      for (let x = -1; x <= 1; x += 0.01) {
        evaluateChebyshev(fit, x, out);
        miss = Math.max(miss, Math.abs(out[0]! - Math.exp(x)));
      }
      return miss;
    };
    // Interpolation misses by at most about twice the first coefficient left out, 2 I_n(1) for exp x.
    for (const [degree, bound] of [
      [4, 1.1e-3],
      [8, 2.3e-8],
    ] as const) {
      expect(worst(degree)).toBeLessThan(bound);
      expect(worst(degree)).toBeGreaterThan(bound / 100);
    }
  });
});
