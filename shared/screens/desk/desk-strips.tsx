import { View } from 'react-native';
import type { QueueView } from '../../client/reading-queue';
import { Button, ButtonLink } from '../../ui/button';
import { Strip } from '../../ui/strip';
import { words } from './words';

interface DeskStripsProps {
  readonly queue: QueueView;
  readonly onForget: (id: string) => void;
}

/** What the reader must know of readings still on the device: waiting for the connection, for a sign-in, or refused. */
export function DeskStrips({ queue, onForget }: DeskStripsProps) {
  const { waiting, refused, isOffline, needsSignIn } = queue;
  return (
    <View>
      {needsSignIn ? (
        <Strip
          kind="iodine"
          action={
            <ButtonLink isSmall href="/sign-in">
              {words.signInAgain}
            </ButtonLink>
          }
        >
          {words.signIn(waiting.length)}
        </Strip>
      ) : isOffline && waiting.length > 0 ? (
        <Strip kind="iodine" testID="offline">
          {words.offline(waiting.length)}
        </Strip>
      ) : null}
      {refused.map(({ id, candidateNumber, refusal }) => (
        <Strip
          key={id}
          kind="methyl"
          action={
            <Button isSmall onPress={() => onForget(id)}>
              {words.refusedLook}
            </Button>
          }
        >
          {words.refused(candidateNumber, refusal ?? '')}
        </Strip>
      ))}
    </View>
  );
}
