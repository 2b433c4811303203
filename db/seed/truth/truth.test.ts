import { describe, expect, it } from 'vitest';
import { compare, decimal, toDecimals } from '../../../shared/chemistry/exact';
import { expectedReading } from './truth-file';
import { candidateNumbers, inventTruth } from './truth';
import type { ItemFacts } from './truth';
import { leadsTo, resultOf, workingLines } from './working';
import { arithmeticErrors } from './wrong-numbers';

const chlorine = [{ count: 6, factor: '0.35' }, { count: 8, factor: '0.85' }, { count: 2, factor: '1' }];
const withItself = [{ count: 7, factor: '0.35' }, { count: 8, factor: '0.85' }, { count: 2, factor: '1' }];

const items: readonly ItemFacts[] = Array.from({ length: 12 }, (_, index) => ({
  number: index + 1,
  quantity: 'zeff',
  nuclear: 17,
  key: '6.10',
  terms: chlorine,
  roundings: ['6.1'],
  slips: [
    { slip: 'counts-itself', text: '5.75', weight: 5, terms: withItself },
    { slip: 'z-minus-core', text: '7.00', weight: 2 },
    { slip: 'sign-reversed', text: '-6.10', weight: 1 },
  ],
}));

const order = { seed: 'demo', items, candidates: candidateNumbers(1500) };
const truth = inventTruth(order);
const answers = truth.flatMap((candidate) => candidate.answers);
const share = (count: number): number => (100 * count) / answers.length;

describe('what the candidates wrote', () => {
  it('is the same for the same seed, whoever else sits the paper', () => {
    expect(JSON.stringify(inventTruth(order))).toBe(JSON.stringify(truth));
    const alone = inventTruth({ ...order, candidates: ['W4071'] });
    expect(alone[0]).toEqual(truth.find((each) => each.candidate === 'W4071'));
    expect(JSON.stringify(inventTruth({ ...order, seed: 'other' }))).not.toBe(JSON.stringify(truth));
  });

  it('survives being stored as JSON', () => {
    expect(JSON.parse(JSON.stringify(truth))).toEqual(truth);
  });

  it('comes in about the shares of a real sitting, in per cent', () => {
    const values = answers.filter((answer) => answer.kind === 'value');
    const plain = values.filter((answer) => !answer.unclear && !answer.text.includes(','));
    const of = (origin: string): number => share(plain.filter((answer) => answer.origin === origin).length);
    const kind = (name: string): number => share(answers.filter((answer) => answer.kind === name).length);
    const near = (found: number, wanted: number, within: number): void => expect(Math.abs(found - wanted)).toBeLessThan(within);
    near(of('key'), 62, 4);
    near(of('rounding'), 8, 1.5);
    near(of('slip'), 18, 3);
    near(of('other'), 4, 1);
    near(kind('blank'), 3, 0.8);
    near(kind('crossed-out'), 1.5, 0.4);
    near(kind('two-answers'), 1, 0.35);
    near(share(values.filter((answer) => answer.text.includes(',')).length), 1, 0.35);
    near(share(values.filter((answer) => answer.unclear).length), 0.9, 0.4);
    near(kind('cannot-read') + kind('elsewhere'), 0.8, 0.3);
  });

  it('differs in ability: some get nearly all, some few', () => {
    const right = truth.filter((each) => !each.isAbsent).map((each) => each.answers.filter((answer) => answer.origin === 'key' || answer.origin === 'rounding').length);
    expect(right.filter((count) => count >= 11).length).toBeGreaterThan(150);
    expect(right.filter((count) => count <= 5).length).toBeGreaterThan(75);
  });

  it('leaves absent candidates without answers', () => {
    const absent = truth.filter((each) => each.isAbsent);
    expect(absent.length).toBeGreaterThan(15);
    expect(absent.length).toBeLessThan(80);
    expect(absent.every((each) => each.answers.length === 0)).toBe(true);
  });

  it('expects the text as written for a value and the code for all else', () => {
    for (const answer of answers) {
      expect(answer.expected).toEqual(answer.kind === 'value' ? { text: answer.text } : { code: answer.kind });
      if (answer.unclear) {
        expect(answer.unclear[0]).toBe(answer.text);
        expect(answer.unclear[1]).not.toBe(answer.text);
      }
      if (answer.struck !== undefined) expect(answer.struck).not.toBe(answer.text);
    }
    const known = truth.find((each) => !each.isAbsent);
    if (!known) throw new Error('Somebody is present.');
    expect(expectedReading(truth, known.candidate, 3)).toEqual(known.answers[2]?.expected);
    expect(expectedReading(truth, 'W1', 3)).toBeUndefined();
  });

  it('shows working that fits the answer and the four lines', () => {
    for (const answer of answers) {
      expect(answer.working.length).toBeLessThanOrEqual(4);
      const last = answer.working.at(-1)?.match(/^17 - ([\d.]+)/);
      if (!last || answer.origin === 'other') continue;
      const left = toDecimals({ n: 17n * 100n - BigInt(toDecimals(decimal(last[1] ?? '0'), 2).replace('.', '')), d: 100n }, 2);
      const meant = answer.origin === 'slip' ? ['5.75', '7.00'] : ['6.10'];
      expect(meant).toContain(left);
    }
  });
});

describe('working', () => {
  // J. C. Slater, Phys. Rev. 36, 57 (1930): 0.35 for the same group, 0.85 for the shell below, 1.00 deeper. Cl 3p: 17 - 10.90.
  const sum = { quantity: 'zeff', nuclear: 17, terms: chlorine } as const;

  it('leads from the terms to the value', () => {
    expect(toDecimals(resultOf(sum), 2)).toBe('6.10');
    expect(leadsTo({ ...sum, terms: withItself }, decimal('5.75'))).toBe(true);
    expect(leadsTo(sum, decimal('5.75'))).toBe(false);
  });

  it('is set out term by term or in one sum', () => {
    expect(workingLines(sum, 'terms', '6.10', false)).toEqual(['6 x 0.35 = 2.1', '8 x 0.85 = 6.8', '2 x 1 = 2', '17 - 10.9']);
    expect(workingLines(sum, 'sum', '6.10', true)).toEqual(['6x0.35 + 8x0.85 + 2', '= 2.1 + 6.8 + 2 = 10.9', '17 - 10.9 = 6.10']);
    expect(workingLines({ ...sum, quantity: 'sigma' }, 'terms', '10.90', true).at(-1)).toBe('2.1 + 6.8 + 2 = 10.90');
    expect(workingLines(sum, 'none', '6.10', true)).toEqual([]);
  });
});

describe('errors of arithmetic', () => {
  it('are never the key, a rounding or a slip, and never negative', () => {
    const wrong = arithmeticErrors('6.10', new Set(['6.1', '7.10']));
    expect(wrong).toContain('6.01');
    expect(wrong).toContain('5.10');
    expect(wrong).not.toContain('6.10');
    expect(wrong).not.toContain('7.10');
    for (const text of arithmeticErrors('0.55', new Set())) expect(compare(decimal(text), decimal('0'))).toBeGreaterThan(0);
  });
});
