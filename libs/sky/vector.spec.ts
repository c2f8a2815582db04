import fc from 'fast-check';
import { ARCSEC, toDeg, toRad } from './angles';
import {
  add,
  cross,
  dot,
  fromSpherical,
  type Matrix,
  norm,
  rotate,
  rotateBack,
  scale,
  separation,
  subtract,
  toSpherical,
  unit,
  type Vector,
} from './vector';

const coordinate = fc.double({ min: -100, max: 100, noNaN: true });
const anyVector = fc.tuple(coordinate, coordinate, coordinate);
const direction = fc
  .tuple(
    fc.double({ min: 0, max: 2 * Math.PI, noNaN: true, maxExcluded: true }),
    fc.double({ min: -Math.PI / 2, max: Math.PI / 2, noNaN: true }),
  )
  .map(([lon, lat]) => fromSpherical(lon, lat));
const miss = (a: Vector, b: Vector) => norm(subtract(a, b));

/** A right-handed frame from two directions that are not along one line. */
function frameOf(first: Vector, second: Vector): Matrix {
  const z = unit(cross(first, second));
  const x = unit(first);
  return [x, cross(z, x), z];
}

describe('vectors', () => {
  it('obey the rules of the cross product', () => {
    fc.assert(
      fc.property(anyVector, anyVector, (a, b) => {
        const c = cross(a, b);
        const size = 1e-12 * (1 + norm(a) ** 2 * norm(b) + norm(b) ** 2 * norm(a));
        expect(Math.abs(dot(c, a))).toBeLessThan(size);
        expect(Math.abs(dot(c, b))).toBeLessThan(size);
        expect(miss(c, scale(cross(b, a), -1))).toBe(0);
        const lagrange = norm(a) ** 2 * norm(b) ** 2 - dot(a, b) ** 2;
        expect(Math.abs(norm(c) ** 2 - lagrange)).toBeLessThan(1e-12 * (1 + norm(a) ** 2 * norm(b) ** 2));
      }),
    );
  });

  it('add and subtract back', () => {
    fc.assert(
      fc.property(anyVector, anyVector, (a, b) => {
        expect(miss(subtract(add(a, b), b), a)).toBeLessThan(1e-13 * (1 + norm(a) + norm(b)));
      }),
    );
  });
});

describe('toSpherical', () => {
  it('undoes fromSpherical', () => {
    fc.assert(
      fc.property(direction, fc.double({ min: 1e-6, max: 100, noNaN: true }), (towards, distance) => {
        const there = scale(towards, distance);
        const { lonRad, latRad, distance: found } = toSpherical(there);
        expect(lonRad).toBeGreaterThanOrEqual(0);
        expect(lonRad).toBeLessThan(2 * Math.PI);
        expect(miss(fromSpherical(lonRad, latRad, found), there)).toBeLessThan(1e-14 * distance);
      }),
    );
  });
});

describe('separation', () => {
  it("agrees with Meeus's example 17.a, Arcturus and Spica", () => {
    // Meeus, Astronomical Algorithms (2nd ed.), example 17.a: 32.7930 degrees.
    const arcturus = fromSpherical(toRad(213.9154), toRad(19.1825));
    const spica = fromSpherical(toRad(201.2983), toRad(-11.1614));
    expect(Math.abs(toDeg(separation(arcturus, spica)) - 32.793)).toBeLessThan(1e-4);
  });

  it('keeps its digits close by and near the opposite point', () => {
    const from = fromSpherical(1, 0);
    const near = fromSpherical(1 + 0.001 * ARCSEC, 0);
    expect(separation(from, near) / ARCSEC).toBeCloseTo(0.001, 9);
    expect((Math.PI - separation(from, scale(near, -1))) / ARCSEC).toBeCloseTo(0.001, 9);
  });

  it('is the same both ways, and no way round is shorter', () => {
    fc.assert(
      fc.property(direction, direction, direction, (a, b, c) => {
        expect(separation(a, b)).toBeCloseTo(separation(b, a), 14);
        expect(separation(a, c)).toBeLessThanOrEqual(separation(a, b) + separation(b, c) + 1e-14);
        expect(separation(scale(a, 1e-5), scale(b, 30))).toBeCloseTo(separation(a, b), 13);
      }),
    );
  });
});

describe('rotate', () => {
  it('keeps angles and lengths, and rotateBack undoes it', () => {
    fc.assert(
      fc.property(direction, direction, anyVector, anyVector, (first, second, a, b) => {
        fc.pre(norm(cross(first, second)) > 1e-3);
        const frame = frameOf(first, second);
        expect(miss(rotateBack(frame, rotate(frame, a)), a)).toBeLessThan(1e-12 * (1 + norm(a)));
        const before = dot(a, b);
        expect(Math.abs(dot(rotate(frame, a), rotate(frame, b)) - before)).toBeLessThan(
          1e-12 * (1 + norm(a) * norm(b)),
        );
      }),
    );
  });
});
