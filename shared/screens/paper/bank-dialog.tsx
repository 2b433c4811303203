import { useState } from 'react';
import { View } from 'react-native';
import { v7 as uuidv7 } from 'uuid';
import { useItemBank, useMakeItem } from '../../client/items';
import type { BankItem } from '../../contracts/item-bank';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { QueryState } from '../query-state';
import { bankItemsFound } from './bank-search';
import { words } from './words';

interface BankDialogProps {
  readonly sittingId: string;
  readonly onClose: () => void;
}

/** Takes items of earlier papers of the course into this one, as they were set. */
export function BankDialog({ sittingId, onClose }: BankDialogProps) {
  const bank = useItemBank(sittingId);
  const make = useMakeItem(sittingId);
  const [find, setFind] = useState('');
  const [added, setAdded] = useState(0);
  const add = ({ draft }: BankItem) => make.mutate({ draft, once: uuidv7() }, { onSuccess: () => setAdded((count) => count + 1) });
  return (
    <Dialog
      title={words.bank.title}
      onClose={onClose}
      width={620}
      testID="bank-dialog"
      actions={
        <Button kind="primary" onPress={onClose}>
          {words.bank.done}
        </Button>
      }
    >
      <Vessel label={words.bank.find} help={words.bank.findHelp} value={find} onChange={setFind} maxLength={60} isFocusedFirst testID="bank-find" />
      <Text variant="small" tone="ink2">
        {words.bank.linksStay}
      </Text>
      <Text variant="small" live="polite">
        {words.bank.added(added)}
      </Text>
      {make.error ? (
        <Text variant="small" tone="methyl" live="assertive">
          {make.error.message}
        </Text>
      ) : null}
      <QueryState query={bank} fetching="Fetching earlier items" failed="The earlier items did not come.">
        {({ items }) => <BankRows items={items} find={find} isBusy={make.isPending} onAdd={add} />}
      </QueryState>
    </Dialog>
  );
}

interface BankRowsProps {
  readonly items: readonly BankItem[];
  readonly find: string;
  readonly isBusy: boolean;
  readonly onAdd: (item: BankItem) => void;
}

function BankRows({ items, find, isBusy, onAdd }: BankRowsProps) {
  const colors = useColors();
  const found = bankItemsFound(items, find);
  if (found.length === 0) return <Text tone="ink2">{items.length === 0 ? words.bank.none : words.bank.noneFound}</Text>;
  return (
    <View role="list" aria-label={words.bank.title}>
      {found.map((item) => (
        <View key={item.itemId} role="listitem" style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 12, paddingVertical: 10, borderTopWidth: 1, borderColor: colors.hair }}>
          <View style={{ flex: 1, minWidth: 220, gap: 2 }}>
            <Text>
              <ChemText>{item.prompt}</ChemText>
              {` ${words.bank.marks(item.marks)}`}
            </Text>
            <Text variant="small" tone="ink2">
              {words.bank.usedIn(item.usedIn)}
            </Text>
          </View>
          <Text variant="reading" tone="copper">
            {item.key}
          </Text>
          <Button isSmall onPress={() => onAdd(item)} isBusy={isBusy}>
            {words.bank.add(item.label)}
          </Button>
        </View>
      ))}
    </View>
  );
}
