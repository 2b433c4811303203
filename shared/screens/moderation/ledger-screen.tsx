import { useLocalSearchParams, useRouter } from 'expo-router';
import { useCallback, useRef, useState } from 'react';
import { View, type TextInput } from 'react-native';
import { useLedger, type LedgerQuestion } from '../../client/ledger';
import { useSitting } from '../../client/sittings';
import type { LedgerSort } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { KeyList, KeyStrip } from '../../ui/key-strip';
import { Empty } from '../../ui/page-state';
import { Text } from '../../ui/text';
import { useBreakpoint, useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { AnswerSheet } from './answer-sheet';
import { LedgerHead } from './ledger-head';
import { LedgerTable } from './ledger-table';
import { nothingHere } from './nothing-here';
import { countOfHeld, nowhere, placeAfterRuling, steppedPlace } from './place';
import { nextHeld, paramsOf, questionOf } from './question';
import { useLastRuling } from './use-last-ruling';
import { usePlace } from './use-place';
import { useTouched } from './use-touched';
import { keyGroups, words } from './words';

/** Rows fetched beyond those on view. */
const ahead = 10;

/** The moderation ledger: every answer of the sitting, and beside it the one that is looked at. */
export function LedgerScreen({ sittingId }: { sittingId: string }) {
  const router = useRouter();
  const isWide = useIsWide();
  const isFull = useBreakpoint() === 'full';
  const asked = questionOf(useLocalSearchParams());
  const [view, setView] = useState({ from: 0, to: 0 });
  const [isOpen, setOpen] = useState(false);
  const [areKeysOpen, setKeysOpen] = useState(false);
  const findField = useRef<TextInput>(null);
  const filters = useRef<View>(null);
  const { data: sitting } = useSitting(sittingId);
  const { at, settle, setPlace } = usePlace();
  const { first, rowAt } = useLedger(sittingId, asked, [
    { from: view.from - ahead, to: view.to + ahead },
    { from: at - 1, to: at + 1 },
  ]);
  const idAt = (row: number) => rowAt(row)?.answerId;
  const place = settle(idAt);
  const canRule = sitting?.roles.includes('lead') ?? false;
  const total = first.data?.total ?? 0;
  const held = first.data?.heldOffsets ?? [];
  const onView = Array.from({ length: Math.max(0, view.to - view.from + 1) }, (_, index) => rowAt(view.from + index) ?? []).flat();
  const { touched, isOwn } = useTouched(onView);
  const last = useLastRuling(isOwn);

  const ask = (changes: Partial<LedgerQuestion>) => {
    setPlace(nowhere);
    setOpen(false);
    router.setParams(paramsOf({ ...asked, ...changes }) as never);
  };
  const go = (to: number) => setPlace({ at: to, id: idAt(to) ?? null });
  const step = (by: 1 | -1) => () => setPlace(steppedPlace(place, by, total, idAt));
  const goHeld = (by: 1 | -1) => () => {
    const to = nextHeld(held, place.at, by);
    if (to !== null) open(to);
  };
  const open = (to: number) => {
    go(to);
    setOpen(true);
  };
  const see = useCallback((from: number, to: number) => setView((before) => (before.from === from && before.to === to ? before : { from, to })), []);
  const sort = (by: LedgerSort, direction: 'up' | 'down') => ask({ sort: by, direction });
  const ruled = (answer: AnswerView, what: string) => {
    last.keep(answer, what);
    const next = placeAfterRuling(place, held, asked.show, idAt, last.ruled());
    if (next === null) setOpen(false);
    else setPlace(next);
  };

  const moves = {
    J: step(1),
    K: step(-1),
    ArrowDown: step(1),
    ArrowUp: step(-1),
    Home: () => go(0),
    End: () => go(total - 1),
    '[': goHeld(-1),
    ']': goHeld(1),
  };
  const isShown = isOpen && place.id !== null;
  useKeys({ ...moves, Enter: () => (place.id === null ? undefined : setOpen(true)), ...(last.onTakeBack ? { U: last.onTakeBack } : {}) }, { isOff: isShown });
  useKeys({
    '/': () => findField.current?.focus(),
    F: () => (filters.current as unknown as HTMLElement | null)?.querySelector<HTMLElement>('[aria-pressed="true"]')?.focus(),
    '?': () => setKeysOpen(true),
  });

  const here = rowAt(place.at);
  const sheet =
    isOpen && place.id !== null ? (
      <AnswerSheet
        key={place.id}
        answerId={place.id}
        rev={here?.answerId === place.id ? here.rev : 0}
        canRule={canRule}
        heldCount={here?.answerId === place.id ? countOfHeld(held, place.at) : null}
        moves={moves}
        last={last}
        onClose={() => setOpen(false)}
        onPrevious={step(-1)}
        onNext={step(1)}
        onNextHeld={held.some((row) => row !== place.at) ? goHeld(1) : null}
        onOther={(id) => setPlace({ at: place.at, id })}
        onRuled={ruled}
      />
    ) : null;
  const isFiltered = asked.show !== 'all' || asked.item !== null || asked.find !== '';
  return (
    <InSitting sittingId={sittingId} isFixed isSlim={isShown && !isFull} side={isWide ? sheet : null}>
      <QueryState query={first} fetching="Fetching the ledger" failed="The ledger did not come." rows={12}>
        {({ items, counts }) => (
          <View style={{ flex: 1, minHeight: 0 }}>
            <LedgerHead asked={asked} counts={counts} items={items} onAsk={ask} findField={findField} filters={filters} />
            {total > 0 ? (
              <LedgerTable question={asked} total={total} heldOffsets={held} rowAt={rowAt} place={place} touched={touched} isNarrow={isShown && !isFull} onView={see} onChoose={open} onSort={sort} />
            ) : (
              <View style={{ flex: 1 }}>
                {isFiltered ? (
                  <Empty head={nothingHere({ show: asked.show, find: asked.find, item: items.find(({ id }) => id === asked.item)?.number })} action={<Button onPress={() => ask({ show: 'all', item: null, find: '' })}>{words.clear}</Button>}>
                    {asked.find === '' ? words.clearHelp : words.findHelp}
                  </Empty>
                ) : (
                  <Empty head={words.notYet}>{words.notYetText}</Empty>
                )}
              </View>
            )}
            <KeyStrip hints={words.hints} last={words.allKeys}>
              <Text variant="small" tone="ink2" live="polite">
                {words.rows(total === 0 ? 0 : view.from + 1, Math.min(total, view.to + 1), total)}
              </Text>
            </KeyStrip>
            {isWide ? null : sheet}
            {areKeysOpen ? (
              <Dialog title={words.keysTitle} onClose={() => setKeysOpen(false)} width={620}>
                <KeyList groups={canRule ? keyGroups : keyGroups.filter(({ isForLead }) => !isForLead)} />
              </Dialog>
            ) : null}
          </View>
        )}
      </QueryState>
    </InSitting>
  );
}
