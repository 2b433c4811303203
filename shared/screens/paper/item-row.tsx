import type { KeyboardEventHandler, PointerEventHandler } from 'react';
import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { Icon } from '../../ui/icon';
import { Pressable } from '../../ui/pressable';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Tube } from '../../ui/tube';
import { ChemText } from '../chem-text';
import { quantityShort } from './item-names';
import { words } from './words';

/** A row, and how much more one has that follows another. */
export const itemRowHeight = 58;
export const followsHeight = 16;

interface ItemRowProps {
  readonly item: ItemView;
  /** The numbers of the items it follows. */
  readonly follows: readonly number[];
  /** Its place while the list is being sorted. */
  readonly number: number;
  readonly isChosen: boolean;
  readonly grip: Readonly<Record<string, PointerEventHandler<HTMLElement>>> | null;
  readonly onKeyDown: KeyboardEventHandler<HTMLElement>;
  readonly onPress: () => void;
}

/** One item in the list of the paper. */
export function ItemRow({ item, follows, number, isChosen, grip, onKeyDown, onPress }: ItemRowProps) {
  const colors = useColors();
  const { worked, maxGrains } = item;
  const marks = marksText(maxGrains);
  const key = worked.key?.text ?? words.noKey;
  // Most items ask for Z_eff: only what else is asked for is said.
  const quantity = item.draft.asked.quantity === 'zeff' || item.draft.asked.quantity === 'difference' ? '' : quantityShort(item.draft);
  const needsLook = worked.problems.length > 0;
  return (
    <View {...({ onKeyDown } as object)} style={{ flexDirection: 'row', height: itemRowHeight + (follows.length > 0 ? followsHeight : 0), borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ flex: 1 }}>
        <Pressable
          onPress={onPress}
          isPressedIn={isChosen}
          testID={`item-row-${item.id}`}
          style={({ isHovered }) => ({
            flex: 1,
            flexDirection: 'row',
            alignItems: 'center',
            gap: 8,
            paddingLeft: 6,
            paddingRight: 6,
            borderWidth: 2,
            borderColor: isChosen ? colors.manganate : 'transparent',
            backgroundColor: isChosen ? colors.manganateFaint : isHovered ? colors.well : 'transparent',
          })}
        >
          <Text weight={600} align="right" lines={1} style={{ width: 22 }}>
            {number}
          </Text>
          <View style={{ flex: 1, minWidth: 0 }}>
            <Text weight={500} lines={1}>
              <ChemText>{worked.label}</ChemText>
              {quantity === '' ? null : (
                <Text variant="small" tone="ink2">
                  {'  '}
                  <ChemText beside="small">{quantity}</ChemText>
                </Text>
              )}
            </Text>
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, height: 26 }}>
              <Text variant={key.length > 9 ? 'grad' : 'readingS'} tone={worked.key ? 'copper' : 'methyl'} weight={400} lines={1} style={{ flex: 1 }}>
                {key}
              </Text>
              {needsLook ? <Icon name="warning" tone="iodine" /> : null}
              <Tube state="given" got={maxGrains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} />
              <Text weight={600} style={{ minWidth: 16 }}>
                {marks}
              </Text>
            </View>
            {follows.length > 0 ? (
              <View style={{ flexDirection: 'row', alignItems: 'center', gap: 4 }}>
                <Icon name="follows" size={14} tone="manganate" />
                <Text variant="micro" tone="ink2" lines={1} testID={`follows-${number}`}>
                  {words.follow.followsShort(follows)}
                </Text>
              </View>
            ) : null}
          </View>
        </Pressable>
      </View>
      {grip ? (
        <View {...(grip as object)} aria-hidden testID={`grip-${number}`} style={{ width: 26, alignItems: 'center', justifyContent: 'center', ...({ cursor: 'grab', touchAction: 'none' } as object) }}>
          <Icon name="more" tone="ink3" size={16} />
        </View>
      ) : null}
    </View>
  );
}
