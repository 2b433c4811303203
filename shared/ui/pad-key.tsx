import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Pressable, type PressState } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size, type Colors } from './tokens';

type KeyKind = 'digit' | 'function' | 'primary';

interface PadKeyProps {
  readonly label: string;
  readonly onPress: () => void;
  readonly onLongPress?: (() => void) | undefined;
  readonly kind?: KeyKind | undefined;
  /** A sign that is typed, large and measured. */
  readonly text?: string | undefined;
  /** A word, set as interface. */
  readonly words?: string | undefined;
  readonly isMeasured?: boolean | undefined;
  readonly isSmall?: boolean | undefined;
  readonly isClosed?: boolean | undefined;
  readonly isExpanded?: boolean | undefined;
  readonly height?: number | undefined;
  readonly testID?: string | undefined;
  readonly children?: ReactNode;
}

function ground(kind: KeyKind, isClosed: boolean, { isPressed, isHovered }: PressState, colors: Colors): string {
  const isDown = isPressed || isHovered;
  if (isClosed) return colors.well;
  if (kind === 'primary') return isDown ? colors.actionDown : colors.action;
  if (kind === 'function') return isPressed ? colors.hair : colors.well;
  return isPressed ? colors.hair : colors.paper;
}

/** One key of the pad, 50 high. */
export function PadKey({ label, onPress, onLongPress, kind = 'digit', text, words, isMeasured = false, isSmall = false, isClosed = false, isExpanded, height = size.padKey, testID, children }: PadKeyProps) {
  const colors = useColors();
  const tone = isClosed ? 'ink3' : kind === 'primary' ? 'onFill' : 'ink';
  return (
    <View style={{ flex: kind === 'digit' ? 1 : undefined, height } as object}>
      <Pressable
        label={label}
        onPress={onPress}
        onLongPress={onLongPress}
        isDisabled={isClosed}
        isExpanded={isExpanded}
        testID={testID}
        style={(state) => ({
          flex: 1,
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: 'center',
          gap: 6,
          paddingHorizontal: 4,
          borderRadius: radius.pad,
          borderWidth: isClosed ? 1.5 : 1,
          borderStyle: isClosed ? 'dashed' : 'solid',
          borderColor: isClosed ? colors.rule : kind === 'primary' ? 'transparent' : colors.hair,
          backgroundColor: ground(kind, isClosed, state, colors),
        })}
      >
        {text === undefined ? null : (
          <Text variant={isSmall ? 'reading' : 'readingM'} tone={tone}>
            {text}
          </Text>
        )}
        {words === undefined ? null : (
          <Text variant={isMeasured ? 'reading' : 'body'} weight={isMeasured ? 500 : 600} tone={tone} lines={1}>
            {words}
          </Text>
        )}
        {children}
      </Pressable>
    </View>
  );
}
