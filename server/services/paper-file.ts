import { createHash } from 'node:crypto';
import { inTransaction, type Database } from '../../db/client';
import { updateSitting } from '../../db/queries/courses';
import { boxesOfLayout, findLayout, layoutPages } from '../../db/queries/layouts';
import { draftedItems } from '../../db/queries/papers';
import type { SentBox } from '../../shared/contracts/layouts';
import { paperSchemaPath, type FileItem, type PaperFile } from '../../shared/contracts/paper-file';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest } from '../errors';
import { draftOf } from './drafts/draft-of';
import { draftOfFileItem, fileItemOf, readFileItems } from './drafts/file-items';
import { createItem, removeItem } from './items';
import { saveLayout } from './layouts';
import { requireOpenPaper, requireSitting } from './sitting-access';

const drawnOrdinal = 1;

function fileOf(db: Database, sittingId: string, title: string): PaperFile {
  const items = draftedItems(db, sittingId);
  const numbers = new Map(items.map(({ item }, index) => [item.id, index + 1]));
  const layout = findLayout(db, sittingId, drawnOrdinal);
  return {
    $schema: `/api${paperSchemaPath}`,
    format: 'meniscus-paper',
    version: 1,
    title,
    items: items.map(({ item, scheme }) => fileItemOf(draftOf(scheme, item.prompt), (id) => numbers.get(id) ?? null)),
    pages: layout ? layoutPages(db, layout.id).map(({ widthMm, heightMm }) => ({ widthMm, heightMm })) : [],
    boxes: layout ? boxesOfLayout(db, layout.id).map(({ item, pageNo, use, x, y, w, h }) => ({ item: item === null ? null : (numbers.get(item) ?? null), pageNo, use, x, y, w, h })) : [],
  };
}

/** Names a paper by all that its file says, so that an edit of any item or region is noticed. */
export const paperMark = (file: PaperFile): string => createHash('sha256').update(JSON.stringify(file)).digest('hex').slice(0, 32);

export const paperMarkOf = (context: Context, sittingId: string, title: string): string => paperMark(fileOf(context.db, sittingId, title));

export function paperFileFor(context: Context, actor: Actor, sittingId: string): PaperFile {
  const { sitting } = requireSitting(context, actor, sittingId, ['lead', 'external']);
  return fileOf(context.db, sittingId, sitting.title);
}

/** Throws with every field of every item that keeps the file from being taken: `items.3.asked.electron`. */
function requireSoundItems({ items }: PaperFile): void {
  const { refusals } = readFileItems(items);
  const [first] = refusals;
  if (!first) return;
  throw invalidRequest(`Item ${first.place}: ${first.message}`, Object.fromEntries(refusals.map(({ place, path, message }) => [`items.${place - 1}.${path}`, message])));
}

/** The boxes of a file, each with the id of its item. */
const boxesFor = ({ boxes }: PaperFile, ids: readonly string[]): SentBox[] =>
  boxes.map(({ item, ...box }, index) => {
    const id = item === null ? null : ids[item - 1];
    if (id === undefined) throw invalidRequest(`Box ${index + 1}: the paper has no item ${item}.`, { [`boxes.${index}.item`]: 'There is no such item.' });
    return { ...box, item: id };
  });

/** Throws unless the paper is open and still what the lead saw of it. */
export function requireSeenPaper(context: Context, actor: Actor, sittingId: string, mark: string): void {
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  requireOpenPaper(context, sitting);
  const file = fileOf(context.db, sittingId, sitting.title);
  if (paperMark(file) !== mark) throw conflict('Someone changed this paper meanwhile. The file was not taken.', file);
}

/** The items of a paper give way to others, in their order; the boxes of those that go, go too. Inside a transaction. */
export function replaceItems(context: Context, actor: Actor, sittingId: string, items: readonly FileItem[]): string[] {
  for (const { item } of draftedItems(context.db, sittingId).reverse()) removeItem(context, actor, item.id, item.rev);
  const ids: string[] = [];
  for (const item of items) ids.push(createItem(context, actor, sittingId, draftOfFileItem(item, (place) => ids[place - 1] ?? '')).id);
  return ids;
}

/** Replaces items and regions of an open paper by those of a file, all or nothing; keys are worked here. */
export function takePaperFile(context: Context, actor: Actor, sittingId: string, mark: string, file: PaperFile): PaperFile {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  inTransaction(db, () => {
    requireSeenPaper(context, actor, sittingId, mark);
    requireSoundItems(file);
    const ids = replaceItems(context, actor, sittingId, file.items);
    const layout = findLayout(db, sittingId, drawnOrdinal);
    if (layout || file.pages.length > 0 || file.boxes.length > 0) saveLayout(context, actor, sittingId, layout?.rev ?? 0, { pages: file.pages, boxes: boxesFor(file, ids) });
    updateSitting(db, sittingId, {});
  });
  return paperFileFor(context, actor, sittingId);
}
