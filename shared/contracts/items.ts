import { z } from 'zod';
import { itemKinds } from './enums';
import { grains, idParams, instant, rev, uuid } from './parts';
import { defineRoute } from './route';

const leads = { who: 'course', roles: ['lead'] } as const;
const overseers = { who: 'course', roles: ['lead', 'external'] } as const;

export const bandKinds = ['absolute', 'relative', 'decimal-places', 'significant-figures'] as const;
export const answerPolicies = ['ask', 'none', 'last'] as const;
export const askedQuantities = ['zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm', 'electronegativity', 'difference', 'value'] as const;
export const askedConventions = ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count', 'scf', 'ionisation-energy', 'typed'] as const;
export const printedQuestions = ['greatest', 'least', 'increasing', 'decreasing'] as const;

const bandDraft = z.strictObject({
  name: z.string().trim().min(1, 'Name the band.').max(60),
  kind: z.enum(bandKinds),
  /** As typed: a half width such as 0.05, a per cent such as 5, or a count of places or figures. */
  width: z.string().max(16),
  marks: z.string().max(16),
});
export type BandDraft = z.infer<typeof bandDraft>;

/** Conventions whose value of the same question can be accepted beside the key. */
export const otherConventions = ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count', 'scf', 'ionisation-energy'] as const;

const alternativeDraft = z.strictObject({
  name: z.string().trim().min(1, 'Name the alternative.').max(60),
  /** The convention that gives the value; null for a value the lead adds, as typed. */
  convention: z.enum(otherConventions).nullable(),
  value: z.string().max(32),
  marks: z.string().max(16),
  reason: z.string().trim().max(300),
});
export type AlternativeDraft = z.infer<typeof alternativeDraft>;

/** A slip the scheme names, with its share as typed; 0 names it only. */
const slipDraft = z.strictObject({ id: z.string().max(60), marks: z.string().max(16) });

const electronDraft = z.strictObject({
  symbol: z.string().max(3),
  charge: z.int().min(-8).max(117),
  electron: z.string().max(3),
  /** A configuration other than the ground state, as typed. */
  configuration: z.string().trim().max(160).optional(),
});
export type ElectronDraft = z.infer<typeof electronDraft>;

/** A key that the lead types, with the value and unit as they would be written. */
const typedDraft = z.strictObject({ label: z.string().trim().max(60), value: z.string().max(32), unit: z.string().trim().max(12), source: z.string().trim().max(300) });

/** Options as printed, numbered from 1; which are right, the server works out. Part marks are of an order only. */
const printedDraft = z.strictObject({
  question: z.enum(printedQuestions),
  options: z.array(electronDraft).max(9),
  partMarks: z.array(z.strictObject({ inPlace: z.int().min(1).max(8), marks: z.string().max(16) })).max(8),
});
export type PrintedDraft = z.infer<typeof printedDraft>;

/** `from` and `second` are items of the same sitting that come earlier; `second` is of a difference, the electron taken off. */
const followDraft = z.strictObject({ from: uuid, second: uuid.nullable(), isTrivial: z.boolean() });
export type FollowDraft = z.infer<typeof followDraft>;

const methodDraft = z.strictObject({ id: z.string().min(1).max(40), text: z.string().trim().max(200), marks: z.string().max(16) });
export type MethodDraft = z.infer<typeof methodDraft>;

/** What the lead decides about an item, as typed. A key is among it only where the lead types it: all others the server computes. */
export const itemDraft = z.strictObject({
  kind: z.enum(itemKinds).default('numeric'),
  asked: electronDraft.extend({
    quantity: z.enum(askedQuantities),
    convention: z.enum(askedConventions),
    /** Of an electronegativity: the radius as the question states it, in ångström, and whether the electron counts itself. */
    radiusAngstrom: z.string().trim().max(12).optional(),
    countsItself: z.boolean().optional(),
    /** Of a difference: the electron taken off. */
    other: electronDraft.optional(),
    typed: typedDraft.optional(),
  }),
  /** Of a choice or an order. */
  printed: printedDraft.nullable().default(null),
  /** The decimals that the question asks for, where the key is a short decimal. */
  decimals: z.int().min(0).max(4),
  /** The significant figures that it asks for, where the key is none. */
  figures: z.int().min(2).max(6).default(4),
  /** Null: as the server proposes it from the rest. */
  prompt: z.string().trim().min(1, 'Write the question, or take the proposed one.').max(600).nullable(),
  marks: z.string().max(16),
  roundings: z.strictObject({ downToDecimals: z.int().min(0).max(4).nullable(), downToFigures: z.int().min(1).max(6).nullable().optional(), truncation: z.boolean() }),
  bands: z.array(bandDraft).max(8),
  alternatives: z.array(alternativeDraft).max(8).default([]),
  slips: z.array(slipDraft).max(60).default([]),
  followThrough: followDraft.nullable().default(null),
  /** Yes-or-no criteria that a reader strikes from the working; their marks are part of those of the item. */
  methodMarks: z.array(methodDraft).max(6).default([]),
  /** What a missing or wrong unit, or a reversed sign, costs once a paper, as typed; null without a rule. */
  unitCost: z.string().max(16).nullable().default(null),
  signCost: z.string().max(16).nullable().default(null),
  crossedOut: z.enum(answerPolicies),
  twoAnswers: z.enum(answerPolicies),
});
export type ItemDraft = z.infer<typeof itemDraft>;

export const itemProblem = z.object({ path: z.string(), message: z.string() });
export type ItemProblem = z.infer<typeof itemProblem>;

/** What follows from a draft. Key, derivation and scale are null while no key can be computed. */
export const workedDraft = z.object({
  label: z.string(),
  key: z.object({ value: z.string(), text: z.string(), decimals: z.int(), figures: z.int().nullable() }).nullable(),
  /** Of the key, where it has one; and all that an answer may carry. */
  unit: z.string(),
  units: z.array(z.string()),
  derivation: z.unknown(),
  /** Of the second electron of a difference. */
  otherDerivation: z.unknown(),
  /** The value of each printed option, where it has one. */
  options: z.array(z.string().nullable()),
  /** Earlier items that this one can follow from, in paper order; of a difference, whose electron each is. */
  sources: z.array(z.object({ id: uuid, number: z.int(), label: z.string(), of: z.enum(['first', 'second']) })),
  scale: z.unknown(),
  /** Accepted roundings as they would be written. */
  roundings: z.array(z.string()),
  bands: z.array(z.object({ from: z.string(), to: z.string() }).nullable()),
  /** The value of each alternative as printed; null while it has none. */
  alternatives: z.array(z.string().nullable()),
  /** Every slip that can be made on this item, the commonest first; a silent one gives the right number. */
  slips: z.array(z.object({ id: z.string(), letter: z.string(), name: z.string(), text: z.string(), differs: z.string(), feedback: z.string(), isSilent: z.boolean() })),
  /** Names of slips that cannot be made here at all. */
  noOccasion: z.array(z.string()),
  /** Slips and other conventions' values that a band would pay, nearest first. */
  guard: z.array(z.object({ kind: z.enum(['slip', 'convention']), name: z.string(), text: z.string(), band: z.string(), marks: z.string(), distance: z.string() })),
  /** Slips that an accepted rounding cannot tell from the key. */
  untold: z.array(z.object({ name: z.string(), text: z.string(), rounded: z.string(), decimals: z.int(), distance: z.string() })),
  /** What other conventions make of the same question, where they differ. */
  others: z.array(z.object({ convention: z.enum(otherConventions), name: z.string(), text: z.string() })),
  /** Subshells that hold an electron of this species. */
  electrons: z.array(z.string()),
  proposedPrompt: z.string(),
  maxGrains: grains.nullable(),
  problems: z.array(itemProblem),
});
export type WorkedDraft = z.infer<typeof workedDraft>;

export const itemView = z.object({
  id: uuid,
  sittingId: uuid,
  number: z.int(),
  draft: itemDraft,
  /** The question as it will be printed. */
  prompt: z.string(),
  worked: workedDraft,
  maxGrains: grains,
  hasAnswerBox: z.boolean(),
  rev,
});
export type ItemView = z.infer<typeof itemView>;

export const listItems = defineRoute({
  method: 'get',
  path: '/sittings/:id/items',
  summary: 'The items of a paper in order, with keys: never for readers.',
  access: overseers,
  params: idParams,
  response: z.object({ lockedAt: instant.nullable(), items: z.array(itemView) }),
});

export const makeItem = defineRoute({
  method: 'post',
  path: '/sittings/:id/items',
  summary: 'Add an item at the end of a paper that is open to change.',
  access: leads,
  params: idParams,
  body: itemDraft,
  response: itemView,
  status: 201,
});

export const getItem = defineRoute({
  method: 'get',
  path: '/items/:id',
  summary: 'One item with its worked key.',
  access: overseers,
  params: idParams,
  response: itemView,
});

export const saveItem = defineRoute({
  method: 'put',
  path: '/items/:id',
  summary: 'Store the draft of an item. Names the rev it saw.',
  access: leads,
  params: idParams,
  body: itemDraft,
  response: itemView,
});

export const removeItem = defineRoute({
  method: 'delete',
  path: '/items/:id',
  summary: 'Remove an item and its boxes from a paper that is open to change. Names the rev it saw.',
  access: leads,
  params: idParams,
  status: 204,
});

export const orderItems = defineRoute({
  method: 'put',
  path: '/sittings/:id/item-order',
  summary: 'Number the items in the order given.',
  access: leads,
  params: idParams,
  body: z.strictObject({ items: z.array(uuid).max(200) }),
  response: z.object({ lockedAt: instant.nullable(), items: z.array(itemView) }),
});

export const workKey = defineRoute({
  method: 'post',
  path: '/keys',
  summary: 'Work a draft: key, derivation, proposed wording, scale, and what is wrong, field by field. Stores nothing.',
  access: leads,
  body: z.strictObject({ sittingId: uuid, /** The item that the draft is of; null for one not made yet, which comes last. */ itemId: uuid.nullable().default(null), draft: itemDraft.extend({ prompt: z.string().max(600).nullable(), bands: z.array(bandDraft.extend({ name: z.string().max(60) })).max(8), alternatives: z.array(alternativeDraft.extend({ name: z.string().max(60) })).max(8).default([]) }) }),
  response: workedDraft,
});

export const spotTestResult = z.object({
  /** unfinished: not yet a value, without complaint. */
  outcome: z.enum(['marked', 'unfinished', 'refused']),
  grains: grains.nullable(),
  maxGrains: grains,
  head: z.string(),
  detail: z.string(),
  rule: z.string().nullable(),
  numbers: z.record(z.string(), z.string()),
  /** For the drawing; null when there is no value. */
  value: z.number().nullable(),
  /** Whether it would wait for the item it follows from. */
  waits: z.boolean(),
  /** What the candidate is told. */
  told: z.string(),
  refusedAt: z.int().nullable(),
});
export type SpotTestResult = z.infer<typeof spotTestResult>;

export const spotTest = defineRoute({
  method: 'post',
  path: '/items/:id/spot-test',
  summary: 'How a value would be marked, with the rule and its numbers; against the draft sent along, or as stored. Stores nothing.',
  access: leads,
  params: idParams,
  body: z.strictObject({
    text: z.string().min(1).max(64),
    draft: itemDraft.optional(),
    /** What else a mark may rest on: own values of the items followed from as written, and ids of method marks struck. */
    followed: z.string().max(64).optional(),
    second: z.string().max(64).optional(),
    method: z.array(z.string().max(40)).max(6).default([]),
  }),
  response: spotTestResult,
});

export const lockPaper = defineRoute({
  method: 'post',
  path: '/sittings/:id/lock',
  summary: 'Freeze paper and layout: make the first scheme, and scripts, pages and answers for the class list.',
  access: leads,
  params: idParams,
  /** With printed sheets nothing needs to be drawn: their layout comes with the printing. */
  body: z.strictObject({ isForPrinting: z.boolean().default(false) }),
  response: z.object({ lockedAt: instant, schemeOrdinal: z.int(), scripts: z.int(), answers: z.int() }),
});

export const itemRoutes = { listItems, makeItem, getItem, saveItem, removeItem, orderItems, workKey, spotTest, lockPaper };
