import { View } from 'react-native';
import type { AnswerView } from '../../contracts/ledger';
import type { Code } from '../../marking/scheme';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { ChemText } from '../chem-text';
import { codeWords } from '../desk/words';
import { words } from './words';

/** The form that an earlier answer settled on, as it is said: a value as it stands, a code by its word. */
export function settledWords(canonical: string | null): string {
  if (canonical === null) return words.sheet.notSettled;
  if (!canonical.startsWith('@')) return canonical;
  return codeWords[canonical.slice(1) as Code] ?? words.sheet.noValue;
}

interface FollowsProps {
  readonly answer: Pick<AnswerView, 'follows'>;
  readonly onOther: (answerId: string) => void;
}

/** The candidate's own values that the answer follows from, each with the way to it. */
export function Follows({ answer, onOther }: FollowsProps) {
  if (answer.follows.length === 0) return null;
  return (
    <View testID="follows">
      {answer.follows.map(({ itemNumber, label, answerId, canonical }) => {
        const isValue = canonical !== null && !canonical.startsWith('@');
        return (
          <View key={itemNumber} style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 12 }}>
            <Text variant="small" style={{ flexGrow: 1, flexShrink: 1 }}>
              {words.sheet.follows(itemNumber)}
              <ChemText beside="small">{label}</ChemText>
              {': '}
              <Text variant={isValue ? 'readingS' : 'small'} weight={isValue ? 500 : 600} tone={canonical === null ? 'iodine' : 'ink'}>
                {settledWords(canonical)}
              </Text>
            </Text>
            {answerId === null ? null : (
              <Button isSmall kind="text" icon="forward" onPress={() => onOther(answerId)} testID={`see-item-${itemNumber}`}>
                {words.sheet.seeItem(itemNumber)}
              </Button>
            )}
          </View>
        );
      })}
    </View>
  );
}
