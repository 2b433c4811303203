import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import type { SheetPreview } from '../../contracts/printings';
import { IconButton } from '../../ui/icon-button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { SheetPage } from './sheet-page';
import { words } from './words';

const widestPx = 820;

/** One candidate's sheets, a page at a time on the mat; what belongs to it stands under it, never over it. */
export function SheetView({ preview }: { preview: SheetPreview }) {
  const colors = useColors();
  const isWide = useIsWide();
  const [room, setRoom] = useState(0);
  const [chosen, setChosen] = useState(1);
  const pages = preview.pages.length;
  const pageNo = Math.min(chosen, Math.max(1, pages));
  const page = preview.pages[pageNo - 1];
  const owner = preview.sample ?? words.preview.spare;
  const margin = isWide ? 28 : 10;
  if (!page) return <Text style={{ padding: 32, maxWidth: 560 }}>{preview.problem}</Text>;
  return (
    <View style={{ flex: 1, minHeight: 0, backgroundColor: colors.mat }}>
      <ScrollView {...({ tabIndex: 0, role: 'group', 'aria-label': words.preview.of(owner) } as object)} style={{ flex: 1 }} contentContainerStyle={{ padding: margin, alignItems: 'center' }} onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}>
        {room > 0 ? <SheetPage page={page} widthMm={preview.widthMm} heightMm={preview.heightMm} width={Math.min(room - 2 * margin, widestPx)} label={words.preview.spoken(pageNo, pages, owner)} /> : null}
      </ScrollView>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, paddingHorizontal: isWide ? 28 : 12, paddingVertical: 6, backgroundColor: colors.paper, borderTopWidth: 1, borderColor: colors.hair }}>
        <Text variant="small" tone="ink2" style={{ flex: 1 }}>
          {words.preview.of(owner)}
        </Text>
        <IconButton icon="back" label={words.preview.previous} isDisabled={pageNo === 1} onPress={() => setChosen(pageNo - 1)} />
        <Text variant="small" isTabular live="polite" testID="sheet-page-no">
          {words.preview.page(pageNo, pages)}
        </Text>
        <IconButton icon="forward" label={words.preview.next} isDisabled={pageNo === pages} onPress={() => setChosen(pageNo + 1)} testID="next-sheet-page" />
      </View>
    </View>
  );
}
