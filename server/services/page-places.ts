import { v7 as uuidv7 } from 'uuid';
import { insertBlob } from '../../db/queries/blobs';
import { answersOfScript, pageLayout, saveCrop, setEvidence, setPlaceImage, type PagePlace } from '../../db/queries/page-images';
import { saveStrip } from '../../db/queries/people-and-paper';
import type { Context } from '../context';
import { mapOfWholePage } from '../ingest/cutting';
import type { PictureResult, PictureTask } from '../ingest/picture-worker';
import type { SheetReport } from '../ingest/sheet/sheet-task';
import { settleAnswers } from './settle';

export type MadePage = Extract<PictureResult, { ok: true }>;

export interface StoredCrop {
  readonly box: string;
  readonly blob: string;
  readonly widthPx: number;
  readonly heightPx: number;
}

export interface StoredPage {
  readonly display: string;
  readonly thumb: string;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly crops: readonly StoredCrop[];
}

/** What to cut out of an image for a place: the boxes of its page of the script's layout. */
export function cutFor({ db }: Pick<Context, 'db'>, place: Pick<PagePlace, 'layout' | 'pageNo'> | undefined): PictureTask['cut'] {
  const found = place?.layout ? pageLayout(db, place.layout, place.pageNo) : undefined;
  return found ? { page: found, boxes: found.boxes } : null;
}

/** The map of an image: of a read sheet its own, else that of a picture which shows the whole page. */
export function mapFor(context: Pick<Context, 'db'>, place: PagePlace, { widthPx, heightPx }: Pick<StoredPage, 'widthPx' | 'heightPx'>, sheet: SheetReport | null): number[] | null {
  if (sheet?.state === 'read') return [...sheet.mmToPx];
  const cut = cutFor(context, place);
  return cut ? mapOfWholePage(cut.page, { width: widthPx, height: heightPx }) : null;
}

/** Puts the pictures of a page on disk; their rows follow in the transaction of the act. `original` is shown where no other display was made. */
export async function storePage({ storage }: Pick<Context, 'storage'>, made: MadePage, original: string): Promise<StoredPage> {
  const shaOf = async (bytes: Uint8Array): Promise<string> => (await storage.put(bytes)).sha256;
  const [display, thumb, ...crops] = await Promise.all([made.display ? shaOf(made.display) : original, shaOf(made.thumb), ...made.crops.map(({ jpeg }) => shaOf(jpeg))]);
  return {
    display,
    thumb,
    widthPx: made.width,
    heightPx: made.height,
    crops: made.crops.map(({ box, width, height }, index) => ({ box, blob: crops[index] ?? '', widthPx: width, heightPx: height })),
  };
}

/** Notes every picture made of a page among the stored bytes. */
export function noteBlobs({ db }: Pick<Context, 'db'>, made: MadePage, stored: StoredPage): void {
  const row = (sha256: string, bytes: Uint8Array): void => insertBlob(db, { sha256, size: bytes.length, mediaType: 'image/jpeg' });
  if (made.display) row(stored.display, made.display);
  row(stored.thumb, made.thumb);
  stored.crops.forEach(({ blob }, index) => row(blob, made.crops[index]?.jpeg ?? new Uint8Array()));
}

export interface Filling {
  readonly crops: readonly StoredCrop[];
  /** How sure the cut-outs are, where they were cut by codes and frames. */
  readonly sheet: SheetReport | null;
}

const allSides = 4;

/** What a read sheet says of one cut-out. */
function sureness(sheet: SheetReport | null, boxId: string): { evidence: 'in' | 'doubtful'; sidesConfirmed: number | null; ink: 'blank' | 'unsure' | 'written' | null } {
  const found = sheet?.state === 'read' ? sheet.boxes.find(({ id }) => id === boxId) : undefined;
  const isDoubtful = found !== undefined && (found.isCutOff || (found.sidesConfirmed !== null && found.sidesConfirmed < allSides));
  return { evidence: isDoubtful ? 'doubtful' : 'in', sidesConfirmed: found?.sidesConfirmed ?? null, ink: found?.ink ?? null };
}

/** Fills a place with an image and its cut-outs: its answers can be read from here on. In the transaction of the act. */
export function fillPlace(context: Pick<Context, 'db' | 'clock'>, place: PagePlace, imageId: string, { crops, sheet }: Filling): void {
  const { db } = context;
  setPlaceImage(db, place.page, imageId);
  const layout = place.layout ? pageLayout(db, place.layout, place.pageNo) : undefined;
  const answers = answersOfScript(db, place.script);
  const readable = new Set<string>();
  for (const { box, blob, widthPx, heightPx } of crops) {
    const region = layout?.boxes.find(({ id }) => id === box);
    if (region?.use === 'number') saveStrip(db, { script: place.script, pageImage: imageId, blob, widthPx, heightPx });
    const answer = region?.item ? answers.get(region.item) : undefined;
    if (!region || answer === undefined) continue;
    saveCrop(db, { id: uuidv7(), answer, box, pageImage: imageId, blob, widthPx, heightPx, ...sureness(sheet, box) });
    if (region.use === 'answer') {
      setEvidence(db, answer, 'in');
      readable.add(answer);
    }
  }
  if (readable.size > 0) settleAnswers(context, [...readable]);
}
