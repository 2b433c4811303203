import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { boxesOfLayout, boxIsElsewhere, bumpLayout, deletePagesAfter, findLayout, insertLayout, layoutPages, replaceBoxes, saveLayoutPage, setPageSample, type BoxRow } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import { isPaperLocked } from '../../db/queries/sittings';
import { insertBlob } from '../../db/queries/blobs';
import { defaultPageMm, type LayoutView, type SentLayout } from '../../shared/contracts/layouts';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notFound } from '../errors';
import { recordAct } from './audit';
import { boxProblems } from './layout-checks';
import { bumpSitting, requireOpenPaper, requireSitting } from './sitting-access';

/** Drawn layouts have one ordinal; printed ones will count on from there. */
const drawnOrdinal = 1;

function viewOf(db: Database, sittingId: string): LayoutView {
  const layout = findLayout(db, sittingId, drawnOrdinal);
  const stored = layout ? layoutPages(db, layout.id) : [];
  const pages = stored.length > 0 ? stored.map(({ pageNo, widthMm, heightMm, sample }) => ({ pageNo, widthMm, heightMm, sample })) : [{ pageNo: 1, ...defaultPageMm, sample: null }];
  const boxes = layout ? boxesOfLayout(db, layout.id) : [];
  const placed = new Set(boxes.filter(({ use }) => use === 'answer').map(({ item }) => item));
  return {
    ordinal: drawnOrdinal,
    isLocked: isPaperLocked(db, sittingId),
    pages,
    boxes: boxes.map(({ layout: _layout, ...box }) => box),
    itemsWithoutBox: draftedItems(db, sittingId)
      .filter(({ item }) => !placed.has(item.id))
      .map(({ item, scheme }) => ({ id: item.id, number: item.number, label: itemLabel(scheme) })),
    rev: layout?.rev ?? 0,
  };
}

export function layoutFor(context: Context, actor: Actor, sittingId: string): LayoutView {
  requireSitting(context, actor, sittingId, ['lead', 'external']);
  return viewOf(context.db, sittingId);
}

function ensureLayout(db: Database, sittingId: string): { id: string } {
  const known = findLayout(db, sittingId, drawnOrdinal);
  if (known) {
    bumpLayout(db, known.id);
    return known;
  }
  const id = uuidv7();
  insertLayout(db, { id, sitting: sittingId, ordinal: drawnOrdinal, origin: 'drawn' });
  return { id };
}

/** Stores all pages and boxes of an open paper; rev is the one that was seen, 0 before anything is stored. */
export function saveLayout(context: Context, actor: Actor, sittingId: string, rev: number, sent: SentLayout): LayoutView {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    requireOpenPaper(context, sitting);
    const known = findLayout(db, sittingId, drawnOrdinal);
    if ((known?.rev ?? 0) !== rev) throw conflict('Someone changed the regions meanwhile. Yours were not stored.', viewOf(db, sittingId));
    const items = new Map(draftedItems(db, sittingId).map(({ item }) => [item.id, item.number]));
    const problems = boxProblems(sent, items);
    const [first] = Object.values(problems);
    if (first !== undefined) throw invalidRequest(first, problems);
    const layout = ensureLayout(db, sittingId);
    sent.pages.forEach((page, index) => saveLayoutPage(db, { layout: layout.id, pageNo: index + 1, ...page }));
    deletePagesAfter(db, layout.id, sent.pages.length);
    const boxes = sent.boxes.map(({ id, ...box }): BoxRow => ({ ...box, id: id === undefined || boxIsElsewhere(db, layout.id, id) ? uuidv7() : id, layout: layout.id }));
    replaceBoxes(db, layout.id, boxes);
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'layout-changed', sitting: sittingId, subject: layout.id, after: { pages: sent.pages, boxes } });
  });
  return viewOf(db, sittingId);
}

/** Throws unless a sample for this page can be taken now: an open paper, a page that is there or the next one. */
export function requireSamplePlace(context: Context, actor: Actor, sittingId: string, pageNo: number): void {
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  requireOpenPaper(context, sitting);
  const { pages } = viewOf(context.db, sittingId);
  if (pageNo > pages.length + 1) throw notFound();
}

/** Keeps the picture of a page to draw on; the page is made if it is the next one. */
export async function saveSample(context: Context, actor: Actor, sittingId: string, pageNo: number, jpeg: Uint8Array): Promise<LayoutView> {
  const { db, storage } = context;
  requireSamplePlace(context, actor, sittingId, pageNo);
  const blob = await storage.put(jpeg);
  inTransaction(db, () => {
    requireSamplePlace(context, actor, sittingId, pageNo);
    const { pages } = viewOf(db, sittingId);
    const layout = ensureLayout(db, sittingId);
    for (const { sample: _sample, ...page } of pages) saveLayoutPage(db, { layout: layout.id, ...page });
    if (pageNo > pages.length) saveLayoutPage(db, { layout: layout.id, pageNo, ...defaultPageMm });
    insertBlob(db, { ...blob, mediaType: 'image/jpeg' });
    setPageSample(db, layout.id, pageNo, blob.sha256);
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'layout-changed', sitting: sittingId, subject: layout.id, after: { sample: { pageNo, sha256: blob.sha256 } } });
  });
  return viewOf(db, sittingId);
}

export function sampleOf(context: Context, actor: Actor, sittingId: string, pageNo: number): string {
  const { pages } = layoutFor(context, actor, sittingId);
  const sample = pages.find((page) => page.pageNo === pageNo)?.sample;
  if (!sample) throw notFound();
  return sample;
}
