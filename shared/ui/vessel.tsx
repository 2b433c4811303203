import { useId, useState, type ReactNode, type Ref } from 'react';
import { TextInput, View, type KeyboardTypeOptions, type TextInputProps } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { faceOf, Text } from './text';
import { useColors } from './theme';
import { line, radius, size, type, type TypeStyle } from './tokens';

export interface VesselProps {
  readonly label: string;
  readonly value: string;
  readonly onChange: (text: string) => void;
  /** At the right of the label, such as the unit. */
  readonly aside?: ReactNode;
  readonly help?: string | undefined;
  /** A sentence when the content is refused. */
  readonly error?: string | undefined;
  readonly placeholder?: string;
  readonly variant?: TypeStyle;
  readonly height?: number;
  readonly isSecret?: boolean;
  readonly isReadOnly?: boolean;
  readonly lines?: number;
  readonly isLabelHidden?: boolean;
  readonly keyboard?: KeyboardTypeOptions | 'none';
  readonly autoComplete?: TextInputProps['autoComplete'];
  readonly maxLength?: number;
  readonly onSubmit?: () => void;
  readonly onKeyDown?: (key: string, event: { preventDefault(): void }) => void;
  readonly onBlur?: () => void;
  readonly isFocusedFirst?: boolean;
  /** Letters are commands of the screen while this field is empty. */
  readonly takesCommands?: boolean;
  readonly inputRef?: Ref<TextInput>;
  readonly testID?: string;
}

/** The small triangle of what is broken. */
export function BrokenSign({ size: side = 20 }: { size?: number }) {
  const colors = useColors();
  return (
    <Svg width={side} height={side} viewBox="0 0 20 20" fill="none" aria-hidden>
      <Path d="M10 3 18 16.5H2zM10 8v4M10 14.2v.01" stroke={colors.methyl} strokeWidth={1.6} strokeLinecap="round" strokeLinejoin="round" />
    </Svg>
  );
}

/** Every field: walls left, right and below, open above, the label over the opening, help below. */
export function Vessel(props: VesselProps) {
  const { label, value, onChange, aside, help, error, variant = 'body', height = size.field, isReadOnly = false, lines = 1 } = props;
  const colors = useColors();
  const [isInHand, setInHand] = useState(false);
  const below = useId();
  const wall = error ? colors.methyl : isInHand ? colors.manganate : colors.rule;
  const width = error || isInHand ? line.focus : line.control;
  // The hint speaks, so it is set in the interface's face even where the content is measured.
  const isMeasured = type[variant].face.startsWith('Mono');
  const described = error || help ? { 'aria-describedby': below } : {};
  return (
    <View style={{ alignSelf: 'stretch' }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', marginBottom: 2 }}>
        {props.isLabelHidden ? <View /> : <Text variant="label">{label}</Text>}
        {typeof aside === 'string' ? <Text variant="label" weight={400} tone="ink2">{aside}</Text> : aside}
      </View>
      <View
        style={{
          minHeight: height,
          borderWidth: width,
          borderTopWidth: 0,
          borderColor: wall,
          borderBottomLeftRadius: radius.vessel,
          borderBottomRightRadius: radius.vessel,
          backgroundColor: isReadOnly ? colors.well : colors.paper,
          paddingHorizontal: 14 - width,
          flexDirection: 'row',
          alignItems: 'center',
        }}
      >
        {isMeasured && value === '' && props.placeholder ? (
          <View style={{ position: 'absolute', left: 14, right: 14, top: 0, bottom: 0, justifyContent: 'center', pointerEvents: 'none' }}>
            <Text tone="ink3" lines={1}>
              {props.placeholder}
            </Text>
          </View>
        ) : null}
        <TextInput
          ref={props.inputRef}
          value={value}
          onChangeText={onChange}
          aria-label={label}
          {...described}
          {...(error ? ({ 'aria-invalid': true } as object) : {})}
          {...(isMeasured ? {} : { placeholder: props.placeholder ?? '', placeholderTextColor: colors.ink3 })}
          {...(isMeasured && props.placeholder ? ({ 'aria-placeholder': props.placeholder } as object) : {})}
          {...(props.takesCommands ? ({ dataSet: { commands: 'while-empty' } } as object) : {})}
          secureTextEntry={props.isSecret ?? false}
          readOnly={isReadOnly}
          multiline={lines > 1}
          numberOfLines={lines}
          {...(props.keyboard === 'none' ? { inputMode: 'none' as const } : props.keyboard ? { keyboardType: props.keyboard } : {})}
          autoComplete={props.autoComplete ?? 'off'}
          autoCapitalize="none"
          autoCorrect={false}
          spellCheck={false}
          {...(props.maxLength === undefined ? {} : { maxLength: props.maxLength })}
          autoFocus={props.isFocusedFirst ?? false}
          onFocus={() => setInHand(true)}
          onBlur={() => {
            setInHand(false);
            props.onBlur?.();
          }}
          onSubmitEditing={props.onSubmit}
          // NOTE the web knows only this older name; without it Enter takes the focus from the field.
          blurOnSubmit={false}
          onKeyPress={(event) => props.onKeyDown?.(event.nativeEvent.key, event)}
          {...(props.testID === undefined ? {} : { testID: props.testID })}
          style={{
            flex: 1,
            minWidth: 0,
            alignSelf: 'stretch',
            paddingVertical: lines > 1 ? 10 : 0,
            fontFamily: faceOf(variant),
            fontSize: type[variant].size,
            lineHeight: type[variant].line,
            color: colors.ink,
            // The walls of the vessel show the focus.
            outlineStyle: 'none' as 'solid',
            outlineWidth: 0,
          }}
        />
        {error ? <BrokenSign /> : null}
      </View>
      {error || help ? (
        <Text id={below} variant="small" tone={error ? 'methyl' : 'ink2'} style={{ marginTop: 4 }} {...(error ? { live: 'polite' as const } : {})}>
          {error ?? help}
        </Text>
      ) : null}
    </View>
  );
}
