import { describe, expect, it } from 'vitest';
import { newDraft, outermostElectron } from './new-draft';

describe('a new item', () => {
  it('begins with lithium and goes on to the next element', () => {
    const first = newDraft(undefined);
    expect(first.asked).toMatchObject({ symbol: 'Li', electron: '2s', quantity: 'zeff' });
    expect(newDraft({ ...first, marks: '2' })).toMatchObject({ asked: { symbol: 'Be', electron: '2s' }, marks: '2', bands: [] });
  });

  it('asks for the outermost electron', () => {
    expect(outermostElectron('Cl')).toBe('3p');
    expect(outermostElectron('Fe')).toBe('4s');
    expect(outermostElectron('Fe', 2)).toBe('3d');
  });
});
