/** The digits of packed designations in order of value: 0-9, A-Z (10-35), a-z (36-61). */
const DIGITS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** The value 0-61 of a digit given by its character code, or -1 where it is none. */
export function digitValue(code: number): number {
  if (code >= 48 && code <= 57) return code - 48;
  if (code >= 65 && code <= 90) return code - 55;
  if (code >= 97 && code <= 122) return code - 61;
  return -1;
}

/** The digit for a value of 0-61. */
export function digitFor(value: number): string {
  return DIGITS.charAt(value);
}

/** A whole number of base-62 digits, or null where a character is none of them. */
export function readBase62(text: string): number | null {
  let value = 0;
  for (let i = 0; i < text.length; i++) {
    const digit = digitValue(text.charCodeAt(i));
    if (digit < 0) return null;
    value = value * 62 + digit;
  }
  return value;
}

/** A number as exactly `width` base-62 digits, or null where it does not fit. */
export function writeBase62(value: number, width: number): string | null {
  let rest = value;
  let text = '';
  for (let i = 0; i < width; i++) {
    text = digitFor(rest % 62) + text;
    rest = Math.floor(rest / 62);
  }
  return rest === 0 ? text : null;
}
