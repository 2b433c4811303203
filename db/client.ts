import SqliteDatabase from 'better-sqlite3';
import { drizzle, type BetterSQLite3Database } from 'drizzle-orm/better-sqlite3';
import * as schema from './schema';

export type Database = BetterSQLite3Database<typeof schema> & { $client: SqliteDatabase.Database };

/** Opens a database file, or `:memory:`: write-ahead log, every commit on disk before it is acknowledged, foreign keys on. */
export function openDatabase(path: string): Database {
  const client = new SqliteDatabase(path);
  client.pragma('journal_mode = WAL');
  client.pragma('synchronous = FULL');
  client.pragma('foreign_keys = ON');
  client.pragma('busy_timeout = 5000');
  client.pragma('cache_size = -65536');
  return drizzle(client, { schema, casing: 'snake_case' });
}

/**
 * Runs synchronous work in one immediate transaction (a savepoint when one is open already).
 * NOTE never async: an async callback would return at its first await, and what follows would land outside.
 */
export function inTransaction<Result>(db: Database, work: () => Result extends Promise<unknown> ? never : Result): Result {
  return db.$client.transaction(work as () => Result).immediate();
}

/** A statement, or a set of them, prepared once for each open database. */
export function preparedOnce<Prepared>(build: (db: Database) => Prepared): (db: Database) => Prepared {
  const made = new WeakMap<Database, Prepared>();
  return (db) => {
    const known = made.get(db);
    if (known) return known;
    const fresh = build(db);
    made.set(db, fresh);
    return fresh;
  };
}
