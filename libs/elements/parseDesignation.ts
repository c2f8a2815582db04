import {
  type CometPrefix,
  type Designation,
  type DesignationParts,
  designationOf,
  invalidDesignation,
  type Survey,
} from './designation';
import { halfMonthProblem, secondLetterRank } from './halfMonth';
import { quoted } from './problem';
import { unpackDesignation } from './unpackDesignation';

const HOW =
  'Comets are written C/2031 K7 or 999P, minor planets 2031 KQ12 or (912345), packed forms K31K12Q or CK31K070';

const PREFIXED = /^([A-Z])\s*\/\s*(.*)$/i;
const NUMBERED_COMET = /^(\d+)([A-Z])(?:-([A-Z]{1,2}))?(?:\s*\/\s*(.*)|\s+(.*))?$/i;
const PROVISIONAL = /^(-?\d{1,4}|A\d{3})\s*([A-Z])([A-Z]?)(\d*)(?:-([A-Z]{1,2}))?(?:\s*\((.*)\)|\s+(.*))?$/i;
// The space is needed: 2040P-L would be fragment L of a comet 2040P.
const SURVEY = /^(\d{1,5}) (P-L|T-[123])$/i;
const NUMBERED = /^(?:\((\d+)\)|(\d+))(?:\s+(.+)|\s*)$/;
const LOOKS_PROVISIONAL = /^(?:A?\d{3,4})\s*[A-Z]{1,2}\d*$/i;

/** Year with a small letter, or with a Roman number that could be nothing newer: 1994n, 1996 XII. */
const OLD_STYLE = /^\d{4}(?:[a-z]\d?| [IVX]{3,})$/;

interface Partial {
  readonly parts?: Omit<DesignationParts, 'kind' | 'prefix' | 'number'>;
  readonly problem?: string;
}

/**
 * A designation from any of its written or packed forms, with or without the body's name; letter case, stray
 * spaces and subscript digits are forgiven in written forms. What is no designation comes back with the reason.
 * Sources: Minor Planet Circulars 23803-4 (the comet scheme of 1995, IAU 1994 resolution); Minor Planet Center,
 * "New- and Old-Style Minor Planet Designations" and "Packed Provisional and Permanent Designations".
 */
export function parseDesignation(text: string): Designation {
  if (text.length > 200) return invalidDesignation(text.slice(0, 200), `The text is too long. ${HOW}.`);
  const written = text
    .normalize('NFKC')
    .replace(/[‐-―−]/g, '-')
    .trim();
  if (written === '') return invalidDesignation(text, `Nothing was given. ${HOW}.`);
  const packed = unpackDesignation(written);
  if (packed !== null) return designationOf(text, packed);
  const tidy = written.replace(/\s+/g, ' ');
  if (OLD_STYLE.test(tidy)) {
    const why = `${quoted(tidy)} is in the style that comets had before 1995; look up its present designation.`;
    return invalidDesignation(text, why);
  }
  return (
    readSurvey(text, tidy) ??
    readPrefixed(text, tidy) ??
    readNumberedComet(text, tidy) ??
    readProvisional(text, tidy) ??
    readNumbered(text, tidy) ??
    invalidDesignation(text, `${quoted(text)} is no designation. ${HOW}.`)
  );
}

function readSurvey(text: string, tidy: string): Designation | null {
  const match = SURVEY.exec(tidy);
  if (match === null) return null;
  const order = Number(match[1]);
  if (order === 0 || order > 9999 || match[1]!.startsWith('0')) {
    return invalidDesignation(text, 'Survey numbers run from 1 to 9999, without leading zeros.');
  }
  const survey = match[2]!.toUpperCase() as Survey;
  return designationOf(text, { ...plain('asteroid'), order, survey });
}

function readPrefixed(text: string, tidy: string): Designation | null {
  const match = PREFIXED.exec(tidy);
  if (match === null) return null;
  const prefix = cometPrefix(match[1]!);
  if (prefix === null) {
    const why = `${match[1]!.toUpperCase()}/ is no prefix of the comet series; those are P/, C/, D/, X/, A/ and I/.`;
    return invalidDesignation(text, why);
  }
  const found = provisionalParts(match[2]!, true);
  if (found?.parts === undefined) {
    const why =
      found?.problem ?? `After ${prefix}/ comes year, half-month and order, as in ${prefix}/2031 K7.`;
    return invalidDesignation(text, why);
  }
  return designationOf(text, { ...found.parts, kind: 'comet', prefix, number: null });
}

function readNumberedComet(text: string, tidy: string): Designation | null {
  const match = NUMBERED_COMET.exec(tidy);
  if (match === null) return null;
  const rest = (match[4] ?? match[5] ?? '').trim();
  const prefix = cometPrefix(match[2]!);
  if (prefix === null || !'PDI'.includes(prefix)) {
    const why = `Only comets with the letters P, D and I carry numbers (1P, 3D, 1I), not ${match[2]!.toUpperCase()}.`;
    return invalidDesignation(text, why);
  }
  if (match[1]!.length > 7) return invalidDesignation(text, `${quoted(match[1]!)} is no comet's number.`);
  const number = Number(match[1]);
  const provisional = /^-?\d/.test(rest) ? provisionalParts(rest, true) : null;
  if (provisional?.problem !== undefined) return invalidDesignation(text, provisional.problem);
  const tail = /^(.{2,})-([A-Z]{1,2})$/.exec(rest);
  const fragment = match[3]?.toUpperCase() ?? tail?.[2] ?? null;
  const name = (match[3] === undefined ? tail?.[1] : undefined) ?? rest;
  const parts = provisional?.parts ?? { ...plain('comet'), name: unbracketed(name) };
  return designationOf(text, {
    ...parts,
    kind: 'comet',
    prefix,
    number,
    fragment: fragment ?? parts.fragment,
  });
}

function readProvisional(text: string, tidy: string): Designation | null {
  const match = PROVISIONAL.exec(tidy);
  if (match === null || (match[1]!.length < 4 && !match[1]!.startsWith('-'))) return null;
  const lettered = match[3] !== '';
  const found = provisionalParts(tidy, !lettered);
  if (found === null) return null;
  if (found.parts === undefined) return invalidDesignation(text, found.problem ?? HOW);
  return designationOf(text, {
    ...found.parts,
    kind: lettered ? 'asteroid' : 'comet',
    prefix: null,
    number: null,
  });
}

function readNumbered(text: string, tidy: string): Designation | null {
  const match = NUMBERED.exec(tidy);
  if (match === null) return null;
  const digits = (match[1] ?? match[2])!.replace(/^0+(?=\d)/, '');
  if (digits.length > 9) return invalidDesignation(text, `${quoted(digits)} is no minor planet's number.`);
  const rest = match[3] ?? '';
  const within = LOOKS_PROVISIONAL.test(rest) ? provisionalParts(rest, false) : null;
  if (within?.problem !== undefined) return invalidDesignation(text, within.problem);
  const parts = within?.parts ?? { ...plain('asteroid'), name: unbracketed(rest) };
  return designationOf(text, { ...parts, kind: 'asteroid', prefix: null, number: Number(digits) });
}

/** Year, half-month, order, fragment and name; null where the text has not even the outline of them. */
function provisionalParts(text: string, comet: boolean): Partial | null {
  const match = PROVISIONAL.exec(text);
  if (match === null) return null;
  const halfMonth = match[2]!.toUpperCase();
  const second = match[3]!.toUpperCase();
  const digits = match[4]!;
  const problem =
    halfMonthProblem(halfMonth) ?? yearProblem(match[1]!, comet) ?? orderProblem(second, digits, comet);
  if (problem !== null) return { problem };
  if (!comet && (match[5] !== undefined || match[6] !== undefined || match[7] !== undefined)) {
    return {
      problem: 'A minor planet’s provisional designation ends with its letters and cycle: 2031 KQ12.',
    };
  }
  const rank = secondLetterRank(second);
  const written = match[1]!.toUpperCase();
  return {
    parts: {
      year: written.startsWith('A') ? Number(`1${written.slice(1)}`) : Number(written),
      halfMonth,
      order: second === '' ? Number(digits) : Number(digits) * 25 + rank,
      lettered: second !== '',
      survey: null,
      fragment: match[5]?.toUpperCase() ?? null,
      name: unbracketed(match[6] ?? match[7] ?? ''),
    },
  };
}

function yearProblem(written: string, comet: boolean): string | null {
  const old = /^A/i.test(written);
  const year = old ? Number(`1${written.slice(1)}`) : Number(written);
  if (comet) {
    if (old) return 'A in place of the 1 of the year belongs to minor planets only (A904 OA).';
    return year === 0 || /^-?0/.test(written) ? `${quoted(written)} is no year of discovery.` : null;
  }
  if (old && (year < 1801 || year > 1924)) {
    return `A in place of the 1 stands for the years 1801 to 1924 only; write the year ${year} in full.`;
  }
  if (!old && (year < 1925 || written.length !== 4)) {
    return year >= 1801
      ? `Minor planets found before 1925 are written with A for the 1 of the year: A${written.slice(1)} …`
      : `${quoted(written)} is no year in which minor planets were found.`;
  }
  return null;
}

function orderProblem(second: string, digits: string, comet: boolean): string | null {
  if (second === 'I') return 'The second letter I is not used; H is followed by J.';
  if (digits.length > 8) return `The number ${quoted(digits)} is too long.`;
  if (second === '') {
    if (!comet) return 'A minor planet has two letters after the year, as in 2031 KQ12.';
    if (digits === '') return 'The order in the half-month is missing: a number from 1 on, as in C/2031 K7.';
  }
  if (digits.startsWith('0')) {
    return second === ''
      ? `The order in the half-month is a number from 1 on without leading zeros, not ${digits}.`
      : `The cycle after the letters is left out at first, then counts from 1 without leading zeros; ${digits} is neither.`;
  }
  return null;
}

function cometPrefix(letter: string): CometPrefix | null {
  const upper = letter.toUpperCase();
  return 'PCDXAI'.includes(upper) ? (upper as CometPrefix) : null;
}

/** A name without the brackets around it; null where nothing is left. */
function unbracketed(name: string): string | null {
  const bare = name
    .trim()
    .replace(/^\((.*)\)$/, '$1')
    .trim();
  return bare === '' ? null : bare;
}

function plain(kind: 'comet' | 'asteroid'): DesignationParts {
  return {
    kind,
    prefix: null,
    number: null,
    year: null,
    halfMonth: null,
    order: null,
    lettered: false,
    survey: null,
    fragment: null,
    name: null,
  };
}
