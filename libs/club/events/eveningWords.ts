import { clockWords, type Interval, type JudgedEvening, type Showing } from '#nights';
import { compassPoint, toRad } from '#sky';
import { DateTime } from 'luxon';

/** A calendar date in words: 'Saturday 14 March', with the year where `withYear` asks for it. */
export function dateWords(date: string, locale: string, withYear = false): string {
  const day = DateTime.fromISO(date, { zone: 'utc', locale });
  return day.toLocaleString({
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    ...(withYear && { year: 'numeric' }),
  });
}

/** One evening as a sentence: date, site, what can be shown, hours and Moon. */
export function eveningSentence(evening: JudgedEvening, locale: string): string {
  const where = `${dateWords(evening.date, locale)} at ${evening.site}`;
  const { publicHours } = evening;
  if (publicHours === null) return `${where}: ${evening.note ?? 'no public hours.'}`;
  const hours = timesWords([publicHours], evening.zone);
  return `${where}: ${String(evening.shown)} of ${String(evening.of)} targets, ${hours}; ${moonSentence(evening)}`;
}

/** What the Moon does in the public hours; ends the sentence. */
export function moonSentence({ moon, publicHours }: JudgedEvening): string {
  const minutes = Math.round(moon.upMinutes);
  if (publicHours === null || minutes <= 0) return 'no Moon.';
  const lit = `${String(Math.round(moon.illuminatedFraction * 100))}% lit`;
  const all = Math.round((publicHours.endMs - publicHours.startMs) / 60_000);
  return minutes >= all
    ? `the Moon, ${lit}, is up throughout.`
    : `the Moon, ${lit}, is up for ${String(minutes)} of ${String(all)} minutes.`;
}

/** Local times of stretches: '20:10 to 22:40 and 23:05 to 23:20'. */
export function timesWords(intervals: readonly Interval[], zone: string): string {
  return intervals
    .map(({ startMs, endMs }) => `${clockWords(startMs, zone)} to ${clockWords(endMs, zone)}`)
    .join(' and ');
}

/** Above this a compass direction says little. */
const OVERHEAD_DEG = 80;

/**
 * Height and direction of a target at its best, for people with nothing but their eyes: '24 degrees high in
 * the south-west'.
 */
export function directionWords({ best }: Showing): string {
  if (best === null) return 'not to be seen';
  const height = `${String(Math.round(best.altitudeDeg))} degrees high`;
  if (best.altitudeDeg >= OVERHEAD_DEG) return `${height}, almost overhead`;
  return `${height} in the ${compassPoint(toRad(best.azimuthDeg), 16).word}`;
}
