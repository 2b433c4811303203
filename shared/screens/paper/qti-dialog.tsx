import { useState } from 'react';
import { View } from 'react-native';
import { useQtiPreview, useTakePaperQti } from '../../client/paper-file';
import type { QtiReading } from '../../contracts/paper-file';
import type { SittingView } from '../../contracts/sittings';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { pickFile } from '../pick-file';
import { fileWords as w } from './file-words';
import { words } from './words';

interface TakeQtiProps {
  readonly sitting: SittingView;
  readonly items: number;
}

/** Chooses a package and shows what would come in before the paper gives way to it. */
export function TakeQtiButton({ sitting, items }: TakeQtiProps) {
  const [file, setFile] = useState<File | null>(null);
  return (
    <>
      <Button kind="text" isSmall icon="upload" onPress={() => void pickFile('application/zip,.zip').then(setFile)} testID="take-qti">
        {w.takeQti}
      </Button>
      {file ? <QtiDialog sitting={sitting} items={items} file={file} onClose={() => setFile(null)} /> : null}
    </>
  );
}

function QtiDialog({ sitting, items, file, onClose }: TakeQtiProps & { file: File; onClose: () => void }) {
  const preview = useQtiPreview(sitting.id, file);
  const take = useTakePaperQti(sitting.id);
  const found = preview.data;
  const rest = (found?.refused.length ?? 0) > 0;
  const count = found?.items.length ?? 0;
  const error = preview.error ?? take.error;
  return (
    <Dialog
      title={words.files.takeTitle(file.name)}
      onClose={onClose}
      testID="qti-dialog"
      actions={
        <>
          {found && count > 0 ? (
            <Button kind="primary" isBusy={take.isPending} onPress={() => take.mutate({ mark: found.mark, rest, file }, { onSuccess: onClose })} testID="confirm-qti">
              {rest ? w.confirmRest(count) : w.confirmAll}
            </Button>
          ) : null}
          <Button onPress={onClose}>{words.files.keep}</Button>
        </>
      }
    >
      {preview.isFetching && !found ? <Text live="polite">{w.reading}</Text> : null}
      {found ? <Preview reading={found} items={items} /> : null}
      {error ? (
        <Text tone="methyl" live="assertive">
          {error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}

function Preview({ reading: { items, refused }, items: before }: { reading: QtiReading; items: number }) {
  return (
    <View style={{ gap: 12 }}>
      {items.length > 0 ? <Text>{w.giveWay(before)}</Text> : null}
      <Text>{w.comesIn(items.length)}</Text>
      {items.map(({ identifier, file, label, marks, prompt, isOwn }, index) => (
        <View key={`${index} ${file}`} style={{ gap: 2 }}>
          <Text variant="label">{w.item(label, marks)}</Text>
          <Text variant="small">{prompt}</Text>
          <Text variant="small" tone="ink2">
            {isOwn ? w.ownKey : w.typedKey(identifier)}
          </Text>
        </View>
      ))}
      {refused.length > 0 ? <Text tone="methyl">{w.refused(refused.length)}</Text> : null}
      {refused.map(({ file, message }, index) => (
        <Text key={`${index} ${file}`} variant="small">
          {w.refusal(file, message)}
        </Text>
      ))}
    </View>
  );
}
