import { expect, it } from 'vitest';
import type { ItemDraft, ItemView } from '../../contracts/items';
import { newDraft } from './new-draft';
import { askedInWords, rulesInWords } from './said-rules';

const view = (number: number, changes: Partial<ItemDraft>, units: readonly string[] = []) =>
  ({ id: String(number), number, draft: { ...newDraft(undefined), ...changes }, worked: { label: 'Ne* 3s', key: { decimals: 2, figures: null }, unit: '', units } }) as unknown as ItemView;

it('tells what an item asks for, with the configuration that its star stands for', () => {
  const excited = view(1, { asked: { symbol: 'Ne', charge: 0, electron: '3s', configuration: '1s2 2s2 2p5 3s1', quantity: 'zeff', convention: 'slater' } });
  expect(askedInWords(excited).map(([name, text]) => `${name}: ${text}`)).toContain('Ne* 3s: 1s2 2s2 2p5 3s1');
  const options = [{ symbol: 'O', charge: 0, electron: '2p' }];
  expect(askedInWords(view(2, { kind: 'order', printed: { question: 'increasing', options, partMarks: [] } }))[0]).toEqual(['Answer', 'an order, increasing']);
});

it('tells rules only where the item has them, and what becomes of codes always', () => {
  expect(rulesInWords(view(1, {}), []).map(([name]) => name)).toEqual(['Crossed out, nothing in its place', 'Two answers left standing']);
  const first = view(1, {});
  const linked = view(2, { followThrough: { from: '1', second: null, isTrivial: false }, unitCost: '0.5', signCost: '1' }, ['eV', 'J']);
  expect(rulesInWords(linked, [first, linked]).slice(0, 4)).toEqual([
    ['Follow-through', 'Follows the candidate’s own value of item 1; one error costs once.'],
    ['Unit', 'An answer may carry eV and J; eV is right.'],
    ['Unit slip', 'A missing or another unit costs 0.5 marks, once a paper.'],
    ['Sign slip', 'A reversed sign costs 1 mark, once a paper.'],
  ]);
});
