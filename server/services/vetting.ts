import { v7 as uuidv7 } from 'uuid';
import { inTransaction } from '../../db/client';
import { draftedItems, findDraftedItem, numbersOf, type DraftedItem } from '../../db/queries/papers';
import { checkOf, hasMade, insertCheck, insertVetting, vettingsOf } from '../../db/queries/vetting';
import { work } from '../../shared/chemistry/work';
import type { BodyOf } from '../../shared/contracts/route';
import type { VettingItem, vetItem as vetContract } from '../../shared/contracts/vetting';
import { itemLabel } from '../../shared/marking/item-label';
import { readTyped } from '../../shared/marking/read-typed';
import { emptyContext } from '../../shared/marking/scheme';
import { markAnswer } from '../../shared/marking/verdict';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { conflict, invalidRequest, notAllowed, notFound } from '../errors';
import { recordAct } from './audit';
import { schemeInWords } from './scheme-words';
import { schemeHash, storeScheme } from './schemes';
import { bumpSitting, requireSitting } from './sitting-access';

const vetters = ['lead', 'external'] as const;

function viewOf({ db }: Context, actor: Actor, { item, scheme }: DraftedItem): VettingItem {
  const hash = schemeHash(scheme);
  const made = hasMade(db, item.id, actor.personId);
  const mine = checkOf(db, item.id, hash, actor.personId) ?? null;
  const isUncovered = made || mine !== null;
  const worked = work(scheme.asked);
  return {
    itemId: item.id,
    number: item.number,
    label: itemLabel(scheme),
    quantity: scheme.asked.quantity,
    prompt: item.prompt,
    maxGrains: item.maxGrains,
    kind: scheme.kind,
    units: [...scheme.units],
    cannotVet: made ? 'You made or changed this item. Somebody else has to vet it.' : null,
    mine,
    key: isUncovered ? scheme.key.text : null,
    derivation: isUncovered && worked.ok ? worked.value.derivation : null,
    otherDerivation: isUncovered && worked.ok ? worked.value.otherDerivation : null,
    decides: isUncovered ? schemeInWords(scheme, numbersOf(db, item.sitting)) : [],
    vettings: vettingsOf(db, item.id, hash).map(({ person, by, ...vetting }) => ({ ...vetting, by: by ?? 'somebody', isOwn: person === actor.personId })),
    rev: item.rev,
  };
}

/** The paper as a second person vets it. */
export function vettingOf(context: Context, actor: Actor, sittingId: string): VettingItem[] {
  requireSitting(context, actor, sittingId, vetters);
  return draftedItems(context.db, sittingId).map((drafted) => viewOf(context, actor, drafted));
}

function requireVetted(context: Context, actor: Actor, itemId: string, rev: number): DraftedItem & { readonly sittingId: string } {
  const drafted = findDraftedItem(context.db, itemId);
  if (!drafted) throw notFound();
  const { sitting } = requireSitting(context, actor, drafted.item.sitting, vetters);
  if (hasMade(context.db, itemId, actor.personId)) throw notAllowed('You made or changed this item. Somebody else has to vet it.');
  if (drafted.item.rev !== rev) throw conflict('The item was changed meanwhile. Look at it anew.', viewOf(context, actor, drafted));
  return { ...drafted, sittingId: sitting.id };
}

/** Keeps what a vetter worked out for an item, then uncovers its key to them. */
export function checkKey(context: Context, actor: Actor, itemId: string, rev: number, text: string): VettingItem {
  const { db, clock } = context;
  const found = requireVetted(context, actor, itemId, rev);
  const read = readTyped(text, found.scheme);
  if (!read.ok) {
    const message = read.unfinished ? 'This is not yet a value.' : read.message;
    throw invalidRequest(message, { text: message });
  }
  inTransaction(db, () => {
    const { scheme, sittingId } = requireVetted(context, actor, itemId, rev);
    const { rule } = markAnswer(scheme, { text }, emptyContext);
    const id = uuidv7();
    insertCheck(db, { id, item: itemId, itemScheme: storeScheme(db, scheme), person: actor.personId, text, agrees: rule === 'key' || rule === 'rounding', at: clock.now() });
    recordAct(context, { actor: actor.personId, act: 'key-worked', sitting: sittingId, subject: itemId, after: { check: id } });
  });
  return viewOf(context, actor, found);
}

/** Signs an item or sends it back with a comment, after its key was worked. */
export function vetItem(context: Context, actor: Actor, itemId: string, rev: number, { outcome, comment }: BodyOf<typeof vetContract>): VettingItem {
  const { db, clock } = context;
  const found = requireVetted(context, actor, itemId, rev);
  inTransaction(db, () => {
    const { scheme, sittingId } = requireVetted(context, actor, itemId, rev);
    const hash = storeScheme(db, scheme);
    if (!checkOf(db, itemId, hash, actor.personId)) throw conflict('Work the key yourself first. It is uncovered then.');
    if (outcome === 'sent-back' && comment === null) throw invalidRequest('Say what is to be changed.', { comment: 'Say what is to be changed.' });
    const id = uuidv7();
    insertVetting(db, { id, item: itemId, itemScheme: hash, person: actor.personId, outcome, comment, at: clock.now() });
    bumpSitting(db, sittingId);
    recordAct(context, { actor: actor.personId, act: 'item-vetted', sitting: sittingId, subject: itemId, after: { vetting: id, outcome, itemScheme: hash } });
  });
  return viewOf(context, actor, found);
}
