import type { SheetPreview } from '../../contracts/printings';

export interface Wish {
  readonly for: 'all' | 'without-sheet';
  /** As typed. */
  readonly spares: string;
}

const mostSpares = 500;

/** Spare sheets as typed: a count, 0 where nothing is typed, null where it is none. */
export function sparesOf(typed: string): number | null {
  const text = typed.trim();
  if (text === '') return 0;
  if (!/^[0-9]{1,3}$/.test(text)) return null;
  const spares = Number.parseInt(text, 10);
  return spares <= mostSpares ? spares : null;
}

export interface Amount {
  readonly candidates: number;
  readonly spares: number;
  readonly pagesEach: number;
  readonly pages: number;
  /** Of paper, printed on both sides. */
  readonly sheets: number;
}

/** What a printing would make, before it is made. */
export function amountOf(preview: Pick<SheetPreview, 'candidates' | 'withoutSheet'> & { readonly pages: readonly unknown[] }, wish: Wish): Amount {
  const candidates = wish.for === 'all' ? preview.candidates : preview.withoutSheet;
  const spares = sparesOf(wish.spares) ?? 0;
  const pagesEach = preview.pages.length;
  const pages = (candidates + spares) * pagesEach;
  return { candidates, spares, pagesEach, pages, sheets: Math.ceil(pages / 2) };
}

/** A weight in bytes for people: kB below a megabyte, then MB with one decimal. */
export const weightText = (bytes: number): string => (bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`);
