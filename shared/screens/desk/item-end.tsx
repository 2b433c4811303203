import type { DeskItem } from '../../contracts/desk';
import { Button, ButtonLink } from '../../ui/button';
import { Empty, Failed, Loading } from '../../ui/page-state';
import { ChemText } from '../chem-text';
import type { DeskWork } from './use-desk-work';
import { words } from './words';

interface ItemEndProps {
  readonly sittingId: string;
  readonly item: DeskItem;
  readonly items: readonly DeskItem[];
  /** Of this item, read by this reader not yet: then other readers hold them. */
  readonly left: number;
  readonly work: DeskWork;
}

/** The other item with the most to read. */
export const nextItem = (items: readonly DeskItem[], itemId: string): DeskItem | undefined => [...items].sort((one, other) => other.toRead - one.toRead).find(({ id, toRead }) => id !== itemId && toRead > 0);

export const isOver = ({ error, isAtEnd, isFetching, shown }: DeskWork): boolean => shown.kind === 'none' && error === null && isAtEnd && !isFetching;

/** Where no answer stands to be read: fetching, failed, the item read, or nothing left. */
export function ItemEnd({ sittingId, item, items, left, work }: ItemEndProps) {
  const name = words.item(item.number, item.label);
  const next = nextItem(items, item.id);
  if (work.error !== null) {
    return (
      <Failed head={words.noAnswers} action={<Button onPress={work.fetchMore}>{words.lookAgain}</Button>}>
        {work.error}
      </Failed>
    );
  }
  if (!isOver(work)) return <Loading>Fetching the next answers</Loading>;
  if (next) {
    const nextName = words.item(next.number, next.label);
    return (
      <Empty
        head={<ChemText beside="head">{left > 0 ? words.restElsewhere(name) : words.itemRead(name)}</ChemText>}
        action={
          <ButtonLink kind="primary" keyCap="Enter" href={`/desk/${sittingId}?item=${next.id}`} testID="next-item">
            <ChemText>{words.goToItem(nextName)}</ChemText>
          </ButtonLink>
        }
      >
        <ChemText beside="small">{words.itemLeft(nextName, next.toRead)}</ChemText>
      </Empty>
    );
  }
  return (
    <Empty head={words.allRead} action={<Button onPress={work.fetchMore}>{words.lookAgain}</Button>}>
      {left > 0 ? words.heldByOthers : words.allReadText}
    </Empty>
  );
}
