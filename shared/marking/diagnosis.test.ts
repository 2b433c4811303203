import { expect, it } from 'vitest';
import { slipsThatFit, strongestFirst } from './diagnosis';
import { readAnswer } from './read-answer';
import { defaultScheme } from './scheme-checks';

const chlorine = defaultScheme({ symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' }, { value: '61/10', text: '6.10', decimals: 2 }, 3600);

const fitting = (text: string): string[] => {
  const read = readAnswer(text, []);
  if (!read.ok) throw new Error(text);
  return slipsThatFit(chlorine, read).map(({ id }) => id);
};

it('names every slip a value fits, twins together, rounded as the key may be', () => {
  // By Slater's coefficients (Phys. Rev. 36, 57, 1930): 17 - (7 x 0.35 + 8 x 0.85 + 2) = 5.75; 17 - (6 x 0.35 + 10 x 0.85) = 6.40.
  expect(fitting('5.75')).toEqual(['counts-itself', 'one-electron-too-many']);
  expect(fitting('5.8')).toEqual(['counts-itself', 'one-electron-too-many']);
  expect(fitting('6.40')).toEqual(['all-inner-085', 'same-group-030']);
});

it('fits nothing to the key, to its neighbours, or to a value with another zero', () => {
  expect([fitting('6.10'), fitting('6.11'), fitting('5.80')]).toEqual([[], [], []]);
});

it('puts first the slip that explains more of the same candidate\'s items, then the commoner one', () => {
  const read = readAnswer('6.40', []);
  if (!read.ok) throw new Error('6.40');
  const fits = slipsThatFit(chlorine, read);
  const order = (others: Parameters<typeof strongestFirst>[1]) => strongestFirst(fits, others).map(({ id, alsoOn }) => [id, alsoOn]);
  expect(order([])).toEqual([['all-inner-085', []], ['same-group-030', []]]);
  expect(order([{ number: 3, fits: [{ id: 'same-group-030' }] }, { number: 5, fits: [{ id: 'same-group-030' }, { id: 'all-inner-085' }] }])).toEqual([['same-group-030', [3, 5]], ['all-inner-085', [5]]]);
});

it('names the slips behind an energy by way of Z_eff', () => {
  const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' } as const;
  const energy = { ...defaultScheme(asked, { value: '-56', text: '-56.25', decimals: 2, figures: 4 }, 3600), units: ['eV'], roundings: { downToDecimals: null, downToFigures: 3, truncation: false } };
  // -13.605693 x (5.75/3)^2 = -49.982 and -13.605693 x (6.40/3)^2 = -61.921, by hand.
  const fit = (text: string) => { const read = readAnswer(text, ['eV']); return read.ok ? slipsThatFit(energy, read) : []; };
  expect([fit('-49.98 eV'), fit('-50.0'), fit('-61.92'), fit('-49.90')].map((slips) => slips.map(({ id }) => id))).toEqual([
    ['counts-itself', 'one-electron-too-many'], ['counts-itself', 'one-electron-too-many'], ['all-inner-085', 'same-group-030'], [],
  ]);
  expect(fit('-49.98')[0]?.feedback).toMatch(/Z_eff comes to 5\.75, and what is asked to −49\.98\.$/);
});
