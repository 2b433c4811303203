import type { LedgerChip } from '../../contracts/enums';

const verbs: Readonly<Record<Exclude<LedgerChip, 'all'>, string>> = {
  'to-rule': 'waits to be ruled',
  discordant: 'has two readings that differ',
  'cannot-read': 'was found unreadable',
  'set-aside': 'is set aside',
  ruled: 'is ruled',
  'one-reading': 'has one reading',
  concordant: 'has two readings that agree',
  blank: 'is blank',
  'not-read': 'is still unread',
};

interface Asked {
  readonly show: LedgerChip;
  readonly find: string;
  /** Number of the item asked for, if any. */
  readonly item: number | undefined;
}

/** Which filters leave nothing: "Nothing in item 6 fits “5.7*” and waits to be ruled." */
export function nothingHere({ show, find, item }: Asked): string {
  const claims = [...(find === '' ? [] : [`fits “${find}”`]), ...(show === 'all' ? [] : [verbs[show]])];
  const said = claims.length === 0 ? 'is here' : claims.join(' and ');
  return `Nothing${item === undefined ? '' : ` in item ${item}`} ${said}.`;
}
