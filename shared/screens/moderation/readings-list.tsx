import { View } from 'react-native';
import type { AnswerView } from '../../contracts/ledger';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { Cover } from '../../ui/cover';
import { MarkStand } from '../../ui/mark-stand';
import { SameGlyph } from '../../ui/pair-glyph';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { codeWords } from '../desk/words';
import { words } from './words';

const placeWords = [words.sheet.first, words.sheet.second] as const;

/** The readings of an answer: covers until the lead has typed, then each with its reader and whether it is as the lead reads it. */
export function ReadingsList({ answer }: { answer: AnswerView }) {
  const colors = useColors();
  return (
    <View role="list">
      {answer.readings.map(({ id, reader, given, grains, note, isAsMine }, index) => (
        <View key={id} role="listitem" style={{ flexDirection: 'row', alignItems: 'center', gap: 14, minHeight: 48, paddingVertical: 6, borderTopWidth: 1, borderColor: colors.hair }}>
          {isAsMine === null ? null : <View style={{ width: 20 }}>{isAsMine ? <SameGlyph /> : null}</View>}
          {given === null ? (
            <Cover width={74} />
          ) : (
            <Text variant={given.code === null ? 'readingM' : 'body'} weight={500}>
              {given.code === null ? (given.text ?? '') : codeWords[given.code]}
            </Text>
          )}
          <View style={{ flex: 1 }}>
            <Text variant="small">
              <Text variant="small" weight={600}>
                {placeWords[index] ?? words.sheet.more}
              </Text>
              {`, ${reader}`}
            </Text>
            {isAsMine === null ? null : (
              <Text variant="small" tone={isAsMine ? 'manganate' : 'ink2'}>
                {isAsMine ? words.sheet.asMine : words.sheet.notAsMine}
              </Text>
            )}
            {note === null ? null : <Text variant="small">{words.sheet.note(note)}</Text>}
          </View>
          {grains === null ? null : <MarkStand state="given" got={grains / GRAINS_PER_MARK} of={answer.maxGrains / GRAINS_PER_MARK} gotText={marksText(grains)} ofText={marksText(answer.maxGrains)} />}
        </View>
      ))}
    </View>
  );
}
