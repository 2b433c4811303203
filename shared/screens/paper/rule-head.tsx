import { View } from 'react-native';
import { Text } from '../../ui/text';

/** The head of a group of rules, with a few words of what they do. */
export function RuleHead({ title, aside }: { title: string; aside: string }) {
  return (
    <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', flexWrap: 'wrap', columnGap: 12 }}>
      <Text variant="head" level={2}>
        {title}
      </Text>
      <Text variant="small" tone="ink2">
        {aside}
      </Text>
    </View>
  );
}
