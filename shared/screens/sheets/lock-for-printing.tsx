import { useState } from 'react';
import { View } from 'react-native';
import { useLockPaper } from '../../client/items';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { words } from './words';

/** Says that printing locks the paper, and locks it after saying what that freezes. */
export function LockForPrinting({ sittingId }: { sittingId: string }) {
  const colors = useColors();
  const [isOpen, setOpen] = useState(false);
  const lock = useLockPaper(sittingId);
  const w = words.open;
  return (
    <View style={{ gap: 10, alignItems: 'flex-start', paddingLeft: 12, borderLeftWidth: 2, borderColor: colors.iodine }}>
      <Text tone="iodine" weight={500}>
        {w.text}
      </Text>
      <Button onPress={() => setOpen(true)} testID="lock-for-printing">
        {w.lock}
      </Button>
      {isOpen ? (
        <Dialog
          title={w.title}
          onClose={() => setOpen(false)}
          testID="lock-dialog"
          actions={
            <>
              <Button kind="primary" isBusy={lock.isPending} onPress={() => lock.mutate({ isForPrinting: true }, { onSuccess: () => setOpen(false) })} testID="confirm-lock">
                {w.lock}
              </Button>
              <Button onPress={() => setOpen(false)}>{w.cancel}</Button>
            </>
          }
        >
          <Text>{w.freezes}</Text>
          <Text>{w.regions}</Text>
          {lock.error ? (
            <Text tone="methyl" live="assertive">
              {lock.error.message}
            </Text>
          ) : null}
        </Dialog>
      ) : null}
    </View>
  );
}
