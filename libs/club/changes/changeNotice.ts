import { type ChartScale } from '#charts';
import { eveningSpan, type Showing, type ShowingRange, zoneClock } from '#nights';
import { type OrbitTarget } from '#sky';
import { DateTime } from 'luxon';
import { setImmediate as othersTurn } from 'node:timers/promises';
import { problem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { dateWords } from '../events/eveningWords';
import { eveningFromText } from '../events/keptEvening';
import { nightProgramme, programmeParts } from '../programmes/programmeView';
import { nightSite } from '../sites/nightSite';
import { siteParts, siteView } from '../sites/siteView';
import { type PlaceShift } from '../sky/placeShift';
import { perturbing } from '../sky/perturbing';
import { type ElementSetView, elementSetView } from '../targets/elementSets';
import { orbitTargetOf, type TargetRow } from '../targets/targetView';
import { changeSentence } from './changeWords';
import { type EveningChange, eveningChange, type PlannedEvening, type ShowingChange } from './eveningChange';

/** One of the two showings of a change. Instants ISO, UTC. */
export interface ChangedShowing {
  readonly shown: boolean;
  readonly minutes: number;
  readonly intervals: readonly { readonly start: string; readonly end: string }[];
}

/** A coming evening, with the events made of it, that new elements of a body touch. */
export interface TouchedEvening extends PlaceShift {
  readonly eveningId: string;
  readonly site: string;
  /** Local date on which it begins. */
  readonly date: string;
  readonly programme: string;
  readonly events: readonly { readonly id: string; readonly title: string; readonly status: string }[];
  /** ISO, UTC: the moment of the shift, at which the body is shown best. */
  readonly at: string;
  readonly showing: ShowingChange;
  readonly before: ChangedShowing;
  readonly after: ChangedShowing;
  readonly printAgain: readonly ChartScale[];
  /** All of it in sentences. */
  readonly sentence: string;
}

/** What a newer element set changes in the evenings that the club has planned. */
export interface ChangeNotice {
  readonly target: string;
  readonly before: ElementSetView;
  readonly after: ElementSetView;
  /** In the order of their dates. */
  readonly touched: readonly TouchedEvening[];
  /** Coming evenings with the body in their programme that stay as they are. */
  readonly untouched: number;
  readonly sentence: string;
}

/** What is read with a coming evening. */
export const plannedParts = {
  site: { include: siteParts },
  programme: { include: programmeParts },
  events: { where: { status: { not: 'calledOff' } }, orderBy: { startsAt: 'asc' } },
} as const satisfies Prisma.EveningInclude;

export type PlannedRow = Prisma.EveningGetPayload<{ include: typeof plannedParts }>;

/** Evenings that are not over, of which no event was made or one that still stands. */
export async function comingEvenings(
  { client, now }: Pick<Database, 'client' | 'now'>,
  club: string,
  targetId?: string,
): Promise<readonly PlannedRow[]> {
  const nowMs = now().getTime();
  const rows = await client.evening.findMany({
    where: {
      clubId: club,
      // No zone is more than a day away from UTC; the rest is told by each site's own clock.
      date: { gte: new Date(nowMs - 2 * DAY_MS).toISOString().slice(0, 10) },
      ...(targetId !== undefined && { programme: { items: { some: { targetId } } } }),
      OR: [{ events: { none: {} } }, { events: { some: { status: { not: 'calledOff' } } } }],
    },
    include: plannedParts,
    orderBy: [{ date: 'asc' }, { id: 'asc' }],
  });
  return rows.filter(({ date, site }) => eveningSpan(zoneClock(site.zone), date).toMs > nowMs);
}

const DAY_MS = 86_400_000;

/**
 * What the second of two element sets of a target changes in the evenings given. Throws a ClubProblem of kind
 * 'invalid' where either set cannot be followed to one of them.
 */
export async function changeNotice(
  target: TargetRow,
  before: Prisma.ElementSetModel,
  after: Prisma.ElementSetModel,
  evenings: readonly PlannedRow[],
  locale: string,
): Promise<ChangeNotice> {
  const touched = await touchedEvenings(target, before, after, evenings, locale);
  const untouched = evenings.length - touched.length;
  return {
    target: target.name,
    before: elementSetView(before),
    after: elementSetView(after),
    touched,
    untouched,
    sentence: noticeSentence(target.name, touched, untouched),
  };
}

/** The evenings of a notice; after each one, which takes milliseconds, whatever else waits has its turn. */
export async function touchedEvenings(
  target: TargetRow,
  before: Prisma.ElementSetModel,
  after: Prisma.ElementSetModel,
  evenings: readonly PlannedRow[],
  locale: string,
): Promise<readonly TouchedEvening[]> {
  const from = orbitTargetOf(target, before);
  const to = orbitTargetOf(target, after);
  const perturbed = perturbing();
  const touched: TouchedEvening[] = [];
  for (const row of evenings) {
    const change = changeOf(row, target, from, to, perturbed);
    if (change !== null) touched.push(touchedEvening(row, target.name, change, after.receivedAt, locale));
    await othersTurn();
  }
  return touched;
}

function changeOf(
  row: PlannedRow,
  { id }: TargetRow,
  before: OrbitTarget,
  after: OrbitTarget,
  perturbed: ReturnType<typeof perturbing>,
): EveningChange | null {
  const { programme } = nightProgramme(row.programme);
  const item = programme.items[row.programme.items.findIndex(({ targetId }) => targetId === id)];
  if (item === undefined) return null;
  const evening = { site: nightSite(siteView(row.site)), programme, item, date: row.date };
  try {
    return eveningChange(inEventHours(evening, row), before, after, perturbed);
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    throw problem('invalid', 'epoch', null, error.message);
  }
}

/** Hours nearer together than this are the same, told to the minute. */
const SAME_HOURS_MS = 60_000;

/** The evening with the hours of its event, where those were moved since it was judged. */
function inEventHours(evening: PlannedEvening, { events, judgedText }: PlannedRow): PlannedEvening {
  const [event] = events;
  const judged = eveningFromText(judgedText).publicHours;
  if (event === undefined || judged === null) return evening;
  const { startsAt, endsAt, zone } = event;
  const moved =
    Math.abs(startsAt.getTime() - judged.startMs) > SAME_HOURS_MS ||
    Math.abs(endsAt.getTime() - judged.endMs) > SAME_HOURS_MS;
  if (!moved) return evening;
  const clock = (instant: Date): string => DateTime.fromJSDate(instant, { zone }).toFormat('HH:mm');
  return {
    ...evening,
    site: { ...evening.site, gate: { opens: null, closes: null } },
    programme: {
      ...evening.programme,
      hours: { kind: 'fixed', start: clock(startsAt), end: clock(endsAt) },
    },
  };
}

function touchedEvening(
  { id, site, date, programme, events }: PlannedRow,
  target: string,
  change: EveningChange,
  receivedAt: Date,
  locale: string,
): TouchedEvening {
  const since = dateWords(DateTime.fromJSDate(receivedAt, { zone: site.zone }).toISODate()!, locale);
  return {
    eveningId: id,
    site: site.name,
    date,
    programme: programme.name,
    events: events.map((event) => ({ id: event.id, title: event.title, status: event.status })),
    at: new Date(Math.round(change.utcMs)).toISOString(),
    ...change.shift,
    showing: change.showing,
    before: changedShowing(change.before),
    after: changedShowing(change.after),
    printAgain: change.printAgain,
    sentence: changeSentence(target, change, since, site.zone),
  };
}

function changedShowing({ shown, minutes, intervals }: Showing | ShowingRange['ifFainter']): ChangedShowing {
  const iso = (utcMs: number): string => new Date(Math.round(utcMs)).toISOString();
  return {
    shown,
    minutes,
    intervals: intervals.map(({ startMs, endMs }) => ({ start: iso(startMs), end: iso(endMs) })),
  };
}

function noticeSentence(target: string, touched: readonly TouchedEvening[], untouched: number): string {
  if (touched.length === 0) {
    return untouched === 0
      ? `No coming evening has ${target} in its programme.`
      : `The new elements of ${target} change nothing in the coming evenings.`;
  }
  const evenings = (count: number): string => `${String(count)} coming evening${count === 1 ? '' : 's'}`;
  const again = touched.filter(({ printAgain }) => printAgain.length > 0).length;
  const counts = [
    again === 0
      ? 'no chart needs to be printed again'
      : `charts of ${evenings(again)} are to be printed again`,
    ...(['gained', 'lost', 'moved'] as const).flatMap((kind) => {
      const count = touched.filter(({ showing }) => showing === kind).length;
      return count === 0 ? [] : [`${String(count)} showing${count === 1 ? ' is' : 's are'} ${kind}`];
    }),
  ];
  return `The new elements of ${target} touch ${evenings(touched.length)}: ${counts.join(', ')}.`;
}
