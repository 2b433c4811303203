import { exactDecimals, fromFractionText, toDecimals } from '../../../shared/chemistry/exact';
import type { Worked } from '../../../shared/chemistry/work';
import type { ItemDraft, ItemProblem } from '../../../shared/contracts/items';
import { linkProblem, type LinkedItem } from '../../../shared/marking/links';
import type { FollowThrough, ItemScheme, Key } from '../../../shared/marking/scheme';
import { schemeProblems } from '../../../shared/marking/scheme-checks';
import { readMarks } from '../../../shared/marking/typed-marks';
import { askedOf, keyOf, type FoundKey } from './asked-of';
import { partsReader, readAlternative, readBand, readMethodMark, readPartMark, readPenalty, readSlip, type PartsReader } from './read-parts';

/** Where a draft stands: the items of its paper, and its own place among them. */
export interface Place {
  readonly items: readonly LinkedItem[];
  readonly number: number;
}

/** A draft that follows from no other item. */
export const alone: Place = { items: [], number: 1 };

/** A draft read into a scheme; null while a field cannot be understood or no key can be computed. */
export interface ReadDraft {
  readonly scheme: ItemScheme | null;
  readonly key: Key | null;
  readonly worked: Worked | null;
  /** What an answer may carry, where there is a key. */
  readonly units: readonly string[];
  readonly maxGrains: number | null;
  /** What keeps it from being stored. */
  readonly refusals: readonly ItemProblem[];
  /** What is stored but keeps the paper from being locked. */
  readonly problems: readonly ItemProblem[];
}

/** Of the two ways to round, the one that the key has. */
function roundingsOf({ figures }: Key, { roundings: { downToDecimals, downToFigures = null, truncation } }: ItemDraft): ItemScheme['roundings'] {
  if (figures === undefined) return { downToDecimals, truncation };
  return { downToDecimals: null, downToFigures: downToFigures === null ? null : Math.min(downToFigures, figures), truncation };
}

function readFollowThrough(reader: PartsReader, { followThrough }: ItemDraft, { items }: Place): FollowThrough | null {
  if (!followThrough) return null;
  const sourceAt = (id: string, field: string) => {
    // One that no longer fits is kept and named: an item may have moved, or ask for something else by now.
    const source = items.find((item) => item.id === id);
    return source ? { from: id, quantity: source.scheme.asked.quantity } : reader.refuse(`followThrough.${field}`, 'The item it follows from is not on this paper.');
  };
  const first = sourceAt(followThrough.from, 'from');
  const second = followThrough.second === null ? null : sourceAt(followThrough.second, 'second');
  if (!first) return null;
  return { ...first, isTrivial: followThrough.isTrivial, ...(second ? { second } : {}) };
}

/** Marks are typed as marks: a sentence about `bands.1.grains` belongs to the field `bands.1.marks`. */
const fieldNames: readonly (readonly [RegExp, string])[] = [
  [/maxGrains$/, 'marks'],
  [/^unitRule\.grains$/, 'unitCost'],
  [/^signRule\.grains$/, 'signCost'],
  [/grains$/, 'marks'],
  [/^key$/, 'decimals'],
];

const atField = ({ path, message }: ItemProblem): ItemProblem => {
  const rule = fieldNames.find(([pattern]) => pattern.test(path));
  return { path: rule ? path.replace(rule[0], rule[1]) : path, message };
};

function problemsOf(scheme: ItemScheme, { items, number }: Place): ItemProblem[] {
  const link = linkProblem({ id: '', number, scheme }, items);
  const found = [...schemeProblems(scheme).map(atField), ...(link === null ? [] : [{ path: 'followThrough.from', message: link }])];
  if (!found.some(({ path }) => path === 'decimals')) return found;
  const exact = fromFractionText(scheme.key.value);
  const needed = exactDecimals(exact) ?? 6;
  const sentence = `The key is ${toDecimals(exact, needed)}. Ask for ${needed} decimals, so that it can be written whole.`;
  return found.map((problem) => (problem.path === 'decimals' ? { ...problem, message: sentence } : problem));
}

/** The parts that differ from what a scheme without them has, so that a scheme stored before they came keeps its name. */
function laterParts(reader: PartsReader, draft: ItemDraft, place: Place): Partial<ItemScheme> {
  const methodMarks = draft.methodMarks.flatMap((mark, index) => readMethodMark(reader, mark, index) ?? []);
  const [unitRule, signRule] = draft.kind === 'numeric' ? [readPenalty(reader, 'unitCost', draft.unitCost), readPenalty(reader, 'signCost', draft.signCost)] : [null, null];
  const followThrough = draft.kind === 'numeric' ? readFollowThrough(reader, draft, place) : null;
  return {
    ...(methodMarks.length > 0 ? { methodMarks } : {}),
    ...(unitRule ? { unitRule } : {}),
    ...(signRule ? { signRule } : {}),
    ...(followThrough ? { followThrough } : {}),
  };
}

function printedOf(reader: PartsReader, draft: ItemDraft, found: FoundKey | null): Partial<ItemScheme> {
  const partMarks = draft.kind === 'order' ? (draft.printed?.partMarks ?? []).flatMap((part, index) => readPartMark(reader, part, index) ?? []) : [];
  return found?.printed ? { printed: { ...found.printed, partMarks } } : {};
}

/** Reads every field of a draft and computes its key; a key is taken from what was sent only where the lead types it. */
export function readDraft(draft: ItemDraft, place: Place = alone): ReadDraft {
  const reader = partsReader();
  const asked = askedOf(draft);
  const outcome = keyOf(draft);
  const found = outcome.ok ? outcome.found : null;
  if (!outcome.ok) for (const { path, message } of outcome.problems) reader.refuse(path, message);
  const marks = readMarks(draft.marks);
  if (!marks.ok) reader.refuse('marks', marks.message);
  if (draft.prompt !== null && draft.prompt.trim() === '') reader.refuse('prompt', 'Write the question, or take the proposed one.');
  if (draft.prompt === null && asked.typed) reader.refuse('prompt', 'Write the question: for a typed key there is no proposed one.');
  const isNumeric = draft.kind === 'numeric';
  const bands = isNumeric ? draft.bands.flatMap((band, index) => readBand(reader, band, index) ?? []) : [];
  const alternatives = draft.alternatives.flatMap((alternative, index) => readAlternative(reader, alternative, index, asked, !isNumeric) ?? []);
  const slips = isNumeric ? draft.slips.flatMap((slip, index) => readSlip(reader, slip, index, asked) ?? []) : [];
  const later = { ...laterParts(reader, draft, place), ...printedOf(reader, draft, found) };
  const maxGrains = marks.ok ? marks.grains : null;
  const read = { key: found?.key ?? null, worked: found?.worked ?? null, units: found?.units ?? [], maxGrains, refusals: reader.refusals };
  if (!found || maxGrains === null || reader.refusals.length > 0) return { ...read, scheme: null, problems: [] };
  const scheme: ItemScheme = {
    kind: draft.kind,
    asked,
    maxGrains,
    key: found.key,
    units: found.units,
    roundings: isNumeric ? roundingsOf(found.key, draft) : { downToDecimals: null, truncation: false },
    alternatives,
    bands,
    ...(slips.length === 0 ? {} : { slips }),
    crossedOut: draft.crossedOut,
    twoAnswers: draft.twoAnswers,
    ...later,
  };
  return { ...read, scheme, problems: problemsOf(scheme, place) };
}
