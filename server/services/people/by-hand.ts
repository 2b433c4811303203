import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../../db/client';
import { candidateStandings, findCandidate } from '../../../db/queries/candidates';
import { findReading, insertReading, ownLiveReading } from '../../../db/queries/desk';
import { setEvidence } from '../../../db/queries/page-images';
import { answerIdsOf, findScript, insertBinding, itemsOfScript, scriptOfCandidate, scriptSheets, setScriptOrigin, typistsOf, type ScriptRow } from '../../../db/queries/people-and-paper';
import type { HandSheet, makeByHand as makeContract, PeopleAndPaper, typeByHand as typeContract } from '../../../shared/contracts/people-and-paper';
import type { BodyOf } from '../../../shared/contracts/route';
import { completeScheme } from '../../../shared/marking/complete-scheme';
import { itemLabel } from '../../../shared/marking/item-label';
import { grammarVersion } from '../../../shared/marking/read-answer';
import type { Actor } from '../../auth/access';
import type { Context } from '../../context';
import { conflict, invalidRequest, notFound } from '../../errors';
import { recordAct } from '../audit';
import { understand } from '../readings';
import { ensureScripts } from '../scripts';
import { settleAnswers } from '../settle';
import { bumpSitting, requireLockedPaper, requireSitting, type SittingAccess } from '../sitting-access';
import { schemeInForce } from '../verdicts';
import { viewOf } from './overview';

const wantedTypists = 2;
const readers = ['reader', 'lead'] as const;

/** Has a candidate without a page in typed from the paper: large print, a scribe, a page found late. */
export function makeByHand(context: Context, actor: Actor, candidateId: string, { reason }: BodyOf<typeof makeContract>): PeopleAndPaper {
  const { db, clock } = context;
  const known = findCandidate(db, candidateId);
  requireSitting(context, actor, known?.sitting, ['lead']);
  return inTransaction(db, () => {
    const candidate = findCandidate(db, candidateId);
    const { sitting } = requireSitting(context, actor, candidate?.sitting, ['lead']);
    if (!candidate) throw notFound();
    requireLockedPaper(context, sitting);
    if (sitting.status === 'released') throw conflict('The marks are released. They change by a settled case or an amendment only.');
    if ((candidateStandings(db, sitting.id, candidateId)[0]?.pagesIn ?? 0) > 0) throw conflict(`${candidate.number} has pages in. Read those at the desk, or take them out first.`);
    ensureScripts(context, sitting.id);
    const script = scriptOfCandidate(db, candidateId);
    if (!script) throw notFound();
    if (script.origin === 'by-hand') throw conflict(`${candidate.number} has a script by hand already.`, viewOf(context, sitting.id));
    setScriptOrigin(db, script.id, 'by-hand');
    const answers = answerIdsOf(db, script.id);
    for (const answer of answers) setEvidence(db, answer, 'in');
    insertBinding(db, { id: uuidv7(), script: script.id, was: candidateId, candidate: candidateId, act: 'by-hand', reason, by: actor.personId, at: clock.now() });
    bumpSitting(db, sitting.id);
    settleAnswers(context, answers);
    recordAct(context, { actor: actor.personId, act: 'script-by-hand', sitting: sitting.id, subject: script.id, after: { candidate: candidateId }, reason });
    return viewOf(context, sitting.id);
  });
}

function requireByHand(context: Context, actor: Actor, scriptId: string): SittingAccess & { readonly script: ScriptRow } {
  const script = findScript(context.db, scriptId);
  const access = requireSitting(context, actor, script?.sitting, readers);
  if (script?.origin !== 'by-hand') throw notFound();
  return { ...access, script };
}

/** Whether this person may still type the script: two people do, each once. */
function mayType(context: Context, actor: Actor, scriptId: string): boolean {
  const typists = typistsOf(context.db, [scriptId]).map(({ reader }) => reader);
  return typists.length < wantedTypists && !typists.includes(actor.personId);
}

export function handScripts(context: Context, actor: Actor, sittingId: string): { scriptId: string; candidateNumber: string }[] {
  requireSitting(context, actor, sittingId, readers);
  return scriptSheets(context.db, sittingId).flatMap(({ scriptId, origin, candidateNumber }) =>
    origin === 'by-hand' && mayType(context, actor, scriptId) ? [{ scriptId, candidateNumber: candidateNumber ?? '' }] : [],
  );
}

/** The items to type, key-blind as the desk is. */
export function handSheet(context: Context, actor: Actor, scriptId: string): HandSheet {
  const { db } = context;
  const { script, sitting } = requireByHand(context, actor, scriptId);
  requireLockedPaper(context, sitting);
  const version = sitting.schemeVersion ?? '';
  const candidate = script.candidate === null ? undefined : findCandidate(db, script.candidate);
  return {
    scriptId,
    candidateNumber: candidate?.number ?? '',
    items: itemsOfScript(db, scriptId).map(({ id, number, prompt }) => {
      const { body } = schemeInForce(db, version, id);
      return { itemId: id, number, prompt, label: itemLabel(body), kind: body.kind, units: [...body.units], methodMarks: completeScheme(body).methodMarks.map(({ id: mark, text }) => ({ id: mark, text })) };
    }),
  };
}

type Sent = BodyOf<typeof typeContract>;

function requireWhole(sent: Sent, items: readonly { readonly id: string; readonly number: number }[]): void {
  const missing = items.filter(({ id }) => !sent.readings.some(({ itemId }) => itemId === id));
  if (missing.length > 0) throw invalidRequest(`Item ${missing.map(({ number }) => number).join(', ')} has no value. Type one, or say that the box is blank.`);
  if (sent.readings.length !== items.length) throw invalidRequest('An item has two values, or is not on this paper.');
}

/** Records all values of a script typed from the paper, in one transaction. A repeat of what is stored is fine. */
export function typeByHand(context: Context, actor: Actor, scriptId: string, sent: Sent): void {
  const { db, clock } = context;
  requireByHand(context, actor, scriptId);
  inTransaction(db, () => {
    const { sitting, access } = requireByHand(context, actor, scriptId);
    requireLockedPaper(context, sitting);
    const version = sitting.schemeVersion ?? '';
    const items = itemsOfScript(db, scriptId);
    requireWhole(sent, items);
    if (sent.readings.every(({ id }) => findReading(db, id)?.reader === actor.personId)) return;
    if (!mayType(context, actor, scriptId)) throw conflict('You have typed this script already, or two others have. Nothing was stored.');
    const at = clock.now();
    for (const { id, answer } of items) {
      const typed = sent.readings.find(({ itemId }) => itemId === id);
      if (!typed || ownLiveReading(db, answer, actor.personId)) throw conflict('You have read an answer of this script before. Another person has to type it.');
      insertReading(db, {
        id: typed.id,
        answer,
        reader: actor.personId,
        purpose: 'live',
        ...understand(typed, schemeInForce(db, version, id).body),
        note: null,
        knewKey: access.roles.has('lead'),
        lease: null,
        openedAt: sent.openedAt,
        recordedAt: at,
        grammar: grammarVersion,
      });
      recordAct(context, { actor: actor.personId, act: 'reading-recorded', sitting: sitting.id, subject: answer, after: { reading: typed.id } });
    }
    settleAnswers(context, items.map(({ answer }) => answer));
  });
}
