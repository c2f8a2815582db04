import { type JudgedEvening } from '#nights';
import { DateTime } from 'luxon';
import { z } from 'zod';
import { type Prisma } from '../database/generated/client';
import { eveningFromText } from './keptEvening';

const statuses = z.enum(['draft', 'published', 'calledOff']);

export type EventStatus = z.output<typeof statuses>;

const stepKinds = z.enum(['made', 'published', 'changed', 'calledOff']);

/** One step in an event's history. */
export interface EventStepView {
  readonly number: number;
  readonly what: z.output<typeof stepKinds>;
  /** ISO, UTC. */
  readonly at: string;
  readonly why: string;
}

/** An event as it is told. Times are ISO with the offset of the site's zone. */
export interface EventView {
  readonly id: string;
  /** Calendar identity and revision. */
  readonly uid: string;
  readonly sequence: number;
  readonly status: EventStatus;
  readonly title: string;
  readonly words: string;
  /** Local date of the evening. */
  readonly date: string;
  readonly zone: string;
  readonly startsAt: string;
  readonly endsAt: string;
  readonly site: {
    readonly id: string;
    readonly name: string;
    readonly latitudeDeg: number;
    readonly longitudeDeg: number;
    readonly directions: string;
  };
  readonly programme: { readonly id: string; readonly name: string };
  /** The evening as it was judged when the event was made of it. */
  readonly evening: JudgedEvening;
  /** ISO, UTC; null: never. */
  readonly publishedAt: string | null;
  readonly callOffWhy: string | null;
  readonly createdAt: string;
  readonly updatedAt: string;
  readonly steps: readonly EventStepView[];
}

/** What is read with an event. */
export const eventParts = {
  evening: { include: { site: true, programme: true } },
  steps: { orderBy: { number: 'asc' } },
} as const satisfies Prisma.EventInclude;

export type EventRow = Prisma.EventGetPayload<{ include: typeof eventParts }>;

export function eventView(row: EventRow): EventView {
  const { evening, zone } = row;
  const { site, programme } = evening;
  return {
    id: row.id,
    uid: row.uid,
    sequence: row.sequence,
    status: statuses.parse(row.status),
    title: row.title,
    words: row.words,
    date: evening.date,
    zone,
    startsAt: localIso(row.startsAt, zone),
    endsAt: localIso(row.endsAt, zone),
    site: {
      id: site.id,
      name: site.name,
      latitudeDeg: site.latitudeDeg,
      longitudeDeg: site.longitudeDeg,
      directions: site.directions,
    },
    programme: { id: programme.id, name: programme.name },
    evening: eveningFromText(evening.judgedText),
    publishedAt: row.publishedAt?.toISOString() ?? null,
    callOffWhy: row.callOffWhy,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    steps: row.steps.map(({ number, what, at, why }) => ({
      number,
      what: stepKinds.parse(what),
      at: at.toISOString(),
      why,
    })),
  };
}

function localIso(instant: Date, zone: string): string {
  return DateTime.fromJSDate(instant, { zone }).toISO({ suppressMilliseconds: true })!;
}
