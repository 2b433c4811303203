import { useWaiting } from '../../client/sittings';
import { ButtonLink } from '../../ui/button';
import { words } from './words';

/** The way to the sheet from a screen of the sitting, while there is one to look at. */
export function EmptyBoxesLine({ sittingId }: { sittingId: string }) {
  const count = useWaiting().data?.lines.find((line) => line.kind === 'blanks' && line.sittingId === sittingId)?.count ?? 0;
  return count === 0 ? null : (
    <ButtonLink iconAfter="forward" align="between" href={`/sittings/${sittingId}/blanks`} testID="empty-boxes">
      {words.lookEmpty(count)}
    </ButtonLink>
  );
}
