import { expect, it } from 'vitest';
import { completeScheme } from './complete-scheme';
import { defaultScheme } from './scheme-checks';

const asked = { symbol: 'Cl', charge: 0, electron: '3p', quantity: 'zeff', convention: 'slater' } as const;
const stored = defaultScheme(asked, { value: '61/10', text: '6.10', decimals: 2 }, 3600);

it('says none where a stored scheme says nothing, and leaves the rest', () => {
  expect(completeScheme(stored)).toEqual({ ...stored, unitRule: null, signRule: null, slips: [], followThrough: null, methodMarks: [], printed: null, withdrawn: 'none' });
  const said = {
    ...stored, unitRule: { grains: 1 }, signRule: { grains: 2 }, slips: [{ id: 'a', letter: 'a', name: '', value: '1', text: '1', grains: 0, feedback: '' }],
    followThrough: { from: '1', quantity: 'sigma', isTrivial: false }, methodMarks: [{ id: 'm', text: '', grains: 1 }],
    printed: { question: 'greatest', options: [], answer: '1', partMarks: [] }, withdrawn: 'full',
  } as const;
  expect(completeScheme(said)).toEqual(said);
});

it('gives four figures to a key that no short decimal says, and states none itself', () => {
  const figures = (value: string, stated?: number) => completeScheme({ ...stored, key: { value, text: '', decimals: 2, ...(stated === undefined ? {} : { figures: stated }) } }).key.figures;
  expect([figures('61/10'), figures('1/3'), figures('1/3', 3), figures('61/10', 3)]).toEqual([undefined, 4, 3, 3]);
});

it('is the same object for the same scheme', () => expect(completeScheme(stored)).toBe(completeScheme(stored)));
