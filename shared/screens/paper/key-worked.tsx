import { View } from 'react-native';
import type { Derivation as DerivationData } from '../../chemistry/derivation';
import type { WorkedDraft } from '../../contracts/items';
import { Text } from '../../ui/text';
import { WorkedDerivation } from '../worked-derivation';
import { words } from './words';

/** How the key comes about, group by group, with its source. */
export function KeyWorked({ worked, quantity }: { worked: WorkedDraft; quantity: string }) {
  const derivation = worked.derivation as DerivationData | null;
  return (
    <View style={{ gap: 10 }} testID="key-worked">
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Text variant="head" level={2}>
          {words.key.title}
        </Text>
        <Text variant="small" tone="ink2">
          {words.key.aside}
        </Text>
      </View>
      {derivation ? (
        <WorkedDerivation derivation={derivation} quantity={quantity} />
      ) : (
        <Text variant="small" tone="ink2">
          {worked.problems[0]?.message ?? words.key.none}
        </Text>
      )}
    </View>
  );
}
