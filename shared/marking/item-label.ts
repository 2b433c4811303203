import { speciesText } from '../chemistry/species';
import type { Asked, AskedElectron, ItemScheme, PrintedQuestion } from './scheme';

/** Species with its charge, and electron: magnesium(2+), 2p is "Mg²⁺ 2p". A star tells a typed configuration from the ground state. */
export const electronLabel = ({ symbol, charge, electron, configuration = '' }: Omit<AskedElectron, 'configuration'> & { readonly configuration?: string | undefined }): string =>
  `${speciesText(symbol, charge)}${configuration.trim() === '' ? '' : '*'} ${electron}`;

const questionLabels: Readonly<Record<PrintedQuestion, string>> = { greatest: 'the greatest', least: 'the least', increasing: 'in increasing order', decreasing: 'in decreasing order' };

/** How an item is called beside its number: "Cl 3p", "Cl 3p less S 3p", "the greatest of 4", or what the lead calls it. */
export function itemLabel({ asked, printed }: { readonly asked: Pick<Asked, 'symbol' | 'charge' | 'electron' | 'configuration' | 'other' | 'typed'>; readonly printed?: { readonly question: PrintedQuestion; readonly options: readonly unknown[] } | null | undefined }): string {
  if (printed) return printed.question === 'greatest' || printed.question === 'least' ? `${questionLabels[printed.question]} of ${printed.options.length}` : `${printed.options.length} ${questionLabels[printed.question]}`;
  if (asked.typed) return asked.typed.label;
  return asked.other ? `${electronLabel(asked)} less ${electronLabel(asked.other)}` : electronLabel(asked);
}

/** What is asked and how, as far as a label goes. */
export type Labelled = Pick<ItemScheme, 'asked' | 'printed'>;
