import { View } from 'react-native';
import { useRecent } from '../../client/desk';
import type { QueueView } from '../../client/reading-queue';
import type { DeskItem } from '../../contracts/desk';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { struckWords } from '../method-words';
import { clockTime } from '../times';
import { saidText } from './use-desk-work';
import { words } from './words';
import type { DoneAnswer } from './work-list';

interface JustReadProps {
  readonly sittingId: string;
  readonly item: DeskItem;
  readonly done: readonly DoneAnswer[];
  readonly queue: QueueView;
  readonly onTakeBack: () => void;
}

const rows = 8;

/** The last readings of this item, those of this page first, with a way to take the last one back. */
export function JustRead({ sittingId, item, done, queue, onTakeBack }: JustReadProps) {
  const colors = useColors();
  const recent = useRecent(sittingId, item.id);
  const refused = new Set(queue.refused.map(({ id }) => id));
  const unsent = new Set(queue.waiting.map(({ id }) => id));
  const here = [...done].reverse().map(({ readingId, lease, said, at }) => ({ id: readingId, number: lease.candidateNumber, said, at }));
  const ids = new Set(here.map(({ id }) => id));
  const before = (recent.data?.readings ?? [])
    .filter(({ id }) => !ids.has(id))
    .map(({ id, candidateNumber, text, code, method, recordedAt }) => ({ id, number: candidateNumber, said: { method, ...(text === null ? {} : { text }), ...(code === null ? {} : { code }) }, at: recordedAt }));
  const list = [...here, ...before].slice(0, rows);
  const last = list.find(({ id }) => !refused.has(id));
  return (
    <View style={{ gap: 10 }}>
      <Text variant="head" level={2}>
        {words.justRead}
      </Text>
      {list.length === 0 ? (
        <Text variant="small" tone="ink2">
          {words.justReadNone}
        </Text>
      ) : (
        <View role="list" aria-label={words.justRead}>
          {list.map(({ id, number, said, at }) => (
            <View key={id} role="listitem" style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 40, borderBottomWidth: 1, borderColor: colors.hair }}>
              <Text variant="readingS" style={{ width: 62 }}>
                {number}
              </Text>
              <View style={{ flex: 1, minWidth: 0 }}>
                <Text variant={said.code === undefined ? 'reading' : 'small'} align="right" lines={1}>
                  {saidText(said)}
                </Text>
                {item.methodMarks.length === 0 ? null : (
                  <Text variant="micro" tone="ink2" align="right">
                    {struckWords(said.method ?? [], item.methodMarks)}
                  </Text>
                )}
              </View>
              <Text variant="label" weight={400} tone="ink2" align="right" style={{ width: 46 }}>
                {refused.has(id) ? words.notStored : unsent.has(id) ? words.waiting : clockTime(at)}
              </Text>
            </View>
          ))}
        </View>
      )}
      {last === undefined ? null : (
        <Button onPress={onTakeBack} keyCap="U" align="between" isWide>
          {words.takeBack(last.number)}
        </Button>
      )}
    </View>
  );
}
