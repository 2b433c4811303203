import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { buttonStyle, ButtonFace, type ButtonLook } from './button-face';
import { useFollow } from './link';
import { Pressable } from './pressable';
import { Text } from './text';
import { useColors } from './theme';

export type { ButtonKind } from './button-face';

export interface ButtonProps extends ButtonLook {
  readonly children: ReactNode;
  readonly onPress: () => void;
  /** Closed, with the line that says what opens it; the line may be empty where the screen says it elsewhere. */
  readonly closed?: string | undefined;
  readonly isBusy?: boolean | undefined;
  /** As wide as what it stands in. */
  readonly isWide?: boolean | undefined;
  readonly label?: string | undefined;
  readonly isPressedIn?: boolean | undefined;
  readonly isExpanded?: boolean | undefined;
  readonly testID?: string | undefined;
}

/** A verb that names its thing. One primary button a screen. */
export function Button({ children, onPress, closed, isBusy = false, isWide = false, label, isPressedIn, isExpanded, testID, ...look }: ButtonProps) {
  const colors = useColors();
  const why = useId();
  const isClosed = closed !== undefined || isBusy;
  return (
    <View style={isWide ? { alignSelf: 'stretch' } : null}>
      <Pressable
        onPress={() => onPress()}
        isDisabled={isClosed}
        label={label}
        describedBy={closed ? why : undefined}
        isPressedIn={isPressedIn}
        isExpanded={isExpanded}
        testID={testID}
        style={(state) => buttonStyle(look, isClosed, state, colors)}
      >
        <ButtonFace look={look} isClosed={isClosed}>
          {children}
        </ButtonFace>
      </Pressable>
      {closed ? (
        <Text id={why} variant="small" tone="ink2" align="center" style={{ marginTop: 6 }}>
          {closed}
        </Text>
      ) : null}
    </View>
  );
}

export interface ButtonLinkProps extends ButtonLook {
  readonly children: ReactNode;
  readonly href: string;
  readonly isWide?: boolean | undefined;
  readonly label?: string | undefined;
  readonly testID?: string | undefined;
}

/** The look of a button for something that leads to another screen. */
export function ButtonLink({ children, href, isWide = false, label, testID, ...look }: ButtonLinkProps) {
  const colors = useColors();
  const follow = useFollow(href);
  return (
    <View style={isWide ? { alignSelf: 'stretch' } : null}>
      <Pressable role="link" href={href} onPress={follow} label={label} testID={testID} style={(state) => buttonStyle(look, false, state, colors)}>
        <ButtonFace look={look} isClosed={false}>
          {children}
        </ButtonFace>
      </Pressable>
    </View>
  );
}
