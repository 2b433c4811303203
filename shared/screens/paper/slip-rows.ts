import type { ItemDraft, WorkedDraft } from '../../contracts/items';

type Offered = WorkedDraft['slips'][number];

/** Slips that come to one value, named together: the item cannot tell them apart. */
export interface SlipRow {
  readonly text: string;
  readonly slips: readonly Offered[];
  /** As typed, where the scheme names it; null where it does not. */
  readonly marks: string | null;
}

/** The slips of an item that it can see, twins in one row, the commonest first. */
export function slipRows(worked: WorkedDraft, draft: ItemDraft): SlipRow[] {
  const rows = new Map<string, Offered[]>();
  for (const slip of worked.slips) if (!slip.isSilent) rows.set(slip.text, [...(rows.get(slip.text) ?? []), slip]);
  const named = new Map(draft.slips.map(({ id, marks }) => [id, marks]));
  return [...rows].map(([text, slips]) => ({ text, slips, marks: slips.map(({ id }) => named.get(id)).find((marks) => marks !== undefined) ?? null }));
}

/** Names a row, gives it another share, or takes it out; twins go together. */
export function withSlipRow(draft: ItemDraft, row: SlipRow, marks: string | null): ItemDraft['slips'] {
  const ids = new Set(row.slips.map(({ id }) => id));
  const rest = draft.slips.filter(({ id }) => !ids.has(id));
  return marks === null ? rest : [...rest, ...row.slips.map(({ id }) => ({ id, marks }))];
}
