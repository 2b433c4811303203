import { View } from 'react-native';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import type { ScaleData } from '../../marking/scale';
import { Scale } from '../../ui/scale';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { drawnScale } from '../drawn-scale';
import { OptionsScale } from './options-scale';
import { words } from './words';

interface ItemScaleProps {
  readonly draft: ItemDraft;
  readonly worked: WorkedDraft;
  /** The value that is being tried. */
  readonly value: { readonly at: number; readonly text: string } | null;
}

/** The live scale of the item: the server computes where things stand, this draws them. */
export function ItemScale({ draft, worked, value }: ItemScaleProps) {
  const isPhone = useIsPhone();
  const data = worked.scale as ScaleData | null;
  if (draft.kind !== 'numeric') return <OptionsScale draft={draft} worked={worked} />;
  if (!data) {
    return (
      <View style={{ minHeight: 120, justifyContent: 'center' }}>
        <Text variant="small" tone="ink2">
          {worked.key ? words.scale.unfinished : words.scale.none}
        </Text>
      </View>
    );
  }
  const apart = new Set(data.roundings.map(({ label }) => label));
  const written = [...new Set(worked.roundings)].filter((text) => !apart.has(text));
  return (
    <Scale
      {...drawnScale(data, words.scale.key(worked.key?.text ?? data.key.label, written))}
      fit={isPhone ? 'phone' : 'editor'}
      drop={value?.at ?? null}
      dropText={value?.text ?? ''}
    />
  );
}
