import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { emptyCounts } from '../../db/queries/blanks';
import {
  courseCodeOf,
  deskItems,
  endExpiredLeases,
  endLeaseAt,
  findLease,
  insertLease,
  itemSitting,
  leasedAnswers,
  nextAnswers,
  openLeasesOf,
  readingCounts,
  readingTarget,
  recentReadings,
  renewLeases,
} from '../../db/queries/desk';
import type { DeskItem, DeskLease, RecentReading } from '../../shared/contracts/desk';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { struckIds } from '../../shared/marking/struck';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notFound } from '../errors';
import { pictureVersion } from './picture-version';
import { requireLockedPaper, requireSitting } from './sitting-access';

const readerRoles = ['reader', 'lead'] as const;

/** How long an answer stays with a reader who does not come back; a later reading is kept all the same. */
export const leaseMs = 20 * 60_000;

/** Puts leases into the order asked for, with the cut-outs of each answer. */
export function describeLeases(db: Database, leaseIds: readonly string[]): DeskLease[] {
  if (leaseIds.length === 0) return [];
  const leases = new Map<string, DeskLease>();
  for (const row of leasedAnswers(db, leaseIds)) {
    if (row.use === 'number') continue;
    const known = leases.get(row.id) ?? {
      id: row.id,
      answerId: row.answerId,
      candidateNumber: row.candidateNumber ?? '',
      pageNo: row.pageNo,
      pageCount: row.pageCount,
      pageImageId: row.pageImageId,
      pageImageRev: row.pageImageRev,
      crops: [],
    };
    leases.set(row.id, { ...known, crops: [...known.crops, { box: row.box, version: pictureVersion(row.blob), use: row.use, widthPx: row.widthPx, heightPx: row.heightPx, isDoubtful: row.evidence === 'doubtful' }] });
  }
  return leaseIds.flatMap((id) => leases.get(id) ?? []);
}

/** Gives an answer to a reader for a while; the caller has made sure that it is free. */
export function giveLease({ db, clock }: Context, answerId: string, reader: string): string {
  const id = uuidv7();
  const now = clock.now();
  insertLease(db, { id, answer: answerId, reader, takenAt: now, expiresAt: now + leaseMs });
  return id;
}

/** The next answers of an item for this reader: those already held, then free ones, never one that another reader holds. */
export function takeLeases(context: Context, actor: Actor, itemId: string, wanted: number): DeskLease[] {
  const { db, clock } = context;
  const { sitting } = requireSitting(context, actor, itemSitting(db, itemId), readerRoles);
  requireLockedPaper(context, sitting);
  return inTransaction(db, () => {
    const now = clock.now();
    endExpiredLeases(db, now);
    const held = openLeasesOf(db, actor.personId, itemId).map((lease) => lease.id).slice(0, wanted);
    if (held.length > 0) renewLeases(db, held, now + leaseMs);
    const fresh = nextAnswers(db, actor.personId, itemId, wanted - held.length).map((answerId) => giveLease(context, answerId, actor.personId));
    return describeLeases(db, [...held, ...fresh]);
  });
}

/** Gives an answer back unread. */
export function endLease(context: Context, actor: Actor, leaseId: string): void {
  const { db, clock } = context;
  const lease = findLease(db, leaseId);
  if (!lease || lease.reader !== actor.personId) throw notFound();
  requireSitting(context, actor, readingTarget(db, lease.answer)?.sitting, readerRoles);
  inTransaction(db, () => endLeaseAt(db, leaseId, clock.now()));
}

/** The last own readings in a sitting, newest first. */
export function recentReadingsOf(context: Context, actor: Actor, sittingId: string, itemId: string | undefined): RecentReading[] {
  requireSitting(context, actor, sittingId, readerRoles);
  return recentReadings(context.db, actor.personId, sittingId, itemId, 20).map((row) => ({ ...row, candidateNumber: row.candidateNumber ?? '', method: struckIds(row.method) }));
}

/** What there is to read for this reader; nothing that decides a mark. */
export function deskStanding(context: Context, actor: Actor, sittingId: string) {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, readerRoles);
  const counts = readingCounts(db, actor.personId, sittingId);
  const items: DeskItem[] = (sitting.schemeVersion === null ? [] : deskItems(db, sitting.schemeVersion)).map(({ id, number, prompt, body }) => ({
    id,
    number,
    prompt,
    label: itemLabel(body),
    kind: body.kind,
    units: [...body.units],
    methodMarks: completeScheme(body).methodMarks.map(({ id, text }) => ({ id, text })),
    typesLast: { twoAnswers: body.twoAnswers === 'last', crossedOut: body.crossedOut === 'last' },
    ...(counts.get(id) ?? { read: 0, toRead: 0 }),
  }));
  return {
    sittingId,
    courseCode: courseCodeOf(db, sitting.course),
    title: sitting.title,
    isOpenForReading: sitting.schemeVersion !== null && sitting.status === 'draft',
    emptyBoxes: [...emptyCounts(db, actor.personId, sittingId).values()].reduce((sum, count) => sum + count, 0),
    items,
  };
}
