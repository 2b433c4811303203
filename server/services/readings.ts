import { inTransaction } from '../../db/client';
import { endLeaseAt, endReading, findLease, findReading, hasOpenLease, insertReading, ownLiveReading, readingTarget } from '../../db/queries/desk';
import { liveReadings, standingRuling } from '../../db/queries/settling';
import { toFractionText } from '../../shared/chemistry/exact';
import type { DeskLease, SentReading } from '../../shared/contracts/desk';
import { codeCanonical } from '../../shared/marking/canonical';
import { grammarVersion } from '../../shared/marking/read-answer';
import { readTyped } from '../../shared/marking/read-typed';
import type { Code, ItemScheme } from '../../shared/marking/scheme';
import { struckIds } from '../../shared/marking/struck';
import { isConcordant } from '../../shared/marking/settlement';
import { requireCourseRole, type Actor, type CourseAccess } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notFound } from '../errors';
import { recordAct } from './audit';
import { describeLeases, giveLease } from './desk';
import { settleAnswers } from './settle';
import { schemeInForce } from './verdicts';

const readerRoles = ['reader', 'lead'] as const;

type Target = NonNullable<ReturnType<typeof readingTarget>>;

export interface Understood {
  readonly text: string | null;
  readonly code: Code | null;
  readonly canonical: string;
  readonly value: string | null;
  /** Ids of the method marks struck, in the order of the scheme, with commas. */
  readonly method: string;
}

function struckOf({ methodMarks = [] }: ItemScheme, struck: readonly string[]): string {
  const unknown = struck.find((id) => !methodMarks.some((mark) => mark.id === id));
  if (unknown !== undefined) throw invalidRequest('This item has no such method mark.', { method: 'This item has no such method mark.' });
  return methodMarks.filter(({ id }) => struck.includes(id)).map(({ id }) => id).join(',');
}

/** A typed text or a code as it is stored; a text that the grammar refuses is named with its place. */
export function understand(given: { text?: string | undefined; code?: Code | undefined; method: readonly string[] }, scheme: ItemScheme): Understood {
  const method = struckOf(scheme, given.method);
  if (given.code !== undefined) return { text: null, code: given.code, canonical: codeCanonical(given.code), value: null, method };
  const text = given.text ?? '';
  const read = readTyped(text, scheme);
  if (!read.ok) {
    const message = 'message' in read ? read.message : 'This is not yet a value.';
    throw invalidRequest(message, { text: message });
  }
  return { text, code: null, canonical: read.canonical, value: toFractionText(read.value), method };
}

function requireTarget(context: Context, actor: Actor, answerId: string): { target: Target; access: CourseAccess } {
  const target = readingTarget(context.db, answerId);
  if (!target) throw notFound();
  return { target, access: requireCourseRole(context, actor, target.course, readerRoles) };
}

/** A repeat of a reading that is already here is fine; another reading under the same id is not. */
function isRepeat(context: Context, actor: Actor, id: string, sent: SentReading): boolean {
  const known = findReading(context.db, id);
  if (!known) return false;
  if (known.reader !== actor.personId) throw notFound();
  const isSameMethod = struckIds(known.method).sort().join() === [...new Set(sent.method)].sort().join();
  const same = known.answer === sent.answerId && known.text === (sent.text ?? null) && known.code === (sent.code ?? null) && isSameMethod;
  if (!same) throw conflict('Another reading was stored under this id. Yours was not stored.', { text: known.text, code: known.code });
  return true;
}

/** A reading counts for the pair unless the pair is full and it says the same, or a ruling stands. */
function isSurplus(context: Context, target: Target, understood: Understood): boolean {
  if (standingRuling(context.db, target.answer)) return true;
  const others = liveReadings(context.db, target.answer);
  const wanted = target.secondPolicy === 'all' ? 2 : 1;
  return others.length >= wanted && others.every((other) => isConcordant(other, understood));
}

/** Records one reading and settles its answer; on disk with the transaction it is called in, its own when there is none. A late one, its lease run out, is kept too. */
export function recordReading(context: Context, actor: Actor, id: string, sent: SentReading): void {
  const { db, clock } = context;
  const { target, access } = requireTarget(context, actor, sent.answerId);
  const lease = findLease(db, sent.leaseId);
  if (!lease || lease.reader !== actor.personId || lease.answer !== sent.answerId) throw notFound();
  if (target.schemeVersion === null) throw conflict('The paper is still open to change.');
  const scheme = schemeInForce(db, target.schemeVersion, target.item);
  const understood = understand(sent, scheme.body);
  inTransaction(db, () => {
    if (isRepeat(context, actor, id, sent)) return;
    const own = ownLiveReading(db, sent.answerId, actor.personId);
    if (own) {
      const stored = findReading(db, own.id);
      throw conflict('You have read this answer already. This reading was not stored.', { text: stored?.text ?? null, code: stored?.code ?? null });
    }
    const at = clock.now();
    const surplus = isSurplus(context, target, understood);
    insertReading(db, {
      id,
      answer: sent.answerId,
      reader: actor.personId,
      purpose: 'live',
      ...understood,
      note: sent.note ?? null,
      knewKey: access.roles.has('lead'),
      lease: lease.id,
      openedAt: sent.openedAt,
      recordedAt: at,
      grammar: grammarVersion,
    });
    if (lease.endedAt === null) endLeaseAt(db, lease.id, at);
    if (lease.withdrawnAt !== null) endReading(db, { reading: id, why: 'reopened', by: actor.personId, at });
    else if (surplus) endReading(db, { reading: id, why: 'surplus', by: actor.personId, at });
    recordAct(context, { actor: actor.personId, act: 'reading-recorded', sitting: target.sitting, subject: sent.answerId, after: { reading: id } });
    settleAnswers(context, [sent.answerId]);
  });
}

/** Ends an own reading and gives its answer back to the reader, unless another reader holds it by now. */
export function takeBackReading(context: Context, actor: Actor, id: string): DeskLease | null {
  const { db, clock } = context;
  const reading = findReading(db, id);
  if (!reading || reading.reader !== actor.personId || reading.purpose !== 'live') throw notFound();
  const { target } = requireTarget(context, actor, reading.answer);
  return inTransaction(db, () => {
    if (ownLiveReading(db, reading.answer, actor.personId)?.id !== id) throw conflict('This reading was taken back already, or no longer counts.');
    if (standingRuling(db, reading.answer)) throw conflict('A lead has ruled on this answer. It can no longer be taken back here.');
    endReading(db, { reading: id, why: 'taken-back', by: actor.personId, at: clock.now() });
    recordAct(context, { actor: actor.personId, act: 'reading-taken-back', sitting: target.sitting, subject: reading.answer, before: { reading: id } });
    settleAnswers(context, [reading.answer]);
    if (hasOpenLease(db, reading.answer)) return null;
    return describeLeases(db, [giveLease(context, reading.answer, actor.personId)])[0] ?? null;
  });
}
