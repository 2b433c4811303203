import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';

/** A heading and its rows, left out where there are none. */
export function Section({ head, children, count }: { head: string; children: ReactNode; count: number }) {
  if (count === 0) return null;
  return (
    <View style={{ gap: 8 }}>
      <Text variant="head" level={2}>
        {`${head} `}
        <Text variant="head" weight={400} tone="ink2" isTabular>
          {count.toLocaleString('en-GB')}
        </Text>
      </Text>
      <View role="list" aria-label={head}>
        {children}
      </View>
    </View>
  );
}

/** One row: what it is, and what can be done about it. */
export function Row({ children, acts, testID }: { children: ReactNode; acts?: ReactNode; testID?: string }) {
  const colors = useColors();
  return (
    <View role="listitem" testID={testID} style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 20, rowGap: 10, paddingVertical: 12, borderTopWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 280, gap: 6 }}>{children}</View>
      {acts ? <View style={{ flexDirection: 'row', flexWrap: 'wrap', flexShrink: 1, columnGap: 10, rowGap: 4 }}>{acts}</View> : null}
    </View>
  );
}
