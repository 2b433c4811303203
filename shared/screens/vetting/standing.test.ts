import { expect, it } from 'vitest';
import type { VettingItem } from '../../contracts/vetting';
import { nextUnsigned, standingOf } from './standing';

const item = (itemId: string, outcomes: ('signed' | 'sent-back')[], isWorked = false): VettingItem => ({
  itemId,
  number: 1,
  label: 'Cl 3p',
  quantity: 'zeff',
  prompt: '',
  maxGrains: 3600,
  cannotVet: null,
  mine: isWorked ? { text: '6.10', agrees: true, at: 1 } : null,
  key: null,
  derivation: null,
  decides: [],
  vettings: outcomes.map((outcome) => ({ by: 'A', isOwn: false, outcome, comment: null, at: 1 })),
  rev: 1,
});

it('the newest signature or return decides', () => {
  expect([item('a', []), item('a', [], true), item('a', ['sent-back', 'signed']), item('a', ['signed', 'sent-back'])].map(standingOf)).toEqual(['to-work', 'worked', 'sent-back', 'signed']);
});

it('goes on to the next that is not signed, round the end', () => {
  const items = [item('a', []), item('b', ['signed']), item('c', ['signed'])];
  expect(nextUnsigned(items, 'b')?.itemId).toBe('a');
  expect(nextUnsigned([item('a', ['signed'])], 'a')).toBeNull();
});
