import type { AnswerState } from '../../contracts/enums';
import type { LedgerChip } from '../../contracts/enums';
import type { PairState } from '../../ui/pair-glyph';

const many = (n: number): string => n.toLocaleString('en-GB');

export const stateGlyphs: Readonly<Record<AnswerState, PairState>> = {
  'not-read': 'unread',
  'one-reading': 'single',
  concordant: 'concordant',
  discordant: 'discordant',
  'cannot-read': 'illegible',
  blank: 'blank',
  'set-aside': 'aside',
  ruled: 'ruled',
};

export const stateWords: Readonly<Record<AnswerState, string>> = {
  'not-read': 'not read',
  'one-reading': 'one reading',
  concordant: 'concordant',
  discordant: 'two readings differ',
  'cannot-read': 'can’t read',
  blank: 'blank',
  'set-aside': 'set aside',
  ruled: 'ruled',
};

export const chipWords: Readonly<Record<LedgerChip, string>> = {
  all: 'Whole ledger',
  'to-rule': 'To rule',
  discordant: 'Differ',
  'cannot-read': 'Can’t read',
  'set-aside': 'Set aside',
  ruled: 'Ruled',
  'one-reading': 'One reading',
  concordant: 'Concordant',
  blank: 'Blank',
  'not-read': 'Not read',
};

export const chipOrder: readonly LedgerChip[] = ['all', 'to-rule', 'discordant', 'cannot-read', 'set-aside', 'ruled', 'one-reading', 'concordant', 'blank', 'not-read'];

export const words = {
  title: 'Moderation ledger',
  find: 'Candidate or value',
  findHelp: '5.7* finds all that begin with 5.7',
  item: 'Item',
  allItems: 'All items',
  columns: { candidate: 'Candidate', item: 'Item', first: 'First', second: 'Second', pair: 'Pair', scale: 'On the scale', why: 'Why', mark: 'Mark' },
  due: 'due',
  covered: 'kept back',
  rows: (from: number, to: number, of: number) => (of === 0 ? 'no rows' : `rows ${many(from)} to ${many(to)} of ${many(of)}`),
  none: (filter: string) => `Nothing in the ledger is ${filter}.`,
  noneFound: (find: string) => `Nothing here fits “${find}”.`,
  clear: 'Clear the filters',
  notYet: 'No answers yet',
  notYetText: 'The ledger opens once the paper is locked and the class list is in.',
  keysTitle: 'All keys of the ledger',
  sheet: {
    name: (candidate: string, item: number, label: string) => `${candidate}, item ${item}, ${label}`,
    read: 'What do you read?',
    fromImage: 'from the image',
    yours: (said: string) => `You read ${said}.`,
    again: 'Read it again',
    blank: 'Blank',
    cannotRead: 'Can’t read',
    other: 'Other',
    record: 'That is what I read',
    opens: 'Opens, and uncovers, when your reading is in.',
    first: 'First',
    second: 'Second',
    more: 'Reading',
    asMine: 'as you read it',
    notAsMine: 'not as you read it',
    note: (note: string) => `Note: ${note}`,
    apart: (gap: string) => `${gap} apart`,
    stands: 'Stands',
    ruledBy: (isOwn: boolean) => (isOwn ? 'Ruled by you' : 'Ruled by another lead'),
    reason: 'Reason',
    reasonHelp: 'Asked because the ruling is neither reading, or changes a mark that stands.',
    needsReason: 'Say why, in a few words.',
    noReason: 'No reason is needed.',
    byHand: 'Rule a mark by hand',
    byHandBack: 'Rule what I read instead',
    marks: 'Marks',
    marksHelp: (of: string) => `From 0 to ${of}`,
    marksOpen: 'The scheme leaves this code to you. Rule a mark, with a reason.',
    ruleMark: (marks: string) => `Rule ${marks} marks`,
    ruleOpen: 'Rule a mark',
    takeBack: 'Take back',
    ruled: (what: string, who: string) => `Ruled ${what} for ${who}`,
    takenBack: (who: string) => `The ruling for ${who} was taken back`,
    conflict: 'Look at what is there now, then rule again if it is still needed.',
    next: 'Next to rule',
    noScan: 'No scan of this answer is in.',
    tabs: { history: 'History', derivation: 'Derivation', page: 'Whole page' },
    tabsLabel: 'More of this answer',
    readOnly: 'You see everything here and change nothing.',
    key: (key: string) => `key ${key}`,
    scheme: (ordinal: number) => `scheme ${ordinal}`,
  },
  acts: {
    read: 'read',
    'read-again': 'read again',
    'taken-back': 'took a reading back',
    surplus: 'read once more than asked',
    ruled: 'ruled',
    'ruling-ended': 'took the ruling back',
    scored: 'Scored',
  },
} as const;

export const keyGroups = [
  {
    head: 'Ledger',
    hints: [
      { keys: ['J', 'K'], does: 'next, previous row' },
      { keys: ['Enter'], does: 'open the sheet' },
      { keys: ['[', ']'], does: 'previous, next held row' },
      { keys: ['/'], does: 'find candidate or value' },
      { keys: ['Home', 'End'], does: 'first, last row' },
    ],
  },
  {
    head: 'Sheet',
    hints: [
      { keys: ['0–9'], does: 'your own reading, while the field has the focus' },
      { keys: ['B', 'X', 'S'], does: 'blank, can’t read, ask: while the field is empty' },
      { keys: ['W', '1–4'], does: 'crossed out, two answers, elsewhere, wrong page' },
      { keys: ['Enter'], does: 'record your reading, then rule as the button says' },
      { keys: ['U'], does: 'take back your last ruling' },
      { keys: ['H', 'D', 'P'], does: 'history, derivation, whole page' },
      { keys: ['Esc'], does: 'close the sheet' },
    ],
  },
] as const;
