import { useId, useState } from 'react';
import { View } from 'react-native';
import type { DeskItem } from '../../contracts/desk';
import { IconButton } from '../../ui/icon-button';
import { Link } from '../../ui/link';
import { Popover } from '../../ui/popover';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { ChemText } from '../chem-text';
import { words as blankWords } from '../blanks/words';
import { words } from './words';

interface ItemMenuProps {
  readonly sittingId: string;
  readonly items: readonly DeskItem[];
  readonly chosen: string;
  readonly emptyBoxes: number;
}

/** The items of the sitting with what is left of each. */
export function ItemMenu({ sittingId, items, chosen, emptyBoxes }: ItemMenuProps) {
  const colors = useColors();
  const menu = useId();
  const [isOpen, setOpen] = useState(false);
  return (
    <View>
      <IconButton icon="more" label={words.items} onPress={() => setOpen(!isOpen)} isExpanded={isOpen} testID="items" />
      {isOpen ? (
        <Popover id={menu} label={words.items} onClose={() => setOpen(false)} style={{ right: 12, top: 60, width: 270, maxHeight: '80vh', overflowY: 'auto' }}>
          {emptyBoxes > 0 ? (
            <Link
              href={`/sittings/${sittingId}/blanks`}
              isFocusInside
              testID="empty-boxes"
              style={({ isHovered }) => ({ minHeight: 48, justifyContent: 'center', paddingHorizontal: 12, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: isHovered ? colors.well : 'transparent' })}
            >
              <Text weight={600}>{blankWords.lookEmpty(emptyBoxes)}</Text>
            </Link>
          ) : null}
          {items.map(({ id, number, label, toRead }) => (
            <Link
              key={id}
              href={`/desk/${sittingId}?item=${id}`}
              isCurrent={id === chosen}
              isFocusInside
              style={({ isHovered }) => ({ minHeight: 44, flexDirection: 'row', alignItems: 'center', gap: 10, paddingHorizontal: 12, backgroundColor: isHovered ? colors.well : 'transparent' })}
            >
              <Text weight={id === chosen ? 600 : 400} style={{ flex: 1 }}>
                <ChemText>{words.item(number, label)}</ChemText>
              </Text>
              <Text variant="small" tone="ink2" isTabular>
                {words.itemToGo(toRead)}
              </Text>
            </Link>
          ))}
        </Popover>
      ) : null}
    </View>
  );
}
