import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fromFractionText, toFigures, toFractionText } from '../chemistry/exact';
import { work } from '../chemistry/work';
import { unitsOf } from './follow-through';
import { linkProblem, sourcesOf, type LinkedItem } from './links';
import { markPaper, type SettledAnswer, type VerdictMemo } from './mark-paper';
import { reasonInWords } from './reasons';
import { defaultScheme } from './scheme-checks';
import type { Asked, Code, ItemScheme, QuantityName } from './scheme';

// Keys by Slater's rules (Phys. Rev. 36, 57, 1930): chlorine 3p, sigma 10.90, Z_eff 6.10, energy −13.605693 eV × (6.10/3)² = −56.25 eV.
function scheme(quantity: QuantityName, changes: Partial<ItemScheme> = {}): ItemScheme {
  const asked: Asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity, convention: 'slater' };
  const worked = work(asked);
  if (!worked.ok) throw new Error(worked.problem.message);
  const { value, text, figures } = worked.value;
  const key = figures === null ? { value: toFractionText(value), text, decimals: 2 } : { value: toFractionText(value), text: toFigures(value, 4), decimals: 2, figures: 4 };
  return { ...defaultScheme(asked, key, 3600), units: unitsOf[quantity] ?? [], roundings: figures === null ? { downToDecimals: 1, truncation: false } : { downToDecimals: null, downToFigures: 3, truncation: false }, ...changes };
}

const from = (id: string, quantity: QuantityName, isTrivial = false) => ({ followThrough: { from: id, quantity, isTrivial } });
const paper = (...schemes: readonly ItemScheme[]): LinkedItem[] => schemes.map((one, index) => ({ id: String(index + 1), number: index + 1, scheme: one }));
const chain = paper(scheme('sigma'), scheme('zeff', from('1', 'sigma')), scheme('energy-ev', from('2', 'zeff')));

const given = (typed: string): SettledAnswer => ({ given: typed.startsWith('@') ? { code: typed.slice(1) as Code } : { text: typed }, struck: [] });
const answers = (...typed: readonly (string | null)[]) => new Map(typed.flatMap((one, index) => (one === null ? [] : [[String(index + 1), given(one)] as const])));
const marks = (items: readonly LinkedItem[], ...typed: readonly (string | null)[]) => {
  const marked = markPaper(items, answers(...typed));
  return items.map(({ id }) => {
    const one = marked.get(id);
    return one ? [one.waits ? 'waits' : one.verdict.grains, one.verdict.rule] : null;
  });
};

describe('what follows from an earlier item', () => {
  it('is paid in full once the error has cost once, along the whole chain', () => {
    expect(marks(chain, '10.90', '6.10', '-56.25')).toEqual([[3600, 'key'], [3600, 'key'], [3600, 'rounding']]);
    // 17 − 11.25 = 5.75, and −13.605693 × (5.75/3)² = −49.98, by hand.
    expect(marks(chain, '11.25', '5.75', '-49.98')).toEqual([[0, 'nothing'], [3600, 'follow-through'], [3600, 'follow-through']]);
    expect(marks(chain, '11.25', '5.75', '-50.0')).toEqual([[0, 'nothing'], [3600, 'follow-through'], [3600, 'follow-through']]);
    // The energy follows from the written Z_eff, right or wrong in itself.
    expect(marks(chain, '11.25', '5.70', '-49.98')[2]).toEqual([0, 'nothing']);
  });

  it('waits while the earlier item is held or unread, unless it has all it can get', () => {
    expect(marks(chain, null, '5.75', '-56.25')).toEqual([null, ['waits', 'nothing'], [3600, 'rounding']]);
    expect(marks(chain, null, '6.10')[1]).toEqual([3600, 'key']);
    expect(marks(chain, null, '@blank')[1]).toEqual([0, 'code']);
  });

  it('is not followed from a blank, a code, an impossible value or across a trivial step', () => {
    expect(marks(chain, '@blank', '5.75')[1]).toEqual([0, 'nothing']);
    expect(marks(chain, '@cannot-read', '5.75')[1]).toEqual([0, 'nothing']);
    expect(marks(chain, '17.50', '-0.50')[1]).toEqual([0, 'nothing']);
    expect(marks(chain, '-1.00', '18.00')[1]).toEqual([0, 'nothing']);
    expect(marks(paper(scheme('sigma'), scheme('zeff', from('1', 'sigma', true))), '11.25', '5.75')[1]).toEqual([0, 'nothing']);
    // A value in another unit is not the quantity that is carried on.
    const energies = paper(scheme('energy-ev'), scheme('energy-kj-mol', from('1', 'energy-ev')));
    expect(marks(energies, '-49.98 kJ/mol', '-4822')[1]).toEqual([0, 'nothing']);
    expect(marks(energies, '-49.98 eV', '-4822')[1]).toEqual([3600, 'follow-through']);
  });

  it('takes roundings and bands round the carried value too, and a right answer by the earlier rule', () => {
    const banded = paper(scheme('sigma'), scheme('zeff', { ...from('1', 'sigma'), bands: [{ name: 'near', kind: 'absolute', width: '1/10', grains: 1200 }] }));
    expect(marks(banded, '11.25', '5.8')[1]).toEqual([3600, 'follow-through']);
    expect(marks(banded, '11.25', '5.85')[1]).toEqual([1200, 'follow-through']);
    expect(marks(banded, '11.25', '6.10')[1]).toEqual([3600, 'key']);
    expect(marks(banded, '11.253', '5.75')[1]).toEqual([3600, 'follow-through']);
    expect(marks(banded, '11.253', '5.747')[1]).toEqual([3600, 'follow-through']);
    expect(marks(paper(scheme('sigma'), scheme('zeff', { ...from('1', 'sigma'), roundings: { downToDecimals: null, truncation: false } })), '11.253', '5.75')[1]).toEqual([3600, 'follow-through']);
  });

  it('says in words what it was worked on from', () => {
    const verdict = markPaper(chain, answers('11.25', '5.75')).get('2')?.verdict;
    expect(verdict && reasonInWords(verdict).detail).toBe('Worked on from the candidate’s own 11.25, the value is 5.75. One error costs once.');
  });
});

describe('links of a paper', () => {
  it('offer earlier items of the same electron whose quantity leads there', () => {
    expect(sourcesOf(chain[2]?.scheme.asked as Asked, 3, chain).map(({ item, leg }) => [item.id, leg])).toEqual([['1', 'first'], ['2', 'first']]);
    expect(sourcesOf({ ...scheme('energy-ev').asked, electron: '3s' }, 3, chain)).toEqual([]);
    expect(sourcesOf({ ...scheme('energy-ev').asked, convention: 'slater-d-at-1' }, 3, chain)).toEqual([]);
    expect(sourcesOf({ symbol: 'S', charge: 0, electron: '3p', quantity: 'difference', convention: 'slater', other: { symbol: 'Cl', charge: 0, electron: '3p' } }, 4, chain).map(({ leg }) => leg)).toEqual(['second', 'second']);
  });

  it('name one that points to a later item, to none, or to another quantity by now', () => {
    const [sigma, zeff] = chain;
    if (!sigma || !zeff) throw new Error('The chain has three items.');
    expect(linkProblem(zeff, chain)).toBeNull();
    expect(linkProblem({ ...zeff, number: 1 }, [{ ...sigma, number: 2 }])).toBe('It follows from item 2, which comes after it.');
    expect(linkProblem(zeff, [zeff])).toBe('The item it follows from is no longer on the paper.');
    expect(linkProblem(zeff, [{ ...sigma, scheme: scheme('radius-pm') }, zeff])).toBe('Nothing can be carried on from item 1 as it is now.');
  });
});

describe('what costs once a paper', () => {
  const energies = paper(...Array.from({ length: 3 }, () => scheme('energy-ev', { unitRule: { grains: 600 }, signRule: { grains: 1200 } })));
  it('a missing or another unit, at the first item in paper order', () => {
    expect(marks(energies, '-56.25', '-56.25 kJ/mol', '-56.25 eV')).toEqual([[3000, 'rounding'], [3600, 'rounding'], [3600, 'rounding']]);
    expect(marks(energies, null, '-56.25', '-56.25')).toEqual([null, [3000, 'rounding'], [3600, 'rounding']]);
  });

  it('a reversed sign, beside the unit', () => {
    expect(marks(energies, '56.25', '56.25 eV', '56.25')).toEqual([[1800, 'rounding'], [3600, 'rounding'], [3600, 'rounding']]);
    const detail = markPaper(energies, answers('56.25')).get('1')?.verdict;
    expect(detail && reasonInWords(detail)).toMatchObject({ head: 'the key, rounded, sign reversed, no unit' });
  });

  it('an item without marks to lose charges nothing', () => {
    expect(marks(energies, '12', '-56.25').slice(0, 2)).toEqual([[0, 'nothing'], [3000, 'rounding']]);
  });

  it('a unit costs nothing without a rule; another unit makes another value', () => {
    const plain = paper(scheme('energy-ev'));
    expect([marks(plain, '-56.25'), marks(plain, '-56.25 eV'), marks(plain, '-56.25 kJ/mol'), marks(plain, '56.25')].map(([first]) => first?.[0])).toEqual([3600, 3600, 0, 0]);
  });
});

describe('method marks, choices and withdrawn items', () => {
  const method = { methodMarks: [{ id: 'grouping', text: 'electrons grouped', grains: 600 }, { id: 'sum', text: 'the sum set out', grains: 600 }] };
  const struck = (typed: string, ...ids: string[]) => markPaper(paper(scheme('zeff', method)), new Map([['1', { ...given(typed), struck: ids }]])).get('1')?.verdict.grains;
  it('adds what was struck to what the value gives, a blank included, not to what a person decides', () => {
    expect([struck('6.10'), struck('6.10', 'sum', 'grouping'), struck('9.99', 'grouping'), struck('@blank', 'sum'), struck('@cannot-read', 'sum'), struck('6.10', 'gone')]).toEqual([2400, 3600, 600, 600, null, 2400]);
  });

  const options = ['O', 'F', 'N', 'C'].map((symbol) => ({ symbol, charge: 0, electron: '2p' }));
  const printed = (kind: 'choice' | 'order', answer: string, changes: Partial<ItemScheme> = {}) =>
    paper({ ...scheme('zeff'), kind, key: { value: '1', text: answer, decimals: 0 }, printed: { question: kind === 'choice' ? 'greatest' : 'increasing', options, answer, partMarks: kind === 'order' ? [{ inPlace: 1, grains: 600 }, { inPlace: 2, grains: 1200 }] : [] }, ...changes });
  it('pays an order in part by the numbers in their places', () => {
    // Z_eff rises across a period: common practice, no source. C, N, O, F are options 4, 3, 1, 2.
    const order = printed('order', '4 3 1 2');
    expect(['4 3 1 2', '4312', '4,3,2,1', '4 1 2 3', '1 2 3', '2', '9 9'].map((typed) => marks(order, typed)[0])).toEqual([
      [3600, 'key'], [3600, 'key'], [1200, 'part'], [600, 'part'], [0, 'nothing'], [0, 'nothing'], [0, 'nothing'],
    ]);
    expect(marks(printed('choice', '2'), '2')[0]).toEqual([3600, 'key']);
    expect(marks(printed('choice', '2', { alternatives: [{ name: 'misprint', value: '1', text: '1', decimals: 0, grains: 1200, reason: 'misprinted' }] }), '1')[0]).toEqual([1200, 'alternative']);
    expect(marks(printed('choice', '2'), '22')[0]).toEqual([0, 'nothing']);
  });

  it('gives a withdrawn item full marks or none, whatever stands there', () => {
    expect(['6.10', '1.00', '@cannot-read'].map((typed) => marks(paper(scheme('zeff', { withdrawn: 'full' })), typed)[0])).toEqual(Array.from({ length: 3 }, () => [3600, 'withdrawn']));
    expect(marks(paper(scheme('zeff', { withdrawn: 'drop' })), '6.10')[0]).toEqual([0, 'withdrawn']);
  });

  it('leaves to a person what the policy calls the last one standing: it has a value', () => {
    const last = paper(scheme('zeff', { twoAnswers: 'last', crossedOut: 'none' }));
    expect([marks(last, '@two-answers')[0], marks(last, '@crossed-out')[0]]).toEqual([[null, 'code'], [0, 'code']]);
  });
});

describe('a paper as a whole', () => {
  const mixed = paper(
    scheme('sigma'), scheme('zeff', { ...from('1', 'sigma'), methodMarks: [{ id: 'm', text: 'shown', grains: 600 }] }),
    scheme('energy-ev', { ...from('2', 'zeff'), unitRule: { grains: 600 }, signRule: { grains: 600 } }), scheme('energy-kj-mol', { ...from('3', 'energy-ev'), unitRule: { grains: 600 } }),
  );
  const typed = fc.constantFrom('10.90', '11.25', '6.10', '5.75', '5.8', '-56.25', '56.25 eV', '-49.98', '-4822', '-5427 kJ/mol', '@blank', '@cannot-read', null);
  const readable = (text: string | null): boolean => text === null || !/[a-z]/i.test(text) || text.startsWith('@');
  const whole = fc.tuple(typed.filter(readable), typed.filter(readable), typed, typed).filter(([, , third, fourth]) => [third, fourth].every((text) => text === null || /^[^ ]*( (eV|kJ\/mol))?$/.test(text)));

  it('is marked the same in whatever order its answers came, with the memo and without', () => {
    const memo: VerdictMemo = new Map();
    fc.assert(
      fc.property(whole, fc.shuffledSubarray(['1', '2', '3', '4'], { minLength: 4 }), (texts, order) => {
        const straight = answers(...texts);
        const shuffled = new Map(order.flatMap((id) => { const one = straight.get(id); return one ? [[id, one] as const] : []; }));
        const marked = markPaper(mixed, straight);
        expect(markPaper(mixed, shuffled, memo)).toEqual(marked);
        for (const { verdict } of marked.values()) expect(verdict.grains === null || (verdict.grains >= 0 && verdict.grains <= 3600)).toBe(true);
      }),
    );
  });

  it('never gives less for an item that follows than it would alone', () => {
    fc.assert(
      fc.property(whole, (texts) => {
        const alone = mixed.map((item) => ({ ...item, scheme: { ...item.scheme, followThrough: null } }));
        const [linked, apart] = [markPaper(mixed, answers(...texts)), markPaper(alone, answers(...texts))];
        // A cost once a paper may fall on another item, so only items before it are compared.
        for (const id of ['1', '2']) expect(linked.get(id)?.verdict.grains ?? 0).toBeGreaterThanOrEqual(apart.get(id)?.verdict.grains ?? 0);
      }),
    );
  });

  it('amended and amended back is marked as before', () => {
    fc.assert(
      fc.property(whole, (texts) => {
        const amended = mixed.map((item) => ({ ...item, scheme: { ...item.scheme, roundings: { downToDecimals: null, truncation: false } } }));
        const back = amended.map((item, index) => ({ ...item, scheme: { ...item.scheme, roundings: mixed[index]?.scheme.roundings ?? item.scheme.roundings } }));
        expect(markPaper(back, answers(...texts))).toEqual(markPaper(mixed, answers(...texts)));
        expect(fromFractionText(mixed[0]?.scheme.key.value ?? '0')).toEqual({ n: 109n, d: 10n });
      }),
    );
  });
});
