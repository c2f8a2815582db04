import { digitFor, digitValue } from './base62';
import { calendarToJd, isCalendarDay, jdToCalendar } from './calendar';

/**
 * The TT Julian date (0h) of a packed date of five characters from `from` on: century letter (I 1800, J 1900,
 * K 2000), two digits of the year, month 1-9 A-C, day 1-9 A-V; `K205V` is 2020 May 31. NaN where it is none.
 * Source: Minor Planet Center, "Packed Dates".
 */
export function packedDateAt(text: string, from: number): number {
  const century = text.charCodeAt(from) - 55;
  const tens = text.charCodeAt(from + 1) - 48;
  const ones = text.charCodeAt(from + 2) - 48;
  const month = digitValue(text.charCodeAt(from + 3));
  const day = digitValue(text.charCodeAt(from + 4));
  const wellFormed =
    century >= 10 && century <= 35 && tens >= 0 && tens <= 9 && ones >= 0 && ones <= 9 && month >= 1;
  if (!wellFormed || month > 12 || day < 1 || day > 31) return NaN;
  const year = century * 100 + tens * 10 + ones;
  return isCalendarDay(year, month, day) ? calendarToJd(year, month, day) : NaN;
}

/** The packed form of the day on which a TT Julian date falls; null outside years 1000-3599 or off 0h. */
export function packDate(ttJd: number): string | null {
  const { year, month, day } = jdToCalendar(ttJd, 5);
  if (year < 1000 || year > 3599 || !Number.isInteger(day)) return null;
  const century = digitFor(Math.floor(year / 100));
  return `${century}${String(year % 100).padStart(2, '0')}${digitFor(month)}${digitFor(day)}`;
}
