import { View } from 'react-native';
import { useProgress, useSitting } from '../../client/sittings';
import type { ProgressView } from '../../contracts/progress';
import type { SittingView } from '../../contracts/sittings';
import { Icon } from '../../ui/icon';
import { Link } from '../../ui/link';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsPhone } from '../../ui/use-breakpoint';
import { EmptyBoxesLine } from '../blanks/empty-boxes-line';
import { iconOf, stagesOf } from '../frame/stages';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { dayText } from '../times';
import { words } from './words';

/** How a sitting stands: what has been read, what is left, and every section with how far it is. */
export function OverviewScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  const progress = useProgress(sittingId);
  return (
    <InSitting sittingId={sittingId}>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(known) => (
          <QueryState query={progress} fetching="Counting" failed="The counts did not come.">
            {(counts) => <Overview sitting={known} progress={counts} />}
          </QueryState>
        )}
      </QueryState>
    </InSitting>
  );
}

function Overview({ sitting, progress }: { sitting: SittingView; progress: ProgressView }) {
  const isPhone = useIsPhone();
  const { readings, pages, answers } = progress;
  return (
    <View style={{ padding: isPhone ? 16 : 32, gap: 28, maxWidth: 760 }}>
      <View style={{ gap: 4 }}>
        <Text variant="display" level={1}>{`${sitting.courseCode}, ${sitting.title}`}</Text>
        <Text tone="ink2">{words.held(dayText(sitting.heldOn), words.seconds[sitting.secondPolicy])}</Text>
      </View>
      {progress.isLocked ? (
        <View style={{ gap: 20 }}>
          <Count label={words.pages} done={pages.in} of={pages.due} tail={words.pagesIn} />
          <Count label={words.readings} done={readings.taken} of={readings.taken + readings.due} tail={words.readingsTaken} />
          {answers.held !== null && answers.held > 0 ? <Text weight={600}>{words.heldAnswers(answers.held)}</Text> : null}
        </View>
      ) : null}
      <EmptyBoxesLine sittingId={sitting.id} />
      <Sections sitting={sitting} progress={progress} />
      <Text variant="small" tone="ink2">
        {words.provisional}
      </Text>
    </View>
  );
}

function Count({ label, done, of, tail }: { label: string; done: number; of: number; tail: (of: number) => string }) {
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: 8 }}>
        <Text variant="display" isTabular>
          {done.toLocaleString('en-GB')}
        </Text>
        <Text tone="ink2">{tail(of)}</Text>
      </View>
      <ProgressRule done={done} of={of} label={label} />
    </View>
  );
}

function Sections({ sitting, progress }: { sitting: SittingView; progress: ProgressView }) {
  const colors = useColors();
  const stages = stagesOf(sitting, progress, null).filter(({ href }) => href !== undefined);
  return (
    <View role="list" aria-label={words.sections} style={{ borderTopWidth: 1, borderColor: colors.hair }}>
      {stages.map(({ section, label, note, href }) => (
        <View key={section} role="listitem">
          <Link
            href={href ?? '/'}
            isFocusInside
            style={({ isHovered }) => ({ flexDirection: 'row', alignItems: 'center', gap: 14, minHeight: 56, paddingHorizontal: 8, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: isHovered ? colors.well : 'transparent' })}
          >
            <Icon name={iconOf(section)} tone="ink2" />
            <Text weight={600} style={{ flex: 1 }}>
              {label}
            </Text>
            <Text variant="small" tone="ink2" isTabular>
              {note}
            </Text>
            <Icon name="forward" tone="ink3" />
          </Link>
        </View>
      ))}
    </View>
  );
}
