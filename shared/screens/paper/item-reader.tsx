import type { ReactNode } from 'react';
import { View } from 'react-native';
import type { ItemView } from '../../contracts/items';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { size } from '../../ui/tokens';
import { useIsWide } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { itemTitle } from './item-names';
import { ItemScale } from './item-scale';
import { KeyWorked } from './key-worked';
import { PrintedStem } from './printed-stem';
import { ReaderRules } from './reader-rules';
import { askedInWords, type Said } from './said-rules';
import { SpotTestPane } from './spot-test-pane';
import { useSpot } from './use-spot';
import { words } from './words';

interface ItemReaderProps {
  readonly item: ItemView;
  readonly items: readonly ItemView[];
  /** Why nothing can be changed here. */
  readonly line: string;
  readonly explanation: string;
  readonly canTry: boolean;
  readonly back: ReactNode;
  readonly onChoose: (id: string) => void;
}

/** One item of a locked paper, or for someone who only looks: its fields are text. */
export function ItemReader({ item, items, line, explanation, canTry, back, onChoose }: ItemReaderProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const { draft, worked } = item;
  const spot = useSpot(item.id, null);
  return (
    <View style={{ flex: 1 }}>
      <View
        style={{ minHeight: size.topBarWide, flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: 14, padding: isWide ? 24 : 16, paddingVertical: 14, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}
      >
        {back}
        <Text variant="title" level={1}>
          <ChemText beside="title">{itemTitle(item.number, draft, worked.label)}</ChemText>
        </Text>
        <Text variant="small" tone="ink2">
          {line}
        </Text>
      </View>
      <View style={{ flexDirection: isWide ? 'row' : 'column', gap: isWide ? 28 : 12, padding: isWide ? 24 : 16, paddingVertical: 14, borderBottomWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper }}>
        {canTry ? (
          <View style={isWide ? { width: 292 } : null}>
            <SpotTestPane spot={spot} draft={draft} items={items} isWorked={worked.key !== null} />
          </View>
        ) : null}
        <View style={isWide ? { flex: 1, minWidth: 0 } : null}>
          <ItemScale draft={draft} worked={worked} value={spot.drop} />
        </View>
      </View>
      <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column' }}>
        <View style={{ flex: isWide ? 4 : undefined, minWidth: 0, padding: isWide ? 24 : 16, gap: 24, backgroundColor: colors.paper, borderRightWidth: isWide ? 1 : 0, borderColor: colors.hair }}>
          <View style={{ gap: 6 }}>
            <Text variant="head" level={2}>
              {words.asked.title}
            </Text>
            {askedInWords(item).map((said) => (
              <SaidLine key={said[0]} said={said} />
            ))}
          </View>
          <PrintedStem number={item.number} draft={draft} worked={worked} error={undefined} canChange={false} onChange={() => undefined} />
          <KeyWorked draft={draft} worked={worked} />
        </View>
        <View style={{ flex: isWide ? 6 : undefined, minWidth: 0, padding: isWide ? 24 : 16, gap: 16, backgroundColor: colors.bench }}>
          <ReaderRules item={item} items={items} onChoose={onChoose} />
          <Text variant="small" tone="ink2">
            {explanation}
          </Text>
        </View>
      </View>
    </View>
  );
}

function SaidLine({ said: [name, text] }: { said: Said }) {
  return (
    <View style={{ flexDirection: 'row', gap: 12 }}>
      <Text variant="small" tone="ink2" style={{ width: 96 }}>
        <ChemText beside="small">{name}</ChemText>
      </Text>
      <Text style={{ flex: 1 }}>
        <ChemText>{text}</ChemText>
      </Text>
    </View>
  );
}
