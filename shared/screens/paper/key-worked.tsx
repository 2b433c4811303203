import { View } from 'react-native';
import type { Derivation as DerivationData } from '../../chemistry/derivation';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { electronLabel } from '../../marking/item-label';
import { Text } from '../../ui/text';
import { ChemText } from '../chem-text';
import { WorkedDerivation } from '../worked-derivation';
import { OptionsByValue } from './options-by-value';
import { RuleHead } from './rule-head';
import { UncheckedNote } from './typed-key';
import { words } from './words';

interface KeyWorkedProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
}

/** How the key comes about: group by group, option by option, or by whose hand. */
export function KeyWorked({ draft, worked }: KeyWorkedProps) {
  const isTyped = draft.kind === 'numeric' && draft.asked.convention === 'typed';
  return (
    <View style={{ gap: 10 }} testID="key-worked">
      <RuleHead title={isTyped ? words.typed.title : words.key.title} aside={isTyped ? words.typed.aside : words.key.aside} />
      {draft.kind !== 'numeric' ? <OptionsByValue draft={draft} worked={worked} /> : isTyped ? <TypedByHand draft={draft} worked={worked} /> : <Derivations draft={draft} worked={worked} />}
    </View>
  );
}

function Derivations({ draft: { asked }, worked }: KeyWorkedProps) {
  const first = worked.derivation as DerivationData | null;
  const second = worked.otherDerivation as DerivationData | null;
  if (!first) {
    return (
      <Text variant="small" tone="ink2">
        {worked.problems[0]?.message ?? words.key.none}
      </Text>
    );
  }
  if (!second || !asked.other) return <WorkedDerivation derivation={first} quantity={asked.quantity} />;
  const result = first.steps.at(-1);
  return (
    <View style={{ gap: 10 }}>
      <Leg>{words.firstDerivation(electronLabel(asked))}</Leg>
      <WorkedDerivation derivation={{ ...first, steps: first.steps.slice(0, -1) }} quantity="zeff" />
      <Leg>{words.secondDerivation(electronLabel(asked.other))}</Leg>
      <WorkedDerivation derivation={second} quantity="zeff" />
      {result === undefined ? null : (
        <Text variant="readingM" tone="copper" weight={600} align="right" testID="difference-step">
          {result}
        </Text>
      )}
    </View>
  );
}

function Leg({ children }: { children: string }) {
  return (
    <Text weight={600} level={3}>
      <ChemText>{children}</ChemText>
    </Text>
  );
}

function TypedByHand({ draft: { asked }, worked }: KeyWorkedProps) {
  const { unit = '', source = '' } = asked.typed ?? {};
  return (
    <View style={{ gap: 8 }}>
      {worked.key ? (
        <Text variant="readingM" tone="copper" weight={600}>
          {words.typed.keyLine(worked.key.text, unit.trim())}
        </Text>
      ) : null}
      {source.trim() === '' ? null : <Text variant="small">{words.typed.from(source.trim())}</Text>}
      <UncheckedNote />
    </View>
  );
}
