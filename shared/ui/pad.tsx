import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { Icon } from './icon';
import { PadKey } from './pad-key';
import { useColors } from './theme';
import { safeFoot } from './safe-area';
import { size } from './tokens';

export interface PadAction {
  readonly label: string;
  readonly onPress: () => void;
  readonly isPrimary?: boolean | undefined;
  readonly isClosed?: boolean | undefined;
  readonly testID?: string | undefined;
}

export interface PadSign {
  readonly label: string;
  /** What it types, where that is not its label. */
  readonly text?: string | undefined;
  readonly spoken?: string | undefined;
}

interface PadProps {
  /** The vessel, at the top beside the delete key. */
  readonly field: ReactNode;
  readonly onType: (text: string) => void;
  readonly onDelete: () => void;
  /** Held longer, the delete key empties the field. */
  readonly onEmpty: () => void;
  /** Two above and one below the key of signs; the last is the one that goes on. */
  readonly actions: readonly [PadAction, PadAction, PadAction];
  /** Behind one key: comma, slash, plus, e, ×10 and the unit; with none there is no such key. */
  readonly signs: readonly PadSign[];
  /** Digits and a space, and nothing else. */
  readonly isWhole?: boolean | undefined;
  readonly side?: 'right' | 'left' | undefined;
}

const digits = [['1', '2', '3'], ['4', '5', '6'], ['7', '8', '9']] as const;
const lastRow = ['.', '0', '−'] as const;
const space: PadSign = { label: 'space', text: ' ' };
const spokenOf: Readonly<Record<string, string>> = { '.': 'point', '−': 'minus' };
const gap = 7;

/** The keypad of a phone: four rows of digits, the action keys under the thumb at the right or left. */
export function Pad({ field, onType, onDelete, onEmpty, actions, signs, isWhole = false, side = 'right' }: PadProps) {
  const colors = useColors();
  const [areSignsOpen, setSignsOpen] = useState(false);
  const [first, second, last] = actions;
  const direction = side === 'right' ? 'row' : 'row-reverse';
  const signed = (row: readonly string[]): PadSign[] => row.map((label) => ({ label, spoken: spokenOf[label] }));
  const rows: readonly (readonly PadSign[])[] = areSignsOpen ? inThrees(signs) : [...digits.map(signed), isWhole ? [space, ...signed(['0'])] : signed(lastRow)];
  const type = (sign: PadSign) => {
    onType(sign.text ?? sign.label);
    setSignsOpen(false);
  };
  return (
    // NOTE a press on a key would take the focus from the field, and with it the place of the cursor.
    <View {...({ onMouseDown: keepFocus } as object)} style={{ paddingHorizontal: 12, paddingTop: 6, paddingBottom: safeFoot, backgroundColor: colors.bench, borderTopWidth: 1, borderColor: colors.hair }}>
      <View style={{ flexDirection: direction, alignItems: 'flex-end', gap, marginBottom: gap }}>
        <View style={{ flex: 3 }}>{field}</View>
        <View style={{ flex: 1.18 }}>
          <PadKey label="Delete" onPress={onDelete} onLongPress={onEmpty} kind="function" height={size.fieldReading}>
            <Icon name="delete" tone="ink" size={24} />
          </PadKey>
        </View>
      </View>
      <View role="group" aria-label="Keypad" style={{ flexDirection: direction, gap, paddingBottom: 12 }}>
        <View style={{ flex: 3, gap }}>
          {rows.map((row, index) => (
            <View key={index} style={{ flexDirection: 'row', gap, height: size.padKey }}>
              {row.map((sign) => (
                <PadKey key={sign.label} label={sign.spoken ?? sign.label} onPress={() => type(sign)} text={sign.label} isSmall={sign.label.length > 2} />
              ))}
              {Array.from({ length: 3 - row.length }, (_, empty) => (
                <View key={empty} style={{ flex: 1 }} />
              ))}
            </View>
          ))}
        </View>
        <View style={{ flex: 1.18, gap }}>
          {[first, second].map(({ label, onPress, isClosed, testID }) => (
            <PadKey key={label} label={label} onPress={onPress} kind="function" words={label} isClosed={isClosed} testID={testID} />
          ))}
          {signs.length === 0 ? null : (
            <PadKey label={areSignsOpen ? 'Digits 0–9' : 'Other signs, ,/+e'} onPress={() => setSignsOpen(!areSignsOpen)} kind="function" isExpanded={areSignsOpen} words={areSignsOpen ? '0–9' : ',/+e'} isMeasured>
              <Icon name={areSignsOpen ? 'down' : 'up'} size={16} />
            </PadKey>
          )}
          <PadKey label={last.label} onPress={last.onPress} kind={last.isPrimary === false ? 'function' : 'primary'} words={last.label} isClosed={last.isClosed} height={signs.length === 0 ? size.padKey * 2 + gap : size.padKey} testID={last.testID} />
        </View>
      </View>
    </View>
  );
}

const keepFocus = (event: { preventDefault(): void }) => event.preventDefault();

/** Always four rows, so that the pad keeps its height. */
function inThrees(signs: readonly PadSign[]): PadSign[][] {
  return Array.from({ length: 4 }, (_, row) => signs.slice(row * 3, row * 3 + 3));
}
