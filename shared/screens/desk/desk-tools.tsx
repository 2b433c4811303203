import { View } from 'react-native';
import type { DeskLease } from '../../contracts/desk';
import { Button } from '../../ui/button';
import { IconButton } from '../../ui/icon-button';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { useIsWide } from '../../ui/use-breakpoint';
import { words } from './words';

interface DeskToolsProps {
  readonly lease: DeskLease;
  readonly isWhole: boolean;
  readonly zoom: number;
  readonly onTurn: () => void;
  readonly onCloser: () => void;
  readonly onFarther: () => void;
  readonly onWhole: () => void;
}

/** On the mat under the scan: whose it is, and what can be done with the picture. */
export function DeskTools({ lease, isWhole, zoom, onTurn, onCloser, onFarther, onWhole }: DeskToolsProps) {
  const colors = useColors();
  const isWide = useIsWide();
  return (
    <View style={{ minHeight: 48, flexDirection: 'row', alignItems: 'center', gap: isWide ? 12 : 4, paddingLeft: isWide ? 40 : 16, paddingRight: isWide ? 28 : 8, backgroundColor: colors.mat }}>
      <Text variant="reading" weight={600} testID="desk-candidate">
        {lease.candidateNumber}
      </Text>
      <Text variant="small" style={{ flex: 1 }}>
        {words.page(lease.pageNo, lease.pageCount)}
      </Text>
      {isWide ? (
        <>
          <Button kind="text" isSmall icon="turn" keyCap="T" onPress={onTurn}>
            {words.turn}
          </Button>
          {zoom > 1 ? (
            <Button kind="text" isSmall icon="farther" onPress={onFarther}>
              {words.farther}
            </Button>
          ) : null}
          <Button kind="text" isSmall icon="closer" keyCap="Z" onPress={onCloser}>
            {words.closer}
          </Button>
          <Button kind="text" isSmall icon="page" keyCap="P" onPress={onWhole} isPressedIn={isWhole}>
            {words.wholePage}
          </Button>
        </>
      ) : (
        <>
          <IconButton icon="turn" label={words.turn} onPress={onTurn} />
          <IconButton icon={zoom > 2 ? 'farther' : 'closer'} label={zoom > 2 ? words.farther : words.closer} onPress={zoom > 2 ? onFarther : onCloser} />
          <IconButton icon="page" label={words.wholePage} onPress={onWhole} isPressedIn={isWhole} />
        </>
      )}
    </View>
  );
}
