/** What `decimalAt` gives for a stretch of blanks; malformed figures are NaN. */
export const BLANK = Infinity;

const POWERS = Array.from({ length: 16 }, (_, i) => 10 ** i);
const SPACE = 32;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;

/**
 * The decimal number in columns [from, to) of a line (counted from 0), blanks around it allowed: BLANK where there
 * is nothing, NaN where there is anything else. Every digit counts, as in `Number`, without making a string.
 */
export function decimalAt(line: string, from: number, to: number): number {
  const end = to < line.length ? to : line.length;
  let i = from;
  while (i < end && line.charCodeAt(i) === SPACE) i++;
  if (i >= end) return BLANK;
  let negative = false;
  const sign = line.charCodeAt(i);
  if (sign === MINUS || sign === PLUS) {
    negative = sign === MINUS;
    i++;
  }
  let digits = 0;
  let mantissa = 0;
  let decimals = -1;
  for (; i < end; i++) {
    const code = line.charCodeAt(i);
    const digit = code - 48;
    if (digit >= 0 && digit <= 9) {
      mantissa = mantissa * 10 + digit;
      digits++;
      if (decimals >= 0) decimals++;
    } else if (code === POINT && decimals < 0) {
      decimals = 0;
    } else {
      break;
    }
  }
  while (i < end && line.charCodeAt(i) === SPACE) i++;
  // Up to 15 digits both the mantissa and the power of ten are exact, so their quotient is rounded once.
  if (i < end || digits === 0 || digits > 15) return NaN;
  const value = decimals > 0 ? mantissa / POWERS[decimals]! : mantissa;
  return negative ? -value : value;
}

/** The text in columns [from, to), without the blanks around it. */
export function textAt(line: string, from: number, to: number): string {
  let start = from;
  let end = to < line.length ? to : line.length;
  while (start < end && line.charCodeAt(start) === SPACE) start++;
  while (end > start && line.charCodeAt(end - 1) === SPACE) end--;
  return line.slice(start, end);
}

/** Whether columns [from, to) hold nothing but blanks. */
export function isBlankAt(line: string, from: number, to: number): boolean {
  const end = to < line.length ? to : line.length;
  for (let i = from; i < end; i++) if (line.charCodeAt(i) !== SPACE) return false;
  return true;
}

/** A column range as messages name it, from 1: [30, 39) is "columns 31-39". */
export function columnsOf(from: number, to: number): string {
  return to - from === 1 ? `column ${to}` : `columns ${from + 1}-${to}`;
}
