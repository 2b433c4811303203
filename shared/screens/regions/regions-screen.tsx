import { useRouter } from 'expo-router';
import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useItems } from '../../client/items';
import { sampleUrl, useLayout } from '../../client/layouts';
import { useSitting } from '../../client/sittings';
import type { LayoutView } from '../../contracts/layouts';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size } from '../../ui/tokens';
import { useIsWide } from '../../ui/use-breakpoint';
import { plainChem } from '../chem-text-parts';
import { InSitting } from '../in-sitting';
import { pickFile } from '../pick-file';
import { QueryState } from '../query-state';
import { clockTime } from '../times';
import type { PaperItem } from './box-panel';
import { PageBar } from './page-bar';
import { PageCanvas } from './page-canvas';
import { RegionsConflict } from './regions-conflict';
import { RegionsSide } from './regions-side';
import { nextItem, type DrawnBox } from './regions-state';
import { useRegions } from './use-regions';
import { words } from './words';

/** Where the answers stand on the pages of the paper. */
export function RegionsScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  return (
    <InSitting sittingId={sittingId}>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {({ roles }) =>
          roles.includes('lead') || roles.includes('external') ? (
            <Regions sittingId={sittingId} isLead={roles.includes('lead')} />
          ) : (
            <Text style={{ padding: 32, maxWidth: 560 }}>{words.notAllowed}</Text>
          )
        }
      </QueryState>
    </InSitting>
  );
}

function Regions({ sittingId, isLead }: { sittingId: string; isLead: boolean }) {
  const layout = useLayout(sittingId);
  const items = useItems(sittingId);
  return (
    <QueryState query={items} fetching="Fetching the paper" failed="The paper did not come.">
      {(list) => (
        <QueryState query={layout} fetching="Fetching the regions" failed="The regions did not come.">
          {(found) => (
            <RegionsEditor
              sittingId={sittingId}
              layout={found}
              items={list.items.map(({ id, number, worked }) => ({ id, number, label: plainChem(worked.label) }))}
              canChange={isLead && !found.isLocked}
            />
          )}
        </QueryState>
      )}
    </QueryState>
  );
}

interface RegionsEditorProps {
  readonly sittingId: string;
  readonly layout: LayoutView;
  readonly items: readonly PaperItem[];
  readonly canChange: boolean;
}

const zooms = [1, 1.5, 2, 3] as const;
const mm = (value: number): string => String(Math.round(value * 10) / 10);

function RegionsEditor({ sittingId, layout, items, canChange }: RegionsEditorProps) {
  const colors = useColors();
  const router = useRouter();
  const isWide = useIsWide();
  const ids = items.map(({ id }) => id).join(' ');
  const itemIds = useMemo(() => (ids === '' ? [] : ids.split(' ')), [ids]);
  const regions = useRegions(sittingId, layout, itemIds);
  const { state, dispatch } = regions;
  const [room, setRoom] = useState(0);
  const [zoom, setZoom] = useState(0);
  const page = state.pages[state.pageNo - 1];
  const sample = layout.pages.find(({ pageNo }) => pageNo === state.pageNo)?.sample ?? null;
  const padding = isWide ? 24 : 12;
  const fitted = page ? Math.min((room - 2 * padding) / page.widthMm, isWide ? 4.2 : Infinity) : 1;
  const scale = fitted * (zooms[zoom] ?? 1);

  const itemOf = (box: DrawnBox) => items.find(({ id }) => id === box.item);
  const placeOf = (box: DrawnBox) => words.placeText(mm(box.w), mm(box.h), mm(box.x), mm(box.y));
  const whatOf = (box: DrawnBox) => {
    const item = itemOf(box);
    return box.use === 'number' ? words.use.number : `item ${item?.number ?? '?'}, ${words.use[box.use]}`;
  };
  const nameOf = (box: DrawnBox) => {
    const what = whatOf(box);
    return words.boxName(what.charAt(0).toUpperCase() + what.slice(1), placeOf(box));
  };
  const tagOf = (box: DrawnBox) => (box.use === 'number' ? words.useTag.number : `${itemOf(box)?.number ?? '?'}${words.useTag[box.use]}`);

  if (items.length === 0) {
    return (
      <View style={{ padding: 32, gap: 14, alignItems: 'flex-start', maxWidth: 560 }}>
        <Text variant="display" level={1}>
          {words.title}
        </Text>
        <Text>{words.noItems}</Text>
        <Button kind="primary" onPress={() => router.push(`/sittings/${sittingId}/paper`)}>
          {words.toPaper}
        </Button>
      </View>
    );
  }

  const standing = regions.hasUnsaved ? words.unsaved : regions.savedAt === null ? '' : words.saved(clockTime(regions.savedAt));
  return (
    <View style={{ flex: 1 }}>
      <View
        style={{ minHeight: size.topBarWide, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 14, rowGap: 6, paddingHorizontal: isWide ? 24 : 16, paddingVertical: 10, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}
      >
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 220, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 14 }}>
          <Text variant="title" level={1}>
            {words.title}
          </Text>
          <Text variant="small" tone={regions.hasUnsaved ? 'iodine' : 'ink2'} live="polite" testID="regions-standing">
            {canChange ? standing : layout.isLocked ? words.locked : words.readOnly}
          </Text>
        </View>
        {canChange ? (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 10 }}>
            <Button kind="text" icon="takeBack" onPress={() => dispatch({ act: 'undo' })} closed={state.past.length > 0 ? undefined : ''}>
              {words.undo}
            </Button>
            <Button onPress={() => dispatch({ act: 'reset' })} closed={regions.hasUnsaved ? undefined : ''}>
              {words.reset}
            </Button>
            <Button kind="primary" isBusy={regions.isSaving} onPress={regions.save} closed={regions.hasUnsaved ? undefined : ''} label={regions.hasUnsaved ? words.save : `${words.save}. ${words.nothingToSave}`} testID="save-regions">
              {words.save}
            </Button>
          </View>
        ) : null}
      </View>
      {regions.theirs ? <RegionsConflict onTheirs={regions.takeTheirs} onMine={regions.keepMine} /> : null}
      {regions.message === null ? null : (
        <Text tone="methyl" live="assertive" style={{ paddingHorizontal: isWide ? 24 : 16, paddingVertical: 10 }}>
          {regions.message}
        </Text>
      )}
      <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column' }}>
        <View style={{ flex: isWide ? 1 : undefined, minWidth: 0, backgroundColor: colors.mat }}>
          <PageBar
            state={state}
            hasSample={sample !== null}
            canChange={canChange}
            isSending={regions.isSendingSample}
            dispatch={dispatch}
            onPicture={() => void pickFile('image/jpeg,image/png,image/webp,image/tiff').then((file) => file && regions.sendSample(file))}
            next={isWide ? null : (items.find(({ id }) => id === nextItem(state, itemIds)) ?? null)}
            newId={uuidv7}
            onCloser={zoom < zooms.length - 1 ? () => setZoom(zoom + 1) : null}
            onFarther={zoom > 0 ? () => setZoom(zoom - 1) : null}
          />
          <View onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)} style={{ padding, alignItems: zoom === 0 ? 'center' : 'flex-start', ...({ overflow: 'auto' } as object) }}>
            {page && room > 0 ? (
              <PageCanvas
                page={page}
                sample={sample === null ? null : sampleUrl(sittingId, state.pageNo, sample)}
                boxes={state.boxes.filter(({ pageNo }) => pageNo === state.pageNo)}
                selected={state.selected}
                isLocked={!canChange}
                scale={scale}
                nameOf={nameOf}
                tagOf={tagOf}
                dispatch={dispatch}
                newId={uuidv7}
              />
            ) : null}
          </View>
        </View>
        <View style={{ width: isWide ? 340 : undefined, padding: isWide ? 24 : 16, gap: 20, backgroundColor: colors.paper, borderLeftWidth: isWide ? 1 : 0, borderColor: colors.hair }}>
          <Text variant="small" tone="ink2">
            {canChange ? (isWide ? words.drawHint : words.touchHint) : words.lead}
          </Text>
          <RegionsSide state={state} items={items} isLocked={!canChange} errors={regions.errors} nameOf={nameOf} placeOf={placeOf} dispatch={dispatch} newId={uuidv7} />
        </View>
      </View>
    </View>
  );
}
