import { layoutOrdinal } from '../../db/queries/printings';
import type { PagePlace } from '../../db/queries/page-images';
import { printedPages } from '../../db/queries/sheets';
import { findSitting } from '../../db/queries/sittings';
import type { Context } from '../context';
import type { PictureResult, PictureTask } from '../ingest/picture-worker';
import type { SheetKeys, SheetReport } from '../ingest/sheet/sheet-task';

/** What codes can say in a sitting; null while nothing was printed for it, so that nobody looks for codes. */
export function sheetKeysOf({ db, config }: Pick<Context, 'db' | 'config'>, sittingId: string): SheetKeys | null {
  const pages = printedPages(db, sittingId);
  const sitting = findSitting(db, sittingId);
  if (pages.length === 0 || !sitting) return null;
  return {
    secret: config.sheetSecret,
    pages: pages.map(({ layout, page, widthMm, heightMm, boxes }) => ({
      sitting: sitting.printNumber,
      layout,
      page,
      boxes: { page: { widthMm, heightMm }, boxes: boxes.map(({ id, use, x, y, w, h }) => ({ id, x, y, w, h, isFramed: use !== 'working' })) },
    })),
  };
}

export interface PictureOf {
  readonly made: PictureResult;
  /** What the codes and frames of the page say; null where none are looked for. */
  readonly sheet: SheetReport | null;
}

/** Whether the boxes that were cut by the codes of a page are those of a place. */
export const isSheetOf = ({ db }: Pick<Context, 'db'>, sheet: SheetReport | null, place: PagePlace): boolean =>
  sheet?.state === 'read' && place.layout !== null && sheet.identity.layout === layoutOrdinal(db, place.layout) && sheet.identity.page === place.pageNo;

/** Makes the pictures of a page; on a sheet printed for the sitting by its codes and frames. */
export async function pictureOf(context: Pick<Context, 'db' | 'config' | 'pictures'>, sittingId: string, task: PictureTask): Promise<PictureOf> {
  const sheets = sheetKeysOf(context, sittingId);
  if (!sheets) return { made: await context.pictures.make(task), sheet: null };
  const made = await context.pictures.makeSheet({ ...task, sheets });
  return { made, sheet: made.ok ? made.sheet : null };
}

const itemWords = (n: number): string => (n === 1 ? 'One box' : `${n} boxes`);

/** Advice for the next scan that a read sheet gives. */
export function noteOf(sheet: SheetReport | null): string | null {
  if (sheet?.state !== 'read') return null;
  const cutOff = sheet.boxes.filter(({ isCutOff }) => isCutOff).length;
  const unsure = sheet.boxes.filter(({ sidesConfirmed, isCutOff }) => !isCutOff && sidesConfirmed !== null && sidesConfirmed < 4).length;
  const notes = [
    cutOff > 0 ? `${itemWords(cutOff)} cut off: scan the page again.` : '',
    unsure > 0 ? `${itemWords(unsure)} not quite found: look at the cut-outs.` : '',
    sheet.isBilevel ? 'A black-and-white scan: faint pencil may be missing. Scan in grey.' : '',
  ].filter((note) => note !== '');
  return notes.length > 0 ? notes.join(' ') : null;
}
