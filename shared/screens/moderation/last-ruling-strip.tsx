import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import type { LastRuling } from './use-last-ruling';
import { words } from './words';

/** At the foot of a sheet that covers the whole screen, and the toast with it: what was ruled last, and the way back. */
export function LastRulingStrip({ last }: { last: LastRuling }) {
  const colors = useColors();
  return (
    <View role="status" aria-live="polite">
      {last.text === null ? null : (
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, minHeight: 52, paddingLeft: 20, paddingRight: 8, borderTopWidth: 1, borderColor: colors.hair, backgroundColor: colors.glass }}>
          <Text variant="small" style={{ flex: 1 }}>
            {last.text}
          </Text>
          {last.onTakeBack ? (
            <Button isSmall kind="text" icon="takeBack" onPress={last.onTakeBack} isBusy={last.isBusy} testID="take-back-last">
              {words.sheet.takeBack}
            </Button>
          ) : null}
        </View>
      )}
    </View>
  );
}
