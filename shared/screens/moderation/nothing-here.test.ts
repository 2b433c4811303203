import { expect, it } from 'vitest';
import { nothingHere } from './nothing-here';

it('names every filter that is on', () => {
  expect(nothingHere({ show: 'to-rule', find: '', item: undefined })).toBe('Nothing waits to be ruled.');
  expect(nothingHere({ show: 'all', find: 'W99', item: undefined })).toBe('Nothing fits “W99”.');
  expect(nothingHere({ show: 'blank', find: '5.7*', item: 6 })).toBe('Nothing in item 6 fits “5.7*” and is blank.');
  expect(nothingHere({ show: 'all', find: '', item: 6 })).toBe('Nothing in item 6 is here.');
});
