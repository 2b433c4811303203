import { useState, type KeyboardEvent as ReactKeyboardEvent } from 'react';
import { View } from 'react-native';
import { elementBySymbol, elements, type ChemicalElement } from '../../chemistry/elements';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Pressable } from '../../ui/pressable';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { radius } from '../../ui/tokens';
import { useIsPhone } from '../../ui/use-breakpoint';
import { Vessel } from '../../ui/vessel';
import { placeInTable, searchElements } from './element-search';
import { words } from './words';

interface ElementPickerProps {
  readonly chosen: string;
  readonly onChoose: (symbol: string) => void;
  readonly onClose: () => void;
}

const cell = 42;
const mostListed = 30;

/** An element by typing, or from the periodic table; on a phone the table is a list. */
export function ElementPicker({ chosen, onChoose, onClose }: ElementPickerProps) {
  const isPhone = useIsPhone();
  const [text, setText] = useState('');
  const fitting = searchElements(text);
  const best = text.trim() === '' ? undefined : fitting[0];
  return (
    <Dialog
      title={words.picker.title}
      onClose={onClose}
      width={18 * cell + 64}
      testID="element-picker"
      actions={<Button onPress={onClose}>{words.picker.cancel}</Button>}
    >
      <Vessel
        label={words.picker.find}
        value={text}
        onChange={setText}
        isFocusedFirst
        maxLength={20}
        testID="find-element"
        help={fitting.length === 0 ? words.picker.none(text) : best ? `${best.number}  ${best.symbol}, ${best.name}` : undefined}
        onSubmit={() => {
          if (best) onChoose(best.symbol);
        }}
      />
      {isPhone ? (
        <ElementRows elements={fitting.slice(0, text.trim() === '' ? 118 : mostListed)} chosen={chosen} onChoose={onChoose} />
      ) : (
        <ElementTable fitting={fitting} chosen={chosen} best={best?.symbol ?? null} onChoose={onChoose} />
      )}
    </Dialog>
  );
}

interface TableProps {
  readonly fitting: readonly ChemicalElement[];
  readonly chosen: string;
  readonly best: string | null;
  readonly onChoose: (symbol: string) => void;
}

const steps: Readonly<Record<string, readonly [number, number]>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** The nearest element in a direction: along the row or column, over the gaps of the table. */
function neighbour(symbol: string, [dx, dy]: readonly [number, number]): string | null {
  const from = elementBySymbol(symbol);
  if (!from.ok) return null;
  const at = placeInTable(from.value);
  const ahead = elements
    .map((element) => ({ element, ...placeInTable(element) }))
    .filter(({ column, row }) => (dx !== 0 ? row === at.row && Math.sign(column - at.column) === dx : column === at.column && Math.sign(row - at.row) === dy))
    .sort((one, other) => Math.abs(one.column - at.column) + Math.abs(one.row - at.row) - Math.abs(other.column - at.column) - Math.abs(other.row - at.row));
  return ahead[0]?.element.symbol ?? null;
}

const focusCell = (symbol: string): void => document.querySelector<HTMLElement>(`[data-element="${symbol}"]`)?.focus();

function ElementTable({ fitting, chosen, best, onChoose }: TableProps) {
  const colors = useColors();
  const fits = new Set(fitting.map(({ symbol }) => symbol));
  const start = best ?? (chosen === '' ? 'H' : chosen);
  return (
    <View role="radiogroup" aria-label={words.picker.table} style={{ height: 9 * cell + 10, width: 18 * cell }}>
      {elements.map((element) => {
        const { symbol, name, number } = element;
        const { column, row } = placeInTable(element);
        const isChosen = symbol === chosen;
        const isBest = symbol === best;
        const keys = {
          tabIndex: symbol === start ? 0 : -1,
          role: 'radio',
          'aria-checked': isChosen,
          onClick: () => onChoose(symbol),
          onKeyDown: (event: ReactKeyboardEvent<HTMLElement>) => {
            const step = steps[event.key];
            if (step) {
              event.preventDefault();
              const next = neighbour(symbol, step);
              if (next) focusCell(next);
            } else if (event.key === 'Enter' || event.key === ' ') {
              event.preventDefault();
              onChoose(symbol);
            }
          },
        };
        return (
          <View
            key={symbol}
            {...({ ...keys, dataSet: { element: symbol } } as object)}
            aria-label={`${name}, ${number}`}
            style={{
              position: 'absolute',
              left: (column - 1) * cell,
              top: (row - 1) * cell + (row > 7 ? 10 : 0),
              width: cell - 3,
              height: cell - 3,
              borderRadius: radius.scan,
              borderWidth: isChosen || isBest ? 2 : 1,
              borderColor: isChosen || isBest ? colors.manganate : colors.hair,
              backgroundColor: isChosen ? colors.manganateFaint : colors.glass,
              opacity: fits.has(symbol) ? 1 : 0.3,
              alignItems: 'center',
              justifyContent: 'center',
              ...({ cursor: 'pointer' } as object),
            }}
          >
            <Text variant="micro" tone="ink3" style={{ fontSize: 10, lineHeight: 11 }}>
              {number}
            </Text>
            <Text variant="small" weight={600} style={{ lineHeight: 17 }}>
              {symbol}
            </Text>
          </View>
        );
      })}
    </View>
  );
}

function ElementRows({ elements: listed, chosen, onChoose }: { elements: readonly ChemicalElement[]; chosen: string; onChoose: (symbol: string) => void }) {
  const colors = useColors();
  return (
    <View>
      {listed.map(({ symbol, name, number }) => (
        <Pressable
          key={symbol}
          onPress={() => onChoose(symbol)}
          isPressedIn={symbol === chosen}
          label={`${name}, ${symbol}, ${number}`}
          style={({ isHovered }) => ({
            minHeight: 44,
            flexDirection: 'row',
            alignItems: 'center',
            gap: 12,
            borderBottomWidth: 1,
            borderColor: colors.hair,
            backgroundColor: symbol === chosen ? colors.manganateFaint : isHovered ? colors.well : 'transparent',
          })}
        >
          <Text align="right" tone="ink3" style={{ width: 36 }}>
            {number}
          </Text>
          <Text weight={600} style={{ width: 36 }}>
            {symbol}
          </Text>
          <Text>{name}</Text>
        </Pressable>
      ))}
    </View>
  );
}
