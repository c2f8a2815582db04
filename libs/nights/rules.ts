import { DateTime } from 'luxon';
import { type ClubDate, type Habit, type Programme } from './programme';
import { type NightSite } from './site';

/** Every calendar date from one to another, both included, 'YYYY-MM-DD'. */
export function datesBetween(from: string, to: string): string[] {
  const dates: string[] = [];
  const last = DateTime.fromISO(to, { zone: 'utc' });
  for (let day = DateTime.fromISO(from, { zone: 'utc' }); day <= last; day = day.plus({ days: 1 })) {
    dates.push(day.toISODate()!);
  }
  return dates;
}

/** Why no evening is held at a site on a date, in words; null where nothing stands against it. */
export function whyClosed(
  site: NightSite,
  programme: Pick<Programme, 'weekdays'>,
  clubDates: readonly ClubDate[],
  date: string,
): string | null {
  const { weekdays } = programme;
  if (weekdays.length > 0 && !weekdays.includes(weekdayOf(date))) {
    return `${WEEKDAYS[weekdayOf(date) - 1]} is not one of the programme's weekdays.`;
  }
  const closure = site.closed.find(({ from, to }) => from <= date && date <= to);
  if (closure !== undefined) return `The site is closed: ${closure.why}.`;
  const taken = clubDates.find((other) => other.date === date);
  return taken === undefined ? null : `The club already holds: ${taken.name}.`;
}

/** The dates of a season that a habit names. */
export function habitDates(habit: Habit, dates: readonly string[]): string[] {
  return dates.filter((date) => {
    const day = DateTime.fromISO(date, { zone: 'utc' });
    if (day.weekday !== habit.weekday) return false;
    return habit.nth === -1
      ? day.plus({ days: 7 }).month !== day.month
      : Math.ceil(day.day / 7) === habit.nth;
  });
}

/** A habit in words: "first Saturday of the month". */
export function habitWords({ nth, weekday }: Habit): string {
  const order = { 1: 'first', 2: 'second', 3: 'third', 4: 'fourth', [-1]: 'last' }[nth];
  return `${order} ${WEEKDAYS[weekday - 1]} of the month`;
}

export const WEEKDAYS = [
  'Monday',
  'Tuesday',
  'Wednesday',
  'Thursday',
  'Friday',
  'Saturday',
  'Sunday',
] as const;

function weekdayOf(date: string): number {
  // 1970-01-01 was a Thursday; cheaper than a calendar library in the season's inner loop.
  return ((((Date.parse(date) / 86_400_000 + 3) % 7) + 7) % 7) + 1;
}
