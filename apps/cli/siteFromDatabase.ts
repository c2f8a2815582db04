import { closeDatabase, type Database, getSite, nightSite, openDatabase, usualDatabaseFile } from '#club';
import { type NightSite } from '#nights';

/** Opens the database of `--db`, or the usual one, for one piece of work. */
export async function withDatabase<T>(
  file: string | undefined,
  work: (database: Database) => Promise<T>,
): Promise<T> {
  const database = await openDatabase({ file: file ?? usualDatabaseFile() });
  try {
    return await work(database);
  } finally {
    await closeDatabase(database);
  }
}

/** A site of the database by name. */
export async function siteFromDatabase(file: string | undefined, name: string): Promise<NightSite> {
  return withDatabase(file, async (database) => nightSite(await getSite(database, name, 'site-name')));
}
