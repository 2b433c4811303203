import { expect, it } from 'vitest';
import { occupiedElectrons } from '../chemistry/configurations';
import { elementByNumber } from '../chemistry/elements';
import { toFractionText } from '../chemistry/exact';
import { work } from '../chemistry/work';
import { guardOf, untoldSlips } from './guard';
import { defaultScheme } from './scheme-checks';
import type { Band, ItemScheme } from './scheme';

function schemeFor(symbol: string, electron: string, bands: readonly Band[] = []): ItemScheme {
  const asked = { symbol, charge: 0, electron, quantity: 'zeff', convention: 'slater' } as const;
  const worked = work(asked);
  if (!worked.ok) throw new Error(worked.problem.message);
  return { ...defaultScheme(asked, { value: toFractionText(worked.value.value), text: worked.value.text, decimals: 2 }, 3600), bands };
}

const band = (kind: Band['kind'], width: string): Band => ({ name: 'near', kind, width, grains: 2400 });

/** The 45 ordinary items: the outermost s or p electron of He to Kr, and the 3d electrons of Sc to Zn, neutral atoms. */
function ordinaryItems(): (readonly [string, string])[] {
  const symbolOf = (number: number): string => {
    const element = elementByNumber(number);
    if (!element.ok) throw new Error(String(number));
    return element.value.symbol;
  };
  const outer = Array.from({ length: 35 }, (_, index): readonly [string, string] => {
    const symbol = symbolOf(index + 2);
    const electrons = occupiedElectrons(symbol, 0);
    const sp = (electrons.ok ? electrons.value : []).filter((one) => /[sp]$/.test(one)).sort();
    return [symbol, sp.at(-1) ?? '1s'];
  });
  return [...outer, ...Array.from({ length: 10 }, (_, index): readonly [string, string] => [symbolOf(index + 21), '3d'])];
}

const paidOf = (bands: readonly Band[]): number => ordinaryItems().filter(([symbol, electron]) => guardOf(schemeFor(symbol, electron, bands)).some(({ kind }) => kind === 'slip')).length;

it('a band of 0.05 pays a wrong method on 13 of 45 ordinary items, 5 % on 35, 0.35 on all', () => {
  expect(ordinaryItems()).toHaveLength(45);
  expect([paidOf([band('absolute', '1/20')]), paidOf([band('relative', '1/20')]), paidOf([band('absolute', '7/20')]), paidOf([])]).toEqual([13, 35, 45, 0]);
});

it('names what a band pays, with its distance, nearest first', () => {
  const findings = guardOf(schemeFor('Cl', '3p', [band('relative', '1/20')]));
  // E. Clementi and D. L. Raimondi, J. Chem. Phys. 38, 2686 (1963): 6.1161; Slater's coefficients with all inner electrons at 0.85: 6.40.
  expect(findings[0]).toMatchObject({ kind: 'convention', text: '6.1161', distance: '0.0161 above', grains: 2400 });
  expect(findings.find(({ text }) => text === '6.40')).toMatchObject({ kind: 'slip', distance: '0.30 above' });
});

it('does not name what the scheme has given a share of its own', () => {
  const scheme = schemeFor('Cl', '3p', [band('relative', '1/20')]);
  const named = { ...scheme, slips: [{ id: 'all-inner-085', letter: 'j', name: '', value: '32/5', text: '6.40', grains: 1200, feedback: '' }], alternatives: [{ name: 'SCF', value: '61161/10000', text: '6.1161', decimals: 4, grains: 1200, reason: '' }] };
  expect(guardOf(named).map(({ name }) => name)).toEqual(['0.30 in every group']);
});

it('says which slips one decimal cannot tell from the key: 3.80 from 3.75 of Fe 4s', () => {
  expect(untoldSlips(schemeFor('Fe', '4s'))).toContainEqual({ name: '0.30 in every group', text: '3.80', rounded: '3.8', decimals: 1 });
  expect(untoldSlips({ ...schemeFor('Fe', '4s'), roundings: { downToDecimals: null, truncation: false } })).toEqual([]);
});
