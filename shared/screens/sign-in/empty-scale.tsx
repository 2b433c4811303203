import Svg, { Path } from 'react-native-svg';
import { useColors } from '../../ui/theme';

const width = 560;
const steps = 40;

/** A scale with graduations and nothing on it: what is to come is marked here. */
export function EmptyScale() {
  const colors = useColors();
  const marks = Array.from({ length: steps + 1 }, (_, index) => {
    const x = 8 + (index * (width - 16)) / steps;
    const length = index % 10 === 0 ? 22 : index % 5 === 0 ? 16 : 10;
    return `M${x.toFixed(1)},60 v${length}`;
  });
  return (
    <Svg width="100%" height={120} viewBox={`0 0 ${width} 120`} fill="none" aria-hidden>
      <Path d={marks.join(' ')} stroke={colors.rule} strokeWidth={1.25} />
      <Path d={`M0,60 H${width}`} stroke={colors.ink} strokeWidth={1.75} strokeLinecap="round" />
    </Svg>
  );
}
