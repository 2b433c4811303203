import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size, space } from '../../ui/tokens';
import { useBreakpoint } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { AskedFields } from './asked-fields';
import { itemTitle } from './item-names';
import { ItemScale } from './item-scale';
import { KeyWorked } from './key-worked';
import { PrintedStem } from './printed-stem';
import { RemoveDialog } from './remove-dialog';
import { ConflictNotice, SaveLine } from './save-line';
import { SpotTestPane } from './spot-test-pane';
import { useKeeper, useKept } from './use-keepers';
import { useSpot } from './use-spot';
import { useWorked } from './use-worked';
import { WhatCounts } from './what-counts';
import { words } from './words';

interface ItemEditorProps {
  readonly item: ItemView;
  readonly items: readonly ItemView[];
  readonly lockButton: ReactNode;
  readonly back: ReactNode;
  readonly onMove: (by: number) => void;
  readonly onChoose: (id: string) => void;
  readonly onRemoved: () => void;
}

/** One item of an open paper: what is asked, its key, what counts, and a value to try against it. */
export function ItemEditor({ item, items, lockButton, back, onMove, onChoose, onRemoved }: ItemEditorProps) {
  const colors = useColors();
  const breakpoint = useBreakpoint();
  const isWide = breakpoint === 'wide' || breakpoint === 'full';
  const keeper = useKeeper(item.sittingId, item);
  const { draft, save, canUndo } = useKept(keeper);
  const worked = useWorked(item, draft);
  const isStored = JSON.stringify(draft) === JSON.stringify(item.draft);
  const spot = useSpot(item.id, isStored ? null : draft);
  const [isRemoving, setRemoving] = useState(false);
  const refused = save.kind === 'refused' ? save.fields : {};
  const problemAt = (path: string) => worked.problems.find((problem) => problem.path === path)?.message ?? refused[path];

  // Links are drawn as they stand in the draft, stored or not.
  const paper = items.map((known) => (known.id === item.id ? { ...known, draft, worked } : known));
  const fields = { draft, worked, problemAt, onChange: keeper.change };

  const spotTest = <SpotTestPane spot={spot} draft={draft} items={paper} isWorked={worked.key !== null} />;
  const scale = <ItemScale draft={draft} worked={worked} value={spot.drop} />;
  const asked = <AskedFields {...fields} />;
  const printed = <PrintedStem number={item.number} draft={draft} worked={worked} error={problemAt('prompt')} canChange onChange={keeper.change} />;
  const key = <KeyWorked draft={draft} worked={worked} />;
  const counts = <WhatCounts {...fields} items={paper} itemId={item.id} onChoose={onChoose} />;
  const foot = (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
      <Button kind="text" isSmall icon="up" onPress={() => onMove(-1)} closed={item.number === 1 ? '' : undefined}>
        {words.moveUp}
      </Button>
      <Button kind="text" isSmall icon="down" onPress={() => onMove(1)} closed={item.number === items.length ? '' : undefined}>
        {words.moveDown}
      </Button>
      <Button kind="danger" isSmall icon="delete" onPress={() => setRemoving(true)} testID="remove-item">
        {words.remove}
      </Button>
    </View>
  );

  return (
    <View style={{ flex: 1 }}>
      <View
        style={{
          minHeight: size.topBarWide,
          flexDirection: 'row',
          flexWrap: 'wrap',
          alignItems: 'center',
          columnGap: 16,
          rowGap: 4,
          paddingHorizontal: isWide ? 24 : 16,
          paddingVertical: 10,
          borderBottomWidth: 1,
          borderColor: colors.hair,
          backgroundColor: colors.paper,
        }}
      >
        {back}
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 240, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 14 }}>
          <Text variant="title" level={1}>
            <ChemText beside="title">{itemTitle(item.number, draft, worked.label)}</ChemText>
          </Text>
          <SaveLine save={save} />
        </View>
        <View style={{ flexDirection: 'row', alignItems: 'flex-start', gap: 12 }}>
          <Button kind="text" icon="takeBack" onPress={() => keeper.undo()} closed={canUndo ? undefined : ''} testID="undo">
            {words.undo}
          </Button>
          {lockButton}
        </View>
      </View>
      {save.kind === 'conflict' ? <ConflictNotice number={item.number} keeper={keeper} /> : null}
      {isWide ? (
        <>
          <View style={{ flexDirection: 'row', gap: 28, paddingHorizontal: 24, paddingVertical: 14, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
            <View style={{ width: 292 }}>{spotTest}</View>
            <View style={{ flex: 1, minWidth: 0 }}>{scale}</View>
          </View>
          <View style={{ flex: 1, flexDirection: 'row', alignItems: 'stretch' }}>
            <View style={{ flex: 4, minWidth: 0, paddingHorizontal: 24, paddingVertical: 18, gap: 20, backgroundColor: colors.paper, borderRightWidth: 1, borderColor: colors.hair }}>
              {asked}
              {printed}
              {key}
              {foot}
            </View>
            <View style={{ flex: 6, minWidth: 0, paddingHorizontal: 24, paddingVertical: 18, backgroundColor: colors.bench }}>{counts}</View>
          </View>
        </>
      ) : (
        <View style={{ backgroundColor: colors.paper }}>
          <View style={{ padding: space[4] }}>{spotTest}</View>
          <View style={{ ...({ position: 'sticky', top: 0, zIndex: 1 } as object), backgroundColor: colors.paper, paddingHorizontal: 8, borderBottomWidth: 1, borderColor: colors.hair }}>{scale}</View>
          <View style={{ padding: space[4], gap: 28 }}>
            {asked}
            {printed}
            {key}
            {counts}
            {foot}
          </View>
        </View>
      )}
      {isRemoving ? <RemoveDialog item={item} onClose={() => setRemoving(false)} onRemoved={onRemoved} /> : null}
    </View>
  );
}
