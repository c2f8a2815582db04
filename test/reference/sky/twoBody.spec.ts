import { heliocentricState, toRad } from '#sky';
import { expected } from './expected';

type Row = readonly [
  q: number,
  e: number,
  inclination: number,
  node: number,
  argument: number,
  days: number,
  ...state: number[],
];

const { rows } = expected<{ rows: Row[] }>('twoBody.json');
const PERIHELION_TT_JD = 2_461_000.5;

// Expected: Kepler's and Barker's equations, each conic by its own, in 60-digit arithmetic; see README.md.
describe('heliocentricState', () => {
  it('is checked from the circle to e = 3.3 and from q = 0.005 to 10', () => {
    expect(rows).toHaveLength(440);
    expect(new Set(rows.map(([, e]) => e))).toContain(1 - 1e-12);
    expect(new Set(rows.map(([, e]) => e))).toContain(1 + 1e-12);
    expect(Math.max(...rows.map(([, , , , , days]) => Math.abs(days)))).toBe(1500);
  });

  it('holds place and velocity to 1e-9 au (and a day) within 1,500 days of perihelion', () => {
    let place = 0;
    let velocity = 0;
    for (const [q, e, inclination, node, argument, days, ...state] of rows) {
      const found = heliocentricState(
        {
          perihelionDistanceAu: q,
          eccentricity: e,
          inclinationRad: toRad(inclination),
          nodeRad: toRad(node),
          argumentOfPerihelionRad: toRad(argument),
          perihelionTtJd: PERIHELION_TT_JD,
          epochTtJd: null,
        },
        PERIHELION_TT_JD + days,
      );
      found.position.forEach((value, axis) => {
        place = Math.max(place, Math.abs(value - state[axis]!));
      });
      found.velocity.forEach((value, axis) => {
        velocity = Math.max(velocity, Math.abs(value - state[3 + axis]!));
      });
    }
    expect(place).toBeLessThan(1e-9);
    expect(velocity).toBeLessThan(1e-9);
  });
});
