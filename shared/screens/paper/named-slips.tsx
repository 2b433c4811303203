import { useState } from 'react';
import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { readMarks } from '../../marking/typed-marks';
import { watchWords } from '../../marking/watch/words';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/checkbox';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { slipRows, withSlipRow, type SlipRow } from './slip-rows';
import { words } from './words';

interface NamedSlipsProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

const shownFirst = 8;
const w = words.slips;

/** The slips that can be made here: the lead ticks those the scheme names, and gives each its share. */
export function NamedSlips({ draft, worked, problemAt, onChange }: NamedSlipsProps) {
  const [isWhole, setWhole] = useState(false);
  const rows = slipRows(worked, draft);
  const silent = worked.slips.filter(({ isSilent }) => isSilent);
  const shown = isWhole ? rows : rows.filter(({ marks }, index) => marks !== null || index < shownFirst);
  const put = (row: SlipRow, marks: string | null) => onChange({ ...draft, slips: withSlipRow(draft, row, marks) }, `slip-${row.slips[0]?.id ?? ''}`);
  const seen = new Set(rows.flatMap(({ slips }) => slips.map(({ id }) => id)));
  const orphans = draft.slips.filter(({ id }) => !seen.has(id));
  if (rows.length === 0 && orphans.length === 0) return null;
  return (
    <View style={{ gap: 4, marginTop: 16 }} testID="named-slips">
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', flexWrap: 'wrap', columnGap: 12 }}>
        <Text variant="head" level={2}>
          {w.title}
        </Text>
        <Text variant="small" tone="ink2">
          {w.aside}
        </Text>
      </View>
      <View role="list" aria-label={w.title}>
        {shown.map((row) => (
          <Row key={row.text} row={row} maxGrains={worked.maxGrains} problem={problemOf(row, draft, problemAt)} onMarks={(marks) => put(row, marks)} />
        ))}
      </View>
      {orphans.length > 0 ? (
        <View role="status" style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 10 }}>
          <Text variant="small" tone="methyl" style={{ flexShrink: 1 }}>
            {w.orphans(orphans.length)}
          </Text>
          <Button isSmall onPress={() => onChange({ ...draft, slips: draft.slips.filter(({ id }) => seen.has(id)) }, 'slips-cleared')} testID="clear-slips">
            {w.clear}
          </Button>
        </View>
      ) : null}
      {rows.length > shown.length || isWhole ? (
        <View style={{ alignItems: 'flex-start' }}>
          <Button kind="text" isSmall icon={isWhole ? 'up' : 'down'} onPress={() => setWhole(!isWhole)} isExpanded={isWhole} testID="all-slips">
            {isWhole ? w.fewer : w.all(rows.length)}
          </Button>
        </View>
      ) : null}
      {worked.key ? (
        <Text variant="small" testID="silent-slips">
          <Text variant="small" weight={600}>
            {w.silent}
          </Text>
          {` ${silent.length > 0 ? watchWords.silent(silent.map(({ name }) => name), worked.key.text) : w.none(worked.key.text)}`}
        </Text>
      ) : null}
      {isWhole && worked.noOccasion.length > 0 ? (
        <Text variant="small" tone="ink2">
          <ChemText beside="small">{watchWords.noOccasion(worked.noOccasion)}</ChemText>
        </Text>
      ) : null}
    </View>
  );
}

function problemOf(row: SlipRow, draft: ItemDraft, problemAt: (path: string) => string | undefined): string | undefined {
  const at = draft.slips.findIndex(({ id }) => row.slips.some((slip) => slip.id === id));
  return at < 0 ? undefined : (problemAt(`slips.${at}.marks`) ?? problemAt(`slips.${at}.id`));
}

/** A sentence begins with a capital, but a symbol such as n stays what it is. */
const capital = (text: string): string => (/^n([spdf-]|\b)/.test(text) ? text : text.charAt(0).toUpperCase() + text.slice(1));

function Diamond({ letter }: { letter: string }) {
  const colors = useColors();
  return (
    <View aria-hidden style={{ width: 30, height: 30, alignItems: 'center', justifyContent: 'center' }}>
      <Svg width={30} height={30} viewBox="0 0 30 30" fill="none" style={{ position: 'absolute' }}>
        <Path d="M15,2 L28,15 L15,28 L2,15 Z" stroke={colors.ink2} strokeWidth={1.5} fill={colors.paper} />
      </Svg>
      <Text variant="micro" weight={600}>
        {letter}
      </Text>
    </View>
  );
}

interface RowProps {
  readonly row: SlipRow;
  readonly maxGrains: number | null;
  readonly problem: string | undefined;
  readonly onMarks: (marks: string | null) => void;
}

function Row({ row, maxGrains, problem, onMarks }: RowProps) {
  const colors = useColors();
  const { slips, text, marks } = row;
  const [first, ...twins] = slips;
  const read = marks === null ? null : readMarks(marks, true);
  if (!first) return null;
  return (
    <View role="listitem" style={{ borderBottomWidth: 1, borderColor: colors.hair, paddingVertical: 6 }} testID={`slip-${first.id}`}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: 10, rowGap: 4 }}>
        <View style={{ flexDirection: 'row' }}>
          {slips.slice(0, 2).map(({ id, letter }) => (
            <Diamond key={id} letter={letter} />
          ))}
        </View>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 200 }}>
          <Checkbox isChecked={marks !== null} onChange={(isNamed) => onMarks(isNamed ? '0' : null)} label={`${first.name}, ${text}`}>
            <ChemText>{capital(first.name)}</ChemText>
          </Checkbox>
          <Text variant="small" tone="ink2">
            {[first.differs, twins.length > 0 ? w.twins(twins.map(({ name }) => name)) : ''].filter((part) => part !== '').map(capital).join('. ')}
          </Text>
        </View>
        <Text variant="reading">{text}</Text>
        {marks === null ? null : (
          <>
            <View style={{ width: 76 }}>
              <Vessel label={w.share} isLabelHidden value={marks} onChange={onMarks} variant="readingS" height={36} maxLength={16} testID={`slip-marks-${first.id}`} />
            </View>
            {read?.ok && maxGrains !== null ? <MarkStand state="given" got={read.grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(read.grains)} ofText={marksText(maxGrains)} /> : null}
          </>
        )}
      </View>
      {problem ? (
        <Text variant="small" tone="methyl" live="polite">
          {problem}
        </Text>
      ) : null}
    </View>
  );
}
