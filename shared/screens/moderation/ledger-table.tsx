import { createColumnHelper, tableFeatures, useTable } from '@tanstack/react-table';
import { useVirtualizer } from '@tanstack/react-virtual';
import { createElement, useEffect, useRef } from 'react';
import { View } from 'react-native';
import type { LedgerQuestion } from '../../client/ledger';
import type { LedgerSort } from '../../contracts/enums';
import type { LedgerRow } from '../../contracts/ledger';
import { GraduatedGutter } from '../../ui/graduated-gutter';
import { HeadCell, TableHead } from '../../ui/table-parts';
import { useColors } from '../../ui/theme';
import { useIsPhone } from '../../ui/use-breakpoint';
import { cardHeight, LedgerCard, LedgerLine, rooms, type ColumnKey } from './ledger-row';
import { words } from './words';

interface LedgerTableProps {
  readonly question: LedgerQuestion;
  readonly total: number;
  readonly heldOffsets: readonly number[];
  readonly rowAt: (row: number) => LedgerRow | undefined;
  readonly chosen: number;
  /** Without the scale, where the sheet needs the room. */
  readonly isNarrow: boolean;
  readonly onView: (from: number, to: number) => void;
  readonly onChoose: (row: number) => void;
  readonly onSort: (sort: LedgerSort) => void;
}

const features = tableFeatures({});
const column = createColumnHelper<typeof features, LedgerRow>();
const sortOf: Readonly<Partial<Record<ColumnKey, LedgerSort>>> = { candidate: 'candidate', item: 'item', pair: 'state', scale: 'value', mark: 'mark' };
const columns = (Object.keys(words.columns) as ColumnKey[]).map((key) => column.display({ id: key, header: words.columns[key] }));
const wideOnly: ReadonlySet<string> = new Set<ColumnKey>(['scale']);
const none: LedgerRow[] = [];

/** The rows of the ledger, virtual; the server sorts. Rows that have not come yet are lines without values. */
export function LedgerTable(props: LedgerTableProps) {
  const { question, total, heldOffsets, rowAt, chosen, isNarrow, onView, onChoose, onSort } = props;
  const colors = useColors();
  const isPhone = useIsPhone();
  const host = useRef<HTMLDivElement>(null);
  const height = isPhone ? cardHeight : 40;
  const table = useTable({ features, columns, data: none });
  const keys = table
    .getAllLeafColumns()
    .map(({ id }) => id as ColumnKey)
    .filter((key) => !isNarrow || !wideOnly.has(key));
  const virtual = useVirtualizer({ count: total, getScrollElement: () => host.current, estimateSize: () => height, overscan: 8 });
  const items = virtual.getVirtualItems();
  const from = items[0]?.index ?? 0;
  const to = items.at(-1)?.index ?? 0;
  useEffect(() => virtual.measure(), [virtual, height]);
  useEffect(() => onView(from, to), [from, to, onView]);
  useEffect(() => {
    if (chosen >= 0 && chosen < total) virtual.scrollToIndex(chosen, { align: 'auto' });
  }, [chosen, total, virtual]);
  const sorted = question.direction === 'up' ? 'ascending' : 'descending';
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
      <View role="table" aria-label={words.title} {...({ 'aria-rowcount': total + 1 } as object)} style={{ flex: 1, minWidth: 0 }}>
        {isPhone ? null : (
          <View role="rowgroup">
            <TableHead>
              {keys.map((key) => {
                const sort = sortOf[key];
                return (
                  <HeadCell key={key} {...rooms[key]} sorted={sort === question.sort ? sorted : null} onSort={sort ? () => onSort(sort) : undefined}>
                    {words.columns[key]}
                  </HeadCell>
                );
              })}
            </TableHead>
          </View>
        )}
        {createElement(
          'div',
          { ref: host, role: 'rowgroup', 'data-testid': 'ledger-rows', style: { flex: 1, minHeight: 0, overflowY: 'auto', overflowX: 'hidden', position: 'relative' } },
          <View style={{ height: virtual.getTotalSize() }}>
            {items.map(({ index, start }) => {
              const row = rowAt(index);
              return (
                <View key={index} style={{ position: 'absolute', left: 0, right: 0, top: start, height }}>
                  {row === undefined ? (
                    <View role="row" style={{ height, borderBottomWidth: 1, borderColor: colors.hair }}>
                      <View role="cell" />
                    </View>
                  ) : isPhone ? (
                    <LedgerCard row={row} index={index} isChosen={index === chosen} onOpen={() => onChoose(index)} />
                  ) : (
                    <LedgerLine row={row} columns={keys} index={index} isChosen={index === chosen} isRepeated={rowAt(index - 1)?.candidateNumber === row.candidateNumber} onOpen={() => onChoose(index)} />
                  )}
                </View>
              );
            })}
          </View>,
        )}
      </View>
      {isPhone ? null : <GraduatedGutter total={total} marked={heldOffsets} from={from} to={to + 1} onGo={(row) => virtual.scrollToIndex(row, { align: 'start' })} />}
    </View>
  );
}
