import { View } from 'react-native';
import { Checkbox } from '../../ui/checkbox';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import type { FieldsProps } from './asked-fields';
import { RuleHead } from './rule-head';
import { words } from './words';

const w = words.costs;
const usualCost = '1';

/** What a unit or a sign that went wrong costs, once a paper; nothing unless the lead says so. */
export function PaperCosts({ draft, worked, problemAt, onChange }: FieldsProps) {
  if (draft.kind !== 'numeric') return null;
  const hasUnits = worked.units.length > 0 || draft.unitCost !== null;
  return (
    <View style={{ gap: 4, marginTop: 16 }} testID="paper-costs">
      <RuleHead title={w.title} aside={w.aside} />
      {hasUnits ? (
        <Cost name="unit" label={w.unit} help={draft.unitCost === null ? w.off : undefined} below={worked.units.length > 0 ? w.units(worked.units) : ''} cost={draft.unitCost} problem={problemAt('unitCost')} onChange={(unitCost, field) => onChange({ ...draft, unitCost }, field)} />
      ) : null}
      <Cost name="sign" label={w.sign} help={draft.signCost === null ? w.signOff : undefined} below="" cost={draft.signCost} problem={problemAt('signCost')} onChange={(signCost, field) => onChange({ ...draft, signCost }, field)} />
    </View>
  );
}

interface CostProps {
  readonly name: 'unit' | 'sign';
  readonly label: string;
  readonly help: string | undefined;
  readonly below: string;
  readonly cost: string | null;
  readonly problem: string | undefined;
  readonly onChange: (cost: string | null, field: string) => void;
}

function Cost({ name, label, help, below, cost, problem, onChange }: CostProps) {
  const colors = useColors();
  return (
    <View style={{ paddingVertical: 6, borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 12, rowGap: 4 }}>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 220 }}>
          <Checkbox isChecked={cost !== null} onChange={(isOn) => onChange(isOn ? usualCost : null, `${name}-cost`)} help={help} testID={`${name}-rule`}>
            {label}
          </Checkbox>
        </View>
        {cost === null ? null : (
          <View style={{ width: 96 }}>
            <Vessel label={`${label}, ${w.marks}`} isLabelHidden value={cost} onChange={(next) => onChange(next, `${name}-cost-typed`)} variant="readingS" height={40} maxLength={16} testID={`${name}-cost`} />
          </View>
        )}
      </View>
      {problem ? (
        <Text variant="small" tone="methyl" live="polite">
          {problem}
        </Text>
      ) : null}
      {below === '' ? null : (
        <Text variant="small" tone="ink2" style={{ marginLeft: 32 }}>
          {below}
        </Text>
      )}
    </View>
  );
}
