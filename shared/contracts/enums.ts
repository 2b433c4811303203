import type { PaperSize } from '../sheets/geometry';

/** Closed lists of words that the database, the interface and the screens share. */

export const membershipRoles = ['lead', 'reader', 'external'] as const;
export type MembershipRole = (typeof membershipRoles)[number];

export const sittingStatuses = ['draft', 'moderated', 'provisional', 'released'] as const;
export const deskModes = ['covered'] as const;
export const secondPolicies = ['none', 'all'] as const;
export type SecondPolicy = (typeof secondPolicies)[number];
export const totalRoundings = ['none', 'half', 'whole'] as const;
export type TotalRounding = (typeof totalRoundings)[number];
export const attendances = ['expected', 'present', 'absent', 'withdrawn', 'deferred', 'late'] as const;
export type Attendance = (typeof attendances)[number];

/** `choice`: one printed number is right; `order`: the printed numbers in their order. */
export const itemKinds = ['numeric', 'choice', 'order'] as const;

export const boxUses = ['answer', 'working', 'number'] as const;
export const bindingActs = ['bound', 'swapped', 'replaced', 'by-hand'] as const;
export const scriptOrigins = ['printed', 'spare', 'unprinted', 'by-hand'] as const;
export type ScriptOrigin = (typeof scriptOrigins)[number];

export const paperSizeNames = ['a4', 'letter'] as const satisfies readonly PaperSize[];
export const printingStates = ['making', 'made', 'failed'] as const;
/** Everyone without a page in, or of these only those who have no printed sheet. */
export const printedFor = ['all', 'without-sheet'] as const;

export const batchStates = ['open', 'done', 'cancelled'] as const;
/** sending: parts still to come; received: whole and waiting for work; done, refused and duplicate are ends. */
export const uploadStates = ['sending', 'received', 'done', 'refused', 'duplicate', 'cancelled'] as const;
export const pageImageStates = ['waiting', 'placed', 'loose', 'refused', 'discarded'] as const;
export const evidenceKinds = ['none', 'in', 'doubtful'] as const;
export const inkKinds = ['blank', 'unsure', 'written'] as const;
export const jobStates = ['waiting', 'running', 'done', 'dead', 'cancelled'] as const;

export const answerStates = [
  'not-read',
  'one-reading',
  'concordant',
  'discordant',
  'cannot-read',
  'blank',
  'set-aside',
  'ruled',
] as const;
/** No mark stands until a person has ruled. */
export const heldStates = ['discordant', 'cannot-read', 'set-aside'] as const satisfies readonly (typeof answerStates)[number][];
export type AnswerState = (typeof answerStates)[number];

export const leasePurposes = ['live'] as const;
export const readingPurposes = ['live', 'third'] as const;
export const readingEndings = ['taken-back', 'reopened', 'surplus'] as const;
export const rulingKinds = ['value', 'code', 'mark'] as const;
export type RulingKind = (typeof rulingKinds)[number];
export const scoreCauses = ['settled', 'ruled', 'amended', 'taken-back'] as const;

export const vettingOutcomes = ['signed', 'sent-back'] as const;

export const exportKinds = ['marks-csv'] as const;

export const auditActs = [
  'signed-in',
  'sign-in-refused',
  'signed-out',
  'signed-out-everywhere',
  'sitting-made',
  'sitting-changed',
  'item-made',
  'item-changed',
  'item-removed',
  'items-ordered',
  'paper-locked',
  'key-worked',
  'item-vetted',
  'class-list-imported',
  'attendance-changed',
  'layout-changed',
  'sheets-printed',
  'batch-made',
  'batch-cancelled',
  'file-received',
  'file-refused',
  'file-retried',
  'script-bound',
  'scripts-swapped',
  'script-by-hand',
  'number-read',
  'number-settled',
  'page-placed',
  'page-turned',
  'page-discarded',
  'page-loosened',
  'reading-recorded',
  'reading-taken-back',
  'third-reading-recorded',
  'ruled',
  'ruling-taken-back',
  'marks-exported',
] as const;
export type AuditAct = (typeof auditActs)[number];

/** The chips of the ledger: all, those that wait for the lead, or one state. */
export const ledgerChips = ['all', 'to-rule', ...answerStates] as const;
export type LedgerChip = (typeof ledgerChips)[number];
export const ledgerSorts = ['candidate', 'item', 'state', 'value', 'mark'] as const;
export type LedgerSort = (typeof ledgerSorts)[number];

/** Rows of files sent back with a batch; those that need someone come first. */
export const filesShown = 200;
