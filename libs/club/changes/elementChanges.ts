import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { getClub } from '../settings/club';
import { orbitRow } from '../targets/targetRows';
import { type TargetRow } from '../targets/targetView';
import {
  type ChangeNotice,
  changeNotice,
  comingEvenings,
  type TouchedEvening,
  touchedEvenings,
} from './changeNotice';

/** What a set that is about to be kept changes beside the one in use; null where there is none in use. */
export async function noticeOfNewSet(
  database: Database,
  target: TargetRow,
  after: Prisma.ElementSetModel,
): Promise<ChangeNotice | null> {
  const [before] = target.elementSets;
  if (before === undefined) return null;
  const { locale } = await getClub(database);
  return changeNotice(
    target,
    before,
    after,
    await comingEvenings(database, target.clubId, target.id),
    locale,
  );
}

/**
 * What the newest element set of a target (id or name) changes beside the one before it, worked out anew; null
 * where it has only one.
 */
export async function elementChanges(database: Database, target: string): Promise<ChangeNotice | null> {
  const row = await orbitRow(database, target);
  const [after, before] = await database.client.elementSet.findMany({
    where: { targetId: row.id },
    orderBy: { number: 'desc' },
    take: 2,
  });
  if (after === undefined || before === undefined) return null;
  const { locale } = await getClub(database);
  return changeNotice(row, before, after, await comingEvenings(database, row.clubId, row.id), locale);
}

/** What element sets that came after an evening was judged change in it: one entry a body. */
export interface BodyChange extends TouchedEvening {
  readonly target: string;
}

/**
 * For each event still to come, by its id: what the elements received since its evening was judged change in
 * it. Events that nothing touches are left out. With `eventId`, only that event is looked at.
 */
export async function eventChanges(
  database: Database,
  eventId?: string,
): Promise<ReadonlyMap<string, readonly BodyChange[]>> {
  const { client } = database;
  const { id, locale } = await getClub(database);
  const coming = await comingEvenings(database, id);
  const evenings =
    eventId === undefined
      ? coming
      : coming.filter(({ events }) => events.some((event) => event.id === eventId));
  const changes = new Map<string, BodyChange[]>();
  for (const evening of evenings) {
    for (const { target: body } of evening.programme.items) {
      const [newest] = body.elementSets;
      if (newest === undefined || newest.receivedAt <= evening.judgedAt) continue;
      const judgedBy = await client.elementSet.findFirst({
        where: { targetId: body.id, receivedAt: { lte: evening.judgedAt } },
        orderBy: { number: 'desc' },
      });
      if (judgedBy === null) continue;
      for (const touched of await touchedEvenings(body, judgedBy, newest, [evening], locale)) {
        for (const event of evening.events) {
          const known = changes.get(event.id) ?? [];
          changes.set(event.id, [...known, { target: body.name, ...touched }]);
        }
      }
    }
  }
  return changes;
}
