import { useState } from 'react';
import { View } from 'react-native';
import { apiUrl } from '../../client/api';
import { useTakePaperFile } from '../../client/items';
import type { SittingView } from '../../contracts/sittings';
import { Button, ButtonLink } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { pickFile } from '../pick-file';
import { words } from './words';

interface PaperFilesProps {
  readonly sitting: SittingView;
  readonly items: number;
  readonly isLead: boolean;
  readonly canChange: boolean;
}

const w = words.files;

/** What can be done with the paper as a whole: vetted, printed, kept as a file, taken from one. */
export function PaperFiles({ sitting, items, isLead, canChange }: PaperFilesProps) {
  const open = (name: string) => window.open(apiUrl(`/sittings/${sitting.id}/${name}`), '_blank', 'noopener');
  const save = (ending: string) => {
    const link = document.createElement('a');
    link.href = apiUrl(`/sittings/${sitting.id}/paper.${ending}`);
    link.download = `paper-${sitting.printNumber}.${ending}`;
    link.click();
  };
  return (
    <View style={{ padding: 12, gap: 8 }}>
      <ButtonLink isSmall isWide icon="guard" href={`/sittings/${sitting.id}/vetting`} testID="to-vetting">
        {words.vet}
      </ButtonLink>
      {items > 0 ? (
        <ButtonLink isSmall isWide icon="page" href={`/sittings/${sitting.id}/sheets`} testID="to-sheets">
          {w.sheets}
        </ButtonLink>
      ) : null}
      <Button isSmall isWide icon="print" onPress={() => open('paper.pdf')} testID="print-paper">
        {w.print}
      </Button>
      <Button kind="text" isSmall icon="download" onPress={() => save('json')} testID="save-paper">
        {w.save}
      </Button>
      {isLead && items > 0 ? (
        <Button kind="text" isSmall icon="download" onPress={() => save('qti.zip')} testID="save-qti">
          {w.saveQti}
        </Button>
      ) : null}
      {canChange ? <TakeButton sitting={sitting} items={items} /> : null}
    </View>
  );
}

/** Chooses a file and asks before the paper gives way to it. */
export function TakeButton({ sitting, items }: Pick<PaperFilesProps, 'sitting' | 'items'>) {
  const [file, setFile] = useState<File | null>(null);
  return (
    <>
      <Button kind="text" isSmall icon="upload" onPress={() => void pickFile('application/json,.json').then(setFile)} testID="take-paper">
        {w.take}
      </Button>
      {file ? <TakeDialog sitting={sitting} items={items} file={file} onClose={() => setFile(null)} /> : null}
    </>
  );
}

function TakeDialog({ sitting, items, file, onClose }: { sitting: SittingView; items: number; file: File; onClose: () => void }) {
  const take = useTakePaperFile(sitting.id);
  return (
    <Dialog
      title={w.takeTitle(file.name)}
      onClose={onClose}
      testID="take-dialog"
      actions={
        <>
          <Button kind="primary" isBusy={take.isPending} onPress={() => take.mutate({ rev: sitting.rev, file }, { onSuccess: onClose })} testID="confirm-take">
            {w.confirm}
          </Button>
          <Button onPress={onClose}>{w.keep}</Button>
        </>
      }
    >
      <Text>{w.takeText(items)}</Text>
      {take.error ? (
        <Text tone="methyl" live="assertive">
          {take.error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
