import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import * as tables from '../../db/schema';
import type { ItemScheme } from '../../shared/marking/scheme';

export interface LargeSitting {
  readonly sittingId: string;
  readonly versionId: string;
  readonly itemIds: readonly string[];
  /** By script, the answers in item order. */
  readonly scripts: readonly { readonly id: string; readonly answers: readonly string[] }[];
}

interface Size {
  readonly course: string;
  readonly lead: string;
  readonly scheme: ItemScheme;
  readonly schemeHash: string;
  readonly items: number;
  readonly scripts: number;
}

/** A locked sitting of any size, every answer with evidence, rows written straight into the tables. */
export function largeSitting(db: Database, { course, lead, scheme, schemeHash, items, scripts }: Size): LargeSitting {
  return inTransaction(db, () => {
    const sittingId = uuidv7();
    const versionId = uuidv7();
    const printNumber = 1 + (db.$client.prepare('select count(*) as n from sitting').get() as { n: number }).n;
    db.insert(tables.sitting).values({ id: sittingId, course, printNumber, title: 'Large sitting', heldOn: '2026-05-06', schemeVersion: versionId }).run();
    db.insert(tables.schemeVersion).values({ id: versionId, sitting: sittingId, ordinal: 1, madeBy: lead, madeAt: 0 }).run();
    db.insert(tables.itemScheme).values({ hash: schemeHash, body: scheme }).onConflictDoNothing().run();
    db.insert(tables.paperLock).values({ sitting: sittingId, lockedAt: 0, lockedBy: lead }).run();
    const itemIds = Array.from({ length: items }, () => uuidv7());
    itemIds.forEach((id, index) => {
      db.insert(tables.item).values({ id, sitting: sittingId, number: index + 1, prompt: 'Bench item.', maxGrains: scheme.maxGrains }).run();
      db.insert(tables.schemeVersionItem).values({ version: versionId, item: id, itemScheme: schemeHash }).run();
    });
    const made = Array.from({ length: scripts }, (_, index) => {
      const candidate = uuidv7();
      const id = uuidv7();
      db.insert(tables.candidate).values({ id: candidate, sitting: sittingId, number: `B${10_000 + index}` }).run();
      db.insert(tables.script).values({ id, sitting: sittingId, number: index + 1, candidate, origin: 'unprinted' }).run();
      const answers = itemIds.map((item, at) => {
        const answer = uuidv7();
        const shuffle = (index * 7919 + at * 104_729) % 1_000_003;
        db.insert(tables.answer).values({ id: answer, script: id, item, sitting: sittingId, evidence: 'in', readingsDue: 1, shuffle }).run();
        return answer;
      });
      return { id, answers };
    });
    return { sittingId, versionId, itemIds, scripts: made };
  });
}
