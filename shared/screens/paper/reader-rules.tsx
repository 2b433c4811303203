import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { readMarks } from '../../marking/typed-marks';
import { watchWords } from '../../marking/watch/words';
import { Text } from '../../ui/text';
import { ChemText } from '../chem-text';
import { Chain } from './chain';
import { CountRow } from './count-row';
import { sharesOf } from './draft-changes';
import { ToleranceGuard, Untold } from './guard-notes';
import { RuleHead } from './rule-head';
import { rulesInWords } from './said-rules';
import { words } from './words';

interface ReaderRulesProps {
  readonly item: ItemView;
  readonly items: readonly ItemView[];
  readonly onChoose: (id: string) => void;
}

const grainsOf = (typed: string): number | null => {
  const read = readMarks(typed, true);
  return read.ok ? read.grains : null;
};

/** Every rule of an item as text, with what it pays. */
export function ReaderRules({ item, items, onChoose }: ReaderRulesProps) {
  const { draft, worked, maxGrains } = item;
  const value = sharesOf(draft, maxGrains)?.value ?? maxGrains;
  return (
    <View style={{ gap: 4 }}>
      <RuleHead title={words.counts.title} aside={words.counts.aside} />
      {draft.kind === 'numeric' ? <ValueRows item={item} value={value} /> : <PrintedRows item={item} value={value} />}
      {draft.alternatives.map(({ name, marks, reason }, index) => (
        <CountRow key={`${name}-${index}`} value={worked.alternatives[index] ?? ''} grains={grainsOf(marks)} maxGrains={maxGrains}>
          <Text>
            <Text weight={600}>{name}</Text>
            {reason === '' ? '' : `, ${reason}`}
          </Text>
        </CountRow>
      ))}
      <SlipRows item={item} />
      {draft.methodMarks.length > 0 ? (
        <View style={{ marginTop: 16 }}>
          <RuleHead title={words.method.title} aside={words.method.aside} />
          {draft.methodMarks.map(({ id, text, marks }) => (
            <CountRow key={id} value="" grains={grainsOf(marks)} maxGrains={maxGrains}>
              <Text>{text}</Text>
            </CountRow>
          ))}
        </View>
      ) : null}
      <View style={{ paddingTop: 16, gap: 6 }}>
        {rulesInWords(item, items).map(([name, text]) => (
          <Text key={name} variant="small">
            <Text variant="small" weight={600}>{`${name}: `}</Text>
            <ChemText beside="small">{text}</ChemText>
          </Text>
        ))}
      </View>
      <Chain items={items} itemId={item.id} onChoose={onChoose} />
    </View>
  );
}

function ValueRows({ item: { draft, worked, maxGrains }, value }: { item: ItemView; value: number }) {
  const { downToDecimals, downToFigures = null, truncation } = draft.roundings;
  const fewest = worked.key?.figures ? (downToFigures === null ? null : words.counts.figuresOf(downToFigures)) : downToDecimals === null ? null : words.counts.decimalsOf(downToDecimals);
  return (
    <>
      <CountRow value={worked.key?.text ?? ''} grains={value} maxGrains={maxGrains}>
        <Text>
          <Text weight={600}>{words.counts.key}</Text>
          {words.counts.keyWith(worked.key?.decimals ?? draft.decimals, worked.key?.figures ?? null)}
        </Text>
      </CountRow>
      <CountRow value={[...new Set(worked.roundings)].join('  ')} grains={fewest === null ? null : value} maxGrains={maxGrains}>
        <Text>{fewest === null ? (worked.key?.figures ? words.counts.noFigures : words.counts.noRounding) : `${words.counts.rounding} ${fewest}${truncation && !worked.key?.figures ? `. ${words.counts.cutOff}` : ''}`}</Text>
      </CountRow>
      <Untold untold={worked.untold} />
      {draft.bands.length === 0 ? (
        <Text tone="ink2" style={{ paddingVertical: 12 }}>
          {words.counts.noBand}
        </Text>
      ) : null}
      {draft.bands.map((band, index) => {
        const range = worked.bands[index];
        return (
          <CountRow key={index} value={range ? words.counts.range(range.from, range.to) : ''} grains={grainsOf(band.marks)} maxGrains={maxGrains}>
            <Text>
              <Text weight={600}>{band.name}</Text>
              {`, ${words.counts.kinds[band.kind]} ${band.width}`}
            </Text>
          </CountRow>
        );
      })}
      <ToleranceGuard guard={worked.guard} />
    </>
  );
}

function PrintedRows({ item: { draft, worked, maxGrains }, value }: { item: ItemView; value: number }) {
  const { kind, printed } = draft;
  if (kind === 'numeric' || !printed) return null;
  return (
    <>
      <CountRow value={worked.key?.text ?? ''} grains={value} maxGrains={maxGrains}>
        <Text weight={600}>{words.answerCounts[kind]}</Text>
      </CountRow>
      {printed.partMarks.map(({ inPlace, marks }) => (
        <CountRow key={inPlace} value="" grains={grainsOf(marks)} maxGrains={maxGrains}>
          <Text>{`${words.partMarks.inPlace} ${words.partMarks.inPlaceOf(inPlace, printed.options.length)}`}</Text>
        </CountRow>
      ))}
    </>
  );
}

function SlipRows({ item: { draft, worked, maxGrains } }: { item: ItemView }) {
  const silent = worked.slips.filter(({ isSilent }) => isSilent).map(({ name }) => name);
  if (draft.slips.length === 0 && silent.length === 0) return null;
  return (
    <View style={{ marginTop: 16 }}>
      <RuleHead title={words.slips.title} aside={words.slips.aside} />
      {draft.slips.map(({ id, marks }) => {
        const slip = worked.slips.find((known) => known.id === id);
        return slip ? (
          <CountRow key={id} value={slip.text} grains={grainsOf(marks)} maxGrains={maxGrains}>
            <Text>
              <Text weight={600}>{slip.letter}</Text>
              {', '}
              <ChemText>{slip.name}</ChemText>
            </Text>
          </CountRow>
        ) : null;
      })}
      {silent.length > 0 && worked.key ? (
        <Text variant="small">
          <Text variant="small" weight={600}>
            {words.slips.silent}
          </Text>
          {` ${watchWords.silent(silent, worked.key.text)}`}
        </Text>
      ) : null}
    </View>
  );
}
