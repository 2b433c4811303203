import { useVirtualizer } from '@tanstack/react-virtual';
import { createElement, useRef } from 'react';
import { View } from 'react-native';
import { marksText } from '../../marking/grains';
import { Cell, HeadCell, TableHead, TableRow } from '../../ui/table-parts';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import type { Totals } from './marks-screen';
import { missingWords, words } from './words';

type Row = Totals['rows'][number];

const candidateWidth = 96;
const itemWidth = 62;
const totalWidth = 84;
const missingWidth = 150;
/** With more items than these a column has room for its number only. */
const labelled = 8;

/** Candidates by items. A mark that is missing says why in a word; a phone shows the total and what is missing. */
export function MarksTable({ totals }: { totals: Totals }) {
  const isPhone = useIsPhone();
  const host = useRef<HTMLDivElement>(null);
  const { rows, items } = totals;
  const virtual = useVirtualizer({ count: rows.length, getScrollElement: () => host.current, estimateSize: () => 40, overscan: 12 });
  const width = candidateWidth + (isPhone ? 0 : items.length * (itemWidth + 12)) + totalWidth + missingWidth + 70;
  const of = items.reduce((sum, { maxGrains }) => sum + maxGrains, 0);
  return createElement(
    'div',
    { ref: host, style: { flex: 1, minHeight: 0, overflow: 'auto' }, tabIndex: 0, 'aria-label': words.title, role: 'region', 'data-testid': 'marks-rows' },
    <View role="table" aria-label={words.title} {...({ 'aria-rowcount': rows.length + 1 } as object)} style={{ minWidth: isPhone ? undefined : width }}>
      <View role="rowgroup" style={{ position: 'sticky' as 'relative', top: 0, zIndex: 1 }}>
        <TableHead>
          <HeadCell width={candidateWidth}>{words.candidate}</HeadCell>
          {isPhone
            ? null
            : items.map(({ id, number, label }) => (
                <HeadCell key={id} width={itemWidth} align="right">
                  {items.length > labelled ? String(number) : `${number} ${label}`}
                </HeadCell>
              ))}
          <HeadCell width={totalWidth} align="right">{`${words.total} / ${marksText(of)}`}</HeadCell>
          <HeadCell grow={1}>{words.missing}</HeadCell>
        </TableHead>
      </View>
      <View role="rowgroup" style={{ height: virtual.getTotalSize(), position: 'relative' }}>
        {virtual.getVirtualItems().map(({ index, start }) => {
          const row = rows[index];
          return row ? (
            <View key={row.candidateId} style={{ position: 'absolute', left: 0, right: 0, top: start }}>
              <MarksRow row={row} index={index} isPhone={isPhone} />
            </View>
          ) : null;
        })}
      </View>
    </View>,
  );
}

function MarksRow({ row, index, isPhone }: { row: Row; index: number; isPhone: boolean }) {
  const away = words.attendance[row.attendance];
  return (
    <TableRow index={index + 2} testID={`marks-${row.candidateNumber}`}>
      <Cell width={candidateWidth}>
        <Text variant="readingS" tone={away === undefined ? 'ink' : 'ink3'}>
          {row.candidateNumber}
        </Text>
      </Cell>
      {isPhone
        ? null
        : row.marks.map(({ answerId, grains, state }) => (
            <Cell key={answerId} width={itemWidth} align="right">
              {grains === null ? (
                <Text variant="micro" tone={missingWords[state] === 'held' ? 'iodine' : 'ink3'}>
                  {away === undefined ? (missingWords[state] ?? '') : ''}
                </Text>
              ) : (
                <Text variant="small" isTabular tone={state === 'ruled' ? 'manganate' : 'ink'}>
                  {marksText(grains)}
                </Text>
              )}
            </Cell>
          ))}
      <Cell width={totalWidth} align="right">
        <Text weight={600} isTabular>
          {row.totalGrains === null ? '–' : marksText(row.totalGrains)}
        </Text>
      </Cell>
      <Cell grow={1}>
        <Text variant="small" tone={away === undefined ? 'ink2' : 'ink3'} lines={1}>
          {away ?? (row.missing.length === 0 ? '' : words.missingItems(row.missing))}
        </Text>
      </Cell>
    </TableRow>
  );
}
