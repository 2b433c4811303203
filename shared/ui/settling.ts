import type { ViewStyle } from 'react-native';
import { curves, motion } from './tokens';

/** Where a piece of a drawing stands; when that changes it moves there as liquid settles. */
export const settling = (x: number, y: number): ViewStyle =>
  ({
    transform: [{ translateX: x }, { translateY: y }],
    transitionProperty: 'transform',
    transitionDuration: `${motion.settleMs}ms`,
    transitionTimingFunction: curves.settle,
  }) as ViewStyle;
