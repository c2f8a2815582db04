import BetterSqlite3 from 'better-sqlite3';

/** Tells whether a database was written to. */
export interface ChangeWatch {
  /** A number that stays the same for as long as nobody commits anything. Costs microseconds. */
  readonly version: () => number;
  readonly close: () => void;
}

/**
 * Watches a database file through a connection of its own: SQLite's data_version changes with each commit of
 * any other connection, those of other programs included.
 */
export function watchChanges(file: string): ChangeWatch {
  const connection = new BetterSqlite3(file, { readonly: true });
  const version = connection.prepare('PRAGMA data_version').pluck();
  return {
    version: () => version.get() as number,
    close: () => {
      connection.close();
    },
  };
}
