/** What an item may have that the response processing of QTI 3.0 has no place for: it rests on other items, or on what a reader sees. */
export const qtiLeavesOut = ['follow-through', 'method-marks', 'unit-cost', 'sign-cost'] as const;
export type QtiLeavesOut = (typeof qtiLeavesOut)[number];

/** The parts of a draft that decide it. */
interface Held {
  readonly followThrough: unknown;
  readonly methodMarks: readonly unknown[];
  readonly unitCost: string | null;
  readonly signCost: string | null;
}

/**
 * What an exported item leaves out, in a fixed order. Our reading of the 1EdTech information model, from memory; no units.
 * An item with one method mark and the cost of a sign leaves out `method-marks` and `sign-cost`.
 */
export const leftOutOfQti = ({ followThrough, methodMarks, unitCost, signCost }: Held): QtiLeavesOut[] => {
  const held: Record<QtiLeavesOut, boolean> = { 'follow-through': followThrough !== null, 'method-marks': methodMarks.length > 0, 'unit-cost': unitCost !== null, 'sign-cost': signCost !== null };
  return qtiLeavesOut.filter((part) => held[part]);
};
