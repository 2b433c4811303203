import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size, type TypeStyle } from './tokens';
import { useIsWide } from './use-breakpoint';

interface CheckboxProps {
  readonly children: ReactNode;
  readonly isChecked: boolean;
  readonly onChange: (isChecked: boolean) => void;
  readonly help?: string | undefined;
  /** In words, where the label is more than text. */
  readonly label?: string | undefined;
  readonly isLabelHidden?: boolean | undefined;
  readonly isClosed?: boolean | undefined;
  /** The box under the thumb, at the other end of the line. */
  readonly isBoxLast?: boolean | undefined;
  readonly gap?: number | undefined;
  readonly variant?: TypeStyle | undefined;
  readonly lines?: number | undefined;
  readonly testID?: string | undefined;
}

/** A thing that holds or not; the whole line can be pressed. */
export function Checkbox({ children, isChecked, onChange, help, label, isLabelHidden = false, isClosed = false, isBoxLast = false, gap = 10, variant = 'body', lines, testID }: CheckboxProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const below = useId();
  return (
    <View>
      <Pressable
        role="checkbox"
        isChecked={isChecked}
        isDisabled={isClosed}
        label={label ?? (isLabelHidden && typeof children === 'string' ? children : undefined)}
        describedBy={help === undefined ? undefined : below}
        onPress={() => onChange(!isChecked)}
        onKeyDown={(key, event) => {
          if (key !== ' ') return;
          event.preventDefault();
          onChange(!isChecked);
        }}
        testID={testID}
        style={() => ({ minHeight: isWide ? size.touchWide : size.touch, minWidth: isWide ? size.touchWide : size.touch, flexDirection: isBoxLast ? 'row-reverse' : 'row', alignItems: 'center', gap, borderRadius: radius.keycap })}
      >
        <View
          aria-hidden
          style={{
            width: 22,
            height: 22,
            borderRadius: radius.keycap,
            borderWidth: isChecked ? 2 : 1.5,
            borderStyle: isClosed ? 'dashed' : 'solid',
            borderColor: isClosed ? colors.rule : isChecked ? colors.manganate : colors.rule,
            backgroundColor: isClosed ? colors.well : isChecked ? colors.manganateFaint : colors.paper,
            alignItems: 'center',
            justifyContent: 'center',
          }}
        >
          {isChecked ? (
            <Svg width={16} height={16} viewBox="0 0 20 20" fill="none">
              <Path d="M3.5 10.5l4.5 4.5 8.5-10" stroke={isClosed ? colors.ink3 : colors.manganate} strokeWidth={2.8} strokeLinecap="round" strokeLinejoin="round" />
            </Svg>
          ) : null}
        </View>
        {isLabelHidden ? null : (
          <Text variant={variant} lines={lines} tone={isClosed ? 'ink3' : 'ink'} style={isBoxLast ? { flex: 1 } : { flexShrink: 1 }}>
            {children}
          </Text>
        )}
      </Pressable>
      {help === undefined ? null : (
        <Text id={below} variant="small" tone="ink2" style={{ marginLeft: 32 }}>
          {help}
        </Text>
      )}
    </View>
  );
}
