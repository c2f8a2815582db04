import { type CalendarEvent, type CalendarFeed, renderCalendar } from '#calendar';
import type Ical from 'ical.js' with { 'resolution-mode': 'import' };
import ical from 'node-ical';
import { createRequire } from 'node:module';

const ICAL = createRequire(__filename)('ical.js') as typeof Ical;

const HOUR_MS = 3_600_000;

function event(start: string, zone: string, change: Partial<CalendarEvent> = {}): CalendarEvent {
  const startMs = Date.parse(start);
  return {
    uid: `00000000-0000-8000-8000-${String(startMs / 1000).padStart(12, '0')}`,
    sequence: 0,
    status: 'CONFIRMED',
    createdMs: Date.parse('2027-01-05T12:00:00Z'),
    lastModifiedMs: Date.parse('2027-01-06T13:14:15Z'),
    startMs,
    endMs: startMs + 2.5 * HOUR_MS,
    zone,
    summary: 'Winter lights at Brackenfold',
    description: 'Jupiter: 19:10 to 20:10.',
    location: 'Brackenfold',
    geo: { latitudeDeg: 47.1, longitudeDeg: 8.2 },
    url: 'https://evenings.example.org/events/1',
    ...change,
  };
}

const feed: CalendarFeed = {
  name: 'Société du Crépuscule; public evenings, all sites',
  description: 'Öffentliche Abende',
  url: 'https://evenings.example.org',
  refreshHours: 6,
  events: [
    event('2027-02-06T18:10:00Z', 'Europe/Zurich'),
    // Both nights on which the clocks change, one event running across the change itself.
    event('2027-03-27T19:00:00Z', 'Europe/Zurich', { endMs: Date.parse('2027-03-28T02:30:00Z') }),
    event('2027-03-28T18:00:00Z', 'Europe/Zurich'),
    event('2027-10-30T18:00:00Z', 'Europe/Zurich', { endMs: Date.parse('2027-10-31T03:30:00Z') }),
    event('2027-10-31T18:30:00Z', 'Europe/Zurich'),
    event('2027-01-09T09:00:00Z', 'Pacific/Auckland'),
    event('2027-04-03T08:00:00Z', 'Pacific/Auckland', { endMs: Date.parse('2027-04-03T16:00:00Z') }),
    event('2027-09-26T07:30:00Z', 'Pacific/Auckland'),
    event('2027-06-12T01:30:00Z', 'America/St_Johns'),
    event('2027-06-12T14:15:00Z', 'Asia/Kathmandu'),
    event('2027-06-12T20:00:00Z', 'UTC'),
    event('2027-07-01T20:00:00Z', 'Europe/Zurich', {
      summary: 'Perséides 🌠, wool; caps \\ gloves: "red" torch',
      description: `Zeile 1\nZeile 2; ${'längere Wörter, '.repeat(30)}\n☄️`,
      location: 'Wether Downs, upper gate; left',
    }),
    event('2027-08-01T20:00:00Z', 'Europe/Zurich', {
      status: 'CANCELLED',
      sequence: 3,
      geo: null,
      url: null,
    }),
  ],
};

const text = renderCalendar(feed);

it('gives the same bytes for the same feed', () => {
  expect(renderCalendar(structuredClone(feed))).toBe(text);
});

it('ends each line with CRLF and keeps it within 75 octets', () => {
  const lines = text.split('\r\n');
  expect(lines.pop()).toBe('');
  for (const line of lines) {
    expect(line).not.toMatch(/[\r\n]/);
    expect(Buffer.byteLength(line, 'utf8')).toBeLessThanOrEqual(75);
  }
});

it('defines each zone it names, once', () => {
  const named = new Set([...text.matchAll(/;TZID=([^:]+):/g)].map((match) => match[1]));
  const defined = [...text.matchAll(/\r\nTZID:(.+)\r\n/g)].map((match) => match[1]);
  expect(defined).toEqual([...named].sort());
});

// ical.js is given no zones of its own here: it must get the instants right from our VTIMEZONE alone.
describe('ical.js', () => {
  const calendar = new ICAL.Component(ICAL.parse(text) as unknown[]);
  const zones = new Map(
    calendar
      .getAllSubcomponents('vtimezone')
      .map((component) => [component.getFirstPropertyValue('tzid'), new ICAL.Timezone(component)]),
  );
  const events = calendar.getAllSubcomponents('vevent');

  it('finds the calendar and every event', () => {
    expect(calendar.getFirstPropertyValue('version')).toBe('2.0');
    // It leaves the values of properties that RFC 5545 does not have as they stand, escapes included.
    const name = 'Société du Crépuscule\\; public evenings\\, all sites';
    expect(calendar.getFirstPropertyValue('x-wr-calname')).toBe(name);
    expect(calendar.getFirstPropertyValue('name')).toBe(name);
    expect(String(calendar.getFirstPropertyValue('refresh-interval'))).toBe('PT6H');
    expect(calendar.getFirstProperty('method')).toBeNull();
    expect(events).toHaveLength(feed.events.length);
  });

  it.each(
    feed.events.map((given, index) => [new Date(given.startMs).toISOString(), given.zone, index] as const),
  )('agrees on %s in %s', (_start, _zone, index) => {
    const given = feed.events[index]!;
    const component = events[index]!;
    const instant = (name: string): number => {
      const property = component.getFirstProperty(name)!;
      const time = property.getFirstValue() as InstanceType<typeof ICAL.Time>;
      const zone = property.getFirstParameter('tzid');
      if (zone !== undefined) time.zone = zones.get(zone)!;
      return time.toUnixTime() * 1000;
    };
    expect(instant('dtstart')).toBe(given.startMs);
    expect(instant('dtend')).toBe(given.endMs);
    expect(instant('dtstamp')).toBe(given.lastModifiedMs);
    const read = new ICAL.Event(component);
    expect(read.uid).toBe(given.uid);
    expect(read.sequence).toBe(given.sequence);
    expect(read.summary).toBe(given.summary);
    expect(read.description).toBe(given.description);
    expect(read.location).toBe(given.location);
    expect(component.getFirstPropertyValue('status')).toBe(given.status);
    expect(component.getFirstPropertyValue('url')).toBe(given.url);
    expect(component.getFirstPropertyValue('geo')).toEqual(
      given.geo === null ? null : [given.geo.latitudeDeg, given.geo.longitudeDeg],
    );
  });
});

// node-ical takes the zones from its own copy of the time-zone database: an independent check of the instants.
describe('node-ical', () => {
  const all = ical.sync.parseICS(text);
  const read = Object.values(all).filter((component) => component.type === 'VEVENT');

  it('finds the calendar and every event', () => {
    expect(all['vcalendar']).toMatchObject({ 'WR-CALNAME': feed.name, version: '2.0' });
    expect(read).toHaveLength(feed.events.length);
  });

  it.each(feed.events.map((given) => [new Date(given.startMs).toISOString(), given.zone, given] as const))(
    'agrees on %s in %s',
    (_start, _zone, given) => {
      const found = read.find(({ uid }) => uid === given.uid)!;
      expect(found.start.getTime()).toBe(given.startMs);
      expect(found.end.getTime()).toBe(given.endMs);
      expect(found.dtstamp.getTime()).toBe(given.lastModifiedMs);
      expect(found.summary).toBe(given.summary);
      expect(found.description).toBe(given.description);
      expect(found.location).toBe(given.location);
      expect(found.status).toBe(given.status);
      expect(Number(found.sequence)).toBe(given.sequence);
    },
  );
});

it('refuses an event that ends before it starts', () => {
  const wrong = { ...feed, events: [event('2027-02-06T18:10:00Z', 'UTC', { endMs: 0 })] };
  expect(() => renderCalendar(wrong)).toThrow(RangeError);
});
