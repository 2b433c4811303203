import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { occupiedElectrons, speciesOf } from '../../chemistry/configurations';
import { elementBySymbol } from '../../chemistry/elements';
import { formatConfiguration } from '../../chemistry/typed-configuration';
import type { ElectronDraft } from '../../contracts/items';
import { electronLabel } from '../../marking/item-label';
import { Checkbox } from '../../ui/checkbox';
import { Select } from '../../ui/select';
import { Text } from '../../ui/text';
import { Vessel } from '../../ui/vessel';
import { ChemText } from '../chem-text';
import { ElementField } from './element-field';
import { outermostElectron } from './new-draft';
import { words } from './words';

interface ElectronFieldsProps {
  readonly electron: ElectronDraft;
  /** How the server names its fields: `asked`, `asked.other`. */
  readonly path: string;
  readonly problemAt: (path: string) => string | undefined;
  readonly onChange: (changes: Partial<ElectronDraft>, field: string) => void;
  /** Beside the electron, such as the decimals. */
  readonly beside?: ((refusedBy: string) => ReactNode) | undefined;
  readonly besidePath?: string | undefined;
  /** Before the names of the fields, where there are several electrons. */
  readonly testPrefix?: string | undefined;
}

const charges = [-4, -3, -2, -1, 0, 1, 2, 3, 4, 5, 6, 7, 8] as const;

const chargeText = (charge: number): string => (charge > 0 ? `+${charge}` : charge < 0 ? `−${-charge}` : '0');

/** The charges that the rules for ions reach, or that leave an electron where the configuration is typed; and the one asked for in any case. */
function chargesOf({ symbol, charge: asked, configuration }: ElectronDraft): number[] {
  const element = elementBySymbol(symbol);
  const leavesOne = (charge: number): boolean => element.ok && charge < element.value.number;
  return charges.filter((charge) => charge === asked || (configuration === undefined ? occupiedElectrons(symbol, charge).ok : leavesOne(charge)));
}

/** What a typed configuration begins with: the ground state, or nothing where no rule gives it. */
export function groundText({ symbol, charge }: ElectronDraft): string {
  const species = speciesOf({ symbol, charge });
  return species.ok ? formatConfiguration(species.value.configuration) : '';
}

/** Another element, and its outermost electron where it has none like the one before. */
function ofElement({ charge, electron }: ElectronDraft, symbol: string): Partial<ElectronDraft> {
  const occupied = occupiedElectrons(symbol, charge);
  const isThere = occupied.ok && occupied.value.includes(electron);
  return { symbol, configuration: undefined, ...(isThere ? {} : { charge: 0, electron: outermostElectron(symbol) }) };
}

const fits = (grow: number, basis: number) => ({ flexGrow: grow, flexBasis: basis });

/** Element, charge and electron in a row. */
export function ElectronRow({ electron, path, problemAt, onChange, beside, besidePath, testPrefix = '', spokenBefore = '' }: ElectronFieldsProps & { readonly spokenBefore?: string }) {
  const below = useId();
  const electrons = occupiedElectrons(electron.symbol, electron.charge, electron.configuration);
  const refusal = (field: string): string | undefined => problemAt(`${path}.${field}`);
  const sentences = [refusal('charge'), refusal('electron'), besidePath === undefined ? undefined : problemAt(besidePath)].filter((sentence) => sentence !== undefined);
  return (
    <View style={{ gap: 4 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <View style={fits(2, 126)}>
          <ElementField symbol={electron.symbol} error={refusal('symbol')} onChange={(symbol) => onChange(ofElement(electron, symbol), 'symbol')} spokenBefore={spokenBefore} testID={`${testPrefix}element`} />
        </View>
        <View style={fits(1, 66)}>
          <Select
            label={words.asked.charge}
            value={String(electron.charge)}
            options={chargesOf(electron).map((charge) => ({ value: String(charge), label: chargeText(charge) }))}
            onChange={(charge) => onChange({ charge: Number(charge) }, 'charge')}
            refusedBy={refusal('charge') && below}
            testID={`${testPrefix}charge`}
          />
        </View>
        <View style={fits(1, 66)}>
          <Select
            label={words.asked.electron}
            value={electron.electron}
            options={(electrons.ok ? electrons.value : [electron.electron]).map((label) => ({ value: label, label }))}
            onChange={(next) => onChange({ electron: next }, 'electron')}
            refusedBy={refusal('electron') && below}
            testID={`${testPrefix}electron`}
          />
        </View>
        {beside ? <View style={fits(1, 66)}>{beside(below)}</View> : null}
      </View>
      {sentences.length > 0 ? (
        <Text id={below} variant="small" tone="methyl" live="polite">
          {sentences.join(' ')}
        </Text>
      ) : null}
    </View>
  );
}

/** A configuration of the lead's own, with the star it puts beside the species. */
export function ConfigurationField({ electron, path, problemAt, onChange, testPrefix = '' }: ElectronFieldsProps) {
  if (electron.configuration === undefined) return null;
  return (
    <View style={{ gap: 4 }}>
      <Vessel
        label={words.asked.configuration}
        help={words.asked.configurationHelp}
        value={electron.configuration}
        onChange={(configuration) => onChange({ configuration }, 'configuration')}
        error={problemAt(`${path}.configuration`)}
        variant="reading"
        maxLength={160}
        testID={`${testPrefix}configuration`}
      />
      {electron.configuration.trim() === '' ? null : (
        <Text variant="small" tone="ink2" testID={`${testPrefix}star`}>
          <ChemText beside="small">{words.star(electronLabel(electron))}</ChemText>
        </Text>
      )}
    </View>
  );
}

/** An electron with its species, and the configuration where it is not the ground state. */
export function ElectronFields(props: ElectronFieldsProps) {
  const { electron, onChange, testPrefix = '' } = props;
  return (
    <View style={{ gap: 8 }}>
      <ElectronRow {...props} />
      <Checkbox isChecked={electron.configuration !== undefined} onChange={(isOther) => onChange({ configuration: isOther ? groundText(electron) : undefined }, 'configuration')} testID={`${testPrefix}other-configuration`}>
        {words.asked.isOther}
      </Checkbox>
      <ConfigurationField {...props} />
    </View>
  );
}
