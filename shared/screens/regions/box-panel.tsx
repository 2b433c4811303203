import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Text } from '../../ui/text';
import type { BoxUse, DrawnBox, RegionsAct } from './regions-state';
import { words } from './words';

export interface PaperItem {
  readonly id: string;
  readonly number: number;
  readonly label: string;
}

interface BoxPanelProps {
  readonly box: DrawnBox;
  readonly items: readonly PaperItem[];
  readonly place: string;
  readonly error: string | undefined;
  readonly dispatch: (act: RegionsAct) => void;
}

const uses: readonly BoxUse[] = ['answer', 'working', 'number'];

/** What the chosen box is for. */
export function BoxPanel({ box, items, place, error, dispatch }: BoxPanelProps) {
  const [first] = items;
  return (
    <View style={{ gap: 12 }} testID="box-panel">
      <View>
        <Text variant="head" level={2}>
          {words.chosen}
        </Text>
        <Text variant="small" tone="ink2">
          {place}
        </Text>
      </View>
      <View role="group" aria-label={words.useLabel} style={{ gap: 6 }}>
        <Text variant="label">{words.useLabel}</Text>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 6 }}>
          {uses.map((use) => (
            <Chip
              key={use}
              isChosen={box.use === use}
              onPress={() => dispatch({ act: 'assign', id: box.id, use, item: box.item ?? first?.id ?? null })}
            >
              {words.use[use]}
            </Chip>
          ))}
        </View>
      </View>
      {box.use === 'number' ? null : (
        <View role="group" aria-label={words.item} style={{ gap: 6 }}>
          <Text variant="label">{words.item}</Text>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 6 }}>
            {items.map(({ id, number, label }) => (
              <Chip key={id} isChosen={box.item === id} onPress={() => dispatch({ act: 'assign', id: box.id, use: box.use, item: id })}>
                {`${number}  ${label}`}
              </Chip>
            ))}
          </View>
        </View>
      )}
      {error === undefined ? null : (
        <Text variant="small" tone="methyl" live="polite">
          {error}
        </Text>
      )}
      <View style={{ alignSelf: 'flex-start' }}>
        <Button kind="danger" isSmall icon="delete" onPress={() => dispatch({ act: 'remove', id: box.id })}>
          {words.remove}
        </Button>
      </View>
    </View>
  );
}
