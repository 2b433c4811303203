import { View } from 'react-native';
import type { ItemDraft } from '../../contracts/items';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { words } from './words';

interface CodePoliciesProps {
  readonly draft: ItemDraft;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

const policies = (['ask', 'none', 'last'] as const).map((value) => ({ value, label: words.counts.policies[value] }));

/** What becomes of an answer that leaves no value to mark. */
export function CodePolicies({ draft, onChange }: CodePoliciesProps) {
  const isLast = draft.crossedOut === 'last' || draft.twoAnswers === 'last';
  return (
    <View style={{ gap: 10, marginTop: 16 }}>
      <Text variant="head" level={2}>
        {words.counts.codes}
      </Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16 }}>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <Select label={words.counts.crossedOut} value={draft.crossedOut} options={policies} onChange={(crossedOut) => onChange({ ...draft, crossedOut }, 'crossed-out')} testID="crossed-out" />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <Select label={words.counts.twoAnswers} value={draft.twoAnswers} options={policies} onChange={(twoAnswers) => onChange({ ...draft, twoAnswers }, 'two-answers')} testID="two-answers" />
        </View>
      </View>
      {isLast ? (
        <Text variant="small" testID="last-counts">
          {words.policy.last}
        </Text>
      ) : null}
      <Text variant="small" tone="ink2">
        {words.counts.blank}
      </Text>
    </View>
  );
}
