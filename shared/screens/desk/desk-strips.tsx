import { View } from 'react-native';
import type { QueueView } from '../../client/reading-queue';
import { Button } from '../../ui/button';
import { Strip } from '../../ui/strip';
import { codeWords, words } from './words';

interface DeskStripsProps {
  readonly queue: QueueView;
  readonly problem: string | null;
  readonly onSignIn: () => void;
  readonly onForget: (id: string) => void;
  readonly onSendAgain: (id: string) => void;
}

/** What the reader must know of readings still on the device: waiting for the connection, for a sign-in, or refused. */
export function DeskStrips({ queue, problem, onSignIn, onForget, onSendAgain }: DeskStripsProps) {
  const { waiting, refused, isOffline, needsSignIn } = queue;
  return (
    <View>
      {needsSignIn ? (
        <Strip
          kind="iodine"
          action={
            <Button isSmall onPress={onSignIn}>
              {words.signInAgain}
            </Button>
          }
        >
          {words.signIn(waiting.length)}
        </Strip>
      ) : isOffline && waiting.length > 0 ? (
        <Strip kind="iodine" testID="offline">
          {words.offline(waiting.length)}
        </Strip>
      ) : null}
      {problem === null ? null : (
        <Strip kind="iodine" testID="desk-problem">
          {problem}
        </Strip>
      )}
      {refused.map(({ id, candidateNumber, text, code, refusal }) => (
        <Strip
          key={id}
          kind="methyl"
          action={
            <View style={{ flexDirection: 'row', gap: 8 }}>
              <Button isSmall onPress={() => onSendAgain(id)}>
                {words.sendAgain(candidateNumber)}
              </Button>
              <Button isSmall kind="danger" onPress={() => onForget(id)}>
                {words.discard(candidateNumber)}
              </Button>
            </View>
          }
        >
          {words.refused(candidateNumber, code === undefined ? (text ?? '') : codeWords[code], refusal ?? '')}
        </Strip>
      ))}
    </View>
  );
}
