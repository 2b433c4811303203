import { fileURLToPath } from 'node:url';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import type { Database } from './client';

/** Brings a database to the newest schema. */
export function migrateDatabase(db: Database): void {
  migrate(db, { migrationsFolder: fileURLToPath(new URL('./migrations', import.meta.url)) });
}
