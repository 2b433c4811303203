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
