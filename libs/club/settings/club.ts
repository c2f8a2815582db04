import { z } from 'zod';
import { type Database } from '../database/openDatabase';
import { type Prisma } from '../database/generated/client';
import { problem } from '../clubProblem';
import { between, line, prose } from '../input/fields';
import { checked } from '../input/checked';

const LOCALE_RIGHT = 'a language tag such as en-GB';
const ADDRESS_RIGHT = 'a web address without a path, such as https://evenings.example.org, or null';

/** The club itself, and how it speaks to the public. */
export const ClubInput = z.strictObject({
  name: line(120),
  locale: z
    .string({ error: LOCALE_RIGHT })
    .refine(isLocale, { error: LOCALE_RIGHT })
    .default('en-GB')
    .meta({ description: LOCALE_RIGHT }),
  bringWords: prose(2000).default(''),
  callOffWords: prose(2000).default(''),
  publicAddress: z
    .string({ error: ADDRESS_RIGHT })
    .regex(/^https?:\/\/[^/?#\s]+$/, { error: ADDRESS_RIGHT })
    .nullable()
    .default(null)
    .meta({ description: ADDRESS_RIGHT }),
  pupilMm: between(3, 8, "millimetres of a visitor's dark-adapted pupil, 3 to 8").default(6),
  fieldFactor: between(1, 5, "Crumey's field factor, 1 (keen) to 5; 2 is typical").default(2),
});

export type ClubInput = z.input<typeof ClubInput>;

/** The club as it is told. */
export interface ClubView extends z.output<typeof ClubInput> {
  readonly id: string;
}

/** The club, or null where none has been entered. */
export async function findClub(database: Database): Promise<ClubView | null> {
  const row = await firstClub(database.client);
  return row === null ? null : view(row);
}

/** The club; a ClubProblem where none has been entered. */
export async function getClub(database: Database): Promise<ClubView> {
  const club = await findClub(database);
  if (club === null) throw noClub();
  return club;
}

/** Enters the club. A database of this program holds one so far; a second is refused. */
export async function createClub(database: Database, input: ClubInput): Promise<ClubView> {
  const fields = checked(ClubInput, input);
  return database.client.$transaction(async (tx) => {
    if ((await firstClub(tx)) !== null) {
      throw problem('conflict', 'name', fields.name, 'There is a club already; change its settings instead.');
    }
    const now = database.now();
    return view(await tx.club.create({ data: { ...fields, createdAt: now, updatedAt: now } }));
  });
}

/** Changes the given settings and leaves the others. */
export async function updateClub(database: Database, change: Partial<ClubInput>): Promise<ClubView> {
  return database.client.$transaction(async (tx) => {
    const row = await firstClub(tx);
    if (row === null) throw noClub();
    const { id, ...kept } = view(row);
    const fields = checked(ClubInput, { ...kept, ...change });
    return view(await tx.club.update({ where: { id }, data: { ...fields, updatedAt: database.now() } }));
  });
}

/** Identifier of the club that a use case works for. */
export async function clubId(client: Prisma.TransactionClient): Promise<string> {
  const row = await firstClub(client);
  if (row === null) throw noClub();
  return row.id;
}

function firstClub(client: Prisma.TransactionClient) {
  return client.club.findFirst({ orderBy: { createdAt: 'asc' } });
}

function noClub() {
  return problem('notFound', 'club', null, 'There is no club yet; enter one first.');
}

function isLocale(tag: string): boolean {
  try {
    return Intl.getCanonicalLocales(tag).length === 1;
  } catch {
    return false;
  }
}

function view(row: Prisma.ClubModel): ClubView {
  const { id, name, locale, bringWords, callOffWords, publicAddress, pupilMm, fieldFactor } = row;
  return { id, name, locale, bringWords, callOffWords, publicAddress, pupilMm, fieldFactor };
}
