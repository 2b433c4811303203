import { useState } from 'react';
import { View } from 'react-native';
import { useCandidates, useChangeAttendance } from '../../client/class-list';
import { usePeopleAct, usePeopleAndPaper, useLookAtPeopleAgain, type PeopleAct } from '../../client/people-and-paper';
import { useProgress, useSitting } from '../../client/sittings';
import type { NumberDiffers, PeopleAndPaper } from '../../contracts/people-and-paper';
import type { SittingView } from '../../contracts/sittings';
import { Button, ButtonLink } from '../../ui/button';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useToast } from '../../ui/toast';
import { useIsPhone } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { ActDialog, type Asked } from './act-dialog';
import { DiffersRow } from './differs-row';
import { QuietSections } from './quiet-sections';
import { Row, Section } from './section';
import { Strip } from './strip';
import { words } from './words';

/** Whether every sheet is with its candidate, and what to do where it is not. */
export function PeopleScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  return (
    <InSitting sittingId={sittingId}>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(known) => (known.roles.includes('lead') || known.roles.includes('external') ? <Fetched sitting={known} /> : <Text style={{ padding: 32, maxWidth: 560 }}>{words.notAllowed}</Text>)}
      </QueryState>
    </InSitting>
  );
}

function Fetched({ sitting }: { sitting: SittingView }) {
  const people = usePeopleAndPaper(sitting.id);
  return (
    <QueryState query={people} fetching="Comparing numbers" failed="The comparison did not come.">
      {(view) => <People sitting={sitting} view={view} />}
    </QueryState>
  );
}

const waits = ({ differ, spares, without, missing, unexpected }: PeopleAndPaper): number => differ.length + spares.length + without.length + missing.length + unexpected.length;

function People({ sitting, view }: { sitting: SittingView; view: PeopleAndPaper }) {
  const isPhone = useIsPhone();
  const progress = useProgress(sitting.id);
  const toast = useToast();
  const act = usePeopleAct(sitting.id);
  const attendance = useChangeAttendance(sitting.id);
  const list = useCandidates(sitting.id);
  const lookAgain = useLookAtPeopleAgain(sitting.id);
  const [asked, setAsked] = useState<Asked | null>(null);
  const isLead = sitting.roles.includes('lead');

  const ask = (next: Asked) => {
    act.reset();
    setAsked(next);
  };
  const go = (one: PeopleAct, text: string, back?: PeopleAct) =>
    act.mutate(one, {
      onSuccess: () => {
        setAsked(null);
        toast({ text, icon: 'check', ...(back ? { action: { label: words.done.back, onPress: () => act.mutate(back) } } : {}) });
      },
    });
  const swap = (sheet: NumberDiffers) => {
    const { claimed, candidateId, candidateNumber = '' } = sheet;
    if (!claimed?.scriptId || !candidateId) return;
    const [one, other] = [candidateNumber ?? '', claimed.candidateNumber];
    const both = (first: string, second: string, reason: string): PeopleAct => ({ act: 'swap', scriptId: sheet.scriptId, body: { withScriptId: claimed.scriptId ?? '', seen: first, seenOther: second, reason } });
    ask({ title: words.ask.swap(one, other), text: words.ask.readings, go: words.differ.swap(one, other), reason: words.reasons.swap, onGo: (reason) => go(both(candidateId, claimed.candidateId, reason), words.done.swap(one, other), both(claimed.candidateId, candidateId, words.done.back)) });
  };
  const bind = (sheet: { scriptId: string; scriptNumber: number; candidateId: string | null }, candidate: string, reason: string) =>
    ask({ title: words.ask.bind(sheet.scriptNumber), text: words.ask.emptied, go: words.ask.give, reason, candidate, onGo: (why, found) => found && go({ act: 'bind', scriptId: sheet.scriptId, body: { candidateId: found.id, seen: sheet.candidateId, reason: why } }, words.done.bind(found.number)) });
  const stays = (sheet: NumberDiffers) =>
    ask({ title: words.ask.stays(sheet.candidateNumber ?? ''), text: words.ask.readings, go: words.differ.stays(sheet.candidateNumber ?? ''), reason: '', onGo: (reason) => go({ act: 'number-settled', scriptId: sheet.scriptId, body: { seen: sheet.candidateId, reason } }, words.done.stays) });
  const byHand = (candidateId: string, number: string) =>
    ask({ title: words.ask.byHand(number), text: words.ask.byHandText, go: words.without.byHand, reason: '', onGo: (reason) => go({ act: 'by-hand', candidateId, body: { reason } }, words.done.byHand(number)) });
  const setAttendance = (candidateId: string, to: 'absent' | 'present') => {
    const candidate = list.data?.candidates.find(({ id }) => id === candidateId);
    if (candidate) attendance.mutate({ candidate, attendance: to }, { onSuccess: lookAgain });
  };

  return (
    <View style={{ padding: isPhone ? 16 : 32, gap: 28, maxWidth: 920 }}>
      <View style={{ gap: 6 }}>
        <Text variant={isPhone ? 'title' : 'display'} level={1}>
          {words.title}
        </Text>
        <Text tone="ink2">{words.lead}</Text>
      </View>
      {progress.data ? (
        <View style={{ gap: 8 }}>
          <Text weight={600} isTabular testID="pages-in-place">
            {words.inPlace(progress.data.pages.in, progress.data.pages.due)}
          </Text>
          <ProgressRule done={progress.data.pages.in} of={progress.data.pages.due} label={words.inPlace(progress.data.pages.in, progress.data.pages.due)} />
          <Text variant="small" tone="ink2" isTabular>
            {words.numbers(view.numbers.agree, view.numbers.settled)}
          </Text>
        </View>
      ) : null}
      {view.numbers.unread > 0 ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 20, rowGap: 10 }}>
          <Text weight={600}>{words.unread(view.numbers.unread)}</Text>
          {isLead ? <ButtonLink href={`/sittings/${sitting.id}/numbers`}>{words.readThem}</ButtonLink> : null}
        </View>
      ) : null}
      {waits(view) === 0 ? <Text tone="ink2">{words.allWell}</Text> : null}
      <Section head={words.differ.head} count={view.differ.length}>
        {view.differ.map((sheet) => (
          <DiffersRow key={sheet.scriptId} sheet={sheet} canAct={isLead} onSwap={() => swap(sheet)} onBind={(candidate) => bind(sheet, candidate, words.reasons.bind)} onStay={() => stays(sheet)} />
        ))}
      </Section>
      <Section head={words.spares.head} count={view.spares.length}>
        {view.spares.map((sheet) => (
          <Row key={sheet.scriptId} testID={`spare-${sheet.scriptNumber}`} acts={isLead ? <Button isSmall onPress={() => bind(sheet, sheet.read ?? '', words.reasons.spare)}>{words.ask.bind(sheet.scriptNumber)}</Button> : null}>
            <Text weight={600}>{words.spares.name(sheet.scriptNumber)}</Text>
            {sheet.version === null ? null : <Strip scriptId={sheet.scriptId} version={sheet.version} />}
            <Text variant="small" tone="ink2">
              {sheet.read === null ? words.spares.unread : words.differ.read(sheet.read)}
            </Text>
          </Row>
        ))}
      </Section>
      <QuietSections view={view} canAct={isLead} onAttendance={setAttendance} onByHand={byHand} />
      {attendance.error ? <Text tone="methyl">{attendance.error.message}</Text> : null}
      {asked ? <ActDialog key={asked.title} sittingId={sitting.id} asked={asked} isBusy={act.isPending} error={act.error?.message ?? null} onClose={() => setAsked(null)} /> : null}
    </View>
  );
}
