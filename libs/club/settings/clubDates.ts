import { type ClubDate } from '#nights';
import { z } from 'zod';
import { problem } from '../clubProblem';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { date, line } from '../input/fields';
import { clubId } from './club';

/** A date on which the club already does something else. */
export const ClubDateInput = z.strictObject({ date, name: line(120) });

export type ClubDateInput = z.input<typeof ClubDateInput>;

export interface ClubDateView extends ClubDate {
  readonly id: string;
}

/** Enters a date; the same date and name twice is refused. */
export async function createClubDate(database: Database, input: ClubDateInput): Promise<ClubDateView> {
  const fields = checked(ClubDateInput, input);
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    const taken = await tx.clubDate.findFirst({ where: { clubId: club, ...fields } });
    if (taken !== null) {
      throw problem('conflict', 'date', fields.date, `"${fields.name}" stands on ${fields.date} already.`);
    }
    const row = await tx.clubDate.create({ data: { clubId: club, ...fields, createdAt: database.now() } });
    return { id: row.id, date: row.date, name: row.name };
  });
}

/** All dates, earliest first. */
export async function listClubDates(database: Database): Promise<readonly ClubDateView[]> {
  const club = await clubId(database.client);
  const rows = await database.client.clubDate.findMany({
    where: { clubId: club },
    orderBy: [{ date: 'asc' }, { name: 'asc' }],
  });
  return rows.map(({ id, date, name }) => ({ id, date, name }));
}
