import { View } from 'react-native';
import type { BandDraft, WorkedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { MarkStand } from '../../ui/mark-stand';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { words } from './words';

interface BandRowProps {
  readonly band: BandDraft;
  readonly index: number;
  readonly range: WorkedDraft['bands'][number];
  readonly maxGrains: number | null;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (band: BandDraft, field: string) => void;
  /** After a width was typed, so that rows can be put into the order of nesting. */
  readonly onSettled: () => void;
  readonly onRemove: () => void;
}

const kinds = (['absolute', 'relative', 'decimal-places', 'significant-figures'] as const).map((value) => ({ value, label: words.counts.kinds[value] }));

/** One tolerance band: name, kind, width, the range it comes to, marks. */
export function BandRow({ band, index, range, maxGrains, problemAt, onChange, onSettled, onRemove }: BandRowProps) {
  const colors = useColors();
  const marks = readMarks(band.marks);
  const problem = (field: string) => problemAt(`bands.${index}.${field}`);
  return (
    <View role="group" aria-label={`${words.counts.addBand} ${band.name}`} style={{ gap: 8, paddingVertical: 10, borderBottomWidth: 1, borderColor: colors.hair }} testID={`band-${index}`}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <View style={{ flexGrow: 2, flexBasis: 110 }}>
          <Vessel label={words.counts.bandName} value={band.name} onChange={(name) => onChange({ ...band, name }, 'name')} maxLength={60} error={problem('name')} height={40} />
        </View>
        <View style={{ flexGrow: 2, flexBasis: 170 }}>
          <Select label={words.counts.bandKind} value={band.kind} options={kinds} onChange={(kind) => onChange({ ...band, kind }, 'kind')} height={40} />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 86 }}>
          <Vessel
            label={words.counts.widths[band.kind]}
            value={band.width}
            onChange={(width) => onChange({ ...band, width }, 'width')}
            onBlur={onSettled}
            variant="readingS"
            maxLength={16}
            error={problem('width')}
            height={40}
            testID={`band-${index}-width`}
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 72 }}>
          <Vessel
            label={words.counts.bandMarks}
            value={band.marks}
            onChange={(text) => onChange({ ...band, marks: text }, 'marks')}
            variant="readingS"
            maxLength={16}
            error={problem('marks')}
            height={40}
            testID={`band-${index}-marks`}
          />
        </View>
      </View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
        <Button kind="text" isSmall icon="close" label={words.counts.removeBand(band.name)} onPress={onRemove}>
          {words.counts.remove}
        </Button>
        <View style={{ flex: 1 }} />
        <Text variant="readingS" tone="ink2">
          {range ? words.counts.range(range.from, range.to) : ''}
        </Text>
        {marks.ok && maxGrains !== null ? (
          <MarkStand state="given" got={marks.grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(marks.grains)} ofText={marksText(maxGrains)} />
        ) : null}
      </View>
    </View>
  );
}
