import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { endRuling, insertRuling, insertUncovered, rulingById } from '../../db/queries/answers';
import { findReading, insertReading } from '../../db/queries/desk';
import { readingsOfAnswers, uncoveredBy } from '../../db/queries/ledger';
import { standingRuling, type RulingRow } from '../../db/queries/settling';
import { heldStates } from '../../shared/contracts/enums';
import type { AnswerView, RulingBody } from '../../shared/contracts/ledger';
import { marksText } from '../../shared/marking/grains';
import { grammarVersion } from '../../shared/marking/read-answer';
import type { Code } from '../../shared/marking/scheme';
import { isConcordant } from '../../shared/marking/settlement';
import { readMarks } from '../../shared/marking/typed-marks';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notAllowed, notFound } from '../errors';
import { answerView, cannotSettle, requireAnswer, type AnswerAccess } from './answers';
import { recordAct } from './audit';
import { isCovered } from './covers';
import { understand } from './readings';
import { settleAnswers } from './settle';
import { decidesCode } from './verdicts';

interface TypedThird {
  readonly text?: string | undefined;
  readonly code?: Code | undefined;
  readonly method: readonly string[];
  readonly openedAt: number;
}

function requireSettling(context: Context, actor: Actor, answerId: string): AnswerAccess {
  const found = requireAnswer(context, actor, answerId, ['lead']);
  const refusal = cannotSettle(actor, true, readingsOfAnswers(context.db, [answerId]));
  if (refusal) throw notAllowed(refusal);
  return found;
}

/** Stores what the lead reads from the image; from then on the readings are uncovered to that lead. */
export function recordThirdReading(context: Context, actor: Actor, answerId: string, readingId: string, typed: TypedThird): AnswerView {
  const { db, clock } = context;
  const { head, scheme, sitting } = requireSettling(context, actor, answerId);
  const understood = understand(typed, scheme.body);
  inTransaction(db, () => {
    const known = findReading(db, readingId);
    if (known) {
      const same = known.answer === answerId && known.reader === actor.personId && isConcordant(known, understood);
      if (!same) throw conflict('Another reading was stored under this id. Yours was not stored.');
      return;
    }
    const at = clock.now();
    insertReading(db, {
      id: readingId,
      answer: answerId,
      reader: actor.personId,
      purpose: 'third',
      ...understood,
      note: null,
      knewKey: true,
      lease: null,
      openedAt: typed.openedAt,
      recordedAt: at,
      grammar: grammarVersion,
    });
    insertUncovered(db, { answer: answerId, person: actor.personId, thirdReading: readingId, at });
    recordAct(context, { actor: actor.personId, act: 'third-reading-recorded', sitting: sitting.id, subject: head.id, after: { reading: readingId } });
  });
  return answerView(context, actor, answerId);
}

/** Marks as typed, in grains; refused when they are no whole grains or more than the item is worth. */
function grainsOf(typed: string, maxGrains: number): number {
  const marks = readMarks(typed, true);
  if (!marks.ok) throw invalidRequest(marks.message, { marks: marks.message });
  if (marks.grains > maxGrains) throw invalidRequest('Marks go from 0 to what the item is worth.', { marks: `At most ${marksText(maxGrains)}.` });
  return marks.grains;
}

type Ruled = Pick<RulingRow, 'kind' | 'text' | 'code' | 'canonical' | 'value' | 'grains' | 'method'>;

/** What the ruling says, checked against the scheme: a code it leaves to a person cannot be ruled, only a mark. */
function ruledBy({ head, scheme }: AnswerAccess, body: RulingBody): Ruled {
  if (body.kind === 'mark') return { kind: 'mark', text: null, code: null, canonical: null, value: null, method: '', grains: grainsOf(body.marks, head.maxGrains) };
  const understood = understand(body, scheme.body);
  if (understood.code !== null && !decidesCode(scheme, { code: understood.code })) {
    throw invalidRequest('The scheme leaves this code to a person. Rule a mark, with a reason.', { code: 'Rule a mark instead.' });
  }
  return { kind: body.kind, ...understood, grains: null };
}

/** A reason is asked for a mark, for a ruling that is neither reading, and for changing what stands. */
function requireReason(ruled: Ruled, body: RulingBody, readings: ReturnType<typeof readingsOfAnswers>, isHeld: boolean, replaces: boolean): void {
  if (body.reason !== undefined) return;
  const isOneOfThem = ruled.canonical !== null && readings.some((reading) => isConcordant(reading, { canonical: ruled.canonical ?? '', method: ruled.method }));
  if (isOneOfThem && isHeld && !replaces) return;
  throw invalidRequest('Say why: this ruling is neither of the readings, or changes a mark that stands.', { reason: 'A reason is needed here.' });
}

/** Rules on one answer. Someone who has not typed a covered answer cannot; an old rev is a conflict with what is there now. */
export function ruleAnswer(context: Context, actor: Actor, answerId: string, seenRev: number, body: RulingBody): AnswerView {
  const { db, clock } = context;
  inTransaction(db, () => {
    const found = requireSettling(context, actor, answerId);
    const { head, sitting } = found;
    if (sitting.status === 'released') throw conflict('The marks are released. They change by a settled case or an amendment only.');
    if (head.rev !== seenRev) throw conflict('Someone changed this answer meanwhile. Yours was not stored.', answerView(context, actor, answerId));
    const hasTyped = uncoveredBy(db, actor.personId, [answerId]).has(answerId);
    if (isCovered(head.state, head.readingsDue, hasTyped)) throw conflict('Type what the image says first. The readings are uncovered then.');
    const readings = readingsOfAnswers(db, [answerId]);
    const before = standingRuling(db, answerId);
    const ruled = ruledBy(found, body);
    const isHeld = heldStates.some((state) => state === head.state);
    requireReason(ruled, body, readings, isHeld, before !== undefined);
    const at = clock.now();
    const id = uuidv7();
    if (before) endRuling(db, { ruling: before.id, why: 'replaced', by: actor.personId, at });
    insertRuling(db, { id, answer: answerId, thirdReading: null, ...ruled, reason: body.reason ?? null, replaces: before?.id ?? null, by: actor.personId, at });
    settleAnswers(context, [answerId], 'ruled');
    recordAct(context, {
      actor: actor.personId,
      act: 'ruled',
      sitting: sitting.id,
      subject: answerId,
      ...(before && { before: { ruling: before.id } }),
      after: { ruling: id, kind: ruled.kind, grains: ruled.grains },
      ...(body.reason && { reason: body.reason }),
    });
  });
  return answerView(context, actor, answerId);
}

/** Ends an own ruling; the one it replaced, if any, stands again. */
export function takeBackRuling(context: Context, actor: Actor, rulingId: string): AnswerView {
  const { db, clock } = context;
  const ruling = rulingById(db, rulingId);
  if (!ruling) throw notFound();
  const { sitting } = requireAnswer(context, actor, ruling.answer, ['lead']);
  inTransaction(db, () => {
    if (standingRuling(db, ruling.answer)?.id !== rulingId) throw conflict('This ruling no longer stands.', answerView(context, actor, ruling.answer));
    if (ruling.by !== actor.personId) throw notAllowed('Only who ruled can take it back. Rule anew instead, with a reason.');
    if (sitting.status === 'released') throw conflict('The marks are released. They change by a settled case or an amendment only.');
    const at = clock.now();
    endRuling(db, { ruling: rulingId, why: 'taken-back', by: actor.personId, at });
    const earlier = ruling.replaces === null ? undefined : rulingById(db, ruling.replaces);
    if (earlier) insertRuling(db, { ...earlier, id: uuidv7(), at });
    settleAnswers(context, [ruling.answer], 'taken-back');
    recordAct(context, { actor: actor.personId, act: 'ruling-taken-back', sitting: sitting.id, subject: ruling.answer, before: { ruling: rulingId } });
  });
  return answerView(context, actor, ruling.answer);
}
