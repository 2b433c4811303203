import { expect, it } from 'vitest';
import { proposedStem } from '../../chemistry/stem';
import type { ItemDraft } from '../../contracts/items';
import { stemWarnings } from './stem-warnings';

const asked = (convention: ItemDraft['asked']['convention']): ItemDraft['asked'] => ({ symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention });

it('finds nothing missing in what the server proposes, under any convention', () => {
  for (const convention of ['slater', 'slater-035-in-1s', 'slater-d-at-1', 'core-count', 'scf', 'ionisation-energy'] as const) {
    expect(stemWarnings(proposedStem(asked(convention), 2), { kind: 'numeric', asked: asked(convention) }), convention).toEqual([]);
  }
});

it('asks for the configuration where it is not the ground state', () => {
  const excited = { ...asked('slater'), symbol: 'Ne', electron: '3s', configuration: '1s2 2s2 2p5 3s1' };
  expect(stemWarnings(proposedStem(excited, 2), { kind: 'numeric', asked: excited })).toEqual([]);
  expect(stemWarnings('By Slater’s rules, find Z_eff for a 3s electron of an Ne atom, to two decimals.', { kind: 'numeric', asked: excited })).toEqual(['configuration']);
});

it('looks for both electrons of a difference, and for none where the key is typed', () => {
  const difference = { ...asked('slater'), quantity: 'difference' as const, other: { symbol: 'Ar', charge: 0, electron: '3p' } };
  expect(stemWarnings(proposedStem(difference, 2), { kind: 'numeric', asked: difference })).toEqual([]);
  expect(stemWarnings('By Slater’s rules, what has Cl 3p more? Two decimals.', { kind: 'numeric', asked: difference })).toEqual(['element']);
  expect(stemWarnings('Find the wavelength in nm.', { kind: 'numeric', asked: { ...asked('typed'), symbol: '', electron: '' } })).toEqual(['figures']);
});

it('names what a wording leaves out', () => {
  expect(stemWarnings('Find Z_eff for a 3p electron of Cl.', { kind: 'numeric', asked: asked('slater') })).toEqual(['figures', 'convention']);
  expect(stemWarnings('By Slater’s rules, how strongly is it held? Two decimals.', { kind: 'numeric', asked: asked('slater') })).toEqual(['element']);
  expect(stemWarnings('By Slater’s rules, Cl 3p, to two decimals.', { kind: 'numeric', asked: asked('scf') })).toEqual(['convention']);
});
