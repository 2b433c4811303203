import { useState } from 'react';
import { View } from 'react-native';
import { useSpotTest } from '../../client/items';
import type { ItemDraft, SpotTestResult } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { size } from '../../ui/tokens';
import { useIsPhone } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { useSettled } from '../use-settled';
import { words } from './words';

interface SpotTestPaneProps {
  readonly text: string;
  readonly onChange: (text: string) => void;
  readonly result: SpotTestResult | null;
  readonly isWorked: boolean;
}

const stillMs = 120;

/** The typed value and what the server says of it, null while nothing is typed; `draft` is what is not stored yet; null where the stored item is the one to try. */
export function useSpot(itemId: string, draft: ItemDraft | null): { text: string; setText: (text: string) => void; result: SpotTestResult | null; drop: { at: number; text: string } | null } {
  const [text, setText] = useState('');
  const still = useSettled(text, stillMs);
  const { data, isError } = useSpotTest(itemId, still, draft);
  const result = text === '' || still === '' || isError ? null : (data ?? null);
  const at = result?.value ?? null;
  return { text, setText, result, drop: at === null ? null : { at, text } };
}

/** A value tried against the item while it is built: mark, rule and distance; nothing is stored. */
export function SpotTestPane({ text, onChange, result, isWorked }: SpotTestPaneProps) {
  const isPhone = useIsPhone();
  const refused = result?.outcome === 'refused' ? result.detail : undefined;
  return (
    <View style={{ gap: 10 }} testID="spot-test">
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Text variant="head" level={2}>
          {words.spot.title}
        </Text>
        <Text variant="small" tone="ink2">
          {words.spot.aside}
        </Text>
      </View>
      <Vessel
        label={words.spot.label}
        isLabelHidden
        value={text}
        onChange={onChange}
        variant={isPhone ? 'readingL' : 'readingXL'}
        height={isPhone ? size.fieldReading : 72}
        maxLength={64}
        error={refused}
        testID="spot-test-value"
        onKeyDown={(key) => {
          if (key === 'Escape') onChange('');
        }}
      />
      <View aria-live="polite" style={{ minHeight: 66 }}>
        <Outcome text={text} result={result} isWorked={isWorked} />
      </View>
    </View>
  );
}

function Outcome({ text, result, isWorked }: Pick<SpotTestPaneProps, 'text' | 'result' | 'isWorked'>) {
  if (text === '' || !isWorked) {
    return (
      <Text variant="small" tone="ink2">
        {isWorked ? words.spot.empty : words.spot.notWorked}
      </Text>
    );
  }
  if (!result || result.outcome === 'refused') return null;
  if (result.outcome === 'unfinished' || result.grains === null) {
    return (
      <Text variant="small" tone="ink2">
        {result.detail}
      </Text>
    );
  }
  return (
    <View style={{ flexDirection: 'row', gap: 16, alignItems: 'flex-start' }}>
      <MarkStand
        state="given"
        scale="desk"
        got={result.grains / GRAINS_PER_MARK}
        of={result.maxGrains / GRAINS_PER_MARK}
        gotText={marksText(result.grains)}
        ofText={marksText(result.maxGrains)}
      />
      <View style={{ flex: 1 }}>
        <Text weight={600}>{result.head.charAt(0).toUpperCase() + result.head.slice(1)}</Text>
        <Text variant="small" tone="ink2">
          {result.detail}
        </Text>
      </View>
    </View>
  );
}
