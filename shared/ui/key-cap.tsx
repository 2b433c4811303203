import { View } from 'react-native';
import { Text } from './text';
import { useColors } from './theme';
import { radius } from './tokens';
import { useHasKeyboard } from './use-has-keyboard';

/** The key that presses the control it stands in; not shown where there is no keyboard. */
export function KeyCap({ children, isOnFill = false }: { children: string; isOnFill?: boolean }) {
  const colors = useColors();
  if (!useHasKeyboard()) return null;
  return (
    <View
      aria-hidden
      style={{
        minWidth: 22,
        height: 22,
        paddingHorizontal: 6,
        alignItems: 'center',
        justifyContent: 'center',
        borderWidth: 1,
        borderBottomWidth: 2,
        borderRadius: radius.keycap,
        borderColor: isOnFill ? colors.onFill : colors.rule,
        backgroundColor: isOnFill ? 'transparent' : colors.paper,
      }}
    >
      <Text variant="keycap" tone={isOnFill ? 'onFill' : 'ink2'}>
        {children}
      </Text>
    </View>
  );
}
