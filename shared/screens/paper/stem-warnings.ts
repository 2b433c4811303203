import type { ItemDraft } from '../../contracts/items';

export type StemWarning = 'figures' | 'convention' | 'element' | 'configuration';

const saysFigures = /decimal|whole number|significant|figure/i;
const namesConvention: Readonly<Record<ItemDraft['asked']['convention'], RegExp>> = {
  slater: /slater/i,
  'slater-035-in-1s': /slater[^]*0\.35/i,
  'slater-d-at-1': /slater[^]*(1\.00|by 1\b)/i,
  'core-count': /core|shells? below/i,
  scf: /scf|clementi|self-consistent/i,
  'ionisation-energy': /ioni[sz]ation/i,
  typed: /./,
};

const bare = (text: string): string => text.replace(/\s+/g, '');

/**
 * What a wording of one's own leaves out that decides the mark: the figures wanted, the convention, the electron asked for, the configuration where it is not the ground state.
 * "Find Z_eff for a 3p electron of Cl" lacks figures and convention.
 */
export function stemWarnings(prompt: string, { kind, asked }: Pick<ItemDraft, 'kind' | 'asked'>): StemWarning[] {
  const warnings: StemWarning[] = [];
  if (kind === 'numeric' && !saysFigures.test(prompt)) warnings.push('figures');
  if (!namesConvention[asked.convention].test(prompt)) warnings.push('convention');
  if (kind !== 'numeric') return warnings;
  if (asked.convention === 'typed') return warnings;
  const electrons = [asked, ...(asked.quantity === 'difference' && asked.other ? [asked.other] : [])];
  if (electrons.some(({ symbol, electron }) => !prompt.includes(electron) || !prompt.includes(symbol))) warnings.push('element');
  if (electrons.some(({ configuration = '' }) => !bare(prompt).includes(bare(configuration)))) warnings.push('configuration');
  return warnings;
}
