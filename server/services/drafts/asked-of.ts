import { toFractionText } from '../../../shared/chemistry/exact';
import { workChoice } from '../../../shared/chemistry/choices';
import { proposedChoiceStem, proposedStem } from '../../../shared/chemistry/stem';
import { work, type Worked } from '../../../shared/chemistry/work';
import type { ProblemCode } from '../../../shared/chemistry/result';
import type { ElectronDraft, ItemDraft, ItemProblem } from '../../../shared/contracts/items';
import { unitsOf } from '../../../shared/marking/follow-through';
import { readAnswer } from '../../../shared/marking/read-answer';
import type { Asked, AskedElectron, ItemScheme, Key } from '../../../shared/marking/scheme';
import { toDecimals, toFigures, whole } from '../../../shared/chemistry/exact';

const fieldOf: Partial<Record<ProblemCode, string>> = {
  'unknown-element': 'symbol',
  'charge-not-whole': 'charge',
  'too-many-removed': 'charge',
  'no-electron-left': 'charge',
  'anion-beyond-shell': 'charge',
  'configuration-needed': 'charge',
  'configuration-not-understood': 'configuration',
  'electron-count': 'configuration',
};

export const electronOf = ({ symbol, charge, electron, configuration }: ElectronDraft): AskedElectron => ({ symbol, charge, electron, ...(configuration === undefined ? {} : { configuration }) });

/** What is asked, without fields that this kind and quantity have no use for. */
export function askedOf({ kind, asked }: Pick<ItemDraft, 'kind' | 'asked'>): Asked {
  const { quantity, convention, radiusAngstrom, countsItself, other, typed } = asked;
  if (kind !== 'numeric') return { symbol: '', charge: 0, electron: '', quantity, convention };
  if (convention === 'typed') return { symbol: '', charge: 0, electron: '', quantity: 'value', convention, typed: { label: typed?.label ?? '', source: typed?.source ?? '' } };
  const plain = { ...electronOf(asked), quantity, convention };
  if (quantity === 'difference') return { ...plain, ...(other === undefined ? {} : { other: electronOf(other) }) };
  if (quantity !== 'electronegativity') return plain;
  return { ...plain, ...(radiusAngstrom === undefined ? {} : { radiusAngstrom }), ...(countsItself === undefined ? {} : { countsItself }) };
}

/** A key, what it was worked from where it was, and the units an answer may carry. */
export interface FoundKey {
  readonly key: Key;
  readonly worked: Worked | null;
  readonly units: readonly string[];
  readonly printed: ItemScheme['printed'];
}

export type KeyOutcome = { readonly ok: true; readonly found: FoundKey } | { readonly ok: false; readonly problems: readonly ItemProblem[] };

const refusal = (path: string, message: string): KeyOutcome => ({ ok: false, problems: [{ path, message }] });

function typedKey({ asked: { typed } }: ItemDraft): KeyOutcome {
  const read = readAnswer((typed?.value ?? '').trim(), []);
  const problems: ItemProblem[] = [];
  if (!typed || typed.label === '') problems.push({ path: 'asked.typed.label', message: 'Say what is asked for, in a few words.' });
  if (!typed || typed.source === '') problems.push({ path: 'asked.typed.source', message: 'Say where the value comes from, so that it can be defended.' });
  if (!read.ok) problems.push({ path: 'asked.typed.value', message: read.unfinished ? 'Write the value of the key.' : read.message });
  else if (read.figures === null) problems.push({ path: 'asked.typed.value', message: 'Write the key as a decimal: its decimals tell what an answer must show.' });
  if (!read.ok || problems.length > 0) return { ok: false, problems };
  const key = { value: toFractionText(read.value), text: toDecimals(read.value, read.decimals), decimals: read.decimals };
  return { ok: true, found: { key, worked: null, units: typed?.unit ? [typed.unit] : [], printed: null } };
}

function printedKey({ printed, asked }: ItemDraft, kind: 'choice' | 'order'): KeyOutcome {
  if (!printed) return refusal('printed', 'Print two options or more.');
  const { question } = printed;
  const isOrder = question === 'increasing' || question === 'decreasing';
  if (isOrder !== (kind === 'order')) return refusal('printed.question', 'This question belongs to another kind of item.');
  const options = printed.options.map(electronOf);
  const choice = workChoice({ kind: question, quantity: asked.quantity, convention: asked.convention, options });
  if (!choice.ok) return refusal('printed.options', choice.problem.message);
  const { answer } = choice.value;
  const key = { value: toFractionText(whole(Number(answer.replaceAll(' ', '')))), text: answer, decimals: 0 };
  return { ok: true, found: { key, worked: null, units: [], printed: { question, options, answer, partMarks: [] } } };
}

/** The key as the question states it: to decimals where it is a short decimal, else to figures. */
function statedKey({ value, figures }: Worked, draft: ItemDraft): Key {
  if (figures === null) return { value: toFractionText(value), text: toDecimals(value, draft.decimals), decimals: draft.decimals };
  const text = toFigures(value, draft.figures);
  return { value: toFractionText(value), text, decimals: text.split('.')[1]?.length ?? 0, figures: draft.figures };
}

/** Where a problem of the engine belongs among the fields. */
function fieldsOf(asked: Asked, code: ProblemCode): string {
  const isOther = asked.other !== undefined && work({ ...asked, quantity: 'zeff' }).ok;
  return `asked.${isOther ? 'other.' : ''}${fieldOf[code] ?? 'electron'}`;
}

/** The key of a draft: computed, or as the lead typed it where the convention says so. */
export function keyOf(draft: ItemDraft): KeyOutcome {
  if (draft.kind !== 'numeric') return printedKey(draft, draft.kind);
  if (draft.asked.convention === 'typed') return typedKey(draft);
  const asked = askedOf(draft);
  if (asked.configuration === '') return refusal('asked.configuration', 'Write the configuration, or ask for the ground state.');
  const worked = work(asked);
  if (!worked.ok) return refusal(fieldsOf(asked, worked.problem.code), worked.problem.message);
  const { unit } = worked.value;
  return { ok: true, found: { key: statedKey(worked.value, draft), worked: worked.value, units: unitsOf[asked.quantity] ?? (unit === '' ? [] : [unit]), printed: null } };
}

/** The wording proposed for an item; empty where only the lead knows what is asked. */
export function proposedPrompt({ asked, key, printed }: Pick<ItemScheme, 'asked' | 'key' | 'printed'>): string {
  if (printed) return proposedChoiceStem({ kind: printed.question, quantity: asked.quantity, convention: asked.convention, options: printed.options });
  return asked.typed ? '' : proposedStem(asked, key.decimals, key.figures ?? null);
}
