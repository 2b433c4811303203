import type { PageIdentity } from '../../../shared/sheets/identity';
import type { BoxMm, PageMm } from '../cutting';

export interface SheetBox extends BoxMm {
  /** Printed with a frame, along whose line the box is measured. Only framed boxes can be checked and judged for ink. */
  readonly isFramed: boolean;
}

export interface SheetLayout {
  readonly page: PageMm;
  readonly boxes: readonly SheetBox[];
}

/** The boxes of the page that codes name; null where no such page was printed for the sittings in question. */
export type LayoutOf = (identity: PageIdentity) => SheetLayout | null;
