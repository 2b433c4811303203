import type { Database } from '../../db/client';
import { answersOfScript } from '../../db/queries/settling';
import type { AnswerView } from '../../shared/contracts/ledger';
import { slipsThatFit, strongestFirst, type FittingSlip } from '../../shared/marking/diagnosis';
import { readTyped } from '../../shared/marking/read-typed';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { PaperPlan } from './paper-plan';

function fitsOf(scheme: ItemScheme, canonical: string | null): FittingSlip[] {
  if (canonical === null || canonical.startsWith('@') || scheme.kind !== 'numeric') return [];
  const read = readTyped(canonical, scheme);
  return read.ok ? slipsThatFit(scheme, read) : [];
}

/** What may explain a value, strongest first by the settled values of the same script; an explanation, never proof. */
export function likelySlips(db: Database, plan: PaperPlan, { script, item }: { readonly script: string; readonly item: string }, canonical: string | null): AnswerView['likely'] {
  const planned = plan.items.get(item);
  const fits = planned ? fitsOf(planned.body, canonical) : [];
  if (fits.length === 0) return [];
  const others = answersOfScript(db, script).flatMap((other) => {
    const its = plan.items.get(other.item);
    return its && other.item !== item ? [{ number: its.at + 1, fits: fitsOf(its.body, other.settledCanonical) }] : [];
  });
  return strongestFirst(fits, others.sort((one, other) => one.number - other.number)).map(({ letter, name, feedback, alsoOn }) => ({ letter, name, feedback, alsoOn: [...alsoOn] }));
}
