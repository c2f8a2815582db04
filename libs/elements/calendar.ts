/** The Unix epoch as a Julian date. */
const UNIX_EPOCH_JD = 2_440_587.5;
const MS_PER_DAY = 86_400_000;

export interface CalendarDay {
  readonly year: number;
  readonly month: number;
  /** Day of the month with its fraction. */
  readonly day: number;
}

/**
 * Julian date of a calendar date, by the Julian calendar before 1582 October 15 and the Gregorian from
 * then on, as the trade counts (Meeus, Astronomical Algorithms, chapter 7). From year -4712.
 */
export function calendarToJd(year: number, month: number, day: number): number {
  const y = month <= 2 ? year - 1 : year;
  const m = month <= 2 ? month + 12 : month;
  const century = Math.floor(y / 100);
  const leap = isJulian(year, month, day) ? 0 : 2 - century + Math.floor(century / 4);
  return Math.floor(365.25 * (y + 4716)) + Math.floor(30.6001 * (m + 1)) + day + leap - 1524.5;
}

/** The calendar date of a Julian date, its day rounded to `decimals` places (Meeus, chapter 7). */
export function jdToCalendar(jd: number, decimals: number): CalendarDay {
  const unit = 10 ** decimals;
  let whole = Math.floor(jd + 0.5);
  let fraction = Math.round((jd + 0.5 - whole) * unit) / unit;
  if (fraction >= 1) {
    whole += 1;
    fraction = 0;
  }
  const alpha = Math.floor((whole - 1_867_216.25) / 36_524.25);
  const a = whole < 2_299_161 ? whole : whole + 1 + alpha - Math.floor(alpha / 4);
  const b = a + 1524;
  const c = Math.floor((b - 122.1) / 365.25);
  const d = Math.floor(365.25 * c);
  const e = Math.floor((b - d) / 30.6001);
  const month = e < 14 ? e - 1 : e - 13;
  return {
    year: month > 2 ? c - 4716 : c - 4715,
    month,
    day: b - d - Math.floor(30.6001 * e) + fraction,
  };
}

/** Days in a month, by the calendar then in force. */
export function daysInMonth(year: number, month: number): number {
  if (month === 2) {
    const leap = year % 4 === 0 && (year < 1582 || year % 100 !== 0 || year % 400 === 0);
    return leap ? 29 : 28;
  }
  return month === 4 || month === 6 || month === 9 || month === 11 ? 30 : 31;
}

/** Whether a calendar date exists, its day with or without a fraction. */
export function isCalendarDay(year: number, month: number, day: number): boolean {
  return (
    Number.isInteger(month) && month >= 1 && month <= 12 && day >= 1 && day < daysInMonth(year, month) + 1
  );
}

/** A TT Julian date as ISO 8601 to the millisecond, without offset, for it is TT and not a civil time. */
export function isoTt(ttJd: number): string {
  return new Date(Math.round((ttJd - UNIX_EPOCH_JD) * MS_PER_DAY)).toISOString().slice(0, -1);
}

/** Milliseconds of a proleptic Gregorian date and time, as ISO 8601 counts, as a Julian date. */
export function msToJd(ms: number): number {
  return ms / MS_PER_DAY + UNIX_EPOCH_JD;
}

function isJulian(year: number, month: number, day: number): boolean {
  return year < 1582 || (year === 1582 && (month < 10 || (month === 10 && day < 15)));
}
