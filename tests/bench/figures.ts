/** The value below which the share of the figures lies. */
export function quantile(figures: readonly number[], share: number): number {
  const sorted = [...figures].sort((one, other) => one - other);
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? Number.NaN;
}

export const median = (figures: readonly number[]): number => quantile(figures, 0.5);

export interface BenchLine {
  readonly name: string;
  readonly ratio: number;
  readonly budget: { readonly most: number } | { readonly least: number } | null;
  readonly detail: string;
}

const keeps = ({ ratio, budget }: BenchLine): boolean => budget === null || ('most' in budget ? ratio <= budget.most : ratio >= budget.least);

/** One line a figure; says whether all budgets are kept. */
export function printLines(lines: readonly BenchLine[]): boolean {
  for (const line of lines) {
    const budget = line.budget === null ? '' : 'most' in line.budget ? `, budget at most ${line.budget.most}` : `, budget at least ${line.budget.least}`;
    console.log(`${keeps(line) ? 'kept  ' : 'MISSED'} ${line.name}: ${line.ratio.toFixed(2)}${budget} (${line.detail})`);
  }
  return lines.every(keeps);
}
