import { occupiedElectrons } from '../../chemistry/configurations';
import { elementByNumber, elementBySymbol } from '../../chemistry/elements';
import type { ItemDraft } from '../../contracts/items';

const lithium = 3;

/** The outermost electron of an atom, as pickers list it: 3p of chlorine. */
export function outermostElectron(symbol: string, charge = 0): string {
  const electrons = occupiedElectrons(symbol, charge);
  return (electrons.ok ? electrons.value.at(-1) : undefined) ?? '1s';
}

/** A difference needs a second electron, and a typed key its value: after those a new item asks for Z_eff. */
function plainQuantity(last: ItemDraft | undefined): Pick<ItemDraft['asked'], 'quantity' | 'convention'> {
  const isPlain = last !== undefined && last.asked.quantity !== 'difference' && last.asked.convention !== 'typed';
  return isPlain ? { quantity: last.asked.quantity, convention: last.asked.convention } : { quantity: 'zeff', convention: 'slater' };
}

/** What a new item starts with: the next element after the last item's, its outermost electron, the same quantity and marks. */
export function newDraft(last: ItemDraft | undefined): ItemDraft {
  const before = last ? elementBySymbol(last.asked.symbol) : null;
  const next = elementByNumber(before?.ok ? before.value.number + 1 : lithium);
  const symbol = next.ok ? next.value.symbol : 'C';
  return {
    kind: 'numeric',
    printed: null,
    asked: { symbol, charge: 0, electron: outermostElectron(symbol), ...plainQuantity(last) },
    decimals: last?.decimals ?? 2,
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
