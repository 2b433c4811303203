import type { LedgerQuestion } from '../../client/ledger';
import { ledgerChips, ledgerSorts } from '../../contracts/enums';

export type Params = Readonly<Record<string, string | string[] | undefined>>;

const one = (value: string | string[] | undefined): string => (Array.isArray(value) ? (value[0] ?? '') : (value ?? ''));

/** What the address asks of the ledger; what it does not know is as if it were not there. */
export function questionOf(params: Params): LedgerQuestion {
  return {
    show: ledgerChips.find((chip) => chip === one(params.show)) ?? 'all',
    item: one(params.item) === '' ? null : one(params.item),
    find: one(params.find),
    sort: ledgerSorts.find((sort) => sort === one(params.sort)) ?? 'candidate',
    direction: one(params.direction) === 'down' ? 'down' : 'up',
  };
}

/** The address for a question, without what is as usual. Undefined takes a name out of the address. */
export const paramsOf = ({ show, item, find, sort, direction }: LedgerQuestion): Record<string, string | undefined> => ({
  show: show === 'all' ? undefined : show,
  item: item ?? undefined,
  find: find === '' ? undefined : find,
  sort: sort === 'candidate' ? undefined : sort,
  direction: direction === 'up' ? undefined : direction,
});

/** The row after (1) or before (-1) one among rows that wait, going round at the ends; null when none waits. */
export function nextHeld(held: readonly number[], at: number, step: 1 | -1): number | null {
  if (held.length === 0) return null;
  if (step === 1) return held.find((row) => row > at) ?? held[0] ?? null;
  return held.findLast((row) => row < at) ?? held.at(-1) ?? null;
}
