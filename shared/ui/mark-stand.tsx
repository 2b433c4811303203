import { View } from 'react-native';
import { Text } from './text';
import { Tube, type TubeProps } from './tube';
import { size } from './tokens';

export interface MarkStandProps extends Omit<TubeProps, 'height'> {
  /** The marks given and available, as text: shares of a mark are not decimals. */
  readonly gotText: string;
  readonly ofText: string;
  readonly scale?: 'row' | 'desk' | 'total' | undefined;
  /** Why no mark stands yet, of a held tube. */
  readonly heldWord?: 'held' | 'waits' | undefined;
  /** Spoken after the mark, such as `slip a`. */
  readonly spokenAfter?: string | undefined;
}

const heights = { row: size.tubeS, desk: size.tubeM, total: size.tubeL } as const;
const variants = { row: 'body', desk: 'title', total: 'total' } as const;
const asides = { row: 'small', desk: 'body', total: 'title' } as const;

function spoken({ state, gotText, ofText, stopper, spokenAfter, heldWord = 'held' }: MarkStandProps): string {
  const mark = state === 'held' ? heldWord : state === 'unread' ? 'not read' : `${gotText} of ${ofText} marks`;
  const parts = [mark, state === 'ruled' ? 'ruled' : '', stopper === 'in' ? 'released' : stopper === 'out' ? 'disputed' : '', spokenAfter ?? ''];
  return parts.filter((part) => part !== '').join(', ');
}

/** A tube with its numeral: the only way a mark may stand. */
export function MarkStand(props: MarkStandProps) {
  const { gotText, ofText, scale = 'row', spokenAfter: _spoken, heldWord = 'held', ...tube } = props;
  const isMark = tube.state === 'given' || tube.state === 'ruled';
  return (
    <View role="img" aria-label={spoken(props)} style={{ flexDirection: 'row', alignItems: 'center', gap: scale === 'row' ? 7 : 12 }}>
      <Tube {...tube} height={heights[scale]} />
      {isMark ? (
        <Text variant={variants[scale]} weight={600} tone={tube.state === 'ruled' ? 'manganate' : 'ink'} lines={1} isTabular={scale === 'row'}>
          {gotText}
          <Text variant={asides[scale]} weight={400} tone="ink3">{` / ${ofText}`}</Text>
        </Text>
      ) : (
        <Text variant={tube.state === 'held' ? 'small' : 'body'} weight={600} tone={tube.state === 'held' ? 'iodine' : 'ink2'}>
          {tube.state === 'held' ? heldWord : '–'}
        </Text>
      )}
    </View>
  );
}
