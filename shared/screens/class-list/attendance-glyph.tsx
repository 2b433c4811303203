import Svg, { Path } from 'react-native-svg';
import type { Attendance } from '../../contracts/enums';
import { useColors } from '../../ui/theme';

const shapes: Readonly<Record<Attendance, string>> = {
  expected: 'M4 10h2M9 10h2M14 10h2',
  present: 'M4 10.5l4 4 8-9',
  absent: 'M5 5l10 10M15 5 5 15',
  withdrawn: 'M16 10H4M8.5 5.5 4 10l4.5 4.5',
  deferred: 'M4 10h12M11.5 5.5 16 10l-4.5 4.5',
  late: 'M10 3.2a6.8 6.8 0 1 1 0 13.6 6.8 6.8 0 0 1 0-13.6M10 6v4.2l2.8 1.8',
};

/** A shape for each attendance, beside its word. */
export function AttendanceGlyph({ attendance }: { attendance: Attendance }) {
  const colors = useColors();
  return (
    <Svg width={18} height={18} viewBox="0 0 20 20" fill="none" aria-hidden>
      <Path d={shapes[attendance]} stroke={colors.ink2} strokeWidth={1.7} strokeLinecap="round" strokeLinejoin="round" />
    </Svg>
  );
}
