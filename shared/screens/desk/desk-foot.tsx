import type { Ref } from 'react';
import { useWindowDimensions, View, type TextInput } from 'react-native';
import type { DeskItem } from '../../contracts/desk';
import type { AnswerForm } from '../../marking/read-typed';
import type { Code } from '../../marking/scheme';
import { understood } from '../../marking/understood';
import { Button } from '../../ui/button';
import { KeyStrip } from '../../ui/key-strip';
import { Pad, type PadSign } from '../../ui/pad';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { usePreference } from '../../ui/preferences';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { Vessel } from '../../ui/vessel';
import { MethodTicks, PadTicks } from '../method-ticks';
import type { MethodDraft } from '../use-method-marks';
import { CodeChoice } from './code-choice';
import { withNextUnit } from './unit-key';
import { words } from './words';

export interface DeskFootProps {
  readonly item: DeskItem;
  readonly text: string;
  readonly onText: (text: string) => void;
  readonly fieldRef: Ref<TextInput>;
  readonly note: string;
  readonly method: MethodDraft;
  readonly isChoosingCode: boolean;
  readonly chosenCode: Code | null;
  readonly onChooseCode: (code: Code) => void;
  readonly onOther: () => void;
  readonly onCancelOther: () => void;
  readonly onRecord: () => void;
  readonly onCode: (code: Code) => void;
}

/** What is to be typed for an item of this kind. */
const toType = {
  numeric: [words.typeIt, words.typeItHelp],
  choice: [words.typeChoice, words.typeChoiceHelp],
  order: [words.typeOrder, words.typeOrderHelp],
} as const;

/** What was understood, in one line; a refusal names its place. */
function Line({ text, form, note }: { text: string; form: AnswerForm; note: string }) {
  const isWide = useIsWide();
  const back = understood(text, form);
  const head = isWide ? 'head' : 'body';
  const noteLine = note === '' ? null : (
    <Text variant="small" tone="manganate" lines={1}>
      {words.noteOpen(note)}
    </Text>
  );
  if (back.kind === 'refused') {
    return (
      <View role="alert">
        <Text variant={head} weight={600} tone="methyl">
          {back.message}
        </Text>
        {noteLine}
      </View>
    );
  }
  const [lead, tail] = back.kind === 'value' ? [words.understood, back.form] : back.kind === 'waiting' ? [words.goOn, ''] : toType[form.kind];
  const value =
    back.kind === 'value' ? (
      <Text variant={isWide ? 'readingM' : 'reading'} weight={500}>
        {` ${back.value}`}
      </Text>
    ) : null;
  return (
    <View aria-live="polite" style={isWide ? { gap: 2 } : { flexDirection: 'row', flexWrap: 'wrap', columnGap: 8, alignItems: 'baseline' }}>
      <Text variant={head} weight={600}>
        {lead}
        {value}
      </Text>
      <Text variant={isWide ? 'body' : 'small'} tone="ink2">
        {tail}
      </Text>
      {noteLine}
    </View>
  );
}

/** From here on there is room for the larger buttons beside the field. */
const roomy = 1280;
const actsWidth = { roomy: 376, narrow: 320 } as const;

interface ActsProps extends Pick<DeskFootProps, 'onRecord' | 'onCode' | 'onOther'> {
  readonly canRecord: boolean;
  readonly isEmpty: boolean;
}

/** The acts with their keys, on wide. */
function Acts({ canRecord, isEmpty, onRecord, onCode, onOther }: ActsProps) {
  const isSmall = useWindowDimensions().width < roomy;
  const closed = isEmpty ? undefined : '';
  return (
    <View style={{ width: isSmall ? actsWidth.narrow : actsWidth.roomy, gap: 8, paddingTop: 18 }}>
      <Button kind="primary" isWide keyCap="Enter" align="between" onPress={onRecord} closed={canRecord ? undefined : ''} testID="record">
        {words.record}
      </Button>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 8 }}>
        <Button isSmall={isSmall} keyCap="B" onPress={() => onCode('blank')} closed={closed} testID="code-blank">
          {words.blank}
        </Button>
        <Button isSmall={isSmall} keyCap="X" onPress={() => onCode('cannot-read')} closed={closed} testID="code-cannot-read">
          {words.cannotRead}
        </Button>
        <Button isSmall={isSmall} keyCap="W" onPress={onOther} closed={closed} testID="other">
          {words.other}
        </Button>
      </View>
      <View style={{ alignItems: 'flex-start' }}>
        <Button kind="text" isSmall keyCap="S" onPress={() => onCode('ask-the-lead')} closed={closed} testID="code-ask-the-lead">
          {words.askLead}
        </Button>
      </View>
    </View>
  );
}

/** The lower half of the desk: field, what was understood, and the acts; on a phone the pad. */
export function DeskFoot(props: DeskFootProps) {
  const { item, text, onText, fieldRef, note, method, onRecord, onCode } = props;
  const colors = useColors();
  const isWide = useIsWide();
  const isRoomy = useWindowDimensions().width >= roomy;
  const [side] = usePreference('actions');
  const isEmpty = text === '';
  const putUnit = () => onText(withNextUnit(text, item.units));
  useKeys(item.units.length === 0 ? {} : { ArrowUp: putUnit });
  const canRecord = understood(text, item).kind === 'value';
  const isPrinted = item.kind !== 'numeric';
  const aside = isPrinted ? words.printedAside : item.units.length === 0 ? words.noUnit : words.unit(item.units);
  const field = (
    <Vessel
      label={words.reading}
      aside={aside}
      value={text}
      onChange={onText}
      variant={isWide ? 'readingXL' : 'readingL'}
      height={isWide ? 84 : 52}
      maxLength={64}
      takesCommands
      isFocusedFirst
      inputRef={fieldRef}
      keyboard={isWide ? 'default' : 'none'}
      testID="desk-field"
    />
  );
  if (!isWide) {
    const signs: PadSign[] = isPrinted ? [] : [{ label: ',' }, { label: '/' }, { label: '+' }, { label: 'e' }, { label: '×10', text: 'x10^' }, ...item.units.map((unit): PadSign => ({ label: unit, text: ` ${unit}` }))];
    return (
      <View>
        <View style={{ minHeight: 40, justifyContent: 'center', paddingHorizontal: 16, paddingVertical: 6, backgroundColor: colors.paper, borderTopWidth: 1, borderColor: colors.hair }}>
          <Line text={text} form={item} note={note} />
        </View>
        {item.methodMarks.length === 0 ? null : (
          <View style={{ paddingHorizontal: 16, paddingBottom: 4, backgroundColor: colors.paper }}>
            <PadTicks marks={item.methodMarks} draft={method} side={side} />
          </View>
        )}
        <Pad
          field={field}
          side={side}
          onType={(sign) => onText(text + sign)}
          onDelete={() => onText(text.slice(0, -1))}
          onEmpty={() => onText('')}
          signs={signs}
          isWhole={isPrinted}
          actions={[
            { label: words.blank, onPress: () => onCode('blank'), isClosed: !isEmpty, testID: 'code-blank' },
            { label: words.other, onPress: props.onOther, isClosed: !isEmpty, testID: 'other' },
            { label: words.recordShort, onPress: onRecord, isClosed: !canRecord, isPrimary: true, testID: 'record' },
          ]}
        />
      </View>
    );
  }
  return (
    <View>
      <View style={{ flexDirection: 'row', gap: isRoomy ? 28 : 20, paddingHorizontal: isRoomy ? 40 : 24, paddingVertical: 14, minHeight: isRoomy ? 196 : 216, borderTopWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
        <View style={{ flex: 1, minWidth: 0, gap: 8 }}>
          {field}
          {item.units.length === 0 ? null : (
            <View style={{ flexDirection: 'row' }}>
              <Button kind="text" isSmall keyCap="↑" onPress={putUnit} closed={isEmpty ? '' : undefined} testID="put-unit">
                {words.putUnit(item.units)}
              </Button>
            </View>
          )}
        </View>
        {props.isChoosingCode ? (
          // In place of the acts: Enter is said once.
          <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: isRoomy ? actsWidth.roomy + 28 : actsWidth.narrow + 20, minWidth: 0, paddingTop: 22 }}>
            <CodeChoice chosen={props.chosenCode} onChoose={props.onChooseCode} onRecord={onRecord} onCancel={props.onCancelOther} hint={words.typesLast(item.typesLast)} />
          </View>
        ) : (
          <>
            <View style={{ flex: 1, minWidth: 0, paddingTop: 22 }}>
              <Line text={text} form={item} note={note} />
            </View>
            <Acts canRecord={canRecord} isEmpty={isEmpty} onRecord={onRecord} onCode={onCode} onOther={props.onOther} />
          </>
        )}
      </View>
      {item.methodMarks.length === 0 ? null : (
        <View style={{ paddingHorizontal: isRoomy ? 40 : 24, paddingBottom: 10, backgroundColor: colors.paper }}>
          <MethodTicks marks={item.methodMarks} draft={method} layout="line" keyCap="↓" />
        </View>
      )}
      <KeyStrip
        hints={[
          { keys: ['0–9'], does: 'types' },
          ...(item.methodMarks.length === 0 ? [] : [{ keys: ['↓'], does: 'strikes a method mark' }]),
          { keys: ['U'], does: 'takes the last one back' },
          { keys: ['N'], does: 'note' },
        ]}
        last={{ keys: ['?'], does: 'all keys' }}
      />
    </View>
  );
}
