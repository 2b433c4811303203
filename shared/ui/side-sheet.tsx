import { useEffect, useId, useRef, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { IconButton } from './icon-button';
import { Text } from './text';
import { useColors } from './theme';
import { shadow, size } from './tokens';
import { useIsWide } from './use-breakpoint';
import { useModal } from './use-modal';

export interface SideSheetProps {
  readonly title: ReactNode;
  /** In words. */
  readonly name: string;
  /** Under the title: how it stands. */
  readonly state?: ReactNode;
  readonly onClose: () => void;
  /** To the row above and below. */
  readonly onPrevious?: (() => void) | undefined;
  readonly onNext?: (() => void) | undefined;
  /** Stays at the foot while the rest scrolls. */
  readonly foot?: ReactNode;
  /** Where a field in the sheet takes the focus itself. */
  readonly keepsFocus?: boolean | undefined;
  readonly testID?: string | undefined;
  readonly children: ReactNode;
}

/** One thing of a list, looked at closely: 412 wide beside the list on wide, the whole screen on anything smaller. */
export function SideSheet(props: SideSheetProps) {
  return useIsWide() ? <Beside {...props} /> : <Whole {...props} />;
}

function Beside(props: SideSheetProps) {
  const colors = useColors();
  const { onClose, keepsFocus = false, testID } = props;
  const heading = useId();
  const host = useRef<View>(null);
  useEffect(() => {
    const before = document.activeElement;
    if (!keepsFocus) host.current?.focus();
    return () => {
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, [keepsFocus]);
  const escape = {
    onKeyDown: (event: KeyboardEvent) => {
      if (event.key === 'Escape' && !event.defaultPrevented) onClose();
    },
  };
  return (
    <View
      ref={host}
      role="complementary"
      aria-labelledby={heading}
      tabIndex={-1}
      {...(escape as object)}
      {...(testID === undefined ? {} : { testID })}
      style={{ width: size.sheet, borderLeftWidth: 1, borderColor: colors.hair, backgroundColor: colors.paper, boxShadow: shadow.sheet, outlineWidth: 0 }}
    >
      <SheetHead {...props} heading={heading} />
      <ScrollView style={{ flex: 1 }}>{props.children}</ScrollView>
      {props.foot}
    </View>
  );
}

function Whole(props: SideSheetProps) {
  const colors = useColors();
  const heading = useId();
  const modal = useModal(props.onClose);
  return (
    <dialog
      {...modal}
      aria-labelledby={heading}
      data-testid={props.testID}
      style={{ position: 'fixed', inset: 0, width: '100%', height: '100%', maxWidth: '100%', maxHeight: '100%', boxSizing: 'border-box', margin: 0, padding: 0, border: 'none', backgroundColor: colors.paper, color: colors.ink }}
    >
      <View style={{ height: '100%' }}>
        <SheetHead {...props} heading={heading} isWhole />
        <ScrollView style={{ flex: 1 }}>{props.children}</ScrollView>
        {props.foot}
      </View>
    </dialog>
  );
}

function SheetHead({ title, name, state, onClose, onPrevious, onNext, heading, isWhole = false }: SideSheetProps & { heading: string; isWhole?: boolean }) {
  const colors = useColors();
  return (
    <View style={{ minHeight: size.topBarWide, flexDirection: 'row', alignItems: 'center', gap: 4, paddingLeft: isWhole ? 4 : 20, paddingRight: 8, paddingVertical: 4, borderBottomWidth: 1, borderColor: colors.hair }}>
      {isWhole ? <IconButton icon="back" label="Close" onPress={onClose} /> : null}
      <View style={{ flex: 1, minWidth: 0 }}>
        <Text id={heading} variant="head" level={2} label={name} lines={1}>
          {title}
        </Text>
        {state}
      </View>
      {onPrevious ? <IconButton icon="up" label="Previous" onPress={onPrevious} /> : null}
      {onNext ? <IconButton icon="down" label="Next" onPress={onNext} /> : null}
      {isWhole ? null : <IconButton icon="close" label="Close" onPress={onClose} />}
    </View>
  );
}
