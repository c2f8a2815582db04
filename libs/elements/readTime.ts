import { utcMsToTtJd } from '#sky';
import { calendarToJd, isCalendarDay, msToJd } from './calendar';
import { packedDateAt } from './packedDate';
import { quoted } from './problem';

/** A time as read: its TT Julian date, or what is wrong with it. */
export type ReadTime =
  { readonly ttJd: number; readonly note: string | null } | { readonly ttJd: null; readonly problem: string };

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const WOULD_BE_RIGHT =
  'write it in TT as 2032-02-11T11:36:31, as 2032-02-11.4837, as 2032 Feb 11.4837, or as a Julian date like 2463274.9837';

const ISO = /^([+-]?\d{4,6})-(\d\d)-(\d\d)(?:[T ](\d\d):(\d\d)(?::(\d\d(?:[.,]\d+)?))?)?$/;
const ZONE = /\s*(Z|UTC?|TT|TDT|TDB|[+-]\d\d:?\d\d)$/i;
const SPACED = /^([+-]?\d{1,5})[-/ ]+(\d{1,2}|[a-z]{3,9})\.?[-/ ]+(\d{1,2}(?:\.\d*)?)$/i;
const CLOSED_UP = /^(\d{4})(\d\d)(\d\d(?:\.\d*)?)$/;
const JULIAN_DATE = /^(?:JD\s*)?(\d{7}(?:\.\d*)?)$/i;
const MODIFIED = /^MJD\s*(\d{1,6}(?:\.\d*)?)$/i;

/**
 * An instant of an element set, in TT, from any of the ways in which the trade writes one: ISO 8601, a date
 * with a decimal day (months as figures or English names), YYYYMMDD, a Julian date (JD), `MJD …`, or a packed
 * date such as K205V. One that carries Z or an offset is civil time: it is turned into TT, and the note says so.
 */
export function readTime(text: string): ReadTime {
  const asWritten = text.trim();
  if (asWritten.length > 60) return { ttJd: null, problem: `${quoted(text)} is no date; ${WOULD_BE_RIGHT}` };
  const zone = ISO.test(asWritten.replace(ZONE, '')) ? ZONE.exec(asWritten)?.[1]?.toUpperCase() : undefined;
  const scale = /\s*(TT|TDT|TDB)$/i;
  const bare = zone === undefined ? asWritten.replace(scale, '') : asWritten.replace(ZONE, '');

  const iso = ISO.exec(bare);
  if (iso !== null) return fromIso(iso, zone, asWritten);

  const dated = CLOSED_UP.exec(bare) ?? SPACED.exec(bare);
  if (dated !== null) {
    const year = Number(dated[1]);
    const month = monthOf(dated[2]!);
    const day = Number(dated[3]);
    if (month === null || !isCalendarDay(year, month, day) || year < -4712) return noSuchDay(asWritten);
    return { ttJd: calendarToJd(year, month, day), note: null };
  }
  const julian = JULIAN_DATE.exec(bare);
  if (julian !== null) return { ttJd: Number(julian[1]), note: null };
  const modified = MODIFIED.exec(bare);
  if (modified !== null) return { ttJd: Number(modified[1]) + 2_400_000.5, note: null };
  if (bare.length === 5) {
    const packed = packedDateAt(bare, 0);
    if (!Number.isNaN(packed)) return { ttJd: packed, note: null };
  }
  const modifiedHint = /^\d{5}(\.\d*)?$/.test(bare) ? ' (a modified Julian date needs MJD in front)' : '';
  return { ttJd: null, problem: `${quoted(asWritten)} is no date${modifiedHint}; ${WOULD_BE_RIGHT}` };
}

function fromIso(iso: RegExpExecArray, zone: string | undefined, asWritten: string): ReadTime {
  const [year, month, day, hour, minute] = [1, 2, 3, 4, 5].map((i) => Number(iso[i] ?? 0));
  const second = Number((iso[6] ?? '0').replace(',', '.'));
  const clockRight = hour! < 24 && minute! < 60 && second < 60;
  if (month! < 1 || month! > 12 || day! < 1 || day! > gregorianMonth(year!, month!) || !clockRight) {
    return noSuchDay(asWritten);
  }
  const midnight = new Date(0).setUTCFullYear(year!, month! - 1, day);
  const ms = midnight + ((hour! * 60 + minute!) * 60 + second) * 1000;
  if (zone === undefined || zone === 'TT' || zone === 'TDT' || zone === 'TDB') {
    return { ttJd: msToJd(ms), note: null };
  }
  const ttJd = utcMsToTtJd(ms - offsetMinutes(zone) * 60_000);
  return {
    ttJd,
    note: `${quoted(asWritten)} is civil time; element sets count in TT, and it was converted (leave the offset out if it is TT already)`,
  };
}

function gregorianMonth(year: number, month: number): number {
  return new Date(new Date(0).setUTCFullYear(year, month, 0)).getUTCDate();
}

function offsetMinutes(zone: string): number {
  const parts = /^([+-])(\d\d):?(\d\d)$/.exec(zone);
  if (parts === null) return 0;
  return (parts[1] === '-' ? -1 : 1) * (Number(parts[2]) * 60 + Number(parts[3]));
}

function monthOf(text: string): number | null {
  if (/^\d+$/.test(text)) return Number(text);
  const at = MONTHS.indexOf(text.slice(0, 3).toLowerCase());
  return at < 0 ? null : at + 1;
}

function noSuchDay(text: string): ReadTime {
  return { ttJd: null, problem: `${quoted(text)} is no day of the calendar; ${WOULD_BE_RIGHT}` };
}
