import type { NumberDiffers } from '../../contracts/people-and-paper';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { Row } from './section';
import { Strip } from './strip';
import { words } from './words';

const w = words.differ;

interface DiffersRowProps {
  readonly sheet: NumberDiffers;
  readonly canAct: boolean;
  readonly onSwap: () => void;
  readonly onBind: (candidate: string) => void;
  readonly onStay: () => void;
}

/** A sheet on which another number is written: the strip, what it may mean, and what to do. */
export function DiffersRow({ sheet, canAct, onSwap, onBind, onStay }: DiffersRowProps) {
  const { scriptId, version, candidateNumber, read, claimed, isExchange } = sheet;
  const own = candidateNumber ?? '';
  const canSwap = claimed?.scriptId !== null && claimed !== null && claimed.pagesIn > 0;
  const meaning = claimed === null ? w.nobody : isExchange ? w.exchanged(own, claimed.candidateNumber) : w.claimed(claimed.candidateNumber);
  return (
    <Row
      testID={`differs-${own}`}
      acts={
        canAct ? (
          <>
            {canSwap ? (
              <Button isSmall kind={isExchange ? 'primary' : 'quiet'} onPress={onSwap} testID={`swap-${own}`}>
                {w.swap(own, claimed.candidateNumber)}
              </Button>
            ) : claimed ? (
              <Button isSmall onPress={() => onBind(claimed.candidateNumber)}>
                {w.bind(claimed.candidateNumber)}
              </Button>
            ) : (
              <Button isSmall onPress={() => onBind('')}>
                {w.another}
              </Button>
            )}
            <Button isSmall kind="text" onPress={onStay}>
              {w.stays(own)}
            </Button>
          </>
        ) : null
      }
    >
      <Strip scriptId={scriptId} version={version} />
      <Text weight={600}>{`${w.printed(own)}. ${read === null ? '' : w.read(read)}`}</Text>
      <Text variant="small" tone="ink2">
        {meaning}
      </Text>
    </Row>
  );
}
