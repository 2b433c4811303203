import type { PageIdentity } from '../../../shared/sheets/identity';
import type { LayoutOf, SheetLayout } from './layout';
import type { ReadBox, ReadPage, SheetReading } from './read-sheet';

/** The pages that may come in, as plain data for a worker thread: those of the layouts printed for one sitting. */
export interface PrintedPage extends Pick<PageIdentity, 'sitting' | 'layout' | 'page'> {
  readonly boxes: SheetLayout;
}

export interface SheetKeys {
  /** The secret that the check digits of codes are made with. */
  readonly secret: string;
  readonly pages: readonly PrintedPage[];
}

export const layoutsOf =
  (pages: readonly PrintedPage[]): LayoutOf =>
  (identity) =>
    pages.find(({ sitting, layout, page }) => sitting === identity.sitting && layout === identity.layout && page === identity.page)?.boxes ?? null;

/** What was made of a page's codes and frames; `mmToPx` and the size belong to the display, which shows the page as it was printed. */
export type SheetReport =
  | Exclude<SheetReading, { state: 'read' }>
  | ({ readonly state: 'read'; readonly identity: PageIdentity; readonly mmToPx: readonly number[]; readonly boxes: readonly Omit<ReadBox, 'corners'>[] } & Omit<ReadPage, 'map' | 'boxes'>);
