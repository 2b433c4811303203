import type { Ref } from 'react';
import { ScrollView, View, type TextInput } from 'react-native';
import type { LedgerQuestion } from '../../client/ledger';
import type { LedgerChip } from '../../contracts/enums';
import { Chip } from '../../ui/chip';
import { PairGlyph } from '../../ui/pair-glyph';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { FindField } from './find-field';
import { chipOrder, chipWords, stateGlyphs, words } from './words';

interface LedgerHeadProps {
  readonly asked: LedgerQuestion;
  readonly counts: Readonly<Record<LedgerChip, number>>;
  readonly items: readonly { readonly id: string; readonly number: number; readonly label: string }[];
  readonly onAsk: (changes: Partial<LedgerQuestion>) => void;
  readonly findField: Ref<TextInput>;
  readonly filters: Ref<View>;
}

/** Over the ledger: its name, the item, what to find, and the chips with their counts. */
export function LedgerHead({ asked, counts, items, onAsk, findField, filters }: LedgerHeadProps) {
  const isPhone = useIsPhone();
  const side = isPhone ? 16 : 24;
  const isShown = (chip: LedgerChip): boolean => counts[chip] > 0 || chip === asked.show || chip === 'all' || chip === 'to-rule';
  return (
    <>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: 14, paddingHorizontal: side, paddingTop: 12, paddingBottom: 8 }}>
        <Text variant="title" level={1} style={{ flexGrow: 1, flexBasis: isPhone ? '100%' : undefined }}>
          {words.title}
        </Text>
        <View style={isPhone ? { flex: 1 } : { width: 170 }}>
          <Select label={words.item} height={40} value={asked.item ?? ''} onChange={(item) => onAsk({ item: item === '' ? null : item })} options={[{ value: '', label: words.allItems }, ...items.map(({ id, number, label }) => ({ value: id, label: `${number} ${label}` }))]} testID="ledger-item" />
        </View>
        <View style={isPhone ? { flex: 1.3 } : { width: 220 }}>
          <FindField asked={asked.find} onFind={(find) => onAsk({ find })} inputRef={findField} />
        </View>
      </View>
      <View ref={filters}>
        <ScrollView horizontal style={{ flexGrow: 0 }} contentContainerStyle={{ gap: 8, paddingHorizontal: side, paddingBottom: 12 }} role="group" aria-label={words.filters}>
          {chipOrder.filter(isShown).map((chip) => (
            <Chip key={chip} isChosen={chip === asked.show} count={counts[chip]} onPress={() => onAsk({ show: chip })} testID={`chip-${chip}`} {...(chip === 'all' || chip === 'to-rule' ? {} : { glyph: <PairGlyph state={stateGlyphs[chip]} /> })}>
              {chipWords[chip]}
            </Chip>
          ))}
        </ScrollView>
      </View>
    </>
  );
}
