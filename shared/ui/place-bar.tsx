import { View } from 'react-native';
import { CurveUnderline } from './curve-underline';
import { Icon } from './icon';
import { Link } from './link';
import type { Place } from './place';
import { safeFoot } from './safe-area';
import { Text } from './text';
import { useColors } from './theme';
import { size } from './tokens';

/** The bar of up to five places at the foot of a phone. */
export function PlaceBar({ places }: { places: readonly Place[] }) {
  const colors = useColors();
  return (
    <View role="navigation" aria-label="Places" style={{ flexDirection: 'row', borderTopWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper, paddingBottom: safeFoot }}>
      {places.map(({ label, href, icon, isChosen, count }) => (
        <Link
          key={href}
          href={href}
          isCurrent={isChosen}
          isFocusInside
          label={count ? `${label}, ${count}` : undefined}
          style={() => ({ flex: 1, minWidth: 0, minHeight: size.tabBar, alignItems: 'center', justifyContent: 'center', paddingTop: 6 })}
        >
          <Icon name={icon} size={24} tone={isChosen ? 'ink' : 'ink2'} />
          <View style={{ maxWidth: '100%' }}>
            <Text variant="label" weight={isChosen ? 600 : 500} tone={isChosen ? 'ink' : 'ink2'} lines={1}>
              {label}
            </Text>
            <CurveUnderline isShown={isChosen} />
          </View>
        </Link>
      ))}
    </View>
  );
}
