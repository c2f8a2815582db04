import { comesNear, distanceToLine, type Line, piecesOutside } from './lines';

const across: Line = [
  [0, 5],
  [10, 5],
];

describe('piecesOutside', () => {
  it('opens a line where boxes stand across it, and only there', () => {
    expect(piecesOutside(across, [], 0.5)).toEqual([across]);
    expect(piecesOutside(across, [[4, 4, 6, 6]], 0.5)).toEqual([
      [
        [0, 5],
        [3.5, 5],
      ],
      [
        [6.5, 5],
        [10, 5],
      ],
    ]);
    expect(piecesOutside(across, [[4, 6, 6, 8]], 0.5)).toEqual([across]);
  });

  it('joins openings that overlap and drops a line that is wholly covered', () => {
    const pieces = piecesOutside(
      across,
      [
        [5, 4, 8, 6],
        [2, 4, 6, 6],
      ],
      0,
    );
    expect(pieces.map(([from, to]) => [from[0], to[0]])).toEqual([
      [0, 2],
      [8, 10],
    ]);
    expect(piecesOutside(across, [[-1, 0, 11, 10]], 0)).toEqual([]);
  });
});

describe('comesNear', () => {
  it('sees a line that passes through a box without an end in it', () => {
    expect(comesNear([4, 4, 6, 6], across, 0)).toBe(true);
    expect(
      comesNear(
        [4, 4, 6, 6],
        [
          [0, 0],
          [10, 10],
        ],
        0,
      ),
    ).toBe(true);
  });

  it('leaves alone a line that only shares the box’s surroundings', () => {
    expect(
      comesNear(
        [4, 0, 6, 1],
        [
          [0, 0],
          [10, 10],
        ],
        0,
      ),
    ).toBe(false);
    expect(comesNear([4, 6, 6, 8], across, 0.5)).toBe(false);
    expect(comesNear([4, 6, 6, 8], across, 1.5)).toBe(true);
  });
});

describe('distanceToLine', () => {
  it('is to the nearer end beyond the ends, and square to the line between them', () => {
    expect(distanceToLine([-3, 9], [0, 5], [10, 5])).toBeCloseTo(5, 12);
    expect(distanceToLine([3, 9], [0, 5], [10, 5])).toBeCloseTo(4, 12);
    expect(distanceToLine([3, 4], [0, 0], [0, 0])).toBeCloseTo(5, 12);
  });
});
