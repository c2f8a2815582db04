import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3';
import { PrismaClient } from './generated/client';

/**
 * Writers take turns on the one connection; a burst of them waits rather than fails. Milliseconds to wait for
 * one's turn, and to be done in.
 */
const transactionOptions = { maxWait: 15_000, timeout: 20_000 };

/** A connected client on a database file whose tables are up to date. */
export async function connect(file: string): Promise<PrismaClient> {
  const client = new PrismaClient({
    adapter: new PrismaBetterSqlite3({ url: `file:${file}` }),
    transactionOptions,
  });
  await client.$connect();
  return client;
}
