import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Icon, type IconName } from './icon';
import { Text } from './text';
import { useColors } from './theme';
import type { ColorRole } from './tokens';

export type StripKind = 'info' | 'iodine' | 'methyl';

interface StripProps {
  readonly kind: StripKind;
  readonly children: ReactNode;
  /** A button or a link at the right. */
  readonly action?: ReactNode;
  readonly icon?: IconName | undefined;
  readonly testID?: string | undefined;
}

const looks: Record<StripKind, { ground: ColorRole; edge: ColorRole; icon: IconName }> = {
  info: { ground: 'glass', edge: 'rule', icon: 'note' },
  iodine: { ground: 'iodineFaint', edge: 'iodine', icon: 'question' },
  methyl: { ground: 'methylFaint', edge: 'methyl', icon: 'warning' },
};

/** A notice over the whole width: something to know, something undecided, something broken. What broke is spoken at once. */
export function Strip({ kind, children, action, icon, testID }: StripProps) {
  const colors = useColors();
  const { ground, edge, icon: usual } = looks[kind];
  return (
    <View
      role={kind === 'methyl' ? 'alert' : 'status'}
      {...(testID === undefined ? {} : { testID })}
      style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 12, rowGap: 4, paddingHorizontal: 16, paddingVertical: 8, backgroundColor: colors[ground], borderLeftWidth: 4, borderLeftColor: colors[edge], borderBottomWidth: 1, borderBottomColor: colors.hair }}
    >
      <View style={{ flex: 1, minWidth: 220, flexDirection: 'row', gap: 10 }}>
        <Icon name={icon ?? usual} tone={kind === 'info' ? 'ink2' : edge} />
        <Text variant="small" weight={500} style={{ flex: 1 }}>
          {children}
        </Text>
      </View>
      {action}
    </View>
  );
}
