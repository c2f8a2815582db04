import { digitValue, readBase62 } from './base62';
import { type CometPrefix, type DesignationParts, type Survey } from './designation';
import { secondLetterRank } from './halfMonth';

const NOTHING = {
  prefix: null,
  number: null,
  year: null,
  halfMonth: null,
  order: null,
  lettered: false,
  survey: null,
  fragment: null,
  name: null,
} as const;

const NUMBERED_COMET = /^(\d{4})([PDI])(?:( {0,6}[a-z]{1,2})|([A-Z]\d\d[A-Z][0-9A-Za-z]\d[0-9A-Za-z]))?$/;
const COMET = /^([PCDXAI]?)([A-Z]\d\d)([A-Z])([0-9A-Za-z]\d)([0a-zA-Z])$/;
const EXTENDED = /^_([0-9A-Za-z])([A-Z])([0-9A-Za-z]{4})$/;
const NUMBER = /^([0-9A-Za-z])(\d{4})$/;
const TILDE_NUMBER = /^~([0-9A-Za-z]{4})$/;
const SURVEY = /^(PLS|T1S|T2S|T3S)(\d{4})$/;
const SURVEYS: Readonly<Record<string, Survey>> = { PLS: 'P-L', T1S: 'T-1', T2S: 'T-2', T3S: 'T-3' };

/**
 * The parts of a packed designation, or null where the text has no packed shape. Half-month letters and the
 * like are still to be judged by `partsProblem`. Source: Minor Planet Center, "Packed Provisional and
 * Permanent Designations".
 */
export function unpackDesignation(text: string): DesignationParts | null {
  return unpackAsteroid(text) ?? unpackComet(text);
}

function unpackAsteroid(text: string): DesignationParts | null {
  const number = NUMBER.exec(text);
  if (number !== null) {
    const value = digitValue(number[1]!.charCodeAt(0)) * 10_000 + Number(number[2]);
    return { ...NOTHING, kind: 'asteroid', number: value };
  }
  const tilde = TILDE_NUMBER.exec(text);
  if (tilde !== null) {
    return { ...NOTHING, kind: 'asteroid', number: 620_000 + (readBase62(tilde[1]!) ?? 0) };
  }
  const survey = SURVEY.exec(text);
  if (survey !== null) {
    const sign = SURVEYS[survey[1]!] ?? null;
    return { ...NOTHING, kind: 'asteroid', survey: sign, order: Number(survey[2]) };
  }
  const extended = EXTENDED.exec(text);
  if (extended !== null) {
    return {
      ...NOTHING,
      kind: 'asteroid',
      year: 2000 + digitValue(extended[1]!.charCodeAt(0)),
      halfMonth: extended[2]!,
      order: 15_501 + (readBase62(extended[3]!) ?? 0),
      lettered: true,
    };
  }
  return null;
}

/** Comets, and the plain seven characters of minor planets, which differ only in their last one. */
function unpackComet(text: string): DesignationParts | null {
  const numbered = NUMBERED_COMET.exec(text);
  if (numbered !== null) {
    const within = numbered[4] === undefined ? null : unpackComet(numbered[4]);
    return {
      ...NOTHING,
      ...within,
      kind: 'comet',
      number: Number(numbered[1]),
      prefix: numbered[2] as CometPrefix,
      fragment: numbered[3]?.trim().toUpperCase() ?? within?.fragment ?? null,
    };
  }
  const match = COMET.exec(text);
  if (match === null) return null;
  const prefix = (match[1] === '' ? null : match[1]) as CometPrefix | null;
  const when = match[2]!;
  const year = digitValue(when.charCodeAt(0)) * 100 + Number(when.slice(1));
  const tens = digitValue(match[4]!.charCodeAt(0));
  const cycle = tens * 10 + Number(match[4]!.charAt(1));
  const last = match[5]!;
  const base = { ...NOTHING, prefix, year, halfMonth: match[3]! };
  if (last >= 'A' && last <= 'Z') {
    const rank = secondLetterRank(last);
    if (rank === 0) return null;
    return {
      ...base,
      kind: prefix === null ? 'asteroid' : 'comet',
      order: cycle * 25 + rank,
      lettered: true,
    };
  }
  return { ...base, kind: 'comet', order: cycle, fragment: last === '0' ? null : last.toUpperCase() };
}

const A = 65;
const CODE_0 = 48;
const CODE_9 = 57;
const TILDE = 126;

/**
 * The designation in full of the packed minor planet in columns 1-7 of a line, for lines by the million: the
 * two common shapes without a regular expression. Null where it is neither; `unpackDesignation` knows the rest.
 */
export function asteroidDesignationAt(line: string): string | null {
  const c5 = line.charCodeAt(5);
  if (c5 === 32 || c5 !== c5) {
    if (line.charCodeAt(0) === TILDE) return tildeNumberAt(line);
    const head = digitValue(line.charCodeAt(0));
    let number = head;
    for (let i = 1; i < 5; i++) {
      const digit = line.charCodeAt(i) - CODE_0;
      if (head < 0 || digit < 0 || digit > 9) return null;
      number = number * 10 + digit;
    }
    return number > 0 ? `(${number})` : null;
  }
  const century = line.charCodeAt(0) - A + 10;
  const c1 = line.charCodeAt(1);
  const c2 = line.charCodeAt(2);
  const half = line.charCodeAt(3);
  const tens = digitValue(line.charCodeAt(4));
  const last = line.charCodeAt(6);
  const isYear = century >= 10 && century <= 35 && isDigit(c1) && isDigit(c2);
  const isHalf = half >= A && half < A + 25 && half !== A + 8;
  const isOrder = tens >= 0 && isDigit(c5) && last >= A && last <= A + 25 && last !== A + 8;
  if (!isYear || !isHalf || !isOrder) return null;
  const year = century * 100 + (c1 - CODE_0) * 10 + c2 - CODE_0;
  if (year < 1925) return null;
  const cycle = tens * 10 + c5 - CODE_0;
  const letters = line.charAt(3) + line.charAt(6);
  return cycle === 0 ? `${year} ${letters}` : `${year} ${letters}${cycle}`;
}

function tildeNumberAt(line: string): string | null {
  let above = 0;
  for (let i = 1; i < 5; i++) {
    const digit = digitValue(line.charCodeAt(i));
    if (digit < 0) return null;
    above = above * 62 + digit;
  }
  return `(${620_000 + above})`;
}

function isDigit(code: number): boolean {
  return code >= CODE_0 && code <= CODE_9;
}
