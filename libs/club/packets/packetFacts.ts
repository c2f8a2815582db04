import { CATALOGUE_VERSION } from '#catalogue';
import { fingerprintOf, type Imprint, type ScheduledEvent } from '#print';
import { clubTarget } from '../charts/chartForEvent';
import { type Database } from '../database/openDatabase';
import { getEvent, listEvents } from '../events/events';
import { type EventView } from '../events/eventView';
import { plannedShowings } from '../events/plannedShowings';
import { CAUTIONS } from '../feed/clubCalendar';
import { type InstrumentView, listInstruments } from '../instruments/instruments';
import { programVersion } from '../programVersion';
import { getProgramme } from '../programmes/programmes';
import { type ProgrammeItemView } from '../programmes/programmeView';
import { type ClubView, getClub } from '../settings/club';
import { getSite } from '../sites/sites';
import { type SiteView } from '../sites/siteView';
import { type NamedTarget } from '../sky/namedTarget';
import { getTarget, listTargets } from '../targets/targets';
import { type TargetView } from '../targets/targetView';

/** A target of the event's programme with all that is known of it. */
export interface PacketItem {
  readonly item: ProgrammeItemView;
  readonly view: TargetView;
  readonly named: NamedTarget;
}

/** Everything a packet is computed from, read from the database: plain values that a worker can be sent. */
export interface PacketFacts {
  readonly club: ClubView;
  readonly event: EventView;
  readonly site: SiteView;
  readonly instruments: readonly InstrumentView[];
  readonly items: readonly PacketItem[];
  readonly schedule: readonly ScheduledEvent[];
  /** In the club's words for every evening. */
  readonly cautions: readonly string[];
  readonly imprint: Imprint;
}

/**
 * Reads what a packet of an event is computed from, for a run sheet asked for as `running` says. A ClubProblem of kind 'notFound' where there is none.
 */
export async function packetFacts(
  database: Database,
  eventId: string,
  running: Imprint['running'],
): Promise<PacketFacts> {
  const event = await getEvent(database, eventId);
  const club = await getClub(database);
  const site = await getSite(database, event.site.id);
  const programme = await getProgramme(database, event.programme.id);
  const items: PacketItem[] = [];
  for (const item of programme.items) {
    // A target that joined the programme later has no showing on the evening as it was judged.
    if (!event.evening.showings.some(({ target }) => target === item.target)) continue;
    items.push({
      item,
      view: await getTarget(database, item.targetId),
      named: await clubTarget(database, item.targetId, Date.parse(event.startsAt)),
    });
  }
  const instruments = (await listInstruments(database)).filter(({ id }) =>
    items.some(({ item }) => item.instrumentId === id),
  );
  const common = new Map((await listTargets(database)).map((view) => [view.name, commonName(view)] as const));
  const schedule = (await listEvents(database))
    .filter(({ status, startsAt }) => status === 'published' && startsAt.slice(0, 10) >= event.date)
    .map((other) => scheduled(other, common));
  return {
    club,
    event,
    site,
    instruments,
    items,
    schedule,
    cautions: CAUTIONS,
    imprint: imprintOf({ club, event, site, instruments, items }, running),
  };
}

/** What the public calls a target: a catalogue number gives way to a name. */
function commonName(view: TargetView): string {
  return view.kind === 'deepSky' && /\d/.test(view.name) ? (view.commonName ?? view.name) : view.name;
}

function scheduled(event: EventView, common: ReadonlyMap<string, string>): ScheduledEvent {
  return {
    title: event.title,
    siteName: event.site.name,
    date: event.date,
    zone: event.zone,
    startMs: Date.parse(event.startsAt),
    endMs: Date.parse(event.endsAt),
    targets: plannedShowings(event).map(({ target }) => common.get(target) ?? target),
  };
}

function imprintOf(
  { club, event, site, instruments, items }: Omit<PacketFacts, 'schedule' | 'cautions' | 'imprint'>,
  running: Imprint['running'],
): Imprint {
  const { directions, hazards, emergencyWords, ...reckonedSite } = site;
  return {
    programVersion: programVersion(),
    catalogueVersion: CATALOGUE_VERSION,
    hours: { startsAt: event.startsAt, endsAt: event.endsAt },
    running,
    site: fingerprintOf(reckonedSite),
    programme: fingerprintOf([
      event.evening,
      instruments,
      items.map(({ item, view }) => [item, reckoned(view)]),
    ]),
    words: fingerprintOf([
      club,
      [event.title, event.words, event.status],
      [directions, hazards, emergencyWords],
      items.map(({ view }) => [view.name, view.gloss]),
      CAUTIONS,
    ]),
    elementSets: items
      .flatMap(({ view }) =>
        view.kind === 'orbit'
          ? [
              {
                target: view.name,
                setId: view.elements.id,
                number: view.elements.number,
                epoch: view.elements.epoch,
                source: view.elements.source,
              },
            ]
          : [],
      )
      .sort((a, b) => (a.target < b.target ? -1 : 1)),
  };
}

/** A target without its words and its elements, which the imprint names by themselves. */
function reckoned(view: TargetView): unknown {
  switch (view.kind) {
    case 'solarSystem':
      return [view.id, view.name, view.body];
    case 'deepSky':
      return [view.id, view.name, view.catalogueId];
    case 'place':
      return [
        view.id,
        view.name,
        view.raDeg,
        view.decDeg,
        view.magnitude,
        view.majorArcmin,
        view.minorArcmin,
      ];
    case 'orbit':
      return [view.id, view.name, view.comaArcmin];
  }
}
