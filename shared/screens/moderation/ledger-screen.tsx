import { useLocalSearchParams, useRouter } from 'expo-router';
import { useCallback, useRef, useState } from 'react';
import { ScrollView, View, type TextInput } from 'react-native';
import { useLedger, useTakeBackRuling, type LedgerQuestion } from '../../client/ledger';
import { useSitting } from '../../client/sittings';
import type { LedgerSort } from '../../contracts/enums';
import type { AnswerView } from '../../contracts/ledger';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Dialog } from '../../ui/dialog';
import { KeyList, KeyStrip } from '../../ui/key-strip';
import { Empty } from '../../ui/page-state';
import { PairGlyph } from '../../ui/pair-glyph';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useToast } from '../../ui/toast';
import { useBreakpoint, useIsPhone, useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { Vessel } from '../../ui/vessel';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { useSettled } from '../use-settled';
import { AnswerSheet } from './answer-sheet';
import { LedgerTable } from './ledger-table';
import { nextHeld, paramsOf, questionOf } from './question';
import { chipOrder, chipWords, keyGroups, stateGlyphs, words } from './words';

const settleMs = 250;

/** The moderation ledger: every answer of the sitting, and beside it the one that is looked at. */
export function LedgerScreen({ sittingId }: { sittingId: string }) {
  const router = useRouter();
  const toast = useToast();
  const isPhone = useIsPhone();
  const isWide = useIsWide();
  const isFull = useBreakpoint() === 'full';
  const question = questionOf(useLocalSearchParams());
  const [find, setFind] = useState(question.find);
  const asked: LedgerQuestion = { ...question, find: useSettled(find, settleMs) };
  const [view, setView] = useState({ from: 0, to: 0 });
  const [chosen, setChosen] = useState(-1);
  const [isOpen, setOpen] = useState(false);
  const [areKeysOpen, setKeysOpen] = useState(false);
  const findField = useRef<TextInput>(null);
  const { data: sitting } = useSitting(sittingId);
  const { first, rowAt } = useLedger(sittingId, asked, Math.min(view.from, Math.max(0, chosen)), Math.max(view.to, chosen));
  const takeBack = useTakeBackRuling();
  const canRule = sitting?.roles.includes('lead') ?? false;
  const total = first.data?.total ?? 0;
  const held = first.data?.heldOffsets ?? [];
  const row = chosen < 0 ? undefined : rowAt(chosen);

  const ask = (changes: Partial<LedgerQuestion>) => {
    setChosen(-1);
    setOpen(false);
    router.setParams(paramsOf({ ...asked, ...changes }) as never);
  };
  const go = (to: number) => setChosen(Math.min(total - 1, Math.max(0, to)));
  const goHeld = (step: 1 | -1) => {
    const to = nextHeld(held, chosen, step);
    if (to === null) return;
    setChosen(to);
    setOpen(true);
  };
  const open = (at: number) => {
    setChosen(at);
    setOpen(true);
  };
  const close = () => setOpen(false);
  const onView = useCallback((from: number, to: number) => setView((before) => (before.from === from && before.to === to ? before : { from, to })), []);
  const sort = (by: LedgerSort) => ask(asked.sort === by ? { direction: asked.direction === 'up' ? 'down' : 'up' } : { sort: by, direction: 'up' });
  const ruled = (answer: AnswerView, what: string) => {
    const { ruling, candidateNumber } = answer;
    toast({
      text: words.sheet.ruled(what, candidateNumber),
      icon: 'check',
      ...(ruling ? { action: { label: words.sheet.takeBack, onPress: () => takeBack.mutate(ruling.id, { onSuccess: () => toast({ text: words.sheet.takenBack(candidateNumber) }), onError: (error) => toast({ text: error.message, icon: 'warning' }) }) } } : {}),
    });
    const next = nextHeld(held.filter((at) => at !== chosen), chosen, 1);
    // Among those to rule, this row leaves the list and the next one moves up into its place.
    if (asked.show === 'all' && next !== null) setChosen(next);
    else if (asked.show !== 'all' && chosen >= total - 1) setChosen(Math.max(0, total - 2));
  };

  useKeys({
    J: () => go(chosen + 1),
    K: () => go(chosen - 1),
    ArrowDown: () => go(chosen + 1),
    ArrowUp: () => go(chosen - 1),
    Home: () => go(0),
    End: () => go(total - 1),
    '[': () => goHeld(-1),
    ']': () => goHeld(1),
    '/': () => findField.current?.focus(),
    '?': () => setKeysOpen(true),
    Escape: close,
    ...(isOpen ? {} : { Enter: () => (row ? setOpen(true) : undefined) }),
  });

  const sheet =
    isOpen && row ? (
      <AnswerSheet key={row.answerId} answerId={row.answerId} canRule={canRule} onClose={close} onPrevious={() => go(chosen - 1)} onNext={() => go(chosen + 1)} onNextHeld={held.length > 0 ? () => goHeld(1) : null} onRuled={ruled} />
    ) : null;
  const isFiltered = asked.show !== 'all' || asked.item !== null || asked.find !== '';
  const side = isPhone ? 16 : 24;
  return (
    <InSitting sittingId={sittingId} isFixed isSlim={isOpen && !isFull} side={isWide ? sheet : null}>
      <QueryState query={first} fetching="Fetching the ledger" failed="The ledger did not come." rows={12}>
        {({ counts, items }) => (
          <View style={{ flex: 1, minHeight: 0 }}>
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: 14, paddingHorizontal: side, paddingTop: 12, paddingBottom: 8 }}>
              <Text variant="title" level={1} style={{ flexGrow: 1, flexBasis: isPhone ? '100%' : undefined }}>
                {words.title}
              </Text>
              <View style={isPhone ? { flex: 1 } : { width: 170 }}>
                <Select label={words.item} height={40} value={asked.item ?? ''} onChange={(item) => ask({ item: item === '' ? null : item })} options={[{ value: '', label: words.allItems }, ...items.map(({ id, number, label }) => ({ value: id, label: `${number} ${label}` }))]} testID="ledger-item" />
              </View>
              <View style={isPhone ? { flex: 1.3 } : { width: 220 }}>
                <Vessel label={words.find} value={find} onChange={setFind} height={40} maxLength={64} inputRef={findField} testID="ledger-find" />
              </View>
            </View>
            <ScrollView horizontal style={{ flexGrow: 0 }} contentContainerStyle={{ gap: 8, paddingHorizontal: side, paddingBottom: 12 }} role="group" aria-label="Filters">
              {chipOrder
                .filter((chip) => counts[chip] > 0 || chip === asked.show || chip === 'all' || chip === 'to-rule')
                .map((chip) => (
                  <Chip key={chip} isChosen={chip === asked.show} count={counts[chip]} onPress={() => ask({ show: chip })} testID={`chip-${chip}`} {...(chip === 'all' || chip === 'to-rule' ? {} : { glyph: <PairGlyph state={stateGlyphs[chip]} /> })}>
                    {chipWords[chip]}
                  </Chip>
                ))}
            </ScrollView>
            {total === 0 ? (
              <Empty
                head={counts.all === 0 && !isFiltered ? words.notYet : asked.find !== '' ? words.noneFound(asked.find) : words.none(chipWords[asked.show].toLowerCase())}
                action={
                  isFiltered ? (
                    <Button
                      onPress={() => {
                        setFind('');
                        ask({ show: 'all', item: null, find: '' });
                      }}
                    >
                      {words.clear}
                    </Button>
                  ) : null
                }
              >
                {counts.all === 0 && !isFiltered ? words.notYetText : words.findHelp}
              </Empty>
            ) : (
              <LedgerTable question={asked} total={total} heldOffsets={held} rowAt={rowAt} chosen={chosen} isNarrow={isOpen && !isFull} onView={onView} onChoose={open} onSort={sort} />
            )}
            <KeyStrip
              hints={[
                { keys: ['J', 'K'], does: 'down, up' },
                { keys: ['[', ']'], does: 'held rows' },
                { keys: ['/'], does: 'find' },
              ]}
              last={{ keys: ['?'], does: 'all keys' }}
            >
              <Text variant="small" tone="ink2" live="polite">
                {words.rows(total === 0 ? 0 : view.from + 1, Math.min(total, view.to + 1), total)}
              </Text>
            </KeyStrip>
            {isWide ? null : sheet}
            {areKeysOpen ? (
              <Dialog title={words.keysTitle} onClose={() => setKeysOpen(false)} width={620}>
                <KeyList groups={keyGroups} />
              </Dialog>
            ) : null}
          </View>
        )}
      </QueryState>
    </InSitting>
  );
}
