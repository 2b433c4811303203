import { useLockPaper } from '../../client/items';
import { useProgress } from '../../client/sittings';
import { attendances } from '../../contracts/enums';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { words } from './words';

interface LockDialogProps {
  readonly sittingId: string;
  readonly onClose: () => void;
}

/** Says what the lock freezes and makes before it does. */
export function LockDialog({ sittingId, onClose }: LockDialogProps) {
  const lock = useLockPaper(sittingId);
  const { data: progress } = useProgress(sittingId);
  const candidates = progress ? attendances.reduce((sum, name) => sum + progress.candidates[name], 0) : null;
  return (
    <Dialog
      title={words.lock.title}
      onClose={onClose}
      testID="lock-dialog"
      actions={
        <>
          <Button kind="primary" isBusy={lock.isPending} onPress={() => lock.mutate({}, { onSuccess: onClose })} testID="confirm-lock">
            {words.lock.confirm}
          </Button>
          <Button onPress={onClose}>{words.lock.cancel}</Button>
        </>
      }
    >
      <Text>{words.lock.text}</Text>
      {progress && candidates !== null ? <Text>{words.lock.makes(candidates, progress.layoutPages)}</Text> : null}
      {lock.error ? (
        <Text tone="methyl" live="assertive">
          {lock.error.message}
        </Text>
      ) : null}
    </Dialog>
  );
}
