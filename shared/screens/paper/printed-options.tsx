import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import type { FieldsProps } from './asked-fields';
import { moved, withOptions } from './draft-changes';
import { ElementPicker } from './element-picker';
import { outermostElectron } from './new-draft';
import { OptionRow } from './option-row';
import { words } from './words';

const most = 9;
const fewest = 2;
const w = words.options;

/** The options of a choice or an order as they are numbered, each with its value; which are right, the server works out. */
export function PrintedOptions({ draft, worked, problemAt, onChange }: FieldsProps) {
  const [isPicking, setPicking] = useState(false);
  const { printed } = draft;
  if (!printed) return null;
  const { options } = printed;
  const answer = draft.kind === 'choice' ? Number(worked.key?.text ?? 0) : 0;
  const problem = problemAt('printed.options') ?? problemAt('printed');
  const put = (next: typeof options, field: string) => onChange(withOptions(draft, next), field);
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', alignItems: 'baseline', columnGap: 12 }}>
        <Text variant="small" weight={600} level={3}>
          {w.title}
        </Text>
        <Text variant="small" tone="ink2">
          {w.aside}
        </Text>
      </View>
      <View role="list" aria-label={w.title}>
        {options.map((option, index) => (
          <OptionRow
            key={index}
            option={option}
            index={index}
            count={options.length}
            value={worked.options[index] ?? null}
            isAnswer={answer === index + 1}
            problemAt={problemAt}
            onChange={(changes, field) => put(options.map((known, at) => (at === index ? { ...known, ...changes } : known)), `option-${index}-${field}`)}
            onMove={(by) => put(moved(options, index, by), `option-moved-${index}-${by}`)}
            onRemove={options.length > fewest ? () => put(options.filter((_known, at) => at !== index), `option-removed-${options.length}`) : null}
          />
        ))}
      </View>
      {problem ? (
        <Text variant="small" tone="methyl" live="polite" testID="options-problem">
          {problem}
        </Text>
      ) : null}
      <View style={{ alignItems: 'flex-start' }}>
        {options.length < most ? (
          <Button kind="text" isSmall icon="plus" onPress={() => setPicking(true)} testID="add-option">
            {w.add}
          </Button>
        ) : (
          <Text variant="small" tone="ink2">
            {w.most}
          </Text>
        )}
      </View>
      {isPicking ? (
        <ElementPicker
          chosen=""
          onClose={() => setPicking(false)}
          onChoose={(symbol) => {
            setPicking(false);
            put([...options, { symbol, charge: 0, electron: outermostElectron(symbol) }], `option-added-${options.length}`);
          }}
        />
      ) : null}
    </View>
  );
}
