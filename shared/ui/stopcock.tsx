import { View } from 'react-native';
import Svg, { Circle, Path } from 'react-native-svg';
import { useColors } from './theme';

interface StopcockProps {
  readonly isOpen: boolean;
  readonly size?: number | undefined;
  /** Where the word stands beside it, it need not be spoken twice. */
  readonly isSilent?: boolean | undefined;
}

/** A gate. Handle in line with the tube: open. Handle across: shut. Always with the word and the reason beside it. */
export function Stopcock({ isOpen, size = 34, isSilent = true }: StopcockProps) {
  const colors = useColors();
  const tone = isOpen ? colors.ink : colors.iodine;
  return (
    <View {...(isSilent ? { 'aria-hidden': true } : { role: 'img' as const, 'aria-label': isOpen ? 'open' : 'shut' })}>
      <Svg width={size} height={size} viewBox="0 0 34 34" fill="none" strokeLinecap="round" aria-hidden>
        <Path d="M12,1 V9.5 M22,1 V9.5 M12,24.5 V33 M22,24.5 V33" stroke={colors.ink2} strokeWidth={1.75} />
        <Circle cx={17} cy={17} r={8.4} fill={isOpen ? colors.paper : colors.iodineFaint} stroke={tone} strokeWidth={1.75} />
        <Path d={isOpen ? 'M17,6.5 V27.5' : 'M5,17 H29'} stroke={tone} strokeWidth={5} />
      </Svg>
    </View>
  );
}
