import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { useVetting } from '../../client/vetting';
import type { VettingItem } from '../../contracts/vetting';
import { Cover } from '../../ui/cover';
import { Icon } from '../../ui/icon';
import { Empty } from '../../ui/page-state';
import { Pressable } from '../../ui/pressable';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { nextUnsigned, standingOf } from './standing';
import { VettingItemPane } from './vetting-item';
import { words } from './words';

/** A second person checks the keys before sheets are printed. */
export function VettingScreen({ sittingId }: { sittingId: string }) {
  const vetting = useVetting(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={vetting} fetching="Fetching the items to vet" failed="The items did not come.">
        {({ items }) => (items.length === 0 ? <Empty head={words.none}>{words.noneText}</Empty> : <Vetting sittingId={sittingId} items={items} />)}
      </QueryState>
    </InSitting>
  );
}

function Vetting({ sittingId, items }: { sittingId: string; items: readonly VettingItem[] }) {
  const colors = useColors();
  const isWide = useIsWide();
  const [chosen, setChosen] = useState(() => items.find((item) => standingOf(item) !== 'signed')?.itemId ?? items[0]?.itemId ?? '');
  const item = items.find(({ itemId }) => itemId === chosen) ?? items[0];
  if (!item) return null;
  const signed = items.filter((one) => standingOf(one) === 'signed').length;
  const list = (
    <View style={isWide ? { width: 220, borderRightWidth: 1, borderColor: colors.hair, backgroundColor: colors.glass } : { borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.glass }}>
      <View style={{ padding: 16, gap: 6 }}>
        <Text variant="head" level={1}>
          {words.title}
        </Text>
        <Text variant="small" tone="ink2">
          {words.signedOf(signed, items.length)}
        </Text>
        <ProgressRule done={signed} of={items.length} label={words.signed} />
      </View>
      <ScrollView horizontal={!isWide} style={{ flexGrow: 0 }}>
        <View role="list" aria-label={words.title} style={{ flexDirection: isWide ? 'column' : 'row' }}>
          {items.map((one) => (
            <ListRow key={one.itemId} item={one} isChosen={one.itemId === item.itemId} onChoose={() => setChosen(one.itemId)} />
          ))}
        </View>
      </ScrollView>
      {isWide ? (
        <Text variant="small" tone="ink2" style={{ padding: 16 }}>
          {words.notYours}
        </Text>
      ) : null}
    </View>
  );
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: isWide ? 'row' : 'column' }}>
      {list}
      <ScrollView {...({ tabIndex: 0, role: 'group', 'aria-label': words.item(item.number, item.label) } as object)} style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1 }}>
        <VettingItemPane key={item.itemId} sittingId={sittingId} item={item} next={nextUnsigned(items, item.itemId)} onNext={setChosen} />
      </ScrollView>
    </View>
  );
}

function ListRow({ item, isChosen, onChoose }: { item: VettingItem; isChosen: boolean; onChoose: () => void }) {
  const colors = useColors();
  const standing = standingOf(item);
  const said = { signed: words.signed, 'sent-back': words.sentBack, worked: words.worked, 'to-work': words.toWork }[standing];
  return (
    <View role="listitem">
      <Pressable
        onPress={onChoose}
        isFocusInside
        isPressedIn={isChosen}
        testID={`vet-${item.number}`}
        style={({ isHovered }) => ({ minHeight: 60, minWidth: 150, flexDirection: 'row', alignItems: 'center', gap: 10, paddingHorizontal: 16, paddingVertical: 6, borderWidth: 2, borderColor: isChosen ? colors.manganate : 'transparent', borderBottomColor: isChosen ? colors.manganate : colors.hair, backgroundColor: isChosen ? colors.manganateFaint : isHovered ? colors.well : 'transparent' })}
      >
        <Text weight={600} style={{ width: 22 }}>
          {item.number}
        </Text>
        <View style={{ flex: 1, gap: 2 }}>
          <Text>
            <ChemText>{item.label}</ChemText>
          </Text>
          {item.key === null ? (
            <Cover />
          ) : (
            <Text variant="readingS" tone="copper">
              {item.key}
            </Text>
          )}
        </View>
        {standing === 'signed' ? <Icon name="check" size={16} /> : null}
        <Text variant="small" tone={standing === 'sent-back' ? 'iodine' : 'ink2'}>
          {said}
        </Text>
      </Pressable>
    </View>
  );
}
