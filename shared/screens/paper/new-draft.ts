import { occupiedElectrons } from '../../chemistry/configurations';
import { elementByNumber, elementBySymbol } from '../../chemistry/elements';
import type { ItemDraft } from '../../contracts/items';

const lithium = 3;

/** The outermost electron of an atom, as pickers list it: 3p of chlorine. */
export function outermostElectron(symbol: string, charge = 0): string {
  const electrons = occupiedElectrons(symbol, charge);
  return (electrons.ok ? electrons.value.at(-1) : undefined) ?? '1s';
}

/** What a new item starts with: the next element after the last item's, its outermost electron, the same quantity and marks. */
export function newDraft(last: ItemDraft | undefined): ItemDraft {
  const before = last ? elementBySymbol(last.asked.symbol) : null;
  const next = elementByNumber(before?.ok ? before.value.number + 1 : lithium);
  const symbol = next.ok ? next.value.symbol : 'C';
  return {
    asked: { symbol, charge: 0, electron: outermostElectron(symbol), quantity: last?.asked.quantity ?? 'zeff', convention: last?.asked.convention ?? 'slater' },
    decimals: last?.decimals ?? 2,
    figures: last?.figures ?? 4,
    prompt: null,
    marks: last?.marks ?? '3',
    roundings: { downToDecimals: 1, truncation: false },
    bands: [],
    alternatives: [],
    slips: [],
    crossedOut: last?.crossedOut ?? 'ask',
    twoAnswers: last?.twoAnswers ?? 'ask',
  };
}
