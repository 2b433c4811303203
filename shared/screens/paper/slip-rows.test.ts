import { expect, it } from 'vitest';
import type { ItemDraft, WorkedDraft } from '../../contracts/items';
import { newDraft } from './new-draft';
import { slipRows, withSlipRow } from './slip-rows';

const slip = (id: string, text: string, isSilent = false) => ({ id, letter: id, name: id, text, differs: '', feedback: '', isSilent });
const worked = { slips: [slip('a', '5.75'), slip('b', '6.40'), slip('f', '6.40'), slip('g', '6.10', true)] } as unknown as WorkedDraft;
const draft: ItemDraft = { ...newDraft(undefined), slips: [{ id: 'f', marks: '1' }] };

it('puts twins in one row and leaves out what the item cannot see', () => {
  expect(slipRows(worked, draft).map(({ text, slips, marks }) => [text, slips.map(({ id }) => id).join(''), marks])).toEqual([['5.75', 'a', null], ['6.40', 'bf', '1']]);
});

it('names twins together, changes their share together, and takes them out together', () => {
  const [first, twins] = slipRows(worked, draft);
  if (!first || !twins) throw new Error('Two rows are expected.');
  expect(withSlipRow(draft, first, '0.5')).toEqual([{ id: 'f', marks: '1' }, { id: 'a', marks: '0.5' }]);
  expect(withSlipRow(draft, twins, '2')).toEqual([{ id: 'b', marks: '2' }, { id: 'f', marks: '2' }]);
  expect(withSlipRow(draft, twins, null)).toEqual([]);
});
