import { expect, it } from 'vitest';
import { plainNumber } from './read-typed';
import { understood } from './understood';

it.each([
  ['5.75', { kind: 'value', value: '5.75', form: 'Two decimals, no unit.' }],
  ['5,75', { kind: 'value', value: '5.75', form: 'Two decimals, no unit.' }],
  [' 6.10 ', { kind: 'value', value: '6.10', form: 'Two decimals, no unit.' }],
  ['6', { kind: 'value', value: '6', form: 'No decimals, no unit.' }],
  ['6.1', { kind: 'value', value: '6.1', form: 'One decimal, no unit.' }],
  ['15/4', { kind: 'value', value: '15/4', form: 'A fraction, no unit.' }],
  ['6.', { kind: 'waiting' }],
  ['', { kind: 'nothing' }],
] as const)('%j is understood', (text, expected) => expect(understood(text, plainNumber)).toEqual(expected));

it('names the unit apart from the value', () => {
  expect(understood('13.6 eV', { kind: 'numeric', units: ['eV', 'kJ/mol'] })).toEqual({ kind: 'value', value: '13.6', form: 'One decimal, unit eV.' });
});

it('names the place of what it refuses', () => {
  expect(understood('6.1.0', plainNumber)).toEqual({ kind: 'refused', message: 'Two points. Keep one: 6.1' });
});
