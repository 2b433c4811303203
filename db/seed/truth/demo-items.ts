import { compare, exactDecimals, ratio, subtract, toDecimals } from '../../../shared/chemistry/exact';
import type { Exact } from '../../../shared/chemistry/exact';
import { proposedStem } from '../../../shared/chemistry/stem';
import { work } from '../../../shared/chemistry/work';
import type { Worked } from '../../../shared/chemistry/work';
import { GRAINS_PER_MARK } from '../../../shared/marking/grains';
import type { Asked } from '../../../shared/marking/scheme';

export interface DemoItem {
  readonly number: number;
  readonly asked: Asked;
  readonly maxGrains: number;
}

const item = (number: number, symbol: string, charge: number, electron: string, quantity: 'zeff' | 'sigma', marks: number): DemoItem => ({
  number,
  asked: { symbol, charge, electron, quantity, convention: 'slater' },
  maxGrains: marks * GRAINS_PER_MARK,
});

/** The paper of the demo: p, s and d electrons, atoms and an ion, Z_eff and sigma; 31 marks. */
export const demoItems: readonly DemoItem[] = [
  item(1, 'C', 0, '2p', 'zeff', 2),
  item(2, 'N', 0, '2p', 'zeff', 2),
  item(3, 'O', 0, '2p', 'zeff', 2),
  item(4, 'F', 0, '2p', 'zeff', 2),
  item(5, 'Na', 0, '3s', 'zeff', 3),
  item(6, 'Cl', 0, '3p', 'zeff', 3),
  item(7, 'Fe', 0, '4s', 'zeff', 3),
  item(8, 'Fe', 0, '3d', 'zeff', 3),
  item(9, 'S', 0, '3p', 'sigma', 2),
  item(10, 'Mg', 2, '2p', 'zeff', 3),
  item(11, 'Zn', 0, '3d', 'zeff', 3),
  item(12, 'Ca', 0, '4s', 'zeff', 3),
];

/** The worked key of an item; the demo asks for nothing that cannot be computed. */
export function workedKey({ asked }: DemoItem): Worked {
  const worked = work(asked);
  if (!worked.ok) throw new Error(worked.problem.message);
  return worked.value;
}

export const keyText = (demoItem: DemoItem): string => {
  const { value, decimals } = workedKey(demoItem);
  return toDecimals(value, decimals);
};

export const promptOf = (demoItem: DemoItem): string => proposedStem(demoItem.asked, workedKey(demoItem).decimals);

/** The value to one decimal, both neighbours where it lies half way: of 91/20 "4.6" and "4.5", of 61/10 "6.1". */
export function oneDecimal(value: Exact): readonly string[] {
  const rounded = toDecimals(value, 1);
  if (exactDecimals(value) !== 2) return [rounded];
  // A step of 0.01 towards zero crosses the half way point, and only there it changes the rounding.
  const step = ratio(compare(value, ratio(0n)) < 0 ? -1n : 1n, 100n);
  return [...new Set([rounded, toDecimals(subtract(value, step), 1)])];
}
