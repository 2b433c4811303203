import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { useColors } from './theme';
import { useIsPhone } from './use-breakpoint';

interface EyeLineProps {
  /** Height of the line in the view it lies in, from above, as a share. */
  readonly at?: number | undefined;
  readonly size?: number | undefined;
}

/** Two violet triangles at the edges of the mat that point at the line to read. Lies over its parent and lets every press through. */
export function EyeLine({ at = 0.5, size: asked }: EyeLineProps) {
  const colors = useColors();
  const isPhone = useIsPhone();
  const size = asked ?? (isPhone ? 13 : 17);
  const place = { position: 'absolute', top: `${at * 100}%`, marginTop: (-size * 1.24) / 2, pointerEvents: 'none' } as const;
  const box = { width: size, height: size * 1.24, viewBox: '0 0 18 22.3', fill: 'none' } as const;
  return (
    <>
      <View aria-hidden style={{ ...place, left: 0 }}>
        <Svg {...box}>
          <Path d="M0,0 L18,11.15 L0,22.3z" fill={colors.manganate} />
        </Svg>
      </View>
      <View aria-hidden style={{ ...place, right: 0 }}>
        <Svg {...box}>
          <Path d="M18,0 L0,11.15 L18,22.3z" fill={colors.manganate} />
        </Svg>
      </View>
    </>
  );
}
