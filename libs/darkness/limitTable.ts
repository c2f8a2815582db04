import { DEFAULT_OBSERVING, type Instrument, type Observing } from './instrument';
import { luminanceToMag, magToLuminance } from './luminance';
import { bestViewLimit, ovalArea, viewsOf } from './visibility';

/** Limiting magnitudes of one instrument for one size of object over all skies, ready to be looked up. */
export interface LimitTable {
  readonly limits: Float64Array;
  /** The least of each limit and those against all darker skies. */
  readonly leastFrom: Float64Array;
  /** The greatest of each limit and those against all brighter skies. */
  readonly mostTo: Float64Array;
}

const BRIGHTEST = 1.5;
const DARKEST = 23.5;
const PER_MAGNITUDE = 40;
const LAST = Math.round((DARKEST - BRIGHTEST) * PER_MAGNITUDE);

/**
 * `limitingMagnitude` for an instrument and a size in arcminutes, worked out for skies from 1.5 to 23.5
 * mag/arcsec2. Building one takes about a millisecond for each power; looking up costs a logarithm. Throws an
 * InstrumentError as `limitingMagnitude` does.
 */
export function limitTable(
  instrument: Instrument,
  majorArcmin: number,
  minorArcmin: number,
  observing: Observing = DEFAULT_OBSERVING,
): LimitTable {
  const views = viewsOf(instrument, observing);
  const areaSr = ovalArea(majorArcmin, minorArcmin);
  const limits = new Float64Array(LAST + 1);
  for (let i = 0; i <= LAST; i++) limits[i] = bestViewLimit(views, BRIGHTEST + i / PER_MAGNITUDE, areaSr);
  const leastFrom = limits.slice();
  for (let i = LAST - 1; i >= 0; i--) leastFrom[i] = Math.min(leastFrom[i]!, leastFrom[i + 1]!);
  const mostTo = limits.slice();
  for (let i = 1; i <= LAST; i++) mostTo[i] = Math.max(mostTo[i]!, mostTo[i - 1]!);
  return { limits, leastFrom, mostTo };
}

/**
 * The limiting magnitude against a sky in nanolambert, within 0.005 mag of `limitingMagnitude` for skies of 2
 * to 23 mag/arcsec2; beyond the table's ends the end value.
 */
export function limitFromTable(table: LimitTable, luminanceNl: number): number {
  const at = (luminanceToMag(luminanceNl) - BRIGHTEST) * PER_MAGNITUDE;
  const { limits } = table;
  if (!(at > 0)) return limits[0]!;
  if (at >= LAST) return limits[LAST]!;
  const before = at | 0;
  const low = limits[before]!;
  return low + (at - before) * (limits[before + 1]! - low);
}

/**
 * A sky in nanolambert such that an object of this magnitude (extinction included) shows against it and every
 * darker one by the table: the brightest such sky but for one step of the table, or 0 where there is none.
 */
export function brightestSkyShowing(table: LimitTable, magnitude: number): number {
  const { leastFrom } = table;
  if (!(leastFrom[LAST]! >= magnitude)) return 0;
  let low = 0;
  let high = LAST;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (leastFrom[middle]! >= magnitude) high = middle;
    else low = middle + 1;
  }
  // A hair darker, so that rounding of the logarithm cannot put it on the wrong side of the step.
  return magToLuminance(BRIGHTEST + low / PER_MAGNITUDE) * (1 - 1e-12);
}

/**
 * A sky in nanolambert such that an object of this magnitude (extinction included) shows neither against it
 * nor against any brighter one by the table: the darkest such sky but for one step, or Infinity where there
 * is none.
 */
export function darkestSkyHiding(table: LimitTable, magnitude: number): number {
  const { mostTo } = table;
  if (!(mostTo[0]! < magnitude)) return Infinity;
  let low = 0;
  let high = LAST;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (mostTo[middle]! < magnitude) low = middle;
    else high = middle - 1;
  }
  return magToLuminance(BRIGHTEST + low / PER_MAGNITUDE) * (1 + 1e-12);
}
