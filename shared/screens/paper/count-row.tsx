import type { ReactNode } from 'react';
import { View } from 'react-native';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';

interface CountRowProps {
  readonly children: ReactNode;
  readonly value: string;
  readonly grains: number | null;
  readonly maxGrains: number | null;
}

/** A rule of the scheme: what it is, the value it pays, and the marks. */
export function CountRow({ children, value, grains, maxGrains }: CountRowProps) {
  const colors = useColors();
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', columnGap: 12, rowGap: 4, minHeight: 48, paddingVertical: 6, borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 220, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 8, rowGap: 4 }}>{children}</View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, marginLeft: 'auto' }}>
        <Text variant="readingS">{value}</Text>
        {grains === null || maxGrains === null ? null : (
          <MarkStand state="given" got={grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(grains)} ofText={marksText(maxGrains)} />
        )}
      </View>
    </View>
  );
}
