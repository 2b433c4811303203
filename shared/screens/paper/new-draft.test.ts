import { describe, expect, it } from 'vitest';
import { newDraft, outermostElectron } from './new-draft';

describe('a new item', () => {
  it('begins with lithium and goes on to the next element', () => {
    const first = newDraft(undefined);
    expect(first.asked).toMatchObject({ symbol: 'Li', electron: '2s', quantity: 'zeff' });
    expect(newDraft({ ...first, marks: '2' })).toMatchObject({ asked: { symbol: 'Be', electron: '2s' }, marks: '2', bands: [] });
  });

  it('goes on after the last option, and does not ask again for what needs more than an electron', () => {
    const first = newDraft(undefined);
    const options = ['O', 'F'].map((symbol) => ({ symbol, charge: 0, electron: '2p' }));
    expect(newDraft({ ...first, kind: 'choice', decimals: 0, printed: { question: 'greatest', options, partMarks: [] } })).toMatchObject({ kind: 'numeric', printed: null, decimals: 2, asked: { symbol: 'Ne', electron: '2p' } });
    expect(newDraft({ ...first, asked: { ...first.asked, quantity: 'electronegativity', radiusAngstrom: '1.00' } }).asked.quantity).toBe('zeff');
  });

  it('asks for the outermost electron', () => {
    expect(outermostElectron('Cl')).toBe('3p');
    expect(outermostElectron('Fe')).toBe('4s');
    expect(outermostElectron('Fe', 2)).toBe('3d');
  });
});
