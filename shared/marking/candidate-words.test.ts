import { describe, expect, it } from 'vitest';
import { toldToCandidate } from './candidate-words';
import type { RuleName } from './scheme';

// Wording ours, no source. What is checked: the mark, the reason with its numbers, and nothing of the key where it may not be told.

const told = (rule: RuleName, numbers: Record<string, string> = {}, more: { grains?: number | null; feedback?: readonly string[]; showsKey?: boolean } = {}): string =>
  toldToCandidate({ verdict: { grains: more.grains === undefined ? 2400 : more.grains, rule, numbers: { key: '6.10', ...numbers } }, maxGrains: 3600, feedback: more.feedback ?? [], showsKey: more.showsKey ?? false });

describe('what a candidate is told', () => {
  it.each<[RuleName, Record<string, string>, string]>([
    ['withdrawn', { withdrawn: 'full' }, 'This question was withdrawn, and everyone has its marks.'],
    ['withdrawn', { withdrawn: 'drop' }, 'This question was withdrawn and does not count.'],
    ['code', { code: 'blank' }, 'Nothing stands in the box.'],
    ['code', { code: 'two-answers' }, 'No single answer stands in the box.'],
    ['key', {}, 'Your answer is right.'],
    ['rounding', { decimals: '1' }, 'Your answer is right, given to one decimal.'],
    ['rounding', { decimals: '0' }, 'Your answer is right, given to a whole number.'],
    ['rounding', { decimals: '2' }, 'Your answer is right, given to 2 decimals.'],
    ['alternative', { name: 'the SCF value' }, 'Your answer is accepted: the SCF value.'],
    ['band', { from: '6.05', to: '6.15' }, 'Your answer is near enough to be accepted.'],
    ['follow-through', { followed: '11.25' }, 'Your answer follows rightly from your own value of an earlier question, 11.25. An error costs once.'],
    ['part', { inPlace: '2', of: '4' }, '2 of the 4 numbers stand in their places.'],
    ['slip', {}, 'Your answer fits a known slip.'],
    ['nothing', {}, 'Your answer is another value.'],
  ])('%s %o', (rule, numbers, sentence) => expect(told(rule, numbers)).toBe(`2 of 3. ${sentence}`));

  it('leaves the mark to a person where none stands', () => {
    expect(told('code', { code: 'two-answers' }, { grains: null })).toBe('A person decides this mark. No single answer stands in the box.');
  });

  it('is the likeliest feedback where a slip fits', () => {
    const feedback = ['An electron does not screen itself.', 'Another.'];
    expect(told('slip', {}, { feedback })).toBe('2 of 3. An electron does not screen itself.');
    expect(told('nothing', {}, { feedback })).toBe('2 of 3. Your answer may have come about so. An electron does not screen itself.');
  });

  it('is the key only where it may be told', () => {
    const withKey = (rule: RuleName, numbers: Record<string, string> = {}) => told(rule, numbers, { showsKey: true });
    expect(withKey('slip')).toBe('2 of 3. Your answer fits a known slip. The value is 6.10.');
    expect(withKey('nothing')).toBe('2 of 3. Your answer is another value. The value is 6.10.');
    expect(withKey('nothing', { key: '' })).toBe('2 of 3. Your answer is another value.');
    expect(withKey('band', { from: '6.05', to: '6.15' })).toBe('2 of 3. Your answer lies between 6.05 and 6.15, which is accepted.');
    // No rule names the key, nor the ends of a band, from which it could be worked.
    const rules: RuleName[] = ['withdrawn', 'code', 'key', 'rounding', 'alternative', 'band', 'follow-through', 'part', 'slip', 'nothing'];
    for (const rule of rules) expect(told(rule, { from: '6.05', to: '6.15' })).not.toMatch(/6\.10|6\.05|6\.15/);
  });

  it.each<[Record<string, string>, string]>([
    [{ sign: 'reversed', signCost: '600' }, 'The sign is the wrong way round, which costs 0.5, once.'],
    [{ sign: 'reversed' }, 'The sign is the wrong way round, which costs nothing more here.'],
    [{ unitWanted: 'eV', unitCost: '1200' }, 'The unit should be eV, which costs 1, once.'],
    [{ unitWanted: 'eV' }, 'The unit should be eV, which costs nothing more here.'],
    [{ method: 'grouped', methodGrains: '400' }, 'Your working earns 1/3: grouped.'],
    [{ method: 'grouped' }, 'Your working earns 0: grouped.'],
  ])('is also what came on top or off: %o', (numbers, sentence) => expect(told('key', numbers)).toBe(`2 of 3. Your answer is right. ${sentence}`));
});
