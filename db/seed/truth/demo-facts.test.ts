import { describe, expect, it } from 'vitest';
import { decimal, equals } from '../../../shared/chemistry/exact';
import { demoFacts } from './demo-facts';
import { demoItems, oneDecimal, promptOf, workedKey } from './demo-items';
import { candidateNumbers, inventTruth } from './truth';
import { leadsTo } from './working';

const facts = demoFacts();

describe('the items of the demo', () => {
  // Worked by hand from J. C. Slater, Phys. Rev. 36, 57 (1930), whose own example is iron: 4s 3.75, 3d 6.25.
  it('have the keys that Slater’s rules give', () => {
    expect(facts.map((item) => item.key)).toEqual([
      '3.25', '3.90', '4.55', '5.20', '2.20', '6.10', '3.75', '6.25', '10.55', '7.85', '8.85', '2.85',
    ]);
  });

  it('ask for s, p and d electrons, an ion and a screening constant, each once in the paper’s order', () => {
    expect(demoItems.map((item) => item.number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
    expect(new Set(demoItems.map((item) => item.asked.electron.at(-1)))).toEqual(new Set(['s', 'p', 'd']));
    expect(demoItems.filter((item) => item.asked.charge > 0)).toHaveLength(1);
    expect(demoItems.filter((item) => item.asked.quantity === 'sigma')).toHaveLength(1);
    expect(demoItems.reduce((sum, item) => sum + item.maxGrains, 0)).toBe(31 * 1200);
  });

  it('print convention, species and figures', () => {
    const prompts = demoItems.map(promptOf);
    expect(prompts[5]).toBe('By Slater’s rules, find Z_eff for a 3p electron of a Cl atom, to two decimals.');
    expect(prompts[9]).toContain('an Mg²⁺ ion');
  });

  it('come with sums that lead to the key', () => {
    for (const [index, item] of facts.entries()) {
      const demoItem = demoItems[index];
      if (!demoItem) throw new Error('Facts and items are one to one.');
      expect(leadsTo(item, workedKey(demoItem).value)).toBe(true);
    }
    expect(facts[5]?.terms).toEqual([{ count: 6, factor: '0.35' }, { count: 8, factor: '0.85' }, { count: 2, factor: '1' }]);
  });

  it('have slips that give other values than the key, each sum leading to its value', () => {
    for (const item of facts) {
      expect(item.slips.length).toBeGreaterThan(8);
      for (const slip of item.slips) {
        expect(equals(decimal(slip.text), decimal(item.key))).toBe(false);
        if (slip.terms) expect(leadsTo({ ...item, nuclear: slip.nuclear ?? item.nuclear, terms: slip.terms }, decimal(slip.text))).toBe(true);
      }
    }
  });

  it('round to one decimal, both ways where the value lies half way', () => {
    expect(oneDecimal(decimal('4.55'))).toEqual(['4.6', '4.5']);
    expect(oneDecimal(decimal('-4.55'))).toEqual(['-4.6', '-4.5']);
    expect(oneDecimal(decimal('6.10'))).toEqual(['6.1']);
    expect(oneDecimal(decimal('6.06'))).toEqual(['6.1']);
  });
});

describe('the answers of the demo', () => {
  const answers = inventTruth({ seed: 'demo', items: facts, candidates: candidateNumbers(400) }).flatMap((each) => each.answers);

  it('name the slip behind a wrong value', () => {
    const slips = answers.filter((answer) => answer.origin === 'slip');
    expect(slips.length).toBeGreaterThan(500);
    const commonest = slips.filter((answer) => answer.slip === 'counts-itself').length;
    expect(commonest / slips.length).toBeGreaterThan(0.15);
    for (const answer of slips.filter((each) => each.kind === 'value')) {
      const known = facts[answer.itemNumber - 1]?.slips.find((slip) => slip.slip === answer.slip);
      expect(answer.text.replace(',', '.')).toBe(known?.text);
    }
  });

  it('keep the working within the lines', () => {
    expect(Math.max(...answers.map((answer) => answer.working.length))).toBeLessThanOrEqual(4);
  });
});
