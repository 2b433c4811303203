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
  const { ruling, score, maxGrains, methodMarks, waitsFor } = answer;
  const grains = score?.grains ?? ruling?.grains ?? null;
  if (grains === null && waitsFor === null) return null;
  const got = grains ?? 0;
  const state = grains === null ? 'held' : ruling ? 'ruled' : 'given';
  const waiting = waitsFor === null ? '' : words.sheet.waits(waitsFor);
  return (
    <View ref={host} tabIndex={-1} style={{ flexDirection: 'row', alignItems: 'center', gap: 14, outlineWidth: 0 }} testID="standing">
      <MarkStand state={state} heldWord="waits" scale="desk" got={got / GRAINS_PER_MARK} of={maxGrains / GRAINS_PER_MARK} gotText={marksText(got)} ofText={marksText(maxGrains)} />
      <View style={{ flex: 1 }}>
        <Text weight={600}>{ruling ? words.sheet.ruledBy(ruling.isOwn, ruledWords(ruling, grains, methodMarks)) : (score?.why.head ?? waiting)}</Text>
        <Text variant="small" tone="ink2">
          {[ruling && waitsFor !== null ? `${waiting}.` : '', ruling?.reason ?? score?.why.detail ?? (waitsFor === null ? '' : words.sheet.waitsHelp)].filter((part) => part !== '').join(' ')}
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
