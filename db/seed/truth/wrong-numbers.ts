import { add, compare, decimal, equals, toDecimals, zero } from '../../../shared/chemistry/exact';

/** A unit or a tenth carried wrongly, a small multiple missed. */
const shifts = ['1', '-1', '0.1', '-0.1', '0.5', '-0.5', '0.2', '0.05', '-0.05', '2'] as const;

/** Wrong values of two decimals as haste makes them, none of them the key or one of `taken`: of 6.10, 7.10 and 6.01 among others. */
export function arithmeticErrors(key: string, taken: ReadonlySet<string>): readonly string[] {
  const value = decimal(key);
  const moved = shifts.map((shift) => add(value, decimal(shift))).filter((wrong) => compare(wrong, zero) > 0);
  const exchanged = key.replace(/(\d)(\d)$/, '$2$1');
  const wrong = [...moved.map((each) => toDecimals(each, 2)), exchanged];
  const others = new Set([...taken].map((text) => toDecimals(decimal(text), 2)));
  return [...new Set(wrong)].filter((text) => !equals(decimal(text), value) && !others.has(text));
}
