import { crossings } from '#darkness';
import { compassPoint, place } from '#sky';
import { DateTime } from 'luxon';
import { type ChartOrder } from './chartFor';

const DAY_MS = 86_400_000;

/** "2 July 2027, 23:30" in a zone. */
export function clockDate(utcMs: number, zone: string): string {
  return DateTime.fromMillis(utcMs, { zone, locale: 'en-GB' }).toFormat('d LLLL yyyy, HH:mm');
}

/**
 * When a target that is down comes up over the level horizon next, and when it sets again, in words. Looks ahead
 * two days, in which everything that rises at all on that date has risen.
 */
export function whenUp({ target, observer, zone, utcMs }: ChartOrder): string {
  const horizontal = (ms: number) => place(target.sky, ms, observer).horizontal!;
  const found = crossings((ms) => horizontal(ms).altitudeRad, 0, utcMs, utcMs + 2 * DAY_MS);
  const rise = found.find(({ rising }) => rising);
  if (rise === undefined) return 'it does not rise there on that date';
  const set = found.find(({ rising, utcMs: at }) => !rising && at > rise.utcMs);
  const where = compassPoint(horizontal(rise.utcMs).azimuthRad, 16).letters;
  const until = set === undefined ? 'and stays up' : `and sets on ${clockDate(set.utcMs, zone)}`;
  return `it rises next on ${clockDate(rise.utcMs, zone)} (${zone}) in the ${where} ${until}`;
}
