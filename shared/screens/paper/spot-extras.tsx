import { View } from 'react-native';
import type { ItemDraft, ItemView } from '../../contracts/items';
import { Checkbox } from '../../ui/checkbox';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { plainChem } from '../chem-text-parts';
import { quantityShort } from './item-names';
import type { Beside } from './use-spot';
import { words } from './words';

interface SpotExtrasProps {
  readonly draft: ItemDraft;
  readonly items: readonly ItemView[];
  readonly beside: Beside;
  readonly onChange: (beside: Beside) => void;
  readonly problems: Readonly<Record<string, string>>;
}

const w = words.tried;

/** What else a mark rests on: own values of the items followed, and the method marks struck. */
export function SpotExtras({ draft, items, beside, onChange, problems }: SpotExtrasProps) {
  const link = draft.followThrough?.isTrivial === false ? draft.followThrough : null;
  const sources = link ? ([['followed', link.from], ['second', link.second]] as const).flatMap(([field, id]) => {
    const item = items.find((known) => known.id === id);
    return item ? [{ field, item }] : [];
  }) : [];
  if (sources.length === 0 && draft.methodMarks.length === 0) return null;
  return (
    <View style={{ gap: 8 }} testID="spot-extras">
      {sources.length > 0 ? (
        <View style={{ flexDirection: 'row', gap: 10 }}>
          {sources.map(({ field, item }) => (
            <View key={field} style={{ flex: 1 }}>
              <Vessel
                label={w.own(item.number)}
                value={beside[field]}
                onChange={(text) => onChange({ ...beside, [field]: text })}
                help={plainChem(`${item.worked.label}, ${quantityShort(item.draft)}`)}
                error={problems[field]}
                variant="reading"
                height={40}
                maxLength={64}
                testID={`spot-${field}`}
              />
            </View>
          ))}
        </View>
      ) : null}
      {draft.methodMarks.length > 0 ? (
        <View role="group" aria-label={w.method}>
          <Text variant="label">{w.method}</Text>
          {draft.methodMarks.map(({ id, text }, index) => (
            <Checkbox key={id} isChecked={beside.method.includes(id)} onChange={(isStruck) => onChange({ ...beside, method: isStruck ? [...beside.method, id] : beside.method.filter((known) => known !== id) })} testID={`spot-method-${index}`}>
              {text.trim() === '' ? words.method.unnamed(index + 1) : text}
            </Checkbox>
          ))}
        </View>
      ) : null}
    </View>
  );
}
