import { useState } from 'react';
import { ScrollView, View } from 'react-native';
import { usePrintings, useSheetPreview } from '../../client/printings';
import { useSitting } from '../../client/sittings';
import type { PrintingView, SheetPreview } from '../../contracts/printings';
import type { SittingView } from '../../contracts/sittings';
import type { PaperSize } from '../../sheets/geometry';
import { Button, ButtonLink } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { PrintSettings } from './print-settings';
import { PrintingList } from './printing-list';
import { SheetView } from './sheet-view';
import { words } from './words';

/** Makes the answer sheets that the scanner can tell apart. */
export function SheetsScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(known) =>
          known.roles.includes('lead') || known.roles.includes('external') ? <Fetched sitting={known} /> : <Text style={{ padding: 32, maxWidth: 560 }}>{words.notAllowed}</Text>
        }
      </QueryState>
    </InSitting>
  );
}

function Fetched({ sitting }: { sitting: SittingView }) {
  const [paperSize, setPaperSize] = useState<PaperSize>('a4');
  const preview = useSheetPreview(sitting.id, paperSize);
  const printings = usePrintings(sitting.id);
  return (
    <QueryState query={preview} fetching="Fetching the sheets" failed="The sheets did not come.">
      {(shown) => (
        <QueryState query={printings} fetching="Fetching what was printed" failed="What was printed did not come.">
          {(list) => (shown.items === 0 ? <NoItems sittingId={sitting.id} /> : <Sheets sitting={sitting} preview={shown} printings={list.printings} paperSize={paperSize} onPaperSize={setPaperSize} />)}
        </QueryState>
      )}
    </QueryState>
  );
}

function NoItems({ sittingId }: { sittingId: string }) {
  return (
    <View style={{ padding: 32, gap: 14, alignItems: 'flex-start', maxWidth: 560 }}>
      <Text variant="display" level={1}>
        {words.title}
      </Text>
      <Text>{words.noItems}</Text>
      <ButtonLink kind="primary" href={`/sittings/${sittingId}/paper`}>
        {words.toPaper}
      </ButtonLink>
    </View>
  );
}

interface SheetsProps {
  readonly sitting: SittingView;
  readonly preview: SheetPreview;
  readonly printings: readonly PrintingView[];
  readonly paperSize: PaperSize;
  readonly onPaperSize: (size: PaperSize) => void;
}

function Sheets({ sitting, preview, printings, paperSize, onPaperSize }: SheetsProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const [isShown, setShown] = useState(false);
  if (!isWide && isShown) {
    return (
      <View style={{ flex: 1, minHeight: 0 }}>
        <View style={{ padding: 8, borderBottomWidth: 1, borderColor: colors.hair, alignItems: 'flex-start' }}>
          <Button kind="text" icon="back" onPress={() => setShown(false)}>
            {words.preview.back}
          </Button>
        </View>
        <SheetView preview={preview} />
      </View>
    );
  }
  const printed = <PrintingList printings={printings} canDownload={sitting.roles.includes('lead')} />;
  const settings = (
    <ScrollView style={{ flex: 1 }} contentContainerStyle={{ padding: isWide ? 28 : 16, gap: 24 }}>
      <View style={{ gap: 6 }}>
        <Text variant={isWide ? 'display' : 'title'} level={1}>
          {words.title}
        </Text>
        <Text tone="ink2">{words.lead}</Text>
      </View>
      {isWide || preview.pages.length === 0 ? null : (
        <Button icon="eye" isWide onPress={() => setShown(true)} testID="see-sheet">
          {words.preview.show}
        </Button>
      )}
      {printings.length > 0 ? printed : null}
      {sitting.roles.includes('lead') ? <PrintSettings sittingId={sitting.id} preview={preview} printings={printings} paperSize={paperSize} onPaperSize={onPaperSize} /> : null}
      {printings.length > 0 ? null : printed}
      <Text variant="small" tone="ink2">
        {words.carries}
      </Text>
    </ScrollView>
  );
  if (!isWide) return settings;
  return (
    <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
      <View style={{ flex: 2, minWidth: 0 }}>
        <SheetView preview={preview} />
      </View>
      <View style={{ flex: 1, minWidth: 380, maxWidth: 520, borderLeftWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>{settings}</View>
    </View>
  );
}
