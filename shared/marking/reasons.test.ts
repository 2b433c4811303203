import { describe, expect, it } from 'vitest';
import { keyingStep } from './keying';
import { reasonInWords } from './reasons';
import type { RuleName } from './scheme';

// Wording ours, no source. What is checked is that each rule has its own sentence with its numbers in it.

const key = { key: '6.10', distance: '0.08' };
const said = (rule: RuleName, numbers: Record<string, string> = {}, grains: number | null = 0): string => {
  const { head, detail } = reasonInWords({ grains, rule, numbers: { ...key, ...numbers } });
  return `${head} | ${detail}`;
};

describe('a rule in words', () => {
  it.each<[RuleName, Record<string, string>, string]>([
    ['key', {}, 'the key | It is the key, 6.10.'],
    ['rounding', { decimals: '1' }, 'the key, rounded | It is the key, 6.10, given to one decimal.'],
    ['rounding', { decimals: '0' }, 'the key, rounded | It is the key, 6.10, given to a whole number.'],
    ['rounding', { decimals: '3' }, 'the key, rounded | It is the key, 6.10, given to 3 decimals.'],
    ['alternative', { name: 'the SCF value', alternative: '6.12' }, 'accepted, the SCF value | It is 6.12, accepted as the SCF value.'],
    ['band', { band: 'near', from: '6.05', to: '6.15' }, 'in the band near | It lies in 6.05 to 6.15, 0.08 high.'],
    ['band', { band: 'near', from: '6.05', to: '6.15', distance: '-0.03' }, 'in the band near | It lies in 6.05 to 6.15, 0.03 low.'],
    ['follow-through', { followed: '11.25', carried: '5.75' }, 'follows from own 11.25 | Worked on from the candidate’s own 11.25, the value is 5.75. One error costs once.'],
    ['follow-through', { followed: '11.25', carried: '5.75', band: 'near', from: '5.70', to: '5.80' }, 'follows from own 11.25 | Worked on from the candidate’s own 11.25, the value is 5.75, and it lies in 5.70 to 5.80. One error costs once.'],
    ['part', { key: '4 3 1 2', inPlace: '2', of: '4' }, '2 of 4 in place | Of the order 4 3 1 2, 2 of 4 numbers stand in their places.'],
    ['withdrawn', { withdrawn: 'full' }, 'withdrawn, full marks | The item was withdrawn: everyone has its marks.'],
    ['withdrawn', { withdrawn: 'drop' }, 'withdrawn | The item was withdrawn: it is out of the total.'],
    ['slip', { letters: 'a, b', slips: 'counts the electron itself; one electron too many', slip: '5.75' },
      'fits a, b, counts the electron itself; one electron too many | It is 5.75, what counts the electron itself; one electron too many comes to. A slip is an explanation, not proof.'],
  ])('%s %o', (rule, numbers, words) => expect(said(rule, numbers)).toBe(words));

  it.each<[Record<string, string>, string]>([
    [{}, 'nothing fits, 0.08 high | No rule is met: 0.08 high beside the key, 6.10.'],
    [{ distance: '-1.10' }, 'nothing fits, 1.10 low | No rule is met: 1.10 low beside the key, 6.10.'],
    [{ distance: '0.00' }, 'too few decimals | The value is that of the key, 6.10, but with fewer decimals than are accepted.'],
    [{ distance: '0' }, 'too few decimals | The value is that of the key, 6.10, but with fewer decimals than are accepted.'],
    [{ distance: '10.00' }, 'nothing fits, 10.00 high | No rule is met: 10.00 high beside the key, 6.10.'],
    [{ distance: '0.005' }, 'nothing fits, 0.005 high | No rule is met: 0.005 high beside the key, 6.10.'],
    [{ key: '2', inPlace: '0', of: '1' }, 'another number | No rule is met: the answer is 2.'],
    [{ key: '4 3 1 2', inPlace: '0', of: '4' }, '0 of 4 in place | No rule is met: the answer is 4 3 1 2.'],
    [{ distance: '0.30', letters: 'j', slips: 'all inner electrons at 0.85' }, 'fits j, all inner electrons at 0.85 | No rule is met: 0.30 high beside the key, 6.10. It fits all inner electrons at 0.85, which has no share here.'],
    [{ distance: '-0.09', step: 'digits-exchanged' }, 'one step from the key, two digits exchanged | No rule is met: 0.09 low beside the key, 6.10. It may be a typing error: two digits exchanged. Look at the crop.'],
  ])('nothing %o', (numbers, words) => expect(said('nothing', numbers)).toBe(words));

  it('has words for every step of the fingers', () => {
    const typed = ['610', '61.0', '6.01', '6.110', '6.0', '6.70'].map((text) => keyingStep(text, '6.10') ?? '');
    expect([...typed, keyingStep('6.10', '-6.10') ?? ''].map((step) => said('nothing', { step }).split(' | ')[0])).toEqual(
      ['point missing', 'point moved', 'two digits exchanged', 'a digit doubled', 'a digit dropped', 'a look-alike digit', 'sign lost'].map((words) => `one step from the key, ${words}`),
    );
  });
});

describe('a code in words', () => {
  it.each([
    ['blank', 0, 'nothing written | The box is blank: 0 marks.'],
    ['cannot-read', null, 'can’t be read | A person has to decide what an unreadable answer is worth.'],
    ['crossed-out', null, 'crossed out | The answer is crossed out, with nothing in its place.'],
    ['crossed-out', 0, 'crossed out | The answer is crossed out, with nothing in its place. The scheme gives 0 marks for that.'],
    ['two-answers', null, 'two answers | Two answers were left standing.'],
    ['two-answers', 0, 'two answers | Two answers were left standing. The scheme gives 0 marks for that.'],
    ['elsewhere', null, 'written elsewhere | The answer stands in another place.'],
    ['wrong-page', null, 'wrong page | The page does not belong to this answer.'],
    ['ask-the-lead', null, 'set aside | A reader asked the lead to look.'],
  ])('%s with %d grains', (code, grains, words) => expect(said('code', { code }, grains)).toBe(words));
});

describe('what came on top or off', () => {
  it.each<[Record<string, string>, string]>([
    [{ sign: 'reversed', signCost: '600' }, 'the key, sign reversed | It is the key, 6.10. The sign is reversed: less 0.5, once a paper.'],
    [{ sign: 'reversed', signCost: '0' }, 'the key, sign reversed | It is the key, 6.10. The sign is reversed: paid for earlier on this paper.'],
    [{ unit: '', unitWanted: 'eV', unitCost: '1200' }, 'the key, no unit | It is the key, 6.10. The unit is eV, and none is given: less 1, once a paper.'],
    [{ unit: 'J', unitWanted: 'eV', unitCost: '0' }, 'the key, unit J | It is the key, 6.10. The unit is eV, and J is given: paid for earlier on this paper.'],
    [{ method: 'grouped; summed', methodGrains: '400' }, 'the key, method | It is the key, 6.10. From the working, 1/3 for: grouped; summed.'],
    [{ sign: 'reversed', signCost: '600', unit: '', unitWanted: 'eV', unitCost: '600', method: 'shown', methodGrains: '600' },
      'the key, sign reversed, no unit, method | It is the key, 6.10. The sign is reversed: less 0.5, once a paper. The unit is eV, and none is given: less 0.5, once a paper. From the working, 0.5 for: shown.'],
  ])('%o', (numbers, words) => expect(said('key', numbers)).toBe(words));
});
