import { View } from 'react-native';
import { Button } from '../ui/button';
import { Icon } from '../ui/icon';
import { Text } from '../ui/text';
import { useColors } from '../ui/theme';

const words = {
  doubt: 'Check position: the frame was not seen whole.',
  show: 'Show the page',
  hide: 'Hide the page',
} as const;

interface CheckPositionProps {
  readonly isWhole: boolean;
  readonly onWhole: () => void;
}

/** Beside a cut-out that may lie off its box: said quietly, with the whole page to look at. */
export function CheckPosition({ isWhole, onWhole }: CheckPositionProps) {
  const colors = useColors();
  return (
    <View testID="check-position" style={{ minHeight: 40, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', justifyContent: 'center', columnGap: 8, paddingHorizontal: 16, backgroundColor: colors.mat }}>
      <Icon name="warning" size={16} tone="ink2" />
      <Text variant="small">{words.doubt}</Text>
      <Button kind="text" isSmall icon="page" onPress={onWhole} testID="show-whole-page">
        {isWhole ? words.hide : words.show}
      </Button>
    </View>
  );
}
