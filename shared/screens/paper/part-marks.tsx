import { View } from 'react-native';
import type { PrintedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { IconButton } from '../../ui/icon-button';
import { MarkStand } from '../../ui/mark-stand';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import type { FieldsProps } from './asked-fields';
import { nextPartMark } from './draft-changes';
import { RuleHead } from './rule-head';
import { words } from './words';

const w = words.partMarks;

/** Of an order: marks for so many numbers in their places, the most first. */
export function PartMarks({ draft, worked, problemAt, onChange }: FieldsProps) {
  const { printed } = draft;
  if (!printed || draft.kind !== 'order') return null;
  const next = nextPartMark(printed);
  if (next === null && printed.partMarks.length === 0) return null;
  const put = (partMarks: PrintedDraft['partMarks'], field: string) => onChange({ ...draft, printed: { ...printed, partMarks } }, field);
  return (
    <View style={{ gap: 4, marginTop: 16 }} testID="part-marks">
      <RuleHead title={w.title} aside={w.aside} />
      {printed.partMarks.length === 0 ? <Text tone="ink2">{w.none}</Text> : null}
      {printed.partMarks.map((part, index) => (
        <Row
          key={index}
          part={part}
          index={index}
          of={printed.options.length}
          maxGrains={worked.maxGrains}
          problemAt={problemAt}
          onChange={(changes, field) => put(printed.partMarks.map((known, at) => (at === index ? { ...known, ...changes } : known)), `part-${index}-${field}`)}
          onRemove={() => put(printed.partMarks.filter((_known, at) => at !== index), `part-removed-${printed.partMarks.length}`)}
        />
      ))}
      {next === null ? null : (
        <View style={{ alignItems: 'flex-start' }}>
          <Button kind="text" isSmall icon="plus" onPress={() => put([...printed.partMarks, { inPlace: next, marks: halfOf(printed.partMarks.at(-1)?.marks ?? draft.marks) }], `part-added-${printed.partMarks.length}`)} testID="add-part-mark">
            {w.add}
          </Button>
        </View>
      )}
    </View>
  );
}

/** Half of what more in place would give, to begin with. */
function halfOf(marks: string): string {
  const read = readMarks(marks);
  return read.ok ? marksText(Math.floor(read.grains / 2)) : '1';
}

interface RowProps {
  readonly part: PrintedDraft['partMarks'][number];
  readonly index: number;
  readonly of: number;
  readonly maxGrains: number | null;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (changes: Partial<PrintedDraft['partMarks'][number]>, field: string) => void;
  readonly onRemove: () => void;
}

function Row({ part, index, of, maxGrains, problemAt, onChange, onRemove }: RowProps) {
  const colors = useColors();
  const path = `printed.partMarks.${index}`;
  const marks = readMarks(part.marks);
  const counts = Array.from({ length: Math.max(of - 2, 1) }, (_, at) => String(at + 1));
  return (
    <View role="group" aria-label={w.inPlaceOf(part.inPlace, of)} style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, alignItems: 'flex-end', paddingVertical: 8, borderBottomWidth: 1, borderColor: colors.hair }} testID={`part-${index}`}>
      <View style={{ flexGrow: 2, flexBasis: 190 }}>
        <Select label={w.inPlace} value={String(part.inPlace)} options={counts.map((value) => ({ value, label: w.inPlaceOf(Number(value), of) }))} onChange={(value) => onChange({ inPlace: Number(value) }, 'in-place')} error={problemAt(`${path}.inPlace`)} height={40} testID={`part-in-place-${index}`} />
      </View>
      <View style={{ flexGrow: 1, flexBasis: 70 }}>
        <Vessel label={w.marks} value={part.marks} onChange={(next) => onChange({ marks: next }, 'marks')} error={problemAt(`${path}.marks`)} variant="readingS" height={40} maxLength={16} testID={`part-marks-${index}`} />
      </View>
      <View style={{ minHeight: 40, flexDirection: 'row', alignItems: 'center', gap: 8 }}>
        {marks.ok && maxGrains !== null ? <MarkStand state="given" got={marks.grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(marks.grains)} ofText={marksText(maxGrains)} /> : null}
        <IconButton icon="close" label={w.remove(part.inPlace)} onPress={onRemove} testID={`part-remove-${index}`} />
      </View>
    </View>
  );
}
