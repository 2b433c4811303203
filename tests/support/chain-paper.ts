import type { ItemDraft } from '../../shared/contracts/items';
import { itemDraft, type WantedItem } from './paper';

const chlorine = { symbol: 'Cl', charge: 0, electron: '3p', convention: 'slater' } as const;
const iron = { symbol: 'Fe', charge: 0, electron: '4s', convention: 'slater' } as const;

const follows = (from: string | undefined): ItemDraft['followThrough'] => ({ from: from ?? '', second: null, isTrivial: false });

/**
 * Sigma of Cl 3p, then its Z_eff with a method mark, then its energy; after them two quantities of Fe 4s. Energies and the
 * radius have a unit that costs half a mark once a paper. Keys by Slater, Phys. Rev. 36, 57 (1930), with 13.605693 eV and
 * 52.9177 pm (CODATA 2018), worked by hand: sigma 2 x 1.00 + 8 x 0.85 + 6 x 0.35 = 10.90; 17 - 10.90 = 6.10;
 * -13.605693 x (6.10 / 3)^2 = -56.25 eV; Fe 4s 3.75, so -13.605693 x (3.75 / 3.7)^2 = -13.98 eV and 3.7^2 / 3.75 x 52.9177 = 193.2 pm.
 */
export const chainPaper: readonly WantedItem[] = [
  itemDraft('Cl', '3p', { asked: { ...chlorine, quantity: 'sigma' }, marks: '2' }),
  ([sigma]) => itemDraft('Cl', '3p', { asked: { ...chlorine, quantity: 'zeff' }, marks: '3', followThrough: follows(sigma), methodMarks: [{ id: 'groups', text: 'Writes the groups as Slater does', marks: '1' }] }),
  ([, zeff]) => itemDraft('Cl', '3p', { asked: { ...chlorine, quantity: 'energy-ev' }, marks: '3', followThrough: follows(zeff), unitCost: '1/2' }),
  itemDraft('Fe', '4s', { asked: { ...iron, quantity: 'energy-ev' }, marks: '2', unitCost: '1/2' }),
  itemDraft('Fe', '4s', { asked: { ...iron, quantity: 'radius-pm' }, marks: '2', unitCost: '1/2' }),
];

/**
 * As someone works on who counts the electron itself, 7 x 0.35 for 6 x 0.35: sigma 11.25, 17 - 11.25 = 5.75,
 * -13.605693 x (5.75 / 3)^2 = -49.98 eV. Iron is right.
 */
export const oneErrorCarriedOn = ['11.25', '5.75', '-49.98 eV', '-13.98 eV', '193.2 pm'] as const;
export const allRight = ['10.90', '6.10', '-56.25 eV', '-13.98 eV', '193.2 pm'] as const;
