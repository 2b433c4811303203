import { useState } from 'react';
import { View } from 'react-native';
import { useBlankSheet, useTakeBackLot, type BlankSheet, type SheetPlace } from '../../client/blanks';
import { Button, ButtonLink } from '../../ui/button';
import { Empty } from '../../ui/page-state';
import { Text } from '../../ui/text';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { BlanksHead } from './blanks-head';
import { OneSheet } from './one-sheet';
import { nextPlace } from './sheet-moves';
import { words } from './words';

/** What was recorded last, and where it stood: enough to take it back. */
interface Lot {
  readonly readingIds: readonly string[];
  readonly place: SheetPlace;
  /** Boxes on the sheet, the unticked ones too. */
  readonly looked: number;
}

const start: SheetPlace = { round: 0 };

/** Boxes that look empty, one sheet after the other; a person says which are. */
export function BlanksScreen({ sittingId }: { sittingId: string }) {
  const [place, setPlace] = useState<SheetPlace>(start);
  const [isAtEnd, setAtEnd] = useState(false);
  const [lot, setLot] = useState<Lot | null>(null);
  const [looked, setLooked] = useState(0);
  const [first, setFirst] = useState<number | null>(null);
  const [said, setSaid] = useState('');
  const query = useBlankSheet(sittingId, place);
  const undo = useTakeBackLot(sittingId);

  const goOn = (sheet: BlankSheet, readingIds: readonly string[], missed: number) => {
    const count = sheet.suggestions.length;
    setFirst(first ?? sheet.items.reduce((sum, item) => sum + item.count, 0));
    setLooked(looked + count);
    setLot({ readingIds, place: { ...place, item: sheet.itemId ?? undefined }, looked: count });
    setSaid(words.recorded(readingIds.length, missed));
    const next = nextPlace(sheet, place.round + 1);
    if (next) setPlace(next);
    else setAtEnd(true);
  };
  const takeBack = () => {
    if (lot === null || lot.readingIds.length === 0 || undo.isPending) return;
    undo.mutate(lot.readingIds, {
      onSuccess: (taken) => {
        setSaid(words.taken(taken));
        setLooked(looked - lot.looked);
        setPlace({ ...lot.place, round: place.round + 1 });
        setAtEnd(false);
        setLot(null);
      },
      onError: ({ message }) => setSaid(message),
    });
  };
  const again = () => {
    setPlace({ round: place.round + 1 });
    setAtEnd(false);
    setLooked(0);
    setFirst(null);
  };
  const lastCount = lot?.readingIds.length ?? 0;
  const end = (head: string, text: string) => (
    <Empty
      head={head}
      action={
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
          <ButtonLink kind="primary" href={`/desk/${sittingId}`} testID="to-desk">
            {words.toTheDesk}
          </ButtonLink>
          <Button onPress={again}>{words.again}</Button>
          {lastCount > 0 ? (
            <Button icon="takeBack" isBusy={undo.isPending} onPress={takeBack} testID="take-back-blanks">
              {words.takeBack(lastCount)}
            </Button>
          ) : null}
        </View>
      }
    >
      {text}
    </Empty>
  );
  return (
    <InSitting sittingId={sittingId} isFixed isSlim isBarHidden>
      <QueryState query={query} fetching="Fetching the boxes" failed="The boxes did not come.">
        {(sheet) => {
          const item = isAtEnd ? undefined : sheet.items.find(({ id }) => id === sheet.itemId);
          const all = first ?? sheet.items.reduce((sum, { count }) => sum + count, 0);
          return (
            <View style={{ flex: 1, minHeight: 0 }}>
              <BlanksHead sittingId={sittingId} item={item} looked={looked} of={Math.max(all, looked + (isAtEnd ? 0 : sheet.suggestions.length))} />
              <Text variant="small" tone="ink2" live="polite" style={{ paddingHorizontal: 24, paddingTop: said === '' ? 0 : 8 }} testID="blanks-said">
                {said}
              </Text>
              {isAtEnd ? (
                end(words.end, words.endText)
              ) : sheet.suggestions.length === 0 ? (
                end(words.endNone, words.endNoneText)
              ) : (
                <OneSheet key={place.round} sittingId={sittingId} sheet={sheet} lastCount={lastCount} isTakingBack={undo.isPending} onTakeBack={takeBack} onDone={(ids, missed) => goOn(sheet, ids, missed)} />
              )}
            </View>
          );
        }}
      </QueryState>
    </InSitting>
  );
}
