import { draftedItems } from '../../db/queries/papers';
import { sittingsOfCourse } from '../../db/queries/courses';
import type { BankItem } from '../../shared/contracts/item-bank';
import { marksText } from '../../shared/marking/grains';
import { itemLabel } from '../../shared/marking/item-label';
import type { Actor } from '../auth/access';
import type { Context } from '../context';
import { draftOf } from './drafts/draft-of';
import { schemeHash } from './schemes';
import { requireSitting } from './sitting-access';

/** Items of the other sittings of a course, each content once, with the sittings that used it, newest first; what they follow from stays behind. */
export function itemBank(context: Context, actor: Actor, sittingId: string): BankItem[] {
  const { db } = context;
  const { sitting } = requireSitting(context, actor, sittingId, ['lead']);
  const bank = new Map<string, BankItem>();
  for (const other of sittingsOfCourse(db, sitting.course).filter(({ id }) => id !== sittingId)) {
    for (const { item, scheme } of draftedItems(db, other.id)) {
      const content = `${schemeHash(scheme)} ${item.prompt}`;
      const known = bank.get(content);
      const usedIn = [...(known?.usedIn ?? []), other.title];
      bank.set(content, known ? { ...known, usedIn } : { itemId: item.id, label: itemLabel(scheme), prompt: item.prompt, key: scheme.key.text, marks: marksText(item.maxGrains), usedIn, draft: { ...draftOf(scheme, item.prompt), followThrough: null } });
    }
  }
  return [...bank.values()];
}
