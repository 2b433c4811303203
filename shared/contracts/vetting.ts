import { z } from 'zod';
import { itemKinds, vettingOutcomes } from './enums';
import { grains, idParams, instant, rev, uuid } from './parts';
import { defineRoute } from './route';

const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

export const vettingItem = z.object({
  itemId: uuid,
  number: z.int(),
  label: z.string(),
  quantity: z.string(),
  prompt: z.string(),
  maxGrains: grains,
  /** What an answer may carry; empty for a pure number. */
  kind: z.enum(itemKinds),
  units: z.array(z.string()),
  /** Why this person cannot vet it, or null. */
  cannotVet: z.string().nullable(),
  /** What this person worked out; the key is uncovered from then on. */
  mine: z.object({ text: z.string(), agrees: z.boolean(), at: instant }).nullable(),
  key: z.string().nullable(),
  derivation: z.unknown(),
  /** Of the second electron of a difference. */
  otherDerivation: z.unknown(),
  /** What else the scheme decides, in words; empty while the key is covered. */
  decides: z.array(z.object({ name: z.string(), words: z.string() })),
  /** Signatures and returns of the scheme as it stands, newest first. */
  vettings: z.array(z.object({ by: z.string(), isOwn: z.boolean(), outcome: z.enum(vettingOutcomes), comment: z.string().nullable(), at: instant })),
  rev,
});
export type VettingItem = z.infer<typeof vettingItem>;

export const getVetting = defineRoute({
  method: 'get',
  path: '/sittings/:id/vetting',
  summary: 'The items of a paper to be vetted; each key covered until one has worked it.',
  access: overseers,
  params: idParams,
  response: z.object({ items: z.array(vettingItem) }),
});

export const checkKey = defineRoute({
  method: 'put',
  path: '/items/:id/vetting-check',
  summary: 'Write the value one has worked out; the key is uncovered then. Names the rev it saw.',
  access: overseers,
  params: idParams,
  body: z.strictObject({ text: z.string().min(1).max(64) }),
  response: vettingItem,
});

export const vetItem = defineRoute({
  method: 'post',
  path: '/items/:id/vetting',
  summary: 'Sign an item or send it back. Not by who made it; names the rev it saw.',
  access: overseers,
  params: idParams,
  body: z.strictObject({ outcome: z.enum(vettingOutcomes), comment: z.string().trim().min(1).max(500).nullable() }),
  response: vettingItem,
});

export const vettingRoutes = { getVetting, checkKey, vetItem };
