import { View } from 'react-native';
import type { WorkedDraft } from '../../contracts/items';
import { watchWords } from '../../marking/watch/words';
import { Icon } from '../../ui/icon';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { words } from './words';

const named = 3;

/** What the bands would pay besides the key: not a bar to saving, but said where they are set. */
export function ToleranceGuard({ guard }: Pick<WorkedDraft, 'guard'>) {
  const colors = useColors();
  if (guard.length === 0) return null;
  const said = guard.slice(0, named).map(watchWords.paid);
  const more = guard.length > named ? [words.guard.more(guard.length - named)] : [];
  return (
    <View role="status" style={{ flexDirection: 'row', gap: 10, padding: 12, backgroundColor: colors.iodineFaint, borderRadius: 2 }} testID="guard">
      <Icon name="guard" tone="iodine" />
      <Text variant="small" style={{ flex: 1 }}>
        <Text variant="small" weight={600} tone="iodine">
          {words.guard.title}
        </Text>
        {` ${[...said, ...more].join('; ')}. ${watchWords.paidAdvice}`}
      </Text>
    </View>
  );
}

/** Slips that the accepted roundings cannot tell from the key, by rounding. */
export function Untold({ untold }: Pick<WorkedDraft, 'untold'>) {
  const groups = new Map<string, WorkedDraft['untold']>();
  for (const slip of untold) groups.set(slip.rounded, [...(groups.get(slip.rounded) ?? []), slip]);
  return [...groups].map(([rounded, slips]) => (
    <Text key={rounded} variant="small" tone="iodine">
      {watchWords.notToldApart(slips.slice(0, named), rounded, slips[0]?.decimals ?? 1)}
    </Text>
  ));
}
