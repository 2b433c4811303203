import { and, desc, eq, inArray } from 'drizzle-orm';
import type { Database } from '../client';
import { auditEntry, person, vetting, vettingCheck } from '../schema';

export const insertCheck = (db: Database, row: typeof vettingCheck.$inferInsert): void => void db.insert(vettingCheck).values(row).run();
export const insertVetting = (db: Database, row: typeof vetting.$inferInsert): void => void db.insert(vetting).values(row).run();

/** What a person worked out last for a scheme of an item. */
export const checkOf = (db: Database, item: string, itemScheme: string, personId: string) =>
  db
    .select({ text: vettingCheck.text, agrees: vettingCheck.agrees, at: vettingCheck.at })
    .from(vettingCheck)
    .where(and(eq(vettingCheck.item, item), eq(vettingCheck.itemScheme, itemScheme), eq(vettingCheck.person, personId)))
    .orderBy(desc(vettingCheck.at))
    .limit(1)
    .get();

/** Signatures and returns of a scheme of an item, newest first. */
export const vettingsOf = (db: Database, item: string, itemScheme: string) =>
  db
    .select({ person: vetting.person, by: person.name, outcome: vetting.outcome, comment: vetting.comment, at: vetting.at })
    .from(vetting)
    .innerJoin(person, eq(person.id, vetting.person))
    .where(and(eq(vetting.item, item), eq(vetting.itemScheme, itemScheme)))
    .orderBy(desc(vetting.at), desc(vetting.id))
    .all();

/** Whether a person has made or changed an item: the trail knows. */
export const hasMade = (db: Database, item: string, personId: string): boolean =>
  db
    .select({ n: auditEntry.n })
    .from(auditEntry)
    .where(and(eq(auditEntry.subject, item), eq(auditEntry.actor, personId), inArray(auditEntry.act, ['item-made', 'item-changed'])))
    .limit(1)
    .get() !== undefined;
