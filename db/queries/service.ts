import { sql } from 'drizzle-orm';
import type { Database } from '../client';

/** Throws when the database cannot be read or is not migrated. */
export const touchDatabase = (db: Database): void => void db.get(sql`select count(*) from (select 1 from person limit 1)`);
