import type { ReactNode } from 'react';
import { View } from 'react-native';
import { fileSender, useRetryUpload } from '../../client/scans';
import { Button, ButtonLink } from '../../ui/button';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { SheetGlyph, type SheetState } from './sheet-glyph';
import type { TrayRow } from './tray-rows';
import { words } from './words';

interface FrameProps {
  readonly state: SheetState;
  readonly head: string;
  readonly children: ReactNode;
  readonly action?: ReactNode;
  readonly isChosen?: boolean;
}

function Frame({ state, head, children, action, isChosen = false }: FrameProps) {
  const colors = useColors();
  return (
    <View
      role="listitem"
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: 14,
        minHeight: 76,
        paddingVertical: 12,
        paddingHorizontal: 16,
        borderBottomWidth: 1,
        borderColor: colors.hair,
        borderLeftWidth: 3,
        borderLeftColor: isChosen ? colors.manganate : 'transparent',
        backgroundColor: isChosen ? colors.manganateFaint : colors.paper,
      }}
    >
      <SheetGlyph state={state} />
      <View style={{ flex: 1, minWidth: 0, gap: 2 }}>
        <Text weight={600}>{head}</Text>
        {children}
      </View>
      {action}
    </View>
  );
}

const small = (text: string, tone: 'ink2' | 'iodine' | 'methyl' = 'ink2') => (
  <Text variant="small" tone={tone} weight={tone === 'ink2' ? 400 : 600}>
    {text}
  </Text>
);

interface TrayRowViewProps {
  readonly row: TrayRow;
  readonly sittingId: string;
  readonly canSend: boolean;
  readonly isChosen: boolean;
  readonly onShow: (batchId: string) => void;
  readonly onCancel: (batchId: string) => void;
}

interface StuckProps {
  readonly row: Extract<TrayRow, { kind: 'stuck' }>;
  readonly sittingId: string;
  readonly canSend: boolean;
}

function Stuck({ row, sittingId, canSend }: StuckProps) {
  const retry = useRetryUpload(sittingId);
  const action = canSend ? (
    <Button isSmall isBusy={retry.isPending} onPress={() => retry.mutate(row.uploadId)} testID="try-again">
      {words.tryAgain}
    </Button>
  ) : null;
  return (
    <Frame state="broken" head={words.row.refused(row.bundle, row.fileName)} action={action}>
      {small(retry.error ? retry.error.message : row.problem, 'methyl')}
      {small(words.row.stuckDo)}
    </Frame>
  );
}

/** One row of the tray: a sheet that says how it stands, its words, and what can be done. */
export function TrayRowView({ row, sittingId, canSend, isChosen, onShow, onCancel }: TrayRowViewProps) {
  switch (row.kind) {
    case 'refused-here':
      return (
        <Frame
          state="broken"
          head={words.row.refused(row.bundle, row.fileName)}
          action={
            <View style={{ gap: 6 }}>
              <Button isSmall onPress={() => fileSender.again(row.key.replace('here-', ''))}>
                {words.sendAgain}
              </Button>
              <Button isSmall kind="text" onPress={() => fileSender.drop(({ key }) => `here-${key}` === row.key)}>
                {words.remove}
              </Button>
            </View>
          }
        >
          {small(row.problem, 'methyl')}
          {small(words.row.nothingElse)}
        </Frame>
      );
    case 'refused':
    case 'duplicate':
      return (
        <Frame state={row.kind === 'refused' ? 'broken' : 'twice'} head={words.row.refused(row.bundle, row.fileName)}>
          {small(row.problem, row.kind === 'refused' ? 'methyl' : 'iodine')}
          {small(words.row.nothingElse)}
        </Frame>
      );
    case 'stuck':
      return <Stuck row={row} sittingId={sittingId} canSend={canSend} />;
    case 'pages-refused':
      return (
        <Frame state="broken" head={words.row.refused(row.bundle, row.fileName)}>
          {row.pages.map(({ name, why }) => (
            <View key={name}>{small(words.row.page(name, why), 'methyl')}</View>
          ))}
          {row.more > 0 ? small(words.row.morePages(row.more), 'methyl') : null}
          {small(words.row.restIn)}
        </Frame>
      );
    case 'note':
      return (
        <Frame state="in" head={words.row.refused(row.bundle, row.fileName)}>
          {small(row.note, 'iodine')}
          {small(words.row.notePages(row.pages))}
        </Frame>
      );
    case 'making':
      return (
        <Frame state="waiting" head={words.row.refused(row.bundle, row.fileName)}>
          {small(words.row.makingPages(row.done, row.of))}
          <ProgressRule done={row.done} of={row.of} label={words.row.refused(row.bundle, row.fileName)} />
        </Frame>
      );
    case 'loose':
      return (
        <Frame
          state="loose"
          head={words.row.loose(row.bundle, row.pages)}
          action={
            canSend ? (
              <ButtonLink isSmall href={`/sittings/${sittingId}/sorting`} testID="sort">
                {words.sort}
              </ButtonLink>
            ) : null
          }
        >
          {small(words.row.looseWhy(row.pages), 'iodine')}
          {small(words.row.looseDo(row.pages))}
        </Frame>
      );
    case 'sending':
      return (
        <Frame state="waiting" head={words.row.sending(row.bundle, row.files)}>
          {small(row.isOffline ? words.row.offline : words.row.sendingAt(row.sent, row.files), row.isOffline ? 'iodine' : 'ink2')}
          <ProgressRule done={row.doneBytes} of={row.bytes} label={words.row.sending(row.bundle, row.files)} />
          {row.now.map(({ key, fileName, sentBytes, size }) => (
            <View key={key} style={{ flexDirection: 'row', alignItems: 'center', gap: 10 }}>
              <Text variant="micro" tone="ink2" lines={1} style={{ width: 120 }}>
                {fileName}
              </Text>
              <View style={{ flex: 1 }}>
                <ProgressRule done={sentBytes} of={size} label={fileName} height={5} thickness={2} />
              </View>
            </View>
          ))}
        </Frame>
      );
    case 'batch': {
      const { batch, brokenOff } = row;
      const { placed, loose, discarded } = batch.pages;
      const all = placed + loose + discarded;
      const lines = [
        batch.state === 'cancelled' ? words.row.cancelled : '',
        all > 0 ? words.row.pages(all, placed) : batch.state === 'cancelled' ? '' : words.row.noPages,
        batch.files.received > batch.stuck ? words.row.making(batch.files.received - batch.stuck) : '',
        brokenOff > 0 ? words.row.waiting(brokenOff) : '',
      ].filter((line) => line !== '');
      return (
        <Frame
          state={all > 0 ? 'in' : 'waiting'}
          head={words.row.batch(batch.bundle)}
          isChosen={isChosen}
          action={
            <View style={{ flexDirection: 'row', gap: 6 }}>
              {canSend && batch.state === 'open' && batch.files.sending + batch.files.received > 0 ? (
                <Button isSmall kind="text" onPress={() => onCancel(batch.id)}>
                  {words.cancel}
                </Button>
              ) : null}
              <Button isSmall kind="text" isPressedIn={isChosen} onPress={() => onShow(batch.id)}>
                {words.open}
              </Button>
            </View>
          }
        >
          {lines.map((line) => (
            <View key={line}>{small(line)}</View>
          ))}
        </Frame>
      );
    }
  }
}
