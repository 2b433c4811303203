import { useState } from 'react';
import { View } from 'react-native';
import { elementBySymbol } from '../../chemistry/elements';
import { Icon } from '../../ui/icon';
import { Pressable } from '../../ui/pressable';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { line, radius, size } from '../../ui/tokens';
import { ElementPicker } from './element-picker';
import { words } from './words';

interface ElementFieldProps {
  readonly symbol: string;
  readonly error: string | undefined;
  readonly onChange: (symbol: string) => void;
  /** Where several stand beside each other: what this one is of. */
  readonly spokenBefore?: string | undefined;
  readonly testID: string;
}

/** The element, chosen from the periodic table or by searching it. */
export function ElementField({ symbol, error, onChange, spokenBefore = '', testID }: ElementFieldProps) {
  const colors = useColors();
  const [isOpen, setOpen] = useState(false);
  const element = elementBySymbol(symbol);
  const text = element.ok ? words.asked.elementValue(symbol, element.value.number) : symbol;
  return (
    <View>
      <Text variant="label" style={{ marginBottom: 2 }}>
        {words.asked.element}
      </Text>
      <Pressable
        onPress={() => setOpen(true)}
        label={`${spokenBefore}${words.asked.element}: ${text}${element.ok ? `, ${element.value.name}` : ''}`}
        isExpanded={isOpen}
        testID={testID}
        style={({ isHovered }) => ({
          minHeight: size.field,
          borderWidth: error ? line.focus : line.control,
          borderTopWidth: 0,
          borderColor: error ? colors.methyl : colors.rule,
          borderBottomLeftRadius: radius.vessel,
          borderBottomRightRadius: radius.vessel,
          backgroundColor: isHovered ? colors.well : colors.paper,
          paddingHorizontal: 12,
          flexDirection: 'row',
          alignItems: 'center',
          justifyContent: 'space-between',
          gap: 8,
        })}
      >
        <Text weight={500} lines={1}>
          {text}
        </Text>
        <Icon name="down" size={16} />
      </Pressable>
      {error ? (
        <Text variant="small" tone="methyl" style={{ marginTop: 4 }}>
          {error}
        </Text>
      ) : null}
      {isOpen ? (
        <ElementPicker
          chosen={symbol}
          onClose={() => setOpen(false)}
          onChoose={(next) => {
            setOpen(false);
            onChange(next);
          }}
        />
      ) : null}
    </View>
  );
}
