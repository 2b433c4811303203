import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { clockTime } from '../times';
import type { DraftKeeper, SaveState } from './draft-keeper';
import { words } from './words';

/** Whether what stands in the editor is stored, in a few words. */
export function SaveLine({ save }: { save: SaveState }) {
  const texts: Record<SaveState['kind'], string> = {
    saved: `${save.kind === 'saved' && save.at !== null ? `${words.save.saved(clockTime(save.at))}, ` : ''}${words.save.open}`,
    waiting: words.save.waiting,
    sending: words.save.sending,
    refused: save.kind === 'refused' ? words.save.refused(save.message) : '',
    unreached: words.save.unreached,
    conflict: words.save.waiting,
  };
  const isTrouble = save.kind === 'refused' || save.kind === 'unreached';
  return (
    <Text variant="small" tone={isTrouble ? 'methyl' : 'ink2'} live="polite" testID="save-line">
      {texts[save.kind]}
    </Text>
  );
}

/** Shown while someone else's version stands on the server. */
export function ConflictNotice({ number, keeper }: { number: number; keeper: DraftKeeper }) {
  const colors = useColors();
  return (
    <View role="alert" style={{ margin: 16, padding: 14, gap: 10, backgroundColor: colors.methylFaint, borderRadius: radius.control }}>
      <Text>{words.save.conflict(number)}</Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button isSmall onPress={() => keeper.takeTheirs()}>
          {words.save.takeTheirs}
        </Button>
        <Button isSmall onPress={() => keeper.keepMine()}>
          {words.save.keepMine}
        </Button>
      </View>
    </View>
  );
}
