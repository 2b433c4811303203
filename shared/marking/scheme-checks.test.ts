import { describe, expect, it } from 'vitest';
import { defaultScheme, schemeProblems } from './scheme-checks';
import type { Alternative, ItemScheme, NamedSlip } from './scheme';

const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' } as const;
const three = defaultScheme(asked, { value: '61/10', text: '6.10', decimals: 2 }, 3600);
// E = −13.605693 eV × (6.10/3)² = −56.2522 eV for 3p of chlorine (Slater 1930, n* = 3).
const energy: ItemScheme = { ...defaultScheme({ ...asked, quantity: 'energy-ev' }, { value: '-5625219/100000', text: '-56.25', decimals: 2, figures: 4 }, 3600), units: ['eV'] };
const problems = (changes: Partial<ItemScheme>, base = three): string[] => schemeProblems({ ...base, ...changes }).map(({ path, message }) => `${path}: ${message}`);

const alternative = (grains: number): Alternative => ({ name: 'SCF', value: '61161/10000', text: '6.1161', decimals: 4, grains, reason: 'taught' });
const slip = (grains: number): NamedSlip => ({ id: 'counts-itself', letter: 'a', name: '', value: '23/4', text: '5.75', grains, feedback: '' });
const method = (id: string, grains: number) => ({ id, text: id, grains });

describe('the scheme that an item starts with', () => {
  it('counts the key and its roundings to one decimal in full, and asks a person about codes', () => {
    expect(three).toEqual({
      kind: 'numeric', asked, maxGrains: 3600, key: { value: '61/10', text: '6.10', decimals: 2 }, units: [], roundings: { downToDecimals: 1, truncation: false },
      alternatives: [], bands: [], crossedOut: 'ask', twoAnswers: 'ask',
    });
    expect(defaultScheme(asked, { value: '61/10', text: '6.1', decimals: 1 }, 3600).roundings.downToDecimals).toBeNull();
    expect([problems({}), problems({}, energy)]).toEqual([[], []]);
  });
});

describe('what is wrong with a key', () => {
  it.each([
    [{ value: '61/10', text: '6.11', decimals: 2 }, 'The printed key 6.11 is not the computed value to 2 decimals.'],
    [{ value: '61/10', text: '6.1', decimals: 2 }, 'The printed key 6.1 is not the computed value to 2 decimals.'],
    [{ value: '61/10', text: 'six', decimals: 2 }, 'The printed key six is not the computed value to 2 decimals.'],
    [{ value: '-5625219/100000', text: '-56.26', decimals: 2, figures: 4 }, 'The printed key -56.26 is not the computed value to 4 figures.'],
    [{ value: '-5625219/100000', text: '-56.252', decimals: 2, figures: 4 }, 'The printed key -56.252 is not the computed value to 4 figures.'],
  ])('%o', (key, message) => expect(problems({ key })).toEqual([`key: ${message}`]));
});

describe('a share', () => {
  const most = 'No more than the value is worth: the marks of the item less its method marks.';
  const units = ['eV'];
  it.each([[-1], [3601], [0.5]])('of %d grains is none', (grains) => {
    expect(problems({ units, alternatives: [alternative(0), alternative(grains)], slips: [slip(grains)], unitRule: { grains }, signRule: { grains } })).toEqual(
      ['alternatives.1.grains', 'slips.0.grains', 'unitRule.grains', 'signRule.grains'].map((path) => `${path}: ${most}`),
    );
  });

  it.each([[0], [3600]])('of %d grains is one', (grains) => {
    expect(problems({ units, alternatives: [alternative(grains)], slips: [slip(grains)], unitRule: { grains }, signRule: { grains } })).toEqual([]);
  });

  it('is of what the method marks leave to the value', () => {
    expect(problems({ methodMarks: [method('a', 600)], alternatives: [alternative(3000)] })).toEqual([]);
    expect(problems({ methodMarks: [method('a', 600)], alternatives: [alternative(3001)] })).toEqual([`alternatives.0.grains: ${most}`]);
    expect(problems({ methodMarks: [method('a', 600)], bands: [{ name: '', kind: 'absolute', width: '1/20', grains: 3001 }] })).toHaveLength(1);
  });

  it('has no unit to be lost where the key is a pure number', () => {
    expect(problems({ unitRule: { grains: 600 } })).toEqual(['unitRule.grains: The key is a pure number: no unit can be missing.']);
    expect(problems({ unitRule: { grains: 600 } }, energy)).toEqual([]);
  });
});

describe('method marks', () => {
  it('leave the value a mark of its own', () => {
    const tooMuch = 'methodMarks: Method marks take less than the item is worth: the value needs a mark of its own.';
    expect(problems({ methodMarks: [method('a', 1200), method('b', 2399)] })).toEqual([]);
    expect(problems({ methodMarks: [method('a', 1200), method('b', 2400)] })).toEqual([tooMuch]);
    // A slip that is named only stays a slip, whatever the method marks take.
    expect(problems({ methodMarks: [method('a', 4800)], slips: [slip(0)] })).toEqual([tooMuch]);
  });

  it('have ids of their own', () => {
    expect(problems({ methodMarks: [method('a', 1), method('b', 1), method('b', 1)] })).toEqual(['methodMarks.2.id: Two method marks have the same id.']);
  });
});

describe('a choice or an order', () => {
  const options = ['O', 'F', 'N', 'C'].map((symbol) => ({ symbol, charge: 0, electron: '2p' }));
  const order = (...partMarks: { inPlace: number; grains: number }[]): Partial<ItemScheme> => ({
    kind: 'order', key: { value: '1', text: '4 3 1 2', decimals: 0 }, printed: { question: 'increasing', options, answer: '4 3 1 2', partMarks },
  });

  it('has options, and no key in numbers', () => {
    expect(problems(order())).toEqual([]);
    expect(problems({ ...order(), printed: null })).toEqual(['printed: Print two options or more.']);
    expect(problems({ ...order(), bands: [{ name: '', kind: 'absolute', width: '0', grains: 0 }], roundings: { downToDecimals: 7, truncation: false } })).toEqual([]);
  });

  it('pays more for more in place, less than for all', () => {
    expect(problems(order({ inPlace: 2, grains: 1200 }, { inPlace: 1, grains: 600 }))).toEqual([]);
    expect(problems(order({ inPlace: 3, grains: 1200 }))).toEqual(['printed.partMarks.0.inPlace: At most 2 of 4 can be in place without all being so.']);
    expect(problems(order({ inPlace: 1, grains: 600 }, { inPlace: 1, grains: 700 }))).toEqual(['printed.partMarks.1.inPlace: There is a part mark for as many in place already.']);
    expect(problems(order({ inPlace: 1, grains: 600 }, { inPlace: 2, grains: 600 }))).toEqual(['printed.partMarks.1.grains: More numbers in place give more marks than fewer.']);
    expect(problems(order({ inPlace: 2, grains: 3600 }))).toEqual(['printed.partMarks.0.grains: A part mark is less than the value is worth.']);
    expect(problems({ ...order({ inPlace: 2, grains: 3000 }), methodMarks: [method('a', 600)] })).toEqual(['printed.partMarks.0.grains: A part mark is less than the value is worth.']);
    expect(problems({ printed: order({ inPlace: 3, grains: 1200 }).printed ?? null })).toEqual([]);
  });
});

describe('the item as a whole', () => {
  it.each([[0], [-1200], [0.5]])('is worth more than %d grains', (maxGrains) => {
    expect(problems({ maxGrains })).toContain('maxGrains: An item is worth more than 0 marks.');
  });

  it('has roundings of fewer decimals than the key, or no more figures', () => {
    const decimals = (downToDecimals: number | null, base = three) => problems({ roundings: { downToDecimals, truncation: false } }, base);
    const wrong = ['roundings.downToDecimals: Roundings have fewer decimals than the key.'];
    expect([0, 1, 2, -1, null].map((count) => decimals(count))).toEqual([[], [], wrong, wrong, []]);
    expect(decimals(2, energy)).toEqual([]);
    const figures = (downToFigures: number | null, base = energy) => problems({ roundings: { downToDecimals: null, downToFigures, truncation: false } }, base);
    const few = ['roundings.downToFigures: Roundings have at most the figures of the key.'];
    expect([1, 4, 5, 0, null].map((count) => figures(count))).toEqual([[], [], few, few, []]);
    expect(figures(3, three)).toEqual(few);
  });
});
