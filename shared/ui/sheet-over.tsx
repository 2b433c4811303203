import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { IconButton } from './icon-button';
import { safeFoot } from './safe-area';
import { Text } from './text';
import { useColors } from './theme';
import { radius } from './tokens';
import { useModal } from './use-modal';

interface SheetOverProps {
  readonly title: string;
  readonly onClose: () => void;
  readonly children: ReactNode;
  readonly testID?: string | undefined;
}

/** A sheet from the foot over the pad, such as a list of codes; what is above stays in sight. */
export function SheetOver({ title, onClose, children, testID }: SheetOverProps) {
  const colors = useColors();
  const heading = useId();
  const modal = useModal(onClose);
  return (
    <dialog
      {...modal}
      aria-labelledby={heading}
      data-testid={testID}
      style={{
        boxSizing: 'border-box',
        width: '100%',
        maxWidth: 560,
        maxHeight: '80dvh',
        margin: 'auto auto 0',
        padding: 0,
        border: 'none',
        borderRadius: `${radius.vessel}px ${radius.vessel}px 0 0`,
        backgroundColor: colors.paper,
        color: colors.ink,
        overflowY: 'auto',
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', paddingLeft: 16, paddingRight: 4, paddingTop: 8 }}>
        <Text id={heading} variant="head" level={2}>
          {title}
        </Text>
        <IconButton icon="close" label="Close" onPress={onClose} />
      </View>
      <View style={{ paddingHorizontal: 16, paddingTop: 4, paddingBottom: 16 }}>{children}</View>
      <View style={{ height: safeFoot }} />
    </dialog>
  );
}
