import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contextFor, contextKey, noFacts } from './context';
import { defaultScheme } from './scheme-checks';
import type { ItemScheme } from './scheme';

const plain = defaultScheme({ symbol: 'Cl', charge: 0, electron: '3p', quantity: 'difference', convention: 'slater' }, { value: '61/10', text: '6.10', decimals: 2 }, 3600);
const linked: ItemScheme = { ...plain, followThrough: { from: '1', quantity: 'zeff', isTrivial: false, second: { from: '2', quantity: 'zeff' } } };
const facts = { followed: '5.75', second: '5.45', isUnitCharged: true, isSignCharged: true, struck: ['b', 'a', 'gone'] };

describe('what a verdict rests on', () => {
  it('is nothing where the scheme has no use for it', () => {
    expect(contextFor(plain, facts)).toEqual({});
    expect(contextFor({ ...linked, followThrough: { from: '1', quantity: 'zeff', isTrivial: true, second: { from: '2', quantity: 'zeff' } } }, facts)).toEqual({});
  });

  it('is the settled values it follows from, codes all alike', () => {
    expect(contextFor(linked, facts)).toEqual({ followed: '5.75', second: '5.45' });
    expect(contextFor({ ...plain, followThrough: { from: '1', quantity: 'zeff', isTrivial: false } }, facts)).toEqual({ followed: '5.75' });
    expect(contextFor(linked, { ...facts, followed: '@blank', second: '@cannot-read' })).toEqual({ followed: '@', second: '@' });
    expect(contextFor(linked, { ...facts, followed: null })).toEqual({ second: '5.45' });
    expect(contextFor(linked, { ...facts, second: null })).toEqual({ followed: '5.75' });
  });

  it('is a unit or a sign that was paid for, only where the item charges for one', () => {
    expect(contextFor({ ...plain, unitRule: { grains: 600 } }, facts)).toEqual({ unit: 'charged' });
    expect(contextFor({ ...plain, signRule: { grains: 600 } }, facts)).toEqual({ sign: 'charged' });
    expect(contextFor({ ...plain, unitRule: { grains: 600 }, signRule: { grains: 600 } }, noFacts)).toEqual({});
  });

  it('is the method marks struck, in the order of the scheme', () => {
    const methodMarks = ['a', 'b', 'c'].map((id) => ({ id, text: id, grains: 100 }));
    expect(contextFor({ ...plain, methodMarks }, facts)).toEqual({ method: 'a,b' });
    expect(contextFor({ ...plain, methodMarks }, noFacts)).toEqual({});
  });
});

describe('its text', () => {
  it('is the same for the same entries in whatever order, and differs for others', () => {
    expect(contextKey({})).toBe('');
    expect(contextKey({ followed: '10.55' })).toBe('[["followed","10.55"]]');
    const context = fc.record({ followed: fc.constantFrom('1', '2', '@'), second: fc.constantFrom('1', '2'), method: fc.constantFrom('a', 'a,b') }, { requiredKeys: [] });
    fc.assert(
      fc.property(context, context, (one, other) => {
        expect(contextKey(Object.fromEntries(Object.entries(one).reverse()))).toBe(contextKey(one));
        expect(contextKey(one) === contextKey(other)).toBe(JSON.stringify(Object.entries(one).sort()) === JSON.stringify(Object.entries(other).sort()));
      }),
    );
  });
});
