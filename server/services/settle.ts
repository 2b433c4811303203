import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { findSitting } from '../../db/queries/sittings';
import {
  answersOfScript,
  findEqualScore,
  findScore,
  isSameScore,
  insertScore,
  liveReadings,
  saveDerivedState,
  saveTotal,
  settlingFacts,
  standingRuling,
  sumOfScript,
  type RulingRow,
} from '../../db/queries/settling';
import { fromFractionText, toApproximate } from '../../shared/chemistry/exact';
import type { scoreCauses } from '../../shared/contracts/enums';
import { isWaiting } from '../../shared/marking/mark-paper';
import type { Given } from '../../shared/marking/scheme';
import { settlement, type Settlement } from '../../shared/marking/settlement';
import { roundTotal } from '../../shared/marking/totals';
import type { Context } from '../context';
import { bumpSitting } from './sitting-access';
import { answerContext, itemsAffected, paperPlan, schemeInForce, type PaperPlan, type SchemeInForce } from './paper-plan';
import { decidesCode, verdictFor } from './verdicts';

type Cause = (typeof scoreCauses)[number];
type Facts = NonNullable<ReturnType<typeof settlingFacts>>;
type LiveReading = ReturnType<typeof liveReadings>[number];

const nobodyToMark = new Set(['absent', 'withdrawn', 'deferred']);

/** Someone who did not sit, or nobody yet: a spare sheet that is bound to no candidate. */
const isNobodyToMark = ({ attendance }: Facts): boolean => attendance === null || nobodyToMark.has(attendance);

const isWithdrawn = ({ body: { withdrawn = 'none' } }: SchemeInForce): boolean => withdrawn !== 'none';

/** How many readings the sitting's policy asks of an answer; none without a scan, or where there is nobody to mark. */
function readingsWanted(facts: Facts): number {
  if (facts.evidence === 'none' || isNobodyToMark(facts)) return 0;
  // Without a picture nobody can look again, so two people type a script by hand.
  return facts.secondPolicy === 'all' || facts.origin === 'by-hand' ? 2 : 1;
}

const givenOf = (row: { text: string | null; code: LiveReading['code'] }): Given =>
  row.code === null ? { text: row.text ?? '' } : { code: row.code };

interface Standing {
  readonly reading: string | null;
  readonly ruling: string | null;
  readonly verdict: string | null;
  readonly grains: number;
}

/** The mark that the settlement leads to; none when the scheme leaves it to a person, or while it waits for an earlier item. */
interface Outcome {
  readonly standing: Standing | null;
  readonly waitsFor: string | null;
}

const noMark: Outcome = { standing: null, waitsFor: null };

/** A withdrawn item has its mark whatever was read, and before anything is; a mark ruled by hand stays. */
const withdrawnForm = { canonical: '@withdrawn', given: { code: 'blank' }, context: {} } as const;

/** What one answer is settled from. */
interface Case {
  readonly facts: Facts;
  readonly plan: PaperPlan;
  readonly scheme: SchemeInForce;
  readonly readings: readonly LiveReading[];
  readonly ruling: RulingRow | undefined;
}

function outcomeOf(db: Database, { facts, plan, scheme, readings, ruling }: Case, settled: Settlement): Outcome {
  if (ruling?.kind === 'mark') return { standing: { reading: null, ruling: ruling.id, verdict: null, grains: ruling.grains ?? 0 }, waitsFor: null };
  if (isWithdrawn(scheme)) {
    if (isNobodyToMark(facts)) return noMark;
    const verdict = verdictFor(db, scheme, withdrawnForm);
    return { standing: { reading: null, ruling: null, verdict: verdict.id, grains: verdict.grains ?? 0 }, waitsFor: null };
  }
  const source = ruling ?? readings[0];
  if (!settled.isMarked || !source || source.canonical === null) return noMark;
  const { context, open, facts: paper } = answerContext(db, plan, facts, source.method);
  const verdict = verdictFor(db, scheme, { canonical: source.canonical, given: givenOf(source), context });
  if (verdict.grains === null) return noMark;
  if (isWaiting(scheme.body, verdict, paper)) return { standing: null, waitsFor: open[0] ?? null };
  return { standing: { reading: ruling ? null : source.id, ruling: ruling?.id ?? null, verdict: verdict.id, grains: verdict.grains }, waitsFor: null };
}

/** Keeps the score that stands when nothing of it changed; a take-back points to the earlier row; else a new one is appended. */
function scoreFor({ db, clock }: Pick<Context, 'db' | 'clock'>, facts: Facts, version: string, standing: Standing | null, cause: Cause): string | null {
  if (!standing) return null;
  const wanted = { answer: facts.id, schemeVersion: version, ...standing };
  const known = facts.score === null ? undefined : findScore(db, facts.score);
  if (known && isSameScore(known, wanted)) return known.id;
  const earlier = cause === 'taken-back' ? findEqualScore(db, wanted) : undefined;
  if (earlier) return earlier.id;
  const id = uuidv7();
  insertScore(db, { id, ...wanted, cause, at: clock.now() });
  return id;
}

const valueOf = (settled: Settlement, readings: readonly LiveReading[], ruling: RulingRow | undefined): number | null => {
  if (settled.canonical === null) return null;
  const value = settled.from === 'ruling' ? ruling?.value : readings[0]?.value;
  return value ? toApproximate(fromFractionText(value)) : null;
};

type Derived = Omit<Parameters<typeof saveDerivedState>[1], 'seq' | 'answer'>;

const isAsBefore = (facts: Facts, derived: Derived): boolean =>
  facts.state === derived.state &&
  facts.readingsDue === derived.readingsDue &&
  facts.settledCanonical === derived.settledCanonical &&
  facts.settledFrom === derived.settledFrom &&
  facts.score === derived.score &&
  facts.waitsFor === derived.waitsFor &&
  facts.sortValue === derived.sortValue;

function derivedOf(context: Pick<Context, 'db' | 'clock'>, facts: Facts, cause: Cause): Derived {
  const { db } = context;
  const version = facts.schemeVersion;
  if (version === null) throw new Error(`Answer ${facts.id} has no scheme in force.`);
  const plan = paperPlan(db, version);
  const scheme = schemeInForce(db, version, facts.item);
  const readings = liveReadings(db, facts.id);
  const ruling = standingRuling(db, facts.id);
  const settled = settlement({
    readings,
    ruling: ruling ? { id: ruling.id, canonical: ruling.canonical } : null,
    wanted: isWithdrawn(scheme) ? 0 : readingsWanted(facts),
    schemeDecides: (code) => decidesCode(scheme, { code }),
  });
  const { standing, waitsFor } = outcomeOf(db, { facts, plan, scheme, readings, ruling }, settled);
  return {
    state: settled.state,
    readingsDue: settled.due,
    settledCanonical: settled.canonical,
    settledFrom: settled.from,
    score: scoreFor(context, facts, version, standing, cause),
    waitsFor,
    sortValue: valueOf(settled, readings, ruling),
  };
}

function factsOf(db: Database, answerId: string): Facts {
  const facts = settlingFacts(db, answerId);
  if (!facts) throw new Error(`There is no answer ${answerId} to settle.`);
  return facts;
}

/** The answers of the same scripts whose marks may change with those named, the named ones included, each script in paper order. */
function withDependants(db: Database, named: readonly Facts[]): { readonly id: string; readonly isNamed: boolean }[] {
  const scripts = new Map<string, Facts[]>();
  for (const facts of named) scripts.set(facts.script, [...(scripts.get(facts.script) ?? []), facts]);
  return [...scripts].flatMap(([script, changed]) => {
    const version = changed[0]?.schemeVersion ?? null;
    const plan = version === null ? null : paperPlan(db, version);
    if (!plan || plan.isPlain) return changed.map(({ id }) => ({ id, isNamed: true }));
    const answers = new Map(answersOfScript(db, script).map((answer) => [answer.item, answer.id]));
    return itemsAffected(plan, changed.map(({ item }) => item)).flatMap((item) => {
      const id = answers.get(item);
      return id === undefined ? [] : [{ id, isNamed: changed.some((facts) => facts.id === id) }];
    });
  });
}

/**
 * Derives state, score and totals of answers from their append-only rows; the only writer of them. Answers of one sitting,
 * inside the transaction of the act that changed them; what follows from them is settled with them. Running it again changes
 * nothing but rev and seq.
 */
export function settleAnswers(context: Pick<Context, 'db' | 'clock'>, answerIds: readonly string[], cause: Cause = 'settled'): void {
  const { db } = context;
  if (!db.$client.inTransaction) throw new Error('Settling belongs inside the transaction of an act.');
  const named = [...new Set(answerIds)].map((id) => factsOf(db, id));
  const [first] = named;
  if (!first) return;
  const seq = bumpSitting(db, first.sitting);
  for (const { id, isNamed } of withDependants(db, named)) {
    const facts = factsOf(db, id);
    const derived = derivedOf(context, facts, cause);
    if (isNamed || !isAsBefore(facts, derived)) saveDerivedState(db, { answer: id, ...derived, seq });
  }
  const rounding = findSitting(db, first.sitting)?.totalRounding ?? 'none';
  for (const script of new Set(named.map((facts) => facts.script))) {
    const sum = sumOfScript(db, script);
    saveTotal(db, { script, ...sum, roundedGrains: roundTotal(sum.grains, rounding) });
  }
}
