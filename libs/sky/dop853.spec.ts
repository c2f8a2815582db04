import { integrate, type Rates, type TakenStep } from './dop853';
import { NODES, STAGES } from './dop853Coefficients';
import { heliocentricState, SUN_MU } from './orbit';

const FINE = { relative: 1e-11, placeFloor: 1e-13, velocityFloor: 1e-15 };

const sunAlone: Rates = (_, s, out) => {
  const r = Math.hypot(s[0]!, s[1]!, s[2]!);
  for (let c = 0; c < 3; c++) {
    out[c] = s[3 + c]!;
    out[3 + c] = (-SUN_MU * s[c]!) / r ** 3;
  }
};

/** Place and velocity on a conic at a number of days from perihelion. */
function conic(q: number, e: number, days: number): Float64Array {
  const { position, velocity } = heliocentricState(
    {
      perihelionDistanceAu: q,
      eccentricity: e,
      inclinationRad: 0.7,
      nodeRad: 2,
      argumentOfPerihelionRad: 4,
      perihelionTtJd: 0,
      epochTtJd: 0,
    },
    days,
  );
  return Float64Array.of(...position, ...velocity);
}

const apart = (a: Float64Array, b: Float64Array) => Math.hypot(a[0]! - b[0]!, a[1]! - b[1]!, a[2]! - b[2]!);

describe('the coefficients', () => {
  it('make each stage of its row stand where its node says (row sums equal nodes)', () => {
    STAGES.forEach((row, stage) => {
      const sum = row.reduce((total, [, weight]) => total + weight, 0);
      expect(Math.abs(sum - NODES[stage]!)).toBeLessThan(4e-14);
    });
  });

  it('meet the quadrature conditions of order 8: the sum of b c^(k-1) is 1/k', () => {
    for (let k = 1; k <= 8; k++) {
      const sum = STAGES[12]!.reduce((total, [stage, b]) => total + b * NODES[stage]! ** (k - 1), 0);
      expect(Math.abs(sum - 1 / k)).toBeLessThan(1e-14);
    }
  });
});

describe('integrate', () => {
  // Expected: libs/sky's own two-body solution, which twoBody.spec.ts in test/reference checks from outside.
  test.each([
    [0.05, 1, -300, 300, 1e-9],
    [0.006, 0.9999, -100, 250, 1e-8],
    [1, 0.0167, -150, 850, 1e-9],
    [2.5, 0.08, 0, -1000, 1e-10],
    [0.6, 1.8, 40, -400, 1e-9],
  ])('follows the conic of q %p, e %p from day %p to %p', (q, e, from, to, allowed) => {
    const state = conic(q, e, from);
    expect(integrate(sunAlone, state, from, to, 1, FINE, 5000, () => undefined)).toBe('done');
    expect(apart(state, conic(q, e, to))).toBeLessThan(allowed);
  });

  it('keeps the energy of a comet through its perihelion', () => {
    const energy = (s: Float64Array) =>
      (s[3]! ** 2 + s[4]! ** 2 + s[5]! ** 2) / 2 - SUN_MU / Math.hypot(s[0]!, s[1]!, s[2]!);
    const state = conic(0.3, 0.9, -200);
    const before = energy(state);
    integrate(sunAlone, state, -200, 200, 1, FINE, 5000, () => undefined);
    expect(Math.abs(energy(state) / before - 1)).toBeLessThan(1e-9);
  });

  it('gives places inside its steps as well as at their ends', () => {
    let worst = 0;
    const inner = new Float64Array(6);
    integrate(
      sunAlone,
      conic(0.3, 0.9, -200),
      -200,
      200,
      1,
      FINE,
      5000,
      ({ from, to, inside }: TakenStep) => {
        for (const part of [0.13, 0.37, 0.5, 0.71, 0.94]) {
          const time = from + part * (to - from);
          inside(time, inner);
          worst = Math.max(worst, apart(inner, conic(0.3, 0.9, time)));
        }
      },
    );
    expect(worst).toBeLessThan(2e-9);
  });

  it('says when it gives up instead of hanging', () => {
    const state = conic(0.05, 1, -300);
    expect(integrate(sunAlone, state, -300, 300, 1, FINE, 20, () => undefined)).toBe('tooManySteps');
    const falling = Float64Array.of(1, 0, 0, 0, 0, 0);
    expect(integrate(sunAlone, falling, 0, 365, 1, FINE, 5000, () => undefined)).not.toBe('done');
  });

  it('does nothing over no time', () => {
    const state = conic(1, 0.1, 5);
    const before = state.slice();
    expect(integrate(sunAlone, state, 5, 5, 1, FINE, 10, () => undefined)).toBe('done');
    expect(state).toEqual(before);
  });
});
