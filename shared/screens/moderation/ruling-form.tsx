import { useEffect, useRef, useState } from 'react';
import { View } from 'react-native';
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
import { needsReason, ruleWords, saidOf } from './ruling';
import { words } from './words';

interface RulingFormProps {
  readonly answer: AnswerView;
  readonly isInDialog: boolean;
  readonly onRuled: (answer: AnswerView, what: string) => void;
  readonly onAgain: () => void;
}

/** After the lead's own reading: what the button will do, a reason where one is asked, or a mark by hand. */
export function RulingForm({ answer, isInDialog, onRuled, onAgain }: RulingFormProps) {
  const { mine } = answer;
  const rule = useRule(answer.answerId);
  const once = useRef(uuidv7());
  const says = ruleWords(answer);
  const [isByHand, setByHand] = useState(says === null);
  const [marks, setMarks] = useState('');
  const [reason, setReason] = useState('');
  const [wasTried, setTried] = useState(false);
  const hand = isByHand || says === null;
  const asksReason = hand || needsReason(answer);
  const read = readMarks(marks, true);
  const grains = read.ok && read.grains <= answer.maxGrains ? read.grains : null;
  const button = useRef<HTMLElement | null>(null);
  useEffect(() => {
    if (!asksReason) button.current?.querySelector<HTMLElement>('button, [role="button"]')?.focus();
  }, [asksReason]);

  const go = () => {
    setTried(true);
    if (!mine || rule.isPending || (asksReason && reason.trim().length < 3) || (hand && grains === null)) return;
    const why = reason.trim() === '' ? {} : { reason: reason.trim() };
    const body: RulingBody = hand ? { kind: 'mark', marks: marks.trim(), ...why } : mine.code !== null ? { kind: 'code', code: mine.code, ...why } : { kind: 'value', text: mine.text ?? '', ...why };
    const what = hand ? `${marksText(grains ?? 0)} marks` : saidOf(mine);
    rule.mutate(
      { rev: answer.rev, body, once: once.current },
      {
        onSuccess: (ruled) => onRuled(ruled, what),
        // A refused one is another request the next time.
        onError: () => (once.current = uuidv7()),
      },
    );
  };
  useKeys({ Enter: go }, { isInDialog });
  if (!mine) return null;
  const marksError = wasTried && hand && grains === null ? (read.ok ? words.sheet.marksHelp(marksText(answer.maxGrains)) : read.message) : undefined;
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
        <Text style={{ flex: 1 }} weight={500}>
          {words.sheet.yours(saidOf(mine))}
        </Text>
        {mine.grains === null ? null : (
          <MarkStand state="given" scale="desk" got={mine.grains / GRAINS_PER_MARK} of={answer.maxGrains / GRAINS_PER_MARK} gotText={marksText(mine.grains)} ofText={marksText(answer.maxGrains)} />
        )}
      </View>
      {says === null ? <Text variant="small">{words.sheet.marksOpen}</Text> : null}
      {hand ? <Vessel label={words.sheet.marks} value={marks} onChange={setMarks} help={words.sheet.marksHelp(marksText(answer.maxGrains))} error={marksError} variant="reading" maxLength={16} isFocusedFirst onSubmit={go} testID="ruled-marks" /> : null}
      {asksReason ? (
        <Vessel
          label={words.sheet.reason}
          value={reason}
          onChange={setReason}
          help={words.sheet.reasonHelp}
          error={wasTried && reason.trim().length < 3 ? words.sheet.needsReason : undefined}
          maxLength={500}
          isFocusedFirst={!hand}
          onSubmit={go}
          testID="ruling-reason"
        />
      ) : (
        <Text variant="small" tone="ink2">
          {words.sheet.noReason}
        </Text>
      )}
      <View ref={button as never}>
        <Button kind="primary" isWide isLarge keyCap="Enter" onPress={go} isBusy={rule.isPending} testID="rule">
          {hand ? (grains === null ? words.sheet.ruleOpen : words.sheet.ruleMark(marksText(grains))) : (says ?? '')}
        </Button>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
        {says === null ? null : (
          <Button isSmall kind="text" onPress={() => setByHand(!isByHand)}>
            {hand ? words.sheet.byHandBack : words.sheet.byHand}
          </Button>
        )}
        <Button isSmall kind="text" onPress={onAgain}>
          {words.sheet.again}
        </Button>
      </View>
      {rule.error ? (
        <Text variant="small" tone="methyl" live="assertive">
          {rule.error.message}
          {rule.error instanceof ApiError && rule.error.code === 'conflict' ? ` ${words.sheet.conflict}` : ''}
        </Text>
      ) : null}
    </View>
  );
}
