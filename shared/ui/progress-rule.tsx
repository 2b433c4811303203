import { useState } from 'react';
import { View } from 'react-native';
import Svg, { G, Path } from 'react-native-svg';
import { progressTicks } from './progress-geometry';
import { settling } from './settling';
import { useColors } from './theme';

interface ProgressRuleProps {
  readonly done: number;
  readonly of: number;
  /** What is counted, as in `readings taken`: spoken with the counts. */
  readonly label: string;
  readonly height?: number | undefined;
  readonly thickness?: number | undefined;
}

/** A graduated line, violet for what is done, a triangle at the present point. Its counts stand beside it as text. */
export function ProgressRule({ done, of, label, height = 12, thickness = 2.5 }: ProgressRuleProps) {
  const colors = useColors();
  const [width, setWidth] = useState(0);
  const place = (count: number) => 1 + (of > 0 ? Math.min(1, Math.max(0, count / of)) : 0) * (width - 2);
  const ticks = progressTicks(of, Math.max(4, width / 16));
  const x = place(done);
  const tip = height * 0.36;
  const middle = thickness / 2 + 0.5;
  return (
    <View
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuenow={done}
      aria-valuemax={of}
      aria-valuetext={`${done} of ${of}`}
      onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)}
      style={{ height: height + thickness, alignSelf: 'stretch' }}
    >
      {width > 0 ? (
        <Svg width={width} height={height + thickness} viewBox={`0 0 ${width} ${height + thickness}`} fill="none" aria-hidden>
          <Path d={`M1,${middle} H${width - 1}`} stroke={colors.hair} strokeWidth={thickness} />
          {done > 0 ? <Path d={`M1,${middle} H${x}`} stroke={colors.manganate} strokeWidth={thickness} /> : null}
          {ticks.map(({ at, isLong }) => (
            <Path key={at} d={`M${place(at)},${thickness} v${height * (isLong ? 0.72 : 0.42)}`} stroke={at <= done && done > 0 ? colors.manganate : colors.rule} strokeWidth={1.1} />
          ))}
          <G style={settling(Math.min(Math.max(x, tip), width - tip), thickness + 1)}>
            <Path d={`M0,0 l${tip},${height * 0.66} h${-2 * tip}z`} fill={colors.manganate} />
          </G>
        </Svg>
      ) : null}
    </View>
  );
}
