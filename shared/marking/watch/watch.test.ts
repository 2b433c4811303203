import { expect, it } from 'vitest';
import { occupiedElectrons } from '../../chemistry/configurations';
import { elementByNumber } from '../../chemistry/elements';
import { toFractionText } from '../../chemistry/exact';
import { work } from '../../chemistry/work';
import { defaultScheme } from '../scheme-checks';
import type { Band, ItemScheme } from '../scheme';
import { guardOf } from './guard';
import { silentSlips } from './silent';
import { toldApart } from './told-apart';
import { watchWords } from './words';
import { conventionValues, slipValues } from './wrong-values';

// Rules: J. C. Slater, Phys. Rev. 36, 57 (1930). Which wrong methods there are: common practice in marking, no source. The counts
// over the ordinary items were made apart from this code.

/** A Z_eff item on a neutral atom by Slater's rules, as it starts out, with bands. */
function schemeFor(symbol: string, electron: string, bands: readonly Band[] = []): ItemScheme {
  const asked = { symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater' } as const;
  const worked = work(asked);
  if (!worked.ok) throw new Error(worked.problem.message);
  return { ...defaultScheme(asked, { value: toFractionText(worked.value.value), text: worked.value.text, decimals: 2 }, 3600), bands };
}

const band = (kind: Band['kind'], width: string, grains = 2400): Band => ({ name: `${kind} ${width}`, kind, width, grains });

/** Neutral atoms: the outermost s or p electron for Z = 2 to 36, and 3d for Z = 21 to 30. Common exam practice, no source. */
function ordinaryItems(): { readonly name: string; readonly symbol: string; readonly electron: string }[] {
  return Array.from({ length: 35 }, (_, index) => index + 2).flatMap((number) => {
    const element = elementByNumber(number);
    if (!element.ok) throw new Error(element.problem.message);
    const { symbol } = element.value;
    const occupied = occupiedElectrons(symbol, 0);
    const sp = (occupied.ok ? occupied.value : []).filter((label) => /[sp]$/.test(label)).at(-1) ?? '';
    return [sp, ...(number >= 21 && number <= 30 ? ['3d'] : [])].map((electron) => ({ name: `${symbol} ${electron}`, symbol, electron }));
  });
}

const items = ordinaryItems();
const payingSlips = (bands: readonly Band[]): number =>
  items.filter(({ symbol, electron }) => guardOf(schemeFor(symbol, electron, bands)).some(({ pays }) => pays.some(({ kind }) => kind === 'slip'))).length;

it('a closed band of 0.05 pays a wrong method on 13 of 45 ordinary items, 5 % on 35, 0.35 on all, none without a band', () => {
  expect(items).toHaveLength(45);
  expect([[band('absolute', '1/20')], [band('relative', '1/20')], [band('absolute', '7/20')], []].map(payingSlips)).toEqual([13, 35, 45, 0]);
});

it('17 of them have a silent slip, which gives the right number', () => {
  expect(items.filter(({ symbol, electron }) => silentSlips(schemeFor(symbol, electron)).rightNumber.length > 0).map(({ name }) => name)).toEqual([
    'He 1s', 'Li 2s', 'Be 2s', 'B 2p', 'C 2p', 'N 2p', 'O 2p', 'F 2p', 'Ne 2p', 'Na 3s', 'Al 3p', 'K 4s', 'Sc 4s', 'Sc 3d', 'Cr 4s', 'Cu 4s', 'Ge 4p',
  ]);
});

it('88 % of their distinct wrong values point to one slip, two names of one slip counted once', () => {
  // Counting the electron itself and one electron too many are the same count of electrons.
  const idsByValue = items.flatMap(({ symbol, electron }) => {
    const byValue = new Map<string, Set<string>>();
    for (const { id, text } of slipValues(schemeFor(symbol, electron).asked)) byValue.set(text, (byValue.get(text) ?? new Set()).add(id === 'one-electron-too-many' ? 'counts-itself' : id));
    return [...byValue.values()];
  });
  expect(Math.round((100 * idsByValue.filter(({ size }) => size === 1).length) / idsByValue.length)).toBe(88);
});

it('names what each band pays, the narrowest first, other conventions too, with distance and marks, nearest first', () => {
  const guards = guardOf(schemeFor('Cl', '3p', [band('relative', '1/20', 1200), band('absolute', '1/50')]));
  expect(guards.map(({ band: { name }, pays }) => [name, ...pays.map(({ id, text, distance, grains }) => `${id} ${text} ${distance} ${grains}`)])).toEqual([
    // E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963), 3p of chlorine: 6.1161.
    ['absolute 1/50', 'scf 6.1161 0.0161 above 2400'],
    // By hand: 17 - (6 x 0.35 + 10 x 0.85) = 6.40 and 17 - (6 x 0.30 + 8 x 0.85 + 2) = 6.40.
    ['relative 1/20', 'all-inner-085 6.40 0.30 above 1200', 'same-group-030 6.40 0.30 above 1200'],
  ]);
});

it('a band without a known wrong value in it is there, and pays none', () => {
  expect(guardOf(schemeFor('Cl', '3p', [band('absolute', '1/100')])).map(({ pays }) => pays)).toEqual([[]]);
  expect(guardOf(schemeFor('Cl', '3p'))).toEqual([]);
});

it('a share of its own keeps a value out only where the band does not outbid it: the highest mark wins', () => {
  const named = (grains: number): ItemScheme => ({
    ...schemeFor('Cl', '3p', [band('relative', '1/20')]),
    slips: [{ id: 'all-inner-085', letter: 'j', name: '', value: '32/5', text: '6.40', grains, feedback: '' }],
    alternatives: [{ name: 'SCF', value: '61161/10000', text: '6.1161', decimals: 4, grains, reason: '' }],
  });
  const paid = (grains: number) => guardOf(named(grains)).flatMap(({ pays }) => pays.map(({ id, ownGrains }) => [id, ownGrains]));
  expect(paid(2400)).toEqual([['same-group-030', null]]);
  expect(paid(1200)).toEqual([['scf', 1200], ['all-inner-085', 1200], ['same-group-030', null]]);
  // Named only: the scheme means to give it nothing, and the band pays it.
  expect(paid(0)).toContainEqual(['all-inner-085', 0]);
});

it('one decimal cannot tell 3.80 from 3.75 of Fe 4s', () => {
  const scheme = schemeFor('Fe', '4s');
  expect(toldApart(scheme)).toContainEqual({ id: 'same-group-030', name: '0.30 in every group', text: '3.80', rounded: '3.8', decimals: 1, distance: '0.05 above' });
  expect(toldApart({ ...scheme, roundings: { downToDecimals: null, truncation: false } })).toEqual([]);
});

it('where cutting off is accepted, what shares a cut value is named too', () => {
  // 6.10 and 6.75 of Cl 3p are 6 and 7 to the unit, and both 6 cut off; 6.40 is 6 either way.
  const cut = (truncation: boolean) => toldApart({ ...schemeFor('Cl', '3p'), roundings: { downToDecimals: 0, truncation } }).map(({ text, rounded }) => `${text} ${rounded}`);
  expect(cut(false)).toContain('6.40 6');
  expect(cut(false).some((line) => line.startsWith('6.75'))).toBe(false);
  expect(cut(true)).toContain('6.75 6');
});

it('tells what has no occasion on an item, and nothing where no slip is worked', () => {
  const { rightNumber, noOccasion } = silentSlips(schemeFor('Be', '2s'));
  expect(noOccasion.map(({ id }) => id)).toEqual(expect.arrayContaining(['same-group-035-in-1s', 'sp-rule-on-d', 'charge-added']));
  // By hand: 4 - (0.35 + 2 x 0.85) = 1.95, and nothing lies deeper.
  expect(rightNumber).toContainEqual({ id: 'all-inner-085', name: 'all inner electrons at 0.85', text: '1.95' });
  expect(rightNumber.every(({ id, text }) => text === '1.95' && !noOccasion.some((none) => none.id === id))).toBe(true);
  const scf: ItemScheme = { ...schemeFor('Be', '2s'), asked: { symbol: 'Be', charge: 0, electron: '2s', quantity: 'zeff', convention: 'scf' } };
  expect([silentSlips(scf), slipValues(scf.asked)]).toEqual([{ rightNumber: [], noOccasion: [] }, []]);
});

it('takes every other convention that covers the item and differs', () => {
  // Core count, common practice: 17 - 10 = 7; the SCF value as above; 3 x the root of 12.967632 eV (NIST) over 13.605693 eV = 2.929.
  expect(conventionValues(schemeFor('Cl', '3p').asked).map(({ id, text }) => `${id} ${text}`).sort()).toEqual(['core-count 7.00', 'ionisation-energy 2.929', 'scf 6.1161']);
});

it('says it in words, with name, value and distance', () => {
  const [scf, inner] = guardOf(schemeFor('Cl', '3p', [band('relative', '1/20')])).flatMap(({ pays }) => pays);
  const fe = toldApart(schemeFor('Fe', '4s')).find(({ id }) => id === 'same-group-030');
  if (!scf || !inner || !fe) throw new Error('Two values are paid, and one is not told apart.');
  expect(watchWords.paid({ ...inner, marks: '2' })).toBe('the slip “all inner electrons at 0.85”, 6.40, 0.30 above the key, would get 2 marks');
  expect(watchWords.paid({ ...scf, marks: '1' })).toBe('6.1161, SCF screening constants, 0.0161 above the key, would get 1 mark');
  expect(watchWords.notToldApart([fe], fe.rounded, fe.decimals)).toBe('At one decimal, 3.8 cannot be told from 0.30 in every group, 3.80, 0.05 above the key.');
  expect(watchWords.silent(['shell n-1 at 1.00'], '2.20')).toBe('shell n-1 at 1.00 gives 2.20 too; this item cannot see it.');
  expect(watchWords.noOccasion(['0.35 inside 1s', 'd removed before s'])).toBe('0.35 inside 1s; d removed before s have no occasion on this item.');
});
