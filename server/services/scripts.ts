import { randomInt } from 'node:crypto';
import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { answersOfCandidate, candidatesWithoutScript, insertAnswer, insertPage, insertScript, lastScriptNumber } from '../../db/queries/candidates';
import { findLayout, layoutPages, newestLayout } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import { saveTotal } from '../../db/queries/settling';
import { isPaperLocked } from '../../db/queries/sittings';
import type { Context } from '../context';
import { settleAnswers } from './settle';
import { bumpSitting } from './sitting-access';

const shuffleRange = 2 ** 31;

interface Made {
  readonly scripts: number;
  readonly answers: number;
}

/**
 * Gives every candidate of a locked sitting a script, with its pages and answers, numbered on in the order of the class list.
 * Call it in the transaction of the act; it makes nothing twice, and nothing while the paper is open.
 */
export function ensureScripts({ db }: Pick<Context, 'db'>, sittingId: string): Made {
  if (!db.$client.inTransaction) throw new Error('Making scripts belongs inside the transaction of an act.');
  if (!isPaperLocked(db, sittingId)) return { scripts: 0, answers: 0 };
  // Someone who comes later has no printed sheet; without a drawn layout the places of the newest printed one stand ready.
  const layout = findLayout(db, sittingId, 1) ?? newestLayout(db, sittingId);
  const without = candidatesWithoutScript(db, sittingId);
  if (without.length === 0) return { scripts: 0, answers: 0 };
  const pages = layout ? layoutPages(db, layout.id).map(({ pageNo }) => pageNo) : [];
  const items = draftedItems(db, sittingId).map(({ item }) => item.id);
  const seq = bumpSitting(db, sittingId);
  let number = lastScriptNumber(db, sittingId);
  for (const candidate of without) {
    number += 1;
    addScript(db, { sitting: sittingId, number, layout: layout?.id ?? null, candidate, origin: 'unprinted' }, { pages, items, seq });
  }
  return { scripts: without.length, answers: without.length * items.length };
}

interface ScriptParts {
  readonly pages: readonly number[];
  readonly items: readonly string[];
  readonly seq: number;
}

/** One script with its places, its answers and its total. In the transaction of the act. */
export function addScript(db: Database, row: Omit<Parameters<typeof insertScript>[1], 'id'>, { pages, items, seq }: ScriptParts): string {
  const script = uuidv7();
  insertScript(db, { id: script, ...row });
  for (const pageNo of pages) insertPage(db, { id: uuidv7(), script, pageNo });
  for (const item of items) insertAnswer(db, { id: uuidv7(), script, item, sitting: row.sitting, shuffle: randomInt(shuffleRange), seq });
  saveTotal(db, { script, grains: 0, missing: items.length, roundedGrains: 0 });
  return script;
}

/** Counts the readings due of a candidate again, after a change of who is to be marked. In the transaction of that act. */
export function settleCandidate(context: Pick<Context, 'db' | 'clock'>, candidateId: string): void {
  const answers = answersOfCandidate(context.db, candidateId);
  if (answers.length > 0) settleAnswers(context, answers);
}
