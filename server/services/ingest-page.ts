import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { insertBlob } from '../../db/queries/blobs';
import { insertPageImage, pageImageAt, samePicture } from '../../db/queries/page-images';
import { findUpload, type BatchRow, type UploadRow } from '../../db/queries/uploads';
import type { Context } from '../context';
import type { OpenedPage } from '../ingest/inputs/opener';
import { nameOfPage, type PlannedPage } from '../ingest/inputs/plan';
import type { SheetReport } from '../ingest/sheet/sheet-task';
import { recordAct } from './audit';
import { cutFor, fillPlace, mapFor, noteBlobs, storePage, type MadePage, type StoredPage } from './page-places';
import { placeOf, type PageToPlace } from './placing';
import { noteOf, pictureOf } from './sheet-pages';
import { bumpSitting } from './sitting-access';

/** One file on its way to being pages. */
export interface IngestOf {
  readonly upload: UploadRow;
  readonly batch: BatchRow;
  readonly path: string;
  /** Its only page is the file itself: what is wrong with it is said of the file. */
  readonly isOnePicture: boolean;
}

interface Original {
  readonly sha256: string;
  readonly size: number;
}

type TakenPage = {
  readonly ok: true;
  readonly made: MadePage;
  readonly stored: StoredPage;
  readonly original: Original;
  readonly sheet: SheetReport | null;
  readonly frame: number;
  readonly note: string | null;
  /** The place whose boxes were cut out. */
  readonly cutPage: string | null;
};

export interface NotTaken {
  readonly ok: false;
  readonly refusal: string;
  readonly isTwin?: boolean;
}

export type Taken = TakenPage | NotTaken;

async function originalOf({ upload, path }: IngestOf, opened: OpenedPage): Promise<Original> {
  const { size } = await stat(opened.path);
  if (opened.path === path && upload.sha256 !== null) return { sha256: upload.sha256, size };
  const hash = createHash('sha256');
  await pipeline(createReadStream(opened.path), hash);
  return { sha256: hash.digest('hex'), size };
}

const toPlace = ({ upload, batch }: IngestOf, page: PlannedPage, sheet: SheetReport | null): PageToPlace => ({
  sittingId: batch.sitting,
  fileName: nameOfPage(page, upload.fileName),
  frame: 'source' in page ? page.source.frame : 0,
  of: 'source' in page ? page.source.of : 1,
  sheet,
});

type Twin = NonNullable<ReturnType<typeof samePicture>>;

function twinRefusal({ upload }: IngestOf, twin: Twin): NotTaken {
  const where = twin.upload === upload.id ? '' : ` of bundle ${twin.bundle}`;
  const page = twin.pages !== null && twin.pages > 1 && twin.name === null ? `page ${twin.index + 1} of ` : '';
  return { ok: false, isTwin: true, refusal: `The same picture as ${page}${twin.name ?? twin.fileName}${where}. It was not kept twice.` };
}

/** Makes and stores the pictures of one page, unless it is here already; the rows follow in keepPage. */
export async function makeTaken(context: Context, of: IngestOf, page: PlannedPage, opened: OpenedPage): Promise<Taken> {
  const { db, storage } = context;
  const original = await originalOf(of, opened);
  const twin = samePicture(db, of.batch.sitting, { original: original.sha256, frame: opened.frame }, null);
  if (twin) return twinRefusal(of, twin);
  const named = placeOf(context, toPlace(of, page, null));
  const { made, sheet } = await pictureOf(context, of.batch.sitting, { path: opened.path, index: opened.frame, turns: 0, cut: 'place' in named ? cutFor(context, named.place) : null });
  if (!made.ok) return { ok: false, refusal: made.refusal };
  const shown = made.display ? createHash('sha256').update(made.display).digest('hex') : null;
  const twinByLook = samePicture(db, of.batch.sitting, { original: original.sha256, frame: opened.frame }, shown);
  if (twinByLook) return twinRefusal(of, twinByLook);
  await storage.putFile(opened.path, original.sha256);
  const stored = await storePage(context, made, original.sha256);
  const placing = placeOf(context, toPlace(of, page, sheet));
  return { ok: true, made, stored, original, sheet, frame: opened.frame, note: noteOf(sheet) ?? opened.note, cutPage: 'place' in placing ? placing.place.page : null };
}

/** Whether the row of a page may still be written: its file was not given up, and no earlier run wrote it. */
const isOpen = ({ db }: Context, { upload }: IngestOf, page: PlannedPage): boolean => findUpload(db, upload.id)?.state === 'received' && pageImageAt(db, upload.id, page.index) === undefined;

/** Writes the rows of one page, and gives it its place: one transaction. Tells where the same picture came in beside it meanwhile. */
export function keepPage(context: Context, of: IngestOf, page: PlannedPage, taken: TakenPage): NotTaken | null {
  const { db } = context;
  const { upload, batch } = of;
  return inTransaction(db, () => {
    if (!isOpen(context, of, page)) return null;
    const { made, stored, original, frame, note, sheet } = taken;
    const twin = samePicture(db, batch.sitting, { original: original.sha256, frame }, stored.display);
    if (twin) return twinRefusal(of, twin);
    const id = uuidv7();
    insertBlob(db, { ...original, mediaType: made.mediaType });
    noteBlobs(context, made, stored);
    const placing = placeOf(context, toPlace(of, page, sheet));
    const place = 'place' in placing && placing.place.page === taken.cutPage ? placing.place : undefined;
    const { display, thumb, widthPx, heightPx } = stored;
    insertPageImage(db, {
      id,
      upload: upload.id,
      index: page.index,
      sitting: batch.sitting,
      original: original.sha256,
      frame,
      name: page.name,
      note,
      display,
      thumb,
      widthPx,
      heightPx,
      residualMm: sheet?.state === 'read' ? sheet.residualMm : null,
      ...(place
        ? { state: 'placed' as const, page: place.page, mmToPx: mapFor(context, place, stored, sheet) }
        : { state: 'loose' as const, why: 'why' in placing ? placing.why : 'The class list changed while the page came in.' }),
    });
    if (place) fillPlace(context, place, id, { crops: stored.crops, sheet });
    if (place && 'from' in placing) recordAct(context, { actor: batch.madeBy, act: 'page-placed', sitting: batch.sitting, subject: id, after: { page: place.page, from: placing.from } });
    bumpSitting(db, batch.sitting);
    return null;
  });
}

/** Notes a page that was not taken, so that the others of its file can be. */
export function noteRefusedPage(context: Context, of: IngestOf, page: PlannedPage, refusal: string): void {
  const { db } = context;
  inTransaction(db, () => {
    if (!isOpen(context, of, page)) return;
    insertPageImage(db, { id: uuidv7(), upload: of.upload.id, index: page.index, sitting: of.batch.sitting, name: page.name, state: 'refused', why: refusal });
    bumpSitting(db, of.batch.sitting);
  });
}
