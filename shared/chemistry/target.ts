import { speciesOf } from './configurations';
import type { Species, SpeciesAsked } from './configurations';
import { found, refused } from './result';
import type { Result } from './result';
import { speciesText } from './species';
import { isSameSubshell, parseSubshell, subshellLabel } from './subshells';
import type { Subshell } from './subshells';
import { formatConfiguration } from './typed-configuration';

export interface ElectronAsked extends SpeciesAsked {
  /** Such as `3p`. */
  readonly electron: string;
}

export interface Target {
  readonly species: Species;
  readonly electron: Subshell;
}

/** Species and electron of an item; refused where the subshell is empty: iron has no 4p electron in its ground state. */
export function targetOf(asked: ElectronAsked): Result<Target> {
  const species = speciesOf(asked);
  if (!species.ok) return species;
  const electron = parseSubshell(asked.electron);
  if (!electron.ok) return electron;
  const { element, charge, configuration, isTyped } = species.value;
  if (configuration.some((occupation) => isSameSubshell(occupation, electron.value))) return found({ species: species.value, electron: electron.value });
  const label = subshellLabel(electron.value);
  if (isTyped) return refused('empty-subshell', `The configuration ${formatConfiguration(configuration)} has no ${label} electron.`);
  const name = charge === 0 ? element.name : speciesText(element.symbol, charge);
  return refused('empty-subshell', `${name} has no ${label} electron in its ground state.`);
}
