import { readDraft } from '../../server/services/drafts/read-draft';
import { schemeHash } from '../../server/services/schemes';
import type { ItemScheme } from '../../shared/marking/scheme';

/** Chlorine 3p by Slater's rules: key 6.10 with its one-decimal roundings, and one band so that every rule is tried. */
export function benchScheme(): { scheme: ItemScheme; hash: string } {
  const scheme: ItemScheme = {
    kind: 'numeric',
    asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' },
    maxGrains: 3600,
    key: { value: '61/10', text: '6.10', decimals: 2 },
    units: [],
    roundings: { downToDecimals: 1, truncation: false },
    alternatives: [],
    bands: [{ name: 'near', kind: 'absolute', width: '1/20', grains: 1200 }],
    crossedOut: 'ask',
    twoAnswers: 'ask',
  };
  return { scheme, hash: schemeHash(scheme) };
}

/** The orbital energy of the same electron, worked again from the candidate's own Z_eff where an earlier item asks for it. */
export function followingScheme(from: string): ItemScheme {
  const { scheme } = readDraft(
    {
      kind: 'numeric',
      asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' },
      printed: null,
      decimals: 2,
      figures: 4,
      prompt: null,
      marks: '3',
      roundings: { downToDecimals: null, downToFigures: 3, truncation: false },
      bands: [{ name: 'near', kind: 'relative', width: '1', marks: '1' }],
      alternatives: [],
      slips: [],
      followThrough: { from, second: null, isTrivial: false },
      methodMarks: [],
      unitCost: null,
      signCost: null,
      crossedOut: 'ask',
      twoAnswers: 'ask',
    },
    { items: [{ id: from, number: 1, scheme: benchScheme().scheme }], number: 2 },
  );
  if (!scheme) throw new Error('The item that follows cannot be worked.');
  return scheme;
}
