import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { insertPageImage, placesOfNumber, type PagePlace } from '../../db/queries/page-images';
import { findBatch, findUpload, updateUpload, type BatchRow, type UploadRow } from '../../db/queries/uploads';
import { mostPagesOfFile } from '../../shared/contracts/scans';
import type { Context } from '../context';
import { mapOfWholePage } from '../ingest/cutting';
import { pageFromName } from '../ingest/page-name';
import { recordAct } from './audit';
import { cutFor, fillPlace, noteBlobs, storePage, type MadePage, type StoredPage } from './page-places';
import { bumpSitting } from './sitting-access';

export const ingestJob = 'ingest-upload';

type Named = { readonly place: PagePlace } | { readonly why: string };

const attendanceWords: Readonly<Record<string, string>> = { absent: 'absent', withdrawn: 'withdrawn', deferred: 'deferred' };

/** The place that a file name gives, or why it gives none that can be taken. */
function placeByName(context: Context, sittingId: string, fileName: string): Named {
  const named = pageFromName(fileName);
  if (!named) return { why: 'The file name gives no candidate and page.' };
  const places = placesOfNumber(context.db, sittingId, named.number);
  const [any] = places;
  if (!any) return { why: `Nobody on the class list has the number ${named.number}.` };
  const place = places.find(({ pageNo }) => pageNo === named.pageNo);
  if (!place) return { why: `The paper has no page ${named.pageNo}.` };
  const away = attendanceWords[place.attendance];
  if (away !== undefined) return { why: `The class list says that ${place.candidateNumber} is ${away}.` };
  if (place.image !== null) return { why: `Page ${place.pageNo} of ${place.candidateNumber} is in already.` };
  return { place };
}

function refuse(context: Context, { id, fileName }: UploadRow, batch: BatchRow, refusal: string): void {
  const { db } = context;
  inTransaction(db, () => {
    updateUpload(db, id, { state: 'refused', problem: refusal });
    bumpSitting(db, batch.sitting);
    recordAct(context, { actor: batch.madeBy, act: 'file-refused', sitting: batch.sitting, subject: id, after: { fileName }, reason: refusal });
  });
}

interface MadeFile {
  readonly upload: UploadRow;
  readonly batch: BatchRow;
  readonly pages: readonly { readonly made: MadePage; readonly stored: StoredPage }[];
  /** The place whose boxes were cut out. */
  readonly cutPage: string | null;
}

/** The rows of a file, once all its pictures are on disk: one transaction. */
function keep(context: Context, { upload, batch, pages, cutPage }: MadeFile): void {
  const { db } = context;
  inTransaction(db, () => {
    if (findUpload(db, upload.id)?.state !== 'received') return;
    const named: Named = pages.length > 1 ? { why: `The file holds ${pages.length} pages. Say whose each is.` } : placeByName(context, batch.sitting, upload.fileName);
    pages.forEach(({ made, stored }, index) => {
      const id = uuidv7();
      noteBlobs(context, made, stored);
      const place = 'place' in named && named.place.page === cutPage ? named.place : undefined;
      insertPageImage(db, {
        id,
        upload: upload.id,
        index,
        sitting: batch.sitting,
        original: upload.sha256,
        display: stored.display,
        thumb: stored.thumb,
        widthPx: stored.widthPx,
        heightPx: stored.heightPx,
        ...(place
          ? { state: 'placed' as const, page: place.page, mmToPx: mapFor(context, place, stored) }
          : { state: 'loose' as const, why: 'why' in named ? named.why : 'The class list changed while the page came in.' }),
      });
      if (place) fillPlace(context, place, id, stored.crops);
      if (place) recordAct(context, { actor: batch.madeBy, act: 'page-placed', sitting: batch.sitting, subject: id, after: { page: place.page, from: 'file name' } });
    });
    updateUpload(db, upload.id, { state: 'done', problem: null });
    bumpSitting(db, batch.sitting);
  });
}

/** The map of an image that shows the whole page. */
export function mapFor(context: Pick<Context, 'db'>, place: PagePlace, { widthPx, heightPx }: Pick<StoredPage, 'widthPx' | 'heightPx'>): number[] | null {
  const cut = cutFor(context, place);
  return cut ? mapOfWholePage(cut.page, { width: widthPx, height: heightPx }) : null;
}

/** Makes the pages of one received file and gives them their place. Running it again, after a crash too, changes nothing. */
export async function ingestUpload(context: Context, uploadId: string): Promise<void> {
  const { db, storage, pictures } = context;
  const upload = findUpload(db, uploadId);
  const batch = upload ? findBatch(db, upload.batch) : undefined;
  if (!upload || !batch || upload.state !== 'received' || upload.sha256 === null) return;
  const named = placeByName(context, batch.sitting, upload.fileName);
  const path = storage.localPath(upload.sha256);
  const pages: { made: MadePage; stored: StoredPage }[] = [];
  let expected = 1;
  for (let index = 0; index < expected; index += 1) {
    const made = await pictures.make({ path, index, turns: 0, cut: index === 0 && 'place' in named ? cutFor(context, named.place) : null });
    if (!made.ok) return refuse(context, upload, batch, expected > 1 ? `Page ${index + 1}: ${made.refusal}` : made.refusal);
    if (made.pages > mostPagesOfFile) return refuse(context, upload, batch, `The file holds ${made.pages} pages; ${mostPagesOfFile} are the most.`);
    expected = made.pages;
    pages.push({ made, stored: await storePage(context, made, upload.sha256) });
  }
  keep(context, { upload, batch, pages, cutPage: 'place' in named ? named.place.page : null });
}
