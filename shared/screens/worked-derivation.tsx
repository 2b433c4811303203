import { View } from 'react-native';
import type { Derivation as DerivationData } from '../chemistry/derivation';
import { Derivation } from '../ui/derivation';
import { Text } from '../ui/text';

interface WorkedDerivationProps {
  readonly derivation: DerivationData;
  /** What the item asks for: that value is the key. */
  readonly quantity: string;
}

/** How a key comes about, group by group, with the sentence on self-screening and its source. */
export function WorkedDerivation({ derivation, quantity }: WorkedDerivationProps) {
  return (
    <View style={{ gap: 10 }}>
      <Derivation
        groups={derivation.groups.map(({ subshells, counted, coefficient, contribution, isAsked, place }) => ({
          subshells,
          counted,
          coefficient: coefficient.text,
          contribution: contribution.text,
          isAsked,
          isOuter: place === 'outer',
        }))}
        nuclearCharge={derivation.nuclearCharge}
        sigma={derivation.sigma.text}
        zeff={derivation.zeff.text}
        asked={quantity === 'sigma' ? 'sigma' : 'zeff'}
      />
      {derivation.steps.map((step) => (
        <Text key={step} variant="readingS">
          {step}
        </Text>
      ))}
      <Text variant="small" tone="ink2">
        {[derivation.selfScreening, derivation.source].filter((sentence) => sentence !== null).join(' ')}
      </Text>
    </View>
  );
}
