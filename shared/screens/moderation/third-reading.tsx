import { useEffect, useRef, useState } from 'react';
import { View, type TextInput } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useThirdReading } from '../../client/ledger';
import type { AnswerView } from '../../contracts/ledger';
import type { Code } from '../../marking/scheme';
import { understood } from '../../marking/understood';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { Vessel } from '../../ui/vessel';
import { rareCodes } from '../desk/code-choice';
import { codeWords, words as deskWords } from '../desk/words';
import { MethodTicks } from '../method-ticks';
import { useMethodMarks } from '../use-method-marks';
import { marksWords } from './ruling';
import { words } from './words';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const rareWithLead: readonly Code[] = rareCodes;

interface ThirdReadingProps {
  readonly answer: AnswerView;
  readonly text: string;
  readonly onText: (text: string) => void;
  readonly isInDialog: boolean;
  readonly onDone: () => void;
}

/** What the lead reads from the image: typed or a code, before anything is uncovered. */
export function ThirdReading({ answer, text, onText, isInDialog, onDone }: ThirdReadingProps) {
  const isPhone = useIsPhone();
  const send = useThirdReading(answer.answerId);
  const [openedAt] = useState(() => Date.now());
  const [isRare, setRare] = useState(false);
  const field = useRef<TextInput>(null);
  const method = useMethodMarks(answer.methodMarks, isInDialog);
  const back = understood(text, answer);
  useEffect(() => field.current?.focus(), []);
  const give = (given: { text: string } | { code: Code }) => {
    if (send.isPending) return;
    send.mutate({ id: uuidv7(), openedAt, method: method.struck, ...given }, {
      onSuccess: () => {
        onText('');
        onDone();
      },
    });
  };
  const code = (chosen: Code) => () => {
    if (text === '') give({ code: chosen });
  };
  useKeys(
    {
      Enter: () => {
        if (back.kind === 'value') give({ text });
      },
      B: code('blank'),
      X: code('cannot-read'),
      S: code('ask-the-lead'),
      W: () => setRare(!isRare),
      ...(answer.methodMarks.length === 0 ? {} : { M: method.begin, ...(text === '' ? {} : { ArrowDown: method.begin }) }),
      ...(method.isNumbering ? { Escape: method.end } : {}),
      ...(isRare && !method.isNumbering ? Object.fromEntries(rareWithLead.map((rare, index) => [String(index + 1), code(rare)])) : {}),
    },
    { isInDialog },
  );
  const type = (typed: string) => {
    onText(typed);
    method.end();
  };
  const help = back.kind === 'value' ? `Understood as ${back.value}. ${back.form}` : answer.kind === 'choice' ? deskWords.typeChoiceHelp : answer.kind === 'order' ? deskWords.typeOrderHelp : words.sheet.fromImage;
  return (
    <View style={{ gap: 10 }}>
      <Vessel label={words.sheet.read} value={text} onChange={type} help={help} error={back.kind === 'refused' ? back.message : undefined} variant="readingM" height={52} maxLength={64} takesCommands isFocusedFirst={!isPhone} inputRef={field} testID="third-reading" />
      <MethodTicks marks={answer.methodMarks.map(({ grains, ...mark }) => ({ ...mark, worth: marksWords(grains) }))} draft={method} layout="list" keyCap={text === '' ? 'M' : '↓'} />
      {text === '' ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
          <Button isSmall keyCap="B" onPress={code('blank')} testID="third-blank">
            {words.sheet.blank}
          </Button>
          <Button isSmall keyCap="X" onPress={code('cannot-read')} testID="third-cannot-read">
            {words.sheet.cannotRead}
          </Button>
          <Button isSmall keyCap="W" onPress={() => setRare(!isRare)} isExpanded={isRare} testID="third-other">
            {words.sheet.other}
          </Button>
        </View>
      ) : (
        <Button kind="primary" isWide keyCap="Enter" onPress={() => give({ text })} isBusy={send.isPending} closed={back.kind === 'value' ? undefined : ''} testID="record-third">
          {words.sheet.record}
        </Button>
      )}
      {isRare && text === '' ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
          {rareWithLead.map((rare, index) => (
            <Button key={rare} isSmall keyCap={String(index + 1)} onPress={code(rare)} testID={`third-${rare}`}>
              {capital(codeWords[rare])}
            </Button>
          ))}
          <Button isSmall keyCap="S" onPress={code('ask-the-lead')} testID="third-ask-the-lead">
            {words.sheet.setAside}
          </Button>
        </View>
      ) : null}
      {send.error ? (
        <Text variant="small" tone="methyl" live="assertive">
          {send.error.message}
        </Text>
      ) : null}
    </View>
  );
}
