import { useState } from 'react';
import { useWindowDimensions, View } from 'react-native';
import { Button } from '../ui/button';
import { Checkbox } from '../ui/checkbox';
import { KeyCap } from '../ui/key-cap';
import { SheetOver } from '../ui/sheet-over';
import { Text } from '../ui/text';
import { methodWords, type MethodMarkRow } from './method-words';
import type { MethodDraft } from './use-method-marks';

interface MarksProps {
  readonly marks: readonly (MethodMarkRow & { /** What it gives, where that may be known. */ readonly worth?: string })[];
  readonly draft: MethodDraft;
}

interface MethodTicksProps extends MarksProps {
  /** Side by side under the field, or one under the other in a sheet. */
  readonly layout: 'line' | 'list';
  /** What begins to strike one from the keyboard just now; left out where a title stands over them already. */
  readonly keyCap?: string;
}

/** The criteria of an item, each struck or not. */
export function MethodTicks({ marks, draft, layout, keyCap }: MethodTicksProps) {
  if (marks.length === 0) return null;
  const isLine = layout === 'line';
  return (
    <View role="group" aria-label={methodWords.title} testID="method-marks" style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 24 }}>
      {keyCap === undefined ? null : (
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 32, minWidth: 132, ...(isLine ? {} : { flexBasis: '100%' }) }}>
          <Text variant="label" tone={draft.isNumbering ? 'manganate' : 'ink'} live="polite">
            {draft.isNumbering ? methodWords.which(marks.length) : methodWords.title}
          </Text>
          <KeyCap>{keyCap}</KeyCap>
        </View>
      )}
      {marks.map(({ id, text, worth }, index) => (
        <View key={id} style={isLine ? { maxWidth: 420 } : { flexBasis: '100%' }}>
          <Checkbox isChecked={draft.struck.includes(id)} onChange={() => draft.strike(id)} label={worth === undefined ? text : `${text}, ${worth}`} lines={isLine ? 2 : undefined} testID={`method-${index + 1}`}>
            {marks.length === 1 ? null : <Text weight={600}>{`${index + 1} `}</Text>}
            {text}
            {worth === undefined ? null : <Text variant="small" tone="ink2">{`, ${worth}`}</Text>}
          </Checkbox>
        </View>
      ))}
    </View>
  );
}

/** From so many on, two stand side by side over the pad, so that the scan keeps its room. */
const paired = 3;
/** As many characters as two or three lines over the pad hold, one a row and two. */
const longest = { alone: 80, paired: 55 } as const;
/** On a shorter screen the scan needs the room: the numbers stand for the criteria. */
const shortScreen = 740;

/** The same over the pad, the boxes under the thumb; on a short screen, or where a text is long, by number, with the texts in a sheet. */
export function PadTicks({ marks, draft, side }: MarksProps & { readonly side: 'right' | 'left' }) {
  const [isOpen, setOpen] = useState(false);
  const isShort = useWindowDimensions().height < shortScreen;
  const isPaired = marks.length >= paired;
  const isByNumber = marks.some(({ text }) => text.length > longest[isPaired ? 'paired' : 'alone']) || (isShort && marks.length > 1);
  const isBoxLast = side === 'right';
  return (
    <View role="group" aria-label={methodWords.title} testID="method-marks" style={{ flexDirection: isByNumber && isBoxLast ? 'row-reverse' : 'row', flexWrap: isByNumber ? 'nowrap' : 'wrap', alignItems: 'center', columnGap: isByNumber ? 6 : 16 }}>
      {(isByNumber && isBoxLast ? [...marks].reverse() : marks).map(({ id, text }) => {
        const number = marks.findIndex((mark) => mark.id === id) + 1;
        return (
          <View key={id} style={isByNumber ? null : { flexBasis: isPaired ? '47%' : '100%', flexGrow: 1, minWidth: 0 }}>
            <Checkbox isChecked={draft.struck.includes(id)} onChange={() => draft.strike(id)} label={text} isBoxLast={!isByNumber && isBoxLast} gap={isByNumber ? 4 : 10} variant={isPaired && !isByNumber ? 'label' : 'small'} lines={isPaired ? 3 : 2} testID={`method-${number}`}>
              {marks.length === 1 && !isByNumber ? null : <Text variant="small" weight={600}>{isByNumber ? String(number) : `${number} `}</Text>}
              {isByNumber ? null : text}
            </Checkbox>
          </View>
        );
      })}
      {isByNumber ? (
        <View style={{ flexGrow: 1, alignItems: isBoxLast ? 'flex-start' : 'flex-end' }}>
          <Button isSmall kind="text" onPress={() => setOpen(true)} testID="method-texts">
            {marks.length > paired ? methodWords.texts : methodWords.title}
          </Button>
        </View>
      ) : null}
      {isOpen ? (
        <SheetOver title={methodWords.title} onClose={() => setOpen(false)} testID="method-sheet">
          <MethodTicks marks={marks} draft={draft} layout="list" />
        </SheetOver>
      ) : null}
    </View>
  );
}
