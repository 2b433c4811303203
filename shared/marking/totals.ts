import { GRAINS_PER_MARK } from './grains';

export type TotalRounding = 'none' | 'half' | 'whole';

const steps = { none: 1, half: GRAINS_PER_MARK / 2, whole: GRAINS_PER_MARK } as const;

/** A total rounded once by the sitting's rule, halves up: 14.5 marks to whole marks is 15. */
export function roundTotal(grains: number, rule: TotalRounding): number {
  const step = steps[rule];
  return Math.floor((grains + step / 2) / step) * step;
}
