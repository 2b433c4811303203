import { useState } from 'react';
import { View } from 'react-native';
import { useExportMarks, useTotals } from '../../client/ledger';
import { useSitting } from '../../client/sittings';
import type { getTotals } from '../../contracts/ledger';
import type { ResponseOf } from '../../contracts/route';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Empty } from '../../ui/page-state';
import { Text } from '../../ui/text';
import { useToast } from '../../ui/toast';
import { useIsPhone } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { dayText } from '../times';
import { MarksTable } from './marks-table';
import { words } from './words';

export type Totals = ResponseOf<typeof getTotals>;

const isAway = (attendance: string): boolean => words.attendance[attendance] !== undefined;

/** Marks of every script with totals, what is missing named, and the file for the records. */
export function MarksScreen({ sittingId }: { sittingId: string }) {
  const totals = useTotals(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={totals} fetching="Fetching the marks" failed="The marks did not come." rows={12}>
        {(found) => <Marks sittingId={sittingId} totals={found} />}
      </QueryState>
    </InSitting>
  );
}

function Marks({ sittingId, totals }: { sittingId: string; totals: Totals }) {
  const isPhone = useIsPhone();
  const toast = useToast();
  const { data: sitting } = useSitting(sittingId);
  const makeFile = useExportMarks(sittingId);
  const [isAsking, setAsking] = useState(false);
  const due = totals.rows.filter(({ attendance }) => !isAway(attendance));
  const incomplete = due.filter(({ missing }) => missing.length > 0).length;
  const exportNow = () => {
    setAsking(false);
    makeFile.mutate(undefined, { onSuccess: (name) => toast({ text: words.exported(name), icon: 'download' }) });
  };
  const side = isPhone ? 16 : 24;
  if (totals.rows.length === 0) return <Empty head={words.none}>{words.noneText}</Empty>;
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 12, paddingHorizontal: side, paddingVertical: 12 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 260, gap: 2 }}>
          <Text variant="title" level={1}>
            {words.title}
          </Text>
          <Text variant="small" tone="ink2">
            {words.summary(due.length - incomplete, due.length)}
          </Text>
        </View>
        {sitting?.roles.includes('lead') ? (
          <Button kind="primary" icon="download" onPress={() => (incomplete > 0 ? setAsking(true) : exportNow())} isBusy={makeFile.isPending} testID="export-marks">
            {words.export}
          </Button>
        ) : null}
      </View>
      <Text variant="small" tone="ink2" style={{ paddingHorizontal: side, paddingBottom: 12 }}>
        {words.provisional(totals.boardDate === null ? null : dayText(totals.boardDate))}
      </Text>
      {makeFile.error ? (
        <Text variant="small" tone="methyl" live="assertive" style={{ paddingHorizontal: side, paddingBottom: 12 }}>
          {makeFile.error.message}
        </Text>
      ) : null}
      <MarksTable totals={totals} />
      {isAsking ? (
        <Dialog
          title={words.incompleteTitle}
          onClose={() => setAsking(false)}
          testID="incomplete-dialog"
          actions={
            <>
              <Button kind="primary" onPress={exportNow} testID="export-anyway">
                {words.anyway}
              </Button>
              <Button onPress={() => setAsking(false)}>{words.wait}</Button>
            </>
          }
        >
          <Text>{words.incomplete(incomplete)}</Text>
        </Dialog>
      ) : null}
    </View>
  );
}
