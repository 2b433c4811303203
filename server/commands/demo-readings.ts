import { v7 as uuidv7 } from 'uuid';
import { hasOpenLease, ownLiveReading } from '../../db/queries/desk';
import { answersOfScript, placesOfNumber } from '../../db/queries/page-images';
import { draftedItems } from '../../db/queries/papers';
import { randomFrom, type Random } from '../../db/seed/truth/random';
import type { AnswerTruth, CandidateTruth } from '../../db/seed/truth/written';
import { inTransaction } from '../../db/client';
import type { Context } from '../context';
import { giveLease } from '../services/desk';
import { recordReading } from '../services/readings';
import { demoSeed, type DemoSitting } from './demo-truth';

/** So much of the demo has been read before anyone comes: enough for a ledger with something to rule on. */
const itemsRead = 2;
const scriptsRead = 48;

/** How often a figure is mistaken in reading; of the demo only. */
const misreadShare = 0.05;
const mistakenFor: Readonly<Record<string, string>> = { 1: '7', 7: '1', 5: '6', 3: '8', 0: '6', 9: '4', 2: '3' };

function asRead({ expected }: AnswerTruth, random: Random): { text?: string; code?: Extract<AnswerTruth['expected'], { code: unknown }>['code'] } {
  if ('code' in expected) return { code: expected.code };
  if (!random.chance(misreadShare)) return { text: expected.text };
  const at = [...expected.text].findLastIndex((figure) => mistakenFor[figure] !== undefined);
  return { text: at < 0 ? expected.text : expected.text.slice(0, at) + (mistakenFor[expected.text[at] ?? ''] ?? '') + expected.text.slice(at + 1) };
}

/** Both readers have read the first items of the first scripts, each with an invented mistake now and then. */
export function readAhead(context: Context, { sittingId, readers }: DemoSitting, truth: readonly CandidateTruth[]): void {
  const { db, clock } = context;
  const items = draftedItems(db, sittingId).slice(0, itemsRead);
  for (const { candidate, answers } of truth.slice(0, scriptsRead)) {
    const script = placesOfNumber(db, sittingId, candidate)[0]?.script;
    if (script === undefined) continue;
    const byItem = answersOfScript(db, script);
    for (const { item } of items) {
      const answerId = byItem.get(item.id);
      const written = answers.find(({ itemNumber }) => itemNumber === item.number);
      if (answerId === undefined || !written || hasOpenLease(db, answerId)) continue;
      for (const reader of readers) {
        if (ownLiveReading(db, answerId, reader)) continue;
        const leaseId = inTransaction(db, () => giveLease(context, answerId, reader));
        recordReading(context, { personId: reader, isOfficer: false }, uuidv7(), { answerId, leaseId, method: [], openedAt: clock.now(), ...asRead(written, randomFrom(demoSeed, 'reading', reader === readers[0] ? 1 : 2, candidate, item.number)) });
      }
    }
  }
}
