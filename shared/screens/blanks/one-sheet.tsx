import { useEffect, useRef, useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { giveSheetBack, useRecordBlanks, type BlankSheet } from '../../client/blanks';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { useKeys } from '../../ui/use-keys';
import { BoxSheet } from './box-sheet';
import { words } from './words';

interface OneSheetProps {
  readonly sittingId: string;
  readonly sheet: BlankSheet;
  /** How many of the last lot can be taken back. */
  readonly lastCount: number;
  readonly isTakingBack: boolean;
  readonly onTakeBack: () => void;
  /** Ids of the readings that are on the server now, and how many were not taken. */
  readonly onDone: (readingIds: readonly string[], missed: number) => void;
}

/** One sheet from its coming to its recording. */
export function OneSheet({ sittingId, sheet, lastCount, isTakingBack, onTakeBack, onDone }: OneSheetProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const record = useRecordBlanks(sittingId);
  const [unticked, setUnticked] = useState<ReadonlySet<string>>(new Set());
  const [openedAt] = useState(() => Date.now());
  // Made once: sending again after a break is the same readings.
  const [readingIds] = useState(() => new Map(sheet.suggestions.map(({ answerId }) => [answerId, uuidv7()])));
  const isOnItsWay = useRef(false);
  const held = useRef<readonly string[]>(sheet.suggestions.map(({ id }) => id));
  useEffect(() => {
    const leases = held;
    return () => giveSheetBack(sittingId, leases.current);
  }, [sittingId]);
  const blank = sheet.suggestions.filter(({ answerId }) => !unticked.has(answerId));
  const toggle = (answerId: string) => {
    const next = new Set(unticked);
    if (!next.delete(answerId)) next.add(answerId);
    setUnticked(next);
  };
  const send = () => {
    if (isOnItsWay.current) return;
    isOnItsWay.current = true;
    const readings = blank.map(({ id, answerId }) => ({ readingId: readingIds.get(answerId) ?? uuidv7(), answerId, leaseId: id }));
    const giveBack = sheet.suggestions.filter(({ answerId }) => unticked.has(answerId)).map(({ id }) => id);
    record.mutate(
      { readings, giveBack, openedAt },
      {
        onSuccess: ({ rows }) => {
          held.current = [];
          const kept = rows.filter(({ outcome }) => outcome === 'recorded').map(({ readingId }) => readingId);
          onDone(kept, rows.length - kept.length);
        },
        onError: () => (isOnItsWay.current = false),
      },
    );
  };
  useKeys({ Enter: send, U: () => (lastCount > 0 ? onTakeBack() : undefined) });
  return (
    <>
      <BoxSheet leases={sheet.suggestions} unticked={unticked} onToggle={toggle} onRecord={send} />
      <View style={{ padding: isWide ? 16 : 12, paddingHorizontal: isWide ? 24 : 12, gap: 8, borderTopWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
        {record.error ? (
          <Text tone="methyl" live="assertive">
            {record.error.message}
          </Text>
        ) : null}
        <View style={{ flexDirection: isWide ? 'row' : 'column', alignItems: isWide ? 'center' : 'stretch', gap: 10 }}>
          <Button kind="primary" keyCap={isWide ? 'Enter' : undefined} isBusy={record.isPending} onPress={send} testID="record-blanks">
            {blank.length === 0 ? words.none : words.these(blank.length)}
          </Button>
          <Text tone="ink2" live="polite" align={isWide ? 'left' : 'center'} style={isWide ? { flex: 1 } : null} testID="blanks-left">
            {unticked.size === 0 ? '' : words.left(unticked.size)}
          </Text>
          {lastCount > 0 ? (
            <Button icon="takeBack" keyCap={isWide ? 'U' : undefined} isBusy={isTakingBack} onPress={onTakeBack} testID="take-back-blanks">
              {words.takeBack(lastCount)}
            </Button>
          ) : null}
        </View>
      </View>
    </>
  );
}
