import { useEffect, useRef, useState, type ReactNode } from 'react';
import { View, type TextInput } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { ApiError } from '../../client/api';
import { useRule } from '../../client/ledger';
import type { AnswerView, RulingBody } from '../../contracts/ledger';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { useKeys } from '../../ui/use-keys';
import { Vessel } from '../../ui/vessel';
import { conflictWords, marksWords, needsReason, ruleWords, saidOf } from './ruling';
import { words } from './words';

interface RulingFormProps {
  readonly answer: AnswerView;
  readonly isInDialog: boolean;
  readonly onRuled: (answer: AnswerView, what: string) => void;
  /** To what somebody else has ruled meanwhile. */
  readonly onSee: () => void;
  readonly onAgain: () => void;
  /** What is uncovered, between the own reading and the ruling. */
  readonly children: ReactNode;
}

/** After the lead's own reading: what is uncovered, a reason where one is asked, what the button will do; or a mark by hand. */
export function RulingForm({ answer, isInDialog, onRuled, onSee, onAgain, children }: RulingFormProps) {
  const { mine } = answer;
  const rule = useRule(answer.answerId);
  const once = useRef(uuidv7());
  const says = ruleWords(answer);
  const [isByHand, setByHand] = useState(says === null);
  const [marks, setMarks] = useState('');
  const [reason, setReason] = useState('');
  const [isReasonOpen, setReasonOpen] = useState(false);
  const [wasTried, setTried] = useState(false);
  const hand = isByHand || says === null;
  const asksReason = hand || needsReason(answer);
  const read = readMarks(marks, true);
  const grains = read.ok && read.grains <= answer.maxGrains ? read.grains : null;
  const button = useRef<HTMLElement | null>(null);
  const reasonField = useRef<TextInput>(null);
  useEffect(() => {
    if (!asksReason) button.current?.querySelector<HTMLElement>('button, [role="button"]')?.focus();
  }, [asksReason]);

  const go = () => {
    setTried(true);
    if (!mine || rule.isPending || (asksReason && reason.trim().length < 3) || (hand && grains === null)) return;
    const why = reason.trim() === '' ? {} : { reason: reason.trim() };
    const body: RulingBody = hand ? { kind: 'mark', marks: marks.trim(), ...why } : mine.code !== null ? { kind: 'code', code: mine.code, method: mine.method, ...why } : { kind: 'value', text: mine.text ?? '', method: mine.method, ...why };
    const what = hand ? marksWords(grains ?? 0) : saidOf(mine, answer.methodMarks);
    rule.mutate(
      { rev: answer.rev, body, once: once.current },
      {
        onSuccess: (ruled) => onRuled(ruled, what),
        // A refused one is another request the next time.
        onError: () => (once.current = uuidv7()),
      },
    );
  };
  const openReason = () => {
    setReasonOpen(true);
    reasonField.current?.focus();
  };
  useKeys({ Enter: go, R: openReason }, { isInDialog });
  if (!mine) return null;
  const isReasonShort = reason.trim().length < 3 && (asksReason || reason.trim() !== '');
  const marksError = wasTried && hand && grains === null ? (read.ok ? words.sheet.marksHelp(marksText(answer.maxGrains)) : read.message) : undefined;
  const isConflict = rule.error instanceof ApiError && rule.error.code === 'conflict';
  const conflict = isConflict && rule.error instanceof ApiError && rule.error.current ? conflictWords(rule.error.current as AnswerView, Date.now()) : null;
  return (
    <View style={{ gap: 14 }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
        <Text style={{ flex: 1 }} weight={500}>
          {words.sheet.yours(saidOf(mine, answer.methodMarks))}
        </Text>
        {mine.grains === null ? null : (
          <MarkStand state="given" scale="desk" got={mine.grains / GRAINS_PER_MARK} of={answer.maxGrains / GRAINS_PER_MARK} gotText={marksText(mine.grains)} ofText={marksText(answer.maxGrains)} />
        )}
      </View>
      {children}
      {says === null ? <Text variant="small">{mine.code === 'ask-the-lead' ? words.sheet.leftAside : words.sheet.marksOpen}</Text> : null}
      {hand ? <Vessel label={words.sheet.marks} value={marks} onChange={setMarks} help={words.sheet.marksHelp(marksText(answer.maxGrains))} error={marksError} variant="reading" maxLength={16} isFocusedFirst onSubmit={go} testID="ruled-marks" /> : null}
      {asksReason || isReasonOpen ? (
        <Vessel
          label={words.sheet.reason}
          value={reason}
          onChange={setReason}
          help={asksReason ? words.sheet.reasonHelp : words.sheet.reasonFree}
          error={wasTried && isReasonShort ? words.sheet.needsReason : undefined}
          maxLength={500}
          isFocusedFirst={!hand}
          onSubmit={go}
          inputRef={reasonField}
          testID="ruling-reason"
        />
      ) : (
        <Text variant="small" tone="ink2">
          {words.sheet.noReason}
        </Text>
      )}
      <View ref={button as never}>
        <Button kind="primary" isWide isLarge keyCap="Enter" onPress={go} isBusy={rule.isPending} testID="rule">
          {hand ? (grains === null ? words.sheet.ruleOpen : words.sheet.ruleMark(marksWords(grains))) : (says ?? '')}
        </Button>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
        {says === null ? null : (
          <Button isSmall kind="text" onPress={() => setByHand(!isByHand)} testID="by-hand">
            {hand ? words.sheet.byHandBack : words.sheet.byHand}
          </Button>
        )}
        {asksReason || isReasonOpen ? null : (
          <Button isSmall kind="text" keyCap="R" onPress={openReason} testID="give-reason">
            {words.sheet.giveReason}
          </Button>
        )}
        <Button isSmall kind="text" onPress={onAgain}>
          {words.sheet.again}
        </Button>
      </View>
      {rule.error ? (
        <View style={{ gap: 8, alignItems: 'flex-start' }}>
          <Text variant="small" tone="methyl" live="assertive" testID="ruling-refused">
            {conflict ?? (isConflict ? `${rule.error.message} ${words.sheet.conflict}` : rule.error.message)}
          </Text>
          {conflict === null ? null : (
            <Button isSmall onPress={onSee} testID="see-conflict">
              {words.sheet.seeIt}
            </Button>
          )}
        </View>
      ) : null}
    </View>
  );
}
