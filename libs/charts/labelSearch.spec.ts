import { chooseSpots, type LabelChoice } from './labelSearch';

/** Labels whose clashes are listed as "a.i-b.j". */
function choose(choices: readonly LabelChoice[], clashing: readonly string[]): number[] {
  const pairs = new Set(clashing.flatMap((pair) => [pair, pair.split('-').reverse().join('-')]));
  const clashes = (a: number, i: number, b: number, j: number): boolean =>
    pairs.has(`${String(a)}.${String(i)}-${String(b)}.${String(j)}`);
  const near = choices.map((_, a) =>
    choices.flatMap((other, b) =>
      a !== b && choices[a]!.costs.some((__, i) => other.costs.some((___, j) => clashes(a, i, b, j)))
        ? [b]
        : [],
    ),
  );
  return [...chooseSpots(choices, near, clashes)];
}

describe('chooseSpots', () => {
  it('gives each label its cheapest spot where none clash', () => {
    expect(
      choose(
        [
          { costs: [0, 1], worth: 9 },
          { costs: [0.5], worth: 9 },
        ],
        [],
      ),
    ).toEqual([0, 0]);
  });

  it('moves the first aside where that lets the second stand too, which choosing in turn would not', () => {
    const labels = [
      { costs: [0, 1], worth: 10 },
      { costs: [0], worth: 5 },
    ];
    expect(choose(labels, ['0.0-1.0'])).toEqual([1, 0]);
  });

  it('leaves out the less worthy where both cannot stand', () => {
    const labels = [
      { costs: [2], worth: 10 },
      { costs: [0], worth: 5 },
    ];
    expect(choose(labels, ['0.0-1.0'])).toEqual([0, -1]);
  });

  it('leaves out a label without a spot', () => {
    expect(choose([{ costs: [], worth: 10 }], [])).toEqual([-1]);
  });

  it('finds in a long chain what only moving all of it finds, the same each time', () => {
    // Neighbours must take different spots. Choosing in turn, the even ones take spot 0; the last, which has
    // none else and stands beside an even one, can stand only if every other one changes.
    const count = 40;
    const labels = Array.from({ length: count }, (_, index) => ({
      costs: index === count - 1 ? [0] : [0, 0.1],
      worth: 100,
    }));
    const clashing = Array.from({ length: count - 1 }, (_, index) => [
      `${String(index)}.0-${String(index + 1)}.0`,
      `${String(index)}.1-${String(index + 1)}.1`,
    ]).flat();
    const chosen = choose(labels, clashing);
    expect(chosen.filter((spot) => spot < 0)).toEqual([]);
    expect(choose(labels, clashing)).toEqual(chosen);
  });
});
