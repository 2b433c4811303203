import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { LedgerRow } from '../../contracts/ledger';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { Cover } from '../../ui/cover';
import { MarkStand } from '../../ui/mark-stand';
import { PairGlyph } from '../../ui/pair-glyph';
import { ScaleRow } from '../../ui/scale-row';
import { Cell, TableRow, type ColumnRoom } from '../../ui/table-parts';
import { Text } from '../../ui/text';
import { ChemText } from '../chem-text';
import { codeWords } from '../desk/words';
import { stateGlyphs, stateWords, words } from './words';

export type ColumnKey = keyof typeof words.columns;

export const rooms: Readonly<Record<ColumnKey, ColumnRoom>> = {
  candidate: { width: 84 },
  item: { width: 96 },
  first: { width: 92, align: 'right' },
  second: { width: 92, align: 'right' },
  pair: { width: 172 },
  scale: { width: 142 },
  why: { grow: 1 },
  mark: { width: 92 },
};

const isHeld = ({ state }: LedgerRow): boolean => state === 'discordant' || state === 'cannot-read' || state === 'set-aside';

/** As many characters as a column shows at the size of a reading. */
const longest = 8;

/** One reading of a row: its text, its code, a cover, or that it is due. */
function Given({ row, at }: { row: LedgerRow; at: number }) {
  const given = row.readings[at];
  if (given === undefined) {
    return (
      <Text variant="small" tone="ink2">
        {row.state === 'one-reading' && at === 1 && row.readingsDue > 0 ? words.due : '–'}
      </Text>
    );
  }
  if (given === null) return <Cover />;
  if (given.code !== null) {
    return (
      <Text variant="small" tone={isHeld(row) ? 'iodine' : 'ink'} lines={1}>
        {codeWords[given.code]}
      </Text>
    );
  }
  const text = given.text ?? '';
  // With a unit or a power of ten it is too long for one line of its column, and a reading is never cut.
  const isLong = text.length > longest;
  return (
    <Text variant={isLong ? 'grad' : 'reading'} lines={isLong ? 2 : 1} align="right">
      {text}
    </Text>
  );
}

export function RowMark({ row }: { row: LedgerRow }) {
  const of = row.maxGrains / GRAINS_PER_MARK;
  const waits = row.waitsFor !== null && !isHeld(row);
  const state = row.grains !== null ? (row.isRuled ? 'ruled' : 'given') : isHeld(row) || waits ? 'held' : 'unread';
  return <MarkStand state={state} heldWord={waits ? 'waits' : 'held'} got={(row.grains ?? 0) / GRAINS_PER_MARK} of={of} gotText={marksText(row.grains ?? 0)} ofText={marksText(row.maxGrains)} />;
}

/** Printed numbers lie on no scale. */
function RowScale({ row, width }: { row: LedgerRow; width?: number }) {
  if (row.key === null) return null;
  const at = row.value === null ? {} : row.isRuled ? { ruled: row.value } : { readings: [row.value] };
  return <ScaleRow keyAt={row.key} reach={row.span} of={row.maxGrains / GRAINS_PER_MARK} width={width} {...at} />;
}

function Pair({ row }: { row: LedgerRow }) {
  const tone = row.state === 'ruled' ? 'manganate' : isHeld(row) ? 'iodine' : 'ink2';
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
      <PairGlyph state={stateGlyphs[row.state]} />
      <Text variant="small" tone={tone} weight={tone === 'ink2' ? 400 : 600} lines={1}>
        {stateWords[row.state]}
      </Text>
    </View>
  );
}

interface LedgerRowProps {
  readonly row: LedgerRow;
  readonly columns: readonly ColumnKey[];
  readonly index: number;
  readonly isChosen: boolean;
  /** Just changed by someone else. */
  readonly isTouched: boolean;
  /** The row above is of the same candidate. */
  readonly isRepeated: boolean;
  readonly onOpen: () => void;
}

const spokenRow = (row: LedgerRow): string => `${row.candidateNumber}, item ${row.itemNumber} ${row.label}, ${stateWords[row.state]}`;

/** One answer as a line of the ledger. */
export function LedgerLine({ row, columns, index, isChosen, isTouched, isRepeated, onOpen }: LedgerRowProps) {
  const cells: Readonly<Record<ColumnKey, ReactNode>> = {
    candidate: (
      <Text variant="readingS" tone={isRepeated ? 'ink3' : 'ink'} weight={isChosen ? 600 : 500}>
        {row.candidateNumber}
      </Text>
    ),
    item: (
      <Text variant="small" lines={1}>
        <Text variant="small" weight={600}>{`${row.itemNumber} `}</Text>
        <ChemText beside="small">{row.label}</ChemText>
      </Text>
    ),
    first: <Given row={row} at={0} />,
    second: <Given row={row} at={1} />,
    pair: <Pair row={row} />,
    scale: <RowScale row={row} />,
    why: (
      <Text variant="small" tone="ink2" lines={1}>
        {row.why}
      </Text>
    ),
    mark: <RowMark row={row} />,
  };
  return (
    <TableRow index={index + 2} isChosen={isChosen} isTouched={isTouched} onPress={onOpen} label={spokenRow(row)} testID={`row-${row.candidateNumber}-${row.itemNumber}`}>
      {columns.map((column) => (
        <Cell key={column} {...rooms[column]}>
          {cells[column]}
        </Cell>
      ))}
    </TableRow>
  );
}

const cardScale = 96;
export const cardHeight = 96;

/** The same on a phone: three lines. */
export function LedgerCard({ row, index, isChosen, isTouched, onOpen }: Omit<LedgerRowProps, 'columns' | 'isRepeated'>) {
  return (
    <TableRow index={index + 2} isChosen={isChosen} isTouched={isTouched} onPress={onOpen} label={spokenRow(row)} height={cardHeight} testID={`row-${row.candidateNumber}-${row.itemNumber}`}>
      <Cell grow={1}>
        <View style={{ flex: 1, gap: 3 }}>
          <View style={{ flexDirection: 'row', gap: 10, alignItems: 'baseline' }}>
            <Text variant="readingS" weight={600}>
              {row.candidateNumber}
            </Text>
            <Text variant="small" lines={1} style={{ flex: 1 }}>
              <Text variant="small" weight={600}>{`${row.itemNumber} `}</Text>
              <ChemText beside="small">{row.label}</ChemText>
            </Text>
          </View>
          <View style={{ flexDirection: 'row', gap: 8, alignItems: 'center', minHeight: 24 }}>
            <Given row={row} at={0} />
            {row.readings.length > 1 ? (
              <>
                <Text variant="small" tone="ink2">
                  {words.and}
                </Text>
                <Given row={row} at={1} />
              </>
            ) : null}
          </View>
          <View style={{ flexDirection: 'row', gap: 8, alignItems: 'center' }}>
            <Pair row={row} />
            <Text variant="small" tone="ink2" lines={1} style={{ flex: 1 }}>
              {row.why}
            </Text>
          </View>
        </View>
      </Cell>
      <Cell width={cardScale} align="right">
        <View style={{ alignItems: 'flex-end', gap: 6 }}>
          <RowMark row={row} />
          <RowScale row={row} width={cardScale} />
        </View>
      </Cell>
    </TableRow>
  );
}
