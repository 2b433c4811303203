import { z } from 'zod';
import { itemDraft } from './items';
import { idParams, uuid } from './parts';
import { defineRoute } from './route';

export const bankItem = z.object({
  /** The newest item of its content. */
  itemId: uuid,
  label: z.string(),
  prompt: z.string(),
  key: z.string(),
  marks: z.string(),
  /** Sittings that used it, newest first. */
  usedIn: z.array(z.string()),
  draft: itemDraft,
});
export type BankItem = z.infer<typeof bankItem>;

export const getItemBank = defineRoute({
  method: 'get',
  path: '/sittings/:id/item-bank',
  summary: 'Items of the other sittings of the course, each content once, newest first: to be used again.',
  access: { who: 'course', roles: ['lead'] },
  params: idParams,
  response: z.object({ items: z.array(bankItem) }),
});

export const itemBankRoutes = { getItemBank };
