import { expect, it } from 'vitest';
import { withNextUnit } from './unit-key';

it('goes through the units of an item and back to none', () => {
  const units = ['eV', 'kJ/mol'];
  expect(withNextUnit('13.6', units)).toBe('13.6 eV');
  expect(withNextUnit('13.6 eV', units)).toBe('13.6 kJ/mol');
  expect(withNextUnit('13.6 kJ/mol', units)).toBe('13.6');
});

it('tells units apart that end alike, and does nothing without a value or a unit', () => {
  expect(withNextUnit('2 keV', ['eV', 'keV'])).toBe('2');
  expect(withNextUnit('', ['eV'])).toBe('');
  expect(withNextUnit('5', [])).toBe('5');
});
