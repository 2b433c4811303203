import { View } from 'react-native';
import { Button } from '../../ui/button';
import { Chip } from '../../ui/chip';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import type { PaperItem } from './box-panel';
import type { RegionsAct, RegionsState } from './regions-state';
import { words } from './words';

interface PageBarProps {
  readonly state: RegionsState;
  readonly hasSample: boolean;
  readonly canChange: boolean;
  readonly isSending: boolean;
  readonly dispatch: (act: RegionsAct) => void;
  readonly onPicture: () => void;
  readonly onCloser: (() => void) | null;
  readonly onFarther: (() => void) | null;
  /** The next item without an answer box, where boxes are not drawn but placed. */
  readonly next: PaperItem | null;
  readonly newId: () => string;
}

/** The pages of the paper, the picture of the one on view, and how close it is. */
export function PageBar({ state, hasSample, canChange, isSending, dispatch, onPicture, onCloser, onFarther, next, newId }: PageBarProps) {
  const colors = useColors();
  const last = state.pages.length;
  return (
    <View style={{ gap: 6, paddingHorizontal: 16, paddingVertical: 10, backgroundColor: colors.glass, borderBottomWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: 8 }}>
        {state.pages.map((_page, index) => (
          <Chip
            key={index}
            isChosen={state.pageNo === index + 1}
            count={state.boxes.filter(({ pageNo }) => pageNo === index + 1).length}
            onPress={() => dispatch({ act: 'show-page', pageNo: index + 1 })}
          >
            {words.page(index + 1)}
          </Chip>
        ))}
        {canChange && last < 40 ? (
          <Button kind="text" isSmall icon="plus" onPress={() => dispatch({ act: 'add-page' })}>
            {words.addPage}
          </Button>
        ) : null}
        {canChange && last > 1 ? (
          <Button kind="text" isSmall icon="close" onPress={() => dispatch({ act: 'remove-last-page' })}>
            {words.removePage(last)}
          </Button>
        ) : null}
        <View style={{ flex: 1 }} />
        {canChange ? (
          <Button isSmall icon="page" isBusy={isSending} onPress={onPicture} testID="page-picture">
            {isSending ? words.sendingPicture : hasSample ? words.otherPicture : words.picture}
          </Button>
        ) : null}
        <Button kind="text" isSmall icon="farther" label={words.farther} onPress={() => onFarther?.()} closed={onFarther ? undefined : ''}>
          {''}
        </Button>
        <Button kind="text" isSmall icon="closer" label={words.closer} onPress={() => onCloser?.()} closed={onCloser ? undefined : ''}>
          {''}
        </Button>
      </View>
      {canChange && next ? (
        <View style={{ alignSelf: 'flex-start' }}>
          <Button isSmall icon="plus" onPress={() => dispatch({ act: 'place', id: newId(), item: next.id, use: 'answer' })} testID="place-next">
            {words.place(`item ${next.number}, ${next.label}`)}
          </Button>
        </View>
      ) : null}
      {hasSample || !canChange ? null : (
        <Text variant="small" tone="ink2">
          {words.noPicture}
        </Text>
      )}
    </View>
  );
}
