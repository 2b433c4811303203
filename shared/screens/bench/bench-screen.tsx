import { useState } from 'react';
import { View } from 'react-native';
import { useMe } from '../../client/session';
import { useCourseSittings } from '../../client/sittings';
import type { SittingView } from '../../contracts/sittings';
import { Button } from '../../ui/button';
import { ScreenFrame } from '../../ui/screen-frame';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsPhone } from '../../ui/use-breakpoint';
import { homePlaces } from '../frame/home-places';
import { QueryState } from '../query-state';
import { NewSittingDialog } from '../sittings/new-sitting-dialog';
import { SittingStand } from './sitting-stand';
import { WaitingLines } from './waiting-lines';
import { words } from './words';

/** Home: the sittings of one's courses, each with its burette. */
export function BenchScreen() {
  const { data: me } = useMe();
  const isPhone = useIsPhone();
  const [isBeginning, setBeginning] = useState(false);
  const leads = me?.courses.some(({ roles }) => roles.includes('lead')) ?? false;
  return (
    <ScreenFrame
      name={words.name}
      subtitle={words.institution}
      places={homePlaces('bench')}
      actions={
        leads ? (
          <Button icon="plus" onPress={() => setBeginning(true)}>
            {words.newSitting}
          </Button>
        ) : null
      }
    >
      <View style={{ padding: isPhone ? 16 : 24, gap: 32 }}>
        {me?.courses.some(({ roles }) => roles.length > 0) ? <WaitingLines /> : null}
        {(me?.courses ?? []).map((course) => (
          <Course key={course.id} id={course.id} name={`${course.code}, ${course.title}`} mayBegin={course.roles.includes('lead')} />
        ))}
      </View>
      {isBeginning ? <NewSittingDialog onClose={() => setBeginning(false)} /> : null}
    </ScreenFrame>
  );
}

function Course({ id, name, mayBegin }: { id: string; name: string; mayBegin: boolean }) {
  const colors = useColors();
  const sittings = useCourseSittings(id);
  return (
    <View style={{ gap: 16 }}>
      <View style={{ borderTopWidth: 1, borderColor: colors.hair, paddingTop: 16, flexDirection: 'row', flexWrap: 'wrap', columnGap: 12, alignItems: 'baseline' }}>
        <Text variant="head" level={2}>
          {name}
        </Text>
        <Text variant="small" tone="ink2">
          {words.legend}
        </Text>
      </View>
      <QueryState query={sittings} fetching="Fetching the sittings" failed="The sittings did not come.">
        {({ sittings: found }) => <Rack sittings={found} mayBegin={mayBegin} />}
      </QueryState>
    </View>
  );
}

function Rack({ sittings, mayBegin }: { sittings: readonly SittingView[]; mayBegin: boolean }) {
  if (sittings.length === 0) {
    return (
      <View style={{ gap: 4 }}>
        <Text weight={600}>{words.none}</Text>
        <Text tone="ink2">{mayBegin ? words.noneForLead : words.noneForOthers}</Text>
      </View>
    );
  }
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 32 }}>
      {sittings.map((sitting) => (
        <SittingStand key={sitting.id} sitting={sitting} />
      ))}
    </View>
  );
}
