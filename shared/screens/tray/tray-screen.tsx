import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { ScrollView, View } from 'react-native';
import { lookAtPagesAgain, useBatch, useBatches, useCancelBatch, usePagesTold, useSendingFiles } from '../../client/scans';
import { useProgress, useSitting } from '../../client/sittings';
import type { ProgressView } from '../../contracts/progress';
import type { BatchSummary } from '../../contracts/scans';
import type { SittingView } from '../../contracts/sittings';
import { Button, ButtonLink } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Empty } from '../../ui/page-state';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsPhone, useIsWide } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { pickFiles } from '../pick-file';
import { QueryState } from '../query-state';
import { BundleDialog } from './bundle-dialog';
import { ContactSheet } from './contact-sheet';
import { trayRows } from './tray-rows';
import { TrayRowView } from './tray-row';
import { useDrop } from './use-drop';
import { words } from './words';

const accepted = 'application/pdf,application/zip,image/jpeg,image/png,image/tiff,image/webp,.pdf,.zip,.jpg,.jpeg,.png,.tif,.tiff,.webp';

/** Where scans arrive, in bundles, over poor connections, without anyone watching. */
export function TrayScreen({ sittingId }: { sittingId: string }) {
  const sitting = useSitting(sittingId);
  const batches = useBatches(sittingId);
  const progress = useProgress(sittingId);
  usePagesTold(sittingId);
  return (
    <InSitting sittingId={sittingId} isFixed>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(known) => (
          <QueryState query={batches} fetching="Fetching the bundles" failed="The bundles did not come." rows={4}>
            {(list) => <Tray sitting={known} batches={list.batches} progress={progress.data} />}
          </QueryState>
        )}
      </QueryState>
    </InSitting>
  );
}

interface TrayProps {
  readonly sitting: SittingView;
  readonly batches: readonly BatchSummary[];
  readonly progress: ProgressView | undefined;
}

function Tray({ sitting, batches, progress }: TrayProps) {
  const colors = useColors();
  const client = useQueryClient();
  const isWide = useIsWide();
  const isPhone = useIsPhone();
  const sending = useSendingFiles();
  const [files, setFiles] = useState<readonly File[]>([]);
  const [chosen, setChosen] = useState<string | null>(null);
  const [cancelling, setCancelling] = useState<BatchSummary | null>(null);
  const cancel = useCancelBatch(sitting.id);
  const canSend = sitting.lockedAt !== null && (sitting.roles.includes('lead') || sitting.roles.includes('reader'));
  const shown = chosen ?? batches[0]?.id ?? null;
  const batch = useBatch(shown);
  const sent = sending.filter(({ state }) => state === 'sent').length;
  const isOver = useDrop(setFiles, !canSend || files.length > 0);
  const made = batches.reduce((sum, { files: { done } }) => sum + done, 0);
  useEffect(() => {
    if (sent > 0) lookAtPagesAgain(client, sitting.id);
  }, [client, sent, made, sitting.id]);
  const choose = (capture: boolean) => void pickFiles(capture ? 'image/jpeg' : accepted, { capture, many: !capture }).then(setFiles);
  const rows = trayRows(batches, sending, batch.data?.uploads ?? [], shown);
  const side = isWide ? 24 : 16;
  const actions = canSend ? (
    <View style={{ flexDirection: 'row', gap: 10 }}>
      {isPhone ? (
        <View style={{ flex: 1 }}>
          <Button icon="camera" isWide onPress={() => choose(true)}>
            {words.photograph}
          </Button>
        </View>
      ) : null}
      <View style={isPhone ? { flex: 1 } : null}>
        <Button kind="primary" icon="plus" isWide={isPhone} onPress={() => choose(false)} testID="add-scans">
          {words.add}
        </Button>
      </View>
    </View>
  ) : null;
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <View style={{ paddingHorizontal: side, paddingTop: 14, paddingBottom: 12, gap: 10, borderBottomWidth: 1, borderColor: colors.hair }}>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 16 }}>
          <Text variant="title" level={1} style={{ flex: 1 }}>
            {words.title}
          </Text>
          {isPhone ? null : actions}
        </View>
        {progress ? <PagesIn pages={progress.pages} bundles={batches.length} /> : null}
        {progress && progress.pages.in > 0 ? <PeopleLinks sitting={sitting} /> : null}
      </View>
      <View style={{ flex: 1, minHeight: 0, flexDirection: isWide ? 'row' : 'column' }}>
        <ScrollView style={{ flex: 1, maxWidth: isWide ? 620 : undefined, backgroundColor: colors.bench }}>
          {rows.length === 0 ? (
            <Empty head={words.emptyHead}>{canSend ? words.empty : sitting.lockedAt === null ? words.emptyLocked : words.emptyReads}</Empty>
          ) : (
            <View role="list" aria-label={words.title}>
              {rows.map((row) => (
                <TrayRowView
                  key={row.key}
                  row={row}
                  sittingId={sitting.id}
                  canSend={canSend}
                  isChosen={row.kind === 'batch' && row.key === shown}
                  onShow={setChosen}
                  onCancel={(id) => setCancelling(batches.find((one) => one.id === id) ?? null)}
                />
              ))}
            </View>
          )}
          {!isWide && chosen !== null && batch.data ? <ContactSheet batch={batch.data} /> : null}
        </ScrollView>
        {isWide && rows.length > 0 ? (
          <ScrollView style={{ flex: 1, borderLeftWidth: 1, borderColor: colors.hair }}>{batch.data ? <ContactSheet batch={batch.data} /> : null}</ScrollView>
        ) : null}
      </View>
      {isPhone && actions ? <View style={{ padding: 12, backgroundColor: colors.bench, borderTopWidth: 1, borderColor: colors.hair }}>{actions}</View> : null}
      {isOver ? <DropSign /> : null}
      {files.length > 0 ? (
        <BundleDialog
          sittingId={sitting.id}
          files={files}
          batches={batches}
          onClose={() => setFiles([])}
          onSent={(id) => {
            setFiles([]);
            setChosen(id);
          }}
        />
      ) : null}
      {cancelling ? (
        <Dialog
          title={words.cancelling.title(cancelling.bundle)}
          onClose={() => setCancelling(null)}
          actions={
            <>
              <Button kind="primary" isBusy={cancel.isPending} onPress={() => cancel.mutate(cancelling.id, { onSuccess: () => setCancelling(null) })}>
                {words.cancel}
              </Button>
              <Button onPress={() => setCancelling(null)}>{words.cancelling.back}</Button>
            </>
          }
        >
          <Text>{words.cancelling.text(cancelling.files.sending + cancelling.files.received)}</Text>
          {cancel.error ? <Text tone="methyl">{cancel.error.message}</Text> : null}
        </Dialog>
      ) : null}
    </View>
  );
}

/** From the pages to the people: whose they are, and the numbers that candidates wrote. */
function PeopleLinks({ sitting }: { sitting: SittingView }) {
  const isOverseer = sitting.roles.includes('lead') || sitting.roles.includes('external');
  const canRead = sitting.roles.includes('lead') || sitting.roles.includes('reader');
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
      {isOverseer ? (
        <ButtonLink kind="text" isSmall href={`/sittings/${sitting.id}/people`} testID="to-people">
          {words.toPeople}
        </ButtonLink>
      ) : null}
      {canRead ? (
        <ButtonLink kind="text" isSmall href={`/sittings/${sitting.id}/numbers`} testID="to-numbers">
          {words.toNumbers}
        </ButtonLink>
      ) : null}
    </View>
  );
}

function PagesIn({ pages, bundles }: { pages: ProgressView['pages']; bundles: number }) {
  return (
    <>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: 8 }}>
        <Text variant="display" isTabular>
          {pages.in.toLocaleString('en-GB')}
        </Text>
        <Text tone="ink2" style={{ flex: 1 }}>
          {words.pagesIn(pages.due)}
        </Text>
        <Text variant="small" tone="ink2">
          {words.bundles(bundles)}
        </Text>
      </View>
      <ProgressRule done={pages.in} of={pages.due} label={words.pagesInLabel} />
      <Text variant="small" tone="ink2">
        {pages.due > 0 && pages.in >= pages.due ? words.allIn : words.stays}
      </Text>
    </>
  );
}

function DropSign() {
  const colors = useColors();
  return (
    <View style={{ position: 'absolute', inset: 8, borderWidth: 2, borderStyle: 'dashed', borderColor: colors.manganate, borderRadius: 12, backgroundColor: `${colors.paper}E6`, alignItems: 'center', justifyContent: 'center', pointerEvents: 'none' }}>
      <Text variant="title" live="polite">
        {words.dropHere}
      </Text>
    </View>
  );
}
