import { useRef, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { linkedVessels, vesselLiquid, vesselSize, vesselWalls, type VesselLink } from './linked-vessels-geometry';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { radius } from './tokens';

export interface LinkedVessel {
  readonly id: string;
  /** Within the walls. */
  readonly number: number;
  readonly label: ReactNode;
  readonly below: ReactNode;
  /** Read out before the number, and after all. */
  readonly spokenBefore: string;
  readonly spokenAfter: string;
  readonly isHere: boolean;
}

interface LinkedVesselsProps {
  readonly label: string;
  readonly vessels: readonly LinkedVessel[];
  readonly links: readonly (VesselLink & { /** A broken line: nothing runs. */ readonly isShut: boolean; readonly isBroken: boolean })[];
  readonly onChoose: (id: string) => void;
}

const cell = 104;
const writing = 60;

/** Vessels that run into each other by siphons, drawn downhill; each can be pressed. */
export function LinkedVessels({ label, vessels, links, onChoose }: LinkedVesselsProps) {
  const colors = useColors();
  const row = useRef<ScrollView>(null);
  const { width, height, places, tubes } = linkedVessels(vessels.length, links, cell);
  const here = vessels.findIndex(({ isHere }) => isHere);
  return (
    <ScrollView
      ref={row}
      horizontal
      onLayout={({ nativeEvent }) => row.current?.scrollTo({ x: Math.max(0, (here + 0.5) * cell - nativeEvent.layout.width / 2), animated: false })}
      style={{ flexGrow: 0 }}
      contentContainerStyle={{ paddingVertical: 2, paddingHorizontal: 2 }}
    >
      <View role="list" aria-label={label} style={{ width, height: height + writing }}>
        <Svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} fill="none" strokeLinejoin="round" strokeLinecap="round" aria-hidden style={{ position: 'absolute', pointerEvents: 'none' }}>
          {vessels.map(({ id, isHere }, index) => {
            const place = places[index] ?? { x: 0, y: 0 };
            const liquid = vesselLiquid(place);
            return [
              <Path key={`${id}-liquid`} d={liquid.body} fill={isHere ? colors.copperFluid : colors.copperMid} />,
              <Path key={`${id}-surface`} d={liquid.surface} stroke={colors.copper} strokeWidth={1.5} />,
            ];
          })}
          {tubes.map((tube, index) => {
            const { isShut, isBroken } = links[index] ?? { isShut: false, isBroken: false };
            if (isShut || isBroken) return <Path key={index} d={tube} stroke={isBroken ? colors.methyl : colors.ink3} strokeWidth={1.5} strokeDasharray="3 4" />;
            return [
              <Path key={`${index}-wall`} d={tube} stroke={colors.ink2} strokeWidth={5} strokeLinecap="butt" />,
              <Path key={`${index}-fluid`} d={tube} stroke={colors.manganateFluid} strokeWidth={2.6} strokeLinecap="butt" />,
            ];
          })}
          {vessels.map(({ id, isHere }, index) => (
            <Path key={id} d={vesselWalls(places[index] ?? { x: 0, y: 0 })} stroke={isHere ? colors.manganate : colors.ink2} strokeWidth={isHere ? 2 : 1.5} />
          ))}
        </Svg>
        {vessels.map((vessel, index) => (
          <Vessel key={vessel.id} vessel={vessel} left={index * cell} top={places[index]?.y ?? 0} height={height} onPress={() => onChoose(vessel.id)} />
        ))}
      </View>
    </ScrollView>
  );
}

function Vessel({ vessel, left, top, height, onPress }: { vessel: LinkedVessel; left: number; top: number; height: number; onPress: () => void }) {
  const colors = useColors();
  const { id, number, label, below, spokenBefore, spokenAfter, isHere } = vessel;
  return (
    <View role="listitem" style={{ position: 'absolute', left, top: 0, width: cell, height: height + writing }}>
      <Pressable
        onPress={onPress}
        isCurrent={isHere}
        isFocusInside
        testID={`chain-${id}`}
        style={({ isHovered }) => ({ flex: 1, alignItems: 'center', borderRadius: radius.control, borderWidth: 1, borderColor: isHovered && !isHere ? colors.rule : 'transparent' })}
      >
        <Spoken>{spokenBefore}</Spoken>
        <View style={{ position: 'absolute', top: top + 8, left: 0, right: 0, alignItems: 'center' }}>
          <Text weight={600} tone={isHere ? 'manganate' : 'ink'} style={{ width: vesselSize.width - 30 }} align="center" lines={1}>
            {number}
          </Text>
        </View>
        <View style={{ position: 'absolute', top: height, left: 4, right: 4, alignItems: 'center' }}>
          <Text variant="small" weight={isHere ? 600 : 500} align="center" lines={2}>
            {label}
          </Text>
          <Text variant="micro" tone="ink2" align="center" lines={1}>
            {below}
          </Text>
        </View>
        <Spoken>{spokenAfter}</Spoken>
      </Pressable>
    </View>
  );
}

/** For screen readers: what the drawing shows. */
function Spoken({ children }: { children: string }) {
  return <Text style={{ position: 'absolute', width: 1, height: 1, overflow: 'hidden' }}>{children}</Text>;
}
