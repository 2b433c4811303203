import { useState, type ReactNode } from 'react';
import { Pressable as NativePressable, type AccessibilityRole, type StyleProp, type ViewStyle } from 'react-native';

export interface PressState {
  readonly isPressed: boolean;
  readonly isHovered: boolean;
}

interface PressableProps {
  readonly children: ReactNode | ((state: PressState) => ReactNode);
  readonly onPress: () => void;
  readonly style?: (state: PressState) => StyleProp<ViewStyle>;
  readonly role?: AccessibilityRole | 'option' | 'row';
  readonly label?: string | undefined;
  readonly describedBy?: string | undefined;
  readonly isDisabled?: boolean;
  readonly isSelected?: boolean | undefined;
  readonly isPressedIn?: boolean | undefined;
  readonly isExpanded?: boolean | undefined;
  readonly isChecked?: boolean | undefined;
  readonly testID?: string | undefined;
}

/** Anything that can be pressed, by pointer or by keyboard, with its states told to assistive technology. */
export function Pressable({ children, onPress, style, role = 'button', label, describedBy, isDisabled = false, isSelected, isPressedIn, isExpanded, isChecked, testID }: PressableProps) {
  const [isHovered, setHovered] = useState(false);
  const [isPressed, setPressed] = useState(false);
  const state = { isHovered: isHovered && !isDisabled, isPressed };
  const aria = {
    ...(label === undefined ? {} : { 'aria-label': label }),
    ...(describedBy === undefined ? {} : { 'aria-describedby': describedBy }),
    ...(isSelected === undefined ? {} : { 'aria-selected': isSelected }),
    ...(isPressedIn === undefined ? {} : { 'aria-pressed': isPressedIn }),
    ...(isExpanded === undefined ? {} : { 'aria-expanded': isExpanded }),
    ...(isChecked === undefined ? {} : { 'aria-checked': isChecked }),
    ...(testID === undefined ? {} : { testID }),
  };
  return (
    <NativePressable
      role={role as 'button'}
      {...aria}
      disabled={isDisabled}
      onPress={onPress}
      onHoverIn={() => setHovered(true)}
      onHoverOut={() => setHovered(false)}
      onPressIn={() => setPressed(true)}
      onPressOut={() => setPressed(false)}
      style={style?.(state)}
    >
      {typeof children === 'function' ? children(state) : children}
    </NativePressable>
  );
}
