import { expect, it } from 'vitest';
import { leftOutOfQti } from './qti-leaves-out';

it('names what the package has no place for', () => {
  expect(leftOutOfQti({ followThrough: null, methodMarks: [{}], unitCost: null, signCost: '1' })).toEqual(['method-marks', 'sign-cost']);
  expect(leftOutOfQti({ followThrough: {}, methodMarks: [], unitCost: '1/2', signCost: null })).toEqual(['follow-through', 'unit-cost']);
  expect(leftOutOfQti({ followThrough: null, methodMarks: [], unitCost: null, signCost: null })).toEqual([]);
});
