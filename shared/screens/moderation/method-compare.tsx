import { View } from 'react-native';
import type { AnswerView } from '../../contracts/ledger';
import { Icon } from '../../ui/icon';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { methodWords } from '../method-words';
import { differInMethodOnly } from './ruling';
import { words } from './words';

const column = 56;

interface Striker {
  readonly name: string;
  readonly method: readonly string[];
}

/** Each method mark with who struck it, once the readings are uncovered; those in which the readings differ say so. */
export function MethodCompare({ answer }: { answer: AnswerView }) {
  const colors = useColors();
  const { methodMarks, readings, mine } = answer;
  if (methodMarks.length === 0 || readings.length === 0) return null;
  const names = [words.sheet.first, words.sheet.second];
  const readers: Striker[] = readings.map(({ method }, index) => ({ name: names[index] ?? words.sheet.more, method }));
  const all = mine === null ? readers : [...readers, { name: words.sheet.you, method: mine.method }];
  const line = { flexDirection: 'row', alignItems: 'center', minHeight: 36, borderTopWidth: 1, borderColor: colors.hair } as const;
  return (
    <View style={{ gap: 6 }}>
      {differInMethodOnly(answer) ? (
        <Text variant="small" weight={600} tone="iodine" testID="only-method">
          {words.sheet.onlyMethod}
        </Text>
      ) : null}
      <View role="table" aria-label={methodWords.title} testID="method-compare">
        <View role="row" style={{ flexDirection: 'row', alignItems: 'center', minHeight: 28 }}>
          <View role="columnheader" style={{ flex: 1 }}>
            <Text variant="label">{words.sheet.methodMark}</Text>
          </View>
          {all.map(({ name }) => (
            <View key={name} role="columnheader" style={{ width: column, alignItems: 'center' }}>
              <Text variant="label">{name}</Text>
            </View>
          ))}
        </View>
        {methodMarks.map(({ id, text }, index) => {
          const differs = readers.some(({ method }) => method.includes(id) !== readers[0]?.method.includes(id));
          return (
            <View key={id} role="row" style={line} testID={`compared-${index + 1}`}>
              <View role="cell" style={{ flex: 1, paddingVertical: 4 }}>
                <Text variant="small">
                  <Text variant="small" weight={600}>{`${index + 1} `}</Text>
                  {text}
                  {differs ? <Text variant="small" weight={600} tone="iodine">{`, ${words.sheet.differs}`}</Text> : null}
                </Text>
              </View>
              {all.map(({ name, method }) => (
                <View key={name} role="cell" style={{ width: column, alignItems: 'center' }}>
                  <View role="img" aria-label={method.includes(id) ? words.sheet.struck : words.sheet.notStruck}>
                    {method.includes(id) ? <Icon name="check" tone="manganate" /> : <Text tone="ink2">–</Text>}
                  </View>
                </View>
              ))}
            </View>
          );
        })}
      </View>
    </View>
  );
}
