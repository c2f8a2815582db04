import { type ChartScale } from '#charts';
import {
  createWorkbench,
  DEFAULT_WEIGHTS,
  judgeEvening,
  type NightSite,
  prepareSeason,
  prepareSite,
  type Programme,
  type ProgrammeItem,
  type Showing,
} from '#nights';
import { type OrbitTarget } from '#sky';
import { perturbing, type Perturbing } from '../sky/perturbing';
import { placeShift, type PlaceShift } from '../sky/placeShift';

/** A coming evening with one body in its programme, as far as the body's elements matter to it. */
export interface PlannedEvening {
  readonly site: NightSite;
  readonly programme: Programme;
  /** The body's item of the programme; its target is put aside for the two accounts. */
  readonly item: ProgrammeItem;
  /** Local date 'YYYY-MM-DD'. */
  readonly date: string;
}

/** What new elements do to a showing: its edges move when either moves by half a minute or more. */
export type ShowingChange = 'gained' | 'lost' | 'moved' | 'same';

/** What new elements of a body change in one evening. */
export interface EveningChange {
  /** The instant of the shift: the showing's best moment by the new elements, or by the old where it is lost. */
  readonly utcMs: number;
  readonly shift: PlaceShift;
  readonly showing: ShowingChange;
  /** The showing by the old elements and by the new, both judged now. */
  readonly before: Showing;
  readonly after: Showing;
  /** Scales at which a reader sees the shift. */
  readonly printAgain: readonly ChartScale[];
}

/** Edges are found to 5 s and told to the minute. */
const MOVED_MS = 30_000;
/** Differences below these are of no consequence to anything, not even to the words. */
const NO_SHIFT_ARCSEC = 0.1;
const NO_MAGNITUDES = 0.005;

/**
 * What changes in an evening when a body's elements are replaced; null where nothing does, or where it is
 * shown neither before nor after. Both accounts move under the planets and are judged by the same rules.
 * Throws a RangeError that names the body where its motion cannot be followed to the evening.
 *
 * `perturbed` may be shared by the evenings of one piece of work.
 */
export function eveningChange(
  evening: PlannedEvening,
  before: OrbitTarget,
  after: OrbitTarget,
  perturbed: Perturbing = perturbing(),
): EveningChange | null {
  const { site, date, item, programme } = evening;
  const items = [before, after].map((target): ProgrammeItem => ({ ...item, target }));
  const judged = judgeEvening(
    createWorkbench(),
    prepareSeason({ ...programme, items }, date, date),
    prepareSite(site),
    DEFAULT_WEIGHTS,
    date,
  );
  const [old, renewed] = judged.showings as [Showing, Showing];
  if (!old.shown && !renewed.shown) return null;
  const showing = showingChange(old, renewed);
  const best = (renewed.shown ? renewed.best : old.best)!;
  const shift = placeShift(
    perturbed(before, best.utcMs),
    perturbed(after, best.utcMs),
    best.utcMs,
    site.observer,
  );
  const nothing =
    showing === 'same' &&
    shift.shiftArcsec < NO_SHIFT_ARCSEC &&
    Math.abs(shift.magnitudeChange ?? 0) < NO_MAGNITUDES;
  if (nothing) return null;
  return {
    utcMs: best.utcMs,
    shift,
    showing,
    before: old,
    after: renewed,
    printAgain: shift.scales.flatMap(({ scale, harmless }) => (harmless ? [] : [scale])),
  };
}

function showingChange(before: Showing, after: Showing): ShowingChange {
  if (before.shown !== after.shown) return after.shown ? 'gained' : 'lost';
  const same =
    before.intervals.length === after.intervals.length &&
    before.intervals.every(
      ({ startMs, endMs }, i) =>
        Math.abs(startMs - after.intervals[i]!.startMs) < MOVED_MS &&
        Math.abs(endMs - after.intervals[i]!.endMs) < MOVED_MS,
    );
  return same ? 'same' : 'moved';
}
