import { useState, type ReactNode } from 'react';
import { useRouter } from 'expo-router';
import { v7 as uuidv7 } from 'uuid';
import { View } from 'react-native';
import { useItems, useMakeItem, useOrderItems } from '../../client/items';
import { useSitting } from '../../client/sittings';
import type { ItemView } from '../../contracts/items';
import type { SittingView } from '../../contracts/sittings';
import { Button } from '../../ui/button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { InSitting } from '../in-sitting';
import { QueryState } from '../query-state';
import { momentText } from '../times';
import { BankDialog } from './bank-dialog';
import { ItemEditor } from './item-editor';
import { ItemList } from './item-list';
import { ItemReader } from './item-reader';
import { LockButton } from './lock-button';
import { newDraft } from './new-draft';
import { PaperFiles, TakeButton } from './paper-files';
import { words } from './words';

interface PaperScreenProps {
  readonly sittingId: string;
  readonly itemId: string | null;
}

/** The paper of a sitting: its items, and one of them open. */
export function PaperScreen({ sittingId, itemId }: PaperScreenProps) {
  const sitting = useSitting(sittingId);
  return (
    <InSitting sittingId={sittingId}>
      <QueryState query={sitting} fetching="Fetching the sitting" failed="The sitting did not come.">
        {(found) =>
          found.roles.includes('lead') || found.roles.includes('external') ? (
            <Paper sitting={found} itemId={itemId} />
          ) : (
            <Text style={{ padding: 32, maxWidth: 560 }}>{words.notAllowed}</Text>
          )
        }
      </QueryState>
    </InSitting>
  );
}

function Paper({ sitting, itemId }: { sitting: SittingView; itemId: string | null }) {
  const items = useItems(sitting.id);
  return (
    <QueryState query={items} fetching="Fetching the paper" failed="The paper did not come.">
      {(list) => <PaperPanes sitting={sitting} items={list.items} lockedAt={list.lockedAt} itemId={itemId} />}
    </QueryState>
  );
}

interface PanesProps {
  readonly sitting: SittingView;
  readonly items: readonly ItemView[];
  readonly lockedAt: number | null;
  readonly itemId: string | null;
}

/** Side by side on wide; on a narrow screen the list is its own screen. */
function PaperPanes({ sitting, items, lockedAt, itemId }: PanesProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const router = useRouter();
  const [isBankOpen, setBankOpen] = useState(false);
  const make = useMakeItem(sitting.id);
  const order = useOrderItems(sitting.id);
  const isLead = sitting.roles.includes('lead');
  const canChange = isLead && lockedAt === null;
  const open = items.find(({ id }) => id === itemId) ?? (isWide ? items[0] : undefined);

  const choose = (id: string | null) => router.setParams({ item: id ?? '' });
  const add = () => make.mutate({ draft: newDraft(items.at(-1)?.draft), once: uuidv7() }, { onSuccess: ({ id }) => choose(id) });
  const move = (by: number) => {
    if (!open) return;
    const ids = items.map(({ id }) => id);
    const from = ids.indexOf(open.id);
    ids.splice(from, 1);
    ids.splice(from + by, 0, open.id);
    order.mutate(ids);
  };

  const lockButton = canChange ? <LockButton sittingId={sitting.id} items={items} /> : null;
  const trouble = make.error ?? order.error;
  const list = (
    <View style={{ flex: 1 }}>
      <ItemList items={items} chosen={open?.id ?? null} canChange={canChange} isAdding={make.isPending} onChoose={choose} onOrder={(ids) => order.mutate(ids)} onAdd={add} onBank={() => setBankOpen(true)} />
      {isBankOpen ? <BankDialog sittingId={sitting.id} onClose={() => setBankOpen(false)} /> : null}
      {trouble ? (
        <Text variant="small" tone="methyl" live="polite" style={{ padding: 16 }}>
          {trouble.message}
        </Text>
      ) : null}
      <PaperFiles sitting={sitting} items={items.length} isLead={isLead} canChange={canChange} />
    </View>
  );
  if (items.length === 0) return <NoItems canChange={canChange} isAdding={make.isPending} message={trouble?.message ?? null} onAdd={add} others={<EarlierWays sitting={sitting} onBank={() => setBankOpen(true)} isBankOpen={isBankOpen} onCloseBank={() => setBankOpen(false)} />} />;
  const back = isWide ? null : (
    <Button kind="text" icon="back" onPress={() => choose(null)}>
      {words.backToItems}
    </Button>
  );
  const editor = open ? (
    canChange ? (
      <ItemEditor
        key={open.id}
        item={open}
        items={items}
        lockButton={lockButton}
        back={back}
        onMove={move}
        onChoose={choose}
        onRemoved={() => choose(isWide ? (items.find(({ id }) => id !== open.id)?.id ?? null) : null)}
      />
    ) : (
      <ItemReader
        key={open.id}
        item={open}
        items={items}
        onChoose={choose}
        canTry={isLead}
        line={lockedAt === null ? words.save.open : words.locked(momentText(lockedAt))}
        explanation={lockedAt === null ? words.readOnly : words.lockedText}
        back={back}
      />
    )
  ) : null;
  if (!isWide) {
    return (
      editor ?? (
        <View style={{ flex: 1 }}>
          {list}
          {lockButton ? <View style={{ padding: 16 }}>{lockButton}</View> : null}
        </View>
      )
    );
  }
  return (
    <View style={{ flex: 1, flexDirection: 'row' }}>
      <View style={{ width: 232, backgroundColor: colors.glass, borderRightWidth: 1, borderColor: colors.hair }}>{list}</View>
      <View style={{ flex: 1, minWidth: 0 }}>{editor}</View>
    </View>
  );
}

interface EarlierWaysProps {
  readonly sitting: SittingView;
  readonly isBankOpen: boolean;
  readonly onBank: () => void;
  readonly onCloseBank: () => void;
}

/** Other ways to a paper than item by item. */
function EarlierWays({ sitting, isBankOpen, onBank, onCloseBank }: EarlierWaysProps) {
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
      <Button kind="text" isSmall icon="tray" onPress={onBank} testID="item-bank">
        {words.bank.open}
      </Button>
      <TakeButton sitting={sitting} items={0} />
      {isBankOpen ? <BankDialog sittingId={sitting.id} onClose={onCloseBank} /> : null}
    </View>
  );
}

interface NoItemsProps {
  readonly canChange: boolean;
  readonly isAdding: boolean;
  readonly message: string | null;
  readonly onAdd: () => void;
  readonly others: ReactNode;
}

function NoItems({ canChange, isAdding, message, onAdd, others }: NoItemsProps) {
  return (
    <View style={{ padding: 32, gap: 14, alignItems: 'flex-start', maxWidth: 560 }}>
      <Text variant="display" level={1}>
        {words.empty.head}
      </Text>
      <Text>{canChange ? words.empty.text : words.empty.reader}</Text>
      {canChange ? (
        <Button kind="primary" icon="plus" isBusy={isAdding} onPress={onAdd} testID="add-item">
          {words.addItem}
        </Button>
      ) : null}
      {canChange ? others : null}
      {message === null ? null : (
        <Text variant="small" tone="methyl" live="polite">
          {message}
        </Text>
      )}
    </View>
  );
}
