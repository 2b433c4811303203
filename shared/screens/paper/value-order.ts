import type { ElectronDraft } from '../../contracts/items';

export interface NumberedOption {
  readonly option: ElectronDraft;
  /** As printed, from 1. */
  readonly number: number;
  readonly value: string | null;
}

/** Value texts come from the server, in plain decimals; they are compared for the order of rows only. */
const sizeOf = (value: string | null): number => (value === null ? Infinity : Number(value.replace('−', '-')));

/** Options from the least value to the greatest; those without a value last. */
export function byValue(options: readonly ElectronDraft[], values: readonly (string | null)[]): NumberedOption[] {
  const numbered = options.map((option, index) => ({ option, number: index + 1, value: values[index] ?? null }));
  return numbered.sort((one, other) => {
    const [left, right] = [sizeOf(one.value), sizeOf(other.value)];
    return left === right ? one.number - other.number : left - right;
  });
}
