import { View } from 'react-native';
import type { ItemDraft, ItemView, SpotTestResult } from '../../contracts/items';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { size } from '../../ui/tokens';
import { useIsPhone } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { followsOf } from './chain-of';
import { RuleHead } from './rule-head';
import { SpotExtras } from './spot-extras';
import type { Spot } from './use-spot';
import { words } from './words';

interface SpotTestPaneProps {
  readonly spot: Spot;
  readonly draft: ItemDraft;
  readonly items: readonly ItemView[];
  readonly isWorked: boolean;
}

/** A value tried against the item while it is built: mark, rule and distance; nothing is stored. */
export function SpotTestPane({ spot, draft, items, isWorked }: SpotTestPaneProps) {
  const isPhone = useIsPhone();
  const { text, setText, result } = spot;
  const refused = result?.outcome === 'refused' ? result.detail : undefined;
  return (
    <View style={{ gap: 10 }} testID="spot-test">
      <RuleHead title={words.spot.title} aside={words.spot.aside} />
      <Vessel
        label={words.spot.label}
        isLabelHidden
        value={text}
        onChange={setText}
        variant={isPhone ? 'readingL' : 'readingXL'}
        height={isPhone ? size.fieldReading : 72}
        maxLength={64}
        error={refused}
        testID="spot-test-value"
        onKeyDown={(key) => {
          if (key === 'Escape') setText('');
        }}
      />
      <SpotExtras draft={draft} items={items} beside={spot.beside} onChange={spot.setBeside} problems={spot.problems} />
      <View aria-live="polite" style={{ minHeight: 66 }}>
        <Outcome text={text} result={result} refusal={spot.refusal} isWorked={isWorked} isNumeric={draft.kind === 'numeric'} waitsFor={waitsFor(spot, draft, items)} />
      </View>
    </View>
  );
}

/** The numbers of the items whose own value was not said. */
function waitsFor({ beside }: Spot, draft: ItemDraft, items: readonly ItemView[]): number[] {
  const typed = [beside.followed, beside.second];
  return followsOf({ draft }).flatMap((id, leg) => (typed[leg]?.trim() === '' ? (items.find((item) => item.id === id)?.number ?? []) : []));
}

interface OutcomeProps {
  readonly text: string;
  readonly result: SpotTestResult | null;
  readonly refusal: string | null;
  readonly isWorked: boolean;
  readonly isNumeric: boolean;
  readonly waitsFor: readonly number[];
}

function Outcome({ text, result, refusal, isWorked, isNumeric, waitsFor: waiting }: OutcomeProps) {
  if (text === '' || !isWorked) {
    return (
      <Text variant="small" tone="ink2">
        {!isWorked ? words.spot.notWorked : isNumeric ? words.spot.empty : words.tried.numbers}
      </Text>
    );
  }
  if (refusal !== null) {
    return (
      <Text variant="small" tone="ink2">
        {words.tried.refused(refusal)}
      </Text>
    );
  }
  if (!result || result.outcome === 'refused') return null;
  if (result.outcome === 'unfinished' || result.grains === null) {
    return (
      <Text variant="small" tone="ink2">
        {result.detail}
      </Text>
    );
  }
  return (
    <View style={{ gap: 8 }}>
      <View style={{ flexDirection: 'row', gap: 16, alignItems: 'flex-start' }}>
        <MarkStand state="given" scale="desk" got={result.grains / GRAINS_PER_MARK} of={result.maxGrains / GRAINS_PER_MARK} gotText={marksText(result.grains)} ofText={marksText(result.maxGrains)} />
        <View style={{ flex: 1 }}>
          <Text weight={600}>{result.head.charAt(0).toUpperCase() + result.head.slice(1)}</Text>
          <Text variant="small" tone="ink2">
            {result.detail}
          </Text>
        </View>
      </View>
      {result.waits ? (
        <Text variant="small" weight={600} tone="iodine" testID="spot-waits">
          {words.tried.waits(waiting)}
        </Text>
      ) : null}
      <Text variant="small" tone="ink2" testID="spot-told">
        <Text variant="small" weight={600}>
          {words.tried.told}
        </Text>
        {` ${result.told}`}
      </Text>
    </View>
  );
}
