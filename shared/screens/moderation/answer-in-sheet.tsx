import { useRef, useState } from 'react';
import { View } from 'react-native';
import { heldStates } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { AnswerMore, type MoreTab } from './answer-more';
import { AnswerScale } from './answer-scale';
import type { AnswerSheetProps } from './answer-sheet';
import { Crops } from './crops';
import { Follows } from './follows';
import { MethodCompare } from './method-compare';
import { ReadingsList } from './readings-list';
import { eitherWay, saidOf } from './ruling';
import { RulingForm } from './ruling-form';
import { Standing } from './standing';
import { ThirdReading } from './third-reading';
import { words } from './words';

/** What the sheet holds once the answer has come, in the order in which a person decides. */
export function AnswerInSheet({ answer, canRule, moves, last, onClose, onNextHeld, onOther, onRuled }: AnswerSheetProps & { answer: AnswerView }) {
  const isInDialog = !useIsWide();
  const [isReading, setReading] = useState(answer.mine === null);
  const [typed, setTyped] = useState('');
  const [tab, setTab] = useState<MoreTab>('history');
  const standing = useRef<View>(null);
  const { mine, ruling } = answer;
  const maySettle = canRule && answer.cannotSettle === null && answer.crops.length > 0;
  const isHeld = heldStates.some((state) => state === answer.state);
  const isMineRuled = mine !== null && ruling?.isOwn === true && ruling.kind !== 'mark' && saidOf(mine, answer.methodMarks) === saidOf(ruling, answer.methodMarks);
  const onTakeBack = canRule && ruling?.isOwn ? () => last.takeBack(answer) : null;
  const takeBackAny = onTakeBack ?? last.onTakeBack;
  useKeys(
    {
      // What is typed keeps the keys that move within a text, and the row that it was typed for.
      ...(typed === '' ? moves : {}),
      H: () => setTab('history'),
      ...(answer.scheme.derivation ? { D: () => setTab('derivation') } : {}),
      P: () => setTab('page'),
      Escape: () => (typed === '' ? onClose() : setTyped('')),
      ...(takeBackAny ? { U: takeBackAny } : {}),
    },
    { isInDialog },
  );
  const uncovered = (
    <>
      {answer.isCovered ? null : <AnswerScale answer={answer} />}
      <ReadingsList answer={answer} />
      {answer.isCovered ? null : <MethodCompare answer={answer} />}
      {eitherWay(answer) === null ? null : (
        <Text variant="small" tone="ink2">
          {eitherWay(answer)}
        </Text>
      )}
    </>
  );
  const see = () => {
    const shown = standing.current as unknown as HTMLElement | null;
    shown?.scrollIntoView({ block: 'center' });
    shown?.focus();
  };
  return (
    <View style={{ paddingBottom: 24 }}>
      <Crops answer={answer} />
      <View style={{ padding: 20, gap: 18 }}>
        {isHeld ? null : <Standing answer={answer} onTakeBack={onTakeBack} isBusy={last.isBusy} host={standing} />}
        {answer.isCovered ? null : <Follows answer={answer} onOther={onOther} />}
        {!maySettle ? (
          <>
            <Text variant="small" tone="ink2">
              {answer.crops.length === 0 ? words.sheet.noScan : canRule ? answer.cannotSettle : answer.isCovered ? words.sheet.readOnlyCovered : words.sheet.readOnly}
            </Text>
            {uncovered}
          </>
        ) : isReading || mine === null ? (
          <>
            <ThirdReading answer={answer} text={typed} onText={setTyped} isInDialog={isInDialog} onDone={() => setReading(false)} />
            {uncovered}
            {answer.isCovered ? (
              <Button kind="primary" isWide isLarge onPress={() => undefined} closed={words.sheet.opens}>
                {words.sheet.rule}
              </Button>
            ) : null}
          </>
        ) : isMineRuled ? (
          <>
            {uncovered}
            <Button isSmall kind="text" onPress={() => setReading(true)}>
              {words.sheet.again}
            </Button>
          </>
        ) : (
          <RulingForm key={mine.id} answer={answer} isInDialog={isInDialog} onRuled={onRuled} onSee={see} onAgain={() => setReading(true)}>
            {uncovered}
          </RulingForm>
        )}
        {onNextHeld && (mine?.code === 'ask-the-lead' || (!isHeld && ruling)) ? (
          <Button onPress={onNextHeld} keyCap="]" testID="next-held">
            {words.sheet.next}
          </Button>
        ) : null}
        <AnswerMore answer={answer} tab={tab} onTab={setTab} />
      </View>
    </View>
  );
}
