import { View } from 'react-native';
import type { Derivation as DerivationData } from '../../chemistry/derivation';
import { useAnswerHistory } from '../../client/ledger';
import type { AnswerView, HistoryAct } from '../../contracts/ledger';
import { marksText } from '../../marking/grains';
import { Cover } from '../../ui/cover';
import { TabPanel, Tabs } from '../../ui/tabs';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { PageOnMat } from '../page-on-mat';
import { QueryState } from '../query-state';
import { momentText } from '../times';
import { WorkedDerivation } from '../worked-derivation';
import { saidOf } from './ruling';
import { words } from './words';

export const moreTabs = ['history', 'derivation', 'page'] as const;
export type MoreTab = (typeof moreTabs)[number];

interface AnswerMoreProps {
  readonly answer: AnswerView;
  readonly tab: MoreTab;
  readonly onTab: (tab: MoreTab) => void;
}

/** History, derivation and the whole page of an answer. */
export function AnswerMore({ answer, tab, onTab }: AnswerMoreProps) {
  return (
    <View style={{ gap: 12 }}>
      <Tabs id="answer-more" label={words.sheet.tabsLabel} tabs={moreTabs.filter((key) => key !== 'derivation' || Boolean(answer.scheme.derivation)).map((key) => ({ key, label: words.sheet.tabs[key] }))} chosen={tab} onChoose={onTab} isSmall />
      <TabPanel id="answer-more" chosen={tab}>
        {tab === 'history' ? <History answer={answer} /> : null}
        {tab === 'derivation' && answer.scheme.derivation ? <WorkedDerivation derivation={answer.scheme.derivation as DerivationData} quantity={answer.scheme.quantity} /> : null}
        {tab === 'page' && answer.pageImageId ? (
          <View style={{ height: 560 }}>
            <PageOnMat id={answer.pageImageId} rev={answer.pageImageRev} label={`Page ${answer.pageNo ?? ''} of ${answer.candidateNumber}`} isWhole />
          </View>
        ) : null}
      </TabPanel>
    </View>
  );
}

function History({ answer }: { answer: AnswerView }) {
  const history = useAnswerHistory(answer.answerId, true);
  return (
    <QueryState query={history} fetching="Fetching the history" failed="The history did not come.">
      {({ acts }) => (
        <View role="list" style={{ gap: 2 }}>
          {acts.map((act, index) => (
            <Act key={index} act={act} methodMarks={answer.methodMarks} />
          ))}
        </View>
      )}
    </QueryState>
  );
}

function Act({ act, methodMarks }: { act: HistoryAct; methodMarks: AnswerView['methodMarks'] }) {
  const colors = useColors();
  const said = act.given === null ? '' : saidOf({ ...act.given, method: act.method }, act.isCovered ? [] : methodMarks);
  const mark = act.grains === null ? '' : `, ${marksText(act.grains)} marks`;
  const scheme = act.act === 'scored' && act.schemeOrdinal !== null ? `, ${words.sheet.scheme(act.schemeOrdinal)}` : '';
  const head = act.act === 'scored' ? words.acts.scored : `${act.who} ${words.acts[act.act]}`;
  return (
    <View role="listitem" style={{ flexDirection: 'row', gap: 10, paddingVertical: 4 }}>
      <View style={{ width: 10, height: 10, marginTop: 6, borderRadius: 5, borderWidth: 1.5, borderColor: colors.ink2, backgroundColor: act.grains === null ? 'transparent' : colors.copperFluid }} />
      <View style={{ flex: 1, gap: 1 }}>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 6, alignItems: 'center' }}>
          <Text variant="small">{`${head}${said === '' ? '' : ` ${said}`}${mark}${scheme}`}</Text>
          {act.isCovered ? <Cover /> : null}
        </View>
        {act.reason === null ? null : <Text variant="small">{act.reason}</Text>}
        <Text variant="micro" tone="ink2">
          {momentText(act.at)}
        </Text>
      </View>
    </View>
  );
}
