import { useState } from 'react';
import { useCandidates } from '../../client/class-list';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { words } from './words';

const w = words.ask;

export interface Asked {
  readonly title: string;
  readonly text: string;
  readonly go: string;
  readonly reason: string;
  /** A candidate has to be named: what stands in the field at first. */
  readonly candidate?: string;
  readonly onGo: (reason: string, candidate: { readonly id: string; readonly number: string } | null) => void;
}

interface ActDialogProps {
  readonly sittingId: string;
  readonly asked: Asked;
  readonly isBusy: boolean;
  readonly error: string | null;
  readonly onClose: () => void;
}

/** Asks before a sheet changes hands: for whom, and why. */
export function ActDialog({ sittingId, asked, isBusy, error, onClose }: ActDialogProps) {
  const [reason, setReason] = useState(asked.reason);
  const [number, setNumber] = useState(asked.candidate ?? '');
  const [isTried, setTried] = useState(false);
  const list = useCandidates(sittingId);
  const found = list.data?.candidates.find((one) => one.number.toLowerCase() === number.trim().toLowerCase());
  const isNamed = asked.candidate === undefined || found !== undefined;
  const isSaid = reason.trim().length >= 3;
  const go = () => {
    setTried(true);
    if (isNamed && isSaid && !isBusy) asked.onGo(reason.trim(), found ? { id: found.id, number: found.number } : null);
  };
  return (
    <Dialog
      title={asked.title}
      onClose={onClose}
      testID="people-dialog"
      actions={
        <>
          <Button kind="primary" isBusy={isBusy} onPress={go} testID="people-go">
            {asked.go}
          </Button>
          <Button onPress={onClose}>{w.cancel}</Button>
        </>
      }
    >
      <Text>{asked.text}</Text>
      {asked.candidate === undefined ? null : (
        <Vessel label={w.candidate} value={number} onChange={setNumber} variant="readingM" maxLength={40} isFocusedFirst onSubmit={go} error={isTried && !found ? w.unknown(number.trim()) : undefined} testID="people-candidate" />
      )}
      <Vessel label={w.reason} value={reason} onChange={setReason} maxLength={300} onSubmit={go} error={isTried && !isSaid ? w.reasonNeeded : undefined} testID="people-reason" />
      {error ? (
        <Text tone="methyl" live="assertive">
          {error}
        </Text>
      ) : null}
    </Dialog>
  );
}
