import { View } from 'react-native';
import { printingFileUrl } from '../../client/printings';
import type { PrintingView } from '../../contracts/printings';
import { Button } from '../../ui/button';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { momentText } from '../times';
import { weightText } from './amount';
import { words } from './words';

const w = words.history;

/** What was printed, newest first; what is being made shows how far it is. */
export function PrintingList({ printings, canDownload }: { printings: readonly PrintingView[]; canDownload: boolean }) {
  return (
    <View style={{ gap: 6 }}>
      <Text variant="head" level={2}>
        {w.head}
      </Text>
      {printings.length === 0 ? (
        <Text variant="small" tone="ink2">
          {w.none}
        </Text>
      ) : (
        <View role="list" aria-label={w.head}>
          {printings.map((printing) => (
            <PrintingRow key={printing.id} printing={printing} canDownload={canDownload} />
          ))}
        </View>
      )}
    </View>
  );
}

function PrintingRow({ printing, canDownload }: { printing: PrintingView; canDownload: boolean }) {
  const colors = useColors();
  const { id, layout, paperSize, candidates, spares, pagesEach, state, done, of, madeAt, madeBy, size } = printing;
  const weight = size === null ? '' : weightText(size);
  const download = () => {
    const link = document.createElement('a');
    link.href = printingFileUrl(id);
    link.download = '';
    link.click();
  };
  return (
    <View role="listitem" testID={`printing-${layout}`} style={{ gap: 4, paddingVertical: 12, borderTopWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 12, rowGap: 6 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 180 }}>
          <Text weight={600}>{w.name(layout, paperSize)}</Text>
          <Text variant="small" tone="ink2">
            {w.what(candidates, spares, pagesEach)}
          </Text>
          <Text variant="small" tone="ink2">
            {w.made(momentText(madeAt), madeBy)}
          </Text>
        </View>
        {state === 'made' && canDownload ? (
          <Button icon="download" isSmall label={w.downloadOf(layout, weight)} onPress={download} testID={`download-${layout}`}>
            {`${w.download}, ${weight}`}
          </Button>
        ) : null}
      </View>
      {state === 'making' ? (
        <View style={{ gap: 4 }}>
          <Text variant="small" isTabular live="polite">
            {w.done(done, of)}
          </Text>
          <ProgressRule done={done} of={of} label={w.making} />
        </View>
      ) : null}
      {state === 'failed' ? (
        <Text variant="small" tone="methyl">
          {w.failed}
        </Text>
      ) : null}
    </View>
  );
}
