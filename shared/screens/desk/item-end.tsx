import type { DeskItem } from '../../contracts/desk';
import { Button, ButtonLink } from '../../ui/button';
import { Empty, Failed, Loading } from '../../ui/page-state';
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

/** Where no answer stands to be read: fetching, failed, the item read, or nothing left. */
export function ItemEnd({ sittingId, item, items, left, work }: ItemEndProps) {
  const name = words.item(item.number, item.label);
  const next = [...items].sort((one, other) => other.toRead - one.toRead).find(({ id, toRead }) => id !== item.id && toRead > 0);
  if (work.error !== null) {
    return (
      <Failed head={words.noAnswers} action={<Button onPress={work.fetchMore}>{words.lookAgain}</Button>}>
        {work.error}
      </Failed>
    );
  }
  if (!work.isAtEnd || work.isFetching) return <Loading>Fetching the next answers</Loading>;
  if (next) {
    const nextName = words.item(next.number, next.label);
    return (
      <Empty
        head={left > 0 ? words.restElsewhere(name) : words.itemRead(name)}
        action={
          <ButtonLink kind="primary" href={`/desk/${sittingId}?item=${next.id}`} testID="next-item">
            {words.goToItem(nextName)}
          </ButtonLink>
        }
      >
        {words.itemLeft(nextName, next.toRead)}
      </Empty>
    );
  }
  return (
    <Empty head={words.allRead} action={<Button onPress={work.fetchMore}>{words.lookAgain}</Button>}>
      {left > 0 ? words.heldByOthers : words.allReadText}
    </Empty>
  );
}
