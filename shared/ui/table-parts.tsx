import type { ReactNode } from 'react';
import { View, type ViewStyle } from 'react-native';
import { Icon } from './icon';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { size } from './tokens';

/** How a column takes its room: fixed, or a share of what is left. */
export interface ColumnRoom {
  readonly width?: number | undefined;
  readonly grow?: number | undefined;
  readonly align?: 'left' | 'right' | undefined;
}

const roomOf = ({ width, grow, align }: ColumnRoom): ViewStyle => ({
  ...(width === undefined ? { flexGrow: grow ?? 1, flexShrink: 1, flexBasis: 0, minWidth: 0 } : { width, flexShrink: 0 }),
  flexDirection: 'row',
  alignItems: 'center',
  justifyContent: align === 'right' ? 'flex-end' : 'flex-start',
});

/** The head of a table: on glass, with a 1.5 line under it. */
export function TableHead({ children }: { children: ReactNode }) {
  const colors = useColors();
  return (
    <View role="row" style={{ flexDirection: 'row', alignItems: 'stretch', minHeight: 36, gap: 12, paddingHorizontal: 16, backgroundColor: colors.glass, borderBottomWidth: 1.5, borderColor: colors.ink2 }}>
      {children}
    </View>
  );
}

interface HeadCellProps extends ColumnRoom {
  readonly children: string;
  readonly sorted?: 'ascending' | 'descending' | null | undefined;
  /** Left out where the column cannot be sorted. */
  readonly onSort?: (() => void) | undefined;
  readonly isHidden?: boolean | undefined;
}

export function HeadCell({ children, sorted, onSort, isHidden = false, ...room }: HeadCellProps) {
  const word = (
    <Text variant="label" tone="ink2" lines={1}>
      {children}
    </Text>
  );
  const sort = onSort === undefined ? {} : { 'aria-sort': sorted ?? 'none' };
  return (
    <View role="columnheader" {...(sort as object)} {...(isHidden ? { 'aria-label': children } : {})} style={roomOf(room)}>
      {onSort === undefined ? (
        isHidden ? null : word
      ) : (
        <Pressable onPress={() => onSort()} isFocusInside style={() => ({ minHeight: 36, flexDirection: 'row', alignItems: 'center', gap: 4 })}>
          {word}
          {sorted ? <Icon name={sorted === 'ascending' ? 'up' : 'down'} size={14} /> : null}
        </Pressable>
      )}
    </View>
  );
}

interface TableRowProps {
  readonly children: ReactNode;
  readonly isChosen?: boolean | undefined;
  /** Just changed by someone else. */
  readonly isTouched?: boolean | undefined;
  readonly onPress?: (() => void) | undefined;
  readonly label?: string | undefined;
  /** In the whole list, from 1, where only a part of it is drawn. */
  readonly index?: number | undefined;
  readonly height?: number | undefined;
  readonly testID?: string | undefined;
}

/** One row, 40 high, a hairline under it; the chosen one has a violet ground and line. */
export function TableRow({ children, isChosen = false, isTouched = false, onPress, label, index, height = size.rowWide, testID }: TableRowProps) {
  const colors = useColors();
  const edge = isChosen || isTouched;
  const style = (isHovered: boolean): ViewStyle => ({
    flexDirection: 'row',
    alignItems: 'center',
    gap: 12,
    minHeight: height,
    paddingHorizontal: edge ? 14 : 16,
    borderWidth: edge ? 2 : 0,
    borderBottomWidth: edge ? 2 : 1,
    borderColor: edge ? colors.manganate : colors.hair,
    backgroundColor: isChosen ? colors.manganateFaint : isHovered ? colors.glass : 'transparent',
  });
  const place = index === undefined ? {} : { 'aria-rowindex': index };
  if (onPress === undefined) {
    return (
      <View role="row" {...(place as object)} style={style(false)} {...(testID === undefined ? {} : { testID })}>
        {children}
      </View>
    );
  }
  return (
    <Pressable role="row" onPress={() => onPress()} isSelected={isChosen} isFocusInside label={label} rowIndex={index} testID={testID} style={({ isHovered }) => style(isHovered)}>
      {children}
    </Pressable>
  );
}

export function Cell({ children, ...room }: ColumnRoom & { children?: ReactNode }) {
  return (
    <View role="cell" style={roomOf(room)}>
      {children}
    </View>
  );
}
