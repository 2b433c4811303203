import { useState } from 'react';
import { View } from 'react-native';
import { useAnswer, useTakeBackRuling } from '../../client/ledger';
import { cropUrl } from '../../client/pictures';
import { heldStates } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { Button } from '../../ui/button';
import { MarkStand } from '../../ui/mark-stand';
import { PairGlyph } from '../../ui/pair-glyph';
import { SideSheet } from '../../ui/side-sheet';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { ChemText } from '../chem-text';
import { fitAlone } from '../desk/fit';
import { ScanPicture } from '../desk/scan-picture';
import { QueryState } from '../query-state';
import { AnswerMore, type MoreTab } from './answer-more';
import { AnswerScale } from './answer-scale';
import { ReadingsList } from './readings-list';
import { saidOf } from './ruling';
import { RulingForm } from './ruling-form';
import { ThirdReading } from './third-reading';
import { stateGlyphs, stateWords, words } from './words';

interface AnswerSheetProps {
  readonly answerId: string;
  readonly canRule: boolean;
  readonly onClose: () => void;
  readonly onPrevious: () => void;
  readonly onNext: () => void;
  readonly onNextHeld: (() => void) | null;
  readonly onRuled: (answer: AnswerView, what: string) => void;
}

/** One answer looked at closely: its scan, the lead's own reading, then what is uncovered, and the ruling. */
export function AnswerSheet(props: AnswerSheetProps) {
  const answer = useAnswer(props.answerId);
  const data = answer.data;
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
      state={data ? <State answer={data} /> : null}
      onClose={props.onClose}
      onPrevious={props.onPrevious}
      onNext={props.onNext}
      keepsFocus
      testID="answer-sheet"
    >
      <QueryState query={answer} fetching="Fetching the answer" failed="The answer did not come.">
        {(found) => <Sheet key={found.answerId} answer={found} {...props} />}
      </QueryState>
    </SideSheet>
  );
}

function State({ answer }: { answer: AnswerView }) {
  const isHeld = heldStates.some((state) => state === answer.state);
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
      <PairGlyph state={stateGlyphs[answer.state]} />
      <Text variant="small" weight={600} tone={isHeld ? 'iodine' : answer.state === 'ruled' ? 'manganate' : 'ink2'} testID="answer-state">
        {stateWords[answer.state]}
      </Text>
    </View>
  );
}

function Sheet({ answer, canRule, onNextHeld, onRuled }: AnswerSheetProps & { answer: AnswerView }) {
  const isWide = useIsWide();
  const takeBack = useTakeBackRuling();
  const [isReading, setReading] = useState(answer.mine === null);
  const [tab, setTab] = useState<MoreTab>('history');
  const maySettle = canRule && answer.cannotSettle === null && answer.crops.length > 0;
  const standing = answer.score ?? (answer.ruling ? { grains: answer.ruling.grains ?? 0, why: null } : null);
  const isHeld = heldStates.some((state) => state === answer.state);
  const takeBackOwn = () => {
    if (answer.ruling?.isOwn) takeBack.mutate(answer.ruling.id);
  };
  useKeys({ H: () => setTab('history'), D: () => setTab('derivation'), P: () => setTab('page'), U: takeBackOwn }, { isInDialog: !isWide });
  return (
    <View style={{ paddingBottom: 24 }}>
      <Crops answer={answer} />
      <View style={{ padding: 20, gap: 18 }}>
        {standing && !isHeld ? (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 14 }}>
            <MarkStand state={answer.ruling ? 'ruled' : 'given'} scale="desk" got={standing.grains / GRAINS_PER_MARK} of={answer.maxGrains / GRAINS_PER_MARK} gotText={marksText(standing.grains)} ofText={marksText(answer.maxGrains)} />
            <View style={{ flex: 1 }}>
              <Text weight={600}>{answer.ruling ? words.sheet.ruledBy(answer.ruling.isOwn) : (answer.score?.why.head ?? '')}</Text>
              <Text variant="small" tone="ink2">
                {answer.ruling?.reason ?? answer.score?.why.detail ?? ''}
              </Text>
            </View>
            {answer.ruling?.isOwn && canRule ? (
              <Button isSmall keyCap="U" icon="takeBack" onPress={takeBackOwn} isBusy={takeBack.isPending} testID="take-back-ruling">
                {words.sheet.takeBack}
              </Button>
            ) : null}
          </View>
        ) : null}
        {takeBack.error ? (
          <Text variant="small" tone="methyl">
            {takeBack.error.message}
          </Text>
        ) : null}
        {maySettle ? (
          isReading || answer.mine === null ? (
            <ThirdReading answer={answer} isInDialog={!isWide} onDone={() => setReading(false)} />
          ) : answer.ruling !== null && answer.ruling.isOwn && saidOf(answer.mine) === saidOf({ text: answer.ruling.text, code: answer.ruling.code }) ? (
            <Button isSmall kind="text" onPress={() => setReading(true)}>
              {words.sheet.again}
            </Button>
          ) : (
            <RulingForm key={answer.mine.id} answer={answer} isInDialog={!isWide} onRuled={onRuled} onAgain={() => setReading(true)} />
          )
        ) : (
          <Text variant="small" tone="ink2">
            {answer.crops.length === 0 ? words.sheet.noScan : canRule ? answer.cannotSettle : words.sheet.readOnly}
          </Text>
        )}
        {answer.isCovered ? null : <AnswerScale answer={answer} />}
        <ReadingsList answer={answer} />
        {onNextHeld && !isHeld && answer.ruling ? (
          <Button onPress={onNextHeld} keyCap="]">
            {words.sheet.next}
          </Button>
        ) : null}
        <AnswerMore answer={answer} tab={tab} onTab={setTab} />
      </View>
    </View>
  );
}

function Crops({ answer }: { answer: AnswerView }) {
  const colors = useColors();
  const [width, setWidth] = useState(0);
  const shown = [...answer.crops].sort((one, other) => (one.use === other.use ? 0 : one.use === 'answer' ? -1 : 1));
  if (shown.length === 0) return null;
  return (
    <View onLayout={({ nativeEvent }) => setWidth(nativeEvent.layout.width)} style={{ backgroundColor: colors.mat, padding: 16, gap: 10, alignItems: 'center', minHeight: 120 }}>
      {width > 0
        ? shown.map((crop) => {
            const size = { width: crop.widthPx, height: crop.heightPx };
            const scale = fitAlone(size, { width: width - 32, height: crop.use === 'answer' ? 190 : 150 });
            return <ScanPicture key={crop.box} src={cropUrl(answer.answerId, crop)} alt={`${crop.use === 'answer' ? 'Answer box' : 'Working'} of ${answer.candidateNumber}`} width={Math.round(size.width * scale)} height={Math.round(size.height * scale)} turns={0} />;
          })
        : null}
    </View>
  );
}
