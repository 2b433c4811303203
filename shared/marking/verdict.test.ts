import { describe, expect, it } from 'vitest';
import { markAnswer } from './verdict';
import { defaultScheme } from './scheme-checks';
import { emptyContext, type Asked, type ItemScheme } from './scheme';

const chlorine: Asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' };
const three = defaultScheme(chlorine, { value: '61/10', text: '6.10', decimals: 2 }, 3600);
const mark = (text: string, scheme: ItemScheme = three) => {
  const { grains, rule } = markAnswer(scheme, { text }, emptyContext);
  return { grains, rule };
};

describe('a verdict', () => {
  it('gives full marks for the key with its decimals, however it is written', () => {
    for (const text of ['6.10', '6,10', '+6.10', '~ 6.10', 'Z_eff = 6.10', '6.100', '61/10', '6.10+']) {
      expect(mark(text), text).toEqual({ grains: 3600, rule: 'key' });
    }
  });

  it('gives full marks for the key rounded to one decimal, and nothing for fewer', () => {
    expect(mark('6.1')).toEqual({ grains: 3600, rule: 'rounding' });
    expect(mark('6')).toEqual({ grains: 0, rule: 'nothing' });
  });

  it('accepts both neighbours of a tie', () => {
    const oxygen = defaultScheme({ ...chlorine, symbol: 'O', electron: '2p' }, { value: '91/20', text: '4.55', decimals: 2 }, 2400);
    expect([mark('4.6', oxygen), mark('4.5', oxygen)]).toEqual([
      { grains: 2400, rule: 'rounding' },
      { grains: 2400, rule: 'rounding' },
    ]);
    expect(mark('4.4', oxygen).grains).toBe(0);
  });

  it('keeps 3.8, the key 3.75 rounded, apart from 3.80, another number', () => {
    const iron = defaultScheme({ ...chlorine, symbol: 'Fe', electron: '4s' }, { value: '15/4', text: '3.75', decimals: 2 }, 3600);
    expect([mark('3.8', iron).grains, mark('3.80', iron).grains, mark('15/4', iron).grains]).toEqual([3600, 0, 3600]);
  });

  it('gives the highest mark of all rules, and names the earlier rule on a tie', () => {
    const generous: ItemScheme = {
      ...three,
      alternatives: [{ name: 'the SCF value', value: '153/25', text: '6.12', decimals: 2, grains: 1800, reason: 'taught in one group' }],
      bands: [
        { name: 'near', kind: 'absolute', width: '1/20', grains: 1200 },
        { name: 'wide', kind: 'relative', width: '1/20', grains: 600 },
      ],
    };
    expect(mark('6.12', generous)).toEqual({ grains: 1800, rule: 'alternative' });
    expect(mark('6.15', generous)).toEqual({ grains: 1200, rule: 'band' });
    expect(mark('6.40', generous)).toEqual({ grains: 600, rule: 'band' });
    expect(mark('6.41', generous)).toEqual({ grains: 0, rule: 'nothing' });
  });

  it('gives 0 for a blank and leaves other codes to a person, unless the scheme says none', () => {
    expect(markAnswer(three, { code: 'blank' }, emptyContext).grains).toBe(0);
    expect(markAnswer(three, { code: 'two-answers' }, emptyContext).grains).toBeNull();
    expect(markAnswer({ ...three, twoAnswers: 'none' }, { code: 'two-answers' }, emptyContext).grains).toBe(0);
    expect(markAnswer({ ...three, twoAnswers: 'none' }, { code: 'cannot-read' }, emptyContext).grains).toBeNull();
  });

  it('takes every answer on the edge of a band of 0.05 and none at 0.06, where binary floats refuse 736 of 1,160', () => {
    let refusedByFloats = 0;
    let edges = 0;
    const hundredths = (value: number) => `${Math.floor(value / 100)}.${String(value % 100).padStart(2, '0')}`;
    for (let key = 100; key <= 2995; key += 5) {
      const scheme: ItemScheme = {
        ...defaultScheme(chlorine, { value: `${key}/100`, text: hundredths(key), decimals: 2 }, 3600),
        bands: [{ name: 'near', kind: 'absolute', width: '1/20', grains: 1200 }],
        roundings: { downToDecimals: null, truncation: false },
      };
      for (const side of [-1, 1]) {
        edges += 1;
        const edge = hundredths(key + 5 * side);
        expect(mark(edge, scheme).grains).toBe(1200);
        expect(mark(hundredths(key + 6 * side), scheme).grains).toBe(0);
        // What a comparison of binary floats would say.
        if (!(Math.abs(Number(edge) - Number(hundredths(key))) <= 0.05)) refusedByFloats += 1;
      }
    }
    expect({ edges, refusedByFloats }).toEqual({ edges: 1160, refusedByFloats: 736 });
  });
});

it('a named slip pays its share with the roundings of the key, and explains a 0 where it has none', () => {
  const slip = (id: string, letter: string, name: string, value: string, text: string, grains: number) => ({ id, letter, name, value, text, grains, feedback: '' });
  const scheme = {
    ...defaultScheme({ symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' }, { value: '61/10', text: '6.10', decimals: 2 }, 3600),
    slips: [slip('counts-itself', 'a', 'counts the electron itself', '23/4', '5.75', 1200), slip('all-inner-085', 'f', 'all inner electrons at 0.85', '32/5', '6.40', 0)],
  };
  const mark = (text: string) => markAnswer(scheme, { text }, {});
  // Counting the electron itself: 17 - (7 x 0.35 + 8 x 0.85 + 2 x 1.00) = 5.75, by Slater's coefficients (Phys. Rev. 36, 57, 1930).
  expect(mark('5.75')).toMatchObject({ grains: 1200, rule: 'slip', numbers: { letters: 'a', slips: 'counts the electron itself' } });
  expect(mark('5.8')).toMatchObject({ grains: 1200, rule: 'slip' });
  expect(mark('6.4')).toMatchObject({ grains: 0, rule: 'slip', numbers: { letters: 'f' } });
  expect(mark('6.10')).toMatchObject({ grains: 3600, rule: 'key' });
  expect(mark('9.99')).toMatchObject({ grains: 0, rule: 'nothing' });
});

it('a key that is no short decimal is met by roundings to the figures given, from the fewest that count', () => {
  // E = -13.605693 eV x (6.10 / 3)^2 = -56.2522... eV for 3p of Cl (Slater 1930, n* = 3).
  const energy = { ...defaultScheme({ ...chlorine, quantity: 'energy-ev' }, { value: '-5625219/100000', text: '-56.25', decimals: 2, figures: 4 }, 3600), units: ['eV'], roundings: { downToDecimals: null, downToFigures: 3, truncation: false } };
  const got = (text: string) => markAnswer(energy, { text }, emptyContext);
  expect(['-56.25', '-56.3', '-56.252', '-56.25 eV', '−56.3eV'].map((text) => [got(text).grains, got(text).rule])).toEqual(Array.from({ length: 5 }, () => [3600, 'rounding']));
  expect(['-56', '-56.26', '56.25', '-56.250'].map((text) => got(text).grains)).toEqual([0, 0, 0, 0]);
  const other = { ...energy, alternatives: [{ name: 'core count', value: '-741/10', text: '-74.10', decimals: 2, figures: 4, grains: 1200, reason: '' }] };
  expect(['-74.10', '-74.1', '-74'].map((text) => markAnswer(other, { text }, emptyContext).grains)).toEqual([1200, 1200, 0]);
});

it('tells a value one wrong step of the fingers from the key, where no slip explains it', () => {
  const step = (text: string, scheme: ItemScheme = three) => markAnswer(scheme, { text }, emptyContext).numbers.step;
  expect(['610', '6.01', '6.70', '6.110'].map((text) => step(text))).toEqual(['point-missing', 'digits-exchanged', 'look-alike', 'digit-doubled']);
  // 6.40 is a slip, all inner electrons at 0.85; 9.99 is far from everything.
  expect([step('6.40'), step('9.99')]).toEqual([undefined, undefined]);
  expect(step('6.1', { ...three, roundings: { downToDecimals: null, truncation: false } })).toBeUndefined();
});
