import { columnVisibilityFeature, createColumnHelper, functionalUpdate, rowSortingFeature, tableFeatures, useTable } from '@tanstack/react-table';
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
import type { Place } from './place';
import { words } from './words';

interface LedgerTableProps {
  readonly question: LedgerQuestion;
  readonly total: number;
  readonly heldOffsets: readonly number[];
  readonly rowAt: (row: number) => LedgerRow | undefined;
  readonly place: Place;
  /** Answers just changed by someone else. */
  readonly touched: ReadonlySet<string>;
  /** Without the scale, where the sheet needs the room. */
  readonly isNarrow: boolean;
  readonly onView: (from: number, to: number) => void;
  readonly onChoose: (row: number) => void;
  readonly onSort: (sort: LedgerSort, direction: 'up' | 'down') => void;
}

const features = tableFeatures({ rowSortingFeature, columnVisibilityFeature });
const helper = createColumnHelper<typeof features, LedgerRow>();
/** What the server sorts by; every column is named by what it shows. */
const sortOf: Readonly<Partial<Record<ColumnKey, LedgerSort>>> = { candidate: 'candidate', item: 'item', pair: 'state', scale: 'value', mark: 'mark' };
const keys = Object.keys(words.columns) as ColumnKey[];
// NOTE without an accessor a column counts as one that cannot be sorted; its value is never read, because the server sorts.
const columns = keys.map((key) => helper.accessor((): unknown => null, { id: key, header: words.columns[key], enableSorting: sortOf[key] !== undefined, sortDescFirst: false }));
const none: LedgerRow[] = [];
const lineHeight = 40;
const overscan = 8;

/** The rows of the ledger, virtual; the server sorts. Rows that have not come yet are lines without values. */
export function LedgerTable(props: LedgerTableProps) {
  const { question, total, heldOffsets, rowAt, place, touched, isNarrow, onView, onChoose, onSort } = props;
  const colors = useColors();
  const isPhone = useIsPhone();
  const host = useRef<HTMLDivElement>(null);
  const height = isPhone ? cardHeight : lineHeight;
  const sorting = keys.filter((key) => sortOf[key] === question.sort).map((id) => ({ id: id as string, desc: question.direction === 'down' }));
  const table = useTable({
    features,
    columns,
    data: none,
    manualSorting: true,
    enableSortingRemoval: false,
    state: { sorting, columnVisibility: { scale: !isNarrow } },
    onSortingChange: (updater) => {
      const [first] = functionalUpdate(updater, sorting);
      const sort = sortOf[first?.id as ColumnKey];
      if (first && sort) onSort(sort, first.desc ? 'down' : 'up');
    },
  });
  const shown = table.getVisibleLeafColumns();
  const shownKeys = shown.map(({ id }) => id as ColumnKey);
  const virtual = useVirtualizer({ count: total, getScrollElement: () => host.current, estimateSize: () => height, overscan });
  const from = virtual.range?.startIndex ?? 0;
  const to = virtual.range?.endIndex ?? 0;
  const { at } = place;
  useEffect(() => virtual.measure(), [virtual, height]);
  useEffect(() => onView(from, to), [from, to, onView]);
  useEffect(() => {
    if (at >= 0 && at < total) virtual.scrollToIndex(at, { align: 'auto' });
  }, [at, total, virtual]);
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
      <View role="table" aria-label={words.title} {...({ 'aria-rowcount': total + 1 } as object)} style={{ flex: 1, minWidth: 0 }}>
        {isPhone ? null : (
          <View role="rowgroup">
            <TableHead>
              {shown.map((column) => {
                const key = column.id as ColumnKey;
                const sorted = column.getIsSorted();
                return (
                  <HeadCell key={key} {...rooms[key]} sorted={sorted === false ? null : sorted === 'asc' ? 'ascending' : 'descending'} onSort={column.getCanSort() ? () => column.toggleSorting() : undefined}>
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
            {virtual.getVirtualItems().map(({ index, start }) => {
              const row = rowAt(index);
              const isChosen = row !== undefined && row.answerId === place.id;
              const isTouched = row !== undefined && touched.has(row.answerId);
              return (
                <View key={index} style={{ position: 'absolute', left: 0, right: 0, top: start, height }}>
                  {row === undefined ? (
                    <View role="row" style={{ height, borderBottomWidth: 1, borderColor: colors.hair }}>
                      <View role="cell" />
                    </View>
                  ) : isPhone ? (
                    <LedgerCard row={row} index={index} isChosen={isChosen} isTouched={isTouched} onOpen={() => onChoose(index)} />
                  ) : (
                    <LedgerLine row={row} columns={shownKeys} index={index} isChosen={isChosen} isTouched={isTouched} isRepeated={rowAt(index - 1)?.candidateNumber === row.candidateNumber} onOpen={() => onChoose(index)} />
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
