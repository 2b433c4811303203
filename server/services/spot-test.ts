import { toApproximate } from '../../shared/chemistry/exact';
import type { ItemDraft, SpotTestResult } from '../../shared/contracts/items';
import { reasonInWords } from '../../shared/marking/reasons';
import { readAnswer } from '../../shared/marking/read-answer';
import { emptyContext, type ItemScheme } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { invalidRequest } from '../errors';
import { readDraft } from './item-drafts';
import { requireItem } from './items';
import { schemeInForce } from './verdicts';

function markedBy(scheme: ItemScheme, text: string): SpotTestResult {
  const read = readAnswer(text, scheme.units);
  const { maxGrains } = scheme;
  if (!read.ok) {
    const outcome = read.unfinished ? 'unfinished' : 'refused';
    const detail = read.unfinished ? 'Not yet a value.' : read.message;
    const head = read.unfinished ? '' : 'Not understood';
    return { outcome, grains: null, maxGrains, head, detail, rule: null, numbers: {}, value: null, refusedAt: read.unfinished ? null : read.at };
  }
  const { grains, rule, numbers } = markAnswer(scheme, { text }, emptyContext);
  return { outcome: 'marked', grains, maxGrains, ...reasonInWords({ grains, rule, numbers }), rule, numbers: { ...numbers }, value: toApproximate(read.value), refusedAt: null };
}

/**
 * Marks a text as an answer to the item would be marked: by the scheme in force once the paper is locked, before that by the
 * draft sent along or the stored one. Stores nothing.
 */
export function spotTest(context: Context, actor: Actor, itemId: string, text: string, draft?: ItemDraft): SpotTestResult {
  const { drafted, sitting } = requireItem(context, actor, itemId, ['lead']);
  if (sitting.schemeVersion !== null) return markedBy(schemeInForce(context.db, sitting.schemeVersion, itemId).body, text);
  if (!draft) return markedBy(drafted.scheme, text);
  const { scheme, refusals } = readDraft(draft);
  if (!scheme) throw invalidRequest(refusals[0]?.message ?? 'The item cannot be worked.', Object.fromEntries(refusals.map(({ path, message }) => [path, message])));
  return markedBy(scheme, text);
}

