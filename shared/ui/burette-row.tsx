import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Circle, Path } from 'react-native-svg';
import { useColors } from './theme';

interface BuretteRowProps {
  readonly stages: number;
  readonly level: number;
  readonly isPointed?: boolean | undefined;
  readonly isClosed?: boolean | undefined;
  /** In words, how far it stands. */
  readonly label: string;
  readonly children: ReactNode;
}

const tall = 22;

/** A burette laid on its side, for a row of a phone's bench: full at the right, its tap at the right end. */
export function BuretteRow({ stages, level, isPointed = false, isClosed = false, label, children }: BuretteRowProps) {
  const colors = useColors();
  const [width, setWidth] = useState(0);
  const [top, from, to] = [12, 2, width - 44];
  const bottom = top + tall;
  const middle = top + tall / 2;
  const x = from + 10 + (Math.min(stages, Math.max(0, level)) / Math.max(1, stages)) * (to - from - 10);
  const ticks = Array.from({ length: stages * 4 + 1 }, (_, index) => index);
  return (
    <View style={{ minHeight: 120, gap: 6, justifyContent: 'center' }}>
      {children}
      <View role="img" aria-label={label} onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: 48 }}>
        {width > 0 ? (
          <Svg width={width} height={48} viewBox={`0 0 ${width} 48`} fill="none" strokeLinecap="round" aria-hidden>
            {level < stages ? (
              <>
                <Path d={`M${x - 4},${top + 1} Q${x + 4},${middle} ${x - 4},${bottom - 1} H${to} q8,0 11,-8 V${top + 9} q-3,-8 -11,-8z`} fill={colors.copperMid} />
                <Path d={`M${x - 4},${top + 1} Q${x + 4},${middle} ${x - 4},${bottom - 1}`} stroke={colors.copper} strokeWidth={2} />
              </>
            ) : null}
            {ticks.map((index) => {
              const at = from + 10 + (index / (stages * 4)) * (to - from - 10);
              const isStage = index % 4 === 0;
              return <Path key={index} d={`M${at},${bottom} v${isStage ? -13 : -6}`} stroke={colors.ink2} strokeWidth={isStage ? 1.5 : 1} opacity={isStage ? 1 : 0.75} strokeLinecap="butt" />;
            })}
            <Path d={`M${from},${top - 4} q1,4 6,4 H${to} q9,0 12,8 h10 M${from},${bottom + 4} q1,-4 6,-4 H${to} q9,0 12,-8 h10`} stroke={colors.ink2} strokeWidth={1.75} />
            <Path d={`M${to + 27},${middle - 10} v20 M${to + 22},${middle - 2.5} h14 l6,2.5 -6,2.5 h-14`} stroke={colors.ink2} strokeWidth={1.75} strokeLinejoin="round" />
            <Circle cx={to + 27} cy={middle} r={4.5} fill={isClosed ? colors.ink2 : colors.paper} stroke={colors.ink2} strokeWidth={1.75} />
            {isPointed ? <Path d={`M${x},${top - 2} l6,-9 h-12z`} fill={colors.manganate} /> : null}
          </Svg>
        ) : null}
      </View>
    </View>
  );
}
