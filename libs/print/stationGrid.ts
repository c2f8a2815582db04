import { type Interval } from '#nights';

/** A station's time in equal cells. */
export interface StationGrid {
  readonly stepMinutes: number;
  readonly startMs: number;
  readonly count: number;
  readonly leastCells: number;
  /** False in a break. */
  readonly isOpen: readonly boolean[];
}

/** In which cells of the grid a wish can be shown throughout. */
export function cellsOf(
  { intervals }: { readonly intervals: readonly Interval[] },
  grid: StationGrid,
): boolean[] {
  const stepMs = grid.stepMinutes * 60_000;
  return grid.isOpen.map((open, cell) => {
    const startMs = grid.startMs + cell * stepMs;
    return (
      open && intervals.some((interval) => interval.startMs <= startMs && interval.endMs >= startMs + stepMs)
    );
  });
}
