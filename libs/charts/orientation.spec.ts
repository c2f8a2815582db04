import { sheetAngle, turnedBack, turnFor } from './orientation';

const quarter = Math.PI / 2;

describe('turnFor', () => {
  it('has north up and east left on an upright sheet', () => {
    const turn = turnFor('upright', 0);
    expect(sheetAngle(turn, 0)).toBeCloseTo(-quarter, 12);
    expect(Math.abs(sheetAngle(turn, quarter))).toBeCloseTo(Math.PI, 12);
  });

  it('has the asked direction at the top', () => {
    for (const up of [0.3, 2, -1.1]) {
      expect(sheetAngle(turnFor('upright', up), up)).toBeCloseTo(-quarter, 12);
      expect(sheetAngle(turnFor('rotated', up), up)).toBeCloseTo(quarter, 12);
      expect(sheetAngle(turnFor('mirrored', up), up)).toBeCloseTo(-quarter, 12);
    }
  });

  it('rotated is upright turned half round, mirrored is it with left and right exchanged, exactly', () => {
    const upright = turnFor('upright', 0.7);
    const rotated = turnFor('rotated', 0.7);
    const mirrored = turnFor('mirrored', 0.7);
    expect([rotated.a, rotated.b, rotated.c, rotated.d]).toEqual([
      -upright.a,
      -upright.b,
      -upright.c,
      -upright.d,
    ]);
    expect([mirrored.a, mirrored.b, mirrored.c, mirrored.d]).toEqual([
      -upright.a,
      -upright.b,
      upright.c,
      upright.d,
    ]);
  });

  it('is undone by turnedBack', () => {
    const turn = turnFor('mirrored', 1.2);
    const right = turn.a * 0.3 + turn.b * -0.8;
    const down = turn.c * 0.3 + turn.d * -0.8;
    const { east, north } = turnedBack(turn, right, down);
    expect(east).toBeCloseTo(0.3, 14);
    expect(north).toBeCloseTo(-0.8, 14);
  });
});
