import { useState } from 'react';
import { View } from 'react-native';
import { useCandidates, useNames } from '../../client/class-list';
import { useSitting } from '../../client/sittings';
import type { CandidateView } from '../../contracts/class-list';
import type { SittingView } from '../../contracts/sittings';
import { attendances } from '../../contracts/enums';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size } from '../../ui/tokens';
import { useIsWide } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { CandidateTable } from './candidate-table';
import { countsOf, found, isToBeMarked, type Shown } from './filter';
import { ImportPane } from './import-pane';
import { words } from './words';

/** Who should have a script, who was there, and whose pages are in. */
export function ClassListScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  const candidates = useCandidates(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(known) => (
          <QueryState query={candidates} fetching="Fetching the class list" failed="The class list did not come.">
            {(list) => <ClassList sitting={known} candidates={list.candidates} />}
          </QueryState>
        )}
      </QueryState>
    </InSitting>
  );
}

function ClassList({ sitting, candidates }: { sitting: SittingView; candidates: readonly CandidateView[] }) {
  const isLead = sitting.roles.includes('lead');
  const [isImporting, setImporting] = useState(false);
  const [done, setDone] = useState<string | null>(null);
  if (isImporting) {
    return (
      <ImportPane
        sitting={sitting}
        onBack={() => setImporting(false)}
        onDone={(sentence) => {
          setDone(sentence);
          setImporting(false);
        }}
      />
    );
  }
  return candidates.length === 0 ? (
    <EmptyList canImport={isLead} onImport={() => setImporting(true)} />
  ) : (
    <FilledList sitting={sitting} candidates={candidates} isLead={isLead} done={done} onImport={() => setImporting(true)} />
  );
}

function EmptyList({ canImport, onImport }: { canImport: boolean; onImport: () => void }) {
  return (
    <View style={{ padding: 32, gap: 14, alignItems: 'flex-start', maxWidth: 560 }}>
      <Text variant="display" level={1}>
        {words.emptyHead}
      </Text>
      <Text>{canImport ? words.emptyText : words.emptyReader}</Text>
      {canImport ? (
        <Button kind="primary" icon="plus" onPress={onImport} testID="import-list">
          {words.import.title}
        </Button>
      ) : null}
    </View>
  );
}

interface FilledListProps {
  readonly sitting: SittingView;
  readonly candidates: readonly CandidateView[];
  readonly isLead: boolean;
  readonly done: string | null;
  readonly onImport: () => void;
}

function FilledList({ sitting, candidates, isLead, done, onImport }: FilledListProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const [shown, setShown] = useState<Shown>('all');
  const [text, setText] = useState('');
  const [showsNames, setShowsNames] = useState(false);
  const names = useNames(sitting.id, isLead && showsNames);
  const nameOf = new Map((showsNames ? (names.data?.names ?? []) : []).map(({ candidateId, name }) => [candidateId, name ?? '']));
  const counts = countsOf(candidates);
  const rows = found(candidates, shown, text, nameOf);
  const marked = candidates.filter(isToBeMarked);
  const complete = marked.filter(({ pagesIn, pagesDue }) => pagesDue > 0 && pagesIn >= pagesDue).length;
  const side = isWide ? 24 : 16;
  return (
    <View style={{ flex: 1 }}>
      <View style={{ minHeight: size.topBarWide, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 14, rowGap: 8, paddingHorizontal: side, paddingVertical: 10 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 240, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 14 }}>
          <Text variant="title" level={1}>
            {words.title}
          </Text>
          <Text variant="small" tone="ink2">
            {words.summary(candidates.length, marked.length, complete)}
          </Text>
        </View>
        {isLead ? (
          <Button icon="plus" onPress={onImport} testID="import-list">
            {words.fromFile}
          </Button>
        ) : null}
      </View>
      {done === null ? null : (
        <Text variant="small" live="polite" style={{ paddingHorizontal: side, paddingBottom: 8 }}>
          {done}
        </Text>
      )}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', columnGap: 16, rowGap: 10, paddingHorizontal: side, paddingBottom: 12 }}>
        <View role="group" aria-label={words.head.attendance} style={{ flexGrow: 1, flexShrink: 1, flexBasis: 320, flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
          {(['all', ...attendances] as const)
            .filter((name) => name === 'all' || counts[name] > 0 || shown === name)
            .map((name) => (
              <Chip key={name} isChosen={shown === name} count={counts[name]} onPress={() => setShown(name)}>
                {name === 'all' ? words.all : words.attendance[name].charAt(0).toUpperCase() + words.attendance[name].slice(1)}
              </Chip>
            ))}
        </View>
        <View style={{ flexGrow: isWide ? 0 : 1, flexBasis: 220 }}>
          <Vessel label={words.find} aside={showsNames ? words.findHelp : words.findNumberHelp} value={text} onChange={setText} height={40} maxLength={60} testID="find-candidate" />
        </View>
      </View>
      {rows.length === 0 ? (
        <View style={{ padding: side, gap: 12, alignItems: 'flex-start', borderTopWidth: 1, borderColor: colors.hair, flex: 1 }}>
          <Text>{words.nothingFound([shown === 'all' ? '' : words.attendance[shown], text.trim() === '' ? '' : `“${text.trim()}”`].filter((part) => part !== '').join(' and '))}</Text>
          <Button
            isSmall
            onPress={() => {
              setShown('all');
              setText('');
            }}
          >
            {words.clear}
          </Button>
        </View>
      ) : (
        <CandidateTable sittingId={sitting.id} rows={rows} names={showsNames ? nameOf : null} canChange={isLead} />
      )}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 16, rowGap: 4, paddingHorizontal: side, paddingVertical: 8, backgroundColor: colors.glass, borderTopWidth: 1, borderColor: colors.hair }}>
        <Text variant="small" tone="ink2" live="polite">
          {words.rows(rows.length, candidates.length)}
        </Text>
        <Text variant="small" tone={names.isError ? 'methyl' : 'ink2'} style={{ flex: 1, flexBasis: 200 }}>
          {names.isError ? names.error.message : isLead && showsNames ? words.namesShown : words.namesFoot}
        </Text>
        {isLead ? (
          <Button kind="text" isSmall icon="eye" onPress={() => setShowsNames(!showsNames)} isPressedIn={showsNames} testID="show-names">
            {showsNames ? words.hideNames : words.showNames}
          </Button>
        ) : null}
      </View>
    </View>
  );
}
