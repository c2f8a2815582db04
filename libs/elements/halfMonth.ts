import { daysInMonth } from './calendar';

/** Letters of the half-months A (1-15 January) to Y (16-31 December); I is left out and Z unused. */
const HALF_MONTHS = 'ABCDEFGHJKLMNOPQRSTUVWXY';
/** Second letters of minor planets in order of discovery, 1-25; I is left out. */
const SECOND_LETTERS = 'ABCDEFGHJKLMNOPQRSTUVWXYZ';

/** Why a letter names no half-month, or null where it does. */
export function halfMonthProblem(letter: string): string | null {
  if (letter === 'I') return 'The half-month letter I is not used; H is 16-30 April, J is 1-15 May.';
  if (letter === 'Z') return 'The half-month letter Z is not used; the last is Y, 16-31 December.';
  return HALF_MONTHS.includes(letter) && letter.length === 1
    ? null
    : `A half-month is one letter, A-H or J-Y, not "${letter}".`;
}

/** First and last day of a half-month as ISO dates; before 1582 by the Julian calendar, as the trade counts. */
export function halfMonthDays(
  year: number,
  letter: string,
): { readonly from: string; readonly to: string } | null {
  const index = HALF_MONTHS.indexOf(letter);
  if (index < 0) return null;
  const month = Math.floor(index / 2) + 1;
  const secondHalf = index % 2 === 1;
  return {
    from: isoDay(year, month, secondHalf ? 16 : 1),
    to: isoDay(year, month, secondHalf ? daysInMonth(year, month) : 15),
  };
}

/** Place of a second letter in the alphabet without I, 1-25; 0 where it is none. */
export function secondLetterRank(letter: string): number {
  return SECOND_LETTERS.indexOf(letter) + 1;
}

/** Second letter and cycle of a minor planet's order in its half-month: 316 is Q12. */
export function orderToLetters(order: number): { readonly letter: string; readonly cycle: number } {
  return { letter: SECOND_LETTERS.charAt((order - 1) % 25), cycle: Math.floor((order - 1) / 25) };
}

function isoDay(year: number, month: number, day: number): string {
  const two = (n: number): string => String(n).padStart(2, '0');
  const sign = year < 0 ? '-' : '';
  const digits = String(Math.abs(year)).padStart(year < 0 ? 6 : 4, '0');
  return `${sign}${digits}-${two(month)}-${two(day)}`;
}
