import { clockWords, type Interval, sideWords } from '#nights';
import { DateTime } from 'luxon';
import { type PacketContent, type SkyPlace, type Standing } from './content';

/** Above this a compass direction says little. */
const OVERHEAD_DEG = 80;

/** "24° high in the south-west", or "almost overhead". */
export function standingWords({ altitudeDeg, azimuthDeg }: SkyPlace): string {
  const height = `${String(Math.round(altitudeDeg))}° high`;
  if (altitudeDeg >= OVERHEAD_DEG) return `${height}, almost overhead`;
  return `${height} in the ${sideWords(azimuthDeg)}`;
}

/** "Saturday 14 March 2027", as the club's own English has it. */
export function dateWords(date: string, locale: string, withYear = true): string {
  return DateTime.fromISO(date, {
    zone: 'utc',
    locale: /^en\b/i.test(locale) ? locale : 'en-GB',
  }).toLocaleString({
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    ...(withYear && { year: 'numeric' }),
  });
}

/** "19:10 to 21:40". */
export function hoursWords({ startMs, endMs }: Interval, zone: string): string {
  return `${clockWords(startMs, zone)} to ${clockWords(endMs, zone)}`;
}

/** "19:10–19:35", for columns. */
export function slotWords({ startMs, endMs }: Interval, zone: string): string {
  return `${clockWords(startMs, zone)}–${clockWords(endMs, zone)}`;
}

/** What, where and when, under the title of every sheet. */
export function occasionWords({ event, site, club }: PacketContent): string {
  const when = `${dateWords(event.date, club.locale)}, ${hoursWords(event, event.zone)} (${event.zone})`;
  return [event.title, ...(event.title.includes(site.name) ? [] : [site.name]), when].join(' · ');
}

/** "42.05° N, 7.15° W". */
export function coordinateWords(latitudeDeg: number, longitudeDeg: number): string {
  const part = (value: number, plus: string, minus: string): string =>
    `${Math.abs(value).toFixed(4)}° ${value < 0 ? minus : plus}`;
  return `${part(latitudeDeg, 'N', 'S')}, ${part(longitudeDeg, 'E', 'W')}`;
}

/**
 * Revision, elements with epoch and age, catalogue, program and the time of computing; of all moving targets, or
 * of those named.
 */
export function imprintWords(
  { imprint, revision, computedMs, event }: PacketContent,
  targets: readonly string[] | null = null,
): string {
  const computed = DateTime.fromMillis(computedMs, { zone: 'utc' }).toFormat("yyyy-LL-dd HH:mm 'UTC'");
  return [
    `Packet ${revision}`,
    `computed ${computed}`,
    ...imprint.elementSets
      .filter(({ target }) => targets === null || targets.includes(target))
      .map((set) => `${set.target}: ${elementWords(set, event.startMs)}`),
    `star catalogue ${imprint.catalogueVersion}`,
    `Duskwright ${imprint.programVersion}`,
  ].join(' · ');
}

/** "elements 2, epoch 2026-11-19, 40 days old". */
export function elementWords(
  { number, epoch }: { readonly number: number; readonly epoch: string | null },
  atMs: number,
): string {
  if (epoch === null) return `elements ${String(number)}, epoch not stated`;
  const days = Math.round((atMs - Date.parse(`${epoch.slice(0, 10)}T00:00:00Z`)) / 86_400_000);
  const age = days < 0 ? `${plural(-days, 'day')} ahead` : `${plural(days, 'day')} old`;
  return `elements ${String(number)}, epoch ${epoch.slice(0, 10)}, ${age} that night`;
}

/** "at 19:35, 24° high in the south-west". */
export function seenWords(standing: Standing, zone: string): string {
  return `at ${clockWords(standing.utcMs, zone)}, ${standingWords(standing)}`;
}

/** "1 day", "2 days". */
export function plural(count: number, word: string): string {
  return `${String(count)} ${word}${count === 1 ? '' : 's'}`;
}
