import type { Ref } from 'react';
import { View } from 'react-native';
import type { AnswerView } from '../../contracts/ledger';
import { GRAINS_PER_MARK, marksText } from '../../marking/grains';
import { Button } from '../../ui/button';
import { MarkStand } from '../../ui/mark-stand';
import { Text } from '../../ui/text';
import { ruledWords } from './ruling';
import { words } from './words';

interface StandingProps {
  readonly answer: AnswerView;
  /** Left out where it cannot be taken back. */
  readonly onTakeBack: (() => void) | null;
  readonly isBusy: boolean;
  readonly host: Ref<View>;
}

/** The mark that stands, and why: the rule that was met, or who ruled what. */
export function Standing({ answer, onTakeBack, isBusy, host }: StandingProps) {
  const { ruling, score, maxGrains } = answer;
  const grains = score?.grains ?? ruling?.grains ?? null;
  if (grains === null) return null;
  return (
    <View ref={host} tabIndex={-1} style={{ flexDirection: 'row', alignItems: 'center', gap: 14, outlineWidth: 0 }} testID="standing">
      <MarkStand state={ruling ? 'ruled' : 'given'} scale="desk" got={grains / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(grains)} ofText={marksText(maxGrains)} />
      <View style={{ flex: 1 }}>
        <Text weight={600}>{ruling ? words.sheet.ruledBy(ruling.isOwn, ruledWords(ruling, grains)) : (score?.why.head ?? '')}</Text>
        <Text variant="small" tone="ink2">
          {ruling?.reason ?? score?.why.detail ?? ''}
        </Text>
      </View>
      {onTakeBack ? (
        <Button isSmall keyCap="U" icon="takeBack" onPress={onTakeBack} isBusy={isBusy} testID="take-back-ruling">
          {words.sheet.takeBack}
        </Button>
      ) : null}
    </View>
  );
}
