import type { AnswerState } from '../../contracts/enums';

export const missingWords: Readonly<Partial<Record<AnswerState, string>>> = {
  'not-read': 'not read',
  'one-reading': 'due',
  discordant: 'held',
  'cannot-read': 'held',
  'set-aside': 'held',
};

export const words = {
  title: 'Marks',
  summary: (complete: number, all: number) => `${complete.toLocaleString('en-GB')} of ${all.toLocaleString('en-GB')} scripts have all their marks`,
  provisional: (board: string | null) => (board === null ? 'Provisional until the board of examiners confirms.' : `Provisional until the board of examiners confirms, planned for ${board}. The institution’s regulations come first.`),
  export: 'Export marks',
  exported: (name: string) => `${name} is saved where your browser keeps its downloads`,
  incompleteTitle: 'Some marks are missing',
  incomplete: (scripts: number) => `${scripts.toLocaleString('en-GB')} ${scripts === 1 ? 'script lacks' : 'scripts lack'} a mark. The file says which; their totals stay empty.`,
  anyway: 'Export what is there',
  wait: 'Not yet',
  candidate: 'Candidate',
  total: 'Total',
  missing: 'Missing',
  missingItems: (items: readonly number[]) => (items.length === 1 ? `item ${items[0]}` : items.length > 5 ? `${items.length} items` : `items ${items.join(', ')}`),
  none: 'No scripts yet',
  noneText: 'Marks appear once the paper is locked and the class list is in.',
  attendance: { absent: 'absent', withdrawn: 'withdrawn', deferred: 'deferred' } as Readonly<Record<string, string>>,
} as const;
