import { View } from 'react-native';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { electronLabel } from '../../marking/item-label';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { ChemText } from '../chem-text';
import { byValue } from './value-order';
import { words } from './words';

interface OptionsByValueProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly hasAnswer?: boolean | undefined;
}

const w = words.options;

/** The options from the least value to the greatest, and the answer that follows. */
export function OptionsByValue({ draft: { printed, kind }, worked, hasAnswer = true }: OptionsByValueProps) {
  const colors = useColors();
  if (!printed) return null;
  const isRight = (number: number): boolean => kind === 'choice' && worked.key?.text === String(number);
  return (
    <View style={{ gap: 10 }}>
      <View role="list" aria-label={w.inOrder}>
        {byValue(printed.options, worked.options).map(({ option, number, value }) => (
          <View key={number} role="listitem" style={{ flexDirection: 'row', alignItems: 'baseline', gap: 12, paddingVertical: 4, borderBottomWidth: 1, borderColor: colors.hair }}>
            <Text variant="readingS" tone="ink2" style={{ width: 20 }}>
              {number}
            </Text>
            <Text style={{ flex: 1 }} weight={isRight(number) ? 600 : 400}>
              <ChemText>{electronLabel(option)}</ChemText>
            </Text>
            <Text variant="reading" tone={isRight(number) ? 'copper' : 'ink'} weight={isRight(number) ? 600 : 500}>
              {value ?? w.noValue}
            </Text>
          </View>
        ))}
      </View>
      {!hasAnswer ? null : worked.key ? (
        <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: 12 }}>
          <Text>{w.answer}</Text>
          <Text variant="readingM" tone="copper" weight={600} testID="answer">
            {worked.key.text}
          </Text>
        </View>
      ) : (
        <Text variant="small" tone="ink2">
          {w.noAnswer}
        </Text>
      )}
    </View>
  );
}
