import { eq } from 'drizzle-orm';
import type { Database } from '../client';
import { blob } from '../schema';

/** Notes that the bytes of a hash are stored; known hashes stay as they are. */
export const insertBlob = (db: Database, row: typeof blob.$inferInsert): void => void db.insert(blob).values(row).onConflictDoNothing().run();

export const mediaTypeOfBlob = (db: Database, sha256: string): string | undefined => db.select({ mediaType: blob.mediaType }).from(blob).where(eq(blob.sha256, sha256)).get()?.mediaType;
