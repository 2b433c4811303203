import { useEffect } from 'react';
import { View } from 'react-native';
import { useAnswer } from '../../client/ledger';
import { heldStates } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { PairGlyph } from '../../ui/pair-glyph';
import { SideSheet } from '../../ui/side-sheet';
import { Text } from '../../ui/text';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys, type KeyMap } from '../../ui/use-keys';
import { ChemText } from '../chem-text';
import { QueryState } from '../query-state';
import { AnswerInSheet } from './answer-in-sheet';
import { LastRulingStrip } from './last-ruling-strip';
import type { LastRuling } from './use-last-ruling';
import { stateGlyphs, stateWords, words } from './words';

export interface AnswerSheetProps {
  readonly answerId: string;
  /** The rev of its row: with a newer one than the sheet has, the sheet looks again. */
  readonly rev: number;
  readonly canRule: boolean;
  /** "3 of 14", among the held rows. */
  readonly heldCount: string | null;
  /** Keys that lead to other rows. */
  readonly moves: KeyMap;
  readonly last: LastRuling;
  readonly onClose: () => void;
  readonly onPrevious: () => void;
  readonly onNext: () => void;
  readonly onNextHeld: (() => void) | null;
  /** Another answer, wherever it stands in the list. */
  readonly onOther: (answerId: string) => void;
  readonly onRuled: (answer: AnswerView, what: string) => void;
}

/** One answer looked at closely: its scan, the lead's own reading, then what is uncovered, and the ruling. */
export function AnswerSheet(props: AnswerSheetProps) {
  const { answerId, rev, heldCount, moves, last, onClose } = props;
  const isWide = useIsWide();
  const answer = useAnswer(answerId);
  const { data, refetch } = answer;
  const isOld = data !== undefined && rev > data.rev;
  useEffect(() => {
    if (isOld) void refetch();
  }, [isOld, refetch]);
  useKeys({ ...moves, Escape: onClose }, { isInDialog: !isWide, isOff: data !== undefined });
  return (
    <SideSheet
      name={data ? words.sheet.name(data.candidateNumber, data.itemNumber, data.label) : words.title}
      title={
        data ? (
          <>
            <Text variant="reading" weight={600}>
              {data.candidateNumber}
            </Text>
            {`, item ${data.itemNumber}, `}
            <ChemText beside="head">{data.label}</ChemText>
          </>
        ) : (
          ''
        )
      }
      state={data ? <State answer={data} heldCount={heldCount} /> : null}
      onClose={onClose}
      onPrevious={props.onPrevious}
      onNext={props.onNext}
      foot={isWide ? null : <LastRulingStrip last={last} />}
      keepsFocus
      testID="answer-sheet"
    >
      <QueryState query={answer} fetching="Fetching the answer" failed="The answer did not come.">
        {(found) => <AnswerInSheet key={found.answerId} answer={found} {...props} />}
      </QueryState>
    </SideSheet>
  );
}

function State({ answer, heldCount }: { answer: AnswerView; heldCount: string | null }) {
  const isHeld = heldStates.some((state) => state === answer.state);
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
      <PairGlyph state={stateGlyphs[answer.state]} />
      <Text variant="small" weight={600} tone={isHeld ? 'iodine' : answer.state === 'ruled' ? 'manganate' : 'ink2'} lines={1} testID="answer-state">
        {isHeld && heldCount !== null ? words.sheet.stateOf(stateWords[answer.state], heldCount) : stateWords[answer.state]}
      </Text>
    </View>
  );
}
