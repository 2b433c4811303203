import type { ReactNode } from 'react';
import { View } from 'react-native';
import { IconLink } from './icon-button';
import { Text } from './text';
import { useColors } from './theme';
import { size } from './tokens';
import { useIsWide } from './use-breakpoint';

interface ScreenHeadProps {
  readonly title: ReactNode;
  readonly subtitle?: ReactNode;
  readonly back?: { readonly href: string; readonly label: string } | undefined;
  readonly actions?: ReactNode;
}

/** The head of a screen: 60 high with a hairline on wide, 56 on a phone. */
export function ScreenHead({ title, subtitle, back, actions }: ScreenHeadProps) {
  const colors = useColors();
  const isWide = useIsWide();
  return (
    <View
      role="banner"
      style={{
        minHeight: isWide ? size.topBarWide : size.topBar,
        flexDirection: 'row',
        alignItems: 'center',
        gap: isWide ? 12 : 4,
        paddingLeft: back ? (isWide ? 12 : 4) : isWide ? 24 : 16,
        paddingRight: isWide ? 24 : 8,
        paddingVertical: 4,
        borderBottomWidth: isWide ? 1 : 0,
        borderColor: colors.hair,
        backgroundColor: colors.paper,
      }}
    >
      {back ? <IconLink icon="back" label={back.label} href={back.href} /> : null}
      <View style={{ flex: 1, minWidth: 0 }}>
        <Text variant={isWide && subtitle === undefined ? 'title' : 'head'} level={1} lines={isWide ? 1 : 2}>
          {title}
        </Text>
        {subtitle === undefined ? null : (
          <Text variant="label" weight={400} tone="ink2" lines={1}>
            {subtitle}
          </Text>
        )}
      </View>
      {actions === undefined ? null : <View style={{ flexDirection: 'row', alignItems: 'center', gap: isWide ? 12 : 4 }}>{actions}</View>}
    </View>
  );
}
