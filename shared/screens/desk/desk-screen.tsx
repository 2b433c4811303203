import { Redirect } from 'expo-router';
import { useState } from 'react';
import { useStanding } from '../../client/desk';
import { useMe } from '../../client/session';
import type { DeskItem } from '../../contracts/desk';
import { ButtonLink } from '../../ui/button';
import { Empty } from '../../ui/page-state';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { DeskItemWork } from './desk-item';
import { words } from './words';

interface DeskScreenProps {
  readonly sittingId: string;
  readonly itemId: string | undefined;
}

const mostToRead = (items: readonly DeskItem[]): DeskItem | undefined => items.reduce<DeskItem | undefined>((most, item) => (most === undefined || item.toRead > most.toRead ? item : most), undefined);

/** The reading desk: typing what is written, fast and blind. */
export function DeskScreen({ sittingId, itemId }: DeskScreenProps) {
  const standing = useStanding(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed isSlim isBarHidden>
      <QueryState query={standing} fetching="Fetching the desk" failed="The desk did not come.">
        {(found) => <Desk key={itemId} standing={found} countedAt={standing.dataUpdatedAt} itemId={itemId} />}
      </QueryState>
    </InSitting>
  );
}

interface DeskProps {
  readonly standing: NonNullable<ReturnType<typeof useStanding>['data']>;
  readonly countedAt: number;
  readonly itemId: string | undefined;
}

function Desk({ standing, countedAt, itemId }: DeskProps) {
  const { sittingId, items, isOpenForReading, emptyBoxes, courseCode, title } = standing;
  const { data: me } = useMe();
  // Chosen once: counts that change while someone reads do not move them to another item.
  const [chosen] = useState(() => items.find(({ id }) => id === itemId)?.id ?? mostToRead(items)?.id);
  const item = items.find(({ id }) => id === chosen);
  if (!item || !isOpenForReading || !me) {
    return (
      <Empty head={words.notOpen} action={<ButtonLink href={`/sittings/${sittingId}/scans`}>{words.toScans}</ButtonLink>}>
        {words.notOpenText}
      </Empty>
    );
  }
  // In the address, so that looking at the page anew stays with the item.
  if (item.id !== itemId) return <Redirect href={`/desk/${sittingId}?item=${item.id}`} />;
  return <DeskItemWork sittingId={sittingId} course={courseCode} title={title} personId={me.id} item={item} items={items} emptyBoxes={emptyBoxes} countedAt={countedAt} />;
}
