import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Icon } from '../../ui/icon';
import { Pressable } from '../../ui/pressable';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { BoxPanel, type PaperItem } from './box-panel';
import type { DrawnBox, RegionsAct, RegionsState } from './regions-state';
import { words } from './words';

interface RegionsSideProps {
  readonly state: RegionsState;
  readonly items: readonly PaperItem[];
  readonly isLocked: boolean;
  readonly errors: Readonly<Record<string, string>>;
  readonly nameOf: (box: DrawnBox) => string;
  readonly placeOf: (box: DrawnBox) => string;
  readonly dispatch: (act: RegionsAct) => void;
  readonly newId: () => string;
}

const waiting = ({ boxes }: RegionsState, items: readonly PaperItem[]) =>
  items.filter(({ id }) => !boxes.some((box) => box.item === id && box.use === 'answer'));

/** The chosen box, the items that still lack one, and the boxes of the page as a list. */
export function RegionsSide({ state, items, isLocked, errors, nameOf, placeOf, dispatch, newId }: RegionsSideProps) {
  const colors = useColors();
  const chosen = state.boxes.find(({ id }) => id === state.selected);
  const without = waiting(state, items);
  const onPage = state.boxes.filter(({ pageNo }) => pageNo === state.pageNo);
  const hasNumber = state.boxes.some(({ use }) => use === 'number');
  const errorOf = (box: DrawnBox) => errors[`boxes.${state.boxes.indexOf(box)}`];
  return (
    <View style={{ gap: 24 }}>
      {chosen && !isLocked ? <BoxPanel box={chosen} items={items} place={placeOf(chosen)} error={errorOf(chosen)} dispatch={dispatch} /> : null}
      <View style={{ gap: 8 }}>
        <Text variant="head" level={2}>
          {words.without}
        </Text>
        {without.length === 0 ? (
          <View style={{ flexDirection: 'row', gap: 8, alignItems: 'center' }}>
            <Icon name="check" />
            <Text variant="small">{words.allPlaced}</Text>
          </View>
        ) : (
          without.map(({ id, number, label }) =>
            isLocked ? (
              <Text key={id} variant="small">{`${number}  ${label}`}</Text>
            ) : (
              <View key={id} style={{ alignSelf: 'flex-start' }}>
                <Button kind="text" isSmall icon="plus" onPress={() => dispatch({ act: 'place', id: newId(), item: id, use: 'answer' })}>
                  {words.place(`item ${number}, ${label}`)}
                </Button>
              </View>
            ),
          )
        )}
        {isLocked || hasNumber ? null : (
          <View style={{ alignSelf: 'flex-start' }}>
            <Button kind="text" isSmall icon="plus" onPress={() => dispatch({ act: 'place', id: newId(), item: null, use: 'number' })}>
              {words.addNumber}
            </Button>
          </View>
        )}
      </View>
      <View style={{ gap: 4 }}>
        <Text variant="head" level={2}>
          {words.boxes}
        </Text>
        {onPage.length === 0 ? (
          <Text variant="small" tone="ink2">
            {words.noBoxes}
          </Text>
        ) : null}
        {onPage.map((box) => (
          <Pressable
            key={box.id}
            onPress={() => dispatch({ act: 'select', id: box.id })}
            isPressedIn={box.id === state.selected}
            style={({ isHovered }) => ({
              paddingVertical: 8,
              paddingHorizontal: 10,
              minHeight: 44,
              borderRadius: radius.control,
              borderWidth: 2,
              borderColor: box.id === state.selected ? colors.manganate : 'transparent',
              backgroundColor: box.id === state.selected ? colors.manganateFaint : isHovered ? colors.well : 'transparent',
            })}
          >
            <Text variant="small" weight={500}>
              {nameOf(box).split(', ').slice(0, 2).join(', ')}
            </Text>
            <Text variant="micro" tone={errorOf(box) ? 'methyl' : 'ink3'}>
              {errorOf(box) ?? placeOf(box)}
            </Text>
          </Pressable>
        ))}
      </View>
    </View>
  );
}
