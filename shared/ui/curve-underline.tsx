import { useState } from 'react';
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { useColors } from './theme';

/** The curve under a chosen tab or section, as wide as what it stands under. */
export function CurveUnderline({ isShown = true }: { isShown?: boolean }) {
  const colors = useColors();
  const [width, setWidth] = useState(0);
  return (
    <View aria-hidden onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ height: 8, alignSelf: 'stretch', pointerEvents: 'none' }}>
      {isShown && width > 0 ? (
        <Svg width={width} height={8} viewBox={`0 0 ${width} 8`} fill="none">
          <Path d={`M1.25,1.5 Q${width / 2},9 ${width - 1.25},1.5`} stroke={colors.manganate} strokeWidth={2.5} strokeLinecap="round" />
        </Svg>
      ) : null}
    </View>
  );
}
