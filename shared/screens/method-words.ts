export interface MethodMarkRow {
  readonly id: string;
  /** What the working must show. */
  readonly text: string;
}

export const methodWords = {
  title: 'Method marks',
  which: (count: number) => `Which, 1 to ${count}?`,
  texts: 'Wording',
} as const;

/** "method 1 and 3" by the numbers of the marks that were struck, "no method mark", or nothing for an item without any. */
export function struckWords(struck: readonly string[], marks: readonly MethodMarkRow[]): string {
  if (marks.length === 0) return '';
  const numbers = marks.flatMap(({ id }, index) => (struck.includes(id) ? [index + 1] : []));
  const last = numbers.pop();
  if (last === undefined) return 'no method mark';
  return numbers.length === 0 ? `method ${last}` : `method ${numbers.join(', ')} and ${last}`;
}
