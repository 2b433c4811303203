import { useId, useState, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { Text } from './text';
import { useColors } from './theme';
import { radius } from './tokens';
import { useIsPhone } from './use-breakpoint';
import { useModal } from './use-modal';

interface DialogProps {
  readonly title: string;
  readonly children: ReactNode;
  /** Buttons at the foot, the one that goes on first. */
  readonly actions?: ReactNode;
  readonly onClose: () => void;
  readonly width?: number;
  readonly testID?: string;
}

/** A question over the screen: the browser's own dialog keeps the focus in it and Escape closes it. Whole width on a phone. */
export function Dialog({ title, children, actions, onClose, width = 480, testID }: DialogProps) {
  const colors = useColors();
  const isPhone = useIsPhone();
  const heading = useId();
  const modal = useModal(onClose);
  // What is longer than its room is scrolled by keyboard, so it takes the focus.
  const [room, setRoom] = useState(0);
  const [content, setContent] = useState(0);
  const isLonger = room > 0 && content > room + 1;
  return (
    <dialog
      {...modal}
      aria-labelledby={heading}
      data-testid={testID}
      onKeyDown={(event) => event.stopPropagation()}
      style={{
        padding: 0,
        border: 'none',
        backgroundColor: colors.paper,
        color: colors.ink,
        borderRadius: isPhone ? 0 : radius.vessel,
        width: isPhone ? '100%' : width,
        maxWidth: '100%',
        maxHeight: '92dvh',
        margin: isPhone ? 'auto 0 0' : 'auto',
        boxShadow: `0 8px 32px ${colors.scrim}66`,
      }}
    >
      <View style={{ maxHeight: '92vh' as unknown as number }}>
        <View style={{ paddingHorizontal: 24, paddingTop: 20, paddingBottom: 8 }}>
          <Text id={heading} variant="title" level={2}>
            {title}
          </Text>
        </View>
        <ScrollView
          {...(isLonger ? { tabIndex: 0 as const } : {})}
          onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.height)}
          onContentSizeChange={(_width, height) => setContent(height)}
          contentContainerStyle={{ paddingHorizontal: 24, paddingBottom: 16, gap: 12 }}
        >
          {children}
        </ScrollView>
        {actions === undefined ? null : (
          <View style={{ flexDirection: isPhone ? 'column' : 'row-reverse', gap: 10, padding: 20, paddingTop: 8 }}>{actions}</View>
        )}
      </View>
    </dialog>
  );
}
