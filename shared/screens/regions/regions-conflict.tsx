import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { words } from './words';

/** Shown while someone else's regions stand on the server. */
export function RegionsConflict({ onTheirs, onMine }: { onTheirs: () => void; onMine: () => void }) {
  const colors = useColors();
  return (
    <View role="alert" style={{ margin: 16, padding: 14, gap: 10, backgroundColor: colors.methylFaint, borderRadius: radius.control }}>
      <Text>{words.conflict}</Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button isSmall onPress={onTheirs}>
          {words.takeTheirs}
        </Button>
        <Button isSmall onPress={onMine}>
          {words.keepMine}
        </Button>
      </View>
    </View>
  );
}
