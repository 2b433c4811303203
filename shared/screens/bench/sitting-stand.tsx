import { View } from 'react-native';
import { useProgress } from '../../client/sittings';
import type { SittingView } from '../../contracts/sittings';
import { BuretteTube } from '../../ui/burette-tube';
import { Link } from '../../ui/link';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { levelOf, stagesOf } from '../frame/stages';
import { dayText } from '../times';
import { words } from './words';

const height = 28;

/** One sitting in the rack: its burette, where it stands, and the ways into it that this person has. */
export function SittingStand({ sitting }: { sitting: SittingView }) {
  const colors = useColors();
  const { data: progress } = useProgress(sitting.id);
  const stages = stagesOf(sitting, progress, null);
  const ways = stages.filter((stage) => stage.href !== undefined);
  return (
    <View style={{ flexDirection: 'row', gap: 8, width: 300 }} role="group" aria-label={`${sitting.courseCode}, ${sitting.title}`}>
      <BuretteTube stages={stages.length} level={levelOf(progress)} step={height * 2} />
      <View style={{ flex: 1, gap: 6, paddingTop: 16 }}>
        <Text variant="head" level={3}>{`${sitting.courseCode}, ${sitting.title}`}</Text>
        <Text variant="small" tone="ink2">{`${dayText(sitting.heldOn)}, paper ${sitting.lockedAt === null ? words.open : words.locked}`}</Text>
        {stages.map((stage) => (
          <Text key={stage.label} variant="small">
            <Text variant="small" weight={600}>{`${stage.label}: `}</Text>
            {stage.note}
          </Text>
        ))}
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16, paddingTop: 8 }}>
          {ways.map((stage) => (
            <Link key={stage.label} href={stage.href ?? '/'} style={() => ({ minHeight: 36, justifyContent: 'center', borderBottomWidth: 2, borderColor: colors.manganate })}>
              <Text weight={600}>{stage.label}</Text>
            </Link>
          ))}
        </View>
      </View>
    </View>
  );
}
