import { useRemoveItem } from '../../client/items';
import type { ItemView } from '../../contracts/items';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { forgetKeeper } from './use-keepers';
import { words } from './words';

interface RemoveDialogProps {
  readonly item: ItemView;
  readonly onClose: () => void;
  readonly onRemoved: () => void;
}

/** Asks before an item goes with its boxes. */
export function RemoveDialog({ item, onClose, onRemoved }: RemoveDialogProps) {
  const remove = useRemoveItem(item.sittingId);
  const go = () =>
    remove.mutate(
      { itemId: item.id, rev: item.rev },
      {
        onSuccess: () => {
          forgetKeeper(item.id);
          onRemoved();
        },
      },
    );
  return (
    <Dialog
      title={words.removeDialog.title(item.number)}
      onClose={onClose}
      testID="remove-dialog"
      actions={
        <>
          <Button kind="danger" isBusy={remove.isPending} onPress={go} testID="confirm-remove">
            {words.removeDialog.confirm}
          </Button>
          <Button onPress={onClose}>{words.removeDialog.cancel}</Button>
        </>
      }
    >
      <Text>{words.removeDialog.text}</Text>
      {remove.error ? (
        <Text tone="methyl" live="assertive">
          {remove.error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
