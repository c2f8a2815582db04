import { IANAZone } from 'luxon';
import { z } from 'zod';

// Messages are worded as what would be right; `checked` makes sentences of them.

/** A number from `low` to `high`; `right` says so in words, with the unit. */
export function between(low: number, high: number, right: string) {
  return z
    .number({ error: right })
    .min(low, { error: right })
    .max(high, { error: right })
    .meta({ description: right });
}

/** A whole number from `low` to `high`. */
export function wholeBetween(low: number, high: number, right: string) {
  return z
    .int({ error: right })
    .min(low, { error: right })
    .max(high, { error: right })
    .meta({ description: right });
}

/** One line of text that says something, without blanks around it. */
export function line(most: number) {
  const right = `one line of text, 1 to ${String(most)} characters`;
  return z
    .string({ error: right })
    .trim()
    .min(1, { error: right })
    .max(most, { error: right })
    .regex(/^[^\p{Cc}]*$/u, { error: right })
    .meta({ description: right });
}

/** Text of any number of lines, possibly none. */
export function prose(most: number) {
  const right = `text of at most ${String(most)} characters`;
  return z
    .string({ error: right })
    .trim()
    .max(most, { error: right })
    .regex(/^(?:[^\p{Cc}]|[\t\r\n])*$/u, { error: right })
    .meta({ description: right });
}

export const latitudeDeg = between(-90, 90, 'degrees from -90 to 90, north positive');
export const longitudeDeg = between(-180, 180, 'degrees from -180 to 180, east positive');
export const elevationM = between(-430, 6500, 'metres above sea level, from -430 to 6500');

const AZIMUTH_RIGHT = 'degrees from 0 to below 360, north through east';

export const azimuthDeg = z
  .number({ error: AZIMUTH_RIGHT })
  .min(0, { error: AZIMUTH_RIGHT })
  .lt(360, { error: AZIMUTH_RIGHT })
  .meta({ description: AZIMUTH_RIGHT });

const DATE_RIGHT = 'a date that exists, as YYYY-MM-DD, from 1900-01-01 to 2199-12-31';

/** A calendar date 'YYYY-MM-DD'. */
export const date = z
  .string({ error: DATE_RIGHT })
  .regex(/^\d{4}-\d{2}-\d{2}$/, { error: DATE_RIGHT, abort: true })
  .refine(isDate, { error: DATE_RIGHT })
  .meta({ description: DATE_RIGHT, format: 'date' });

const TIME_RIGHT = 'a local time of day as HH:MM, from 00:00 to 23:59';

/** A local time of day 'HH:MM'. */
export const timeOfDay = z
  .string({ error: TIME_RIGHT })
  .regex(/^(?:[01]\d|2[0-3]):[0-5]\d$/, { error: TIME_RIGHT })
  .meta({ description: TIME_RIGHT });

const ZONE_RIGHT = 'the IANA name of a time zone, such as Europe/Zurich';

/** A zone whose rules this machine knows. */
export const zone = z
  .string({ error: ZONE_RIGHT })
  .refine((name) => /^[A-Za-z]/.test(name) && IANAZone.isValidZone(name), { error: ZONE_RIGHT })
  .meta({ description: ZONE_RIGHT });

const INSTANT_RIGHT = 'an instant with its offset, such as 2027-03-14T20:10:00+01:00';

/** An ISO 8601 instant with offset or Z. */
export const instant = z.iso
  .datetime({ offset: true, error: INSTANT_RIGHT })
  .meta({ description: INSTANT_RIGHT });

/** Minutes from local noon: orders the times of an evening, which runs from noon to noon. */
export function minutesFromNoon(time: string): number {
  const [hour = 0, minute = 0] = time.split(':').map(Number);
  return ((hour + 12) % 24) * 60 + minute;
}

function isDate(text: string): boolean {
  const parsed = new Date(`${text}T00:00:00Z`);
  const year = Number(text.slice(0, 4));
  return (
    !Number.isNaN(parsed.getTime()) && parsed.toISOString().startsWith(text) && year >= 1900 && year <= 2199
  );
}
