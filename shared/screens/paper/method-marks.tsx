import { v7 as uuidv7 } from 'uuid';
import { View } from 'react-native';
import type { MethodDraft } from '../../contracts/items';
import { marksText } from '../../marking/grains';
import { Button } from '../../ui/button';
import { IconButton } from '../../ui/icon-button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsPhone } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import type { FieldsProps } from './asked-fields';
import { moved, sharesOf } from './draft-changes';
import { RuleHead } from './rule-head';
import { words } from './words';

const most = 6;
const w = words.method;

/** Named yes-or-no criteria that a reader strikes beside the value; what they take is not the value’s. */
export function MethodMarks({ draft, worked, problemAt, onChange }: FieldsProps) {
  const { methodMarks } = draft;
  const put = (next: MethodDraft[], field: string) => onChange({ ...draft, methodMarks: next }, field);
  const shares = sharesOf(draft, worked.maxGrains);
  const problem = problemAt('methodMarks');
  return (
    <View style={{ gap: 4, marginTop: 16 }} testID="method-marks">
      <RuleHead title={w.title} aside={w.aside} />
      {methodMarks.length === 0 ? <Text tone="ink2">{w.none}</Text> : null}
      {methodMarks.map((mark, index) => (
        <Row
          key={mark.id}
          mark={mark}
          index={index}
          count={methodMarks.length}
          problemAt={problemAt}
          onChange={(changes, field) => put(methodMarks.map((known, at) => (at === index ? { ...known, ...changes } : known)), `method-${index}-${field}`)}
          onMove={(by) => put(moved(methodMarks, index, by), `method-moved-${index}-${by}`)}
          onRemove={() => put(methodMarks.filter((_known, at) => at !== index), `method-removed-${methodMarks.length}`)}
        />
      ))}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', justifyContent: 'space-between', columnGap: 16 }}>
        {methodMarks.length < most ? (
          <Button kind="text" isSmall icon="plus" onPress={() => put([...methodMarks, { id: uuidv7(), text: '', marks: '1' }], `method-added-${methodMarks.length}`)} testID="add-method-mark">
            {w.add}
          </Button>
        ) : null}
        {shares && methodMarks.length > 0 && worked.maxGrains !== null ? (
          <Text variant="small" live="polite" tone={shares.value > 0 ? 'ink' : 'methyl'} testID="method-sum">
            {w.sum(marksText(shares.method), marksText(shares.value), marksText(worked.maxGrains))}
          </Text>
        ) : null}
      </View>
      {problem ? (
        <Text variant="small" tone="methyl" live="polite">
          {problem}
        </Text>
      ) : null}
    </View>
  );
}

interface RowProps {
  readonly mark: MethodDraft;
  readonly index: number;
  readonly count: number;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (changes: Partial<MethodDraft>, field: string) => void;
  readonly onMove: (by: number) => void;
  readonly onRemove: () => void;
}

function Row({ mark, index, count, problemAt, onChange, onMove, onRemove }: RowProps) {
  const colors = useColors();
  const isPhone = useIsPhone();
  const named = mark.text.trim() === '' ? w.unnamed(index + 1) : mark.text;
  const problem = (field: string) => problemAt(`methodMarks.${index}.${field}`);
  return (
    <View role="group" aria-label={named} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, alignItems: 'flex-start', paddingVertical: 8, borderBottomWidth: 1, borderColor: colors.hair }} testID={`method-${index}`}>
      <View style={{ flexGrow: 3, flexBasis: 220 }}>
        <Vessel label={w.text} value={mark.text} onChange={(text) => onChange({ text }, 'text')} error={problem('text') ?? problem('id')} height={40} maxLength={200} testID={`method-text-${index}`} />
      </View>
      <View style={{ flexGrow: 1, flexBasis: 64, maxWidth: 120 }}>
        <Vessel label={w.marks} value={mark.marks} onChange={(marks) => onChange({ marks }, 'marks')} error={problem('marks')} variant="readingS" height={40} maxLength={16} testID={`method-marks-${index}`} />
      </View>
      <View style={{ flexDirection: 'row', alignItems: 'center', paddingTop: isPhone ? 0 : 20, marginLeft: 'auto' }}>
        <IconButton icon="up" label={w.up(named)} isDisabled={index === 0} onPress={() => onMove(-1)} testID={`method-up-${index}`} />
        <IconButton icon="down" label={w.down(named)} isDisabled={index === count - 1} onPress={() => onMove(1)} testID={`method-down-${index}`} />
        <IconButton icon="close" label={w.remove(named)} onPress={onRemove} testID={`method-remove-${index}`} />
      </View>
    </View>
  );
}
