import { useState, type KeyboardEvent as ReactKeyboardEvent, type PointerEvent as ReactPointerEvent } from 'react';
import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { marksText } from '../../marking/grains';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useHasKeyboard } from '../../ui/use-has-keyboard';
import { numbersFollowed } from './chain-of';
import { droppedAt } from './drop-place';
import { followsHeight, ItemRow, itemRowHeight } from './item-row';
import { words } from './words';

interface ItemListProps {
  readonly items: readonly ItemView[];
  readonly chosen: string | null;
  readonly canChange: boolean;
  readonly isAdding: boolean;
  readonly onChoose: (id: string) => void;
  readonly onOrder: (ids: readonly string[]) => void;
  readonly onAdd: () => void;
  readonly onBank: () => void;
}

interface Drag {
  readonly id: string;
  readonly from: number;
  readonly y: number;
  readonly to: number;
}

const movedTo = (ids: readonly string[], from: number, to: number): string[] => {
  const rest = ids.filter((_id, index) => index !== from);
  const id = ids[from];
  return id === undefined ? [...ids] : [...rest.slice(0, to), id, ...rest.slice(to)];
};

/** The items of the paper: number, electron, key, marks. A row is moved by its grip, or by Alt with the arrow keys. */
export function ItemList({ items, chosen, canChange, isAdding, onChoose, onOrder, onAdd, onBank }: ItemListProps) {
  const colors = useColors();
  const [drag, setDrag] = useState<Drag | null>(null);
  const hasKeyboard = useHasKeyboard();
  const ids = items.map(({ id }) => id);
  const shown = drag ? movedTo(ids, drag.from, drag.to) : ids;
  const byId = new Map(items.map((item) => [item.id, item]));
  const heights = items.map(({ draft }) => itemRowHeight + (draft.followThrough ? followsHeight : 0));
  const total = items.reduce((sum, { maxGrains }) => sum + maxGrains, 0);

  const move = (id: string, by: number) => {
    const from = ids.indexOf(id);
    const to = Math.min(Math.max(from + by, 0), ids.length - 1);
    if (to !== from) onOrder(movedTo(ids, from, to));
  };

  const onKeyDown = (id: string) => (event: ReactKeyboardEvent<HTMLElement>) => {
    const by = event.key === 'ArrowUp' ? -1 : event.key === 'ArrowDown' ? 1 : 0;
    if (by === 0) return;
    event.preventDefault();
    if (event.altKey) {
      if (canChange) move(id, by);
      return;
    }
    const next = ids[ids.indexOf(id) + by];
    if (next === undefined) return;
    onChoose(next);
    document.querySelector<HTMLElement>(`[data-testid="item-row-${next}"]`)?.focus();
  };

  const grip = (id: string) => ({
    onPointerDown: (event: ReactPointerEvent<HTMLElement>) => {
      event.preventDefault();
      event.currentTarget.setPointerCapture(event.pointerId);
      const from = ids.indexOf(id);
      setDrag({ id, from, to: from, y: event.clientY });
    },
    onPointerMove: (event: ReactPointerEvent<HTMLElement>) => {
      if (!drag) return;
      const to = droppedAt(heights, drag.from, event.clientY - drag.y);
      if (to !== drag.to) setDrag({ ...drag, to });
    },
    onPointerUp: () => {
      if (drag && drag.to !== drag.from) onOrder(movedTo(ids, drag.from, drag.to));
      setDrag(null);
    },
    onPointerCancel: () => setDrag(null),
  });

  return (
    <View>
      <View style={{ paddingHorizontal: 16, paddingVertical: 18, borderBottomWidth: 1, borderColor: colors.hair }}>
        <Text variant="head" level={2}>
          {words.items}
        </Text>
        <Text variant="small" tone="ink2">
          {words.itemsSummary(items.length, marksText(total))}
        </Text>
      </View>
      <View role="list" aria-label={words.items}>
        {shown.map((id, index) => {
          const item = byId.get(id);
          if (!item) return null;
          return (
            <View key={id} role="listitem" style={{ opacity: drag?.id === id ? 0.7 : 1 }}>
              <ItemRow
                item={item}
                follows={numbersFollowed(items, item)}
                number={index + 1}
                isChosen={id === chosen}
                grip={canChange && items.length > 1 ? grip(id) : null}
                onKeyDown={onKeyDown(id)}
                onPress={() => onChoose(id)}
              />
            </View>
          );
        })}
      </View>
      {canChange ? (
        <View style={{ paddingHorizontal: 12, paddingVertical: 10, gap: 6, alignItems: 'flex-start' }}>
          <Button kind="text" icon="plus" isBusy={isAdding} onPress={onAdd} testID="add-item">
            {words.addItem}
          </Button>
          <Button kind="text" isSmall icon="tray" onPress={onBank} testID="item-bank">
            {words.bank.open}
          </Button>
          {items.length > 1 && hasKeyboard ? (
            <Text variant="micro" tone="ink3" style={{ paddingHorizontal: 8 }}>
              {words.moveHint}
            </Text>
          ) : null}
        </View>
      ) : null}
    </View>
  );
}
