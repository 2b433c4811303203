import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { BrandMark } from './brand-mark';
import { CurveUnderline } from './curve-underline';
import { Icon } from './icon';
import { Link } from './link';
import type { Place } from './place';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size } from './tokens';

export interface Person {
  readonly name: string;
  /** One or two letters for the ring. */
  readonly initials: string;
  readonly href: string;
}

interface PlaceRailProps {
  readonly places: readonly Place[];
  readonly feet: readonly Place[];
  readonly person?: Person | undefined;
  readonly rail?: ReactNode;
  readonly isSlim: boolean;
}

/** The rail at the left of a wide screen: the mark, the places or a burette, and at the foot what is always at hand. */
export function PlaceRail({ places, feet, person, rail, isSlim }: PlaceRailProps) {
  const colors = useColors();
  const home = places[0]?.href ?? '/';
  return (
    <View role="navigation" aria-label="Places" style={{ width: isSlim ? size.columnSlim : size.column, borderRightWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
      <View style={{ height: size.topBarWide, justifyContent: 'center', alignItems: isSlim ? 'center' : 'flex-start', paddingHorizontal: isSlim ? 0 : 16 }}>
        <Link href={home} label="Meniscus" style={() => ({ flexDirection: 'row', alignItems: 'center', gap: 10 })}>
          <BrandMark size={28} />
          {isSlim ? null : <Text variant="head">Meniscus</Text>}
        </Link>
      </View>
      <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1, paddingTop: rail === undefined ? 12 : 0 }}>
        {rail ?? places.map((place) => <RailPlace key={place.href} place={place} isSlim={isSlim} />)}
      </ScrollView>
      <View style={{ paddingBottom: 12, paddingTop: 8 }}>
        {feet.map((place) => (
          <RailPlace key={place.href} place={place} isSlim={isSlim} isFoot />
        ))}
        {person ? <PersonLink person={person} isSlim={isSlim} /> : null}
      </View>
    </View>
  );
}

function RailPlace({ place, isSlim, isFoot = false }: { place: Place; isSlim: boolean; isFoot?: boolean }) {
  const colors = useColors();
  const { label, href, icon, isChosen, count } = place;
  return (
    <Link
      href={href}
      isCurrent={isChosen}
      isFocusInside
      label={isSlim ? `${label}${count ? `, ${count}` : ''}` : undefined}
      style={({ isHovered }) => ({
        minHeight: isFoot ? 40 : size.touch,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: isSlim ? 'center' : 'flex-start',
        gap: 10,
        marginHorizontal: 8,
        paddingHorizontal: isSlim ? 0 : 8,
        borderRadius: radius.control,
        backgroundColor: isHovered ? colors.well : 'transparent',
      })}
    >
      {isSlim || isFoot ? <Icon name={icon} tone={isChosen ? 'ink' : 'ink2'} /> : null}
      {isSlim ? null : (
        <View style={{ marginTop: isChosen ? 8 : 0 }}>
          <Text variant="body" weight={isChosen ? 600 : 400} tone={isChosen ? 'ink' : 'ink2'} lines={1}>
            {label}
          </Text>
          {isChosen ? <CurveUnderline /> : null}
        </View>
      )}
      {!isSlim && count ? (
        <Text variant="small" weight={600} tone="ink2" style={{ marginLeft: 'auto' }}>
          {count.toLocaleString('en-GB')}
        </Text>
      ) : null}
    </Link>
  );
}

function PersonLink({ person, isSlim }: { person: Person; isSlim: boolean }) {
  const colors = useColors();
  return (
    <Link href={person.href} label={isSlim ? person.name : undefined} isFocusInside style={() => ({ minHeight: size.touch, flexDirection: 'row', alignItems: 'center', justifyContent: isSlim ? 'center' : 'flex-start', gap: 10, paddingHorizontal: isSlim ? 0 : 16 })}>
      <View aria-hidden style={{ width: 36, height: 36, borderRadius: 18, borderWidth: 1, borderColor: colors.rule, alignItems: 'center', justifyContent: 'center' }}>
        <Text variant="small" weight={600}>
          {person.initials}
        </Text>
      </View>
      {isSlim ? null : (
        <Text variant="small" tone="ink2" lines={1} style={{ flexShrink: 1 }}>
          {person.name}
        </Text>
      )}
    </Link>
  );
}
