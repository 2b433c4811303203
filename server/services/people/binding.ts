import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../../db/client';
import { candidateStandings, findCandidate, type CandidateRow } from '../../../db/queries/candidates';
import { answerIdsOf, findScript, findStrip, insertBinding, insertNumberSettled, scriptOfCandidate, setScriptCandidate, voidScript, type ScriptRow } from '../../../db/queries/people-and-paper';
import type { bindScript as bindContract, PeopleAndPaper, settleNumber as settleContract, swapScripts as swapContract } from '../../../shared/contracts/people-and-paper';
import type { BodyOf } from '../../../shared/contracts/route';
import type { Actor } from '../../auth/access';
import type { Context } from '../../context';
import { conflict, invalidRequest, notFound } from '../../errors';
import { recordAct } from '../audit';
import { ensureScripts } from '../scripts';
import { settleAnswers } from '../settle';
import { bumpSitting, requireSitting, type SittingAccess } from '../sitting-access';
import { viewOf } from './overview';

/** A live script, for a lead of its course, while its marks can still change. */
export function requireScript(context: Context, actor: Actor, scriptId: string): SittingAccess & { readonly script: ScriptRow } {
  const script = findScript(context.db, scriptId);
  const access = requireSitting(context, actor, script?.sitting, ['lead']);
  if (!script) throw notFound();
  if (access.sitting.status === 'released') throw conflict('The marks are released. A sheet changes hands by a settled case only.');
  return { ...access, script };
}

const seenAs = (context: Context, script: ScriptRow, seen: string | null): void => {
  if (script.candidate !== seen) throw conflict('Someone bound this script meanwhile. Nothing was changed.', viewOf(context, script.sitting));
};

/** Sets an empty script aside, so that another can take its place. */
function setAside(context: Context, actor: Actor, empty: ScriptRow, by: ScriptRow, reason: string): void {
  const { db, clock } = context;
  voidScript(db, empty.id, `replaced by script ${by.number}`);
  insertBinding(db, { id: uuidv7(), script: empty.id, was: empty.candidate, candidate: null, act: 'replaced', reason, by: actor.personId, at: clock.now() });
}

function requireEmpty(context: Context, candidate: CandidateRow): ScriptRow | undefined {
  const theirs = scriptOfCandidate(context.db, candidate.id);
  const standing = candidateStandings(context.db, candidate.sitting, candidate.id)[0];
  if (theirs && (standing?.pagesIn ?? 0) > 0) throw conflict(`${candidate.number} has pages in on script ${theirs.number} already. Swap the two instead.`);
  if (theirs?.origin === 'by-hand') throw conflict(`${candidate.number} has a script by hand. Take that back first.`);
  return theirs;
}

/** Binds a script, often a spare one, to a candidate who has no page in; whoever had it gets an empty one. */
export function bindScript(context: Context, actor: Actor, scriptId: string, { candidateId, seen, reason }: BodyOf<typeof bindContract>): PeopleAndPaper {
  const { db, clock } = context;
  requireScript(context, actor, scriptId);
  return inTransaction(db, () => {
    const { script, sitting } = requireScript(context, actor, scriptId);
    seenAs(context, script, seen);
    const candidate = findCandidate(db, candidateId);
    if (!candidate || candidate.sitting !== sitting.id) throw notFound();
    if (script.candidate === candidateId) throw invalidRequest(`Script ${script.number} belongs to ${candidate.number} already.`);
    const empty = requireEmpty(context, candidate);
    if (empty) setAside(context, actor, empty, script, reason);
    setScriptCandidate(db, scriptId, candidateId);
    insertBinding(db, { id: uuidv7(), script: scriptId, was: script.candidate, candidate: candidateId, act: 'bound', reason, by: actor.personId, at: clock.now() });
    ensureScripts(context, sitting.id);
    bumpSitting(db, sitting.id);
    const changed = [...answerIdsOf(db, scriptId), ...(empty ? answerIdsOf(db, empty.id) : [])];
    if (changed.length > 0) settleAnswers(context, changed);
    recordAct(context, { actor: actor.personId, act: 'script-bound', sitting: sitting.id, subject: scriptId, before: { candidate: script.candidate }, after: { candidate: candidateId, setAside: empty?.id ?? null }, reason });
    return viewOf(context, sitting.id);
  });
}

/** Exchanges the candidates of two scripts; what was read stays with the paper it was read from. */
export function swapScripts(context: Context, actor: Actor, scriptId: string, { withScriptId, seen, seenOther, reason }: BodyOf<typeof swapContract>): PeopleAndPaper {
  const { db, clock } = context;
  requireScript(context, actor, scriptId);
  return inTransaction(db, () => {
    const { script, sitting } = requireScript(context, actor, scriptId);
    const { script: other } = requireScript(context, actor, withScriptId);
    if (other.sitting !== sitting.id) throw notFound();
    if (other.id === script.id) throw invalidRequest('Name two scripts to exchange.');
    seenAs(context, script, seen);
    seenAs(context, other, seenOther);
    setScriptCandidate(db, script.id, null);
    setScriptCandidate(db, other.id, seen);
    setScriptCandidate(db, script.id, seenOther);
    const at = clock.now();
    insertBinding(db, { id: uuidv7(), script: script.id, was: seen, candidate: seenOther, act: 'swapped', reason, by: actor.personId, at });
    insertBinding(db, { id: uuidv7(), script: other.id, was: seenOther, candidate: seen, act: 'swapped', reason, by: actor.personId, at });
    bumpSitting(db, sitting.id);
    settleAnswers(context, [...answerIdsOf(db, script.id), ...answerIdsOf(db, other.id)]);
    recordAct(context, { actor: actor.personId, act: 'scripts-swapped', sitting: sitting.id, subject: script.id, before: { candidate: seen }, after: { candidate: seenOther, with: other.id }, reason });
    return viewOf(context, sitting.id);
  });
}

/** Keeps a sheet with its candidate although the number on it differs: another image or another candidate asks again. */
export function settleNumber(context: Context, actor: Actor, scriptId: string, { seen, reason }: BodyOf<typeof settleContract>): PeopleAndPaper {
  const { db, clock } = context;
  requireScript(context, actor, scriptId);
  return inTransaction(db, () => {
    const { script, sitting } = requireScript(context, actor, scriptId);
    seenAs(context, script, seen);
    const found = findStrip(db, scriptId);
    if (!found) throw conflict('This script has no page with a number in.');
    insertNumberSettled(db, { id: uuidv7(), script: scriptId, pageImage: found.strip.pageImage, candidate: script.candidate, reason, by: actor.personId, at: clock.now() });
    bumpSitting(db, sitting.id);
    recordAct(context, { actor: actor.personId, act: 'number-settled', sitting: sitting.id, subject: scriptId, after: { candidate: script.candidate }, reason });
    return viewOf(context, sitting.id);
  });
}
