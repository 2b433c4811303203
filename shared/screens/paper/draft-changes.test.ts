import { describe, expect, it } from 'vitest';
import type { ItemDraft } from '../../contracts/items';
import { conventionsFor, moved, neighbourElectron, nextPartMark, quantitiesFor, sharesOf, withConvention, withKind, withOptions, withQuantity, withTypedValue } from './draft-changes';
import { newDraft } from './new-draft';

const chlorine: ItemDraft = { ...newDraft(undefined), asked: { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' } };

describe('another kind', () => {
  it('makes the electron the first of two options, and the first option the electron again', () => {
    const choice = withKind({ ...chlorine, bands: [{ name: 'near', kind: 'absolute', width: '0.1', marks: '1' }], prompt: 'Find it.' }, 'choice');
    expect(choice).toMatchObject({ kind: 'choice', bands: [], prompt: null, printed: { question: 'greatest', options: [{ symbol: 'Cl', electron: '3p' }, { symbol: 'Ar', electron: '3p' }] } });
    // As the server gives an order back: without decimals.
    expect(withKind({ ...choice, decimals: 0, roundings: { downToDecimals: null, truncation: false } }, 'numeric')).toMatchObject({ kind: 'numeric', printed: null, decimals: 2, roundings: { downToDecimals: 1 }, asked: { symbol: 'Cl', electron: '3p' } });
  });

  it('keeps the options and the direction between a choice and an order', () => {
    const least = withKind(chlorine, 'choice');
    const order = withKind({ ...least, printed: least.printed && { ...least.printed, question: 'least' } }, 'order');
    expect(order.printed).toMatchObject({ question: 'increasing', partMarks: [] });
    expect(order.printed?.options).toEqual(least.printed?.options);
  });

  it('has no quantity that a choice cannot ask for', () => {
    expect(withKind(withQuantity(chlorine, 'difference'), 'order').asked).toMatchObject({ quantity: 'zeff' });
    expect(quantitiesFor('choice')).not.toContain('difference');
    expect(conventionsFor('choice', 'zeff')).not.toContain('typed');
  });
});

describe('another quantity or convention', () => {
  it('brings the second electron of a difference, and takes it away', () => {
    const difference = withQuantity(chlorine, 'difference');
    expect(difference.asked.other).toEqual({ symbol: 'S', charge: 0, electron: '3p' });
    expect(withQuantity(difference, 'zeff').asked).not.toHaveProperty('other');
  });

  it('works what follows from Z_eff by Slater’s rules only', () => {
    expect(withQuantity(withConvention(chlorine, 'scf'), 'energy-ev').asked.convention).toBe('slater');
    expect(withQuantity(withConvention(chlorine, 'slater-d-at-1'), 'energy-ev').asked.convention).toBe('slater-d-at-1');
    expect(conventionsFor('numeric', 'radius-pm')).toEqual(['slater', 'slater-035-in-1s', 'slater-d-at-1', 'typed']);
  });

  it('asks for a value of one’s own, and comes back to an electron', () => {
    const typed = withConvention({ ...chlorine, slips: [{ id: 'counts-itself', marks: '1' }] }, 'typed');
    expect(typed).toMatchObject({ slips: [], asked: { quantity: 'value', convention: 'typed', typed: { label: '', value: '' } } });
    expect(withConvention(typed, 'slater')).toMatchObject({ decimals: 2, asked: { symbol: 'Cl', quantity: 'zeff', convention: 'slater' } });
    expect(withConvention({ ...typed, asked: { ...typed.asked, symbol: '', electron: '' } }, 'slater').asked).toMatchObject({ symbol: 'C', electron: '2p' });
  });

  it('lets the roundings follow the decimals of a typed key, unless the lead chose them', () => {
    const typed = withConvention(chlorine, 'typed');
    const roundedTo = (draft: ItemDraft) => [draft.decimals, draft.roundings.downToDecimals];
    expect(roundedTo(withTypedValue(typed, '496'))).toEqual([0, null]);
    expect(roundedTo(withTypedValue(withTypedValue(typed, '1.2'), '1.25'))).toEqual([2, 1]);
    const chosen = { ...withTypedValue(typed, '1.253'), roundings: { downToDecimals: 2, truncation: false } };
    expect(roundedTo(withTypedValue(chosen, '1.254'))).toEqual([3, 2]);
  });
});

describe('options and marks', () => {
  it('takes the neighbour in the periodic table, the other way at its ends', () => {
    expect([neighbourElectron('Cl', 1), neighbourElectron('H', -1), neighbourElectron('Og', 1)].map(({ symbol }) => symbol)).toEqual(['Ar', 'He', 'Ts']);
  });

  it('moves a member, and leaves the list where there is no room', () => {
    expect(moved(['a', 'b', 'c'], 2, -1)).toEqual(['a', 'c', 'b']);
    expect(moved(['a', 'b', 'c'], 0, -1)).toEqual(['a', 'b', 'c']);
  });

  it('offers a part mark for at most two less than there are options, the most first', () => {
    const order = withKind(chlorine, 'order');
    const four = withOptions(order, ['N', 'O', 'F', 'Ne'].map((symbol) => ({ symbol, charge: 0, electron: '2p' }))).printed;
    if (!four || !order.printed) throw new Error('An order has options.');
    expect([nextPartMark(order.printed), nextPartMark(four), nextPartMark({ ...four, partMarks: [{ inPlace: 2, marks: '1' }] })]).toEqual([null, 2, 1]);
    expect(withOptions({ ...order, printed: { ...four, partMarks: [{ inPlace: 2, marks: '1' }] } }, four.options.slice(1)).printed?.partMarks).toEqual([]);
  });

  it('leaves the value what method marks do not take', () => {
    const method = (marks: string) => ({ methodMarks: [{ id: 'a', text: 'grouping', marks }] });
    expect(sharesOf(method('0.5'), 3600)).toEqual({ method: 600, value: 3000 });
    expect(sharesOf(method(''), 3600)).toBeNull();
    expect(sharesOf({ methodMarks: [] }, 3600)).toEqual({ method: 0, value: 3600 });
  });
});
