import { View } from 'react-native';
import { useProgress } from '../../client/sittings';
import type { SittingView } from '../../contracts/sittings';
import { ButtonLink } from '../../ui/button';
import { BuretteRow } from '../../ui/burette-row';
import { BuretteTube } from '../../ui/burette-tube';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { levelOf, stagesOf } from '../frame/stages';
import { dayText } from '../times';
import { words } from './words';

const step = 48;

/** One sitting in the rack: its burette, how it stands, and the way into it. On a phone the burette lies. */
export function SittingStand({ sitting }: { sitting: SittingView }) {
  const isPhone = useIsPhone();
  const { data: progress } = useProgress(sitting.id);
  const stages = stagesOf(sitting, progress, null);
  const level = levelOf(progress);
  const now = stages[Math.min(stages.length - 1, Math.floor(level))];
  const others = stages.filter(({ label, note }) => note !== '' && ['Scans', 'Reading', 'Moderation'].includes(label) && label !== now?.label);
  const name = `${sitting.courseCode}, ${sitting.title}`;
  const text = (
    <View style={{ gap: 4 }}>
      <Text variant="head" level={3}>
        {name}
      </Text>
      <Text variant="small" tone="ink2">
        {dayText(sitting.heldOn)}
      </Text>
      {now && progress ? (
        <View style={{ paddingTop: 6, gap: 2 }}>
          <Text variant="small" weight={600}>
            {`${now.label}${now.note === '' ? '' : `, ${now.note}`}`}
          </Text>
          {progress.isLocked
            ? others.map(({ label, note }) => (
                <Text key={label} variant="small" tone="ink2">
                  {`${label}: ${note}`}
                </Text>
              ))
            : null}
        </View>
      ) : null}
    </View>
  );
  const way = (
    <View style={{ alignSelf: 'flex-start', paddingTop: 10 }}>
      <ButtonLink href={`/sittings/${sitting.id}`} label={`${words.open}: ${name}`}>
        {words.open}
      </ButtonLink>
    </View>
  );
  if (isPhone) {
    return (
      <View role="group" aria-label={name} style={{ alignSelf: 'stretch', width: '100%' }}>
        <BuretteRow stages={stages.length} level={level} label={`${Math.floor(level)} of ${stages.length} stages done`}>
          {text}
        </BuretteRow>
        {way}
      </View>
    );
  }
  return (
    <View style={{ flexDirection: 'row', gap: 16, width: 270 }} role="group" aria-label={name}>
      <BuretteTube stages={stages.length} level={level} step={step} />
      <View style={{ flex: 1, paddingTop: 20 }}>
        {text}
        {way}
      </View>
    </View>
  );
}
