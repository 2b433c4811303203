import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { fileSender, useMakeBatch } from '../../client/scans';
import type { BatchSummary } from '../../contracts/scans';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { nextBundle } from './tray-rows';
import { words } from './words';

interface BundleDialogProps {
  readonly sittingId: string;
  readonly files: readonly File[];
  readonly batches: readonly BatchSummary[];
  readonly onClose: () => void;
  readonly onSent: (batchId: string) => void;
}

/** Asks of which bundle the files are, then sends them. The name of an own open bundle goes on with it. */
export function BundleDialog({ sittingId, files, batches, onClose, onSent }: BundleDialogProps) {
  const make = useMakeBatch(sittingId);
  const [once] = useState(() => uuidv7());
  const [name, setName] = useState(() => nextBundle(batches.map(({ bundle }) => bundle)));
  const [wasTried, setTried] = useState(false);
  const goesOn = batches.find(({ bundle, isOwn, state }) => isOwn && state === 'open' && bundle.toLowerCase() === name.trim().toLowerCase());
  const send = (batchId: string) => {
    fileSender.add(batchId, files);
    onSent(batchId);
  };
  const go = () => {
    setTried(true);
    if (name.trim() === '') return;
    if (goesOn) send(goesOn.id);
    else make.mutate({ bundle: name.trim(), once }, { onSuccess: ({ id }) => send(id) });
  };
  return (
    <Dialog
      title={words.bundle.title(files.length)}
      onClose={onClose}
      testID="bundle-dialog"
      actions={
        <>
          <Button kind="primary" isBusy={make.isPending} onPress={go} testID="send-files">
            {words.bundle.go(files.length)}
          </Button>
          <Button onPress={onClose}>{words.bundle.back}</Button>
        </>
      }
    >
      <Vessel
        label={words.bundle.label}
        value={name}
        onChange={setName}
        help={goesOn ? words.bundle.goesOn(goesOn.bundle) : words.bundle.help}
        error={wasTried && name.trim() === '' ? words.bundle.needsName : undefined}
        maxLength={60}
        isFocusedFirst
        onSubmit={go}
        testID="bundle-name"
      />
      {make.error ? (
        <Text tone="methyl" live="assertive">
          {make.error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
