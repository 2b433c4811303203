import { describe, expect, it } from 'vitest';
import { nested } from './band-order';
import { newDraft } from './new-draft';

const band = (name: string, width: string) => ({ name, width, kind: 'absolute' as const, marks: '1' });
const worked = (bands: ({ from: string; to: string } | null)[]) => ({ label: '', key: null, derivation: null, scale: null, roundings: [], bands, electrons: [], proposedPrompt: '', maxGrains: null, problems: [] });

describe('the order of bands', () => {
  const draft = { ...newDraft(undefined), bands: [band('wide', '0.2'), band('near', '0.1')] };

  it('is that of their nesting, the innermost first', () => {
    const sorted = nested(draft, worked([{ from: '5.90', to: '6.30' }, { from: '6.00', to: '6.20' }]));
    expect(sorted.bands.map(({ name }) => name)).toEqual(['near', 'wide']);
  });

  it('leaves what is in order, or not yet worked, as the same object', () => {
    expect(nested(draft, worked([{ from: '6.00', to: '6.20' }, { from: '5.90', to: '6.30' }]))).toBe(draft);
    expect(nested(draft, worked([]))).toBe(draft);
    expect(nested(draft, worked([{ from: '6.00', to: '6.20' }, null]))).toBe(draft);
  });
});
