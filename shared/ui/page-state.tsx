import { useEffect, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { Text } from './text';
import { useColors } from './theme';
import { motion } from './tokens';
import { BrokenSign } from './vessel';

/** What is being fetched: hairlines and graduations at once, without values, where rows will stand; after a while one line says what is fetched. No spinner. */
export function Loading({ children, rows = 6 }: { children: string; rows?: number | undefined }) {
  const colors = useColors();
  const [isLong, setLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), motion.loadingWordsMs);
    return () => clearTimeout(timer);
  }, []);
  return (
    <View aria-busy style={{ paddingHorizontal: 24, paddingTop: 20 }}>
      <View style={{ height: 20 }}>
        <Text variant="small" tone="ink2" live="polite">
          {isLong ? children : ''}
        </Text>
      </View>
      {rows > 0 ? <Graduations /> : null}
      {Array.from({ length: rows }, (_, index) => (
        <View key={index} aria-hidden style={{ height: 40, borderBottomWidth: 1, borderColor: colors.hair }} />
      ))}
    </View>
  );
}

function Graduations() {
  const colors = useColors();
  return (
    <View aria-hidden style={{ flexDirection: 'row', height: 8, marginTop: 12, borderTopWidth: 1.5, borderColor: colors.hair, justifyContent: 'space-between' }}>
      {Array.from({ length: 21 }, (_, index) => (
        <View key={index} style={{ width: 1, height: index % 5 === 0 ? 8 : 4, backgroundColor: colors.hair }} />
      ))}
    </View>
  );
}

interface StateProps {
  readonly head: ReactNode;
  readonly children: ReactNode;
  /** One way on. */
  readonly action?: ReactNode;
}

/** Nothing here: a broken vessel, a head, one sentence, one way on. */
export function Empty(said: StateProps) {
  const colors = useColors();
  return (
    <View style={{ flexDirection: 'row', gap: 20, padding: 24, maxWidth: 620 }}>
      <Svg width={56} height={68} viewBox="0 0 56 68" fill="none" strokeLinecap="round" aria-hidden>
        <Path d="M8,3 V52 a11,11 0 0 0 11,11 H37 a11,11 0 0 0 11,-11 V3" stroke={colors.ink3} strokeWidth={1.5} strokeDasharray="3 3.5" />
        <Path d="M8,40 Q28,50 48,40" stroke={colors.ink3} strokeWidth={1.5} strokeDasharray="3 3.5" />
      </Svg>
      <Said {...said} />
    </View>
  );
}

/** Something did not come or did not go: what happened, what is safe, one button. */
export function Failed(said: StateProps) {
  return (
    <View role="alert" style={{ flexDirection: 'row', gap: 16, padding: 24, maxWidth: 620 }}>
      <BrokenSign size={28} />
      <Said {...said} />
    </View>
  );
}

function Said({ head, children, action }: StateProps) {
  return (
    <View style={{ flex: 1, gap: 6, alignItems: 'flex-start' }}>
      <Text variant="head" level={2}>
        {head}
      </Text>
      <Text variant="small" tone="ink2">
        {children}
      </Text>
      {action ? <View style={{ marginTop: 8 }}>{action}</View> : null}
    </View>
  );
}
