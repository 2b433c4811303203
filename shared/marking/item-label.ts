import { speciesText } from '../chemistry/species';
import type { Asked } from './scheme';

/** Species with its charge, and electron: how an item is called beside its number. Magnesium(2+), 2p is "Mg²⁺ 2p". */
export const itemLabel = ({ symbol, charge, electron }: Pick<Asked, 'symbol' | 'charge' | 'electron'>): string => `${speciesText(symbol, charge)} ${electron}`;
