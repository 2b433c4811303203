import { useEffect, useRef, useState } from 'react';
import type { LedgerRow } from '../../contracts/ledger';
import { touchedRows } from './touched';

const shownMs = 2_000;
const none: ReadonlySet<string> = new Set();

/** Rows on view that someone else has just changed, for two seconds; and a way to say that the next change of one is one's own. */
export function useTouched(rows: readonly LedgerRow[]): { touched: ReadonlySet<string>; isOwn: (answerId: string) => void } {
  const [touched, setTouched] = useState(none);
  const seen = useRef(new Map<string, number>());
  const own = useRef(new Set<string>());
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const stand = rows.map(({ answerId, rev }) => `${answerId} ${rev}`).join('\n');
  const latest = useRef(rows);
  useEffect(() => {
    latest.current = rows;
  });
  useEffect(() => {
    const changed = touchedRows(seen.current, latest.current, own.current);
    for (const { answerId, rev } of latest.current) {
      if (rev > (seen.current.get(answerId) ?? rev)) own.current.delete(answerId);
      seen.current.set(answerId, rev);
    }
    if (changed.length === 0) return;
    setTouched(new Set(changed));
    clearTimeout(timer.current);
    timer.current = setTimeout(() => setTouched(none), shownMs);
  }, [stand]);
  useEffect(() => () => clearTimeout(timer.current), []);
  return { touched, isOwn: (answerId) => void own.current.add(answerId) };
}
