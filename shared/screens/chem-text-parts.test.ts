import { describe, expect, it } from 'vitest';
import { chemParts, plainChem } from './chem-text-parts';

describe('text with symbols of chemistry', () => {
  it('sets Z_eff, raised charges and orbital letters apart', () => {
    expect(chemParts('find Z_eff for a 3d electron of an Fe²⁺ ion')).toEqual([
      { kind: 'plain', text: 'find ' },
      { kind: 'zeff' },
      { kind: 'plain', text: ' for a ' },
      { kind: 'plain', text: '3' },
      { kind: 'symbol', text: 'd' },
      { kind: 'plain', text: ' electron of an Fe' },
      { kind: 'raised', text: '2+' },
      { kind: 'plain', text: ' ion' },
    ]);
  });

  it('is plain where only plain text can stand', () => {
    expect(plainChem('Z_eff of Mg²⁺ 2p')).toBe('Zeff of Mg2+ 2p');
  });

  it('leaves other text whole', () => {
    expect(chemParts('3 days, 12s and 4sp')).toEqual([{ kind: 'plain', text: '3 days, 12s and 4sp' }]);
    expect(chemParts('')).toEqual([]);
  });
});
