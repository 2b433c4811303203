import { occupiedElectrons } from '../../chemistry/configurations';
import { elementByNumber, elementBySymbol } from '../../chemistry/elements';
import type { ItemDraft } from '../../contracts/items';

const lithium = 3;

/** The outermost electron of an atom, as pickers list it: 3p of chlorine. */
export function outermostElectron(symbol: string, charge = 0): string {
  const electrons = occupiedElectrons(symbol, charge);
  return (electrons.ok ? electrons.value.at(-1) : undefined) ?? '1s';
}

/** What needs more than an electron is not asked for again: a second one, a radius, a key typed by hand. */
function plainQuantity(last: ItemDraft | undefined): Pick<ItemDraft['asked'], 'quantity' | 'convention'> {
  const isPlain = last !== undefined && !['difference', 'electronegativity'].includes(last.asked.quantity) && last.asked.convention !== 'typed';
  return isPlain ? { quantity: last.asked.quantity, convention: last.asked.convention } : { quantity: 'zeff', convention: 'slater' };
}

/** What a new item starts with: the next element after the last item's, its outermost electron, the same quantity and marks. */
export function newDraft(last: ItemDraft | undefined): ItemDraft {
  const isComputed = last?.kind === 'numeric' && last.asked.convention !== 'typed';
  const symbolBefore = last?.kind === 'numeric' ? last.asked.symbol : last?.printed?.options.at(-1)?.symbol;
  const before = symbolBefore === undefined ? null : elementBySymbol(symbolBefore);
  const next = elementByNumber(before?.ok ? before.value.number + 1 : lithium);
  const symbol = next.ok ? next.value.symbol : 'C';
  return {
    kind: 'numeric',
    printed: null,
    asked: { symbol, charge: 0, electron: outermostElectron(symbol), ...plainQuantity(last) },
    // An order has no decimals, and a typed key those of its value.
    decimals: isComputed ? last.decimals : 2,
    figures: last?.figures ?? 4,
    prompt: null,
    marks: last?.marks ?? '3',
    roundings: { downToDecimals: 1, truncation: false },
    bands: [],
    alternatives: [],
    slips: [],
    followThrough: null,
    methodMarks: [],
    unitCost: null,
    signCost: null,
    crossedOut: last?.crossedOut ?? 'ask',
    twoAnswers: last?.twoAnswers ?? 'ask',
  };
}
