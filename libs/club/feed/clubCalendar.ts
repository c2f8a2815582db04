import { type CalendarEvent, type CalendarStatus, renderCalendar } from '#calendar';
import { clockWords, type Showing } from '#nights';
import { type Database } from '../database/openDatabase';
import { directionWords, timesWords } from '../events/eveningWords';
import { listEvents } from '../events/events';
import { type EventView } from '../events/eventView';
import { plannedShowings } from '../events/plannedShowings';
import { type ClubView, getClub } from '../settings/club';
import { getSite } from '../sites/sites';

/** General cautions of public viewing nights; common practice, and local codes come before them. */
export const CAUTIONS: readonly string[] = [
  'Local codes, the owner of the site and the club on the spot come first.',
  'Never look near the Sun through a telescope or binoculars, also not when it is low or has just set.',
  'Eyes take twenty minutes to get used to the dark: bring a red torch, and leave white lights and screens off.',
  'It gets colder than you expect: warm clothes, firm shoes, and mind cables and uneven ground in the dark.',
  'No laser pointers, except where local law allows them, and never towards aircraft, vehicles or people.',
  'Children come with an adult who stays with them.',
  'Rest before you drive home if you are tired.',
];

/** How long a reader should wait between two looks at the feed. */
const REFRESH_HOURS = 6;

/**
 * The calendar that members and visitors subscribe to, of all sites or of one (id or name), as iCalendar text:
 * what is published, and what was published and called off.
 */
export async function clubCalendar(
  database: Database,
  { site }: { readonly site?: string } = {},
): Promise<string> {
  const club = await getClub(database);
  const only = site === undefined ? null : await getSite(database, site);
  const events = (await listEvents(database)).filter(
    (event) => event.publishedAt !== null && (only === null || event.site.id === only.id),
  );
  return renderCalendar({
    name: only === null ? `${club.name}: public evenings` : `${club.name}: public evenings at ${only.name}`,
    description: `Public viewing evenings of ${club.name}.`,
    url: club.publicAddress,
    refreshHours: REFRESH_HOURS,
    events: events.map((event) => calendarEvent(event, club)),
  });
}

const STATUS: Readonly<Record<EventView['status'], CalendarStatus>> = {
  draft: 'TENTATIVE',
  published: 'CONFIRMED',
  calledOff: 'CANCELLED',
};

function calendarEvent(event: EventView, club: ClubView): CalendarEvent {
  const { site } = event;
  const calledOff = event.status === 'calledOff';
  return {
    uid: event.uid,
    sequence: event.sequence,
    status: STATUS[event.status],
    createdMs: Date.parse(event.createdAt),
    lastModifiedMs: Date.parse(event.updatedAt),
    startMs: Date.parse(event.startsAt),
    endMs: Date.parse(event.endsAt),
    zone: event.zone,
    // Readers that ignore STATUS still show the title.
    summary: calledOff ? `Called off: ${event.title}` : event.title,
    description: description(event, club),
    location: site.name,
    geo: { latitudeDeg: site.latitudeDeg, longitudeDeg: site.longitudeDeg },
    url: club.publicAddress === null ? null : `${club.publicAddress}/events/${event.id}`,
  };
}

function description(event: EventView, club: ClubView): string {
  const { site, zone } = event;
  const shown = plannedShowings(event);
  if (event.callOffWhy !== null) return `This evening is called off: ${event.callOffWhy}`;
  const paragraphs = [
    event.words,
    shown.length === 0
      ? ''
      : [
          `What we plan to show, under a clear sky (times of ${zone}):`,
          ...shown.map((showing) => showingLine(showing, zone)),
        ].join('\n'),
    site.directions === '' ? '' : `The way there: ${site.directions}`,
    club.bringWords === '' ? '' : `What to bring: ${club.bringWords}`,
    club.callOffWords,
    CAUTIONS.join('\n'),
  ];
  return paragraphs.filter((paragraph) => paragraph !== '').join('\n\n');
}

function showingLine(showing: Showing, zone: string): string {
  const { target, intervals, best } = showing;
  const times = `${target}: ${timesWords(intervals, zone)}`;
  return best === null
    ? times
    : `${times}, best at ${clockWords(best.utcMs, zone)}, ${directionWords(showing)}`;
}
