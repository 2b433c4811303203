import Svg, { Path } from 'react-native-svg';
import { useColors } from './theme';

/** Two walls, the curve, the liquid, and the eye line from both sides. Below 24 only walls and curve. */
export function BrandMark({ size = 28 }: { size?: number }) {
  const colors = useColors();
  const isWhole = size >= 24;
  return (
    <Svg width={size} height={size} viewBox="0 0 28 28" fill="none" aria-hidden>
      {isWhole && <Path d="M8 9.5Q14 16.5 20 9.5V18.5a6 6 0 0 1-12 0z" fill={colors.copperFluid} />}
      <Path d="M7 2.5V18.5a7 7 0 0 0 14 0V2.5" stroke={colors.ink} strokeWidth={2} strokeLinecap="round" />
      <Path d="M8 9.5Q14 16.5 20 9.5" stroke={colors.ink} strokeWidth={2} strokeLinecap="round" />
      {isWhole && <Path d="M1 13l4-2.6v5.2zM27 13l-4-2.6v5.2z" fill={colors.manganate} />}
    </Svg>
  );
}
