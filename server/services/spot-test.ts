import { toApproximate } from '../../shared/chemistry/exact';
import type { SpotTestResult, spotTest as contract } from '../../shared/contracts/items';
import type { BodyOf } from '../../shared/contracts/route';
import { canonicalOf } from '../../shared/marking/canonical';
import { toldToCandidate } from '../../shared/marking/candidate-words';
import { completeScheme } from '../../shared/marking/complete-scheme';
import { contextFor, noFacts, type PaperFacts } from '../../shared/marking/context';
import { slipsThatFit } from '../../shared/marking/diagnosis';
import { unitsOf } from '../../shared/marking/follow-through';
import { isWaiting } from '../../shared/marking/mark-paper';
import { reasonInWords } from '../../shared/marking/reasons';
import { readTyped } from '../../shared/marking/read-typed';
import type { FollowedItem, ItemScheme } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { invalidRequest } from '../errors';
import { readDraft } from './drafts/read-draft';
import { placeOf, requireItem } from './items';
import { schemeInForce } from './verdicts';

type Tried = BodyOf<typeof contract>;

/** An own value as it would be settled; refused with the field named when it is none. */
function settledForm(field: 'followed' | 'second', typed: string | undefined, link: FollowedItem | undefined): string | null {
  if (typed === undefined || typed.trim() === '' || !link) return null;
  const canonical = canonicalOf({ text: typed }, { kind: 'numeric', units: unitsOf[link.quantity] ?? [] });
  if (canonical === null) throw invalidRequest('The own value it follows from is no value.', { [field]: 'This is not a value.' });
  return canonical;
}

function factsOf(scheme: ItemScheme, { followed, second, method }: Tried): PaperFacts {
  const link = completeScheme(scheme).followThrough;
  return { ...noFacts, followed: settledForm('followed', followed, link ?? undefined), second: settledForm('second', second, link?.second), struck: method };
}

function markedBy(scheme: ItemScheme, tried: Tried): SpotTestResult {
  const read = readTyped(tried.text, scheme);
  const { maxGrains } = scheme;
  if (!read.ok) {
    const outcome = read.unfinished ? 'unfinished' : 'refused';
    const detail = read.unfinished ? 'Not yet a value.' : read.message;
    const head = read.unfinished ? '' : 'Not understood';
    return { outcome, grains: null, maxGrains, head, detail, rule: null, numbers: {}, value: null, waits: false, told: '', refusedAt: read.unfinished ? null : read.at };
  }
  const facts = factsOf(scheme, tried);
  const verdict = markAnswer(scheme, { text: tried.text }, contextFor(scheme, facts));
  const { grains, rule, numbers } = verdict;
  const feedback = rule === 'slip' || rule === 'nothing' ? slipsThatFit(scheme, read).map((slip) => slip.feedback) : [];
  return {
    outcome: 'marked',
    grains,
    maxGrains,
    ...reasonInWords(verdict),
    rule,
    numbers: { ...numbers },
    value: scheme.kind === 'numeric' ? toApproximate(read.value) : null,
    waits: isWaiting(scheme, verdict, facts),
    told: toldToCandidate({ verdict, maxGrains, feedback, showsKey: true }),
    refusedAt: null,
  };
}

/**
 * Marks a text as an answer to the item would be marked: by the scheme in force once the paper is locked, before that by the
 * draft sent along or the stored one. Stores nothing.
 */
export function spotTest(context: Context, actor: Actor, itemId: string, tried: Tried): SpotTestResult {
  const { drafted, sitting } = requireItem(context, actor, itemId, ['lead']);
  if (sitting.schemeVersion !== null) return markedBy(schemeInForce(context.db, sitting.schemeVersion, itemId).body, tried);
  if (!tried.draft) return markedBy(drafted.scheme, tried);
  const { scheme, refusals } = readDraft(tried.draft, placeOf(context.db, sitting.id, itemId));
  if (!scheme) throw invalidRequest(refusals[0]?.message ?? 'The item cannot be worked.', Object.fromEntries(refusals.map(({ path, message }) => [path, message])));
  return markedBy(scheme, tried);
}
