import { View } from 'react-native';
import type { DeskItem } from '../../contracts/desk';
import { ButtonLink } from '../../ui/button';
import { IconLink } from '../../ui/icon-button';
import { ProgressRule } from '../../ui/progress-rule';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { ChemText } from '../chem-text';
import { words as blankWords } from '../blanks/words';
import { ItemMenu } from './item-menu';
import { words } from './words';

interface DeskHeadProps {
  readonly sittingId: string;
  readonly course: string;
  readonly title: string;
  readonly item: DeskItem;
  readonly items: readonly DeskItem[];
  readonly emptyBoxes: number;
  /** Read on this page since the counts were fetched. */
  readonly readHere: number;
}

/** Item, sitting and progress: 60 high on wide; on a phone 56 and the rule under it. */
export function DeskHead({ sittingId, course, title, item, items, emptyBoxes, readHere }: DeskHeadProps) {
  const colors = useColors();
  const isWide = useIsWide();
  const of = item.read + item.toRead;
  const done = Math.min(of, item.read + readHere);
  const count = (
    <Text variant="body" isTabular>
      <Text weight={600} isTabular>
        {done.toLocaleString('en-GB')}
      </Text>
      {` ${words.progress(of)}`}
    </Text>
  );
  const rule = <ProgressRule done={done} of={of} label={words.progressLabel} height={isWide ? 8 : 10} thickness={isWide ? 2 : 3} />;
  return (
    <View>
      <View style={{ minHeight: isWide ? 60 : 56, flexDirection: 'row', alignItems: 'center', gap: 8, paddingLeft: isWide ? 24 : 4, paddingRight: isWide ? 24 : 12, borderBottomWidth: isWide ? 1 : 0, borderColor: colors.hair }}>
        {isWide ? null : <IconLink icon="back" label={words.back} href="/" />}
        <View style={{ flex: 1, minWidth: 0 }}>
          <Text variant="head" level={1} lines={1}>
            <ChemText beside="head">{words.item(item.number, item.label)}</ChemText>
          </Text>
          <Text variant="small" tone="ink2" lines={1}>{`${course}, ${title}`}</Text>
        </View>
        {isWide && emptyBoxes > 0 ? (
          <ButtonLink kind="text" isSmall iconAfter="forward" href={`/sittings/${sittingId}/blanks`} testID="empty-boxes-head">
            {blankWords.lookEmpty(emptyBoxes)}
          </ButtonLink>
        ) : null}
        {isWide ? (
          <View style={{ width: 240, alignItems: 'flex-end', gap: 2 }}>
            {count}
            {rule}
          </View>
        ) : (
          count
        )}
        <ItemMenu sittingId={sittingId} items={items} chosen={item.id} emptyBoxes={emptyBoxes} />
      </View>
      {isWide ? null : rule}
    </View>
  );
}
