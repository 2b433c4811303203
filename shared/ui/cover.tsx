import { View } from 'react-native';
import Svg, { Path, Rect } from 'react-native-svg';
import { useColors } from './theme';

/** A small ruled slip of paper where a value is kept back. */
export function Cover({ width = 46 }: { width?: number }) {
  const colors = useColors();
  return (
    <View role="img" aria-label="covered">
      <Svg width={width} height={16} viewBox={`0 0 ${width} 16`} fill="none" aria-hidden>
        <Rect x={0.75} y={0.75} width={width - 1.5} height={14.5} rx={4} fill={colors.well} stroke={colors.rule} strokeWidth={1} />
        <Path d={`M7,8 H${width - 7}`} stroke={colors.rule} strokeWidth={1.5} strokeDasharray="1.5 4" strokeLinecap="round" />
      </Svg>
    </View>
  );
}
