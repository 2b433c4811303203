import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import { useColors } from './theme';
import { faces, type, type ColorRole, type Face, type TypeStyle } from './tokens';

type Tone = Extract<ColorRole, 'ink' | 'ink2' | 'ink3' | 'copper' | 'manganate' | 'iodine' | 'methyl' | 'onFill' | 'rule'>;
type Weight = 400 | 500 | 600;

export interface TextProps {
  readonly children?: ReactNode;
  readonly variant?: TypeStyle | undefined;
  readonly tone?: Tone | undefined;
  readonly weight?: Weight | undefined;
  /** Makes it a heading of that level. */
  readonly level?: 1 | 2 | 3 | undefined;
  readonly align?: 'left' | 'right' | 'center' | undefined;
  readonly lines?: number | undefined;
  /** Figures of one width, for counts that stand under each other. */
  readonly isTabular?: boolean | undefined;
  readonly live?: 'polite' | 'assertive' | undefined;
  readonly id?: string | undefined;
  readonly label?: string | undefined;
  readonly testID?: string | undefined;
  readonly style?: StyleProp<TextStyle>;
}

/** The face of a type style at another weight of the same family. */
export function faceOf(variant: TypeStyle, weight?: Weight): string {
  const { face } = type[variant];
  const family = face.startsWith('Mono') ? 'Mono' : 'Next';
  return faces[weight === undefined ? face : (`${family}${weight}` as Face)];
}

const tabular: TextStyle = { fontVariant: ['tabular-nums'] };

/** All text of the app. Interface in Next, what is measured in Mono. */
export function Text({ children, variant = 'body', tone = 'ink', weight, level, align, lines, isTabular = false, live, id, label, testID, style }: TextProps) {
  const colors = useColors();
  const { size, line, tracking } = type[variant];
  return (
    <NativeText
      {...(id === undefined ? {} : { nativeID: id })}
      {...(level === undefined ? {} : { role: 'heading' as const, 'aria-level': level })}
      {...(live === undefined ? {} : { 'aria-live': live })}
      {...(label === undefined ? {} : { 'aria-label': label })}
      {...(testID === undefined ? {} : { testID })}
      {...(lines === undefined ? {} : { numberOfLines: lines })}
      style={[
        { fontFamily: faceOf(variant, weight), fontSize: size, lineHeight: line, letterSpacing: tracking, color: colors[tone] },
        isTabular ? tabular : null,
        align === undefined ? null : { textAlign: align },
        style,
      ]}
    >
      {children}
    </NativeText>
  );
}
