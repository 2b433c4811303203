import { useState, type ReactNode, type Ref } from 'react';
import { Pressable as NativePressable, type AccessibilityRole, type StyleProp, type View, type ViewStyle } from 'react-native';

export interface PressState {
  readonly isPressed: boolean;
  readonly isHovered: boolean;
}

export interface PressableProps {
  readonly children: ReactNode | ((state: PressState) => ReactNode);
  readonly onPress: (event: PressEvent) => void;
  readonly style?: ((state: PressState) => StyleProp<ViewStyle>) | undefined;
  readonly role?: AccessibilityRole | 'option' | 'row' | undefined;
  readonly label?: string | undefined;
  readonly describedBy?: string | undefined;
  readonly isDisabled?: boolean | undefined;
  readonly isSelected?: boolean | undefined;
  readonly isPressedIn?: boolean | undefined;
  readonly isExpanded?: boolean | undefined;
  readonly isChecked?: boolean | undefined;
  /** Of several places, the one this leads to is open. */
  readonly isCurrent?: boolean | undefined;
  readonly href?: string | undefined;
  /** Of a row, in the whole list. */
  readonly rowIndex?: number | undefined;
  readonly id?: string | undefined;
  /** The id of what it opens or shows. */
  readonly controls?: string | undefined;
  readonly tabIndex?: 0 | -1 | undefined;
  /** Draw the focus line inside, where a neighbour would cut it off. */
  readonly isFocusInside?: boolean | undefined;
  readonly onKeyDown?: ((key: string, event: { preventDefault(): void }) => void) | undefined;
  readonly onLongPress?: (() => void) | undefined;
  readonly hostRef?: Ref<View> | undefined;
  readonly testID?: string | undefined;
}

/** What a press brings: enough to let the browser open a link in another tab. */
export interface PressEvent {
  preventDefault(): void;
  readonly nativeEvent: object;
}

/** Anything that can be pressed, by pointer or by keyboard, with its states told to assistive technology. */
export function Pressable({ children, onPress, style, role = 'button', isDisabled = false, ...rest }: PressableProps) {
  const [isHovered, setHovered] = useState(false);
  const [isPressed, setPressed] = useState(false);
  const state = { isHovered: isHovered && !isDisabled, isPressed };
  const { onKeyDown } = rest;
  const given = {
    ...(rest.label === undefined ? {} : { 'aria-label': rest.label }),
    ...(rest.describedBy === undefined ? {} : { 'aria-describedby': rest.describedBy }),
    ...(rest.isSelected === undefined ? {} : { 'aria-selected': rest.isSelected }),
    ...(rest.isPressedIn === undefined ? {} : { 'aria-pressed': rest.isPressedIn }),
    ...(rest.isExpanded === undefined ? {} : { 'aria-expanded': rest.isExpanded }),
    ...(rest.isChecked === undefined ? {} : { 'aria-checked': rest.isChecked }),
    ...(rest.isCurrent ? { 'aria-current': 'page' } : {}),
    ...(rest.controls === undefined ? {} : { 'aria-controls': rest.controls }),
    ...(rest.rowIndex === undefined ? {} : { 'aria-rowindex': rest.rowIndex }),
    ...(rest.href === undefined ? {} : { href: rest.href }),
    ...(rest.id === undefined ? {} : { nativeID: rest.id }),
    ...(rest.tabIndex === undefined ? {} : { tabIndex: rest.tabIndex }),
    ...(rest.isFocusInside ? { dataSet: { focus: 'inside' } } : {}),
    ...(rest.testID === undefined ? {} : { testID: rest.testID }),
    ...(onKeyDown ? { onKeyDown: (event: KeyboardEvent) => onKeyDown(event.key, event) } : {}),
  };
  return (
    <NativePressable
      {...(rest.hostRef === undefined ? {} : { ref: rest.hostRef })}
      role={role as 'button'}
      {...given}
      disabled={isDisabled}
      onPress={onPress}
      {...(rest.onLongPress === undefined ? {} : { onLongPress: rest.onLongPress })}
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
