import { v7 as uuidv7 } from 'uuid';
import { inTransaction, type Database } from '../../db/client';
import { answerBoxCounts, deleteItem, draftedItems, findDraftedItem, insertItem, lastItemNumber, numberItem, paperLockedAt, updateItem, type DraftedItem } from '../../db/queries/papers';
import type { ItemDraft, ItemView, WorkedDraft } from '../../shared/contracts/items';
import type { ItemScheme } from '../../shared/marking/scheme';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notFound } from '../errors';
import { recordAct } from './audit';
import { proposedPrompt } from './drafts/asked-of';
import { draftOf } from './drafts/draft-of';
import { readDraft, type Place } from './drafts/read-draft';
import { workDraft } from './drafts/work-draft';
import { bumpSitting, requireOpenPaper, requireSitting, type SittingAccess } from './sitting-access';
import { schemeHash } from './schemes';

interface ItemList {
  readonly lockedAt: number | null;
  readonly items: ItemView[];
}

const linked = (items: readonly DraftedItem[]): Place['items'] => items.map(({ item, scheme }) => ({ id: item.id, number: item.number, scheme }));

function viewOf({ item, scheme }: DraftedItem, items: Place['items'], answerBoxes: number): ItemView {
  const draft = draftOf(scheme, item.prompt);
  const { id, number, prompt, maxGrains, rev } = item;
  return { id, sittingId: item.sitting, number, draft, prompt, worked: workDraft(draft, { items, number }), maxGrains, hasAnswerBox: answerBoxes === 1, rev };
}

/** Where an item stands on its paper; one that is not made yet comes last. */
export function placeOf(db: Database, sittingId: string, itemId: string | null): Place {
  const items = linked(draftedItems(db, sittingId));
  return { items, number: items.find(({ id }) => id === itemId)?.number ?? items.length + 1 };
}

function listOf(db: Database, sittingId: string): ItemList {
  const boxes = answerBoxCounts(db, sittingId, 1);
  const drafted = draftedItems(db, sittingId);
  const paper = linked(drafted);
  const items = drafted.map((one) => viewOf(one, paper, boxes.get(one.item.id) ?? 0));
  return { lockedAt: paperLockedAt(db, sittingId), items };
}

/** The paper with its keys, for those who may see them. */
export function itemsOf(context: Context, actor: Actor, sittingId: string): ItemList {
  requireSitting(context, actor, sittingId, ['lead', 'external']);
  return listOf(context.db, sittingId);
}

interface ItemAccess extends SittingAccess {
  readonly drafted: DraftedItem;
}

export function requireItem(context: Context, actor: Actor, itemId: string, roles: readonly ('lead' | 'external')[]): ItemAccess {
  const drafted = findDraftedItem(context.db, itemId);
  if (!drafted) throw notFound();
  return { drafted, ...requireSitting(context, actor, drafted.item.sitting, roles) };
}

export function itemFor(context: Context, actor: Actor, itemId: string): ItemView {
  const { drafted } = requireItem(context, actor, itemId, ['lead', 'external']);
  return viewOf(drafted, linked(draftedItems(context.db, drafted.item.sitting)), answerBoxCounts(context.db, drafted.item.sitting, 1).get(itemId) ?? 0);
}

/** The scheme of a draft that can be stored, or a refusal that names its fields. */
function storable(draft: ItemDraft, place: Place): { scheme: ItemScheme; prompt: string } {
  const { scheme, refusals } = readDraft(draft, place);
  const [first] = refusals;
  if (!scheme || first) throw invalidRequest(first?.message ?? 'The item cannot be worked.', Object.fromEntries(refusals.map(({ path, message }) => [path, message])));
  return { scheme, prompt: draft.prompt ?? proposedPrompt(scheme) };
}

/** Adds an item at the end of an open paper; its key is computed here. */
export function createItem(context: Context, actor: Actor, sittingId: string, draft: ItemDraft): ItemView {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  const id = uuidv7();
  inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    requireOpenPaper(context, sitting);
    const { scheme, prompt } = storable(draft, placeOf(db, sittingId, null));
    const number = lastItemNumber(db, sittingId) + 1;
    if (number > 200) throw invalidRequest('A paper has at most 200 items.');
    insertItem(db, { id, sitting: sittingId, number, prompt, kind: scheme.kind, maxGrains: scheme.maxGrains }, scheme);
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'item-made', sitting: sittingId, subject: id, after: { number, scheme: schemeHash(scheme) } });
  });
  return itemFor(context, actor, id);
}

/** Stores the draft of an item of an open paper. What is stored may still have problems that keep it from being locked. */
export function saveItem(context: Context, actor: Actor, itemId: string, rev: number, draft: ItemDraft): ItemView {
  const { db } = context;
  requireItem(context, actor, itemId, ['lead']);
  inTransaction(db, () => {
    const { drafted, sitting } = requireItem(context, actor, itemId, ['lead']);
    requireOpenPaper(context, sitting);
    if (drafted.item.rev !== rev) throw conflict('Someone changed this item meanwhile. Yours was not stored.', itemFor(context, actor, itemId));
    const { scheme, prompt } = storable(draft, placeOf(db, sitting.id, itemId));
    updateItem(db, itemId, prompt, scheme);
    bumpSitting(db, sitting.id);
    const before = { scheme: schemeHash(drafted.scheme), prompt: drafted.item.prompt };
    recordAct(context, { actor: actor.personId, act: 'item-changed', sitting: sitting.id, subject: itemId, before, after: { scheme: schemeHash(scheme), prompt } });
  });
  return itemFor(context, actor, itemId);
}

/** Removes an item and its boxes from an open paper; the items after it move up. */
export function removeItem(context: Context, actor: Actor, itemId: string, rev: number): void {
  const { db } = context;
  requireItem(context, actor, itemId, ['lead']);
  inTransaction(db, () => {
    const { drafted, sitting } = requireItem(context, actor, itemId, ['lead']);
    requireOpenPaper(context, sitting);
    if (drafted.item.rev !== rev) throw conflict('Someone changed this item meanwhile. It was not removed.', itemFor(context, actor, itemId));
    const followers = draftedItems(db, sitting.id).filter(({ scheme: { followThrough } }) => followThrough?.from === itemId || followThrough?.second?.from === itemId);
    if (followers.length > 0) throw invalidRequest(`Item ${followers.map(({ item }) => item.number).join(' and ')} follows from this one. Take that link away first.`);
    deleteItem(db, itemId);
    draftedItems(db, sitting.id).forEach(({ item }, index) => numberItem(db, item.id, index + 1));
    bumpSitting(db, sitting.id);
    const before = { number: drafted.item.number, scheme: schemeHash(drafted.scheme), prompt: drafted.item.prompt };
    recordAct(context, { actor: actor.personId, act: 'item-removed', sitting: sitting.id, subject: itemId, before });
  });
}

/** Numbers the items of an open paper in the order given, which must name each of them once. */
export function orderItems(context: Context, actor: Actor, sittingId: string, order: readonly string[]): ItemList {
  const { db } = context;
  requireSitting(context, actor, sittingId, ['lead']);
  inTransaction(db, () => {
    const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
    requireOpenPaper(context, sitting);
    const before = draftedItems(db, sittingId).map(({ item }) => item.id);
    const isSameSet = order.length === before.length && new Set(order).size === order.length && before.every((id) => order.includes(id));
    if (!isSameSet) throw conflict('The paper has other items by now. The order was not changed.', listOf(db, sittingId));
    order.forEach((id, index) => numberItem(db, id, index + 1));
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'items-ordered', sitting: sittingId, subject: sittingId, before: { items: before }, after: { items: order } });
  });
  return listOf(db, sittingId);
}

/** Works a draft without storing it. */
export function workKey(context: Context, actor: Actor, { sittingId, itemId, draft }: { sittingId: string; itemId: string | null; draft: ItemDraft }): WorkedDraft {
  requireSitting(context, actor, sittingId, ['lead']);
  return workDraft(draft, placeOf(context.db, sittingId, itemId));
}
