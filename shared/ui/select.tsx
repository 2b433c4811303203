import { useId, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './icon';
import { Text, faceOf } from './text';
import { useColors } from './theme';
import { line, radius, size, type } from './tokens';

export interface SelectOption<Value extends string> {
  readonly value: Value;
  readonly label: string;
}

interface SelectProps<Value extends string> {
  readonly label: string;
  readonly value: Value;
  readonly options: readonly SelectOption<Value>[];
  readonly onChange: (value: Value) => void;
  readonly help?: string | undefined;
  readonly error?: string | undefined;
  /** Refused, with the sentence elsewhere: the id of the text that says it. */
  readonly refusedBy?: string | undefined;
  readonly isLabelHidden?: boolean;
  /** In a row of a table: no walls until it is in hand. */
  readonly isBare?: boolean;
  readonly height?: number;
  readonly glyph?: ReactNode;
  readonly testID?: string;
}

/** A vessel whose content is chosen from a closed list, by the browser's own picker: keyboard, phone and screen reader know it. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { label, value, options, onChange, help, error, isLabelHidden = false, isBare = false, height = size.field, glyph } = props;
  const colors = useColors();
  const below = useId();
  const [isInHand, setInHand] = useState(false);
  const isRefused = error !== undefined || props.refusedBy !== undefined;
  const wall = isRefused ? colors.methyl : isInHand ? colors.manganate : isBare ? 'transparent' : colors.rule;
  const width = isRefused || isInHand ? line.focus : line.control;
  const isKnown = options.some((option) => option.value === value);
  return (
    <View style={{ alignSelf: 'stretch' }}>
      {isLabelHidden ? null : (
        <Text variant="label" style={{ marginBottom: 2 }}>
          {label}
        </Text>
      )}
      <View
        style={{
          minHeight: height,
          borderWidth: width,
          borderTopWidth: 0,
          borderColor: wall,
          borderBottomLeftRadius: radius.vessel,
          borderBottomRightRadius: radius.vessel,
          backgroundColor: isBare ? 'transparent' : colors.paper,
          flexDirection: 'row',
          alignItems: 'center',
          paddingLeft: (isBare ? 6 : 12) - width,
          paddingRight: 8 - width,
          gap: isBare ? 8 : 4,
        }}
      >
        {glyph}
        <select
          aria-label={label}
          aria-invalid={isRefused ? true : undefined}
          aria-describedby={props.refusedBy ?? (error || help ? below : undefined)}
          value={value}
          onChange={(event) => onChange(event.target.value as Value)}
          onFocus={() => setInHand(true)}
          onBlur={() => setInHand(false)}
          data-testid={props.testID}
          style={{
            appearance: 'none',
            flex: 1,
            minWidth: 0,
            alignSelf: 'stretch',
            border: 'none',
            outline: 'none',
            padding: 0,
            margin: 0,
            backgroundColor: 'transparent',
            color: colors.ink,
            fontFamily: faceOf('body'),
            fontSize: isBare ? type.small.size : type.body.size,
            textOverflow: 'ellipsis',
            cursor: 'pointer',
          }}
        >
          {isKnown ? null : <option value={value}>{value}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} style={{ color: colors.ink, backgroundColor: colors.paper }}>
              {option.label}
            </option>
          ))}
        </select>
        <View style={{ pointerEvents: 'none' }}>
          <Icon name="down" size={16} />
        </View>
      </View>
      {error || help ? (
        <Text id={below} variant="small" tone={error ? 'methyl' : 'ink2'} style={{ marginTop: 4 }} {...(error ? { live: 'polite' as const } : {})}>
          {error ?? help}
        </Text>
      ) : null}
    </View>
  );
}
