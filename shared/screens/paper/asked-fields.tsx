import { useId, useState } from 'react';
import { View } from 'react-native';
import { occupiedElectrons, speciesOf } from '../../chemistry/configurations';
import { elementBySymbol } from '../../chemistry/elements';
import { formatConfiguration } from '../../chemistry/typed-configuration';
import type { ItemDraft } from '../../contracts/items';
import { Checkbox } from '../../ui/checkbox';
import { Icon } from '../../ui/icon';
import { Pressable } from '../../ui/pressable';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { useColors } from '../../ui/theme';
import { line, radius, size } from '../../ui/tokens';
import { Vessel } from '../../ui/vessel';
import { ElementPicker } from './element-picker';
import { words } from './words';

interface AskedFieldsProps {
  readonly draft: ItemDraft;
  /** The key is no short decimal, so that the question states its figures. */
  readonly hasFigures: boolean;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (draft: ItemDraft, field: string) => void;
}

const charges = [-4, -3, -2, -1, 0, 1, 2, 3, 4, 5, 6, 7, 8] as const;
const decimals = ['0', '1', '2', '3', '4'] as const;

const quantityOrder = ['zeff', 'sigma', 'energy-ev', 'energy-kj-mol', 'radius-pm', 'electronegativity'] as const satisfies readonly ItemDraft['asked']['quantity'][];

/** What follows from Z_eff is worked out from Slater’s rules only. */
const isFollowed = (quantity: ItemDraft['asked']['quantity']): boolean => quantity !== 'zeff' && quantity !== 'sigma';
const figuresOffered = [2, 3, 4, 5, 6] as const;

const conventionOrder = ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count', 'scf', 'ionisation-energy'] as const satisfies readonly ItemDraft['asked']['convention'][];

const chargeText = (charge: number): string => (charge > 0 ? `+${charge}` : charge < 0 ? `−${-charge}` : '0');

/** The charges that the rules for ions reach, or that leave an electron where the configuration is typed; and the one asked for in any case. */
function chargesOf({ symbol, charge: asked, configuration }: ItemDraft['asked']): number[] {
  const element = elementBySymbol(symbol);
  const leavesOne = (charge: number): boolean => element.ok && charge < element.value.number;
  return charges.filter((charge) => charge === asked || (configuration === undefined ? occupiedElectrons(symbol, charge).ok : leavesOne(charge)));
}

/** What a typed configuration begins with: the ground state, or nothing where no rule gives it. */
function groundText({ symbol, charge }: ItemDraft['asked']): string {
  const species = speciesOf({ symbol, charge });
  return species.ok ? formatConfiguration(species.value.configuration) : '';
}

/** What the item asks for: quantity, element, charge, electron, decimals, marks. */
export function AskedFields({ draft, hasFigures, problemAt, onChange }: AskedFieldsProps) {
  const { asked } = draft;
  const put = (changes: Partial<ItemDraft['asked']>, field: string) => onChange({ ...draft, asked: { ...asked, ...changes } }, field);
  const electrons = occupiedElectrons(asked.symbol, asked.charge, asked.configuration);
  const below = useId();
  const sentences = ['asked.charge', 'asked.electron', 'decimals'].map(problemAt).filter((sentence) => sentence !== undefined);
  return (
    <View style={{ gap: 12 }}>
      <Text variant="head" level={2}>
        {words.asked.title}
      </Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <View style={{ flexGrow: 1, flexBasis: 100 }}>
          <Select
            label={words.asked.quantity}
            value={asked.quantity}
            options={quantityOrder.map((value) => ({ value, label: words.asked.quantities[value] }))}
            onChange={(quantity) => put({ quantity, ...(quantity === 'electronegativity' ? { radiusAngstrom: asked.radiusAngstrom ?? '1.00', countsItself: asked.countsItself ?? false } : {}), ...(isFollowed(quantity) ? { convention: 'slater' } : {}) }, 'quantity')}
            testID="quantity"
          />
        </View>
        <View style={{ flexGrow: 2, flexBasis: 116 }}>
          <Select
            label={words.asked.convention}
            value={asked.convention}
            options={conventionOrder.map((value) => ({ value, label: words.asked.conventions[value] }))}
            onChange={(convention) => onChange({ ...draft, asked: { ...asked, convention }, decimals: convention === 'scf' ? 4 : asked.convention === 'scf' ? 2 : draft.decimals }, 'convention')}
            testID="convention"
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 76 }}>
          <Vessel
            label={words.asked.marks}
            value={draft.marks}
            onChange={(marks) => onChange({ ...draft, marks }, 'marks')}
            error={problemAt('marks')}
            variant="reading"
            maxLength={16}
            testID="marks"
          />
        </View>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <View style={{ flexGrow: 2, flexBasis: 126 }}>
          <ElementField symbol={asked.symbol} error={problemAt('asked.symbol')} onChange={(symbol) => put({ symbol, configuration: undefined }, 'symbol')} />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 66 }}>
          <Select
            label={words.asked.charge}
            value={String(asked.charge)}
            options={chargesOf(asked).map((charge) => ({ value: String(charge), label: chargeText(charge) }))}
            onChange={(charge) => put({ charge: Number(charge) }, 'charge')}
            refusedBy={problemAt('asked.charge') && below}
            testID="charge"
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 66 }}>
          <Select
            label={words.asked.electron}
            value={asked.electron}
            options={(electrons.ok ? electrons.value : [asked.electron]).map((electron) => ({ value: electron, label: electron }))}
            onChange={(electron) => put({ electron }, 'electron')}
            refusedBy={problemAt('asked.electron') && below}
            testID="electron"
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 66 }}>
          {hasFigures ? (
            <Select
              label={words.asked.figures}
              value={String(draft.figures)}
              options={figuresOffered.map((value) => ({ value: String(value), label: String(value) }))}
              onChange={(value) => onChange({ ...draft, figures: Number(value) }, 'figures')}
              testID="figures"
            />
          ) : (
            <Select
              label={words.asked.decimals}
              value={String(draft.decimals)}
              options={decimals.map((value) => ({ value, label: value }))}
              onChange={(value) => onChange({ ...draft, decimals: Number(value) }, 'decimals')}
              refusedBy={problemAt('decimals') && below}
              testID="decimals"
            />
          )}
        </View>
      </View>
      <Checkbox isChecked={asked.configuration !== undefined} onChange={(isOther) => put({ configuration: isOther ? groundText(asked) : undefined }, 'configuration')} testID="other-configuration">
        {words.asked.isOther}
      </Checkbox>
      {asked.configuration === undefined ? null : (
        <Vessel
          label={words.asked.configuration}
          help={words.asked.configurationHelp}
          value={asked.configuration}
          onChange={(configuration) => put({ configuration }, 'configuration')}
          error={problemAt('asked.configuration')}
          variant="reading"
          maxLength={160}
          testID="configuration"
        />
      )}
      {asked.quantity === 'electronegativity' ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: 10 }}>
          <View style={{ width: 110 }}>
            <Vessel label={words.asked.radius} value={asked.radiusAngstrom ?? ''} onChange={(radiusAngstrom) => put({ radiusAngstrom }, 'radius')} variant="reading" maxLength={12} testID="radius" />
          </View>
          <Checkbox isChecked={asked.countsItself ?? false} onChange={(countsItself) => put({ countsItself }, 'counts-itself')}>
            {words.asked.countsItself}
          </Checkbox>
        </View>
      ) : null}
      {sentences.length > 0 ? (
        <Text id={below} variant="small" tone="methyl" live="polite">
          {sentences.join(' ')}
        </Text>
      ) : null}
    </View>
  );
}

/** The element, chosen from the periodic table or by searching it. */
function ElementField({ symbol, error, onChange }: { symbol: string; error: string | undefined; onChange: (symbol: string) => void }) {
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
        label={`${words.asked.element}: ${text}${element.ok ? `, ${element.value.name}` : ''}`}
        isExpanded={isOpen}
        testID="element"
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
