import { useState } from 'react';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { KeyList } from '../../ui/key-strip';
import { Vessel } from '../../ui/vessel';
import { keyGroups, words } from './words';

interface NoteDialogProps {
  readonly note: string;
  readonly onKeep: (note: string) => void;
  readonly onClose: () => void;
}

/** A note that goes with the next reading. */
export function NoteDialog({ note, onKeep, onClose }: NoteDialogProps) {
  const [text, setText] = useState(note);
  const keep = () => onKeep(text.trim());
  return (
    <Dialog
      title={words.noteTitle}
      onClose={onClose}
      testID="note-dialog"
      actions={
        <>
          <Button kind="primary" onPress={keep}>
            {words.noteKeep}
          </Button>
          <Button onPress={onClose}>{words.cancel}</Button>
        </>
      }
    >
      <Vessel label={words.noteLabel} value={text} onChange={setText} help={words.noteHelp} maxLength={500} isFocusedFirst onSubmit={keep} testID="note" />
    </Dialog>
  );
}

export function KeysDialog({ onClose }: { onClose: () => void }) {
  return (
    <Dialog title={words.keysTitle} onClose={onClose} width={620} testID="keys-dialog">
      <KeyList groups={keyGroups} />
    </Dialog>
  );
}
