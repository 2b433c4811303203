import { expect, it } from 'vitest';
import { slipsThatFit } from './diagnosis';
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
