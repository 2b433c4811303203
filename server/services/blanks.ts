import { inTransaction } from '../../db/client';
import { emptyAnswers, emptyCounts, isEmptyAnswer } from '../../db/queries/blanks';
import { deskItems, endExpiredLeases, endLeaseAt, findLease, findReading, ownLiveReading, readingTarget, renewLeases } from '../../db/queries/desk';
import type { SittingRow } from '../../db/queries/sittings';
import type { BlankItem, BlankReading, blankOutcomes } from '../../shared/contracts/blanks';
import type { DeskLease } from '../../shared/contracts/desk';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notFound } from '../errors';
import { describeLeases, giveLease, leaseMs } from './desk';
import { recordReading } from './readings';
import { requireLockedPaper, requireSitting } from './sitting-access';

const readerRoles = ['reader', 'lead'] as const;

type Outcome = (typeof blankOutcomes)[number];

interface Asked {
  readonly item?: string | undefined;
  readonly limit: number;
  readonly cursor?: string | undefined;
}

interface Sheet {
  readonly items: BlankItem[];
  readonly itemId: string | null;
  readonly suggestions: DeskLease[];
  readonly cursor: string | null;
}

/** Items with boxes that look empty, as this reader has them to read, in paper order. */
export function emptyItems({ db }: Pick<Context, 'db'>, reader: string, { id, schemeVersion }: Pick<SittingRow, 'id' | 'schemeVersion'>): BlankItem[] {
  if (schemeVersion === null) return [];
  const counts = emptyCounts(db, reader, id);
  return deskItems(db, schemeVersion).flatMap(({ id: item, number, body }) => {
    const n = counts.get(item) ?? 0;
    return n === 0 ? [] : [{ id: item, number, label: itemLabel(body), count: n }];
  });
}

/** One sheet of boxes that look empty, held for this reader like answers at the desk. */
export function blankSuggestions(context: Context, actor: Actor, sittingId: string, { item, limit, cursor }: Asked): Sheet {
  const { db, clock } = context;
  const { sitting } = requireSitting(context, actor, sittingId, readerRoles);
  requireLockedPaper(context, sitting);
  if (item !== undefined && !deskItems(db, sitting.schemeVersion ?? '').some(({ id }) => id === item)) throw notFound();
  return inTransaction(db, () => {
    const now = clock.now();
    endExpiredLeases(db, now);
    const items = emptyItems(context, actor.personId, sitting);
    const itemId = item ?? items[0]?.id ?? null;
    if (itemId === null) return { items, itemId, suggestions: [], cursor: null };
    const found = emptyAnswers(db, { reader: actor.personId, item: itemId, limit: limit + 1, after: cursor });
    const sheet = found.slice(0, limit);
    const held = sheet.flatMap(({ lease }) => lease ?? []);
    if (held.length > 0) renewLeases(db, held, now + leaseMs);
    const leases = sheet.map(({ id, lease }) => lease ?? giveLease(context, id, actor.personId));
    return { items, itemId, suggestions: describeLeases(db, leases), cursor: found.length > limit ? (sheet.at(-1)?.id ?? null) : null };
  });
}

/** Records one box as blank by the way of every reading; a repeat of what is here already is recorded too. */
function recordBlank(context: Context, actor: Actor, { sittingId, openedAt }: { sittingId: string; openedAt: number }, { readingId, answerId, leaseId }: BlankReading): Outcome {
  const { db } = context;
  if (readingTarget(db, answerId)?.sitting !== sittingId) return 'gone';
  if (!findReading(db, readingId)) {
    const lease = findLease(db, leaseId);
    if (!lease || lease.reader !== actor.personId || lease.answer !== answerId || lease.withdrawnAt !== null) return 'gone';
    if (ownLiveReading(db, answerId, actor.personId)) return 'already-read';
    if (!isEmptyAnswer(db, answerId)) return 'gone';
  }
  recordReading(context, actor, readingId, { answerId, leaseId, code: 'blank', method: [], openedAt });
  return 'recorded';
}

interface Confirmed {
  readonly readings: readonly BlankReading[];
  readonly giveBack: readonly string[];
  readonly openedAt: number;
}

/** What a person confirmed of a sheet, in one transaction; leases of what is written end, so that any reader can have it. */
export function recordBlankReadings(context: Context, actor: Actor, sittingId: string, { readings, giveBack, openedAt }: Confirmed): { readingId: string; outcome: Outcome }[] {
  const { db, clock } = context;
  const { sitting } = requireSitting(context, actor, sittingId, readerRoles);
  requireLockedPaper(context, sitting);
  return inTransaction(db, () => {
    const rows = readings.map((row) => ({ readingId: row.readingId, outcome: recordBlank(context, actor, { sittingId, openedAt }, row) }));
    for (const id of giveBack) {
      if (findLease(db, id)?.reader === actor.personId) endLeaseAt(db, id, clock.now());
    }
    return rows;
  });
}
