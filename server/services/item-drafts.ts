import { occupiedElectrons } from '../../shared/chemistry/configurations';
import { divide, exactDecimals, fromFractionText, multiply, toDecimals, toFigures, toFractionText, whole, type Exact } from '../../shared/chemistry/exact';
import type { ProblemCode } from '../../shared/chemistry/result';
import { valuesByOtherConventions } from '../../shared/chemistry/other-conventions';
import { proposedStem } from '../../shared/chemistry/stem';
import { slipLetter } from '../../shared/chemistry/slips/letters';
import { slipsOf } from '../../shared/chemistry/slips/slips-of';
import { work, type Worked } from '../../shared/chemistry/work';
import { askedConventions, askedQuantities, type AlternativeDraft, type BandDraft, type ItemDraft, type ItemProblem, type WorkedDraft } from '../../shared/contracts/items';
import { bandRange } from '../../shared/marking/bands';
import { marksText } from '../../shared/marking/grains';
import { guardOf, untoldSlips } from '../../shared/marking/guard';
import { itemLabel } from '../../shared/marking/item-label';
import { readAnswer } from '../../shared/marking/read-answer';
import { roundings } from '../../shared/marking/rounding';
import { scaleOf } from '../../shared/marking/scale';
import type { Alternative, Asked, Band, ItemScheme, NamedSlip } from '../../shared/marking/scheme';
import { schemeProblems } from '../../shared/marking/scheme-checks';
import { readMarks } from '../../shared/marking/typed-marks';

/** A draft read into a scheme; null while a field cannot be understood or no key can be computed. */
export interface ReadDraft {
  readonly scheme: ItemScheme | null;
  readonly worked: Worked | null;
  readonly maxGrains: number | null;
  /** What keeps it from being stored. */
  readonly refusals: readonly ItemProblem[];
  /** What is stored but keeps the paper from being locked. */
  readonly problems: readonly ItemProblem[];
}

const fieldOf: Partial<Record<ProblemCode, string>> = {
  'unknown-element': 'asked.symbol',
  'charge-not-whole': 'asked.charge',
  'too-many-removed': 'asked.charge',
  'no-electron-left': 'asked.charge',
  'anion-beyond-shell': 'asked.charge',
  'configuration-needed': 'asked.charge',
  'configuration-not-understood': 'asked.configuration',
  'electron-count': 'asked.configuration',
};

const percent = whole(100);

function readWidth({ kind, width }: BandDraft): Exact | string {
  const read = readAnswer(width.trim(), []);
  if (!read.ok) return read.unfinished ? 'Write a width.' : read.message;
  return kind === 'relative' ? divide(read.value, percent) : read.value;
}

function readBand(band: BandDraft, index: number, refusals: ItemProblem[]): Band | null {
  const width = readWidth(band);
  const marks = readMarks(band.marks);
  if (typeof width === 'string') refusals.push({ path: `bands.${index}.width`, message: width });
  if (!marks.ok) refusals.push({ path: `bands.${index}.marks`, message: marks.message });
  if (typeof width === 'string' || !marks.ok) return null;
  return { name: band.name, kind: band.kind, width: toFractionText(width), grains: marks.grains };
}

function readAlternative(draft: AlternativeDraft, index: number, asked: Asked, units: readonly string[], refusals: ItemProblem[]): Alternative | null {
  const at = (field: string, message: string) => void refusals.push({ path: `alternatives.${index}.${field}`, message });
  const marks = readMarks(draft.marks);
  if (!marks.ok) at('marks', marks.message);
  if (draft.name.trim() === '') at('name', 'Name the alternative.');
  if (draft.convention === null && draft.reason.trim() === '') at('reason', 'Say why this value is accepted.');
  if (!marks.ok) return null;
  const rest = { name: draft.name, grains: marks.grains, reason: draft.reason };
  if (draft.convention !== null) {
    const worked = work({ ...asked, convention: draft.convention });
    if (!worked.ok) at('convention', worked.problem.message);
    if (!worked.ok) return null;
    const { value, text, decimals, figures } = worked.value;
    return { ...rest, convention: draft.convention, value: toFractionText(value), text, decimals, ...(figures === null ? {} : { figures }) };
  }
  const read = readAnswer(draft.value.trim(), units);
  if (!read.ok) at('value', read.unfinished ? 'Write a value.' : read.message);
  return read.ok ? { ...rest, value: toFractionText(read.value), text: draft.value.trim(), decimals: read.decimals } : null;
}

function readSlip(draft: ItemDraft['slips'][number], index: number, asked: Asked, refusals: ItemProblem[]): NamedSlip | null {
  const slip = slipsOf(asked).find(({ id }) => id === draft.id);
  const marks = readMarks(draft.marks, true);
  if (!slip) refusals.push({ path: `slips.${index}.id`, message: 'This slip cannot be made on this item.' });
  else if (slip.isSilent) refusals.push({ path: `slips.${index}.id`, message: `The slip “${slip.name}” gives the right number here: this item cannot see it.` });
  if (!marks.ok) refusals.push({ path: `slips.${index}.marks`, message: marks.message });
  if (!slip || slip.isSilent || !marks.ok) return null;
  const { id, name, value, text, feedback } = slip;
  return { id, letter: slipLetter(id), name, value: toFractionText(value), text, grains: marks.grains, feedback };
}

/** Marks are typed as marks: a sentence about `bands.1.grains` belongs to the field `bands.1.marks`. */
const atField = ({ path, message }: ItemProblem): ItemProblem => ({ path: path.replace(/maxGrains$/, 'marks').replace(/grains$/, 'marks').replace(/^key$/, 'decimals'), message });

function problemsOf(scheme: ItemScheme): ItemProblem[] {
  const found = schemeProblems(scheme).map(atField);
  if (!found.some(({ path }) => path === 'decimals')) return found;
  const exact = toDecimals(fromFractionText(scheme.key.value), exactDecimals(fromFractionText(scheme.key.value)) ?? 6);
  const needed = exactDecimals(fromFractionText(scheme.key.value)) ?? 6;
  const sentence = `The key is ${exact}. Ask for ${needed} decimals, so that it can be written whole.`;
  return found.map((problem) => (problem.path === 'decimals' ? { ...problem, message: sentence } : problem));
}

/** What is asked, without fields that this quantity has no use for. */
function askedOf({ asked: { radiusAngstrom, countsItself, configuration, ...plain } }: ItemDraft): Asked {
  const asked = { ...plain, ...(configuration === undefined ? {} : { configuration }) };
  if (asked.quantity !== 'electronegativity') return asked;
  return { ...asked, ...(radiusAngstrom === undefined ? {} : { radiusAngstrom }), ...(countsItself === undefined ? {} : { countsItself }) };
}

/** The key as the question states it: to decimals where it is a short decimal, else to figures. */
function keyOf({ value, figures }: Worked, draft: ItemDraft): ItemScheme['key'] {
  if (figures === null) return { value: toFractionText(value), text: toDecimals(value, draft.decimals), decimals: draft.decimals };
  const text = toFigures(value, draft.figures);
  return { value: toFractionText(value), text, decimals: text.split('.')[1]?.length ?? 0, figures: draft.figures };
}

/** Of the two ways to round, the one that the key has. */
function roundingsOf({ figures }: Worked, { roundings: { downToDecimals, downToFigures = null, truncation }, figures: asked }: ItemDraft): ItemScheme['roundings'] {
  if (figures === null) return { downToDecimals, truncation };
  return { downToDecimals: null, downToFigures: downToFigures === null ? null : Math.min(downToFigures, asked), truncation };
}

/** Reads every field of a draft and computes its key; the key is never taken from what was sent. */
export function readDraft(draft: ItemDraft): ReadDraft {
  const refusals: ItemProblem[] = [];
  const asked = askedOf(draft);
  if (asked.configuration === '') refusals.push({ path: 'asked.configuration', message: 'Write the configuration, or ask for the ground state.' });
  const worked = work(asked);
  if (!worked.ok) refusals.push({ path: fieldOf[worked.problem.code] ?? 'asked.electron', message: worked.problem.message });
  const marks = readMarks(draft.marks);
  if (!marks.ok) refusals.push({ path: 'marks', message: marks.message });
  const bands = draft.bands.map((band, index) => readBand(band, index, refusals));
  if (draft.prompt !== null && draft.prompt.trim() === '') refusals.push({ path: 'prompt', message: 'Write the question, or take the proposed one.' });
  draft.bands.forEach((band, index) => {
    if (band.name.trim() === '') refusals.push({ path: `bands.${index}.name`, message: 'Name the band.' });
  });
  const alternatives = draft.alternatives.map((alternative, index) => readAlternative(alternative, index, asked, [], refusals));
  const slips = draft.slips.map((slip, index) => readSlip(slip, index, asked, refusals));
  const maxGrains = marks.ok ? marks.grains : null;
  if (!worked.ok || maxGrains === null || refusals.length > 0) {
    return { scheme: null, worked: worked.ok ? worked.value : null, maxGrains, refusals, problems: [] };
  }
  const scheme: ItemScheme = {
    kind: 'numeric',
    asked,
    maxGrains,
    key: keyOf(worked.value, draft),
    units: worked.value.unit === '' ? [] : [worked.value.unit],
    roundings: roundingsOf(worked.value, draft),
    alternatives: alternatives.filter((alternative) => alternative !== null),
    bands: bands.filter((band) => band !== null),
    ...(slips.length === 0 ? {} : { slips: slips.filter((slip) => slip !== null) }),
    crossedOut: draft.crossedOut,
    twoAnswers: draft.twoAnswers,
  };
  return { scheme, worked: worked.value, maxGrains, refusals, problems: problemsOf(scheme) };
}

/** The accepted roundings of a key, fewest decimals last: of 61/10 "6.1", of 91/20 "4.5" and "4.6". */
export function roundingTexts({ key, roundings: policy }: ItemScheme): string[] {
  if (key.figures !== undefined) {
    const fewest = policy.downToFigures ?? key.figures;
    return Array.from({ length: key.figures - fewest }, (_, index) => toFigures(fromFractionText(key.value), (key.figures ?? 0) - 1 - index));
  }
  if (policy.downToDecimals === null) return [];
  const value = fromFractionText(key.value);
  const texts: string[] = [];
  for (let places = key.decimals - 1; places >= policy.downToDecimals; places -= 1) {
    for (const rounded of roundings(value, places)) texts.push(toDecimals(rounded, places));
  }
  return texts;
}

const exactText = (value: Exact, atLeast: number): string => toDecimals(value, Math.max(atLeast, Math.min(6, exactDecimals(value) ?? 6)));

/** A range that the band cannot have yet, such as one of no places, has no text. */
function rangeTexts(band: Band, { value, decimals }: ItemScheme['key']): { from: string; to: string } | null {
  const width = fromFractionText(band.width);
  const isCount = band.kind === 'decimal-places' || band.kind === 'significant-figures';
  if (isCount && (width.d !== 1n || width.n > 12n || width.n < 0n)) return null;
  const { from, to } = bandRange(band, fromFractionText(value));
  return { from: exactText(from, decimals), to: exactText(to, decimals) };
}

/** Key, derivation, wording, scale and what is wrong, as the editor shows them. */
export function workDraft(draft: ItemDraft): WorkedDraft {
  const { scheme, worked, maxGrains, refusals, problems } = readDraft(draft);
  const electrons = occupiedElectrons(draft.asked.symbol, draft.asked.charge, draft.asked.configuration);
  const drawable = scheme && scheme.bands.every((band) => rangeTexts(band, scheme.key) !== null);
  return {
    label: itemLabel(draft.asked),
    key: worked && { ...keyOf(worked, draft), figures: worked.figures === null ? null : draft.figures },
    unit: worked?.unit ?? '',
    derivation: worked?.derivation ?? null,
    scale: drawable ? scaleOf(scheme) : null,
    roundings: scheme ? roundingTexts(scheme) : [],
    bands: scheme ? scheme.bands.map((band) => rangeTexts(band, scheme.key)) : draft.bands.map(() => null),
    alternatives: draft.alternatives.map((_alternative, index) => scheme?.alternatives[index]?.text ?? null),
    slips: slipsOf(draft.asked).map(({ id, name, text, oneLine, feedback, isSilent }) => ({ id, letter: slipLetter(id), name, text, differs: oneLine, feedback, isSilent })),
    guard: drawable ? guardOf(scheme).map(({ grains, ...finding }) => ({ ...finding, marks: marksText(grains) })) : [],
    untold: scheme ? untoldSlips(scheme) : [],
    others: valuesByOtherConventions(draft.asked).map(({ convention, name, text }) => ({ convention, name, text })),
    electrons: electrons.ok ? [...electrons.value] : [],
    proposedPrompt: proposedStem(draft.asked, draft.decimals, worked?.figures === null || !worked ? null : draft.figures),
    maxGrains,
    problems: [...refusals, ...problems],
  };
}

/** As it could be typed again: a width that no decimal says stays a fraction, so that storing it anew changes nothing. */
function widthText({ kind, width }: Band, decimals: number): string {
  const value = kind === 'relative' ? multiply(fromFractionText(width), percent) : fromFractionText(width);
  const places = exactDecimals(value);
  return places === null ? toFractionText(value) : toDecimals(value, Math.max(places, kind === 'absolute' ? decimals : 0));
}

/** A stored scheme as the editor's draft; the wording is null where it is the proposed one. */
export function draftOf(scheme: ItemScheme, prompt: string): ItemDraft {
  const convention = askedConventions.find((name) => name === scheme.asked.convention);
  const quantity = askedQuantities.find((name) => name === scheme.asked.quantity);
  if (quantity === undefined || convention === undefined) throw new Error(`The editor has no fields for ${scheme.asked.quantity} under ${scheme.asked.convention}.`);
  const { decimals, figures } = scheme.key;
  const { downToDecimals, downToFigures, truncation } = scheme.roundings;
  return {
    asked: { ...scheme.asked, quantity, convention },
    decimals: Math.min(4, decimals),
    figures: figures ?? 4,
    prompt: prompt === proposedStem(scheme.asked, decimals, figures ?? null) ? null : prompt,
    marks: marksText(scheme.maxGrains),
    roundings: { downToDecimals, truncation, ...(downToFigures === undefined ? {} : { downToFigures }) },
    bands: scheme.bands.map((band) => ({ name: band.name, kind: band.kind, width: widthText(band, decimals), marks: marksText(band.grains) })),
    alternatives: scheme.alternatives.map(({ name, convention = null, text, grains, reason }) => ({ name, convention: convention === 'typed' ? null : convention, value: convention === null ? text : '', marks: marksText(grains), reason })),
    slips: (scheme.slips ?? []).map(({ id, grains }) => ({ id, marks: marksText(grains) })),
    crossedOut: scheme.crossedOut,
    twoAnswers: scheme.twoAnswers,
  };
}
