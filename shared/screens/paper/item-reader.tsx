import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { readMarks } from '../../marking/typed-marks';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size } from '../../ui/tokens';
import { useIsWide } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { ItemScale } from './item-scale';
import { KeyWorked } from './key-worked';
import { PrintedStem } from './printed-stem';
import { SpotTestPane, useSpot } from './spot-test-pane';
import { CountRow } from './what-counts';
import { words } from './words';

interface ItemReaderProps {
  readonly item: ItemView;
  /** Why nothing can be changed here. */
  readonly line: string;
  readonly explanation: string;
  readonly canTry: boolean;
  readonly back: ReactNode;
}

/** One item of a locked paper, or for someone who only looks: its fields are text. */
export function ItemReader({ item, line, explanation, canTry, back }: ItemReaderProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const { draft, worked } = item;
  const spot = useSpot(item.id, null);
  const facts: readonly (readonly [string, string])[] = [
    [words.asked.quantity, words.asked.quantityNames[draft.asked.quantity]],
    [words.asked.convention, words.asked.conventions[draft.asked.convention]],
    [words.asked.element, worked.label],
    worked.key?.figures ? [words.asked.figures, words.counts.figuresOf(draft.figures)] : [words.asked.decimals, words.counts.decimalsOf(draft.decimals)],
  ];
  return (
    <View style={{ flex: 1 }}>
      <View
        style={{ minHeight: size.topBarWide, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 14, padding: isWide ? 24 : 16, paddingVertical: 14, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}
      >
        {back}
        <Text variant="title" level={1}>
          <ChemText beside="title">{words.title(item.number, words.quantityOf[draft.asked.quantity], worked.label)}</ChemText>
        </Text>
        <Text variant="small" tone="ink2">
          {line}
        </Text>
      </View>
      <View style={{ flexDirection: isWide ? 'row' : 'column', gap: isWide ? 28 : 12, padding: isWide ? 24 : 16, paddingVertical: 14, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
        {canTry ? (
          <View style={isWide ? { width: 292 } : null}>
            <SpotTestPane text={spot.text} onChange={spot.setText} result={spot.result} isWorked={worked.scale !== null} />
          </View>
        ) : null}
        <View style={isWide ? { flex: 1, minWidth: 0 } : null}>
          <ItemScale worked={worked} value={spot.drop} />
        </View>
      </View>
      <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column' }}>
        <View style={{ flex: isWide ? 4 : undefined, minWidth: 0, padding: isWide ? 24 : 16, gap: 24, backgroundColor: colors.paper, borderRightWidth: isWide ? 1 : 0, borderColor: colors.hair }}>
          <View style={{ gap: 6 }}>
            <Text variant="head" level={2}>
              {words.asked.title}
            </Text>
            {facts.map(([name, value]) => (
              <View key={name} style={{ flexDirection: 'row', gap: 12 }}>
                <Text variant="small" tone="ink2" style={{ width: 96 }}>
                  {name}
                </Text>
                <Text style={{ flex: 1 }}>
                  <ChemText>{value}</ChemText>
                </Text>
              </View>
            ))}
          </View>
          <PrintedStem number={item.number} draft={draft} worked={worked} error={undefined} canChange={false} onChange={() => undefined} />
          <KeyWorked worked={worked} quantity={draft.asked.quantity} />
        </View>
        <View style={{ flex: isWide ? 6 : undefined, minWidth: 0, padding: isWide ? 24 : 16, gap: 16, backgroundColor: colors.bench }}>
          <CountsAsText item={item} />
          <Text variant="small" tone="ink2">
            {explanation}
          </Text>
        </View>
      </View>
    </View>
  );
}

function CountsAsText({ item: { draft, worked, maxGrains } }: { item: ItemView }) {
  const { downToDecimals, truncation } = draft.roundings;
  return (
    <View>
      <Text variant="head" level={2}>
        {words.counts.title}
      </Text>
      <CountRow value={worked.key?.text ?? ''} grains={maxGrains} maxGrains={maxGrains}>
        <Text>
          <Text weight={600}>{words.counts.key}</Text>
          {words.counts.keyWith(draft.decimals, worked.key?.figures ?? null)}
        </Text>
      </CountRow>
      <CountRow value={[...new Set(worked.roundings)].join('  ')} grains={downToDecimals === null ? null : maxGrains} maxGrains={maxGrains}>
        <Text>{downToDecimals === null ? words.counts.noRounding : `${words.counts.rounding} ${words.counts.decimalsOf(downToDecimals)}${truncation ? `. ${words.counts.cutOff}` : ''}`}</Text>
      </CountRow>
      {draft.bands.length === 0 ? (
        <Text tone="ink2" style={{ paddingVertical: 12 }}>
          {words.counts.noBand}
        </Text>
      ) : null}
      {draft.bands.map((band, index) => {
        const marks = readMarks(band.marks);
        const range = worked.bands[index];
        return (
          <CountRow key={index} value={range ? words.counts.range(range.from, range.to) : ''} grains={marks.ok ? marks.grains : null} maxGrains={maxGrains}>
            <Text>
              <Text weight={600}>{band.name}</Text>
              {`, ${words.counts.kinds[band.kind]} ${band.width}`}
            </Text>
          </CountRow>
        );
      })}
      <View style={{ paddingTop: 16, gap: 4 }}>
        <Text variant="small">{`${words.counts.crossedOut}: ${words.counts.policies[draft.crossedOut]}.`}</Text>
        <Text variant="small">{`${words.counts.twoAnswers}: ${words.counts.policies[draft.twoAnswers]}.`}</Text>
      </View>
    </View>
  );
}
