import fc from 'fast-check';
import {
  BAND_COUNT,
  CELL_COUNT,
  bandStarts,
  bandSouth,
  cellOf,
  cellWidth,
  visitCellsInCone,
} from './skyCells';

const angle = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

const visited = (raRad: number, decRad: number, radiusRad: number): number[] => {
  const cells: number[] = [];
  visitCellsInCone(raRad, decRad, radiusRad, (cell) => cells.push(cell));
  return cells;
};

/** The place at a distance and position angle from another. */
const away = (raRad: number, decRad: number, distance: number, turn: number): [number, number] => {
  const dec = Math.asin(
    Math.max(
      -1,
      Math.min(
        1,
        Math.sin(decRad) * Math.cos(distance) + Math.cos(decRad) * Math.sin(distance) * Math.cos(turn),
      ),
    ),
  );
  const ra = Math.atan2(
    Math.sin(turn) * Math.sin(distance) * Math.cos(decRad),
    Math.cos(distance) - Math.sin(decRad) * Math.sin(dec),
  );
  return [raRad + ra, dec];
};

describe('sky cells', () => {
  it('are 10,312 in 90 bands, equal in area to a tenth away from the poles', () => {
    expect([BAND_COUNT, CELL_COUNT]).toEqual([90, 10312]);
    const mean = (4 * Math.PI) / CELL_COUNT;
    for (let band = 5; band < BAND_COUNT - 5; band++) {
      const area = cellWidth(band) * (Math.sin(bandSouth(band + 1)) - Math.sin(bandSouth(band)));
      expect(Math.abs(area / mean - 1)).toBeLessThan(0.1);
    }
  });

  it('give the poles and both sides of 0h their own cells', () => {
    expect(cellOf(1, -Math.PI / 2)).toBe(0);
    expect(cellOf(6.2, Math.PI / 2)).toBe(CELL_COUNT - 1);
    const equator = bandStarts[45]!;
    expect(cellOf(0, 0)).toBe(equator);
    expect(cellOf(2 * Math.PI, 0)).toBe(equator);
    expect(cellOf(-1e-17, 0)).toBe(equator);
    expect(cellOf(-5e-324, 0)).toBe(equator);
    expect(cellOf(-0.001, 0)).toBe(bandStarts[46]! - 1);
  });

  it('are all visited, once each, by a cone that holds the sky', () => {
    const cells = visited(2, 0.5, Math.PI);
    expect(cells).toHaveLength(CELL_COUNT);
    expect(new Set(cells).size).toBe(CELL_COUNT);
  });

  it('are never missed: the cell of any place in a cone is visited, and none twice', () => {
    fc.assert(
      fc.property(
        angle(-10, 10),
        angle(-Math.PI / 2, Math.PI / 2),
        fc.oneof(angle(0, 0.05), angle(0, Math.PI)),
        angle(0, 1),
        angle(0, 2 * Math.PI),
        (raRad, decRad, radiusRad, part, turn) => {
          const cells = visited(raRad, decRad, radiusRad);
          expect(new Set(cells).size).toBe(cells.length);
          const [ra, dec] = away(raRad, decRad, radiusRad * part, turn);
          expect(cells).toContain(cellOf(ra, dec));
        },
      ),
      { numRuns: 1500, seed: 20261201 },
    );
  });

  it('are few for a narrow cone', () => {
    expect(visited(1, 0.3, Math.PI / 360).length).toBeLessThanOrEqual(4);
    expect(visited(1, 1.56, Math.PI / 360).length).toBeLessThanOrEqual(6);
  });
});
