import { type Interval, type Showing } from '#nights';
import { type EventView } from './eventView';

/**
 * What is shown while the event lasts: the evening's showings inside the event's own hours, which may have been
 * moved since the evening was judged. A best moment outside them is left out, and so is what another brightness
 * would change where the hours cut a showing short.
 */
export function plannedShowings(event: EventView): readonly Showing[] {
  const startMs = Date.parse(event.startsAt);
  const endMs = Date.parse(event.endsAt);
  return event.evening.showings.flatMap((showing): Showing[] => {
    if (!showing.shown) return [];
    const intervals = showing.intervals.flatMap((interval) => inside(interval, startMs, endMs));
    if (intervals.length === 0) return [];
    const { best } = showing;
    const minutes = intervals.reduce((sum, part) => sum + (part.endMs - part.startMs) / 60_000, 0);
    const kept =
      best !== null && best.utcMs >= startMs - HALF_MINUTE_MS && best.utcMs <= endMs + HALF_MINUTE_MS;
    const whole = showing.minutes - minutes <= 1;
    return [
      { ...showing, intervals, minutes, best: kept ? best : null, range: whole ? showing.range : null },
    ];
  });
}

/** Events begin and end on whole minutes, evenings to the second. */
const HALF_MINUTE_MS = 30_000;

function inside({ startMs, endMs }: Interval, fromMs: number, toMs: number): Interval[] {
  const start = Math.max(startMs, fromMs);
  const end = Math.min(endMs, toMs);
  return end > start ? [{ startMs: start, endMs: end }] : [];
}
