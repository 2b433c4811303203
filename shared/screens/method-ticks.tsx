import { View } from 'react-native';
import { Checkbox } from '../ui/checkbox';
import { KeyCap } from '../ui/key-cap';
import { Text } from '../ui/text';
import { methodWords, type MethodMarkRow } from './method-words';
import type { MethodDraft } from './use-method-marks';

interface MethodTicksProps {
  readonly marks: readonly (MethodMarkRow & { /** What it gives, where that may be known. */ readonly worth?: string })[];
  readonly draft: MethodDraft;
  /** Side by side under the field, one under the other in a sheet, or over the pad under one thumb. */
  readonly layout: 'line' | 'list' | 'pad';
  /** On the pad, the side of the thumb. */
  readonly side?: 'right' | 'left';
}

/** From so many on, two stand side by side over the pad, so that the scan keeps its room. */
const paired = 3;

/** The criteria of an item, each struck or not. */
export function MethodTicks({ marks, draft, layout, side = 'right' }: MethodTicksProps) {
  if (marks.length === 0) return null;
  const isPad = layout === 'pad';
  const isAlone = marks.length === 1;
  const width = isPad ? (marks.length >= paired ? '47%' : '100%') : layout === 'list' ? '100%' : undefined;
  return (
    <View role="group" aria-label={methodWords.title} testID="method-marks" style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: isPad ? 16 : 24 }}>
      {isPad ? null : (
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 32, ...(layout === 'list' ? { flexBasis: '100%' } : {}) }}>
          <Text variant="label">{methodWords.title}</Text>
          <KeyCap>M</KeyCap>
          <Text variant="small" tone="manganate" live="polite">
            {draft.isNumbering ? methodWords.itsNumber(marks.length) : ''}
          </Text>
        </View>
      )}
      {marks.map(({ id, text, worth }, index) => (
        <View key={id} style={width === undefined ? { maxWidth: 420 } : { flexBasis: width, flexGrow: 1, minWidth: 0 }}>
          <Checkbox isChecked={draft.struck.includes(id)} onChange={() => draft.strike(id)} label={worth === undefined ? text : `${text}, ${worth}`} isBoxLast={isPad && side === 'right'} variant={isPad ? 'small' : 'body'} lines={layout === 'list' ? undefined : 2} testID={`method-${index + 1}`}>
            {isAlone ? null : <Text variant={isPad ? 'small' : 'body'} weight={600}>{`${index + 1} `}</Text>}
            {text}
            {worth === undefined ? null : <Text variant="small" tone="ink2">{`, ${worth}`}</Text>}
          </Checkbox>
        </View>
      ))}
    </View>
  );
}
