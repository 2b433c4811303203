import { workChoice } from '../../../shared/chemistry/choices';
import { occupiedElectrons } from '../../../shared/chemistry/configurations';
import { exactDecimals, fromFractionText, toDecimals, toFigures, type Exact } from '../../../shared/chemistry/exact';
import { valuesByOtherConventions } from '../../../shared/chemistry/other-conventions';
import { slipLetter } from '../../../shared/chemistry/slips/letters';
import { slipsOf } from '../../../shared/chemistry/slips/slips-of';
import { work } from '../../../shared/chemistry/work';
import type { ItemDraft, WorkedDraft } from '../../../shared/contracts/items';
import { bandRange } from '../../../shared/marking/bands';
import { marksText } from '../../../shared/marking/grains';
import { itemLabel } from '../../../shared/marking/item-label';
import { sourcesOf } from '../../../shared/marking/links';
import { roundings } from '../../../shared/marking/rounding';
import { scaleOf } from '../../../shared/marking/scale';
import type { Asked, Band, ItemScheme } from '../../../shared/marking/scheme';
import { guardOf } from '../../../shared/marking/watch/guard';
import { silentSlips } from '../../../shared/marking/watch/silent';
import { toldApart } from '../../../shared/marking/watch/told-apart';
import { askedOf, electronOf, proposedPrompt } from './asked-of';
import { alone, readDraft, type Place } from './read-draft';

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

const guardFindings = (scheme: ItemScheme): WorkedDraft['guard'] =>
  guardOf(scheme).flatMap(({ band, pays }) => pays.map(({ kind, name, text, distance, grains }) => ({ kind, name, text, distance, band: band.name, marks: marksText(grains) })));

function optionTexts({ kind, asked, printed }: ItemDraft): (string | null)[] {
  if (kind === 'numeric' || !printed) return [];
  return printed.options.map((option) => {
    const worked = work({ ...option, quantity: asked.quantity, convention: asked.convention });
    return worked.ok ? worked.value.text : null;
  });
}

/** While a choice has no answer yet, its wording can be read all the same. */
function promptOf(draft: ItemDraft, asked: Asked, scheme: ItemScheme | null): string {
  if (scheme) return proposedPrompt(scheme);
  const printed = draft.kind !== 'numeric' && draft.printed ? { question: draft.printed.question, options: draft.printed.options.map(electronOf), answer: '', partMarks: [] } : null;
  const worked = draft.kind === 'numeric' ? work(asked) : null;
  const figures = worked?.ok && worked.value.figures !== null ? { figures: draft.figures } : {};
  return proposedPrompt({ asked, printed, key: { value: '0', text: '0', decimals: draft.decimals, ...figures } });
}

/** Key, derivation, wording, scale and what is wrong, as the editor shows them. */
export function workDraft(draft: ItemDraft, place: Place = alone): WorkedDraft {
  const { scheme, key, worked, units, maxGrains, refusals, problems } = readDraft(draft, place);
  const asked = askedOf(draft);
  const isNumeric = draft.kind === 'numeric';
  const electrons = occupiedElectrons(draft.asked.symbol, draft.asked.charge, draft.asked.configuration);
  const drawable = isNumeric && scheme && scheme.bands.every((band) => rangeTexts(band, scheme.key) !== null);
  return {
    label: itemLabel({ asked, printed: isNumeric ? null : draft.printed }),
    key: key && { ...key, figures: key.figures ?? null },
    unit: units[0] ?? '',
    units: [...units],
    derivation: worked?.derivation ?? null,
    otherDerivation: worked?.otherDerivation ?? null,
    options: optionTexts(draft),
    sources: isNumeric ? sourcesOf(asked, place.number, place.items).map(({ item, leg }) => ({ id: item.id, number: item.number, label: itemLabel(item.scheme), of: leg })) : [],
    scale: drawable ? scaleOf(scheme) : null,
    roundings: scheme && isNumeric ? roundingTexts(scheme) : [],
    bands: scheme ? scheme.bands.map((band) => rangeTexts(band, scheme.key)) : draft.bands.map(() => null),
    alternatives: draft.alternatives.map((_alternative, index) => scheme?.alternatives[index]?.text ?? null),
    slips: slipsOf(asked).map(({ id, name, text, oneLine, feedback, isSilent }) => ({ id, letter: slipLetter(id), name, text, differs: oneLine, feedback, isSilent })),
    noOccasion: silentSlips({ asked }).noOccasion.map(({ name }) => name),
    guard: drawable ? guardFindings(scheme) : [],
    untold: scheme && isNumeric ? toldApart(scheme).map(({ name, text, rounded, decimals, distance }) => ({ name, text, rounded, decimals, distance })) : [],
    others: isNumeric ? valuesByOtherConventions(asked).map(({ convention, name, text }) => ({ convention, name, text })) : [],
    electrons: electrons.ok ? [...electrons.value] : [],
    proposedPrompt: promptOf(draft, asked, scheme),
    maxGrains,
    problems: [...refusals, ...problems],
  };
}

/** The values of the options of a choice or an order, in printed order; empty for a number. */
export function optionValues({ kind, asked, printed }: Pick<ItemScheme, 'kind' | 'asked' | 'printed'>): string[] {
  if (kind === 'numeric' || !printed) return [];
  const choice = workChoice({ kind: printed.question, quantity: asked.quantity, convention: asked.convention, options: printed.options });
  return choice.ok ? choice.value.worked.map(({ text }) => text) : [];
}
