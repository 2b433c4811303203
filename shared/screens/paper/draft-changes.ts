import { elementByNumber, elementBySymbol } from '../../chemistry/elements';
import type { ElectronDraft, ItemDraft, PrintedDraft } from '../../contracts/items';
import { readAnswer } from '../../marking/read-answer';
import { readMarks } from '../../marking/typed-marks';
import { outermostElectron } from './new-draft';

type Kind = ItemDraft['kind'];
type Quantity = ItemDraft['asked']['quantity'];
type Convention = ItemDraft['asked']['convention'];

const computed = ['zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm', 'electronegativity', 'difference'] as const;
const printedQuantities = ['zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm'] as const;
const bySlater = ['slater', 'slater-035-in-1s', 'slater-d-at-1'] as const;
const others = ['core-count', 'scf', 'ionisation-energy'] as const;

/** A choice says nothing of radii or of a second electron, so it has fewer quantities than a number. */
export const quantitiesFor = (kind: Kind): readonly Quantity[] => (kind === 'numeric' ? computed : printedQuantities);

/** What follows from Z_eff is worked out from Slater’s rules only. */
const isFollowed = (quantity: Quantity): boolean => !['zeff', 'sigma', 'difference', 'value'].includes(quantity);

/** Conventions that work a quantity out; a number may have a key typed by hand besides. */
export const conventionsFor = (kind: Kind, quantity: Quantity): readonly Convention[] => [...bySlater, ...(isFollowed(quantity) ? [] : others), ...(kind === 'numeric' ? (['typed'] as const) : [])];

export const isOrderQuestion = (question: PrintedDraft['question']): boolean => question === 'increasing' || question === 'decreasing';

export const electronPart = ({ symbol, charge, electron, configuration }: ElectronDraft): ElectronDraft => ({ symbol, charge, electron, ...(configuration === undefined ? {} : { configuration }) });

/** The outermost electron of the atom so many places on in the periodic table: one on from Cl 3p is Ar 3p. */
export function neighbourElectron(symbol: string, by: 1 | -1): ElectronDraft {
  const element = elementBySymbol(symbol);
  const number = element.ok ? element.value.number : 5;
  const beside = elementByNumber(number + by);
  const back = elementByNumber(number - by);
  const next = beside.ok ? beside.value.symbol : back.ok ? back.value.symbol : 'C';
  return { symbol: next, charge: 0, electron: outermostElectron(next) };
}

const electronOr = (electron: ElectronDraft): ElectronDraft => (electron.symbol === '' ? { symbol: 'C', charge: 0, electron: '2p' } : electronPart(electron));

const usualRounding = (decimals: number): number | null => (decimals > 1 ? 1 : null);

/** Another kind of item: the electron becomes the first option and back; rules and wording that were of the other kind go. */
export function withKind(draft: ItemDraft, kind: Kind): ItemDraft {
  if (kind === draft.kind) return draft;
  const { asked, printed } = draft;
  const reset = { ...draft, bands: [], alternatives: [], slips: [], followThrough: null, unitCost: null, signCost: null, prompt: null, kind };
  const quantity = quantitiesFor(kind).find((known) => known === asked.quantity) ?? 'zeff';
  const convention = asked.convention === 'typed' ? 'slater' : asked.convention;
  const decimals = convention === 'scf' ? 4 : 2;
  if (kind === 'numeric') return { ...reset, printed: null, decimals, roundings: { ...draft.roundings, downToDecimals: usualRounding(decimals) }, asked: { ...electronOr(printed?.options[0] ?? electronPart(asked)), quantity, convention } };
  const first = electronOr(asked);
  const options = printed?.options ?? [first, neighbourElectron(first.symbol, 1)];
  const isRising = printed?.question === 'increasing' || printed?.question === 'least';
  const question = kind === 'choice' ? (isRising ? 'least' : 'greatest') : isRising ? 'increasing' : 'decreasing';
  return { ...reset, asked: { ...first, quantity, convention }, printed: { question, options, partMarks: [] } };
}

/** Another quantity, with what it needs besides: a radius, or the electron taken off. */
export function withQuantity(draft: ItemDraft, quantity: Quantity): ItemDraft {
  const { radiusAngstrom = '1.00', countsItself = false, other, ...asked } = draft.asked;
  const convention = isFollowed(quantity) && !bySlater.some((known) => known === asked.convention) ? 'slater' : asked.convention;
  return {
    ...draft,
    asked: {
      ...asked,
      quantity,
      convention,
      ...(quantity === 'electronegativity' ? { radiusAngstrom, countsItself } : {}),
      ...(quantity === 'difference' ? { other: other ?? neighbourElectron(asked.symbol, -1) } : {}),
    },
  };
}

const emptyTyped = { label: '', value: '', unit: '', source: '' };

/** Another convention, with the decimals its keys are stated with. A typed key has no electron, slips or other conventions. */
export function withConvention(draft: ItemDraft, convention: Convention): ItemDraft {
  const { typed, ...asked } = draft.asked;
  if (convention === asked.convention) return draft;
  if (convention === 'typed') {
    const { other: _other, ...plain } = asked;
    return { ...draft, asked: { ...plain, quantity: 'value', convention, typed: typed ?? emptyTyped }, slips: [], alternatives: draft.alternatives.filter((one) => one.convention === null), followThrough: null, unitCost: null };
  }
  const decimals = convention === 'scf' ? 4 : asked.convention === 'scf' || asked.convention === 'typed' ? 2 : draft.decimals;
  if (asked.convention !== 'typed') return { ...draft, asked: { ...asked, convention }, decimals };
  return { ...draft, asked: { ...electronOr(asked), quantity: 'zeff', convention }, decimals, roundings: { ...draft.roundings, downToDecimals: usualRounding(decimals) }, unitCost: null };
}

/** A key as typed so far; its decimals say how far it is rounded, unless the lead chose otherwise. */
export function withTypedValue(draft: ItemDraft, value: string): ItemDraft {
  const { typed = emptyTyped } = draft.asked;
  const decimalsIn = (text: string): number => {
    const read = readAnswer(text.trim(), []);
    return read.ok ? Math.min(4, read.decimals) : draft.decimals;
  };
  const decimals = decimalsIn(value);
  const isUsual = typed.value === '' || draft.roundings.downToDecimals === usualRounding(decimalsIn(typed.value));
  const roundings = isUsual ? { ...draft.roundings, downToDecimals: usualRounding(decimals) } : draft.roundings;
  return { ...draft, decimals, roundings, asked: { ...draft.asked, typed: { ...typed, value } } };
}

/** A list with one of its members moved; the same list where there is no room. */
export function moved<Member>(list: readonly Member[], from: number, by: number): Member[] {
  const to = from + by;
  const one = list[from];
  if (one === undefined || to < 0 || to >= list.length) return [...list];
  const rest = list.filter((_member, at) => at !== from);
  return [...rest.slice(0, to), one, ...rest.slice(to)];
}

/** The options of a choice or an order; part marks that no longer can be are taken out. */
export function withOptions(draft: ItemDraft, options: readonly ElectronDraft[]): ItemDraft {
  const { printed } = draft;
  if (!printed) return draft;
  return { ...draft, printed: { ...printed, options: [...options], partMarks: printed.partMarks.filter(({ inPlace }) => inPlace <= options.length - 2) } };
}

/** How many in place the next part mark is for: all but one in place are all in place, so at most two less than there are. */
export function nextPartMark({ options, partMarks }: PrintedDraft): number | null {
  for (let inPlace = options.length - 2; inPlace >= 1; inPlace -= 1) if (!partMarks.some((known) => known.inPlace === inPlace)) return inPlace;
  return null;
}

/** What of the marks of an item its method marks take, and what is left for the value; null while a mark is not understood. */
export function sharesOf({ methodMarks }: Pick<ItemDraft, 'methodMarks'>, maxGrains: number | null): { readonly method: number; readonly value: number } | null {
  const read = methodMarks.map(({ marks }) => readMarks(marks));
  if (maxGrains === null || read.some(({ ok }) => !ok)) return null;
  const method = read.reduce((sum, marks) => sum + (marks.ok ? marks.grains : 0), 0);
  return { method, value: maxGrains - method };
}
