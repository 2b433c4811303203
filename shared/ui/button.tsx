import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon, type IconName } from './icon';
import { KeyCap } from './key-cap';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';
import { radius, size, line, type ColorRole } from './tokens';

export type ButtonKind = 'primary' | 'quiet' | 'text' | 'danger';

export interface ButtonProps {
  readonly children: ReactNode;
  readonly onPress: () => void;
  readonly kind?: ButtonKind;
  readonly icon?: IconName;
  readonly keyCap?: string;
  readonly isLarge?: boolean;
  readonly isSmall?: boolean;
  /** Closed, with the line that says what opens it; the line may be empty where the screen says it elsewhere. */
  readonly closed?: string | undefined;
  readonly isBusy?: boolean;
  readonly isWide?: boolean;
  readonly label?: string;
  readonly isPressedIn?: boolean;
  readonly isExpanded?: boolean;
  readonly align?: 'center' | 'between';
  readonly testID?: string;
}

const tones = { primary: 'onFill', quiet: 'ink', text: 'ink', danger: 'methyl' } as const satisfies Record<ButtonKind, ColorRole>;

/** A verb that names its thing. One primary button a screen. */
export function Button(props: ButtonProps) {
  const { children, onPress, kind = 'quiet', icon, keyCap, isLarge = false, isSmall = false, closed, isBusy = false, isWide = false, align = 'center' } = props;
  const colors = useColors();
  const why = useId();
  const isClosed = closed !== undefined || isBusy;
  const tone = isClosed ? 'ink3' : tones[kind];
  return (
    <View style={isWide ? { alignSelf: 'stretch' } : null}>
      <Pressable
        onPress={onPress}
        isDisabled={isClosed}
        label={props.label}
        describedBy={closed ? why : undefined}
        isPressedIn={props.isPressedIn}
        isExpanded={props.isExpanded}
        testID={props.testID}
        style={({ isHovered, isPressed }) => ({
          minHeight: isLarge ? size.buttonLarge : isSmall ? size.touchWide : size.button,
          paddingHorizontal: kind === 'text' ? 8 : isSmall ? 12 : 16,
          borderRadius: radius.control,
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: align === 'between' ? 'space-between' : 'center',
          gap: 8,
          borderWidth: kind === 'text' ? 0 : line.control,
          borderStyle: isClosed ? 'dashed' : 'solid',
          borderColor: isClosed || kind === 'quiet' ? colors.rule : kind === 'danger' ? colors.methyl : 'transparent',
          backgroundColor: isClosed
            ? kind === 'text' ? 'transparent' : colors.well
            : kind === 'primary'
              ? isHovered || isPressed ? colors.actionDown : colors.action
              : isHovered || isPressed ? colors.well : kind === 'text' ? 'transparent' : colors.paper,
        })}
      >
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
          {icon && <Icon name={icon} tone={tone} />}
          <Text variant={isSmall ? 'small' : 'body'} weight={600} tone={tone} lines={1}>
            {children}
          </Text>
        </View>
        {keyCap !== undefined && <KeyCap isOnFill={kind === 'primary' && !isClosed}>{keyCap}</KeyCap>}
      </Pressable>
      {closed ? (
        <Text id={why} variant="small" tone="ink2" align="center" style={{ marginTop: 6 }}>
          {closed}
        </Text>
      ) : null}
    </View>
  );
}
