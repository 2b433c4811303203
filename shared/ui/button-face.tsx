import type { ReactNode } from 'react';
import { View, type ViewStyle } from 'react-native';
import { Icon, type IconName } from './icon';
import { KeyCap } from './key-cap';
import type { PressState } from './pressable';
import { Text } from './text';
import { line, radius, size, type ColorRole, type Colors } from './tokens';

/** Quiet buttons in methyl discard, in iodine they raise a doubt. */
export type ButtonKind = 'primary' | 'quiet' | 'text' | 'danger' | 'caution';

export interface ButtonLook {
  readonly kind?: ButtonKind | undefined;
  readonly icon?: IconName | undefined;
  /** At the end, such as the arrow of a way on. */
  readonly iconAfter?: IconName | undefined;
  readonly keyCap?: string | undefined;
  readonly isLarge?: boolean | undefined;
  readonly isSmall?: boolean | undefined;
  readonly align?: 'center' | 'between' | undefined;
}

const tones = { primary: 'onFill', quiet: 'ink', text: 'ink', danger: 'methyl', caution: 'iodine' } as const satisfies Record<ButtonKind, ColorRole>;
const walls = { primary: 'action', quiet: 'rule', text: 'rule', danger: 'methyl', caution: 'iodine' } as const satisfies Record<ButtonKind, ColorRole>;

function ground(kind: ButtonKind, isClosed: boolean, isDown: boolean, colors: Colors): string {
  if (kind === 'text') return isDown ? colors.well : 'transparent';
  if (isClosed) return colors.well;
  if (kind === 'primary') return isDown ? colors.actionDown : colors.action;
  return isDown ? colors.well : colors.paper;
}

export function buttonStyle({ kind = 'quiet', isLarge = false, isSmall = false, align = 'center' }: ButtonLook, isClosed: boolean, { isHovered, isPressed }: PressState, colors: Colors): ViewStyle {
  const isDown = isHovered || isPressed;
  return {
    paddingVertical: 4,
    minHeight: isLarge ? size.buttonLarge : isSmall ? size.touchWide : size.button,
    paddingHorizontal: kind === 'text' ? 8 : isSmall ? (align === 'between' ? 10 : 12) : 16,
    borderRadius: radius.control,
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: align === 'between' ? 'space-between' : 'center',
    gap: isSmall ? 6 : 10,
    borderWidth: kind === 'text' ? 0 : line.control,
    borderStyle: isClosed ? 'dashed' : 'solid',
    borderColor: isClosed ? colors.rule : kind === 'primary' && isDown ? colors.actionDown : colors[walls[kind]],
    backgroundColor: ground(kind, isClosed, isDown && !isClosed, colors),
  };
}

export function ButtonFace({ look, isClosed, children }: { look: ButtonLook; isClosed: boolean; children: ReactNode }) {
  const { kind = 'quiet', icon, iconAfter, keyCap, isSmall = false } = look;
  const tone = isClosed ? 'ink3' : tones[kind];
  return (
    <>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, flexShrink: 1, minWidth: 0 }}>
        {icon && <Icon name={icon} tone={tone} />}
        <Text variant={isSmall ? 'small' : 'body'} weight={600} tone={tone} align={look.align === 'between' ? 'left' : 'center'} style={{ flexShrink: 1 }}>
          {children}
        </Text>
        {iconAfter && <Icon name={iconAfter} tone={tone} size={16} />}
      </View>
      {keyCap !== undefined && <KeyCap isOnFill={kind === 'primary' && !isClosed}>{keyCap}</KeyCap>}
    </>
  );
}
