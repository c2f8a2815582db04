import { DateTime } from 'luxon';
import { contentLine, escapeText, uriValue } from './contentLine';
import { type CalendarEvent, type CalendarFeed } from './feed';
import { timeZoneComponent } from './timeZoneComponent';

/**
 * A feed as an iCalendar object (RFC 5545 with the calendar properties of RFC 7986). The same feed gives the
 * same bytes. Events keep the order they are given in. Throws a RangeError for an event that ends before it
 * starts or stands in an unknown zone.
 *
 * It carries no METHOD: a published calendar, whose DTSTAMP is the last change (RFC 5545, 3.8.7.2).
 */
export function renderCalendar(feed: CalendarFeed): string {
  const refresh = `PT${String(Math.max(1, Math.round(feed.refreshHours)))}H`;
  return [
    'BEGIN:VCALENDAR\r\n',
    'VERSION:2.0\r\n',
    'PRODID:-//Duskwright//Public viewing evenings//EN\r\n',
    'CALSCALE:GREGORIAN\r\n',
    contentLine('NAME', escapeText(feed.name)),
    contentLine('X-WR-CALNAME', escapeText(feed.name)),
    ...optional(feed.description, (text) => [
      contentLine('DESCRIPTION', escapeText(text)),
      contentLine('X-WR-CALDESC', escapeText(text)),
    ]),
    ...optional(feed.url, (url) => [contentLine('URL', uriValue(url))]),
    `REFRESH-INTERVAL;VALUE=DURATION:${refresh}\r\n`,
    `X-PUBLISHED-TTL:${refresh}\r\n`,
    ...zonesOf(feed.events).map(({ zone, firstMs, lastMs }) => timeZoneComponent(zone, firstMs, lastMs)),
    ...feed.events.flatMap(eventLines),
    'END:VCALENDAR\r\n',
  ].join('');
}

function eventLines(event: CalendarEvent): string[] {
  if (!(event.endMs > event.startMs)) {
    throw new RangeError(
      `The event ${event.uid} ends at ${String(event.endMs)}; give an end after its start at ${String(event.startMs)}.`,
    );
  }
  const { geo } = event;
  return [
    'BEGIN:VEVENT\r\n',
    contentLine('UID', escapeText(event.uid)),
    contentLine('DTSTAMP', utcTime(event.lastModifiedMs)),
    contentLine('CREATED', utcTime(event.createdMs)),
    contentLine('LAST-MODIFIED', utcTime(event.lastModifiedMs)),
    contentLine('SEQUENCE', String(event.sequence)),
    contentLine('STATUS', event.status),
    ...localTime('DTSTART', event.startMs, event.zone),
    ...localTime('DTEND', event.endMs, event.zone),
    contentLine('SUMMARY', escapeText(event.summary)),
    ...optional(event.location, (text) => [contentLine('LOCATION', escapeText(text))]),
    ...(geo === null
      ? []
      : [contentLine('GEO', `${geo.latitudeDeg.toFixed(6)};${geo.longitudeDeg.toFixed(6)}`)]),
    ...optional(event.description, (text) => [contentLine('DESCRIPTION', escapeText(text))]),
    ...optional(event.url, (url) => [contentLine('URL', uriValue(url))]),
    'END:VEVENT\r\n',
  ];
}

function optional(text: string | null, lines: (text: string) => string[]): string[] {
  return text === null || text === '' ? [] : lines(text);
}

function utcTime(utcMs: number): string {
  return DateTime.fromMillis(utcMs, { zone: 'utc', locale: 'en' }).toFormat("yyyyMMdd'T'HHmmss'Z'");
}

/** A time with its zone; UTC is written as such, for it takes no TZID (RFC 5545, 3.3.5). */
function localTime(name: string, utcMs: number, zone: string): string[] {
  if (isUtc(zone)) return [contentLine(name, utcTime(utcMs))];
  const local = DateTime.fromMillis(utcMs, { zone, locale: 'en' });
  return [contentLine(`${name};TZID=${zone}`, local.toFormat("yyyyMMdd'T'HHmmss"))];
}

/** Each zone in use, by name, with the instants its rules must cover. */
function zonesOf(events: readonly CalendarEvent[]) {
  const zones = new Map<string, { zone: string; firstMs: number; lastMs: number }>();
  for (const { zone, startMs, endMs } of events) {
    if (isUtc(zone)) continue;
    const known = zones.get(zone) ?? { zone, firstMs: startMs, lastMs: endMs };
    known.firstMs = Math.min(known.firstMs, startMs);
    known.lastMs = Math.max(known.lastMs, endMs);
    zones.set(zone, known);
  }
  return [...zones.values()].sort((a, b) => (a.zone < b.zone ? -1 : 1));
}

function isUtc(zone: string): boolean {
  return /^(Etc\/)?(UTC|UCT|Zulu|Universal)$/i.test(zone);
}
