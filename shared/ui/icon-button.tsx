import { Icon, type IconName } from './icon';
import { Link } from './link';
import { Pressable, type PressState } from './pressable';
import { useColors } from './theme';
import { radius, size, type ColorRole, type Colors } from './tokens';
import { useIsWide } from './use-breakpoint';

interface IconButtonProps {
  readonly icon: IconName;
  /** The word for it: spoken, and shown on hovering. */
  readonly label: string;
  readonly onPress: () => void;
  readonly tone?: ColorRole | undefined;
  readonly isDisabled?: boolean | undefined;
  readonly isPressedIn?: boolean | undefined;
  readonly isExpanded?: boolean | undefined;
  readonly testID?: string | undefined;
}

const styleOf = (side: number, colors: Colors) => ({ isHovered, isPressed }: PressState) => ({
  width: side,
  height: side,
  alignItems: 'center' as const,
  justifyContent: 'center' as const,
  borderRadius: radius.control,
  backgroundColor: isHovered || isPressed ? colors.well : 'transparent',
});

/** An icon that can be pressed: 44 across on touch, 36 on wide. */
export function IconButton({ icon, label, onPress, tone = 'ink', isDisabled, isPressedIn, isExpanded, testID }: IconButtonProps) {
  const colors = useColors();
  const side = useIsWide() ? size.touchWide : size.touch;
  return (
    <Pressable onPress={() => onPress()} label={label} isDisabled={isDisabled} isPressedIn={isPressedIn} isExpanded={isExpanded} testID={testID} style={styleOf(side, colors)}>
      <Icon name={icon} tone={isDisabled ? 'rule' : tone} />
    </Pressable>
  );
}

/** The same, leading somewhere. */
export function IconLink({ icon, label, href, tone = 'ink', testID }: { icon: IconName; label: string; href: string; tone?: ColorRole; testID?: string }) {
  const colors = useColors();
  const side = useIsWide() ? size.touchWide : size.touch;
  return (
    <Link href={href} label={label} testID={testID} style={styleOf(side, colors)}>
      <Icon name={icon} tone={tone} />
    </Link>
  );
}
