import { View } from 'react-native';
import type { BlankItem } from '../../contracts/blanks';
import { IconLink } from '../../ui/icon-button';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { words } from './words';

interface BlanksHeadProps {
  readonly sittingId: string;
  /** The item of the sheet; none at the end. */
  readonly item: BlankItem | undefined;
  readonly looked: number;
  readonly of: number;
}

/** What the sheet is, what to do with it, and how far one is. */
export function BlanksHead({ sittingId, item, looked, of }: BlanksHeadProps) {
  const colors = useColors();
  const isWide = useIsWide();
  return (
    <View style={{ borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ minHeight: 60, flexDirection: 'row', alignItems: 'center', gap: 8, paddingLeft: 4, paddingRight: isWide ? 24 : 12 }}>
        <IconLink icon="back" label={words.back} href={item ? `/desk/${sittingId}?item=${item.id}` : `/desk/${sittingId}`} />
        <View style={{ flex: 1, minWidth: 0 }}>
          <Text variant="head" level={1} lines={1}>
            {words.title}
          </Text>
          {item ? (
            <Text variant="small" tone="ink2" lines={1}>
              <ChemText beside="small">{words.item(item.number, item.label)}</ChemText>
            </Text>
          ) : null}
        </View>
        {of > 0 ? (
          <View style={{ width: isWide ? 240 : 150, alignItems: 'flex-end', gap: 2 }}>
            <Text variant={isWide ? 'body' : 'small'} isTabular>{`${looked.toLocaleString('en-GB')} ${words.looked(of)}`}</Text>
            <ProgressRule done={looked} of={of} label={words.lookedLabel} height={8} thickness={2} />
          </View>
        ) : null}
      </View>
      {item ? (
        <Text variant="small" tone="ink2" style={{ paddingHorizontal: isWide ? 24 : 12, paddingBottom: 10 }}>
          {isWide ? `${words.help} ${words.helpKeys}` : words.help}
        </Text>
      ) : null}
    </View>
  );
}
