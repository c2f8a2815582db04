import { type JudgedEvening } from '#nights';
import { eventUid } from '#calendar';
import { DateTime } from 'luxon';
import { randomUUID } from 'node:crypto';
import { type z } from 'zod';
import { problem } from '../clubProblem';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { judgeEvening } from '../evenings';
import { checked, valueInWords } from '../input/checked';
import { requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { CallOff, EventChange, EventInput } from './eventInput';
import { eventParts, type EventRow, type EventStepView, eventView, type EventView } from './eventView';
import { eveningAsText } from './keptEvening';

/** Judges an evening, keeps it and makes a draft of it that only coordinators see. */
export async function makeEvent(database: Database, input: EventInput): Promise<EventView> {
  const fields = checked(EventInput, input);
  const { siteName, programmeName, date } = fields;
  return keepEvent(database, fields, await judgeEvening(database, { siteName, programmeName, date }));
}

/** Keeps an evening that has been judged and makes a draft of it. */
export async function keepEvent(
  database: Database,
  fields: z.output<typeof EventInput>,
  judged: JudgedEvening,
): Promise<EventView> {
  const { date, words } = fields;
  const hours = judged.publicHours;
  if (hours === null) {
    const why = judged.note ?? 'The evening has no public hours.';
    throw problem('conflict', 'date', date, `date was ${date}; give an evening with public hours. ${why}`);
  }
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    const named = { where: { clubId: club }, select: { id: true, name: true, zone: true } } as const;
    const site = requireNamed(await tx.site.findMany(named), fields.siteName, 'site', 'siteName');
    const programme = requireNamed(
      await tx.programme.findMany({ where: { clubId: club }, select: { id: true, name: true } }),
      fields.programmeName,
      'programme',
      'programmeName',
    );
    await refuseSecondEvent(tx, site, date);
    const now = database.now();
    const figures = { score: judged.score, judgedText: eveningAsText(judged), judgedAt: now };
    const key = { siteId: site.id, programmeId: programme.id, date };
    const evening = await tx.evening.upsert({
      where: { siteId_programmeId_date: key },
      create: { clubId: club, ...key, ...figures },
      update: figures,
    });
    const id = randomUUID();
    const row = await tx.event.create({
      data: {
        id,
        clubId: club,
        eveningId: evening.id,
        title: fields.title ?? `${programme.name} at ${site.name}`,
        words,
        status: 'draft',
        uid: eventUid(id),
        startsAt: wholeMinute(hours.startMs),
        endsAt: wholeMinute(hours.endMs),
        zone: judged.zone,
        createdAt: now,
        updatedAt: now,
        steps: {
          create: [
            {
              number: 1,
              what: 'made',
              at: now,
              why: `Made of an evening with ${judged.score.toFixed(1)} points.`,
            },
          ],
        },
      },
      include: eventParts,
    });
    return eventView(row);
  });
}

/** Shows a draft to the public. */
export function publishEvent(database: Database, id: string): Promise<EventView> {
  return changeRow(database, id, (event) => {
    if (event.status !== 'draft') {
      const now =
        event.status === 'published' ? 'published already' : 'called off; make a new one of the evening';
      throw problem('conflict', 'status', event.status, `The event is ${now}.`);
    }
    const why = 'Shown to the public.';
    return { data: { status: 'published', publishedAt: database.now() }, step: { what: 'published', why } };
  });
}

/**
 * Changes an event's times or words. Once the public has seen it, each change raises its calendar revision. A
 * change that changes nothing leaves no trace.
 */
export async function changeEvent(database: Database, id: string, change: EventChange): Promise<EventView> {
  const fields = checked(EventChange, change);
  return changeRow(database, id, (event) => {
    if (event.status === 'calledOff') {
      throw problem(
        'conflict',
        'status',
        event.status,
        'The event is called off and cannot be changed any more.',
      );
    }
    const startsAt = fields.startsAt === undefined ? event.startsAt : new Date(fields.startsAt);
    const endsAt = fields.endsAt === undefined ? event.endsAt : new Date(fields.endsAt);
    if (fields.startsAt !== undefined || fields.endsAt !== undefined) {
      checkTimes(event, startsAt, endsAt, fields);
    }
    const title = fields.title ?? event.title;
    const words = fields.words ?? event.words;
    const what = [
      ...changedTimes(event, startsAt, endsAt),
      ...(title === event.title ? [] : [`title from "${event.title}" to "${title}"`]),
      ...(words === event.words ? [] : ['the words for the public']),
    ];
    if (what.length === 0) return null;
    const why = `Changed: ${what.join('; ')}.${fields.why === '' ? '' : ` ${fields.why}`}`;
    const sequence = event.publishedAt === null ? event.sequence : event.sequence + 1;
    return { data: { startsAt, endsAt, title, words, sequence }, step: { what: 'changed', why } };
  });
}

/** Calls an event off. One that the public has seen stays in the calendar as cancelled. */
export async function callOffEvent(database: Database, id: string, callOff: CallOff): Promise<EventView> {
  const { why } = checked(CallOff, callOff);
  return changeRow(database, id, (event) => {
    if (event.status === 'calledOff') {
      throw problem('conflict', 'status', event.status, 'The event is called off already.');
    }
    const sequence = event.publishedAt === null ? event.sequence : event.sequence + 1;
    return { data: { status: 'calledOff', callOffWhy: why, sequence }, step: { what: 'calledOff', why } };
  });
}

/** All events, earliest first. */
export async function listEvents(database: Database): Promise<readonly EventView[]> {
  const rows = await database.client.event.findMany({
    where: { clubId: await clubId(database.client) },
    include: eventParts,
    orderBy: [{ startsAt: 'asc' }, { uid: 'asc' }],
  });
  return rows.map(eventView);
}

/** One event by its id. */
export async function getEvent(database: Database, id: string): Promise<EventView> {
  return eventView(await eventRow(database.client, id));
}

interface EventStep {
  readonly data: Prisma.EventUpdateInput;
  readonly step: { readonly what: EventStepView['what']; readonly why: string };
}

/** Reads an event, lets `decide` say what becomes of it, and writes that with a line of history. */
function changeRow(
  database: Database,
  id: string,
  decide: (event: EventRow) => EventStep | null,
): Promise<EventView> {
  return database.client.$transaction(async (tx) => {
    const event = await eventRow(tx, id);
    const decided = decide(event);
    if (decided === null) return eventView(event);
    const now = database.now();
    const number = event.steps.length + 1;
    const row = await tx.event.update({
      where: { id },
      data: { ...decided.data, updatedAt: now, steps: { create: [{ number, at: now, ...decided.step }] } },
      include: eventParts,
    });
    return eventView(row);
  });
}

async function eventRow(client: Prisma.TransactionClient, id: string): Promise<EventRow> {
  const row = await client.event.findFirst({
    where: { id, clubId: await clubId(client) },
    include: eventParts,
  });
  if (row !== null) return row;
  throw problem('notFound', 'event', id, `event was ${valueInWords(id)}; give the id of an event.`);
}

async function refuseSecondEvent(
  tx: Prisma.TransactionClient,
  site: { readonly id: string; readonly name: string },
  date: string,
): Promise<void> {
  const other = await tx.event.findFirst({
    where: { evening: { siteId: site.id, date }, status: { not: 'calledOff' } },
  });
  if (other === null) return;
  throw problem(
    'conflict',
    'date',
    date,
    `date was ${date}; ${site.name} has an event on that evening already, "${other.title}". Change it or call it off first.`,
  );
}

function checkTimes(
  event: EventRow,
  startsAt: Date,
  endsAt: Date,
  fields: { readonly startsAt?: string | undefined; readonly endsAt?: string | undefined },
): void {
  const noon = DateTime.fromISO(event.evening.date, { zone: event.zone }).set({ hour: 12 });
  const next = noon.plus({ days: 1 });
  const right = `a time in the evening of ${event.evening.date}, from ${noon.toISO()!} to ${next.toISO()!}`;
  for (const [field, value] of [
    ['startsAt', startsAt],
    ['endsAt', endsAt],
  ] as const) {
    if (value.getTime() >= noon.toMillis() && value.getTime() <= next.toMillis()) continue;
    throw problem(
      'invalid',
      field,
      fields[field],
      `${field} was ${valueInWords(fields[field])}; give ${right}.`,
    );
  }
  if (endsAt > startsAt) return;
  const field = fields.endsAt === undefined ? 'startsAt' : 'endsAt';
  throw problem(
    'invalid',
    field,
    fields[field],
    `${field} was ${valueInWords(fields[field])}; give an end after the start.`,
  );
}

function changedTimes(event: EventRow, startsAt: Date, endsAt: Date): string[] {
  const clock = (instant: Date): string =>
    DateTime.fromJSDate(instant, { zone: event.zone }).toFormat('HH:mm');
  const say = (what: string, from: Date, to: Date): string[] =>
    from.getTime() === to.getTime() ? [] : [`${what} from ${clock(from)} to ${clock(to)}`];
  return [...say('start', event.startsAt, startsAt), ...say('end', event.endsAt, endsAt)];
}

function wholeMinute(utcMs: number): Date {
  return new Date(Math.round(utcMs / 60_000) * 60_000);
}
