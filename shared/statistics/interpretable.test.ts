import { expect, it } from 'vitest';
import { figure } from './interpretable';

// Not to be interpreted below 30: common practice, no source.
it('a figure on 29 is too few, on 30 a value, and without variation none', () => {
  expect([figure(29, 0.5), figure(30, 0.5), figure(40, null), figure(0, null)]).toEqual([
    { state: 'too few', n: 29, value: 0.5 },
    { state: 'value', n: 30, value: 0.5 },
    { state: 'no variation', n: 40, value: null },
    { state: 'too few', n: 0, value: null },
  ]);
});
