import type { ReactNode } from 'react';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { size } from './tokens';
import { useIsWide } from './use-breakpoint';

interface ChipProps {
  readonly children: string;
  readonly count?: number;
  readonly glyph?: ReactNode;
  readonly isChosen: boolean;
  readonly onPress: () => void;
  readonly testID?: string;
}

/** A filter with its glyph and count; a 2 wide ink line when chosen. */
export function Chip({ children, count, glyph, isChosen, onPress, testID }: ChipProps) {
  const colors = useColors();
  const height = useIsWide() ? size.chipWide : size.chip;
  return (
    <Pressable
      onPress={onPress}
      isPressedIn={isChosen}
      label={count === undefined ? children : `${children}, ${count}`}
      testID={testID}
      style={({ isHovered }) => ({
        height,
        borderRadius: height / 2,
        paddingHorizontal: isChosen ? 11 : 12,
        borderWidth: isChosen ? 2 : 1,
        borderColor: isChosen ? colors.ink : colors.rule,
        backgroundColor: isHovered ? colors.well : colors.paper,
        flexDirection: 'row',
        alignItems: 'center',
        gap: 7,
      })}
    >
      {glyph}
      <Text variant="small" weight={isChosen ? 600 : 500} lines={1}>
        {children}
        {count === undefined ? '' : `\u2002${count.toLocaleString('en-GB')}`}
      </Text>
    </Pressable>
  );
}
