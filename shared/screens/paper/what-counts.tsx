import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import type { BandDraft, ItemDraft, WorkedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { MarkStand } from '../../ui/mark-stand';
import { Alternatives } from './alternatives';
import { nested } from './band-order';
import { BandRow } from './band-row';
import { ToleranceGuard, Untold } from './guard-notes';
import { NamedSlips } from './named-slips';
import { words } from './words';

interface WhatCountsProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

/** A rule of the scheme: what it is, the value it pays, and the marks. */
export function CountRow({ children, value, grains, maxGrains }: { children: ReactNode; value: string; grains: number | null; maxGrains: number | null }) {
  const colors = useColors();
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', columnGap: 12, rowGap: 4, minHeight: 48, paddingVertical: 6, borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 220, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 8, rowGap: 4 }}>{children}</View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, marginLeft: 'auto' }}>
        <Text variant="readingS">{value}</Text>
        {grains === null || maxGrains === null ? null : (
          <MarkStand state="given" got={grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(grains)} ofText={marksText(maxGrains)} />
        )}
      </View>
    </View>
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

/** Every rule that pays marks: the key, its roundings, the bands round it; and what becomes of an answer without a value. */
export function WhatCounts({ draft, worked, problemAt, onChange }: WhatCountsProps) {
  const [removed, setRemoved] = useState<{ name: string; before: ItemDraft } | null>(null);
  const { roundings } = draft;
  const { maxGrains } = worked;
  const places = Array.from({ length: draft.decimals }, (_, count) => String(count));
  const putRounding = (changes: Partial<ItemDraft['roundings']>, field: string) => onChange({ ...draft, roundings: { ...roundings, ...changes } }, field);
  const nest = () => {
    const sorted = nested(draft, worked);
    if (sorted !== draft) onChange(sorted, 'bands-order');
  };
  return (
    <View style={{ gap: 4 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', flexWrap: 'wrap', columnGap: 12 }}>
        <Text variant="head" level={2}>
          {words.counts.title}
        </Text>
        <Text variant="small" tone="ink2">
          {words.counts.aside}
        </Text>
      </View>
      <CountRow value={worked.key?.text ?? ''} grains={maxGrains} maxGrains={maxGrains}>
        <Text>
          <Text weight={600}>{words.counts.key}</Text>
          {words.counts.keyWith(draft.decimals, worked.key?.figures ?? null)}
        </Text>
      </CountRow>
      <CountRow value={[...new Set(worked.roundings)].join('  ')} grains={worked.roundings.length > 0 ? maxGrains : null} maxGrains={maxGrains}>
        <Text weight={600}>{words.counts.rounding}</Text>
        <View style={{ width: 160 }}>
          {worked.key?.figures ? (
            <Select
              label={words.counts.rounding}
              isLabelHidden
              height={40}
              value={String(roundings.downToFigures ?? 'none')}
              options={[{ value: 'none', label: words.counts.roundingNone }, ...Array.from({ length: draft.figures - 1 }, (_, index) => String(index + 1)).map((value) => ({ value, label: words.counts.figuresOf(Number(value)) }))]}
              onChange={(value) => putRounding({ downToFigures: value === 'none' ? null : Number(value) }, 'rounding')}
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
              onChange={(value) => putRounding({ downToDecimals: value === 'none' ? null : Number(value) }, 'rounding')}
              error={problemAt('roundings.downToDecimals')}
              testID="rounding"
            />
          )}
        </View>
        {roundings.downToDecimals === null ? null : (
          <Chip isChosen={roundings.truncation} onPress={() => putRounding({ truncation: !roundings.truncation }, 'truncation')}>
            {words.counts.cutOff}
          </Chip>
        )}
      </CountRow>
      <Untold untold={worked.untold} />
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
          maxGrains={maxGrains}
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
      <ToleranceGuard guard={worked.guard} />
      <Alternatives draft={draft} worked={worked} problemAt={problemAt} onChange={onChange} />
      <NamedSlips draft={draft} worked={worked} problemAt={problemAt} onChange={onChange} />
      <CodePolicies draft={draft} onChange={onChange} />
    </View>
  );
}

const policies = (['ask', 'none'] as const).map((value) => ({ value, label: words.counts.policies[value] }));

/** What becomes of an answer that leaves no value to mark. */
function CodePolicies({ draft, onChange }: Pick<WhatCountsProps, 'draft' | 'onChange'>) {
  return (
    <View style={{ gap: 10, marginTop: 16 }}>
      <Text variant="head" level={2}>
        {words.counts.codes}
      </Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16 }}>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <Select label={words.counts.crossedOut} value={draft.crossedOut} options={policies} onChange={(crossedOut) => onChange({ ...draft, crossedOut }, 'crossed-out')} />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <Select label={words.counts.twoAnswers} value={draft.twoAnswers} options={policies} onChange={(twoAnswers) => onChange({ ...draft, twoAnswers }, 'two-answers')} />
        </View>
      </View>
      <Text variant="small" tone="ink2">
        {words.counts.blank}
      </Text>
    </View>
  );
}
