import type { Database } from '../../db/client';
import {
  answerHead,
  cropsOfAnswer,
  pageOfAnswer,
  readersOfSitting,
  scoreWithVerdict,
  thirdReadingOf,
} from '../../db/queries/answers';
import { readingsOfAnswers, uncoveredBy } from '../../db/queries/ledger';
import { answersOfScript, standingRuling } from '../../db/queries/settling';
import { absolute, exactDecimals, fromFractionText, subtract, toDecimals } from '../../shared/chemistry/exact';
import { work } from '../../shared/chemistry/work';
import type { AnswerView } from '../../shared/contracts/ledger';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { reasonInWords } from '../../shared/marking/reasons';
import { isWaiting } from '../../shared/marking/mark-paper';
import { scaleOf } from '../../shared/marking/scale';
import { isConcordant } from '../../shared/marking/settlement';
import { struckIds } from '../../shared/marking/struck';
import type { GuardRole } from '../../shared/contracts/route';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { notFound } from '../errors';
import { isCovered, shownGiven } from './covers';
import { likelySlips } from './likely';
import { requireSitting, type SittingAccess } from './sitting-access';
import { pictureVersion } from './picture-version';
import { answerContext, paperPlan, schemeInForce, type PaperPlan, type SchemeInForce } from './paper-plan';
import { verdictFor } from './verdicts';

export type AnswerHead = NonNullable<ReturnType<typeof answerHead>>;

export interface AnswerAccess extends SittingAccess {
  readonly head: AnswerHead;
  readonly scheme: SchemeInForce;
  readonly plan: PaperPlan;
}

/** The answer with the scheme in force, for an actor with one of the roles in its course. */
export function requireAnswer(context: Context, actor: Actor, answerId: string, roles: readonly GuardRole[]): AnswerAccess {
  const head = answerHead(context.db, answerId);
  if (!head) throw notFound();
  const { sitting, access } = requireSitting(context, actor, head.sitting, roles);
  if (sitting.schemeVersion === null) throw notFound();
  return { sitting, access, head, scheme: schemeInForce(context.db, sitting.schemeVersion, head.item), plan: paperPlan(context.db, sitting.schemeVersion) };
}

/** Readers by number, steady within the sitting; a lead's names are for the people pages. */
export function pseudonyms(context: Pick<Context, 'db'>, sittingId: string): (personId: string) => string {
  const numbers = new Map(readersOfSitting(context.db, sittingId).map((id, index) => [id, index + 1]));
  return (personId) => (numbers.has(personId) ? `reader ${numbers.get(personId)}` : 'lead');
}

type Reading = ReturnType<typeof readingsOfAnswers>[number];

/** The distance between the two values furthest apart, exact where a short decimal says it. */
function gapOf(readings: readonly Reading[]): string | null {
  const values = readings.flatMap(({ value }) => (value === null ? [] : [fromFractionText(value)]));
  const [first, second] = [values[0], values.find((value) => values[0] && subtract(value, values[0]).n !== 0n)];
  if (!first || !second) return null;
  const gap = absolute(subtract(first, second));
  return toDecimals(gap, Math.max(2, Math.min(6, exactDecimals(gap) ?? 6)));
}

function rulingView(context: Context, actor: Actor, answerId: string): AnswerView['ruling'] {
  const ruling = standingRuling(context.db, answerId);
  if (!ruling) return null;
  const { id, kind, text, code, grains, method, reason, at } = ruling;
  return { id, kind, text, code, grains, method: struckIds(method), reason, isOwn: ruling.by === actor.personId, at };
}

function scoreView(context: Context, head: AnswerHead): AnswerView['score'] {
  const found = head.score === null ? undefined : scoreWithVerdict(context.db, head.score);
  if (!found) return null;
  const why = found.rule && found.numbers ? reasonInWords({ grains: found.grains, rule: found.rule, numbers: found.numbers }) : { head: 'ruled by hand', detail: 'A mark given by a person, not by a rule.' };
  return { grains: found.grains, why, schemeOrdinal: found.ordinal };
}

interface Worth {
  readonly grains: number | null;
  /** The number of the earlier item that the mark would wait for. */
  readonly waitsFor: number | null;
}

/** What a reading of this answer would get, beside the rest of the paper as it stands. */
function worthOf(db: Database, access: AnswerAccess, reading: Pick<Reading, 'canonical' | 'text' | 'code' | 'method'>): Worth {
  const { head, scheme, plan } = access;
  const { context, facts } = answerContext(db, plan, head, reading.method);
  const given = reading.code === null ? { text: reading.text ?? '' } : { code: reading.code };
  const verdict = verdictFor(db, scheme, { canonical: reading.canonical, given, context });
  if (!isWaiting(scheme.body, verdict, facts)) return { grains: verdict.grains, waitsFor: null };
  return { grains: null, waitsFor: followsView(db, access).find(({ canonical }) => canonical === null)?.itemNumber ?? null };
}

function mineView(context: Context, actor: Actor, access: AnswerAccess): AnswerView['mine'] {
  const { head } = access;
  const third = thirdReadingOf(context.db, head.id, actor.personId);
  if (!third) return null;
  return { id: third.id, text: third.text, code: third.code, method: struckIds(third.method), ...worthOf(context.db, access, third) };
}

/** Why this person may not settle the answer: who read it cannot. */
export function cannotSettle(actor: Actor, isLead: boolean, readings: readonly Reading[]): string | null {
  if (!isLead) return 'Only a lead can rule.';
  return readings.some((reading) => reading.reader === actor.personId) ? 'You read this answer yourself. Another lead has to settle it.' : null;
}

/** The own values that an answer follows from, as they are settled by now. */
function followsView(db: Database, { head, scheme, plan }: AnswerAccess): AnswerView['follows'] {
  const link = completeScheme(scheme.body).followThrough;
  if (!link) return [];
  const { facts } = answerContext(db, plan, head, '');
  const answers = new Map(answersOfScript(db, head.script).map(({ item, id }) => [item, id]));
  const numbered = (id: string, canonical: string | null) => {
    const source = plan.items.get(id);
    return { itemNumber: (source?.at ?? 0) + 1, label: source ? itemLabel(source.body) : '', answerId: answers.get(id) ?? null, canonical };
  };
  return [numbered(link.from, facts.followed), ...(link.second ? [numbered(link.second.from, facts.second)] : [])];
}

/** One answer whole, as this person may see it. */
export function answerView(context: Context, actor: Actor, answerId: string): AnswerView {
  const { db } = context;
  const found = requireAnswer(context, actor, answerId, ['lead', 'external']);
  const { head, scheme, plan, access } = found;
  const readings = readingsOfAnswers(db, [answerId]);
  const mine = mineView(context, actor, found);
  const third = mine ? thirdReadingOf(db, answerId, actor.personId) : undefined;
  const covered = isCovered(head.state, head.readingsDue, uncoveredBy(db, actor.personId, [answerId]).has(answerId));
  const crops = cropsOfAnswer(db, answerId);
  const nameOf = pseudonyms(context, head.sitting);
  const worked = work(scheme.body.asked);
  const answerCrop = crops.find((crop) => crop.use === 'answer') ?? crops[0];
  const onPage = answerCrop ? pageOfAnswer(db, head.script, answerCrop.pageNo) : undefined;
  return {
    answerId,
    sittingId: head.sitting,
    candidateNumber: head.candidateNumber ?? '',
    itemId: head.item,
    itemNumber: head.itemNumber,
    label: itemLabel(scheme.body),
    prompt: head.prompt,
    kind: scheme.body.kind,
    units: [...scheme.body.units],
    maxGrains: head.maxGrains,
    state: head.state,
    methodMarks: completeScheme(scheme.body).methodMarks.map(({ id, text, grains }) => ({ id, text, grains })),
    waitsFor: head.waitsFor,
    follows: followsView(db, found),
    isCovered: covered,
    cannotSettle: cannotSettle(actor, access.roles.has('lead'), readings),
    crops: crops.flatMap(({ box, use, blob, widthPx, heightPx, evidence }) => (use === 'number' ? [] : [{ box, version: pictureVersion(blob), use, widthPx, heightPx, isDoubtful: evidence === 'doubtful' }])),
    pageImageId: onPage?.image ?? null,
    pageImageRev: onPage?.rev ?? 1,
    pageNo: answerCrop?.pageNo ?? null,
    readings: readings.map((reading) => ({
      id: reading.id,
      reader: nameOf(reading.reader),
      given: shownGiven(reading, head.state, covered),
      grains: covered ? null : worthOf(db, found, reading).grains,
      note: covered ? null : reading.note,
      method: covered ? [] : struckIds(reading.method),
      recordedAt: reading.recordedAt,
      isAsMine: covered || !third ? null : isConcordant(third, reading),
    })),
    mine,
    gap: covered ? null : gapOf(readings),
    ruling: rulingView(context, actor, answerId),
    score: scoreView(context, head),
    likely: covered ? [] : likelySlips(db, plan, head, head.settledCanonical ?? third?.canonical ?? null),
    scheme: {
      key: scheme.body.key.text,
      quantity: scheme.body.asked.quantity,
      convention: scheme.body.asked.convention,
      scale: scheme.body.kind === 'numeric' ? scaleOf(scheme.body) : null,
      derivation: worked.ok ? worked.value.derivation : null,
    },
    rev: head.rev,
  };
}
