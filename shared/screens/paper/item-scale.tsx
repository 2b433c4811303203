import { View } from 'react-native';
import type { WorkedDraft } from '../../contracts/items';
import { GRAINS_PER_MARK } from '../../marking/grains';
import type { ScaleData } from '../../marking/scale';
import { Scale } from '../../ui/scale';
import { Text } from '../../ui/text';
import { useIsPhone } from '../../ui/use-breakpoint';
import { words } from './words';

interface ItemScaleProps {
  readonly worked: WorkedDraft;
  /** The value that is being tried. */
  readonly value: { readonly at: number; readonly text: string } | null;
}

/** The live scale of the item: the server computes where things stand, this draws them. */
export function ItemScale({ worked, value }: ItemScaleProps) {
  const isPhone = useIsPhone();
  const data = worked.scale as ScaleData | null;
  if (!data) {
    return (
      <View style={{ minHeight: 120, justifyContent: 'center' }}>
        <Text variant="small" tone="ink2">
          {words.scale.none}
        </Text>
      </View>
    );
  }
  const apart = new Set(data.roundings.map(({ label }) => label));
  const written = [...new Set(worked.roundings)].filter((text) => !apart.has(text));
  const marks = (grains: number) => grains / GRAINS_PER_MARK;
  return (
    <Scale
      fit={isPhone ? 'phone' : 'editor'}
      lo={data.lo}
      hi={data.hi}
      major={data.major}
      minor={data.minor}
      decimals={data.decimals}
      of={marks(data.maxGrains)}
      keyAt={data.key.at}
      keyText={words.scale.key(worked.key?.text ?? data.key.label, written)}
      roundings={data.roundings}
      alternatives={data.alternatives.map(({ at, label, grains }) => ({ at, label, marks: marks(grains) }))}
      bands={data.bands.map(({ name, from, to, grains }) => ({ name, from, to, marks: marks(grains) }))}
      drop={value?.at ?? null}
      dropText={value?.text ?? ''}
    />
  );
}
