import { v7 as uuidv7 } from 'uuid';
import type { Database } from '../../db/client';
import { findSitting } from '../../db/queries/sittings';
import {
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
import { codeCanonical } from '../../shared/marking/canonical';
import type { Given } from '../../shared/marking/scheme';
import { settlement, type Settlement } from '../../shared/marking/settlement';
import { roundTotal } from '../../shared/marking/totals';
import type { Context } from '../context';
import { bumpSitting } from './sitting-access';
import { schemeInForce, verdictFor, type SchemeInForce } from './verdicts';

type Cause = (typeof scoreCauses)[number];
type Facts = NonNullable<ReturnType<typeof settlingFacts>>;
type LiveReading = ReturnType<typeof liveReadings>[number];

const nobodyToMark = new Set(['absent', 'withdrawn', 'deferred']);

/** How many readings the sitting's policy asks of an answer; none without a scan, or for someone who did not sit. */
function readingsWanted(facts: Facts): number {
  if (facts.evidence === 'none' || (facts.attendance !== null && nobodyToMark.has(facts.attendance))) return 0;
  return facts.secondPolicy === 'all' ? 2 : 1;
}

const givenOf = (row: { text: string | null; code: LiveReading['code'] }): Given =>
  row.code === null ? { text: row.text ?? '' } : { code: row.code };

interface Standing {
  readonly reading: string | null;
  readonly ruling: string | null;
  readonly verdict: string | null;
  readonly grains: number;
}

/** The mark that the settlement leads to, or null when the scheme leaves it to a person. */
function standingMark(db: Database, scheme: SchemeInForce, settled: Settlement, readings: readonly LiveReading[], ruling: RulingRow | undefined): Standing | null {
  if (!settled.isMarked) return null;
  if (ruling?.kind === 'mark') return { reading: null, ruling: ruling.id, verdict: null, grains: ruling.grains ?? 0 };
  const source = ruling ?? readings[0];
  if (!source) return null;
  if (source.canonical === null) return null;
  const verdict = verdictFor(db, scheme, source.canonical, givenOf(source));
  if (verdict.grains === null) return null;
  return { reading: ruling ? null : source.id, ruling: ruling?.id ?? null, verdict: verdict.id, grains: verdict.grains };
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

function settleOne(context: Pick<Context, 'db' | 'clock'>, facts: Facts, seq: number, cause: Cause): void {
  const { db } = context;
  const version = facts.schemeVersion;
  if (version === null) throw new Error(`Answer ${facts.id} has no scheme in force.`);
  const scheme = schemeInForce(db, version, facts.item);
  const readings = liveReadings(db, facts.id);
  const ruling = standingRuling(db, facts.id);
  const settled = settlement({
    readings,
    ruling: ruling ? { id: ruling.id, canonical: ruling.canonical } : null,
    wanted: readingsWanted(facts),
    schemeDecides: (code) => verdictFor(db, scheme, codeCanonical(code), { code }).grains !== null,
  });
  const standing = standingMark(db, scheme, settled, readings, ruling);
  saveDerivedState(db, {
    answer: facts.id,
    state: settled.state,
    readingsDue: settled.due,
    settledCanonical: settled.canonical,
    settledFrom: settled.from,
    score: scoreFor(context, facts, version, standing, cause),
    sortValue: valueOf(settled, readings, ruling),
    seq,
  });
}

/**
 * Derives state, score and totals of answers from their append-only rows; the only writer of them. Answers of one sitting,
 * inside the transaction of the act that changed them. Running it again changes nothing but rev and seq.
 */
export function settleAnswers(context: Pick<Context, 'db' | 'clock'>, answerIds: readonly string[], cause: Cause = 'settled'): void {
  const { db } = context;
  if (!db.$client.inTransaction) throw new Error('Settling belongs inside the transaction of an act.');
  const scripts = new Set<string>();
  let sittingId: string | undefined;
  let seq = 0;
  for (const answerId of answerIds) {
    const facts = settlingFacts(db, answerId);
    if (!facts) throw new Error(`There is no answer ${answerId} to settle.`);
    if (facts.sitting !== sittingId) {
      sittingId = facts.sitting;
      seq = bumpSitting(db, sittingId);
    }
    settleOne(context, facts, seq, cause);
    scripts.add(facts.script);
  }
  const rounding = sittingId === undefined ? 'none' : (findSitting(db, sittingId)?.totalRounding ?? 'none');
  for (const script of scripts) {
    const sum = sumOfScript(db, script);
    saveTotal(db, { script, ...sum, roundedGrains: roundTotal(sum.grains, rounding) });
  }
}
