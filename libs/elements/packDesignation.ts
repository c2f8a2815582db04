import { digitFor, writeBase62 } from './base62';
import { type DesignationParts } from './designation';
import { orderToLetters } from './halfMonth';

/** The last number that fits a letter and four digits, and the last order that fits two characters. */
const FIRST_TILDE_NUMBER = 620_000;
const LAST_PLAIN_ORDER = 15_500;
const LAST_PLAIN_CYCLE = 619;

/**
 * The packed number of a minor planet: 3202 `03202`, 360017 `a0017`, from 620000 on a tilde and four base-62
 * digits. Null beyond 15396335. Source: Minor Planet Center, "Packed Provisional and Permanent Designations".
 */
export function packAsteroidNumber(number: number): string | null {
  if (number >= FIRST_TILDE_NUMBER) {
    const digits = writeBase62(number - FIRST_TILDE_NUMBER, 4);
    return digits === null ? null : `~${digits}`;
  }
  return `${digitFor(Math.floor(number / 10_000))}${String(number % 10_000).padStart(4, '0')}`;
}

/**
 * The packed provisional designation of a minor planet: 2031 KQ12 `K31K12Q`, surveys `PLS2040`, and past the
 * order 15500 of a half-month the extended form, 2026 CZ6190 `_QC0aEM` (2000-2061 only). Same source.
 */
export function packAsteroidProvisional(parts: DesignationParts): string | null {
  const order = parts.order ?? 0;
  if (parts.survey !== null) {
    return order > 9999 ? null : `${parts.survey.replace('-', '')}S${String(order).padStart(4, '0')}`;
  }
  const year = parts.year ?? 0;
  if (order > LAST_PLAIN_ORDER) {
    const digits = writeBase62(order - LAST_PLAIN_ORDER - 1, 4);
    const inReach = year >= 2000 && year <= 2061 && digits !== null;
    return inReach ? `_${digitFor(year - 2000)}${parts.halfMonth}${digits}` : null;
  }
  const when = packYear(year);
  return when === null ? null : `${when}${parts.halfMonth}${packLettered(order)}`;
}

/**
 * The packed designation of a comet: 1995 A1 `J95A010`, its orbit type in front where it is known
 * (`CK31K070`), a fragment as a small letter at the end (`J94P01b`); numbered comets `0999P`, their fragment's
 * small letters in columns 11-12. Null where there is no room. Same source.
 */
export function packComet(parts: DesignationParts): string | null {
  const fragment = parts.fragment?.toLowerCase() ?? '';
  if (parts.number !== null) {
    if (parts.number > 9999) return null;
    const head = `${String(parts.number).padStart(4, '0')}${parts.prefix ?? ''}`;
    return fragment === '' ? head : head + fragment.padStart(7);
  }
  const when = packYear(parts.year ?? 0);
  const order = parts.order ?? 0;
  if (when === null) return null;
  const head = `${parts.prefix ?? ''}${when}${parts.halfMonth}`;
  if (parts.lettered) {
    return fragment === '' && order <= LAST_PLAIN_ORDER ? head + packLettered(order) : null;
  }
  if (fragment.length > 1 || order > LAST_PLAIN_CYCLE) return null;
  return `${head}${packCycle(order)}${fragment === '' ? '0' : fragment}`;
}

/** The year's century as a letter (I 18, J 19, K 20, …) and its last two digits. */
function packYear(year: number): string | null {
  if (year < 1000 || year > 3599) return null;
  return digitFor(Math.floor(year / 100)) + String(year % 100).padStart(2, '0');
}

function packLettered(order: number): string {
  const { letter, cycle } = orderToLetters(order);
  return packCycle(cycle) + letter;
}

/** 0-619 in two characters: tens as a base-62 digit, then the unit. */
function packCycle(cycle: number): string {
  return digitFor(Math.floor(cycle / 10)) + String(cycle % 10);
}
