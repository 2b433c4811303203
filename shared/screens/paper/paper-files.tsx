import { useState } from 'react';
import { View } from 'react-native';
import { apiUrl } from '../../client/api';
import { useItems } from '../../client/items';
import { usePaperNow, useTakePaperFile } from '../../client/paper-file';
import type { SittingView } from '../../contracts/sittings';
import { Button, ButtonLink } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { pickFile } from '../pick-file';
import { leftOutOfQti } from '../../marking/qti-leaves-out';
import { fileWords } from './file-words';
import { TakeQtiButton } from './qti-dialog';
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
      {isLead ? <LeftOutOfQti sittingId={sitting.id} /> : null}
      {canChange ? <TakeButton sitting={sitting} items={items} /> : null}
    </View>
  );
}

/** What saving as QTI loses, item by item, before it is saved. */
function LeftOutOfQti({ sittingId }: { sittingId: string }) {
  const out = (useItems(sittingId).data?.items ?? []).map(({ number, draft }) => ({ number, parts: leftOutOfQti(draft) })).filter(({ parts }) => parts.length > 0);
  if (out.length === 0) return null;
  return (
    <Text variant="small" tone="ink2" testID="qti-leaves-out">
      {fileWords.leftOut(out)}
    </Text>
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
      <TakeQtiButton sitting={sitting} items={items} />
    </>
  );
}

function TakeDialog({ sitting, items, file, onClose }: { sitting: SittingView; items: number; file: File; onClose: () => void }) {
  const take = useTakePaperFile(sitting.id);
  const now = usePaperNow(sitting.id);
  const paper = now.data;
  const error = take.error ?? now.error;
  return (
    <Dialog
      title={w.takeTitle(file.name)}
      onClose={onClose}
      testID="take-dialog"
      actions={
        <>
          {now.error ? null : (
            <Button kind="primary" isBusy={take.isPending || !paper} onPress={() => paper && take.mutate({ tag: paper.tag, file }, { onSuccess: onClose })} testID="confirm-take">
              {w.confirm}
            </Button>
          )}
          <Button onPress={onClose}>{w.keep}</Button>
        </>
      }
    >
      <Text>{w.takeText(paper?.answer.items.length ?? items)}</Text>
      {error ? (
        <Text tone="methyl" live="assertive">
          {now.error ? fileWords.noPaper : error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
