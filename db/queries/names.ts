import { eq } from 'drizzle-orm';
import type { Database } from '../client';
import { candidate, candidateName } from '../schema';

/** The only queries that touch names; their callers are the lead's and the exams officer's. */

export const namesOfSitting = (db: Database, sittingId: string) =>
  db
    .select({ candidateId: candidate.id, number: candidate.number, name: candidateName.name, email: candidateName.email })
    .from(candidate)
    .leftJoin(candidateName, eq(candidateName.candidate, candidate.id))
    .where(eq(candidate.sitting, sittingId))
    .orderBy(candidate.id)
    .all();

export const saveName = (db: Database, row: { candidate: string; name: string | null; email: string | null }): void =>
  void db
    .insert(candidateName)
    .values(row)
    .onConflictDoUpdate({ target: candidateName.candidate, set: { name: row.name, email: row.email, erasedAt: null } })
    .run();
