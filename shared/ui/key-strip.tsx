import type { ReactNode } from 'react';
import { View } from 'react-native';
import { KeyCap } from './key-cap';
import { Text } from './text';
import { useColors } from './theme';
import { useHasKeyboard } from './use-has-keyboard';

export interface KeyHint {
  readonly keys: readonly string[];
  readonly does: string;
}

/** The keys of a screen along its foot; not there without a keyboard unless it says something else too. */
export function KeyStrip({ hints, last, children }: { hints: readonly KeyHint[]; last?: KeyHint; children?: ReactNode }) {
  const colors = useColors();
  const hasKeyboard = useHasKeyboard();
  if (!hasKeyboard && children === undefined) return null;
  return (
    <View style={{ minHeight: 44, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 20, rowGap: 6, paddingHorizontal: 24, paddingVertical: 8, backgroundColor: colors.glass, borderTopWidth: 1, borderColor: colors.hair }}>
      {children}
      {children === undefined ? null : <View style={{ flex: 1 }} />}
      {hasKeyboard ? hints.map((hint) => <Hint key={hint.does} hint={hint} />) : null}
      {hasKeyboard && last ? (
        <View style={children === undefined ? { marginLeft: 'auto' } : null}>
          <Hint hint={last} />
        </View>
      ) : null}
    </View>
  );
}

function Hint({ hint: { keys, does } }: { hint: KeyHint }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 6 }}>
      {keys.map((key) => (
        <KeyCap key={key}>{key}</KeyCap>
      ))}
      <Text variant="small" tone="ink2">
        {does}
      </Text>
    </View>
  );
}

/** All keys of a screen, for the sheet that ? opens. */
export function KeyList({ groups }: { groups: readonly { readonly head: string; readonly hints: readonly KeyHint[] }[] }) {
  const colors = useColors();
  return (
    <View style={{ gap: 20 }}>
      {groups.map(({ head, hints }) => (
        <View key={head}>
          <Text variant="head" level={3}>
            {head}
          </Text>
          {hints.map(({ keys, does }) => (
            <View key={does} style={{ minHeight: 36, flexDirection: 'row', alignItems: 'center', gap: 12, borderBottomWidth: 1, borderColor: colors.hair }}>
              <Text variant="readingS" style={{ width: 190 }}>
                {keys.join('  ')}
              </Text>
              <Text variant="small" style={{ flex: 1 }}>
                {does}
              </Text>
            </View>
          ))}
        </View>
      ))}
    </View>
  );
}
