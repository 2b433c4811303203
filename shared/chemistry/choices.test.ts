import { describe, expect, it } from 'vitest';
import { workChoice } from './choices';
import type { ChoiceKind } from './choices';
import { proposedChoiceStem } from './stem';

const atom = (symbol: string, electron: string) => ({ symbol, charge: 0, electron });
const choice = (kind: ChoiceKind, options: readonly ReturnType<typeof atom>[], convention = 'slater') => ({ kind, quantity: 'zeff', convention, options });
const answer = (...asked: Parameters<typeof choice>): string => {
  const result = workChoice(choice(...asked));
  return result.ok ? result.value.answer : result.problem.message;
};

// Z_eff rises across a period: common practice in first-year teaching, no source.
const second = [atom('O', '2p'), atom('F', '2p'), atom('N', '2p')];

describe('a choice', () => {
  it('is answered by the printed number', () => {
    expect(answer('greatest', second)).toBe('2');
    expect(answer('least', second)).toBe('3');
  });

  it('of an order is answered by all of them', () => {
    expect(answer('increasing', second)).toBe('3 1 2');
    expect(answer('decreasing', second)).toBe('2 1 3');
  });

  it('follows the convention: Na, K, Rb tie by Slater’s rules and grow by screening constants', () => {
    const group = [atom('K', '4s'), atom('Na', '3s'), atom('Rb', '5s')];
    expect(answer('increasing', group)).toBe('Options 1 and 2 have the same value, so there is no one answer.');
    expect(answer('increasing', group, 'scf')).toBe('2 1 3');
  });

  it('carries the working of every option', () => {
    const result = workChoice(choice('greatest', second));
    expect(result.ok && result.value.worked.map(({ text }) => text)).toEqual(['4.55', '5.20', '3.90']);
  });

  it('is printed with its options numbered', () => {
    expect(proposedChoiceStem(choice('greatest', second))).toBe(
      'By Slater’s rules, which of these has the greatest value of Z_eff? Write its number. 1: a 2p electron of an O atom; 2: a 2p electron of an F atom; 3: a 2p electron of an N atom.',
    );
    expect(proposedChoiceStem(choice('increasing', second))).toMatch(/^By Slater’s rules, put these in order of increasing Z_eff\. Write their numbers\. 1: /);
  });

  describe('edge cases', () => {
    it('a tie matters only where it decides', () => {
      const options = [atom('Na', '3s'), atom('K', '4s'), atom('Cl', '3p')];
      expect(answer('greatest', options)).toBe('3');
      expect(answer('least', options)).toBe('Options 1 and 2 have the same value, so there is no one answer.');
    });

    it('two to nine options, each of which can be worked', () => {
      expect(answer('greatest', second.slice(0, 1))).toBe('A choice has two to 9 options.');
      expect(answer('greatest', Array.from({ length: 10 }, () => atom('O', '2p')))).toBe('A choice has two to 9 options.');
      expect(answer('greatest', [atom('O', '2p'), atom('F', '3p')])).toBe('Option 2: Fluorine has no 3p electron in its ground state.');
    });
  });
});
