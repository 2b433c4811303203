import { inTransaction } from '../../db/client';
import { mediaTypeOfBlob } from '../../db/queries/blobs';
import { withdrawLeases, endReading } from '../../db/queries/desk';
import { actsFromImage, cropOfBox, dropCrops, findPageImage, hasAnswerCrop, loosePages, placeById, placeOf, placesOfSitting, setEvidence, setPlaceImage, updatePageImage, type PageImageRow, type PagePlace } from '../../db/queries/page-images';
import { dropStrip } from '../../db/queries/people-and-paper';
import type { LoosePage, PageImageView, PagePlaceView } from '../../shared/contracts/scans';
import type { GuardRole } from '../../shared/contracts/route';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, notAllowed, notFound } from '../errors';
import { pageFromName } from '../ingest/page-name';
import type { SheetReport } from '../ingest/sheet/sheet-task';
import { recordAct } from './audit';
import { scanners, scanViewers } from './batches';
import { cutFor, fillPlace, mapFor, noteBlobs, storePage, type MadePage, type StoredPage } from './page-places';
import { settleAnswers } from './settle';
import { isSheetOf, pictureOf } from './sheet-pages';
import { bumpSitting, requireSitting, type SittingAccess } from './sitting-access';

type Found = NonNullable<ReturnType<typeof findPageImage>> & SittingAccess;

function requirePage(context: Context, actor: Actor, imageId: string, roles: readonly GuardRole[]): Found {
  const found = findPageImage(context.db, imageId);
  if (!found) throw notFound();
  return { ...found, ...requireSitting(context, actor, found.image.sitting, roles) };
}

const viewOf = ({ image, fileName, candidateNumber, pageNo }: Omit<Found, keyof SittingAccess>): PageImageView => {
  const { id, state, why, turns, widthPx, heightPx, rev } = image;
  return { id, fileName, state, why, candidateNumber, pageNo, turns, widthPx, heightPx, rev };
};

export const pageImageFor = (context: Context, actor: Actor, imageId: string): PageImageView => viewOf(requirePage(context, actor, imageId, scanViewers));

/** Loose pages with the likeliest place of each, and the places they could have. */
export function looseFor(context: Context, actor: Actor, sittingId: string): { pages: LoosePage[]; places: PagePlaceView[] } {
  const { db } = context;
  requireSitting(context, actor, sittingId, scanViewers);
  const loose = loosePages(db, sittingId);
  if (loose.length === 0) return { pages: [], places: [] };
  const places = placesOfSitting(db, sittingId).map(({ image, imageRev, ...place }) => ({ ...place, image: image === null ? null : { id: image, rev: imageRev ?? 1 } }));
  const likely = (fileName: string): LoosePage['likely'] => {
    const named = pageFromName(fileName);
    const found = places.find((place) => named && place.image === null && place.candidateNumber.toLowerCase() === named.number.toLowerCase() && place.pageNo === named.pageNo);
    return found ? { candidateId: found.candidateId, pageNo: found.pageNo } : null;
  };
  return { pages: loose.map(({ why, ...page }) => ({ ...page, why: why ?? 'No script has claimed it.', likely: likely(page.fileName) })), places };
}

interface Remade {
  readonly made: MadePage;
  readonly stored: StoredPage;
  readonly sheet: SheetReport | null;
}

/** Makes the pictures of an image again, cut for a place; they are on disk when this resolves. */
async function remake(context: Context, image: PageImageRow, turns: number, place: PagePlace | undefined): Promise<Remade> {
  const { original, frame } = image;
  if (original === null) throw notFound();
  const { made, sheet } = await context.storage.withLocalCopy(original, async (path) => {
    const task = { path, index: frame, turns, cut: cutFor(context, place) };
    const found = await pictureOf(context, image.sitting, task);
    // A sheet of another page than the one it is placed at is cut as any picture is.
    return place && found.sheet !== null && !isSheetOf(context, found.sheet, place) ? { made: await context.pictures.make(task), sheet: null } : found;
  });
  if (!made.ok) throw conflict(made.refusal);
  return { made, stored: await storePage(context, made, original), sheet };
}

const seen = (found: Found, rev: number): void => {
  if (found.image.state === 'refused') throw conflict('This page was refused; there is no picture of it. Scan it again.', viewOf(found));
  if (found.image.rev !== rev) throw conflict('Someone sorted this page a moment ago. Yours was not stored.', viewOf(found));
};

function requireFree(place: PagePlace | undefined, imageId: string): PagePlace {
  if (!place) throw notFound();
  if (place.image !== null && place.image !== imageId) throw conflict(`Page ${place.pageNo} of ${place.candidateNumber} is in already. Take that page out first, or choose another place.`);
  return place;
}

/** Says whose page an image is. */
export async function placePage(context: Context, actor: Actor, imageId: string, rev: number, wanted: { readonly candidateId: string; readonly pageNo: number }): Promise<PageImageView> {
  const { db } = context;
  const found = requirePage(context, actor, imageId, scanners);
  seen(found, rev);
  if (found.image.state === 'placed') throw conflict('This page has its place. Take it out first.', viewOf(found));
  const placeNow = (): PagePlace => {
    const place = placeOf(db, wanted.candidateId, wanted.pageNo);
    return requireFree(place?.sitting === found.image.sitting ? place : undefined, imageId);
  };
  const { made, stored, sheet } = await remake(context, found.image, found.image.turns, placeNow());
  inTransaction(db, () => {
    seen(requirePage(context, actor, imageId, scanners), rev);
    const place = placeNow();
    noteBlobs(context, made, stored);
    const { display, thumb, widthPx, heightPx } = stored;
    updatePageImage(db, imageId, { state: 'placed', page: place.page, why: null, display, thumb, widthPx, heightPx, mmToPx: mapFor(context, place, stored, sheet) });
    fillPlace(context, place, imageId, { crops: stored.crops, sheet });
    bumpSitting(db, found.image.sitting);
    recordAct(context, { actor: actor.personId, act: 'page-placed', sitting: found.image.sitting, subject: imageId, before: { state: found.image.state }, after: { page: place.page, from: 'a person' } });
  });
  return pageImageFor(context, actor, imageId);
}

/** Turns an image by quarter turns and cuts it again. */
export async function turnPage(context: Context, actor: Actor, imageId: string, rev: number, by: number): Promise<PageImageView> {
  const { db } = context;
  const found = requirePage(context, actor, imageId, scanners);
  seen(found, rev);
  const turns = (found.image.turns + by) % 4;
  const place = found.image.page === null ? undefined : placeById(db, found.image.page);
  const { made, stored, sheet } = await remake(context, found.image, turns, place);
  inTransaction(db, () => {
    seen(requirePage(context, actor, imageId, scanners), rev);
    noteBlobs(context, made, stored);
    const { display, thumb, widthPx, heightPx } = stored;
    updatePageImage(db, imageId, { turns, display, thumb, widthPx, heightPx, mmToPx: place ? mapFor(context, place, stored, sheet) : null });
    if (place) fillPlace(context, place, imageId, { crops: stored.crops, sheet });
    bumpSitting(db, found.image.sitting);
    recordAct(context, { actor: actor.personId, act: 'page-turned', sitting: found.image.sitting, subject: imageId, before: { turns: found.image.turns }, after: { turns } });
  });
  return pageImageFor(context, actor, imageId);
}

/** Frees the place of a placed image; its answers wait for a page again. In the transaction of the act. */
function emptyPlace(context: Context, image: PageImageRow): void {
  const { db, clock } = context;
  if (image.page === null) return;
  setPlaceImage(db, image.page, null);
  dropStrip(db, image.id);
  const answers = dropCrops(db, image.id);
  for (const answer of answers) {
    withdrawLeases(db, answer, clock.now());
    if (!hasAnswerCrop(db, answer)) setEvidence(db, answer, 'none');
  }
  if (answers.length > 0) settleAnswers(context, answers);
}

/** Takes a page out of its place, or a discarded one back among the loose. */
export function loosenPage(context: Context, actor: Actor, imageId: string, rev: number, reopen: boolean): PageImageView {
  const { db, clock } = context;
  inTransaction(db, () => {
    const found = requirePage(context, actor, imageId, scanners);
    seen(found, rev);
    const { image, candidateNumber, pageNo, access } = found;
    if (image.state === 'loose') return;
    const { readings, rulings } = actsFromImage(db, imageId);
    if (rulings > 0) throw conflict('A ruling stands on an answer of this page. Take the ruling back first.');
    if (readings.length > 0 && !reopen) throw conflict(`${readings.length} readings were taken from this page. A lead can reopen them with it.`);
    if (readings.length > 0 && !access.roles.has('lead')) throw notAllowed('Only a lead reopens readings. Tell one which page is misplaced.');
    for (const reading of readings) endReading(db, { reading, why: 'reopened', by: actor.personId, at: clock.now() });
    emptyPlace(context, image);
    updatePageImage(db, imageId, { state: 'loose', page: null, mmToPx: null, why: pageNo === null ? 'It was taken back from the discarded pages.' : `It was taken out of page ${pageNo} of ${candidateNumber ?? 'a script'}.` });
    bumpSitting(db, image.sitting);
    recordAct(context, { actor: actor.personId, act: 'page-loosened', sitting: image.sitting, subject: imageId, before: { state: image.state, page: image.page }, after: { reopened: readings } });
  });
  return pageImageFor(context, actor, imageId);
}

/** Sets a loose page aside as no answer page; its image stays. */
export function discardPage(context: Context, actor: Actor, imageId: string, rev: number): PageImageView {
  const { db } = context;
  inTransaction(db, () => {
    const found = requirePage(context, actor, imageId, scanners);
    seen(found, rev);
    const { image } = found;
    if (image.state === 'placed') throw conflict('This page has its place. Take it out first.', viewOf(found));
    updatePageImage(db, imageId, { state: 'discarded', page: null, why: 'Not an answer page.' });
    bumpSitting(db, image.sitting);
    recordAct(context, { actor: actor.personId, act: 'page-discarded', sitting: image.sitting, subject: imageId, before: { state: image.state } });
  });
  return pageImageFor(context, actor, imageId);
}

/** The picture of a page, for someone who may see its script. */
export function pictureOfPage(context: Context, actor: Actor, imageId: string, size: 'thumb' | 'display' | 'original'): { sha256: string; mediaType: string } {
  const { image } = requirePage(context, actor, imageId, scanViewers);
  const sha256 = image[size];
  const mediaType = sha256 === null ? undefined : mediaTypeOfBlob(context.db, sha256);
  if (sha256 === null || mediaType === undefined) throw notFound();
  return { sha256, mediaType };
}

export function pictureOfCrop(context: Context, actor: Actor, answerId: string, boxId: string): string {
  const found = cropOfBox(context.db, answerId, boxId);
  if (!found) throw notFound();
  requireSitting(context, actor, found.sitting, scanViewers);
  return found.blob;
}
