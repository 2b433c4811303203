import { useState } from 'react';
import { View } from 'react-native';
import type { BandDraft, ItemDraft } from '../../contracts/items';
import { marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import type { FieldsProps } from './asked-fields';
import { nested } from './band-order';
import { BandRow } from './band-row';
import { CountRow } from './count-row';
import { words } from './words';

/** The accepted roundings of the key. */
export function RoundingRow({ draft, worked, problemAt, onChange, grains }: FieldsProps & { readonly grains: number | null }) {
  const { roundings } = draft;
  const decimals = worked.key?.decimals ?? draft.decimals;
  const places = Array.from({ length: decimals }, (_, count) => String(count));
  const put = (changes: Partial<ItemDraft['roundings']>, field: string) => onChange({ ...draft, roundings: { ...roundings, ...changes } }, field);
  return (
    <CountRow value={[...new Set(worked.roundings)].join('  ')} grains={worked.roundings.length > 0 ? grains : null} maxGrains={worked.maxGrains}>
      <Text weight={600}>{words.counts.rounding}</Text>
      <View style={{ width: 160 }}>
        {worked.key?.figures ? (
          <Select
            label={words.counts.rounding}
            isLabelHidden
            height={40}
            value={String(roundings.downToFigures ?? 'none')}
            options={[{ value: 'none', label: words.counts.roundingNone }, ...Array.from({ length: draft.figures - 1 }, (_, index) => String(index + 1)).map((value) => ({ value, label: words.counts.figuresOf(Number(value)) }))]}
            onChange={(value) => put({ downToFigures: value === 'none' ? null : Number(value) }, 'rounding')}
            error={problemAt('roundings.downToFigures')}
            testID="rounding"
          />
        ) : (
          <Select
            label={words.counts.rounding}
            isLabelHidden
            height={40}
            value={roundings.downToDecimals === null ? 'none' : String(roundings.downToDecimals)}
            options={[{ value: 'none', label: words.counts.roundingNone }, ...places.map((value) => ({ value, label: words.counts.decimalsOf(Number(value)) }))]}
            onChange={(value) => put({ downToDecimals: value === 'none' ? null : Number(value) }, 'rounding')}
            error={problemAt('roundings.downToDecimals')}
            testID="rounding"
          />
        )}
      </View>
      {roundings.downToDecimals === null ? null : (
        <Chip isChosen={roundings.truncation} onPress={() => put({ truncation: !roundings.truncation }, 'truncation')}>
          {words.counts.cutOff}
        </Chip>
      )}
    </CountRow>
  );
}

/** A band to begin with: a tenth wider than the last, for half its marks. */
function newBand({ bands }: ItemDraft): BandDraft {
  const last = bands.at(-1);
  const marks = last ? readMarks(last.marks) : null;
  let n = bands.length + 1;
  while (bands.some(({ name }) => name === words.counts.newBand(n))) n += 1;
  return { name: words.counts.newBand(n), kind: 'absolute', width: `0.${Math.min(bands.length + 1, 9)}`, marks: marks?.ok ? marksText(Math.floor(marks.grains / 2)) : '1' };
}

/** Tolerance bands round the key; one that was removed can be brought back. */
export function Bands({ draft, worked, problemAt, onChange }: FieldsProps) {
  const [removed, setRemoved] = useState<{ name: string; before: ItemDraft } | null>(null);
  const nest = () => {
    const sorted = nested(draft, worked);
    if (sorted !== draft) onChange(sorted, 'bands-order');
  };
  return (
    <>
      {draft.bands.length === 0 ? (
        <View style={{ minHeight: 44, justifyContent: 'center' }}>
          <Text tone="ink2">{words.counts.noBand}</Text>
        </View>
      ) : null}
      {draft.bands.map((band, index) => (
        <BandRow
          key={index}
          band={band}
          index={index}
          range={worked.bands[index] ?? null}
          maxGrains={worked.maxGrains}
          problemAt={problemAt}
          onSettled={nest}
          onChange={(next, field) => onChange({ ...draft, bands: draft.bands.map((known, at) => (at === index ? next : known)) }, `band-${index}-${field}`)}
          onRemove={() => {
            setRemoved({ name: band.name, before: draft });
            onChange({ ...draft, bands: draft.bands.filter((_band, at) => at !== index) }, `band-removed-${draft.bands.length}`);
          }}
        />
      ))}
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 16, flexWrap: 'wrap' }}>
        <Button
          kind="text"
          isSmall
          icon="plus"
          testID="add-band"
          onPress={() => {
            setRemoved(null);
            onChange({ ...draft, bands: [...draft.bands, newBand(draft)] }, `band-added-${draft.bands.length}`);
          }}
        >
          {words.counts.addBand}
        </Button>
        {removed ? (
          <View role="status" style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
            <Text variant="small">{words.counts.removedBand(removed.name)}</Text>
            <Button
              kind="text"
              isSmall
              icon="takeBack"
              onPress={() => {
                onChange({ ...draft, bands: removed.before.bands }, 'band-back');
                setRemoved(null);
              }}
            >
              {words.undo}
            </Button>
          </View>
        ) : null}
      </View>
    </>
  );
}
