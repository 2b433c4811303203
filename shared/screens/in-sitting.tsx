import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { useColors } from '../ui/theme';

interface InSittingProps {
  readonly sittingId: string;
  readonly children: ReactNode;
  /** The screen scrolls its own parts. */
  readonly isFixed?: boolean;
}

/** What stands round every screen of a sitting. */
export function InSitting({ children, isFixed = false }: InSittingProps) {
  const colors = useColors();
  return (
    <View role="main" style={{ flex: 1, backgroundColor: colors.paper }}>
      {isFixed ? children : <ScrollView contentContainerStyle={{ flexGrow: 1 }}>{children}</ScrollView>}
    </View>
  );
}
