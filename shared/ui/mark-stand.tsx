import { View } from 'react-native';
import { Text } from './text';
import { Tube, type TubeProps } from './tube';
import { size } from './tokens';

interface MarkStandProps extends TubeProps {
  /** The marks given and available, as text: shares of a mark are not decimals. */
  readonly gotText: string;
  readonly ofText: string;
  readonly scale?: 'row' | 'desk' | 'total';
}

const heights = { row: size.tubeS, desk: size.tubeM, total: size.tubeL } as const;
const variants = { row: 'body', desk: 'title', total: 'total' } as const;

/** A tube with its numeral: the only way a mark may stand. */
export function MarkStand({ gotText, ofText, scale = 'row', ...tube }: MarkStandProps) {
  const isMark = tube.state === 'given' || tube.state === 'ruled';
  const spoken = isMark ? `${gotText} of ${ofText} marks${tube.state === 'ruled' ? ', ruled' : ''}` : tube.state === 'held' ? 'held' : 'not read';
  return (
    <View role="img" aria-label={spoken} style={{ flexDirection: 'row', alignItems: 'center', gap: scale === 'row' ? 7 : 12 }}>
      <Tube {...tube} height={heights[scale]} />
      {isMark ? (
        <Text variant={variants[scale]} weight={600} tone={tube.state === 'ruled' ? 'manganate' : 'ink'}>
          {gotText}
          <Text variant="small" tone="ink3">{` / ${ofText}`}</Text>
        </Text>
      ) : (
        <Text variant={tube.state === 'held' ? 'small' : 'body'} weight={600} tone={tube.state === 'held' ? 'iodine' : 'ink'}>
          {tube.state === 'held' ? 'held' : '–'}
        </Text>
      )}
    </View>
  );
}
