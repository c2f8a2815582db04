/** The spots open to one label, cheapest first, and what leaving it out would lose. */
export interface LabelChoice {
  readonly costs: readonly number[];
  readonly worth: number;
}

/** Says whether spot `i` of label `a` and spot `j` of label `b` cannot both be taken. */
export type Clashes = (a: number, i: number, b: number, j: number) => boolean;

const LEFT_OUT = -1;
/** An exact search gives up after this many steps and hands its best over to annealing. */
const mostExactSteps = 4000;
const movesEach = 80;
const mostMoves = 6000;

/**
 * Gives each label the number of its spot, or -1 where it is left out, so that no two clash and the worth of
 * what stands less the cost of where it stands is as great as can be found. `near` lists, for each label, the
 * others it could clash with. Labels must come most worthy first.
 *
 * Labels fall into groups that cannot touch each other. In each group labels first choose in turn; where that
 * leaves anyone worse off than alone, the group is searched exactly (branch and bound), and where it is too large
 * for that, by annealing with ejections (Christensen, Marks & Shieber 1995, ACM Trans. Graphics 14, 203, compare
 * such methods). The random numbers are always the same, so the answer is too.
 */
export function chooseSpots(
  choices: readonly LabelChoice[],
  near: readonly (readonly number[])[],
  clashes: Clashes,
): Int16Array {
  const chosen = new Int16Array(choices.length).fill(LEFT_OUT);
  for (let label = 0; label < choices.length; label++) chosen[label] = firstFree(label, chosen);

  for (const group of groups(near)) {
    if (group.length > 1 && group.some((label) => choices[label]!.costs.length > 0 && chosen[label] !== 0)) {
      if (!searchExactly(group)) anneal(group);
    }
  }
  return chosen;

  function firstFree(label: number, among: Int16Array): number {
    const { costs } = choices[label]!;
    for (let spot = 0; spot < costs.length; spot++) {
      if (!near[label]!.some((other) => among[other]! >= 0 && clashes(label, spot, other, among[other]!))) {
        return spot;
      }
    }
    return LEFT_OUT;
  }

  function valueOf(label: number, spot: number): number {
    return spot < 0 ? 0 : choices[label]!.worth - choices[label]!.costs[spot]!;
  }

  /** True where the whole group was searched. Keeps the best found in any case. */
  function searchExactly(group: readonly number[]): boolean {
    const trial = Int16Array.from(chosen);
    for (const label of group) trial[label] = LEFT_OUT;
    // What the labels from each place on could be worth at most.
    const rest = new Float64Array(group.length + 1);
    for (let at = group.length - 1; at >= 0; at--) {
      rest[at] =
        rest[at + 1]! + Math.max(0, valueOf(group[at]!, choices[group[at]!]!.costs.length > 0 ? 0 : -1));
    }
    let best = group.reduce((sum, label) => sum + valueOf(label, chosen[label]!), 0);
    let steps = 0;
    const descend = (at: number, value: number): void => {
      if (++steps > mostExactSteps || value + rest[at]! <= best + 1e-9) return;
      const label = group[at];
      if (label === undefined) {
        best = value;
        for (const one of group) chosen[one] = trial[one]!;
        return;
      }
      const { costs } = choices[label]!;
      for (let spot = 0; spot < costs.length; spot++) {
        if (near[label]!.some((other) => trial[other]! >= 0 && clashes(label, spot, other, trial[other]!))) {
          continue;
        }
        trial[label] = spot;
        descend(at + 1, value + valueOf(label, spot));
        trial[label] = LEFT_OUT;
        if (steps > mostExactSteps) return;
      }
      descend(at + 1, value);
    };
    descend(0, 0);
    return steps <= mostExactSteps;
  }

  function anneal(group: readonly number[]): void {
    const random = seeded();
    const state = Int16Array.from(chosen);
    const moves = Math.min(mostMoves, movesEach * group.length);
    let gain = 0;
    let bestGain = 0;
    for (let move = 0; move < moves; move++) {
      const heat = 2 * (1 - move / moves) + 0.01;
      const label = group[Math.floor(random() * group.length)]!;
      const { costs } = choices[label]!;
      if (costs.length === 0) continue;
      const spot = Math.floor(random() * costs.length);
      if (spot === state[label]) continue;
      const before: [number, number][] = [[label, state[label]!]];
      let change = valueOf(label, spot) - valueOf(label, state[label]!);
      state[label] = spot;
      for (const other of near[label]!) {
        if (state[other]! < 0 || !clashes(label, spot, other, state[other]!)) continue;
        before.push([other, state[other]!]);
        change -= valueOf(other, state[other]!);
        state[other] = LEFT_OUT;
      }
      // Whoever had to go, and whoever was out before, may find another spot now.
      for (const other of [...before.slice(1).map(([one]) => one), ...near[label]!]) {
        if (state[other]! >= 0) continue;
        const free = firstFree(other, state);
        if (free < 0) continue;
        before.push([other, LEFT_OUT]);
        state[other] = free;
        change += valueOf(other, free);
      }
      if (change >= 0 || random() < Math.exp(change / heat)) {
        gain += change;
        if (gain > bestGain + 1e-9) {
          bestGain = gain;
          for (const one of group) chosen[one] = state[one]!;
        }
      } else {
        for (const [one, spotBefore] of before.toReversed()) state[one] = spotBefore;
      }
    }
  }
}

/** The labels in groups of which none can touch another, each in the order given. */
function groups(near: readonly (readonly number[])[]): number[][] {
  const seen = new Uint8Array(near.length);
  const found: number[][] = [];
  for (let start = 0; start < near.length; start++) {
    if (seen[start] === 1) continue;
    seen[start] = 1;
    const group = [start];
    // The group grows as it is gone through.
    for (const member of group) {
      for (const other of near[member]!) {
        if (seen[other] === 1) continue;
        seen[other] = 1;
        group.push(other);
      }
    }
    found.push(group.sort((one, other) => one - other));
  }
  return found;
}

/** The repeatable random numbers of Park & Miller 1988, in (0, 1). */
function seeded(): () => number {
  let state = 20270301;
  return () => (state = (state * 48271) % 2147483647) / 2147483647;
}
