import { DEFAULT_OBSERVING, type Instrument, type Observing } from './instrument';
import { luminanceToMag } from './luminance';
import { bestViewLimit, ovalArea, viewsOf } from './visibility';

/** Limiting magnitudes of one instrument for one size of object over all skies, ready to be looked up. */
export interface LimitTable {
  readonly limits: Float64Array;
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
  return { limits };
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
