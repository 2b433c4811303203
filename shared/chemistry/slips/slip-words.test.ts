import { describe, expect, it } from 'vitest';
import { carriedValue } from '../carried-on';
import { decimal, toFigures, whole } from '../exact';
import { slipsOf } from './slips-of';
import type { SlipValue } from './slips-of';

// What is said of each slip. Numbers by the coefficients of J. C. Slater, Phys. Rev. 36, 57 (1930), counted by hand; wording ours, no source.

const slip = (symbol: string, electron: string, charge: number, id: string, more: { quantity?: string; configuration?: string } = {}): SlipValue | undefined =>
  slipsOf({ symbol, charge, electron, quantity: 'zeff', convention: 'slater', ...more }).find((one) => one.id === id);

describe('the step that differs, and the rule with what leads to the value', () => {
  it.each([
    ['Cl', '3p', 0, 'counts-itself', '7 × 0.35 where the key has 6 × 0.35', 'An electron does not screen itself: of the 7 in (3s 3p), 6 screen. With 7 × 0.35 it comes to 5.75.'],
    ['Cl', '3p', 0, 'shell-below-100', '8 × 1.00 where the key has 8 × 0.85', 'For a 3p electron the 8 electrons of shell 2, one shell in, screen 0.85 each. With 1.00 it comes to 4.90.'],
    ['Cl', '3p', 0, 'core-electrons-only', '8 × 1.00 where the key has 8 × 0.85 + 6 × 0.35', 'By Slater’s rules each electron screens by its coefficient, not all alike. With 10 core electrons at 1.00 and nothing else it comes to 7.00.'],
    ['Cl', '3p', 0, 'all-inner-085', '2 × 0.85 where the key has 2 × 1.00', 'For a 3p electron only the shell one in screens 0.85; every deeper electron screens 1.00. With 0.85 for all of them it comes to 6.40.'],
    ['Cl', '3p', 0, 'same-group-ignored', 'nothing where the key has 6 × 0.35', 'In (3s 3p) each other electron screens 0.35. Without them it comes to 8.20.'],
    ['Cl', '3p', 0, 'sigma-for-zeff', '10.90, not taken from 17', 'Z_eff is what is left of Z after the screening: 17 − 10.90. With the screening itself it comes to 10.90.'],
    ['Cl', '3p', 0, 's-and-p-split', '2 × 0.85 + 4 × 0.35 where the key has 6 × 0.35', '(3s 3p) is one group, in which each other electron screens 0.35. With 0.85 for the 3s electrons it comes to 5.10.'],
    ['Cl', '3p', 0, 'coefficients-exchanged', '8 × 0.35 + 6 × 0.85 where the key has 8 × 0.85 + 6 × 0.35', 'For a 3p electron the same group screens 0.35 and the shell one in 0.85. With the two exchanged it comes to 7.10.'],
    ['Cl', '3p', 0, 'same-group-085', '6 × 0.85 where the key has 6 × 0.35', 'In (3s 3p) each other electron screens 0.35. With 0.85 it comes to 3.10.'],
    ['Cl', '3p', 0, 'all-at-100', '14 × 1.00 where the key has 8 × 0.85 + 6 × 0.35', 'For a 3p electron the same group screens 0.35 and the shell one in 0.85; only deeper ones screen 1.00. With 1.00 for all of them it comes to 1.00.'],
    ['Cl', '3p', 0, 'same-group-030', '6 × 0.30 where the key has 6 × 0.35', 'In (3s 3p) each other electron screens 0.35. 0.30 belongs to 1s alone. With 0.30 it comes to 6.40.'],
    ['Cl', '3p', 0, 'group-number-as-count', '16 × 0.35 where the key has 6 × 0.35', 'The same group counts by its electrons: of the 7 in (3s 3p), 6 screen. With the group number, 17, as the number in the shell it comes to 2.60.'],
    ['Cl', '3p', 0, 'coefficients-rounded', '8 × 0.90 + 6 × 0.40 where the key has 8 × 0.85 + 6 × 0.35', 'The coefficients are 0.35 and 0.85, and only a result is rounded. With 0.4 and 0.9 it comes to 5.40.'],
    ['Cl', '3p', 0, 'shell-below-035', '8 × 0.35 where the key has 8 × 0.85', 'For a 3p electron the 8 electrons of shell 2, one shell in, screen 0.85 each. With 0.35 it comes to 10.10.'],
    ['Cl', '3p', 0, 'deep-core-left-out', 'nothing where the key has 2 × 1.00', 'For a 3p electron the 2 electrons two or more shells in screen 1.00 each. Without them it comes to 8.10.'],
    ['Cl', '3p', 0, 'shell-below-left-out', 'nothing where the key has 8 × 0.85', 'For a 3p electron the 8 electrons of shell 2, one shell in, screen 0.85 each. Without them it comes to 12.90.'],
    ['Cl', '3p', 0, 'inner-octet-left-out', 'nothing where the key has 8 × 0.85', 'Every shell further in counts, from 1s on; the 8 of shell 2, at 0.85 each, screen as well. Without them it comes to 12.90.'],
    ['Cl', '3p', 0, 'all-other-electrons', '14 × 1.00 where the key has 8 × 0.85 + 6 × 0.35', 'By Slater’s rules each electron screens by its coefficient, not all alike. With 1.00 for 16 other electrons it comes to 1.00.'],
    ['Cl', '3p', 0, 'charge-of-species', 'the charge, 0', 'Z_eff is the charge that a 3p electron meets inside Cl: 17 − 10.90. Taken as the charge of the whole species it comes to 0.00.'],
    ['Cl', '3p', 0, 'sign-reversed', 'the sign', 'The screening counts as positive and is taken from Z: 17 − 10.90. The other way round it comes to −6.10.'],
    ['Cl', '3p', 0, 'no-shielding', 'nothing taken from 17', 'Z_eff is what is left of Z after the screening: 17 − 10.90. Without the screening it comes to 17.00.'],
    ['Cl', '3p', 0, 'mass-number', '35 in place of 17', 'Z is the atomic number, 17; the mass number plays no part. With 35 in its place it comes to 24.10.'],
    ['Cl', '3p', 0, 'missing-bracket', '17 − 2.10 + 8.80', 'The whole sum is taken from Z: 17 − 10.90. With only the first term taken off and 8.80 added it comes to 23.70.'],
    ['Cl', '3p', 0, 'group-inward', '2 × 0.85 + 7 × 0.35 where the key has 2 × 1.00 + 8 × 0.85 + 6 × 0.35', 'Asked is a 3p electron, in (3s 3p). For (2s 2p) it comes to 12.85.'],
    ['Cl', '3p', 0, 'element-before', 'S in place of Cl', 'Asked is Cl, Z = 17. For S it comes to 5.45.'],
    ['Cl', '3s', 0, 's-and-p-split', '1 × 0.35 where the key has 6 × 0.35', '(3s 3p) is one group, in which each other electron screens 0.35. With the 3p electrons left out it comes to 7.85.'],
    ['Fe', '4s', 0, 'counts-itself', '2 × 0.35 where the key has 1 × 0.35', 'An electron does not screen itself: of the 2 in (4s), 1 screens. With 2 × 0.35 it comes to 3.40.'],
    ['Fe', '4s', 0, 'inner-d-at-100', '6 × 1.00 where the key has 6 × 0.85', 'For a 4s electron the 3d electrons are one shell in, so each screens 0.85. With 1.00 it comes to 2.85.'],
    ['Fe', '4s', 0, 'next-group-only', '8 × 1.00 where the key has 8 × 0.85', 'For a 4s electron the whole of shell 3 is one shell in, so its s and p electrons screen 0.85 as well. With 1.00 for them it comes to 2.55.'],
    ['Fe', '4s', 0, 'inner-d-left-out', 'nothing where the key has 6 × 0.85', 'For a 4s electron the 3d electrons are one shell in, so each screens 0.85. Without them it comes to 8.85.'],
    ['Fe', '4s', 0, 'inner-octet-left-out', 'nothing where the key has 8 × 1.00', 'Every shell further in counts, from 1s on; the 8 of shell 2, at 1.00 each, screen as well. Without them it comes to 11.75.'],
    ['Fe', '4s', 0, 'period-as-count', '3 × 0.35 where the key has 1 × 0.35', 'The same group counts by its electrons: of the 2 in (4s), 1 screens. With the period, 4, as the number in the group it comes to 3.05.'],
    ['Fe', '4s', 0, 'bracket-slip', '2 × 0.35 − 1 where the key has 1 × 0.35', 'The electron itself is taken off before multiplying: (2 − 1) × 0.35. With 2 × 0.35 − 1 it comes to 4.40.'],
    ['Fe', '4s', 0, 'element-after', 'Co in place of Fe', 'Asked is Fe, Z = 26. For Co it comes to 3.90.'],
    ['Fe', '3d', 0, 'filling-order', '2 × 1.00 more than the key', 'In Slater’s order 4s stands to the right of (3d), so its electrons do not screen, whatever the order of filling. With 1.00 for each of them it comes to 4.25.'],
    ['Fe', '3d', 0, 'sp-rule-on-d', '8 × 0.85 where the key has 8 × 1.00', 'For a 3d electron everything to the left in Slater’s order screens 1.00, (3s 3p) as well. With 0.85 for (3s 3p), which is the rule for s and p electrons, it comes to 7.45.'],
    ['Fe', '3d', 0, 'outer-at-035', '2 × 0.35 more than the key', 'Electrons to the right of (3d) in Slater’s order do not screen; there are 2 of them. With 0.35 for each of them it comes to 5.55.'],
    ['Fe', '3d', 0, 'd-grouped-with-sp', '8 × 0.85 + 8 × 0.35 where the key has 16 × 1.00', '3d is a group of its own, apart from (3s 3p) and to the right of it. With all of them as one group it comes to 12.65.'],
    ['Fe', '3d', 0, 'all-inner-085', '18 × 0.85 where the key has 18 × 1.00', 'For a 3d electron every electron to the left in Slater’s order screens 1.00. With 0.85 for all of them it comes to 8.95.'],
    ['Fe', '3d', 0, 'all-at-100', '5 × 1.00 where the key has 5 × 0.35', 'For a 3d electron the same group screens 0.35; only electrons further to the left screen 1.00. With 1.00 for all of them it comes to 3.00.'],
    ['Fe', '3d', 0, 'coefficients-rounded', '5 × 0.40 where the key has 5 × 0.35', 'The coefficient is 0.35, and only a result is rounded. With 0.4 it comes to 6.00.'],
    ['Fe', '3d', 0, 'group-outward', '14 × 0.85 + 1 × 0.35 where the key has 8 × 1.00 + 5 × 0.35', 'Asked is a 3d electron, in (3d). For (4s) it comes to 3.75.'],
    ['Cr', '3d', 0, 'outer-at-035', '1 × 0.35 more than the key', 'Electrons to the right of (3d) in Slater’s order do not screen; there is 1 of them. With 0.35 for each of them it comes to 4.25.'],
    ['Cr', '3d', 0, 'exception-ignored', '3 × 0.35 where the key has 4 × 0.35', 'Cr is an exception to the order of filling: 1s2 2s2 2p6 3s2 3p6 3d5 4s1. With the regular filling it comes to 4.95.'],
    ['Na', '3s', 0, 'counts-itself', '1 × 0.35 more than the key', 'An electron does not screen itself: in (3s) there is no other. With 1 × 0.35 it comes to 1.85.'],
    ['Na', '3s', 0, 'one-electron-too-many', '1 × 0.35 more than the key', 'The neutral atom Na has 1 electron in (3s). With 2 there, as in the ion with one electron more, it comes to 1.85.'],
    ['Na', '3s', 0, 'period-as-count', '2 × 0.35 more than the key', 'The same group counts by its electrons: in (3s) there is no other. With the period, 3, as the number in the group it comes to 1.50.'],
    ['Na', '3s', 0, 'same-group-ignored', 'the same sum as the key', 'In (3s) each other electron screens 0.35. Without them it comes to 2.20.'],
    ['Na', '3s', 0, 'bracket-slip', '1 × 0.35 − 1 where the key has 0 × 0.35', 'The electron itself is taken off before multiplying: (1 − 1) × 0.35. With 1 × 0.35 − 1 it comes to 2.85.'],
    ['He', '1s', 0, 'same-group-035-in-1s', '1 × 0.35 where the key has 1 × 0.30', 'Inside 1s an electron screens the other by 0.30; 0.35 belongs to the other groups. With 0.35 it comes to 1.65.'],
    ['He', '1s', 0, 'all-at-100', '1 × 1.00 where the key has 1 × 0.30', 'Inside 1s an electron screens the other by 0.30. With 1.00 for all of them it comes to 1.00.'],
    ['He', '1s', 0, 'all-other-electrons', '1 × 1.00 where the key has 1 × 0.30', 'By Slater’s rules each electron screens by its coefficient, not all alike. With 1.00 for 1 other electron it comes to 1.00.'],
    ['He', '1s', 0, 'same-group-ignored', 'nothing where the key has 1 × 0.30', 'In (1s) each other electron screens 0.30. Without them it comes to 2.00.'],
    ['Cl', '3p', -1, 'neutral-atom-electrons', '6 × 0.35 where the key has 7 × 0.35', 'Cl⁻ has 18 electrons, 1 more than the atom. With the electrons of the neutral atom it comes to 6.10.'],
    ['Cl', '3p', -1, 'nuclear-charge-changed', '18 in place of 17', 'A charge changes the number of electrons, never Z, which stays 17. With 18 for Z it comes to 6.75.'],
    ['Cl', '3p', -1, 'charge-sign-reversed', '5 × 0.35 where the key has 7 × 0.35', 'Cl⁻ has 18 electrons, 1 more than the atom. With 16 electrons it comes to 6.45.'],
    ['Cl', '3p', -1, 'charge-added', '− 1 at the end', 'A charge changes the number of electrons, never Z, which stays 17. Nothing is added after Z − σ. With the charge, −1, added it comes to 4.75.'],
    ['Cl', '3p', -1, 'charge-of-species', 'the charge, −1', 'Z_eff is the charge that a 3p electron meets inside Cl⁻: 17 − 11.25. Taken as the charge of the whole species it comes to −1.00.'],
    ['Cl', '3p', -1, 'element-before', 'S⁻ in place of Cl⁻', 'Asked is Cl⁻, Z = 17. For S⁻ it comes to 5.10.'],
    ['Fe', '3d', 2, 'neutral-atom-electrons', 'the same sum as the key', 'Fe²⁺ has 24 electrons, 2 fewer than the atom. With the electrons of the neutral atom it comes to 6.25.'],
    ['Fe', '3d', 2, 'nuclear-charge-changed', '24 in place of 26', 'A charge changes the number of electrons, never Z, which stays 26. With 24 for Z it comes to 4.25.'],
    ['Fe', '3d', 2, 'charge-sign-reversed', '7 × 0.35 where the key has 5 × 0.35', 'Fe²⁺ has 24 electrons, 2 fewer than the atom. With 28 electrons it comes to 5.55.'],
    ['Fe', '3d', 2, 'charge-added', '+ 2 at the end', 'A charge changes the number of electrons, never Z, which stays 26. Nothing is added after Z − σ. With the charge, +2, added it comes to 8.25.'],
    ['Fe', '3d', 2, 'd-removed-before-s', '3 × 0.35 where the key has 5 × 0.35', 'A cation loses the electrons of highest n first, so 4s goes before 3d. With the 4s electrons kept it comes to 6.95.'],
    ['Fe', '3d', 2, 'element-after', 'Co²⁺ in place of Fe²⁺', 'Asked is Fe²⁺, Z = 26. For Co²⁺ it comes to 6.90.'],
    ['Au', '5s', 0, 'inner-d-at-100', '24 × 1.00 where the key has 24 × 0.85', 'For a 5s electron the 4d and 4f electrons are one shell in, so each screens 0.85. With 1.00 it comes to 17.75.'],
    ['Au', '6s', 0, 'inner-f-left-out', 'nothing where the key has 14 × 1.00', 'For a 6s electron the 14 4f electrons screen 1.00 each. Without them it comes to 17.70.'],
    ['Ce', '6s', 0, 'inner-f-left-out', 'nothing where the key has 1 × 1.00', 'For a 6s electron the 1 4f electron screens 1.00. With it left out it comes to 4.00.'],
  ])('%s %s, charge %i: %s', (symbol, electron, charge, id, oneLine, feedback) => expect(slip(symbol, electron, charge, id)).toMatchObject({ oneLine, feedback }));

  it('speaks of one electron in the singular', () => {
    const excited = { configuration: '1s1 2p1' };
    expect(slip('He', '2p', 0, 'shell-below-100', excited)?.feedback).toBe('For a 2p electron the 1 electron of shell 1, one shell in, screens 0.85. With 1.00 it comes to 1.00.');
    expect(slip('He', '2p', 0, 'core-electrons-only', excited)?.feedback).toContain('With 1 core electron at 1.00');
  });

  it('is taken from Z where sigma is asked for', () => {
    expect(slip('Cl', '3p', 0, 'zeff-for-sigma', { quantity: 'sigma' })).toMatchObject({
      oneLine: '17 − 10.90', feedback: 'The screening constant is the sum of the contributions, before it is taken from Z. Taken from Z it comes to 6.10.',
    });
  });
});

describe('slips of a quantity that follows from Z_eff', () => {
  it('come to what the wrong Z_eff makes of it, by way of that', () => {
    // −13.605693 eV × (5.75/3)² = −49.98 eV, by hand.
    const energy = slip('Cl', '3p', 0, 'counts-itself', { quantity: 'energy-ev' });
    expect(energy).toMatchObject({ text: '-49.98', figures: 4, feedback: expect.stringMatching(/With 7 × 0\.35 Z_eff comes to 5\.75, and what is asked to −49\.98\.$/) as string });
    const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'energy-ev', convention: 'slater' };
    expect(toFigures(carriedValue(asked, { quantity: 'zeff', value: decimal('5.75') }) ?? whole(0), 4)).toBe('-49.98');
    expect(slip('Cl', '3p', 0, 'zeff-for-sigma', { quantity: 'energy-ev' })).toBeUndefined();
    // A Z_eff below 0 or above Z is no atom's, and leads nowhere.
    expect(slip('Cl', '3p', 0, 'sign-reversed', { quantity: 'energy-ev' })).toBeUndefined();
  });

  it('are none of a difference, nor of an electronegativity that counts the electron itself', () => {
    const asked = { symbol: 'Cl', charge: 0, electron: '3p', convention: 'slater', radiusAngstrom: '0.99' };
    expect(slipsOf({ ...asked, quantity: 'difference', other: { symbol: 'S', charge: 0, electron: '3p' } })).toEqual([]);
    expect(slipsOf({ ...asked, quantity: 'electronegativity', countsItself: true })).toEqual([]);
    // 0.359 × 5.75/0.99² + 0.744 = 2.850 (Allred and Rochow 1958).
    expect(slipsOf({ ...asked, quantity: 'electronegativity', countsItself: false }).find(({ id }) => id === 'counts-itself')?.text).toBe('2.850');
    expect(slipsOf({ ...asked, quantity: 'electronegativity' })).toEqual([]);
  });
});
