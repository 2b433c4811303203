import { View } from 'react-native';
import type { AlternativeDraft, ItemDraft, WorkedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { words } from './words';

interface AlternativesProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

const w = words.alternatives;

/** Values accepted beside the key: what another convention gives, or one the lead adds with a reason. */
export function Alternatives({ draft, worked, problemAt, onChange }: AlternativesProps) {
  const { alternatives } = draft;
  const put = (next: AlternativeDraft[], field: string) => onChange({ ...draft, alternatives: next }, field);
  const taken = new Set(alternatives.map(({ convention }) => convention));
  const isPrinted = draft.kind !== 'numeric';
  const offered = worked.others.filter(({ convention }) => !taken.has(convention));
  return (
    <View style={{ gap: 8, marginTop: 16 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', flexWrap: 'wrap', columnGap: 12 }}>
        <Text variant="head" level={2}>
          {w.title}
        </Text>
        <Text variant="small" tone="ink2">
          {isPrinted ? words.alternativeNumbers.aside : w.aside}
        </Text>
      </View>
      {alternatives.map((alternative, index) => (
        <AlternativeRow
          key={index}
          alternative={alternative}
          index={index}
          valueLabel={isPrinted ? words.alternativeNumbers.value : w.value}
          text={worked.alternatives[index] ?? null}
          maxGrains={worked.maxGrains}
          problemAt={problemAt}
          onChange={(next, field) => put(alternatives.map((known, at) => (at === index ? next : known)), `alternative-${index}-${field}`)}
          onRemove={() => put(alternatives.filter((_known, at) => at !== index), `alternative-removed-${alternatives.length}`)}
        />
      ))}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>
        {offered.map(({ convention, name, text }) => (
          <Button key={convention} isSmall icon="plus" onPress={() => put([...alternatives, { name, convention, value: '', marks: draft.marks, reason: '' }], `alternative-added-${alternatives.length}`)} testID={`accept-${convention}`}>
            {w.accept(name, text)}
          </Button>
        ))}
        <Button kind="text" isSmall icon="plus" onPress={() => put([...alternatives, { name: isPrinted ? words.alternativeNumbers.other : w.other, convention: null, value: '', marks: draft.marks, reason: '' }], `alternative-added-${alternatives.length}`)} testID="add-alternative">
          {isPrinted ? words.alternativeNumbers.add : w.add}
        </Button>
      </View>
    </View>
  );
}

interface AlternativeRowProps {
  readonly alternative: AlternativeDraft;
  readonly index: number;
  readonly valueLabel: string;
  readonly text: string | null;
  readonly maxGrains: number | null;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (alternative: AlternativeDraft, field: string) => void;
  readonly onRemove: () => void;
}

function AlternativeRow({ alternative, index, valueLabel, text, maxGrains, problemAt, onChange, onRemove }: AlternativeRowProps) {
  const colors = useColors();
  const marks = readMarks(alternative.marks);
  const problem = (field: string) => problemAt(`alternatives.${index}.${field}`);
  const isByHand = alternative.convention === null;
  return (
    <View role="group" aria-label={alternative.name} style={{ gap: 8, paddingVertical: 10, borderBottomWidth: 1, borderColor: colors.hair }} testID={`alternative-${index}`}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, alignItems: 'flex-end' }}>
        <View style={{ flexGrow: 2, flexBasis: 160 }}>
          <Vessel label={w.name} value={alternative.name} onChange={(name) => onChange({ ...alternative, name }, 'name')} maxLength={60} error={problem('name')} height={40} />
        </View>
        {isByHand ? (
          <View style={{ flexGrow: 1, flexBasis: 90 }}>
            <Vessel label={valueLabel} value={alternative.value} onChange={(value) => onChange({ ...alternative, value }, 'value')} variant="readingS" maxLength={32} error={problem('value')} height={40} testID={`alternative-value-${index}`} />
          </View>
        ) : (
          <View style={{ minWidth: 80, minHeight: 40, justifyContent: 'center' }}>
            <Text variant="reading" tone="copper">
              {text ?? '–'}
            </Text>
          </View>
        )}
        <View style={{ flexGrow: 1, flexBasis: 70 }}>
          <Vessel label={words.counts.bandMarks} value={alternative.marks} onChange={(next) => onChange({ ...alternative, marks: next }, 'marks')} variant="readingS" maxLength={16} error={problem('marks')} height={40} />
        </View>
        {marks.ok && maxGrains !== null ? <MarkStand state="given" got={marks.grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(marks.grains)} ofText={marksText(maxGrains)} /> : null}
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, alignItems: 'flex-end' }}>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <Vessel label={w.reason} value={alternative.reason} onChange={(reason) => onChange({ ...alternative, reason }, 'reason')} maxLength={300} error={problem('reason')} help={isByHand ? w.reasonHelp : ''} height={40} />
        </View>
        <Button kind="text" isSmall icon="close" onPress={onRemove}>
          {w.remove(alternative.name)}
        </Button>
      </View>
      {problem('convention') ? (
        <Text variant="small" tone="methyl">
          {problem('convention')}
        </Text>
      ) : null}
    </View>
  );
}
