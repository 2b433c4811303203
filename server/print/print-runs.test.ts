import { expect, it } from 'vitest';
import { printRuns } from './print-runs';

it('sets quantities and raised figures in the fount of symbols, the rest as it is', () => {
  expect(printRuns('find Z_eff of Mg²⁺, σ = 4.15')).toEqual([
    { style: 'plain', text: 'find ' },
    { style: 'symbol', text: 'Z' },
    { style: 'subscript', text: 'eff' },
    { style: 'plain', text: ' of Mg' },
    { style: 'symbol', text: '²⁺' },
    { style: 'plain', text: ', ' },
    { style: 'symbol', text: 'σ' },
    { style: 'plain', text: ' = 4.15' },
  ]);
});

it('leaves plain text in one piece, and an empty one too', () => {
  expect(printRuns('6 × 0.35 = 2.10')).toEqual([{ style: 'plain', text: '6 × 0.35 = 2.10' }]);
  expect(printRuns('')).toEqual([{ style: 'plain', text: '' }]);
  expect(printRuns('3d → 4s')).toEqual([{ style: 'plain', text: '3d to 4s' }]);
});
