import { expect, it } from 'vitest';
import { struckIds } from './struck';

it('gives the ids that a reading keeps, none for none', () => {
  expect([struckIds('a,b'), struckIds('a'), struckIds('')]).toEqual([['a', 'b'], ['a'], []]);
});
