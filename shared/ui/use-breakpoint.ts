import { useWindowDimensions } from 'react-native';
import { breakpoint } from './tokens';

export type Breakpoint = 'phone' | 'middle' | 'wide' | 'full';

/** Which layout a width has: one pane, one pane with sheets over it, panes side by side, and with room to spare. */
export function breakpointOf(width: number): Breakpoint {
  if (width >= breakpoint.full) return 'full';
  if (width >= breakpoint.wide) return 'wide';
  return width >= breakpoint.middle ? 'middle' : 'phone';
}

export const useBreakpoint = (): Breakpoint => breakpointOf(useWindowDimensions().width);

/** Panes side by side. */
export function useIsWide(): boolean {
  const current = useBreakpoint();
  return current === 'wide' || current === 'full';
}

export const useIsPhone = (): boolean => useBreakpoint() === 'phone';
