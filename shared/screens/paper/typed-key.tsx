import { View } from 'react-native';
import type { ItemDraft } from '../../contracts/items';
import { Icon } from '../../ui/icon';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { withTypedValue } from './draft-changes';
import type { FieldsProps } from './asked-fields';
import { words } from './words';

const w = words.typed;

/** A key that the lead types: what is asked in short, value, unit, and where the value is from. */
export function TypedKey({ draft, problemAt, onChange }: FieldsProps) {
  const typed = draft.asked.typed ?? { label: '', value: '', unit: '', source: '' };
  const put = (changes: Partial<NonNullable<ItemDraft['asked']['typed']>>, field: string) => onChange({ ...draft, asked: { ...draft.asked, typed: { ...typed, ...changes } } }, `typed-${field}`);
  const problem = (field: string) => problemAt(`asked.typed.${field}`);
  const withoutUnit = (unit: string): ItemDraft => ({ ...draft, asked: { ...draft.asked, typed: { ...typed, unit } }, unitCost: unit.trim() === '' ? null : draft.unitCost });
  return (
    <View style={{ gap: 12 }}>
      <Vessel label={w.label} value={typed.label} onChange={(label) => put({ label }, 'label')} help={w.labelHelp} error={problem('label')} maxLength={60} testID="typed-label" />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <View style={{ flexGrow: 2, flexBasis: 150 }}>
          <Vessel label={w.value} value={typed.value} onChange={(value) => onChange(withTypedValue(draft, value), 'typed-value')} help={w.valueHelp} error={problem('value')} variant="reading" maxLength={32} testID="typed-value" />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 110 }}>
          <Vessel label={w.unit} value={typed.unit} onChange={(unit) => onChange(withoutUnit(unit), 'typed-unit')} help={w.unitHelp} error={problem('unit')} variant="reading" maxLength={12} testID="typed-unit" />
        </View>
      </View>
      <Vessel label={w.source} value={typed.source} onChange={(source) => put({ source }, 'source')} help={w.sourceHelp} error={problem('source')} maxLength={300} lines={2} height={72} testID="typed-source" />
    </View>
  );
}

/** Said wherever a typed key stands: nobody but people can check it. */
export function UncheckedNote() {
  const colors = useColors();
  return (
    <View style={{ flexDirection: 'row', gap: 10, padding: 12, backgroundColor: colors.iodineFaint, borderRadius: 2 }} testID="unchecked">
      <Icon name="hand" tone="iodine" />
      <Text variant="small" style={{ flex: 1 }}>
        {w.unchecked}
      </Text>
    </View>
  );
}
