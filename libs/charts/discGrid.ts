import type { Disc } from './labels';
import type { Box } from './lines';

const cellMm = 8;

/** Discs sorted into squares of the sheet, so that those near a box are found without a look at all. */
export interface DiscGrid {
  /** True where some disc for which `meets` holds may lie within `reachMm` of a box. */
  readonly someNear: (box: Box, reachMm: number, meets: (disc: Disc) => boolean) => boolean;
}

/** Sorts discs; those whose middle lies off the sheet are kept too. */
export function discGrid(discs: readonly Disc[]): DiscGrid {
  const cells = new Map<number, Disc[]>();
  let widest = 0;
  const key = (column: number, row: number): number => column * 4096 + row;
  for (const disc of discs) {
    const at = key(Math.floor(disc.xMm / cellMm), Math.floor(disc.yMm / cellMm));
    const cell = cells.get(at);
    if (cell === undefined) cells.set(at, [disc]);
    else cell.push(disc);
    widest = Math.max(widest, disc.radiusMm);
  }
  return {
    someNear: ([left, top, right, bottom], reachMm, meets) => {
      const reach = reachMm + widest;
      const lastColumn = Math.floor((right + reach) / cellMm);
      const lastRow = Math.floor((bottom + reach) / cellMm);
      for (let column = Math.floor((left - reach) / cellMm); column <= lastColumn; column++) {
        for (let row = Math.floor((top - reach) / cellMm); row <= lastRow; row++) {
          const cell = cells.get(key(column, row));
          if (cell?.some(meets) === true) return true;
        }
      }
      return false;
    },
  };
}
